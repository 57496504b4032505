// What a sea does with what is delivered to it: alkali, carbonate, hydrogen carbonate or acid enters as one change of total
// alkalinity and of dissolved carbon. First the pH before any gas is exchanged; then, at the fugacity the water had, the carbon it
// holds in the end. Uptake is that response less the carbon delivered, so that carbon already fixed in an exhaust is never
// counted twice; hydrogen carbonate is seen to give some of its carbon back.
// It knows no gas exchange in time (gas-exchange.ts) and no precipitate (precipitation.ts): alkali that precipitates is not here.
// Invariant: uptake plus carbon delivered is the change of dissolved carbon from the water before to the water in the end.
// Sources: Renforth and Henderson 2017 (Rev. Geophys. 55, 636); Schulz, Bach and Dickson 2023 (State of the Planet 2-oae2023, 2).

import type { CarbonateState } from './carbonate-state.ts';
import { uptakePerAlkalinity } from './buffering.ts';
import { solvePair } from './solve-pair.ts';

/** What may be delivered; an acid by its protons. */
export const deliveredForms = ['hydroxide', 'carbonate', 'hydrogen-carbonate', 'acid'] as const;

export type DeliveredForm = (typeof deliveredForms)[number];

/** Moles of alkalinity and of dissolved carbon that a mole of each brings. */
export const formBrings: Readonly<Record<DeliveredForm, { readonly alkalinity: number; readonly carbon: number }>> = {
  hydroxide: { alkalinity: 1, carbon: 0 },
  carbonate: { alkalinity: 2, carbon: 1 },
  'hydrogen-carbonate': { alkalinity: 1, carbon: 1 },
  acid: { alkalinity: -1, carbon: 0 },
};

/** One change, mol per kg of sea water. */
export interface Delivery {
  readonly alkalinity: number;
  readonly carbon: number;
}

/** Moles of each form per kg, as one change. */
export function deliveryOf(amounts: Readonly<Partial<Record<DeliveredForm, number>>>): Delivery {
  let [alkalinity, carbon] = [0, 0];
  for (const form of deliveredForms) {
    const molPerKg = amounts[form] ?? 0;
    alkalinity += molPerKg * formBrings[form].alkalinity;
    carbon += molPerKg * formBrings[form].carbon;
  }
  return { alkalinity, carbon };
}

export interface SeaResponse {
  /** Mixed in, before gas is exchanged. */
  readonly mixed: CarbonateState;
  /** In the end, at the fugacity the water had before. */
  readonly settled: CarbonateState;
  /** Change of the dissolved carbon from before to the end, mol/kg. */
  readonly response: number;
  /** Carbon dioxide taken from the air, mol/kg; below zero: given off. */
  readonly uptake: number;
}

/** The response to a finite delivery; null where it is more acid or base than a solution can be. */
export function respondTo(state: CarbonateState, { alkalinity, carbon }: Delivery): SeaResponse | null {
  const total = { variable: 'total-alkalinity', molPerKg: state.totalAlkalinity + alkalinity } as const;
  const dissolved = state.dissolvedCarbon + carbon;
  const mixed = solvePair(state.medium, total, { variable: 'dissolved-carbon', molPerKg: dissolved });
  const settled = solvePair(state.medium, total, { variable: 'carbon-dioxide', molPerKg: state.carbonDioxide });
  if (mixed.kind !== 'solved' || settled.kind !== 'solved') return null;
  const response = settled.state.dissolvedCarbon - state.dissolvedCarbon;
  return { mixed: mixed.state, settled: settled.state, response, uptake: response - carbon };
}

/** For a delivery so small that it changes nothing: moles taken from the air per mole delivered in that form. */
export function uptakePerMole(state: CarbonateState, form: DeliveredForm): number {
  const { alkalinity, carbon } = formBrings[form];
  return uptakePerAlkalinity(state) * alkalinity - carbon;
}

/** What a kilogram of effluent leaves per kilogram of sea water at a dilution (kg of sea water per kg of effluent). */
export function dilutedDelivery(effluent: Delivery, dilution: number): Delivery {
  return { alkalinity: effluent.alkalinity / dilution, carbon: effluent.carbon / dilution };
}

/**
 * The least dilution from the one given on at which the mixed water is as `holds` asks; null where not even the water without
 * effluent is. The further it is diluted the nearer it comes to that.
 */
export function enoughDilution(
  state: CarbonateState,
  effluent: Delivery,
  dilution: number,
  holds: (mixed: CarbonateState) => boolean,
): number | null {
  const isEnough = (trial: number): boolean => {
    const response = respondTo(state, dilutedDelivery(effluent, trial));
    return response !== null && holds(response.mixed);
  };
  if (!holds(state)) return null;
  if (isEnough(dilution)) return dilution;
  let [low, high] = [Math.log(dilution), Math.log(dilution) + 1];
  while (!isEnough(Math.exp(high))) {
    if (high > largestLnDilution) return null;
    [low, high] = [high, high + 2];
  }
  while (high - low > 1e-6) {
    const middle = (low + high) / 2;
    if (isEnough(Math.exp(middle))) high = middle;
    else low = middle;
  }
  return Math.exp(high);
}

/** Beyond it what is left cannot be told from rounding. */
const largestLnDilution = Math.log(1e12);
