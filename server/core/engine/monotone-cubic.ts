// A curve through points that neither overshoots nor swings between them: a cubic Hermite interpolant whose slopes keep it
// monotone wherever the points are. Knows nothing of engines and never extrapolates.
// Invariants: it goes through every point; between two points it stays between their values.
// Source: F. N. Fritsch, R. E. Carlson, "Monotone piecewise cubic interpolation", SIAM J. Numer. Anal. 17 (1980) 238–246,
// with the end slopes and the weighted harmonic mean of F. N. Fritsch, J. Butland, SIAM J. Sci. Stat. Comput. 5 (1984) 300.

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** The curve through points of rising, different x; null outside them, or without points. One point is its own curve. */
export function monotoneCubic(points: readonly Point[]): (x: number) => number | null {
  const slopes = slopesAt(points);
  return (x) => {
    const [first] = points;
    const last = points.at(-1);
    if (!first || !last || !(x >= first.x && x <= last.x)) return null;
    let low = 0;
    let high = points.length - 1;
    while (high - low > 1) {
      const middle = (low + high) >> 1;
      if ((points[middle]?.x ?? 0) <= x) low = middle;
      else high = middle;
    }
    const [left = first, right = last] = [points[low], points[high]];
    const width = right.x - left.x;
    if (width === 0) return left.y;
    const t = (x - left.x) / width;
    const [leftSlope = 0, rightSlope = 0] = [slopes[low], slopes[high]];
    const [square, cube] = [t * t, t * t * t];
    return (
      (2 * cube - 3 * square + 1) * left.y +
      (cube - 2 * square + t) * width * leftSlope +
      (-2 * cube + 3 * square) * right.y +
      (cube - square) * width * rightSlope
    );
  };
}

function slopesAt(points: readonly Point[]): readonly number[] {
  const widths = points.slice(1).map(({ x }, index) => x - (points[index]?.x ?? x));
  const secants = points.slice(1).map(({ y }, index) => (y - (points[index]?.y ?? y)) / (widths[index] ?? 1));
  const [only = 0] = secants;
  if (points.length < 3) return points.map(() => only);
  return points.map((_, index) => {
    if (index === 0) return endSlope(widths[0], widths[1], secants[0], secants[1]);
    if (index === points.length - 1) {
      return endSlope(widths.at(-1), widths.at(-2), secants.at(-1), secants.at(-2));
    }
    const [before = 0, after = 0] = [secants[index - 1], secants[index]];
    if (before * after <= 0) return 0;
    const [left = 1, right = 1] = [widths[index - 1], widths[index]];
    const [weightBefore, weightAfter] = [2 * right + left, right + 2 * left];
    return (weightBefore + weightAfter) / (weightBefore / before + weightAfter / after);
  });
}

/** Three-point slope at an end, limited so that the end piece stays monotone. */
function endSlope(own = 1, next = 1, ownSecant = 0, nextSecant = 0): number {
  const slope = ((2 * own + next) * ownSecant - own * nextSecant) / (own + next);
  if (slope * ownSecant <= 0) return 0;
  return ownSecant * nextSecant <= 0 && Math.abs(slope) > 3 * Math.abs(ownSecant) ? 3 * ownSecant : slope;
}
