// The state of the carbonate system from any two of its variables. Where a species and pH are known the rest is a quotient;
// two species, or a species and the dissolved carbon, are a quadratic; where alkalinity is one of them, hydrogen is sought
// between pH -1 and 15 by Newton's steps in ln [H+] inside a closing bracket.
// It knows no units but mol/kg and no names of entries. Invariant: a state that is given back has both variables as they were
// given, to rounding; no state, or a second one, is said and never guessed over.
// Sources: alkalinity falls with [H+] at a fixed dissolved carbon, CO2 or HCO3-, so that there one state at most; at a fixed
// CO3-- it falls and then rises, and there are none, one or two (Munhoven 2021, Geosci. Model Dev. 14, 4225); so it is, by the
// quadratic, for HCO3- at a fixed dissolved carbon. Of two, the one nearer to sea water as it is met is taken.

import { findZero, type Rising } from '../../equilibrium/bracket.ts';
import { carbonateState, type CarbonateState } from './carbonate-state.ts';
import { carbonShares, otherSpecies, type SeaMedium } from './speciation.ts';

/** What may be known. Fugacity, partial pressure and the dissolved gas say the same; so do carbonate and a saturation. */
export type CarbonateVariable =
  'total-alkalinity' | 'dissolved-carbon' | 'hydrogen' | 'carbon-dioxide' | 'hydrogen-carbonate' | 'carbonate';

/** A known variable, mol/kg; hydrogen ions on the total scale. */
export interface Known {
  readonly variable: CarbonateVariable;
  readonly molPerKg: number;
}

/** A state, with the other that fits as well where there is one; or why there is none. */
export type PairSolution =
  | { readonly kind: 'solved'; readonly state: CarbonateState; readonly other: CarbonateState | null }
  /** No sea water has both. */
  | { readonly kind: 'none' }
  /** Both say the same thing, so that one variable is still free. */
  | { readonly kind: 'same' };

/** The state of a medium in which both are known. */
export function solvePair(medium: SeaMedium, first: Known, second: Known): PairSolution {
  if (first.variable === second.variable) return { kind: 'same' };
  const values = new Map([first, second].map(({ variable, molPerKg }) => [variable, molPerKg]));
  const isSound = [...values].every(
    ([variable, value]) => Number.isFinite(value) && (value > 0 || variable === signed),
  );
  if (!isSound) return { kind: 'none' };
  const hydrogen = values.get('hydrogen');
  const alkalinity = values.get('total-alkalinity');
  const carbon = carbonOf(values);
  if (hydrogen !== undefined) return fromHydrogen(medium, hydrogen, alkalinity, carbon);
  if (alkalinity !== undefined) return carbon ? fromAlkalinity(medium, alkalinity, carbon) : { kind: 'none' };
  return fromSpecies(medium, values);
}

/** An acidified water has less than none. */
const signed: CarbonateVariable = 'total-alkalinity';

type CarbonVariable = Exclude<CarbonateVariable, 'total-alkalinity' | 'hydrogen'>;

interface KnownCarbon {
  readonly variable: CarbonVariable;
  readonly molPerKg: number;
}

const carbonVariables: readonly CarbonVariable[] = [
  'dissolved-carbon',
  'carbon-dioxide',
  'hydrogen-carbonate',
  'carbonate',
];

function carbonOf(values: ReadonlyMap<CarbonateVariable, number>): KnownCarbon | undefined {
  for (const variable of carbonVariables) {
    const molPerKg = values.get(variable);
    if (molPerKg !== undefined) return { variable, molPerKg };
  }
  return undefined;
}

function fromHydrogen(
  medium: SeaMedium,
  hydrogen: number,
  alkalinity: number | undefined,
  carbon: KnownCarbon | undefined,
): PairSolution {
  if (carbon) return solved(carbonateState(medium, hydrogen, dissolvedCarbon(medium, hydrogen, carbon)));
  if (alkalinity === undefined) return { kind: 'none' };
  const rest = alkalinity - otherSpecies(medium, hydrogen).alkalinity;
  const dissolved = rest / carbonShares(medium.constants, hydrogen).charge;
  return dissolved > 0 ? solved(carbonateState(medium, hydrogen, dissolved)) : { kind: 'none' };
}

/** The dissolved carbon of which a share is known. */
function dissolvedCarbon({ constants }: SeaMedium, hydrogen: number, { variable, molPerKg }: KnownCarbon): number {
  const shares = carbonShares(constants, hydrogen);
  switch (variable) {
    case 'dissolved-carbon':
      return molPerKg;
    case 'carbon-dioxide':
      return molPerKg / shares.dioxide;
    case 'hydrogen-carbonate':
      return molPerKg / shares.hydrogenCarbonate;
    case 'carbonate':
      return molPerKg / shares.carbonate;
  }
}

/** Two of the species and their sum: quadratics in [H+]. */
function fromSpecies(medium: SeaMedium, values: ReadonlyMap<CarbonateVariable, number>): PairSolution {
  const { carbonic1, carbonic2 } = medium.constants;
  const product = carbonic1 * carbonic2;
  const total = values.get('dissolved-carbon');
  const dioxide = values.get('carbon-dioxide');
  const middle = values.get('hydrogen-carbonate');
  const carbonate = values.get('carbonate');
  const stateOf = (hydrogen: number, carbon: KnownCarbon): CarbonateState =>
    carbonateState(medium, hydrogen, dissolvedCarbon(medium, hydrogen, carbon));
  if (total === undefined) {
    if (dioxide !== undefined && middle !== undefined) {
      return solved(stateOf((carbonic1 * dioxide) / middle, { variable: 'hydrogen-carbonate', molPerKg: middle }));
    }
    if (middle !== undefined && carbonate !== undefined) {
      return solved(stateOf((carbonic2 * middle) / carbonate, { variable: 'hydrogen-carbonate', molPerKg: middle }));
    }
    if (dioxide === undefined || carbonate === undefined) return { kind: 'none' };
    return solved(stateOf(Math.sqrt((product * dioxide) / carbonate), { variable: 'carbonate', molPerKg: carbonate }));
  }
  const carbon: KnownCarbon = { variable: 'dissolved-carbon', molPerKg: total };
  if (middle !== undefined) {
    const share = middle / total;
    const half = (carbonic1 * (1 - share)) / (2 * share);
    const root = half ** 2 - product;
    if (!(root >= 0)) return { kind: 'none' };
    const acid = half + Math.sqrt(root);
    const both = [product / acid, acid].map((hydrogen) => stateOf(hydrogen, carbon));
    return root === 0 ? solved(both[0]) : solved(both[0], both[1]);
  }
  const known = dioxide ?? carbonate ?? NaN;
  const share = known / total;
  if (!(share < 1)) return { kind: 'none' };
  // CO2: (1-a) h² - a K1 h - a K1 K2 = 0; CO3--: a h² + a K1 h - (1-a) K1 K2 = 0. Each has one positive root.
  const hydrogen =
    dioxide !== undefined
      ? positiveRoot(1 - share, -share * carbonic1, -share * product)
      : positiveRoot(share, share * carbonic1, -(1 - share) * product);
  return solved(stateOf(hydrogen, carbon));
}

/** The positive root of a x² + b x + c with a > 0 > c, without cancellation. */
function positiveRoot(a: number, b: number, c: number): number {
  const root = Math.sqrt(b ** 2 - 4 * a * c);
  return b > 0 ? (-2 * c) / (b + root) : (-b + root) / (2 * a);
}

const lowestLn = -15 * Math.LN10;
const highestLn = Math.LN10;
const usualLn = -8 * Math.LN10;

interface Trial {
  readonly lnHydrogen: number;
  /** Alkalinity left over, and its slope by ln [H+]. */
  readonly excess: number;
  readonly slope: number;
}

function fromAlkalinity(medium: SeaMedium, alkalinity: number, carbon: KnownCarbon): PairSolution {
  const trialAt = (lnHydrogen: number): Trial => {
    const hydrogen = Math.exp(lnHydrogen);
    const shares = carbonShares(medium.constants, hydrogen);
    const others = otherSpecies(medium, hydrogen);
    const dissolved = dissolvedCarbon(medium, hydrogen, carbon);
    const own = dissolved * shares.charge;
    // d ln(dissolved)/d ln h where one species is held: the protons it has less than the mean.
    const growth = protonsAway[carbon.variable] - shares.charge;
    const slope = carbon.variable === 'dissolved-carbon' ? 0 : own * growth;
    return {
      lnHydrogen,
      excess: own + others.alkalinity - alkalinity,
      slope: slope - dissolved * shares.spread + others.slope,
    };
  };
  const stateAt = (lnHydrogen: number): CarbonateState => {
    const hydrogen = Math.exp(lnHydrogen);
    return carbonateState(medium, hydrogen, dissolvedCarbon(medium, hydrogen, carbon));
  };
  const falling = (bounds: readonly [number, number]): number | null =>
    zeroOf(
      trialAt,
      (trial) => -trial.excess,
      bounds,
      (trial) => -trial.slope,
    );
  if (carbon.variable !== 'carbonate') {
    const found = falling([lowestLn, highestLn]);
    return found === null ? { kind: 'none' } : solved(stateAt(found));
  }
  // Falls and then rises: one state on either side of the least alkalinity there can be.
  const least = zeroOf(trialAt, (trial) => trial.slope, [lowestLn, highestLn]) ?? highestLn;
  if (trialAt(least).excess > 0) return { kind: 'none' };
  const basic = falling([lowestLn, least]);
  const acid = zeroOf(
    trialAt,
    (trial) => trial.excess,
    [least, highestLn],
    (trial) => trial.slope,
  );
  const [taken, other] = acid === null ? [basic, null] : [acid, basic];
  if (taken === null) return { kind: 'none' };
  return solved(stateAt(taken), other === null || other === taken ? undefined : stateAt(other));
}

/** Protons a species has given away. */
const protonsAway: Readonly<Record<CarbonVariable, number>> = {
  'dissolved-carbon': NaN,
  'carbon-dioxide': 0,
  'hydrogen-carbonate': 1,
  carbonate: 2,
};

/** Where a value that rises with ln [H+] is zero within the bounds; null where it is not. */
function zeroOf(
  trialAt: (lnHydrogen: number) => Trial,
  valueOf: (trial: Trial) => number,
  bounds: readonly [low: number, high: number],
  slopeOf: (trial: Trial) => number | null = () => null,
): number | null {
  const rising: Rising<Trial> = { stateAt: trialAt, valueOf, slopeOf, nearEnough: alkalinityNearEnough };
  const end = findZero(rising, bounds, usualLn);
  if (end.kind === 'root') return end.state.lnHydrogen;
  if (end.kind !== 'jump') return null;
  return (Math.abs(end.lowValue) <= Math.abs(end.highValue) ? end.low : end.high).lnHydrogen;
}

/** mol/kg: some hundred times the rounding of the sum, so that slopes may be taken by small steps. */
const alkalinityNearEnough = 1e-16;

function solved(state: CarbonateState | undefined, other?: CarbonateState): PairSolution {
  return state ? { kind: 'solved', state, other: other ?? null } : { kind: 'none' };
}
