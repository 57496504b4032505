// Where a function that only rises reaches zero, or the jump that stands in that place, between two bounds.
// Knows nothing of what rises. Invariant: zero stays between the states on either side, which only come closer; at the end
// either a value is as near as asked, or no number lies between the two places and the function jumps there.
// Method: Newton's step where the state knows its slope, false position where it does not, halving whenever neither shrinks the
// bounds well.

export interface Rising<State> {
  /** The state at a place, found from a neighbouring one where that helps; undefined ends the search as failed. */
  readonly stateAt: (place: number, near: State | undefined) => State | undefined;
  /** Its value: below zero left of the place that is sought. */
  readonly valueOf: (state: State) => number;
  /** Its slope by place, where it is known and finite. */
  readonly slopeOf: (state: State) => number | null;
  readonly nearEnough: number;
  /** The state at zero out of the states on either side of it, where one can be had from them: tried as they come closer. */
  readonly between?: (low: State, high: State) => State | undefined;
}

/** A state at zero, the two states on either side of a jump, or the bound beyond which zero lies. */
export type RisingEnd<State> =
  | { readonly kind: 'root'; readonly state: State }
  | {
      readonly kind: 'jump';
      readonly low: State;
      readonly high: State;
      readonly lowValue: number;
      readonly highValue: number;
    }
  | { readonly kind: 'below' | 'above' | 'failed' };

interface Side<State> {
  place: number;
  state: State | undefined;
  value: number;
}

/** Searches from `start` between the bounds. */
export function findZero<State>(
  rising: Rising<State>,
  bounds: readonly [lowAt: number, highAt: number],
  start: number,
): RisingEnd<State> {
  const low: Side<State> = { place: bounds[0], state: undefined, value: -Infinity };
  const high: Side<State> = { place: bounds[1], state: undefined, value: Infinity };
  let place = Math.min(Math.max(start, bounds[0]), bounds[1]);
  let near: State | undefined;
  let slow = 0;
  let lastSize = Infinity;
  let closeness = firstCloseness;
  for (let count = 0; count < mostCalls; count += 1) {
    const state = rising.stateAt(place, near);
    if (state === undefined) return { kind: 'failed' };
    const value = rising.valueOf(state);
    if (Math.abs(value) <= rising.nearEnough) return { kind: 'root', state };
    if (place === bounds[0] && value > 0) return { kind: 'below' };
    if (place === bounds[1] && value < 0) return { kind: 'above' };
    const side = value < 0 ? low : high;
    side.place = place;
    side.state = state;
    side.value = value;
    near = state;
    if (
      low.state !== undefined &&
      high.state !== undefined &&
      high.place - low.place < closeness * Math.abs(high.place)
    ) {
      closeness *= closer;
      const found = rising.between?.(low.state, high.state);
      if (found !== undefined) return { kind: 'root', state: found };
    }
    slow = Math.abs(value) > 0.5 * lastSize ? slow + 1 : 0;
    lastSize = Math.abs(value);
    const next = nextPlace(rising, low, high, side, count);
    const nowWide = high.place - low.place;
    const middle = low.place + nowWide / 2;
    const isClosed = !(middle > low.place && middle < high.place);
    if (isClosed && low.state !== undefined && high.state !== undefined) {
      return { kind: 'jump', low: low.state, high: high.state, lowValue: low.value, highValue: high.value };
    }
    // A slope that leads nowhere: halve, or look at the bound that has not been looked at.
    const isSlow = slow >= 2;
    if (isSlow) slow = 0;
    const wide = side === low ? high : low;
    const away = count > 12 && wide.state === undefined ? wide.place : middle;
    place = isSlow ? away : next;
  }
  return { kind: 'failed' };
}

function nextPlace<State>(
  rising: Rising<State>,
  low: Side<State>,
  high: Side<State>,
  last: Side<State>,
  count: number,
): number {
  const middle = low.place + (high.place - low.place) / 2;
  const slope = last.state === undefined ? null : rising.slopeOf(last.state);
  if (slope !== null && slope > 0) {
    const step = last.place - last.value / slope;
    if (step > low.place && step < high.place) return step;
    // Out of the bounds: look at a bound that has not been looked at, else halve.
    if (step >= high.place && high.state === undefined) return count < 4 ? middle : high.place;
    if (step <= low.place && low.state === undefined) return count < 4 ? middle : low.place;
    return middle;
  }
  if (low.state === undefined) return count < 8 ? middle : low.place;
  if (high.state === undefined) return count < 8 ? middle : high.place;
  const chord = low.place - (low.value * (high.place - low.place)) / (high.value - low.value);
  return count % 2 === 0 && chord > low.place && chord < high.place ? chord : middle;
}

const mostCalls = 400;
/** Of the place: sides this close are asked for what lies between them, and again at each further step. */
const firstCloseness = 0.03;
const closer = 0.01;
