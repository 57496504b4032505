// The closed table of units: one row a unit, and nothing else in the program knows a conversion factor.
// A row's definition is exact: whole or decimal numbers and units of earlier rows (`60 min`), never a rounded factor.
// It does not know how compound units are read (read-unit.ts) nor which units a place asks for.
// Invariants: every spelling is unique with all prefixes; no spelling is a reserved word, and none is C, F, H or S, which
// are elements. Sources stand in each row: SI Brochure 9th edition, NIST SP 811 (2008) appendix B, ISO 80000, IMO.

import type { Dimension } from './dimension.ts';

/**
 * How a unit's numbers are meant: `plain` measures from nothing; `kelvin` counts kelvins, of a temperature or of a
 * difference; `temperature` is a scale with its own zero; `gauge-pressure` counts from the standard atmosphere.
 */
export type UnitScale = 'plain' | 'kelvin' | 'temperature' | 'gauge-pressure';

/** One unit of the table. */
export interface UnitRow {
  /** The spelling used in answers. */
  readonly symbol: string;
  /** Other spellings read as the same unit (they take the same prefixes), among them the plurals of time units. */
  readonly spellings: readonly string[];
  /** For hovers and for "did you mean": the name in the singular, and in the plural where people write it. */
  readonly name: string;
  readonly plural: string;
  /** Numbers and earlier units with whole powers, `550 ft lbf s^-1`; or the base quantity this unit measures. */
  readonly definition: string | { readonly base: keyof Dimension };
  /** Prefix letters it takes, from `prefixes`. */
  readonly prefixes: readonly string[];
  readonly scale: UnitScale;
  /** For `temperature`: how many steps of this unit the scale's zero is above absolute zero. */
  readonly zero?: string;
  readonly source: string;
}

/** A decimal prefix: its further spellings, its name and its power of ten. */
export interface PrefixRow {
  readonly spellings: readonly string[];
  readonly name: string;
  readonly power: number;
}

/** The SI prefixes that some unit takes. `µ` is read as micro sign, as Greek letter and as `u`; answers say `u`. */
export const prefixes: Readonly<Record<string, PrefixRow>> = {
  E: { spellings: ['E'], name: 'exa', power: 18 },
  P: { spellings: ['P'], name: 'peta', power: 15 },
  T: { spellings: ['T'], name: 'tera', power: 12 },
  G: { spellings: ['G'], name: 'giga', power: 9 },
  M: { spellings: ['M'], name: 'mega', power: 6 },
  k: { spellings: ['k'], name: 'kilo', power: 3 },
  h: { spellings: ['h'], name: 'hecto', power: 2 },
  d: { spellings: ['d'], name: 'deci', power: -1 },
  c: { spellings: ['c'], name: 'centi', power: -2 },
  m: { spellings: ['m'], name: 'milli', power: -3 },
  u: { spellings: ['u', '\u00b5', '\u03bc'], name: 'micro', power: -6 },
  n: { spellings: ['n'], name: 'nano', power: -9 },
  p: { spellings: ['p'], name: 'pico', power: -12 },
};

const si = 'SI Brochure, 9th edition (BIPM, 2019)';
const siTable8 = 'SI Brochure, 9th edition (BIPM, 2019), table 8';
const sp811 = 'NIST SP 811 (2008), appendix B';
const yardAgreement = 'international yard and pound agreement (1959); NIST SP 811 (2008), appendix B';
const handbook44 = 'NIST Handbook 44, appendix C';
const iso4217 = 'ISO 4217';
const ratio = 'ISO 80000-1, section 7.3.1';

type Optional = 'spellings' | 'prefixes' | 'scale' | 'plural';

function unit(row: Omit<UnitRow, Optional> & Partial<Pick<UnitRow, Optional>>): UnitRow {
  return { spellings: [], prefixes: [], scale: 'plain', plural: `${row.name}s`, ...row };
}

/** All units, base units first; a definition uses earlier rows only. */
export const unitTable: readonly UnitRow[] = [
  // Length, area, volume.
  unit({ symbol: 'm', name: 'metre', definition: { base: 'length' }, prefixes: [...'kdcmunp'], source: si }),
  unit({ symbol: 'inch', name: 'inch', plural: 'inches', definition: '2.54 cm', source: yardAgreement }),
  unit({ symbol: 'ft', name: 'foot', plural: 'feet', definition: '12 inch', source: yardAgreement }),
  unit({ symbol: 'mile', name: 'statute mile', definition: '5280 ft', source: yardAgreement }),
  unit({
    symbol: 'nmi',
    name: 'nautical mile',
    definition: '1852 m',
    source: 'First International Extraordinary Hydrographic Conference, Monaco (1929); NIST SP 811 (2008), appendix B',
  }),
  unit({ symbol: 'ha', name: 'hectare', definition: '10000 m^2', source: siTable8 }),
  unit({
    symbol: 'L',
    spellings: ['l'],
    name: 'litre',
    definition: '1 dm^3',
    prefixes: [...'hdcmu'],
    source: siTable8,
  }),
  unit({ symbol: 'gal', spellings: ['gal_us'], name: 'US gallon', definition: '231 inch^3', source: handbook44 }),
  unit({ symbol: 'gal_imp', name: 'imperial gallon', definition: '4.54609 L', source: sp811 }),
  unit({ symbol: 'bbl', name: 'barrel (of 42 US gallons)', plural: 'barrels', definition: '42 gal', source: sp811 }),

  // Mass.
  unit({ symbol: 'kg', name: 'kilogram', definition: { base: 'mass' }, source: si }),
  // No Mg (magnesium) and no hg: the gram takes only the prefixes people write.
  unit({ symbol: 'g', name: 'gram', definition: '0.001 kg', prefixes: [...'mun'], source: si }),
  unit({ symbol: 't', name: 'tonne', definition: '1000 kg', prefixes: [...'kMG'], source: siTable8 }),
  unit({ symbol: 'lb', name: 'pound (mass)', plural: 'pounds', definition: '0.45359237 kg', source: yardAgreement }),
  unit({ symbol: 'short_ton', name: 'short ton', definition: '2000 lb', source: sp811 }),
  unit({ symbol: 'long_ton', name: 'long ton', definition: '2240 lb', source: sp811 }),

  // Time and rate.
  unit({
    symbol: 's',
    spellings: ['second', 'seconds'],
    name: 'second',
    definition: { base: 'time' },
    source: si,
  }),
  unit({ symbol: 'ms', name: 'millisecond', definition: '0.001 s', source: si }),
  unit({ symbol: 'us', spellings: ['\u00b5s', '\u03bcs'], name: 'microsecond', definition: '0.001 ms', source: si }),
  unit({ symbol: 'min', spellings: ['minute', 'minutes'], name: 'minute', definition: '60 s', source: siTable8 }),
  unit({ symbol: 'h', spellings: ['hour', 'hours'], name: 'hour', definition: '60 min', source: siTable8 }),
  unit({ symbol: 'd', spellings: ['day', 'days'], name: 'day', definition: '24 h', source: siTable8 }),
  unit({ symbol: 'week', spellings: ['weeks'], name: 'week', definition: '7 d', source: 'ISO 8601' }),
  unit({
    symbol: 'year',
    spellings: ['years'],
    name: 'year (of 365.25 days)',
    plural: 'years',
    definition: '365.25 d',
    source: 'convention of this program: the Julian year, which the International Astronomical Union uses too',
  }),
  unit({ symbol: 'Hz', name: 'hertz', plural: 'hertz', definition: '1 s^-1', prefixes: [...'kMG'], source: si }),
  unit({ symbol: 'rpm', name: 'revolution per minute', definition: '1 min^-1', source: sp811 }),
  unit({
    symbol: 'kn',
    name: 'knot',
    definition: '1 nmi h^-1',
    source: 'NIST SP 811 (2008), appendix B',
  }),

  // Force and pressure.
  unit({ symbol: 'N', name: 'newton', definition: '1 kg m s^-2', prefixes: [...'MkGm'], source: si }),
  unit({
    symbol: 'kgf',
    name: 'kilogram-force',
    plural: 'kilograms-force',
    definition: '9.80665 kg m s^-2',
    source: sp811,
  }),
  unit({ symbol: 'lbf', name: 'pound-force', plural: 'pounds-force', definition: '9.80665 lb m s^-2', source: sp811 }),
  unit({ symbol: 'Pa', name: 'pascal', definition: '1 N m^-2', prefixes: [...'GMkhmu'], source: si }),
  unit({ symbol: 'bar', name: 'bar', definition: '100000 Pa', prefixes: [...'kmu'], source: sp811 }),
  unit({ symbol: 'atm', name: 'standard atmosphere', definition: '101325 Pa', prefixes: [...'mu'], source: sp811 }),
  unit({ symbol: 'Torr', name: 'torr', plural: 'torr', definition: '1/760 atm', prefixes: ['m'], source: sp811 }),
  unit({
    symbol: 'mmHg',
    name: 'conventional millimetre of mercury',
    plural: 'millimetres of mercury',
    definition: '13595.1 kg m^-3 9.80665 m s^-2 mm',
    source: 'NIST SP 811 (2008), appendix B: density 13.5951 g/cm3 and standard gravity',
  }),
  unit({
    symbol: 'psi',
    name: 'pound-force per square inch',
    definition: '1 lbf inch^-2',
    prefixes: ['k'],
    source: sp811,
  }),
  unit({
    symbol: 'barg',
    name: 'bar above the standard atmosphere',
    plural: 'bar gauge',
    definition: '1 bar',
    prefixes: ['m'],
    scale: 'gauge-pressure',
    source: 'common practice; counted from 1 atm',
  }),
  unit({
    symbol: 'psig',
    name: 'pound-force per square inch above the standard atmosphere',
    plural: 'psi gauge',
    definition: '1 psi',
    scale: 'gauge-pressure',
    source: 'common practice; counted from 1 atm',
  }),

  // Energy and power.
  unit({ symbol: 'J', name: 'joule', definition: '1 N m', prefixes: [...'EPTGMkm'], source: si }),
  unit({ symbol: 'W', name: 'watt', definition: '1 J s^-1', prefixes: [...'TGMkmu'], source: si }),
  unit({ symbol: 'Wh', name: 'watt hour', definition: '1 W h', prefixes: [...'PTGMk'], source: sp811 }),
  unit({ symbol: 'cal', name: 'thermochemical calorie', definition: '4.184 J', prefixes: [...'GMk'], source: sp811 }),
  unit({
    symbol: 'Btu',
    name: 'British thermal unit (International Table)',
    plural: 'British thermal units',
    definition: '1055.05585262 J',
    source: 'ISO 80000-5; NIST SP 811 (2008), appendix B',
  }),
  unit({
    symbol: 'MMBtu',
    name: 'million Btu',
    plural: 'million Btu',
    definition: '1000000 Btu',
    source: 'common practice',
  }),
  unit({
    symbol: 'toe',
    name: 'tonne of oil equivalent',
    plural: 'tonnes of oil equivalent',
    definition: '41.868 GJ',
    prefixes: [...'Mk'],
    source: 'International Energy Agency: 10 gigacalories (International Table)',
  }),
  unit({
    symbol: 'hp',
    name: 'mechanical horsepower (550 foot pounds-force per second)',
    plural: 'horsepower',
    definition: '550 ft lbf s^-1',
    source: sp811,
  }),
  unit({
    symbol: 'PS',
    name: 'metric horsepower (75 kilogram-force metres per second)',
    plural: 'metric horsepower',
    definition: '75 kgf m s^-1',
    source: sp811,
  }),

  // Temperature.
  unit({
    symbol: 'K',
    name: 'kelvin',
    definition: { base: 'temperature' },
    prefixes: ['m'],
    scale: 'kelvin',
    source: si,
  }),
  unit({
    symbol: 'degR',
    name: 'degree Rankine',
    plural: 'degrees Rankine',
    definition: '5/9 K',
    scale: 'kelvin',
    source: sp811,
  }),
  unit({
    symbol: 'degC',
    spellings: ['\u00b0C', '\u2103'],
    name: 'degree Celsius',
    plural: 'degrees Celsius',
    definition: '1 K',
    scale: 'temperature',
    zero: '273.15',
    source: si,
  }),
  unit({
    symbol: 'degF',
    spellings: ['\u00b0F', '\u2109'],
    name: 'degree Fahrenheit',
    plural: 'degrees Fahrenheit',
    definition: '5/9 K',
    scale: 'temperature',
    zero: '459.67',
    source: sp811,
  }),

  // Amount, electricity, viscosity.
  unit({ symbol: 'mol', name: 'mole', definition: { base: 'amount' }, prefixes: [...'MkmunG'], source: si }),
  unit({ symbol: 'A', name: 'ampere', definition: { base: 'current' }, prefixes: [...'kmu'], source: si }),
  unit({ symbol: 'V', name: 'volt', definition: '1 W A^-1', prefixes: [...'kmu'], source: si }),
  unit({ symbol: 'cP', name: 'centipoise', plural: 'centipoise', definition: '0.001 Pa s', source: sp811 }),
  unit({ symbol: 'cSt', name: 'centistokes', plural: 'centistokes', definition: '1 mm^2 s^-1', source: sp811 }),

  // Ratios.
  unit({ symbol: '%', name: 'per cent', plural: 'percent', definition: '1/100', source: ratio }),
  unit({ symbol: '\u2030', name: 'per mille', plural: 'permille', definition: '1/1000', source: ratio }),
  unit({
    symbol: 'ppm',
    name: 'part per million',
    plural: 'parts per million',
    definition: '1/1000000',
    source: `${ratio}; the quantity must say whether by amount, mass or volume`,
  }),
  unit({
    symbol: 'ppb',
    name: 'part per billion (1e9)',
    plural: 'parts per billion',
    definition: '1/1000000000',
    source: `${ratio}; the quantity must say whether by amount, mass or volume`,
  }),

  // Money: no rate is known between currencies, and each is a dimension of its own.
  unit({ symbol: 'EUR', name: 'euro', definition: { base: 'euro' }, prefixes: [...'GMk'], source: iso4217 }),
  unit({ symbol: 'USD', name: 'US dollar', definition: { base: 'dollar' }, prefixes: [...'GMk'], source: iso4217 }),
  unit({
    symbol: 'GBP',
    name: 'pound sterling',
    plural: 'pounds sterling',
    definition: { base: 'pound' },
    prefixes: [...'GMk'],
    source: iso4217,
  }),
];
