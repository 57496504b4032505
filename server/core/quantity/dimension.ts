// Dimensions: which base quantities a number is made of, as whole exponents, with their algebra and their English names.
// Each currency is a base dimension of its own, so that adding euros to dollars is a mismatch like any other.
// It knows no units, scales or values: that a temperature is no temperature difference is the business of quantity.ts.
// Invariant: dimensions under multiply form a commutative group, and raising is repeated multiplication.
// Source: ISO 80000-1 (quantity calculus); SI Brochure, 9th edition, for the symbols.

/** Whole-number exponents of the base quantities. */
export interface Dimension {
  readonly length: number;
  readonly mass: number;
  readonly time: number;
  readonly temperature: number;
  readonly amount: number;
  readonly current: number;
  readonly euro: number;
  readonly dollar: number;
  readonly pound: number;
}

/** The dimension of a plain number, a ratio or a share. */
export const dimensionless: Dimension = {
  length: 0,
  mass: 0,
  time: 0,
  temperature: 0,
  amount: 0,
  current: 0,
  euro: 0,
  dollar: 0,
  pound: 0,
};

/** A dimension from the exponents that are not zero. */
export function dimensionOf(exponents: Partial<Dimension>): Dimension {
  return { ...dimensionless, ...exponents };
}

/** The dimension of a product. */
export function multiplyDimensions(left: Dimension, right: Dimension): Dimension {
  return {
    length: left.length + right.length,
    mass: left.mass + right.mass,
    time: left.time + right.time,
    temperature: left.temperature + right.temperature,
    amount: left.amount + right.amount,
    current: left.current + right.current,
    euro: left.euro + right.euro,
    dollar: left.dollar + right.dollar,
    pound: left.pound + right.pound,
  };
}

/** The dimension of a quotient. */
export function divideDimensions(left: Dimension, right: Dimension): Dimension {
  return multiplyDimensions(left, raiseDimension(right, -1));
}

/** The dimension of a power; `exponent` is a whole number. */
export function raiseDimension(dimension: Dimension, exponent: number): Dimension {
  // `+ 0` turns the -0 of 0 * -1 into 0, so that equal dimensions are also equal records.
  return {
    length: dimension.length * exponent + 0,
    mass: dimension.mass * exponent + 0,
    time: dimension.time * exponent + 0,
    temperature: dimension.temperature * exponent + 0,
    amount: dimension.amount * exponent + 0,
    current: dimension.current * exponent + 0,
    euro: dimension.euro * exponent + 0,
    dollar: dimension.dollar * exponent + 0,
    pound: dimension.pound * exponent + 0,
  };
}

/** Whether two dimensions are the same. */
export function sameDimension(left: Dimension, right: Dimension): boolean {
  return (
    left === right ||
    (left.length === right.length &&
      left.mass === right.mass &&
      left.time === right.time &&
      left.temperature === right.temperature &&
      left.amount === right.amount &&
      left.current === right.current &&
      left.euro === right.euro &&
      left.dollar === right.dollar &&
      left.pound === right.pound)
  );
}

/** Whether a dimension is that of a plain number. */
export function isDimensionless(dimension: Dimension): boolean {
  return sameDimension(dimension, dimensionless);
}

/** A short text that is the same for the same dimension and for no other: a key for maps. Its form means nothing. */
export function dimensionKey(dimension: Dimension): string {
  return baseSymbols.map(([name]) => dimension[name]).join(' ');
}

/**
 * A dimension in words with their article (`a specific energy`) and in SI units (`J/kg`). A dimension nobody has a word
 * for is described by its base units (`a quantity in kg2/m`). A plain number is `a plain number`, in `1`.
 * Where two quantities of the trade share a dimension (pressure and energy per volume, energy and torque) the commoner
 * one gives the words.
 */
export function describeDimension(dimension: Dimension): { readonly words: string; readonly si: string } {
  const named = namedDimensions.get(dimensionKey(dimension));
  if (named) return named;
  const si = inBaseUnits(dimension);
  return { words: `a quantity in ${si}`, si };
}

/** Every dimension that has a name, for the printed reference and the tests. */
export function listNamedDimensions(): readonly { readonly words: string; readonly si: string }[] {
  return [...namedDimensions.values()];
}

const baseSymbols: readonly (readonly [keyof Dimension, string])[] = [
  ['mass', 'kg'],
  ['length', 'm'],
  ['time', 's'],
  ['temperature', 'K'],
  ['amount', 'mol'],
  ['current', 'A'],
  ['euro', 'EUR'],
  ['dollar', 'USD'],
  ['pound', 'GBP'],
];

function inBaseUnits(dimension: Dimension): string {
  const above: string[] = [];
  const below: string[] = [];
  for (const [name, symbol] of baseSymbols) {
    const exponent = dimension[name];
    if (exponent === 0) continue;
    const power = Math.abs(exponent);
    (exponent > 0 ? above : below).push(power === 1 ? symbol : `${symbol}${power}`);
  }
  const numerator = above.length > 0 ? above.join(' ') : '1';
  if (below.length === 0) return numerator;
  return `${numerator}/${below.length === 1 ? below.join('') : `(${below.join(' ')})`}`;
}

/** Reads `kg m2 s-3`, the compact notation of the table below. */
function fromBaseUnits(text: string): Dimension {
  const exponents: Partial<Record<keyof Dimension, number>> = {};
  for (const [, symbol, power] of text.matchAll(/([A-Za-z]+)(-?\d*)/g)) {
    const base = baseSymbols.find(([, candidate]) => candidate === symbol);
    if (base) exponents[base[0]] = power === '' ? 1 : Number(power);
  }
  return dimensionOf(exponents);
}

/** Words, SI units, base units. The names are those of ISO 80000 where it has one, otherwise the trade's. */
const dimensionNames: readonly (readonly [words: string, si: string, base: string])[] = [
  ['a plain number', '1', ''],
  ['a length', 'm', 'm'],
  ['an area', 'm2', 'm2'],
  ['a volume', 'm3', 'm3'],
  ['a mass', 'kg', 'kg'],
  ['a time', 's', 's'],
  ['a temperature', 'K', 'K'],
  ['an amount of substance', 'mol', 'mol'],
  ['an electric current', 'A', 'A'],
  ['an electric charge', 'A s', 'A s'],
  ['a voltage', 'V', 'kg m2 s-3 A-1'],
  ['an electric charge per amount of substance', 'A s/mol', 'A s mol-1'],
  ['a rate', '1/s', 's-1'],
  ['a rate of change of a rate', '1/s2', 's-2'],
  ['a speed', 'm/s', 'm s-1'],
  ['an acceleration', 'm/s2', 'm s-2'],
  ['a force', 'N', 'kg m s-2'],
  ['a pressure', 'Pa', 'kg m-1 s-2'],
  ['a rate of pressure change', 'Pa/s', 'kg m-1 s-3'],
  ['an energy', 'J', 'kg m2 s-2'],
  ['a power', 'W', 'kg m2 s-3'],
  ['a specific energy', 'J/kg', 'm2 s-2'],
  ['a specific power', 'W/kg', 'm2 s-3'],
  ['a molar energy', 'J/mol', 'kg m2 s-2 mol-1'],
  ['a heat capacity', 'J/K', 'kg m2 s-2 K-1'],
  ['a specific heat capacity', 'J/(kg K)', 'm2 s-2 K-1'],
  ['a molar heat capacity', 'J/(mol K)', 'kg m2 s-2 K-1 mol-1'],
  ['a power per area', 'W/m2', 'kg s-3'],
  ['a power per volume', 'W/m3', 'kg m-1 s-3'],
  ['a thermal conductivity', 'W/(m K)', 'kg m s-3 K-1'],
  ['a heat transfer coefficient', 'W/(m2 K)', 'kg s-3 K-1'],
  ['a thermal expansion coefficient', '1/K', 'K-1'],
  ['a temperature change per time', 'K/s', 'K s-1'],
  ['a temperature change per length', 'K/m', 'K m-1'],
  ['a mass flow', 'kg/s', 'kg s-1'],
  ['a volume flow', 'm3/s', 'm3 s-1'],
  ['an amount flow', 'mol/s', 'mol s-1'],
  ['a mass flow per area', 'kg/(m2 s)', 'kg m-2 s-1'],
  ['an amount flow per area', 'mol/(m2 s)', 'mol m-2 s-1'],
  ['an amount flow per mass', 'mol/(kg s)', 'mol kg-1 s-1'],
  ['an amount flow per volume', 'mol/(m3 s)', 'mol m-3 s-1'],
  ['a density', 'kg/m3', 'kg m-3'],
  ['a specific volume', 'm3/kg', 'm3 kg-1'],
  ['a molar mass', 'kg/mol', 'kg mol-1'],
  ['a molar volume', 'm3/mol', 'm3 mol-1'],
  ['an amount per mass', 'mol/kg', 'mol kg-1'],
  ['an amount per volume', 'mol/m3', 'mol m-3'],
  ['an amount per area', 'mol/m2', 'mol m-2'],
  ['a mass per area', 'kg/m2', 'kg m-2'],
  ['a mass per length', 'kg/m', 'kg m-1'],
  ['a mass per energy', 'kg/J', 's2 m-2'],
  ['a volume per energy', 'm3/J', 'm s2 kg-1'],
  ['an amount per energy', 'mol/J', 'mol s2 kg-1 m-2'],
  ['a mass per mass and length', '1/m', 'm-1'],
  ['a number per area', '1/m2', 'm-2'],
  ['a number per volume', '1/m3', 'm-3'],
  ['a number per mass', '1/kg', 'kg-1'],
  ['a number per amount of substance', '1/mol', 'mol-1'],
  ['a dynamic viscosity', 'Pa s', 'kg m-1 s-1'],
  ['a kinematic viscosity', 'm2/s', 'm2 s-1'],
  ['a mass per force and time', 'kg/(N s)', 's m-1'],
  ['a momentum', 'kg m/s', 'kg m s-1'],
  ['an exposure (mass per volume times time)', 'kg s/m3', 'kg s m-3'],
  ['a transport work (mass times distance)', 'kg m', 'kg m'],
];

const currencies: readonly (readonly [symbol: string, plural: string])[] = [
  ['EUR', 'euros'],
  ['USD', 'US dollars'],
  ['GBP', 'pounds sterling'],
];

const priceNames: readonly (readonly [words: string, si: string, base: string])[] = [
  ['an amount of money', '', ''],
  ['a price per energy', '/J', 'kg-1 m-2 s2'],
  ['a price per mass', '/kg', 'kg-1'],
  ['a price per volume', '/m3', 'm-3'],
  ['a price per amount of substance', '/mol', 'mol-1'],
  ['a price per power', '/W', 'kg-1 m-2 s3'],
  ['a cost per time', '/s', 's-1'],
  ['a cost per distance', '/m', 'm-1'],
];

const namedDimensions: ReadonlyMap<string, { readonly words: string; readonly si: string }> = nameDimensions();

function nameDimensions(): Map<string, { readonly words: string; readonly si: string }> {
  const named = new Map<string, { readonly words: string; readonly si: string }>();
  const add = (words: string, si: string, base: string): void => {
    const key = dimensionKey(fromBaseUnits(base));
    // The first name stands: `N` before `J/m`, `Pa` before `J/m3`.
    if (!named.has(key)) named.set(key, { words, si });
  };
  for (const [words, si, base] of dimensionNames) add(words, si, base);
  for (const [symbol, plural] of currencies) {
    for (const [words, si, base] of priceNames) add(`${words} in ${plural}`, `${symbol}${si}`, `${symbol} ${base}`);
  }
  return named;
}
