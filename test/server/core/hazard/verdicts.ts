// The table of blends and states with the verdict a practitioner would give: every code a row earns with its severity, and
// why. `harmless` marks a look-alike: it earns nothing beyond what a portion earns alone.
// Shares are by mass unless said; a gas over the blend is by mole. Without a blanket there is air; without a state, 25 °C
// and 1 bar. Provenance: common practice, written down before any rule was.

import type { HazardSeverity } from '../../../../server/core/hazard/hazard-codes.ts';
import gasesContactsAndOxidants from './verdicts/gases-contacts-and-oxidants.json' with { type: 'json' };
import hydridesAndMetals from './verdicts/hydrides-and-metals.json' with { type: 'json' };
import otherAlkaliMetals from './verdicts/other-alkali-metals.json' with { type: 'json' };
import oxidisersAcidsAndBases from './verdicts/oxidisers-acids-and-bases.json' with { type: 'json' };
import secondLookOnFuels from './verdicts/second-look-on-fuels.json' with { type: 'json' };
import secondLookOnMetals from './verdicts/second-look-on-metals.json' with { type: 'json' };
import sodium from './verdicts/sodium.json' with { type: 'json' };
import vapoursAndUllage from './verdicts/vapours-and-ullage.json' with { type: 'json' };

type Percent = Readonly<Record<string, number>>;

export interface Verdict {
  readonly kind?: 'oxidant';
  readonly basis?: 'mole';
  readonly percent: Percent;
  readonly celsius?: number;
  readonly bar?: number;
  readonly blanket?: Percent;
  /** What the walls, pipes and seals are of. */
  readonly contact?: readonly string[];
  /** What is kept ready to put its fire out. */
  readonly extinguishing?: readonly string[];
  readonly earns: Readonly<Record<string, HazardSeverity>>;
  readonly harmless?: true;
  readonly because: string;
}

export const verdicts = [
  ...sodium,
  ...otherAlkaliMetals,
  ...hydridesAndMetals,
  ...oxidisersAcidsAndBases,
  ...vapoursAndUllage,
  ...gasesContactsAndOxidants,
  ...secondLookOnMetals,
  ...secondLookOnFuels,
] as unknown as readonly Verdict[];

/** `sodium 30, gas_oil 70 · 25 °C · under argon`: unique over the table. */
export function titleOf(verdict: Verdict): string {
  const words = (percent: Percent): string =>
    Object.entries(percent)
      .map(([name, share]) => `${name} ${String(share)}`)
      .join(', ');
  return [
    `${verdict.kind ?? ''} ${verdict.basis ?? ''} ${words(verdict.percent)}`.trim(),
    `${String(verdict.celsius ?? 25)} °C`,
    ...(verdict.bar === undefined ? [] : [`${String(verdict.bar)} bar`]),
    ...(verdict.blanket === undefined ? [] : [`under ${words(verdict.blanket)}`]),
    ...(verdict.contact === undefined ? [] : [`in ${verdict.contact.join(', ')}`]),
    ...(verdict.extinguishing === undefined ? [] : [`${verdict.extinguishing.join(', ')} at hand`]),
  ].join(' · ');
}
