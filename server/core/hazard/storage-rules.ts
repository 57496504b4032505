// How a blend is kept: melts, temperatures near or above the flash point, vapour inside its flammable range, autoignition,
// more oxygen than in air, and a blanket that reacts with what it covers.
// Knows no pairs within the blend. Invariant: a fire needs oxygen: under a blanket with less than the limiting oxygen no
// range is entered, whatever the temperature.

import { isOxidiser, lowFlashPointK, traceOxygen, eachPortion } from './alone-rules.ts';
import { blanketRules } from './blanket-rules.ts';
import { gasMixtureOf, oxygenIn, oxygenOfAir } from './gas-mixtures.ts';
import { burns } from './meeting-rules.ts';
import { ruleSources } from './rule.ts';
import type { HazardRule, Hit } from './rule.ts';
import { isGas, isMetal, isMolten, liquids, shareOver } from './store.ts';
import type { Store } from './store.ts';
import { flashPointK, ullageOf } from './vapour.ts';
import type { Ullage } from './vapour.ts';

/** SOLAS II-2/4.2: oil fuel in storage tanks stays this far below its flash point. */
const flashMarginK = 10;
/** More oxygen than this counts as enriched, by volume. */
const enrichedOxygen = 0.235;
/** Air at 1 atm begins to condense, with about half oxygen in the first drops. */
const airCondensesK = 82;
const referenceK = 298.15;

export const storageRules: readonly HazardRule[] = [
  {
    id: 'molten-metal',
    code: 'hazard/molten-metal',
    happens: 'A leak of molten metal is a spray that burns, and water on it explodes.',
    mend: 'Store it below its melting point, or design for a melt: drip trays, trace heating, no water above.',
    source: ruleSources.nfpa484,
    find: (store) =>
      eachPortion(
        store,
        (portion) =>
          isMolten(portion) && portion.meltingPointK !== null && portion.meltingPointK > referenceK ? 'warning' : null,
        ({ meltingPointK }) => (meltingPointK === null ? {} : { limitK: meltingPointK }),
      ),
  },
  {
    id: 'near-flash-point',
    code: 'hazard/near-flash-point',
    happens: 'A little more heat brings its vapour to the lower flammable limit.',
    mend: 'Store it at least 10 K below its flash point, or under inert gas.',
    source: ruleSources.solas,
    find: (store) => {
      const flash = isGas(store) ? null : flashPointK(store);
      if (flash === null || flash < lowFlashPointK || !hasOxygenToBurn(store, ullageOf(store))) return [];
      const isNear = store.temperatureK < flash && store.temperatureK > flash - flashMarginK;
      return isNear ? [{ severity: 'warning', portion: null, partner: null, numbers: { flashPointK: flash } }] : [];
    },
  },
  {
    id: 'flammable-ullage',
    code: 'hazard/flammable-range',
    happens: 'The vapour over it burns or explodes at a spark.',
    mend: 'Blanket it with nitrogen below the limiting oxygen, or store it colder than its flash point.',
    source: ruleSources.crowl,
    find: flammableUllage,
  },
  {
    id: 'flammable-gas',
    code: 'hazard/flammable-range',
    happens: 'The gas burns or explodes at a spark as it is.',
    mend: 'Keep fuel gas and air apart, or dilute it below its lower limit.',
    source: ruleSources.crowl,
    find: (store) => {
      const mixture = isGas(store) && store.kind === 'tank' ? gasMixtureOf(store) : null;
      if (mixture === null || mixture.overLowerLimit < 1 || mixture.oxygenShare < traceOxygen) return [];
      const isRich = (mixture.overUpperLimit ?? 0) > 1 || mixture.oxygenShare < mixture.limitingOxygenShare;
      return [
        {
          severity: isRich ? 'warning' : 'error',
          portion: null,
          partner: null,
          numbers: {
            overLowerLimit: mixture.overLowerLimit,
            vapourShare: mixture.fuelShare,
            oxygenShare: mixture.oxygenShare,
            limitingOxygenShare: mixture.limitingOxygenShare,
          },
        },
      ];
    },
  },
  {
    id: 'above-autoignition',
    code: 'hazard/above-autoignition',
    happens: 'Air sets it alight without a spark.',
    mend: 'Store it colder, or keep air from it and from its leaks.',
    source: ruleSources.practice,
    find: (store) =>
      shareOver(store, 'O2') > traceOxygen && store.kind === 'tank'
        ? eachPortion(
            store,
            // What is solid and cold by nature is told of as pyrophoric.
            ({ autoignitionK, hazards }) =>
              autoignitionK !== null && store.temperatureK >= autoignitionK && hazards.pyrophoric === undefined
                ? 'error'
                : null,
            ({ autoignitionK }) => (autoignitionK === null ? {} : { limitK: autoignitionK }),
          )
        : [],
  },
  {
    id: 'oxygen-over-fuel',
    code: 'hazard/oxygen-enriched',
    happens: 'In more oxygen than air’s, oil, grease and cloth catch fire easily and burn fiercely.',
    mend: 'Bring the oxygen over it down to air’s, better below the limiting oxygen.',
    source: ruleSources.practice,
    find: (store) => {
      const oxygenShare = shareOver(store, 'O2');
      if (store.kind !== 'tank' || isGas(store) || oxygenShare <= enrichedOxygen) return [];
      const portion = store.portions.findIndex((one) => burns(one) && !isMetal(one));
      return portion < 0
        ? []
        : [
            {
              severity: 'warning',
              portion,
              partner: { kind: 'gas', formula: 'O2', moleShare: oxygenShare },
              numbers: { oxygenShare },
            },
          ];
    },
  },
  {
    id: 'oxygen-to-burn-with',
    code: 'hazard/oxygen-enriched',
    happens: 'Lines and fans for more oxygen than air’s must be free of oil, and metals burn in it.',
    mend: 'Clean for oxygen, choose its materials, and detect leaks.',
    source: ruleSources.practice,
    find: (store) => {
      const oxygenShare = store.kind === 'oxidant' ? oxygenOf(store) : 0;
      return oxygenShare > enrichedOxygen
        ? [{ severity: 'warning', portion: null, partner: null, numbers: { oxygenShare } }]
        : [];
    },
  },
  {
    id: 'condensing-air',
    code: 'hazard/oxygen-enriched',
    happens: 'Walls as cold as this condense air that is about half oxygen; it drips onto what burns.',
    mend: 'Vacuum-insulate, and keep anything that burns from under cold pipes.',
    source: ruleSources.practice,
    find: (store) =>
      store.temperatureK < airCondensesK && store.portions.some((portion) => !isOxidiser(portion))
        ? [{ severity: 'warning', portion: null, partner: null, numbers: { limitK: airCondensesK } }]
        : [],
  },
  ...blanketRules,
];

function hasOxygenToBurn(store: Store, ullage: Ullage | null): boolean {
  return ullage !== null && shareOver(store, 'O2') >= Math.min(ullage.limitingOxygenShare, oxygenOfAir - 1e-3);
}

function flammableUllage(store: Store): readonly Hit[] {
  if (store.kind !== 'tank' || isGas(store) || liquids(store).length === 0) return [];
  const ullage = ullageOf(store);
  // At its flash point a pure liquid reaches its limit; rounding must not decide.
  if (ullage === null || ullage.overLowerLimit < 1 - 1e-9 || !hasOxygenToBurn(store, ullage)) return [];
  // A liquefied gas stands under its own vapour; only who says that air is over it means it.
  const isLiquefied = liquids(store).some(({ usualPhase, flammableLimits }) => usualPhase === 'gas' && flammableLimits);
  if (ullage.vapourShare >= 1 || (isLiquefied && store.blanket.assumed)) return [];
  const { overLowerLimit, overUpperLimit, vapourShare, limitingOxygenShare } = ullage;
  return [
    {
      severity: (overUpperLimit ?? 0) > 1 ? 'warning' : 'error',
      portion: null,
      partner: { kind: 'gas', formula: 'O2', moleShare: shareOver(store, 'O2') },
      numbers: { overLowerLimit, vapourShare, oxygenShare: shareOver(store, 'O2'), limitingOxygenShare },
    },
  ];
}

/** mol O2 per mol of an oxidant whose molar masses are known; 0 where one is not. */
function oxygenOf(store: Store): number {
  let oxygen = 0;
  let total = 0;
  for (const portion of store.portions) {
    if (portion.molarMassKgPerMol === null) return 0;
    const mol = portion.massShare / portion.molarMassKgPerMol;
    total += mol;
    oxygen += mol * oxygenIn(portion);
  }
  return total > 0 ? oxygen / total : 0;
}
