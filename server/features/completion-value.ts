// The offers inside a value, a portion, an equation or an expression: by what the place takes (the entry's row, a share, a
// figure's unit on the other side of a claim) and by what stands right before the cursor. Decides only; the offers are made
// in the files of their kind. Invariant: a unit is offered behind a number only, and only one that measures what the place
// asks for, where it asks for something.
import { Comma, Compare, WordToken, type Token } from '../../grammar/tokens.ts';
import { BASIS_WORDS, CONNECTIVE_WORDS } from '../../grammar/words.ts';
import { functions } from '../scenario/functions.ts';
import { kindOf } from '../scenario/kinds/registry.ts';
import type { EvaluatedScenario } from '../scenario/scenario.ts';
import type { Behind } from './completion-behind.ts';
import { functionItems } from './completion-functions.ts';
import type { CompletionItem } from './completion-item.ts';
import {
  definitionItems,
  figureItems,
  figureWordItems,
  isGivenFigure,
  isMaterialFigure,
  mayHaveFigure,
  rowItems,
  shareDetail,
  shareItems,
  unitOfFigure,
  valueItems,
} from './completion-names.ts';
import type { CompletionPlace, Where } from './completion-place.ts';
import { elementItems, substanceItems, substancesWith } from './completion-substances.ts';
import { toleranceOf, unitItems, wantedOf, type Wanted } from './completion-units.ts';
import { entryRow, wordsTaken, type WordsTaken } from './entry-rows.ts';

type ValueWhere = Exclude<Where, { kind: 'top' | 'line' }>;

/** Figures and shares written out with their names are no more than these; what is typed brings the others. */
const MOST_WRITTEN_OUT = 200;

export function valueOffers(
  scenario: EvaluatedScenario,
  place: CompletionPlace,
  where: ValueWhere,
): readonly CompletionItem[] {
  const { fragment, behind } = place;
  const { start, text: typed } = fragment;
  const wanted = wantedAt(scenario, place, where);
  const taken = takenAt(where);
  const own = where.kind === 'expression' ? where.name : where.body.name;

  const numbers = (from: number, words: string): CompletionItem[] => [
    ...(from === start ? valueItems(scenario, wanted, own, start) : []),
    ...figureItems(scenario, words, from, MOST_WRITTEN_OUT),
    ...figureWordItems(scenario, from),
    ...(from === start ? [...shareItems(scenario, words, from, MOST_WRITTEN_OUT), ...functionItems(start)] : []),
  ];
  const materials = (form: 'names' | 'formulas'): CompletionItem[] => [
    ...definitionItems(scenario, ({ kind }) => taken.kinds.includes(kind), own, start),
    ...substanceItems(form, typed, start),
  ];

  switch (behind.kind) {
    case 'start':
      if (where.kind === 'equation') return materials('formulas');
      if (functions.get(behind.call ?? '')?.takes === 'substance') return materials('names');
      return [
        ...listedItems(taken.listed, start),
        ...(taken.materials ? materials('names') : []),
        ...(taken.formulas ? substanceItems('formulas', typed, start) : []),
        ...(taken.anything ? definitionItems(scenario, () => true, own, start) : []),
        ...(taken.anything && typed !== '' ? substanceItems('names', typed, start) : []),
        ...(taken.numbers ? numbers(start, typed) : []),
      ];
    case 'number': {
      const unit = unitItems(behind.tolerance ? wanted.flatMap(toleranceOf) : wanted, place.run, behind.start);
      return where.kind === 'portion' && behind.start === start ? [...unit, ...basisItems(start, true)] : unit;
    }
    case 'amount':
      if (where.kind === 'portion') return [...basisItems(start, true), ...materials('names')];
      if (taken.elements) return [...elementItems(typed, start), ...basisItems(start, true)];
      return connectiveItems(where.kind === 'expression' ? behindOperand(where, behind) : connectivesAt(where), start);
    case 'basis':
      return taken.elements ? elementItems(typed, start) : materials('names');
    case 'rest':
      return materials('names');
    case 'per':
      return unitItems([], typed, start);
    case 'word': {
      const isFigure = taken.numbers && taken.listed.length === 0 && behind.start !== undefined;
      const figures = isFigure ? numbers(behind.start, place.run) : [];
      return [...figures, ...connectiveItems(connectivesAt(where), start)];
    }
    case 'of':
      return [
        ...rowItems(scenario, behind.words, start),
        ...definitionItems(scenario, ({ kind }) => !kindOf(kind)?.evaluated, own, start).map((item) => ({
          ...item,
          rank: item.rank + 50,
        })),
        ...definitionItems(scenario, (definition) => mayHaveFigure(definition, behind.words), own, start),
        ...(isMaterialFigure(behind.words) ? substanceItems('names', typed, start) : []),
        ...(isGivenFigure(behind.words)
          ? substanceItems('names', typed, start, substancesWith(behind.words.replaceAll(' ', '-')))
          : []),
      ];
    case 'in':
      return ownersOf(scenario, behind, own, start);
    case 'by':
      return basisItems(start, false);
    case 'connective':
      return taken.anything ? definitionItems(scenario, () => true, own, start) : [];
    case 'closed':
      return [];
  }
}

/** What the words of a place may be. `anything`: nobody reads it yet, so it may name any definition. */
export function takenAt(where: ValueWhere): WordsTaken & { readonly anything: boolean } {
  const kinds = ['substance', 'blend'];
  const nothing = {
    listed: [],
    materials: false,
    kinds,
    elements: false,
    formulas: false,
    numbers: true,
    anything: false,
  };
  if (where.kind !== 'entry') return { ...nothing, materials: where.kind === 'equation' };
  const row = entryRow(where.body.kind, where.entry);
  return row ? { ...wordsTaken(row.reader), anything: false } : { ...nothing, anything: true };
}

/** What a number at the place must measure, likeliest first; empty where anything may stand. */
function wantedAt(scenario: EvaluatedScenario, { before }: CompletionPlace, where: ValueWhere): readonly Wanted[] {
  switch (where.kind) {
    case 'entry': {
      const reader = entryRow(where.body.kind, where.entry)?.reader;
      if (reader?.unit === undefined) return [];
      const phrase = before.slice(before.findLastIndex(({ tokenType }) => tokenType === Comma) + 1);
      const connective = phrase.findLast(({ image }) => reader.connectives?.[image] !== undefined);
      const behindConnective = connective && reader.connectives?.[connective.image];
      if (behindConnective !== undefined) return [wantedOf(behindConnective)];
      const others = reader.otherUnits ?? [];
      // The second phrase of a state is its pressure as a rule.
      const isFirst = phrase.length === before.length;
      return (isFirst ? [reader.unit, ...others] : [...others, reader.unit]).map(wantedOf);
    }
    case 'portion':
      return ['%', 'kg', 'mol', 'm3'].map(wantedOf);
    case 'expression':
      return where.claim ? wantedByClaim(scenario, before) : [];
    case 'equation':
      return [];
  }
}

/** The other side of a claim is measured as its left side is. */
function wantedByClaim(scenario: EvaluatedScenario, before: readonly Token[]): readonly Wanted[] {
  const sign = before.findIndex(
    ({ tokenType, image }) => tokenType === Compare || (tokenType === WordToken && image === 'within'),
  );
  const left = before.slice(before[0]?.image === 'expect' ? 1 : 0, Math.max(0, sign));
  const of = left.findIndex(({ image }) => image === 'of');
  if (of > 0) {
    const unit = unitOfFigure(
      left
        .slice(0, of)
        .map(({ image }) => image)
        .join(' '),
    );
    return unit === null ? [] : [wantedOf(unit === '1' ? '%' : unit)];
  }
  if (left.some(({ image }) => image === 'in')) return [wantedOf('%')];
  const [only, ...others] = left;
  const value = scenario.files.flatMap(({ values }) => values).find(({ name }) => name === only?.image);
  return value?.quantity && others.length === 0 ? [value.quantity] : [];
}

function ownersOf(
  scenario: EvaluatedScenario,
  { substance, table }: Extract<Behind, { kind: 'in' }>,
  own: string,
  start: number,
): CompletionItem[] {
  const blends = definitionItems(
    scenario,
    ({ kind }) => table || kind === 'blend',
    own,
    start,
    (definition) => shareDetail(definition, substance),
  );
  // Those that hold the substance tell its share; the others come behind them.
  return blends.map((item) => (/%|share/.test(item.detail) ? item : { ...item, rank: item.rank + 50 }));
}

function listedItems(words: readonly string[], start: number): CompletionItem[] {
  return words.map((word, rank) => ({ label: word, role: 'word', detail: '', insert: word, start, rank }));
}

function basisItems(start: number, continues: boolean): CompletionItem[] {
  return BASIS_WORDS.map((word, rank) => ({
    label: word,
    role: 'keyword',
    detail: `share by ${word}`,
    insert: continues ? `${word} ` : word,
    continues,
    start,
    rank: 60 + rank,
  }));
}

function connectiveItems(words: readonly string[], start: number): CompletionItem[] {
  return words.map((word, index) => ({
    label: word,
    role: 'keyword',
    detail: '',
    insert: word,
    start,
    rank: 90 + index,
  }));
}

/** Behind a whole operand of an expression. */
function behindOperand(
  { claim }: Extract<Where, { kind: 'expression' }>,
  { share }: Extract<Behind, { kind: 'amount' }>,
): readonly string[] {
  return [...(share ? ['by'] : []), ...(claim ? ['within'] : [])];
}

function connectivesAt(where: ValueWhere): readonly string[] {
  if (where.kind === 'expression') return where.claim ? ['of', 'in', 'within'] : ['of', 'in'];
  if (where.kind !== 'entry') return [];
  const row = entryRow(where.body.kind, where.entry);
  return row ? Object.keys(row.reader.connectives ?? {}) : CONNECTIVE_WORDS;
}
