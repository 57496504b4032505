// GNU units: the factor of every unit word of our table (prefixes included), compound conversions, temperature scales.
// `from` and `to` are our spellings, which the test reads; `asked` is what GNU units was asked where its spelling differs.
// Left out: currencies (their rates move) and gauge pressures (GNU units has none; the test takes their step from bar).

export const packages = ['units'];
export const program = ['units', '--version'];

/** GNU units' spelling of our words where it is another; the prefix is put before it. */
const spellings = {
  t: 'tonne',
  L: 'liter',
  gal: 'gallon',
  gal_imp: 'brgallon',
  bbl: 'bbl',
  short_ton: 'shortton',
  long_ton: 'brton',
  min: 'minute',
  h: 'hour',
  d: 'day',
  // GNU units' own year is the tropical year; ours is 365.25 days by definition.
  year: '(365.25 day)',
  // GNU units counts revolutions in radians; here a revolution is a plain number.
  rpm: '(1/minute)',
  kn: 'knot',
  ha: 'hectare',
  Torr: 'torr',
  Wh: '(watt hour)',
  cal: 'calorie_th',
  Btu: 'btu_IT',
  MMBtu: '(1e6 btu_IT)',
  toe: 'tonoil',
  PS: 'metrichorsepower',
  degR: 'degrankine',
  cP: 'centipoise',
  cSt: 'centistokes',
  '%': 'percent',
  '\u2030': '(1/1000)',
  ppm: 'ppm',
  ppb: 'ppb',
};
const prefixNames = {
  E: 'exa',
  P: 'peta',
  T: 'tera',
  G: 'giga',
  M: 'mega',
  k: 'kilo',
  h: 'hecto',
  d: 'deci',
  c: 'centi',
  m: 'milli',
  u: 'micro',
  n: 'nano',
  p: 'pico',
};

/** Our compound units and what GNU units is asked for them. */
const compounds = [
  ['kJ/(kg K)', 'J/(kg K)'],
  ['J/(mol K)', 'cal/(mol K)', 'joule/(mol kelvin)', 'calorie_th/(mol kelvin)'],
  ['MJ/kg', 'kWh/kg', 'megajoule/kg', 'kilowatt hour/kg'],
  ['MJ/kg', 'Btu/lb', 'megajoule/kg', 'btu_IT/lb'],
  ['MJ/kg', 'kcal/kg', 'megajoule/kg', 'kilocalorie_th/kg'],
  ['MJ/kg', 'kJ/kg', 'megajoule/kg', 'kilojoule/kg'],
  ['MJ/L', 'kWh/m3', 'megajoule/liter', 'kilowatt hour/m^3'],
  ['MJ/L', 'Btu/gal', 'megajoule/liter', 'btu_IT/gallon'],
  ['MJ/L', 'bar', 'megajoule/liter', 'bar'],
  ['kJ/mol', 'kcal/mol', 'kilojoule/mol', 'kilocalorie_th/mol'],
  ['kJ/mol', 'J/kmol', 'kilojoule/mol', 'joule/kilomole'],
  ['Btu/(lb degR)', 'kJ/(kg K)', 'btu_IT/(lb degrankine)', 'kilojoule/(kg kelvin)'],
  ['kg/m3', 'g/cm3', 'kg/m^3', 'gram/cm^3'],
  ['kg/m3', 'lb/ft3', 'kg/m^3', 'lb/ft^3'],
  ['kg/m3', 'kg/L', 'kg/m^3', 'kg/liter'],
  ['lb/gal', 'kg/m3', 'lb/gallon', 'kg/m^3'],
  ['g/kWh', 'g/MJ', 'gram/(kilowatt hour)', 'gram/megajoule'],
  ['g/kWh', 'kg/J', 'gram/(kilowatt hour)', 'kg/joule'],
  ['lb/(hp h)', 'g/kWh', 'lb/(horsepower hour)', 'gram/(kilowatt hour)'],
  ['lb/MMBtu', 'g/MJ', 'lb/(1e6 btu_IT)', 'gram/megajoule'],
  ['kWh/kg', 'J/kg', 'kilowatt hour/kg', 'joule/kg'],
  ['t/year', 'kg/s', 'tonne/(365.25 day)', 'kg/second'],
  ['t/d', 'kg/h', 'tonne/day', 'kg/hour'],
  ['m3/h', 'L/min', 'm^3/hour', 'liter/minute'],
  ['gal/min', 'm3/h', 'gallon/minute', 'm^3/hour'],
  ['kn', 'km/h', 'knot', 'kilometer/hour'],
  ['kn', 'm/s', 'knot', 'm/second'],
  ['mile/h', 'kn', 'mile/hour', 'knot'],
  ['nmi/h', 'kn', 'nauticalmile/hour', 'knot'],
  ['1/year', '1/s', '1/(365.25 day)', '1/second'],
  ['rpm', 'Hz', '1/minute', '1/second'],
  ['umol/kg', 'mol/kg', 'micromole/kg', 'mol/kg'],
  ['mol/L', 'mol/m3', 'mol/liter', 'mol/m^3'],
  ['g/mol', 'kg/kmol', 'gram/mol', 'kg/kilomole'],
  ['g/(t nmi)', 'g/(t km)', 'gram/(tonne nauticalmile)', 'gram/(tonne kilometer)'],
  ['g/(kN s)', 'lb/(lbf h)', 'gram/(kilonewton second)', 'lb/(lbf hour)'],
  ['W/(m2 K)', 'Btu/(h ft2 degR)', 'watt/(m^2 kelvin)', 'btu_IT/(hour ft^2 degrankine)'],
  ['W/(m K)', 'Btu/(h ft degR)', 'watt/(m kelvin)', 'btu_IT/(hour ft degrankine)'],
  ['kW/m2', 'Btu/(h ft2)', 'kilowatt/m^2', 'btu_IT/(hour ft^2)'],
  ['mm2/s', 'ft2/s', 'mm^2/second', 'ft^2/second'],
  ['mPa s', 'lb/(ft h)', 'millipascal second', 'lb/(ft hour)'],
  ['J/mol/K', 'kJ/(kmol K)', 'joule/mol/kelvin', 'kilojoule/(kilomole kelvin)'],
  ['psi', 'kPa', 'psi', 'kilopascal'],
  ['bar', 'psi', 'bar', 'psi'],
  ['atm', 'mmHg', 'atm', 'mmHg'],
  ['hp', 'PS', 'horsepower', 'metrichorsepower'],
  ['hp h', 'kWh', 'horsepower hour', 'kilowatt hour'],
  ['toe', 'MWh', 'tonoil', 'megawatt hour'],
  ['bbl', 'm3', 'bbl', 'm^3'],
  ['MJ^2/(kg s^-1)', 'J2 s/kg', 'megajoule^2/(kg second^-1)', 'joule^2 second/kg'],
  ['A h', 'A s', 'ampere hour', 'ampere second'],
  ['kW/kg', 'hp/lb', 'kilowatt/kg', 'horsepower/lb'],
];

const temperatures = [
  ['degC', 'K', 'tempC', 'K', [-273.15, -20, 0, 15, 25, 100, 1712.15]],
  ['degF', 'K', 'tempF', 'K', [-459.67, -40, 32, 59, 212, 2000]],
  ['degF', 'degC', 'tempF', 'tempC', [-40, 0, 68, 212]],
  ['degC', 'degF', 'tempC', 'tempF', [-40, 25, 350, 900]],
  ['degR', 'K', 'degrankine', 'K', [491.67, 1000]],
];

export async function answer({ run, load }) {
  const version = run('units', ['--version']).match(/version (\S+)/)[1];
  const { listUnitWords } = await load('server/core/quantity/unit-words.ts');
  const { describeDimension } = await load('server/core/quantity/dimension.ts');
  // 15 significant digits: every one of them is certain in double arithmetic, the sixteenth is not.
  const ask = (from, to) => {
    const number = Number(run('units', ['--terse', '--output-format', '%.15g', from, to]));
    if (!Number.isFinite(number)) throw new Error(`GNU units gave no number for ${from} in ${to}.`);
    return number;
  };
  const rows = [];
  for (const word of new Set(listUnitWords().values())) {
    const { euro, dollar, pound } = word.dimension;
    if (euro !== 0 || dollar !== 0 || pound !== 0) continue;
    if (word.scale === 'temperature' || word.scale === 'gauge-pressure') continue;
    const base = spellings[word.row.symbol] ?? word.row.symbol;
    const isExpression = base.startsWith('(');
    const scale = word.prefix === '' ? '' : isExpression ? `${prefixNames[word.prefix]} ` : prefixNames[word.prefix];
    const to = describeDimension(word.dimension).si;
    const asked = [`${scale}${base}`, to.replaceAll(/(?<=[a-z])(\d)/g, '^$1')];
    rows.push({ from: word.symbol, to, factor: ask(...asked), asked: asked.join(' -> '), provenance: 'seen' });
  }
  for (const [from, to, askedFrom = from, askedTo = to] of compounds) {
    const factor = ask(askedFrom, askedTo);
    rows.push({ from, to, factor, asked: `${askedFrom} -> ${askedTo}`, provenance: 'seen' });
  }
  for (const [from, to, askedFrom, askedTo, values] of temperatures) {
    for (const value of values) {
      // A scale is written as a function of the number, `tempC(25)`; a plain unit as a product.
      const asked = askedFrom.startsWith('temp') ? `${askedFrom}(${value})` : `${value} ${askedFrom}`;
      rows.push({ from, to, value, result: ask(asked, askedTo), asked: `${asked} -> ${askedTo}`, provenance: 'seen' });
    }
  }
  return {
    source: `GNU units ${version}, Debian`,
    command: 'units --terse --output-format %.15g FROM TO',
    rows,
  };
}
