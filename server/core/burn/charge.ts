// A kilogram of fuel with its oxidant: how much oxidant that is, its elements, its energy and the volume of its gases.
// Knows no products and no temperature but those the streams come in with. Invariant: elements and enthalpy are those of
// the streams added up and nothing else, so a zone and the rest of the oxidant mix to exactly the whole charge.
// Source of λ: oxygen demand by valence, balance/stoichiometry.ts; what the oxidant offers is its negative demand.

import { oxygenDemand } from '../balance/stoichiometry.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { elementOfSymbol } from '../substance/elements.ts';
import type { BurnFault, BurnHeld, BurnStream, Charge, OxidantAmount } from './burn.ts';

/** The charge of 1 kg of fuel with an amount of oxidant, or why there is none. */
export function chargeOf(
  fuel: BurnStream,
  oxidant: BurnStream,
  amount: OxidantAmount,
  held: BurnHeld,
  of: 'whole' | 'zone' = 'whole',
): Charge | BurnFault {
  const ratio = oxidantForLambda(fuel, oxidant);
  const oxidantKgPerKg = massOf(amount, ratio, of);
  if (typeof oxidantKgPerKg !== 'number') return oxidantKgPerKg;
  const sums = new Map(fuel.elementMolPerKg);
  for (const [symbol, mol] of oxidant.elementMolPerKg) {
    sums.set(symbol, (sums.get(symbol) ?? 0) + oxidantKgPerKg * mol);
  }
  const present = [...sums].filter(([, mol]) => mol > 0).sort(([a], [b]) => numberOf(a) - numberOf(b));
  if (present.length === 0) return { kind: 'fault', reason: 'nothing' };
  const sum = (a: number | null, b: number | null): number | null => {
    if (a === null || (oxidantKgPerKg > 0 && b === null)) return null;
    return a + oxidantKgPerKg * (b ?? 0);
  };
  const gasMol = fuel.gasMolPerKg + oxidantKgPerKg * oxidant.gasMolPerKg;
  // Pressure times volume of each stream's gas at its own temperature: what expanding into place has cost.
  const pressureVolumeJ =
    molarGasConstantJPerMolK *
    (fuel.gasMolPerKg * fuel.temperatureK + oxidantKgPerKg * oxidant.gasMolPerKg * oxidant.temperatureK);
  const pressurePa = held.held === 'pressure' ? held.pressurePa : held.chargePressurePa;
  return {
    kind: 'charge',
    oxidantKgPerKg,
    lambda: typeof ratio === 'number' ? oxidantKgPerKg / ratio : null,
    elements: present.map(([symbol]) => symbol),
    elementMol: Float64Array.from(present, ([, mol]) => mol),
    massKg: 1 + oxidantKgPerKg,
    enthalpyJ: sum(fuel.enthalpyJPerKg, oxidant.enthalpyJPerKg),
    referenceEnthalpyJ: sum(fuel.referenceEnthalpyJPerKg, oxidant.referenceEnthalpyJPerKg),
    gasMol,
    volumeM3: pressureVolumeJ / pressurePa,
    pressureVolumeJ,
  };
}

/** kg of oxidant per kg of fuel at λ = 1, or why λ has no meaning. */
export function oxidantForLambda(fuel: BurnStream, oxidant: BurnStream): number | BurnFault {
  const needed = oxygenDemand(fuel.elementMolPerKg);
  if (needed.withoutValence.length > 0) {
    return { kind: 'fault', reason: 'no-valence', of: 'fuel', elements: needed.withoutValence };
  }
  const offered = oxygenDemand(oxidant.elementMolPerKg);
  if (offered.withoutValence.length > 0) {
    return { kind: 'fault', reason: 'no-valence', of: 'oxidant', elements: offered.withoutValence };
  }
  if (!(needed.molPerKg > 0)) return { kind: 'fault', reason: 'no-oxygen-needed', molPerKg: needed.molPerKg };
  // Steam and carbon dioxide come out as 0 but for the rounding of their atomic weights.
  if (!(offered.molPerKg < -negligibleOxygenMolPerKg)) {
    return { kind: 'fault', reason: 'no-oxygen-offered', molPerKg: Math.max(0, -offered.molPerKg) };
  }
  return needed.molPerKg / -offered.molPerKg;
}

const negligibleOxygenMolPerKg = 1e-6;

function massOf(amount: OxidantAmount, ratio: number | BurnFault, of: 'whole' | 'zone'): number | BurnFault {
  const isUsable = (value: number): boolean => value > 0 && Number.isFinite(value);
  const fault: BurnFault = { kind: 'fault', reason: 'not-positive', of };
  if (amount.by === 'mass') return amount.kgPerKg === 0 || isUsable(amount.kgPerKg) ? amount.kgPerKg : fault;
  if (typeof ratio !== 'number') return ratio;
  const lambda = amount.by === 'lambda' ? amount.lambda : 1 / amount.ratio;
  return isUsable(lambda) ? lambda * ratio : fault;
}

function numberOf(symbol: string): number {
  return elementOfSymbol(symbol)?.number ?? Number.POSITIVE_INFINITY;
}
