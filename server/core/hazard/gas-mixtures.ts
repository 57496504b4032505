// A blend that is gas: whether it burns as it is, and whether it could burn once it meets air, however much of it.
// Knows no vapour over a liquid (vapour.ts). Invariant: pure fuel is flammable in air, pure inert gas is not.
// Method: Le Chatelier's rule for both limits; a mixture with little fuel is flammable in air if, thinned with air to its
// lower limit, there is still the limiting oxygen, which is the geometry behind ISO 10156's greatest harmless share of a
// fuel in nitrogen. Carbon dioxide counts as one and a half, helium 0.9 and argon 0.55 of nitrogen (ISO 10156, from memory).

import { limitingOxygenOf, lowerLimitAt } from './vapour.ts';
import type { Store, StoredPortion } from './store.ts';

export interface GasMixture {
  /** Fuel over the lower limit of its mixture as the gas is. */
  readonly overLowerLimit: number;
  /** Null where an upper limit is not known, or where richer than air in oxygen. */
  readonly overUpperLimit: number | null;
  readonly fuelShare: number;
  readonly oxygenShare: number;
  readonly limitingOxygenShare: number;
  readonly isFlammableInAir: boolean;
}

/** Of a store that holds gas only; null where nothing in it burns or a molar mass is missing. */
export function gasMixtureOf(store: Store): GasMixture | null {
  const mols = store.portions.map(({ massShare, molarMassKgPerMol }) =>
    molarMassKgPerMol === null ? null : massShare / molarMassKgPerMol,
  );
  const total = mols.reduce<number | null>((sum, mol) => (sum === null || mol === null ? null : sum + mol), 0);
  const fuels = store.portions.flatMap((portion, index) =>
    portion.flammableLimits === null || total === null
      ? []
      : [{ portion, limits: portion.flammableLimits, moleShare: (mols[index] ?? 0) / total }],
  );
  if (fuels.length === 0 || total === null) return null;
  const oxygenShare = store.portions.reduce(
    (sum, portion, index) => sum + ((mols[index] ?? 0) / total) * oxygenIn(portion),
    0,
  );
  const overLowerLimit = fuels.reduce(
    (sum, { portion, limits, moleShare }) => sum + moleShare / lowerLimitAt(portion, limits.lower, store.temperatureK),
    0,
  );
  const uppers = fuels.map(({ limits, moleShare }) => (limits.upper === null ? null : moleShare / limits.upper));
  const overUpper = uppers.reduce(
    (sum, part) => (sum === null || part === null ? null : sum + part),
    0 as number | null,
  );
  const fuelShare = fuels.reduce((sum, { moleShare }) => sum + moleShare, 0);
  const limitingOxygenShare = limitingOxygenOf(fuels);
  // An inert gas that is better than nitrogen stands for more of it, and so brings the oxygen down further.
  const inertWeight = store.portions.reduce(
    (sum, portion, index) => sum + ((mols[index] ?? 0) / total) * ((inerting[portion.formula?.text ?? ''] ?? 1) - 1),
    0,
  );
  const weighed = 1 + inertWeight;
  // Thinned with air until the fuel stands at its lower limit.
  const part = overLowerLimit > 1 ? 1 / overLowerLimit : 1;
  const oxygenThere = (part * oxygenShare + (1 - part) * oxygenOfAir) / (part * weighed + (1 - part));
  return {
    overLowerLimit,
    overUpperLimit: oxygenShare > oxygenOfAir + 1e-6 ? null : overUpper,
    fuelShare,
    oxygenShare,
    limitingOxygenShare,
    isFlammableInAir: overLowerLimit >= 1 && oxygenThere >= limitingOxygenShare,
  };
}

export const oxygenOfAir = 0.20946;

const inerting: Readonly<Partial<Record<string, number>>> = { CO2: 1.5, He: 0.9, Ar: 0.55 };

/** mol of O2 per mol of a portion that is gas. */
export function oxygenIn(portion: StoredPortion): number {
  if (portion.formula !== null) return portion.formula.text === 'O2' ? 1 : 0;
  const { molarMassKgPerMol, molPerKg } = portion;
  // Air's oxygen is all but that of its carbon dioxide.
  const atoms = (molPerKg.get('O') ?? 0) - 2 * (molPerKg.get('C') ?? 0);
  return molPerKg.has('N') && molarMassKgPerMol !== null ? (atoms / 2) * molarMassKgPerMol : 0;
}
