// How uncertain a number is, and because of which inputs: per independent input its signed contribution (sensitivity
// times the input's standard uncertainty). Numbers that share an input are thereby correlated exactly as they should be,
// so that x - x is certain. It knows no dimensions and no kinds. Invariant: a contribution of zero is not kept.
// Source: JCGM 100:2008 (GUM), section 5.1.2 (independent inputs) and 5.1.3; contributions are its c_i u(x_i).

/** By independent input, c·u(x) with its sign, in the unit of the number it belongs to. */
export type Parts = ReadonlyMap<string, number>;

/** The parts of a number that is certain. */
export const noParts: Parts = new Map();

/** The combined standard uncertainty: the root of the sum of squares of independent contributions. */
export function standardUncertaintyOf(parts: Parts): number {
  if (parts.size === 0) return 0;
  return Math.hypot(...parts.values());
}

/** The parts of a number whose slopes against two others are given. */
export function combineParts(left: Parts, leftSlope: number, right: Parts, rightSlope: number): Parts {
  if (left.size === 0 && right.size === 0) return noParts;
  const sum = new Map<string, number>();
  for (const [input, part] of left) addPart(sum, input, part * leftSlope);
  for (const [input, part] of right) addPart(sum, input, part * rightSlope);
  return sum;
}

function addPart(sum: Map<string, number>, input: string, part: number): void {
  const total = (sum.get(input) ?? 0) + part;
  if (total === 0) sum.delete(input);
  else sum.set(input, total);
}
