// Which rules govern a fuel aboard a ship, by its kind and flash point: information with its date, not advice.
// Knows no ship, no flag and no class. Invariant: whatever burns has a route; what no code prescribes goes by alternative
// design. Sources: the instruments named, as reported publicly up to `knownAsOf`; they change every year.

import { lowFlashPointK } from './alone-rules.ts';
import { burns } from './meeting-rules.ts';
import { gasMixtureOf } from './gas-mixtures.ts';
import { isGas, isIn, isMetal } from './store.ts';
import type { Store } from './store.ts';
import { flashPointK } from './vapour.ts';

export interface ApprovalRoute {
  readonly id: string;
  /** What governs, in the instruments' own numbers. */
  readonly instrument: string;
  /** `mandatory`: a code in force · `interim`: guidelines, to be agreed with the flag · `none`: alternative design. */
  readonly status: 'mandatory' | 'interim' | 'none';
  /** Since when, ISO date or month. */
  readonly since: string;
  readonly says: string;
}

/** The month up to which these were followed. */
export const knownAsOf = '2025-09';

const alternativeDesign =
  'Alternative design and arrangements: SOLAS II-1/55 and II-2/17, with MSC.1/Circ.1212/Rev.1 and MSC.1/Circ.1455, agreed with flag and class.';

const routes = {
  oil: {
    id: 'oil-fuel',
    instrument: 'SOLAS II-2/4.2',
    status: 'mandatory',
    since: '2002-07-01',
    says: 'Oil fuel with a flash point of 60 °C or above (43 °C for emergency generators).',
  },
  igf: {
    id: 'igf-code',
    instrument: 'IGF Code (MSC.391(95)), SOLAS II-1 part G',
    status: 'mandatory',
    since: '2017-01-01',
    says: 'Natural gas by prescription; any other gas or fuel that flashes below 60 °C by the code’s alternative design.',
  },
  alcohol: {
    id: 'alcohols',
    instrument: 'MSC.1/Circ.1621, interim guidelines for methyl and ethyl alcohol, with the IGF Code',
    status: 'interim',
    since: '2020-12',
    says: 'Guidelines for methanol and ethanol; the flag agrees to them case by case.',
  },
  lpg: {
    id: 'lpg',
    instrument: 'MSC.1/Circ.1666, interim guidelines for liquefied petroleum gas, with the IGF Code',
    status: 'interim',
    since: '2023-06',
    says: 'Guidelines for propane and butane.',
  },
  ammonia: {
    id: 'ammonia',
    instrument: 'MSC.1/Circ.1687, interim guidelines for ammonia, with the IGF Code',
    status: 'interim',
    since: '2024-12',
    says: 'Guidelines for ammonia as fuel, with its toxicity; approved in December 2024.',
  },
  hydrogen: {
    id: 'hydrogen',
    instrument: 'Interim guidelines for hydrogen, finalised by sub-committee CCC 11, with the IGF Code',
    status: 'interim',
    since: '2025-09',
    says: 'Guidelines were finalised in September 2025; see whether the committee has approved them since.',
  },
  lowFlashOil: {
    id: 'low-flash-oil',
    instrument: 'IGF Code by its alternative design; guidelines for 52 to 60 °C are not finished',
    status: 'none',
    since: '2017-01-01',
    says: 'An oil that flashes below 60 °C counts as a low-flashpoint fuel.',
  },
  noCode: {
    id: 'no-code',
    instrument: 'no prescriptive code: alternative design',
    status: 'none',
    since: '2002-07-01',
    says: alternativeDesign,
  },
  metal: {
    id: 'metal-fuel',
    instrument: 'no prescriptive code: alternative design',
    status: 'none',
    since: '2002-07-01',
    says: alternativeDesign,
  },
} as const satisfies Readonly<Record<string, ApprovalRoute>>;

/** Fuel cells have guidelines of their own beside those of their fuel. */
export const fuelCellRoute: ApprovalRoute = {
  id: 'fuel-cells',
  instrument: 'MSC.1/Circ.1647, interim guidelines for fuel cell power installations',
  status: 'interim',
  since: '2022-06',
  says: 'For the fuel cells; the fuel keeps its own route.',
};

/** What part of a blend decides its route: a hundredth of metal is a metal fuel, a tenth of alcohol an alcohol. */
const leastMetal = 0.01;
const leastFuel = 0.1;

/** The route of a blend as a ship's fuel; null for a gas in which nothing burns. */
export function approvalRouteOf(store: Store): ApprovalRoute | null {
  const share = (is: (portion: Store['portions'][number]) => boolean): number =>
    store.portions.reduce((sum, portion) => sum + (is(portion) ? portion.massShare : 0), 0);
  if (share((portion) => isMetal(portion) || isIn(portion, 'metal-hydride', 'carbide')) >= leastMetal) {
    return routes.metal;
  }
  if (share((portion) => isIn(portion, 'ammonia')) >= leastFuel) return routes.ammonia;
  if (isGas(store) || share((portion) => isIn(portion, 'fuel-gas')) >= leastFuel) return gasRoute(store, share);
  const flash = flashPointK(store);
  if (flash === null) return store.portions.some(burns) ? routes.noCode : null;
  if (flash >= lowFlashPointK) return routes.oil;
  const isAlcohol = (portion: Store['portions'][number]): boolean =>
    isIn(portion, 'alcohol') && (portion.formula?.composition.get('C') ?? 3) <= 2;
  if (share((portion) => isIn(portion, 'hydrocarbon')) >= 0.5) return routes.lowFlashOil;
  return share(isAlcohol) >= leastFuel ? routes.alcohol : routes.igf;
}

function gasRoute(
  store: Store,
  share: (is: (portion: Store['portions'][number]) => boolean) => number,
): ApprovalRoute | null {
  const isMostly = (carbon: readonly number[]): boolean =>
    share(({ formula }) => formula !== null && carbon.includes(formula.composition.get('C') ?? 0)) >= 0.5;
  const mixture = isGas(store) ? gasMixtureOf(store) : null;
  if (
    isGas(store) &&
    mixture?.isFlammableInAir !== true &&
    !store.portions.some((portion) => isIn(portion, 'fuel-gas'))
  )
    return null;
  if (share(({ formula }) => formula?.text === 'H2') >= 0.5) return routes.hydrogen;
  const isPetroleumGas = store.portions.some(({ name }) => name === 'lpg');
  return isPetroleumGas || (isMostly([3, 4]) && share((portion) => isIn(portion, 'hydrocarbon')) >= 0.5)
    ? routes.lpg
    : routes.igf;
}
