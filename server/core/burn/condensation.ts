// Where, between two equilibria of one cooling gas, condensed phases come and go: the temperature of each change to 0.01 K.
// Knows nothing of fuels; asks for a state at a temperature, and reads of it which condensed phases are there and how near
// the others are to forming. Invariant: an event lies between two solved states no further apart than the precision, the
// upper with the phases before and the lower with those after it.
// Method: an absent phase's affinity falls to nothing nearly on a line over 1/T, a present phase's amount over T; secants
// on these, kept inside the bracket, and bisection where they do not help.

import { fillGibbs } from '../substance/property-set.ts';
import type { Equilibrium } from '../equilibrium/equilibrium.ts';
import { mayBePresent } from '../equilibrium/work.ts';
import { eventPrecisionK } from './burn.ts';
import type { MatterState, NoState, PathEvent } from './burn.ts';

/** A state at a temperature in K, `near` being one to start from. */
export type StateAt = (temperatureK: number, near: Equilibrium) => Equilibrium | NoState;

/** A solved state with what the search reads of it again and again. */
export interface CooledPoint {
  readonly state: Equilibrium;
  /** Condensed phases that are there, in rising index. */
  readonly present: readonly number[];
  /** Of every condensed phase, from the first on: potentials of its atoms less its g/RT; 0 for one present, to rounding. */
  readonly affinities: Float64Array;
}

/**
 * Condensed phases of a state by rising index. Less than this of one is rounding: where two phases hold an element that
 * hardly counts (sodium carbonate beside salt and a surplus of lithium), which of them has the last 1e-26 mol is chance.
 */
export function condensedPhases({ candidates, amountsMol, massKg }: MatterState): readonly number[] {
  const present: number[] = [];
  for (let phase = candidates.gasCount; phase < amountsMol.length; phase += 1) {
    if ((amountsMol[phase] ?? 0) > negligibleMolPerKg * massKg) present.push(phase);
  }
  return present;
}

const negligibleMolPerKg = 1e-12;

/** Reads a state. */
export function cooledPoint(state: Equilibrium): CooledPoint {
  const { candidates, potentials, temperatureK } = state;
  const { phases, gasCount, elements, atoms } = candidates;
  const gibbs = new Float64Array(phases.length);
  fillGibbs(candidates.properties, temperatureK, gibbs);
  const affinities = new Float64Array(phases.length - gasCount);
  for (let phase = gasCount; phase < phases.length; phase += 1) {
    let affinity = -(gibbs[phase] ?? 0);
    elements.forEach((_, element) => {
      const count = atoms[phase * elements.length + element] ?? 0;
      if (count !== 0) affinity += count * (potentials[element] ?? 0);
    });
    // Past its real end a crystal may not form, however low its extrapolated energy.
    affinities[phase - gasCount] = mayBePresent(candidates, phase, temperatureK) ? affinity : -Infinity;
  }
  return { state, present: condensedPhases(state), affinities };
}

/** Events between two points, the upper first, in falling temperature; `complete` is false where a state could not be had. */
export function eventsBetween(
  upper: CooledPoint,
  lower: CooledPoint,
  above: CooledPoint | undefined,
  stateAt: StateAt,
): { readonly events: readonly PathEvent[]; readonly complete: boolean } {
  const events: PathEvent[] = [];
  let from = upper;
  let before = above;
  // Each round passes at least one change of phases, and there are never more phases to change than candidates.
  for (let round = 0; round <= 2 * upper.affinities.length; round += 1) {
    if (isSame(from.present, lower.present)) return { events, complete: true };
    const found = firstChange(from, lower, before, stateAt);
    if (found === undefined) return { events, complete: false };
    events.push(...eventsOfChange(found.upper, found.lower));
    from = found.lower;
    before = undefined;
  }
  return { events, complete: false };
}

/**
 * A point between two with the same phases at which another one has formed, where three points' affinities say that one
 * comes and goes again between two of them; undefined where none does. `beside` is a neighbour on either side.
 */
export function hiddenVisit(
  upper: CooledPoint,
  lower: CooledPoint,
  beside: CooledPoint,
  stateAt: StateAt,
): CooledPoint | undefined {
  const { gasCount } = upper.state.candidates;
  for (let index = 0; index < upper.affinities.length; index += 1) {
    const peak = peakBetween(upper, lower, beside, index);
    if (peak === undefined || upper.present.includes(gasCount + index)) continue;
    const state = stateAt(peak, upper.state);
    if (state.kind !== 'equilibrium') continue;
    const point = cooledPoint(state);
    if (!isSame(point.present, upper.present)) return point;
  }
  return undefined;
}

/** The point nearest above the first change below `upper`, and the one nearest below it. */
function firstChange(
  upper: CooledPoint,
  lower: CooledPoint,
  above: CooledPoint | undefined,
  stateAt: StateAt,
): { readonly upper: CooledPoint; readonly lower: CooledPoint } | undefined {
  let high = upper;
  let low = lower;
  let higher = above !== undefined && isSame(above.present, upper.present) ? above : undefined;
  let lower2: CooledPoint | undefined;
  let cameFromAbove = true;
  let width = Infinity;
  let slowSteps = 0;
  for (let step = 0; step < mostSteps; step += 1) {
    const gap = high.state.temperatureK - low.state.temperatureK;
    if (gap <= eventPrecisionK) return { upper: high, lower: low };
    // Secants shrink the bracket from one end at first and then all at once; where they go on gaining little, one bisection.
    slowSteps = gap > 0.5 * width ? slowSteps + 1 : 0;
    width = Math.min(width, gap);
    const isSlow = slowSteps > mostSlowSteps;
    if (isSlow) slowSteps = 0;
    const middle = low.state.temperatureK + gap / 2;
    const predicted = isSlow ? undefined : predictedK(high, higher, low, lower2);
    const target = predicted === undefined ? middle : predicted + (cameFromAbove ? -nudgeK : nudgeK);
    const inside = Math.min(
      Math.max(target, low.state.temperatureK + Math.min(nudgeK, gap / 4)),
      high.state.temperatureK - Math.min(nudgeK, gap / 4),
    );
    const state = stateAt(inside, high.state);
    if (state.kind !== 'equilibrium') return undefined;
    const point = cooledPoint(state);
    cameFromAbove = isSame(point.present, high.present);
    if (cameFromAbove) {
      higher = high;
      high = point;
    } else {
      lower2 = isSame(point.present, low.present) ? low : undefined;
      low = point;
    }
  }
  return undefined;
}

const mostSteps = 80;
const mostSlowSteps = 2;
/** Aimed so far to one side of the predicted change that two tries enclose it. */
const nudgeK = 0.4 * eventPrecisionK;

/** Where the nearer side's secant puts the change that comes first on cooling; undefined without two states on a side. */
function predictedK(
  high: CooledPoint,
  higher: CooledPoint | undefined,
  low: CooledPoint,
  lower: CooledPoint | undefined,
): number | undefined {
  const fromAbove = higher && secantK(high, higher, low.present, high.present, Math.max);
  const fromBelow = lower && secantK(low, lower, high.present, low.present, Math.min);
  const isInside = (temperatureK: number | undefined): temperatureK is number =>
    temperatureK !== undefined &&
    temperatureK > low.state.temperatureK - nudgeK &&
    temperatureK < high.state.temperatureK + nudgeK;
  if (!isInside(fromAbove)) return isInside(fromBelow) ? fromBelow : undefined;
  if (!isInside(fromBelow)) return fromAbove;
  return high.state.temperatureK - fromAbove < fromBelow - low.state.temperatureK ? fromAbove : fromBelow;
}

/** The change of `here`'s phases (`own`) into `others` that its two states point at; `choose` takes the one met first. */
function secantK(
  here: CooledPoint,
  further: CooledPoint,
  others: readonly number[],
  own: readonly number[],
  choose: (...values: number[]) => number,
): number | undefined {
  const { gasCount } = here.state.candidates;
  const near = here.state.temperatureK;
  const far = further.state.temperatureK;
  let chosen: number | undefined;
  const consider = (temperatureK: number): void => {
    if (Number.isFinite(temperatureK)) chosen = chosen === undefined ? temperatureK : choose(chosen, temperatureK);
  };
  for (const phase of others) {
    if (own.includes(phase)) continue;
    const a = here.affinities[phase - gasCount] ?? 0;
    const b = further.affinities[phase - gasCount] ?? 0;
    consider(1 / (1 / near - (a * (1 / near - 1 / far)) / (a - b)));
  }
  for (const phase of own) {
    if (others.includes(phase)) continue;
    const a = here.state.amountsMol[phase] ?? 0;
    const b = further.state.amountsMol[phase] ?? 0;
    // An amount that grows towards the change ends by a jump, as in melting, and points nowhere.
    if (b > a) consider(near - (a * (near - far)) / (a - b));
  }
  return chosen;
}

/** The top of the parabola of an affinity through three points, where it is positive and strictly between the first two. */
function peakBetween(upper: CooledPoint, lower: CooledPoint, beside: CooledPoint, index: number): number | undefined {
  const [x1, x2, x3] = [upper, lower, beside].map(({ state }) => state.temperatureK) as [number, number, number];
  const [y1, y2, y3] = [upper, lower, beside].map(({ affinities }) => affinities[index] ?? -Infinity) as [
    number,
    number,
    number,
  ];
  if (!(Math.min(y1, y2, y3) > -Infinity)) return undefined;
  const slope = (y2 - y1) / (x2 - x1);
  const curvature = ((y3 - y2) / (x3 - x2) - slope) / (x3 - x1);
  if (!(curvature < 0)) return undefined;
  const peak = (x1 + x2) / 2 - slope / (2 * curvature);
  const height = y1 + slope * (peak - x1) + curvature * (peak - x1) * (peak - x2);
  return peak < x1 && peak > x2 && height > 0 ? peak : undefined;
}

/** What changes between two points a hair apart. */
function eventsOfChange(upper: CooledPoint, lower: CooledPoint): readonly PathEvent[] {
  const temperatureK = (upper.state.temperatureK + lower.state.temperatureK) / 2;
  const leaving = upper.present.filter((phase) => !lower.present.includes(phase));
  const appearing = lower.present.filter((phase) => !upper.present.includes(phase));
  return [
    ...leaving.map((phase): PathEvent => ({ kind: 'leaves', phase, temperatureK, with: appearing })),
    ...appearing.map((phase): PathEvent => ({ kind: 'appears', phase, temperatureK, with: leaving })),
  ];
}

function isSame(a: readonly number[], b: readonly number[]): boolean {
  return a.length === b.length && a.every((phase, index) => phase === b[index]);
}
