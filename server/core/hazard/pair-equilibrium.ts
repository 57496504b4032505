// Two portions as a state of lowest energy: the heat they give off together beyond what each gives by falling apart alone,
// and the temperature they would reach. This is how a pair is judged that no written reaction describes.
// Knows no rule and no rate: that carbon and hydrogen are more stable as methane says nothing of what happens in a tank.
// Invariant: a portion beside more of itself gives nothing. At 1 bar; the enthalpies of the portions are those at 25 °C.

import { candidateSet } from '../equilibrium/candidates.ts';
import { equilibriumSolver } from '../equilibrium/solver.ts';
import { elementOfSymbol } from '../substance/elements.ts';
import { referenceTemperatureK } from '../substance/substance.ts';
import type { StoredPortion } from './store.ts';

export interface PairEquilibrium {
  /** Per kg of the two together, J: given off at 25 °C, what each would give off alone taken out. */
  readonly heatJPerKg: number;
  /** Never above 0 but for rounding: J per kg of the two, against each at rest by itself. */
  readonly gibbsJPerKg: number;
  /** The state of lowest energy that holds all the heat; null where it lies beyond the tables. */
  readonly adiabaticK: number | null;
  /** mol of gas per kg of the two at that temperature. */
  readonly gasMolPerKg: number;
}

type Pair = readonly [StoredPortion, StoredPortion];

/** The two in the proportion of their mass shares; undefined where an enthalpy or the phases of an element are missing. */
export function pairEquilibrium(first: StoredPortion, second: StoredPortion): PairEquilibrium | undefined {
  const key = [first, second].map(({ name, massShare }) => `${name} ${massShare.toPrecision(12)}`).join(' ');
  const known = kept.get(key);
  if (known !== undefined || kept.has(key)) return known;
  const answer = solvePair([first, second]);
  if (kept.size >= mostKept) kept.clear();
  kept.set(key, answer);
  return answer;
}

const mostKept = 200;
const kept = new Map<string, PairEquilibrium | undefined>();

function solvePair(pair: Pair): PairEquilibrium | undefined {
  const total = pair[0].massShare + pair[1].massShare;
  const shares = pair.map(({ massShare }) => massShare / total);
  let enthalpyJ = 0;
  for (const [index, { formationEnthalpyJPerKg }] of pair.entries()) {
    if (formationEnthalpyJPerKg === null) return undefined;
    enthalpyJ += formationEnthalpyJPerKg * (shares[index] ?? 0);
  }
  const elements = [...new Set(pair.flatMap(({ molPerKg }) => [...molPerKg.keys()]))].sort(
    (a, b) => (elementOfSymbol(a)?.number ?? 0) - (elementOfSymbol(b)?.number ?? 0),
  );
  const solver = equilibriumSolver(candidateSet(elements));
  const amounts = (weights: readonly number[]): Float64Array =>
    Float64Array.from(elements, (symbol) =>
      pair.reduce((sum, { molPerKg }, index) => sum + (weights[index] ?? 0) * (molPerKg.get(symbol) ?? 0), 0),
    );
  const atRest = (weights: readonly number[]) =>
    solver.solve(amounts(weights), { held: 'temperature-pressure', temperatureK: referenceTemperatureK, pressurePa });
  const together = atRest(shares);
  const apart = [atRest([shares[0] ?? 0, 0]), atRest([0, shares[1] ?? 0])];
  if (together.kind === 'none') return undefined;
  let alone = { enthalpyJ: 0, gibbsJ: 0 };
  for (const state of apart) {
    if (state.kind === 'none') return undefined;
    alone = { enthalpyJ: alone.enthalpyJ + state.enthalpyJ, gibbsJ: alone.gibbsJ + state.gibbsEnergyJ };
  }
  const hot = solver.solve(amounts(shares), { held: 'enthalpy-pressure', enthalpyJ, pressurePa });
  return {
    heatJPerKg: alone.enthalpyJ - together.enthalpyJ,
    gibbsJPerKg: together.gibbsEnergyJ - alone.gibbsJ,
    adiabaticK: hot.kind === 'none' ? null : hot.temperatureK,
    gasMolPerKg: hot.kind === 'none' ? together.gasMol : hot.gasMol,
  };
}

const pressurePa = 1e5;
