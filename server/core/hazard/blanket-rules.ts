// The gas over a blend against what it covers: which gases react with which families, in which state, and how badly.
// Knows no vapour. Invariant: one finding a portion, of the gas that does it most harm; argon and helium do none.

import { isIn, isCovered, holdsWater, shareOver } from './store.ts';
import type { Store, StoredPortion } from './store.ts';
import { traceOxygen } from './alone-rules.ts';
import type { HazardSeverity } from './hazard-codes.ts';
import { ruleSources } from './rule.ts';
import type { HazardRule, Hit } from './rule.ts';

/** Which gas, over what, and how badly; null where it does nothing. */
interface BlanketReaction {
  readonly id: string;
  readonly gas: string;
  readonly leastShare: number;
  readonly happens: string;
  readonly mend: string;
  readonly source: string;
  readonly judge: (portion: StoredPortion, store: Store) => HazardSeverity | null;
}

/** Potassium, rubidium and caesium, alone or in an alloy: their crust is superoxide. */
const formsSuperoxide = (portion: StoredPortion): boolean =>
  isIn(portion, 'alkali-metal') && isPartly(portion, ['K', 'Rb', 'Cs']);

/** A tenth of its atoms at least: what technical sodium holds of potassium makes no crust of its own. */
export function isPartly({ molPerKg }: StoredPortion, symbols: readonly string[]): boolean {
  let all = 0;
  let some = 0;
  for (const [symbol, mol] of molPerKg) {
    all += mol;
    if (symbols.includes(symbol)) some += mol;
  }
  return some >= leastPart * all && some > 0;
}

const leastPart = 0.1;

/** Solid under a liquid the gas reaches it slowly; bare or molten at once. */
const byCover = (portion: StoredPortion, store: Store): HazardSeverity =>
  isCovered(portion, store) ? 'warning' : 'error';

const traceNitrogen = 0.02;
const traceCarbonDioxide = 0.01;

const reactions: readonly BlanketReaction[] = [
  {
    id: 'air-over-alkali-metal',
    gas: 'O2',
    leastShare: traceOxygen,
    happens: 'Air and its moisture turn the metal to oxide, caustic and hydrogen; a melt takes fire.',
    mend: 'Blanket it with dry argon (nitrogen does for sodium and potassium, not for lithium).',
    source: ruleSources.bretherick,
    judge: (portion, store) =>
      isIn(portion, 'alkali-metal') && !formsSuperoxide(portion) ? byCover(portion, store) : null,
  },
  {
    id: 'air-over-pyrophoric',
    gas: 'O2',
    leastShare: traceOxygen,
    happens: 'It takes fire in the air over it.',
    mend: 'Keep it under inert gas, or under the liquid it is known to keep in.',
    source: ruleSources.bretherick,
    judge: (portion, store) => {
      const { pyrophoric } = portion.hazards;
      const isBare = pyrophoric !== undefined && pyrophoric.form === undefined && portion.phase !== 'gas';
      return isBare && !isIn(portion, 'alkali-metal') && !isCovered(portion, store) ? 'error' : null;
    },
  },
  {
    id: 'air-over-hydride',
    gas: 'O2',
    leastShare: traceOxygen,
    happens: 'The moisture of air makes hydrogen from it.',
    mend: 'Blanket it with dry nitrogen or argon.',
    source: ruleSources.bretherick,
    judge: (portion, store) =>
      isIn(portion, 'metal-hydride') && portion.phase === 'solid' && !holdsWater(store) && !isIn(portion, 'unstable')
        ? 'warning'
        : null,
  },
  {
    id: 'nitrogen-over-lithium',
    gas: 'N2',
    leastShare: traceNitrogen,
    happens: 'Lithium forms its nitride at room temperature; other light metals do when molten.',
    mend: 'Blanket it with argon or helium.',
    source: ruleSources.bretherick,
    judge: (portion, store) => {
      if (isIn(portion, 'alkali-metal') && isPartly(portion, ['Li'])) return byCover(portion, store);
      const isNitrideMelt = portion.phase === 'liquid' && isPartly(portion, ['Mg', 'Ca', 'Ti']);
      return isNitrideMelt && isIn(portion, 'passivated-metal', 'alkaline-earth-metal') ? 'error' : null;
    },
  },
  {
    id: 'carbon-dioxide-over-metal',
    gas: 'CO2',
    leastShare: traceCarbonDioxide,
    happens: 'A reactive metal or hydride burns in carbon dioxide once warm or molten.',
    mend: 'Blanket it with argon.',
    source: ruleSources.bretherick,
    judge: (portion) => {
      if (isIn(portion, 'alkali-metal')) return portion.phase === 'liquid' ? 'error' : 'warning';
      if (isIn(portion, 'passivated-metal', 'alkaline-earth-metal')) return portion.phase === 'liquid' ? 'error' : null;
      return isIn(portion, 'metal-hydride') && isIn(portion, 'strong-reducer') && portion.phase === 'solid'
        ? 'warning'
        : null;
    },
  },
  {
    id: 'carbon-dioxide-over-base',
    gas: 'CO2',
    leastShare: traceCarbonDioxide,
    happens: 'The blend absorbs the gas: the tank draws a vacuum, and solids form.',
    mend: 'Blanket it with nitrogen.',
    source: ruleSources.igc,
    judge: (portion, store) => {
      // Ammonium carbamate closes lines and relief valves.
      if (isIn(portion, 'ammonia')) return 'error';
      return (isIn(portion, 'caustic') && holdsWater(store)) || (isIn(portion, 'amine') && portion.phase !== 'gas')
        ? 'warning'
        : null;
    },
  },
  {
    id: 'hydrogen-over-alkali-metal',
    gas: 'H2',
    leastShare: traceCarbonDioxide,
    happens: 'Hot molten alkali metal takes up hydrogen as hydride.',
    mend: 'Blanket it with argon.',
    source: ruleSources.bretherick,
    judge: (portion, store) =>
      isIn(portion, 'alkali-metal') && portion.phase === 'liquid' && store.temperatureK > hydrideFormsK
        ? 'warning'
        : null,
  },
];

const hydrideFormsK = 473;

export const blanketRules: readonly HazardRule[] = [
  ...reactions.map(({ id, happens, mend, source, gas, leastShare, judge }): HazardRule => ({
    id,
    code: 'hazard/blanket',
    happens,
    mend,
    source,
    find: (store) => overEach(store, gas, leastShare, judge),
  })),
  {
    id: 'superoxide-crust',
    code: 'hazard/superoxide',
    happens:
      'Oxygen leaves a crust of superoxide on it that explodes with the metal or oil when cut, scraped or knocked.',
    mend: 'Blanket it with argon or nitrogen; never cut or scrape a yellow crust.',
    source: ruleSources.bretherick,
    find: (store) =>
      overEach(store, 'O2', traceOxygen, (portion) => (formsSuperoxide(portion) ? byCover(portion, store) : null)),
  },
];

function overEach(
  store: Store,
  gas: string,
  leastShare: number,
  judge: (portion: StoredPortion, store: Store) => HazardSeverity | null,
): readonly Hit[] {
  const moleShare = shareOver(store, gas);
  if (store.kind !== 'tank' || moleShare < leastShare) return [];
  return store.portions.flatMap((portion, index): Hit[] => {
    const severity = portion.phase === 'gas' ? null : judge(portion, store);
    if (severity === null) return [];
    return [{ severity, portion: index, partner: { kind: 'gas', formula: gas, moleShare }, numbers: {} }];
  });
}
