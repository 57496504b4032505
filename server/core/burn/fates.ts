// Where the carbon, the alkali and the hydrogen of a charge are in a state: shares of each element's atoms by the kind of
// substance that holds them, in gas and in condensed phases.
// Knows no temperatures and no energies. Invariant: the shares of one element add up to exactly 1 in the order given
// (all are 0 where there is none of it), and every atom is counted in one form only.

import type { CandidateSet } from '../equilibrium/candidates.ts';
import { alkaliMetals } from '../substance/elements.ts';
import type { Formula } from '../substance/formula.ts';
import type { MatterState } from './burn.ts';
import { sharesAddingToOne } from './exact-shares.ts';

/** `soot` is condensed carbon, counted as graphite; `carbonate` in any phase, with hydrogen carbonates and hydrates. */
export type CarbonForm = 'carbon-dioxide' | 'carbonate' | 'carbon-monoxide' | 'hydrocarbon' | 'soot' | 'other';
/**
 * `oxide` with peroxide and superoxide; salts with their acid salts and hydrates; `metal` as a gas is metal vapour, its pairs
 * included; ions are `other`.
 */
export type AlkaliForm = 'hydroxide' | 'carbonate' | 'chloride' | 'sulphate' | 'oxide' | 'metal' | 'other';
/** `water` is free water; that of crystals is `crystal-water`; `hydroxide` is that of metals, hydrated ones apart. */
export type HydrogenForm = 'water' | 'crystal-water' | 'hydroxide' | 'hydrogen' | 'hydrocarbon' | 'other';

export const carbonForms: readonly CarbonForm[] = [
  'carbon-dioxide',
  'carbonate',
  'carbon-monoxide',
  'hydrocarbon',
  'soot',
  'other',
];
export const alkaliForms: readonly AlkaliForm[] = [
  'hydroxide',
  'carbonate',
  'chloride',
  'sulphate',
  'oxide',
  'metal',
  'other',
];
export const hydrogenForms: readonly HydrogenForm[] = [
  'water',
  'crystal-water',
  'hydroxide',
  'hydrogen',
  'hydrocarbon',
  'other',
];

/** Atoms of one element in one form: mol, and shares of all of the element's atoms. */
export interface FateRow<Form extends string> {
  readonly form: Form;
  readonly gasMol: number;
  readonly condensedMol: number;
  readonly gasShare: number;
  readonly condensedShare: number;
}

export interface Fate<Form extends string> {
  readonly element: string;
  readonly totalMol: number;
  /** Every form, also those with nothing in them. Adding gas then condensed row by row gives exactly 1. */
  readonly rows: readonly FateRow<Form>[];
}

/** Undefined where the state has no carbon. */
export function carbonFate(state: MatterState): Fate<CarbonForm> | undefined {
  return fateOf(state, 'C', carbonForms, carbonFormOf);
}

/** One for each alkali metal of the state, in the order of their numbers. */
export function alkaliFates(state: MatterState): readonly Fate<AlkaliForm>[] {
  return alkaliMetals.flatMap((metal) => fateOf(state, metal, alkaliForms, alkaliFormOf) ?? []);
}

/** Undefined where the state has no hydrogen. */
export function hydrogenFate(state: MatterState): Fate<HydrogenForm> | undefined {
  return fateOf(state, 'H', hydrogenForms, hydrogenFormOf);
}

/** Share of a form, gas and condensed together. */
export function shareOfForm<Form extends string>(fate: Fate<Form>, form: Form): number {
  const row = fate.rows.find((one) => one.form === form);
  return row === undefined ? 0 : row.gasShare + row.condensedShare;
}

/** The form in which a substance holds carbon. */
export function carbonFormOf({ composition, charge, phase }: Formula): CarbonForm {
  if (charge !== 0) return 'other';
  const carbon = composition.get('C') ?? 0;
  const oxygen = composition.get('O') ?? 0;
  const hydrogen = composition.get('H') ?? 0;
  const others = composition.size - [carbon, oxygen, hydrogen].filter((atoms) => atoms > 0).length;
  if (others > 0) return isOxySalt(oxygen, 3 * carbon, hydrogen) ? 'carbonate' : 'other';
  if (oxygen === 0 && hydrogen === 0) return phase === 'g' ? 'other' : 'soot';
  if (oxygen === 0) return 'hydrocarbon';
  if (hydrogen > 0 || carbon !== 1) return 'other';
  return oxygen === 2 ? 'carbon-dioxide' : oxygen === 1 ? 'carbon-monoxide' : 'other';
}

/** The form in which a substance holds its alkali. */
export function alkaliFormOf({ composition, charge }: Formula): AlkaliForm {
  if (charge !== 0) return 'other';
  let alkali = 0;
  const rest: string[] = [];
  for (const [symbol, atoms] of composition) {
    if (alkaliMetals.includes(symbol)) alkali += atoms;
    else rest.push(symbol);
  }
  const atoms = (symbol: string): number => composition.get(symbol) ?? 0;
  const oxygen = atoms('O');
  const hydrogen = atoms('H');
  switch (rest.filter((symbol) => symbol !== 'H' && symbol !== 'O').join(' ')) {
    case '':
      if (hydrogen === 0) return oxygen === 0 ? 'metal' : 'oxide';
      return oxygen >= alkali && hydrogen === alkali + 2 * (oxygen - alkali) ? 'hydroxide' : 'other';
    case 'C':
      return isOxySalt(oxygen, 3 * atoms('C'), hydrogen) ? 'carbonate' : 'other';
    case 'Cl':
      return isOxySalt(oxygen, 0, hydrogen) ? 'chloride' : 'other';
    case 'S':
      return isOxySalt(oxygen, 4 * atoms('S'), hydrogen) ? 'sulphate' : 'other';
    default:
      return 'other';
  }
}

/** The oxygen of the acid's group and, beyond it, no more than hydrogen can hold as water of crystallisation. */
function isOxySalt(oxygen: number, oxygenOfGroup: number, hydrogen: number): boolean {
  return oxygen >= oxygenOfGroup && 2 * (oxygen - oxygenOfGroup) <= hydrogen;
}

/** The form in which a substance holds hydrogen. */
export function hydrogenFormOf({ composition, charge, text }: Formula): HydrogenForm {
  if (charge !== 0) return 'other';
  const hydrogen = composition.get('H') ?? 0;
  const oxygen = composition.get('O') ?? 0;
  if (composition.size === 1) return 'hydrogen';
  if (composition.size === 2 && composition.has('C')) return 'hydrocarbon';
  if (composition.size === 2 && oxygen === 1 && hydrogen === 2) return 'water';
  // Each atom in one form: a hydrate's few atoms of hydroxide or acid go with its water.
  if (text.includes('·')) return 'crystal-water';
  const metals = [...composition.keys()].filter((symbol) => symbol !== 'H' && symbol !== 'O');
  const isHydroxide = oxygen > 0 && oxygen === hydrogen && metals.length === 1 && hydroxideMetals.has(metals[0] ?? '');
  return isHydroxide ? 'hydroxide' : 'other';
}

const hydroxideMetals: ReadonlySet<string> = new Set([...alkaliMetals, 'Mg', 'Ca', 'Fe']);

/**
 * The atoms and the place in the table of every phase that holds an element. One candidate set serves a whole path, so
 * this is found once a set; it depends on nothing else.
 */
interface Holder {
  readonly phase: number;
  readonly atoms: number;
  /** Twice the form's place, one more where condensed. */
  readonly slot: number;
}

const holdersOfSets = new WeakMap<CandidateSet, Map<string, readonly Holder[]>>();

function holdersOf<Form extends string>(
  candidates: CandidateSet,
  element: string,
  forms: readonly Form[],
  formOf: (formula: Formula) => Form,
): readonly Holder[] {
  const known = holdersOfSets.get(candidates) ?? new Map<string, readonly Holder[]>();
  holdersOfSets.set(candidates, known);
  let holders = known.get(element);
  if (holders === undefined) {
    holders = candidates.phases.flatMap(({ formula }, phase): Holder[] => {
      const atoms = formula.composition.get(element) ?? 0;
      return atoms === 0
        ? []
        : [{ phase, atoms, slot: 2 * forms.indexOf(formOf(formula)) + (formula.phase === 'g' ? 0 : 1) }];
    });
    known.set(element, holders);
  }
  return holders;
}

function fateOf<Form extends string>(
  state: MatterState,
  element: string,
  forms: readonly Form[],
  formOf: (formula: Formula) => Form,
): Fate<Form> | undefined {
  const mol = new Array<number>(2 * forms.length).fill(0);
  for (const { phase, atoms, slot } of holdersOf(state.candidates, element, forms, formOf)) {
    mol[slot] = (mol[slot] ?? 0) + atoms * (state.amountsMol[phase] ?? 0);
  }
  const totalMol = mol.reduce((sum, one) => sum + one, 0);
  if (!(totalMol > 0)) return undefined;
  const shares = sharesAddingToOne(mol);
  const rows = forms.map((form, index) => ({
    form,
    gasMol: mol[2 * index] ?? 0,
    condensedMol: mol[2 * index + 1] ?? 0,
    gasShare: shares[2 * index] ?? 0,
    condensedShare: shares[2 * index + 1] ?? 0,
  }));
  return { element, totalMol, rows };
}
