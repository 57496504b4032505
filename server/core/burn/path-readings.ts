// What a cooling path tells at a glance: dew points of what condenses, between which temperatures molten salt makes deposits
// stick, and how much of the carbon would end as carbonate if the gas froze at each temperature.
// Knows no solver. Invariant: read off the path's own events and states; nothing is interpolated. Salts are pure phases here,
// so a real deposit, a mixed melt, begins to stick somewhat lower and stays sticky longer than this says.

import type { BurnState, CoolingPath, MatterState } from './burn.ts';
import { alkaliFormOf, carbonFate, shareOfForm } from './fates.ts';
import type { AlkaliForm } from './fates.ts';
import { alkaliMetals } from '../substance/elements.ts';

/** The first condensed phase of a formula on the way down. */
export interface DewPoint {
  /** `Na2CO3`, whatever its phase. */
  readonly formula: string;
  /** Index into the path's candidates of the phase that comes first. */
  readonly phase: number;
  readonly substance: AlkaliForm | 'water' | 'soot' | 'other-condensed';
  /** Null where it is there already in the path's first state. */
  readonly temperatureK: number | null;
}

/** Each formula that condenses, in the order of falling temperature. */
export function dewPoints(path: CoolingPath): readonly DewPoint[] {
  const found = new Map<string, DewPoint>();
  const note = (phase: number, temperatureK: number | null): void => {
    const formula = path.candidates.phases[phase]?.formula;
    if (formula === undefined || found.has(formula.text)) return;
    found.set(formula.text, { formula: formula.text, phase, substance: substanceOf(path, phase), temperatureK });
  };
  for (const phase of path.presentAtStart) note(phase, null);
  for (const event of path.events) if (event.kind === 'appears') note(event.phase, event.temperatureK);
  return [...found.values()];
}

function substanceOf({ candidates }: CoolingPath, phase: number): DewPoint['substance'] {
  const formula = candidates.phases[phase]?.formula;
  if (formula === undefined) return 'other-condensed';
  if (formula.text === 'H2O') return 'water';
  if (formula.text === 'C') return 'soot';
  const isAlkali = [...formula.composition.keys()].some((symbol) => alkaliMetals.includes(symbol));
  return isAlkali ? alkaliFormOf(formula) : 'other-condensed';
}

/** A stretch of temperatures; `fromK` null where it begins above the path, `toK` where it goes on below it. */
export interface StickyRange {
  readonly fromK: number | null;
  readonly toK: number | null;
}

/** Where liquid other than water is among what is condensed, from the hottest stretch down. */
export function stickyRanges(path: CoolingPath): readonly StickyRange[] {
  const molten = new Set(path.presentAtStart.filter((phase) => isMelt(path, phase)));
  const ranges: StickyRange[] = [];
  let fromK: number | null = null;
  for (const { kind, phase, temperatureK } of path.events) {
    if (!isMelt(path, phase)) continue;
    const was = molten.size;
    if (kind === 'appears') molten.add(phase);
    else molten.delete(phase);
    if (was === 0 && molten.size > 0) fromK = temperatureK;
    if (was > 0 && molten.size === 0) {
      ranges.push({ fromK, toK: temperatureK });
      fromK = null;
    }
  }
  return molten.size > 0 ? [...ranges, { fromK, toK: null }] : ranges;
}

/** Mass of liquid other than water over the mass of all that is condensed; 0 where nothing is. */
export function meltShare({ candidates, amountsMol, massKg, condensedMassShare }: MatterState): number {
  const condensedKg = massKg * condensedMassShare;
  if (!(condensedKg > 0)) return 0;
  let meltKg = 0;
  candidates.phases.forEach(({ formula }, phase) => {
    if (formula.phase !== 'l' || formula.text === 'H2O') return;
    meltKg += (amountsMol[phase] ?? 0) * (candidates.molarMassKgPerMol[phase] ?? 0);
  });
  return meltKg / condensedKg;
}

function isMelt({ candidates }: CoolingPath, phase: number): boolean {
  const formula = candidates.phases[phase]?.formula;
  return formula?.phase === 'l' && formula.text !== 'H2O';
}

/** If the gas froze at a temperature, which share of all carbon would leave as carbonate and which as carbon dioxide. */
export interface CarbonAtFreezing {
  readonly temperatureK: number;
  readonly carbonateShare: number;
  readonly carbonDioxideShare: number;
}

/** For each live state of the path; a state that is frozen itself repeats where it froze, and is left out. */
export function carbonAgainstFreezing(path: CoolingPath): readonly CarbonAtFreezing[] {
  return path.states.flatMap((state): CarbonAtFreezing[] => {
    const fate = isLive(state) ? carbonFate(state) : undefined;
    if (fate === undefined || !isLive(state)) return [];
    return [
      {
        temperatureK: state.temperatureK,
        carbonateShare: shareOfForm(fate, 'carbonate'),
        carbonDioxideShare: shareOfForm(fate, 'carbon-dioxide'),
      },
    ];
  });
}

function isLive(state: CoolingPath['states'][number]): state is Extract<BurnState, { kind: 'equilibrium' }> {
  return state.kind === 'equilibrium';
}
