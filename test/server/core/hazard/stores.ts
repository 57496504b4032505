// Stores for the tests, from the rows of the table of verdicts and from a few words.

import { findSubstance } from '../../../../server/core/substance/catalogue.ts';
import { gasOver, portionOf } from '../../../../server/core/hazard/store.ts';
import type { ContactMaterial, Store } from '../../../../server/core/hazard/store.ts';
import type { ExtinguishingAgent } from '../../../../server/core/substance/hazards.ts';
import type { Substance } from '../../../../server/core/substance/substance.ts';
import type { Verdict } from './verdicts.ts';

type Percent = Readonly<Record<string, number>>;

function named(name: string): Substance {
  const substance = findSubstance(name);
  if (substance === undefined) throw new Error(`the catalogue has no ${name}`);
  return substance;
}

export function storeOf(verdict: Omit<Verdict, 'earns' | 'because'>): Store {
  const temperatureK = (verdict.celsius ?? 25) + 273.15;
  const pressurePa = (verdict.bar ?? 1) * 1e5;
  const parts = Object.entries(verdict.percent).map(([name, share]) => ({ substance: named(name), share }));
  const masses = parts.map(
    ({ substance, share }) => share * (verdict.basis === 'mole' ? (substance.molarMassKgPerMol ?? Number.NaN) : 1),
  );
  const total = masses.reduce((sum, mass) => sum + mass, 0);
  const blanket: Percent = verdict.blanket ?? { air: 100 };
  return {
    kind: verdict.kind ?? 'tank',
    portions: parts.map(({ substance }, index) =>
      portionOf(substance, (masses[index] ?? 0) / total, temperatureK, pressurePa),
    ),
    temperatureK,
    pressurePa,
    blanket: gasOver(
      Object.entries(blanket).map(([name, share]) => ({ substance: named(name), moleShare: share / 100 })),
      verdict.blanket === undefined,
    ),
    contact: (verdict.contact ?? []) as readonly ContactMaterial[],
    extinguishing: (verdict.extinguishing ?? []) as readonly ExtinguishingAgent[],
  };
}
