// Numbers into text, and the only place that rounds. Four significant digits and never fixed decimals; a value with an
// uncertainty shows the uncertainty to two digits and stops at the same place. Knows no units and no dimensions.
// A number that is exactly shorter is shown shorter (`0.3`, `25`), so `106.0` says "rounded" and `106` says "just that".
// Invariant: the text read back is within half a unit of its last shown digit of the value. Source of the form of
// `value ± uncertainty`: JCGM 100:2008 (GUM), 7.2.6.

/** `people` writes `−1.205 × 10⁻⁷`; `plain` writes `-1.205e-7`, for places that take ASCII only. */
export type NumberStyle = 'people' | 'plain';

export const SIGNIFICANT_DIGITS = 4;
const UNCERTAINTY_DIGITS = 2;
/** Plain decimals from here (included) … */
const SMALLEST_DECIMAL = 1e-4;
/** … to here (excluded); powers of ten outside. */
const LARGEST_DECIMAL = 1e7;
/** An uncertainty this small beside its value is the rounding of the arithmetic, not knowledge. */
const NEGLIGIBLE = 1e-12;

/** The number to `digits` significant digits. `value` must be finite; anything else is shown as `–`. */
export function formatNumber(value: number, style: NumberStyle = 'people', digits = SIGNIFICANT_DIGITS): string {
  if (!Number.isFinite(value)) return '–';
  const rounded = Number(value.toPrecision(digits));
  if (rounded === 0) return '0';
  const exact = Number(value.toPrecision(12)) === rounded;
  const exponent = exponentOf(rounded);
  if (isDecimal(rounded)) {
    // `1.2e5.toFixed(0)` and not `toPrecision`, which would fall into powers of ten by itself.
    const places = Math.max(0, digits - 1 - exponent);
    return signed(trimmed(rounded.toFixed(places), exact), style);
  }
  // From the text, because dividing by a power of ten is not exact.
  const mantissa = rounded.toExponential(digits - 1).replace(/e.*$/, '');
  return withPower(signed(trimmed(mantissa, exact), style), exponent, style);
}

/**
 * `44.00 ± 0.20`: the uncertainty to two digits, the value to the same place. With a null, zero or negligible
 * uncertainty, the plain number.
 */
export function formatWithUncertainty(
  value: number,
  uncertainty: number | null,
  style: NumberStyle = 'people',
): string {
  if (uncertainty === null || !Number.isFinite(uncertainty) || uncertainty <= Math.abs(value) * NEGLIGIBLE) {
    return formatNumber(value, style);
  }
  const mark = style === 'people' ? ' ± ' : ' +/- ';
  const roundedUncertainty = Number(uncertainty.toPrecision(UNCERTAINTY_DIGITS));
  const lastPlace = exponentOf(roundedUncertainty) - (UNCERTAINTY_DIGITS - 1);
  const leading = Math.max(Math.abs(value), roundedUncertainty);
  if (leading >= SMALLEST_DECIMAL && leading < LARGEST_DECIMAL && lastPlace > -10) {
    return signed(toPlace(value, lastPlace), style) + mark + toPlace(roundedUncertainty, lastPlace);
  }
  const exponent = exponentOf(leading);
  const scale = 10 ** exponent;
  const mantissas =
    signed(toPlace(value / scale, lastPlace - exponent), style) +
    mark +
    toPlace(roundedUncertainty / scale, lastPlace - exponent);
  return withPower(`(${mantissas})`, exponent, style);
}

/**
 * The uncertainty where it says anything of a number of four digits: below half a unit of the fourth it does not, and digits
 * that only the inputs have, and no model, would be told. Otherwise null.
 */
export function tellingUncertainty(value: number, uncertainty: number | null): number | null {
  if (uncertainty === null || value === 0 || !Number.isFinite(value)) return uncertainty;
  const fourthDigit = 10 ** (exponentOf(value) - (SIGNIFICANT_DIGITS - 1));
  return uncertainty < fourthDigit / 2 ? null : uncertainty;
}

/** A fraction as percent: `30 %`, `0.012 %`. */
export function formatPercent(fraction: number, style: NumberStyle = 'people'): string {
  return `${formatNumber(fraction * 100, style)} %`;
}

/** A whole number as it is: `12`, `−3`; for powers, counts and coefficients. */
export function formatCount(count: number, style: NumberStyle = 'people'): string {
  return signed(String(Math.round(count)), style);
}

/** Digits as superscripts: `-7` gives `⁻⁷`. */
export function superscript(text: string): string {
  return Array.from(text, (character) => SUPERSCRIPTS[character] ?? character).join('');
}

const SUPERSCRIPTS: Readonly<Record<string, string>> = {
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
  '-': '⁻',
  '−': '⁻',
};

/** The power of ten of the leading digit. By text, because `Math.log10(1000)` may be 2.9999999999999996. */
function exponentOf(value: number): number {
  const text = value.toExponential();
  return Number(text.slice(text.indexOf('e') + 1));
}

function isDecimal(value: number): boolean {
  const size = Math.abs(value);
  return size >= SMALLEST_DECIMAL && size < LARGEST_DECIMAL;
}

/** The value rounded to the place 10^lastPlace, with exactly the decimals of that place. */
function toPlace(value: number, lastPlace: number): string {
  if (lastPlace <= 0) return value.toFixed(-lastPlace);
  const step = 10 ** lastPlace;
  return (Math.round(value / step) * step).toFixed(0);
}

/** Trailing zeros say "rounded here"; an exact number goes without them. */
function trimmed(text: string, exact: boolean): string {
  return exact && text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}

function signed(text: string, style: NumberStyle): string {
  const isZero = !/[1-9]/.test(text);
  const bare = text.replace(/^-/, '');
  if (!text.startsWith('-') || isZero) return bare;
  return (style === 'people' ? '−' : '-') + bare;
}

function withPower(mantissa: string, exponent: number, style: NumberStyle): string {
  if (style === 'plain') return `${mantissa}e${exponent}`;
  return `${mantissa} × 10${superscript(String(exponent))}`;
}
