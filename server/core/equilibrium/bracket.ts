// A root of a function that only rises, or the jump that stands in its place, between two bounds.
// Knows nothing of what rises. Invariant: the root stays between `low` and `high`, which only come closer; at the end either
// the value is as near as asked or no number lies between the bounds, and then the function jumps there.
// Method: false position with the Illinois change, halving whenever that does not shrink the bounds well.

export interface Bracket<State> {
  readonly low: State;
  readonly high: State;
  readonly lowValue: number;
  readonly highValue: number;
}

/** The state at the root (`kind: 'root'`), or the two states on either side of a jump. */
export type BracketEnd<State> =
  | { readonly kind: 'root'; readonly state: State }
  | ({ readonly kind: 'jump' } & Bracket<State>)
  | { readonly kind: 'failed' };

/**
 * Narrows a bracket with lowValue < 0 < highValue at `lowAt` < `highAt`. `stateAt` gives the state at a place, `valueOf` its
 * value less the one sought; undefined ends the search as failed.
 */
export function narrow<State>(
  bracket: Bracket<State>,
  bounds: readonly [lowAt: number, highAt: number],
  stateAt: (place: number) => State | undefined,
  valueOf: (state: State) => number,
  nearEnough: number,
): BracketEnd<State> {
  let { low, high, lowValue, highValue } = bracket;
  let [lowAt, highAt] = bounds;
  let lowWeight = 1;
  let highWeight = 1;
  for (let count = 0; count < mostCalls; count += 1) {
    const middle = lowAt + (highAt - lowAt) / 2;
    if (!(middle > lowAt && middle < highAt)) break;
    const from = lowValue * lowWeight;
    const to = highValue * highWeight;
    const chord = lowAt - (from * (highAt - lowAt)) / (to - from);
    const place = count % 3 === 2 || !(chord > lowAt && chord < highAt) ? middle : chord;
    const state = stateAt(place);
    if (state === undefined) return { kind: 'failed' };
    const value = valueOf(state);
    if (Math.abs(value) <= nearEnough) return { kind: 'root', state };
    if (value < 0) {
      low = state;
      lowValue = value;
      lowAt = place;
      lowWeight = 1;
      highWeight *= 0.5;
    } else {
      high = state;
      highValue = value;
      highAt = place;
      highWeight = 1;
      lowWeight *= 0.5;
    }
  }
  return { kind: 'jump', low, high, lowValue, highValue };
}

const mostCalls = 400;
