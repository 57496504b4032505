// A spilled kilogram of a blend that meets plenty of water, in which what can dissolves: heat and gas, and what part of the blend's own
// hydrogen gathers over it in its tank.
// Knows no rate and no droplets: everything reacts, so each number is an upper bound. Invariant: gas and heat are sums over
// the portions and never negative; a portion whose reaction is not known is named, not left out in silence.

import { dissolves, waterReactionOf } from './alone-rules.ts';
import { molPerKg, waterStoichiometry } from './reactions.ts';
import { molarVolumeM3PerMol } from './rule.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import type { Store } from './store.ts';

export interface WaterContact {
  /** J given off by one kg of the blend; a lower number than the truth where `withoutHeat` names portions. */
  readonly heatJPerKg: number;
  /** mol of each gas by one kg of the blend. */
  readonly gasMolPerKg: Readonly<Record<string, number>>;
  /** m³ of hydrogen at 25 °C and 1 bar by one kg of the blend. */
  readonly hydrogenM3PerKg: number;
  /** kg of water taken up by one kg of the blend. */
  readonly waterKgPerKg: number;
  /** kg of water that this heat would bring from 25 °C to the boil and evaporate. */
  readonly steamKgPerKg: number;
  readonly withoutHeat: readonly string[];
  /** Portions that react with water in a way the data do not balance. */
  readonly withoutReaction: readonly string[];
}

/** kg per mol of water. */
export const waterKgPerMol = 0.018015;
/** 75 K of liquid water at 4.18 kJ/(kg K), and 2257 kJ/kg to evaporate it at 100 °C. */
const steamJPerKg = 75 * 4180 + 2.257e6;

/** Null where nothing in the blend reacts with water. */
export function waterContactOf(store: Store): WaterContact | null {
  let heatJPerKg = 0;
  let waterMol = 0;
  let reacts = false;
  const gasMolPerKg: Record<string, number> = {};
  const withoutHeat: string[] = [];
  const withoutReaction: string[] = [];
  for (const portion of store.portions) {
    // Spilled, a metal lies there as it was mixed in; a piece of a passive one does nothing.
    if (dissolves(portion) || waterReactionOf(portion, store) === null) continue;
    reacts = true;
    const stoichiometry = waterStoichiometry(portion);
    const mol = molPerKg(portion);
    if (stoichiometry === undefined || mol === null) {
      withoutReaction.push(portion.name);
      continue;
    }
    waterMol += mol * stoichiometry.waterMol;
    if (stoichiometry.dissolvedHeatJ === null) withoutHeat.push(portion.name);
    else heatJPerKg += Math.max(0, mol * stoichiometry.dissolvedHeatJ);
    for (const [gas, each] of Object.entries(stoichiometry.gasMol)) {
      gasMolPerKg[gas] = (gasMolPerKg[gas] ?? 0) + mol * each;
    }
  }
  if (!reacts) return null;
  return {
    heatJPerKg,
    gasMolPerKg,
    hydrogenM3PerKg: (gasMolPerKg['H2'] ?? 0) * molarVolumeM3PerMol,
    waterKgPerKg: waterMol * waterKgPerMol,
    steamKgPerKg: heatJPerKg / steamJPerKg,
    withoutHeat,
    withoutReaction,
  };
}

export interface HydrogenOver {
  /** Hydrogen in the gas over the blend, mol per mol, if the gas is let out as hydrogen is made (perfectly mixed). */
  readonly ventedShare: number;
  /** Rise of the pressure if nothing is let out, Pa. */
  readonly closedRisePa: number;
}

/**
 * Hydrogen made in a tank that is filled to a share of its volume, by mol per kg of the blend and its density; both ends of
 * what venting can do. The fill must lie between 0 and 1.
 */
export function hydrogenOver(
  hydrogenMolPerKg: number,
  densityKgPerM3: number,
  filledShare: number,
  temperatureK: number,
  pressurePa: number,
): HydrogenOver {
  const hydrogenMolPerM3 = (hydrogenMolPerKg * densityKgPerM3) / ullagePerBlend(filledShare);
  const gasMolPerM3 = pressurePa / (molarGasConstantJPerMolK * temperatureK);
  return {
    // A stirred volume that hydrogen washes out: 1 - exp(-made / held).
    ventedShare: 1 - Math.exp(-hydrogenMolPerM3 / gasMolPerM3),
    closedRisePa: hydrogenMolPerM3 * molarGasConstantJPerMolK * temperatureK,
  };
}

/** The hydrogen, mol per kg of the blend, that brings the gas over it to a share, as `hydrogenOver` counts with venting. */
export function hydrogenForShare(
  share: number,
  densityKgPerM3: number,
  filledShare: number,
  temperatureK: number,
  pressurePa: number,
): number {
  const gasMolPerM3 = pressurePa / (molarGasConstantJPerMolK * temperatureK);
  return (-Math.log(1 - share) * gasMolPerM3 * ullagePerBlend(filledShare)) / densityKgPerM3;
}

/** m³ of gas over a m³ of the blend. */
function ullagePerBlend(filledShare: number): number {
  return (1 - filledShare) / filledShare;
}
