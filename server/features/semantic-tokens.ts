// Colours by meaning, on top of the grammar's: what a definition gives, what stands for a value, what the catalogue knows,
// which entries their kind takes, which words are units. A word that stands for nothing keeps the grammar's colour, so that
// a misspelt one looks different from one that is understood. Works nothing out.
// Invariant: tokens come in the order of the text, do not overlap, and lie in one line each.
import { findSubstance } from '../core/substance/catalogue.ts';
import type { EvaluatedScenario } from '../scenario/scenario.ts';
import { walkedWords, type WalkedWord } from './token-walk.ts';

/** The order is the protocol's legend. Those that are no standard types are explained in the extension's manifest. */
export const TOKEN_TYPES = [
  'kind',
  'class',
  'variable',
  'substance',
  'property',
  'enumMember',
  'figure',
  'unit',
  'function',
  'findingCode',
] as const;
export type TokenType = (typeof TOKEN_TYPES)[number];

/** `defaultLibrary`: of the catalogue. `acknowledged`: a hazard that its author has accepted. */
export const TOKEN_MODIFIERS = ['declaration', 'readonly', 'defaultLibrary', 'acknowledged'] as const;
export type TokenModifier = (typeof TOKEN_MODIFIERS)[number];

export interface SemanticToken {
  readonly start: number;
  readonly end: number;
  readonly type: TokenType;
  readonly modifiers: readonly TokenModifier[];
}

/** The tokens of one file of the scenario, or of the sections that a stretch of it touches. */
export function semanticTokens(
  scenario: EvaluatedScenario,
  path: string,
  from = 0,
  to = Infinity,
): readonly SemanticToken[] {
  const tree = scenario.files.find((file) => file.path === path)?.tree;
  if (!tree) return [];
  const roleOf = rolesOfNames(scenario);
  return tree.sections.flatMap(({ start, end, section }) => {
    if (end < from || start > to) return [];
    return walkedWords(section).flatMap((word) => {
      const meaning = meaningOf(word, roleOf);
      const { span } = word;
      if (!meaning || /[\r\n]/.test(section.text.slice(span.start, span.end))) return [];
      return [{ start: start + span.start, end: start + span.end, ...meaning }];
    });
  });
}

type TokenMeaning = Pick<SemanticToken, 'type' | 'modifiers'>;
type RoleOf = ReadonlyMap<string, 'definition' | 'value'>;

function rolesOfNames({ files }: EvaluatedScenario): RoleOf {
  const roles = new Map<string, 'definition' | 'value'>();
  for (const { definitions, values } of files) {
    for (const { name } of definitions) roles.set(name, 'definition');
    for (const { name } of values) roles.set(name, 'value');
  }
  return roles;
}

function meaningOf(word: WalkedWord, roleOf: RoleOf): TokenMeaning | null {
  switch (word.role) {
    case 'name':
      return nameMeaning(word, roleOf);
    case 'code':
      return { type: 'findingCode', modifiers: ['acknowledged'] };
    case 'kind':
    case 'figure':
    case 'unit':
    case 'function':
      return { type: word.role, modifiers: [] };
    case 'entry':
      return { type: 'property', modifiers: [] };
    case 'word':
      return { type: 'enumMember', modifiers: [] };
  }
}

function nameMeaning({ word, isGiven }: Extract<WalkedWord, { role: 'name' }>, roleOf: RoleOf): TokenMeaning | null {
  const role = word.phase === undefined ? roleOf.get(word.text) : undefined;
  const given: TokenModifier[] = isGiven ? ['declaration'] : [];
  if (role === 'definition') return { type: 'class', modifiers: given };
  if (role === 'value') return { type: 'variable', modifiers: [...given, 'readonly'] };
  return findSubstance(word.text, word.phase) ? { type: 'substance', modifiers: ['defaultLibrary'] } : null;
}
