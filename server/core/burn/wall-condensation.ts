// What alkali vapour of a frozen gas does on a wall: chemistry has stopped in the gas, but a vapour that is above its
// saturation at the wall condenses on it, as itself. Knows no boundary layer: how much of the gas comes to the wall is not
// asked, so what condenses is told in the proportion of the gas.
// Invariant: atoms stay; a vapour condenses to a phase of its own composition only, and down to its saturation there.
// Practice: alkali chloride and hydroxide vapours that outlive the gas side condense on colder tubes and make deposits stick
// below what the solids alone would (common practice of biomass and recovery boilers).

import { mayBePresent } from '../equilibrium/work.ts';
import { standardPressurePa } from '../quantity/constants.ts';
import { alkaliMetals } from '../substance/elements.ts';
import { fillGibbs } from '../substance/property-set.ts';
import type { MatterState } from './burn.ts';
import { matterState } from './matter-state.ts';

export interface WallCondensation {
  /** The state with what is above its saturation condensed. */
  readonly state: MatterState;
  /** Indices of the gases that condense, the most by mol first. */
  readonly vapours: readonly number[];
}

/** Null where no alkali vapour is above its saturation at the state's own temperature. */
export function vapourOnWall(state: MatterState): WallCondensation | null {
  const { candidates, amountsMol, gasMol, temperatureK, pressurePa } = state;
  const { phases, gasCount } = candidates;
  if (!(gasMol > 0)) return null;
  const gibbs = new Float64Array(phases.length);
  fillGibbs(candidates.properties, temperatureK, gibbs);
  const moved = amountsMol.slice();
  const condensing: { readonly gas: number; readonly mol: number }[] = [];
  for (let gas = 0; gas < gasCount; gas += 1) {
    const mol = amountsMol[gas] ?? 0;
    const target = mol > 0 && holdsAlkali(state, gas) ? stablestOf(state, gas, gibbs) : null;
    if (!target) continue;
    const logPressure = Math.log(((mol / gasMol) * pressurePa) / standardPressurePa);
    const excess = (gibbs[gas] ?? 0) + logPressure - target.units * (gibbs[target.phase] ?? 0);
    if (!(excess > 0)) continue;
    const condensed = mol * -Math.expm1(-excess);
    if (condensed < leastShareOfGas * gasMol) continue;
    moved[gas] = mol - condensed;
    moved[target.phase] = (moved[target.phase] ?? 0) + target.units * condensed;
    condensing.push({ gas, mol: condensed });
  }
  if (condensing.length === 0) return null;
  return {
    state: matterState(candidates, moved, temperatureK, pressurePa),
    vapours: condensing.sort((a, b) => b.mol - a.mol).map(({ gas }) => gas),
  };
}

/** Less than a tenth of a part per million of the gas wets no wall. */
const leastShareOfGas = 1e-7;

function holdsAlkali({ candidates }: MatterState, phase: number): boolean {
  const composition = candidates.phases[phase]?.formula.composition;
  return composition !== undefined && alkaliMetals.some((metal) => composition.has(metal));
}

/** The condensed phase a vapour turns into: of its composition, or of so many units that make up its pairs. */
function stablestOf(
  { candidates, temperatureK }: MatterState,
  gas: number,
  gibbs: Float64Array,
): { readonly phase: number; readonly units: number } | null {
  let best: { readonly phase: number; readonly units: number } | null = null;
  for (let phase = candidates.gasCount; phase < candidates.phases.length; phase += 1) {
    const units = unitsOf(candidates.phases[gas]?.formula.composition, candidates.phases[phase]?.formula.composition);
    if (units === null || !mayBePresent(candidates, phase, temperatureK)) continue;
    if (best === null || units * (gibbs[phase] ?? Infinity) < best.units * (gibbs[best.phase] ?? Infinity))
      best = { phase, units };
  }
  return best;
}

type Composition = ReadonlyMap<string, number>;

function unitsOf(whole: Composition | undefined, unit: Composition | undefined): number | null {
  if (whole === undefined || unit === undefined || whole.size !== unit.size) return null;
  const ratios = [...whole].map(([symbol, atoms]) => atoms / (unit.get(symbol) ?? NaN));
  const [first = NaN] = ratios;
  return Number.isInteger(first) && ratios.every((ratio) => ratio === first) ? first : null;
}
