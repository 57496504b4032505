// The words the grammar itself knows: reserved words, definition kinds, bases of a share and phases.
// Each is listed once, here; the lexer's retagging, the syntax colouring and completion all read these lists.
// What an entry or a function is called is not known here: those words belong to the tables of the kinds.
// Invariant: no word stands in both RESERVED_WORDS and KIND_WORDS, so a kind's word may still be a name's part.

/** Words that start a statement at the top level, and end whatever is open when they start a line. */
export const STATEMENT_WORDS = ['scenario', 'use', 'let', 'expect'] as const;
export type StatementWord = (typeof STATEMENT_WORDS)[number];

/** Words that stand between the operands of a phrase. */
export const CONNECTIVE_WORDS = [
  'per',
  'of',
  'in',
  'at',
  'on',
  'from',
  'to',
  'between',
  'and',
  'until',
  'within',
  'by',
] as const;

/** Every word that cannot be a name; all of them may stand in the words of an entry. */
export const RESERVED_WORDS: readonly string[] = [...STATEMENT_WORDS, 'acknowledge', 'rest', ...CONNECTIVE_WORDS];

/** The kinds of definition: special at the start of a header only. */
export const KIND_WORDS: readonly string[] = [
  'substance',
  'blend',
  'oxidant',
  'reaction',
  'burn',
  'engine',
  'duty',
  'service',
  'supply',
  'sea',
  'space',
  'site',
  'account',
  'fleet',
  'sweep',
  'find',
  'compare',
];

/** What a share is counted by; special only behind an amount and behind `by`. */
export const BASIS_WORDS = ['mass', 'mole', 'volume'] as const;
export type BasisWord = (typeof BASIS_WORDS)[number];

/** Phases that may be attached to a formula in round brackets. */
export const PHASE_WORDS = ['g', 'l', 'cr', 'aq'] as const;
export type PhaseWord = (typeof PHASE_WORDS)[number];

const reserved: ReadonlySet<string> = new Set(RESERVED_WORDS);
const kinds: ReadonlySet<string> = new Set(KIND_WORDS);

export const isReservedWord = (word: string): boolean => reserved.has(word);
export const isKindWord = (word: string): boolean => kinds.has(word);

export const asStatementWord = (word: string): StatementWord | undefined =>
  STATEMENT_WORDS.find((statementWord) => statementWord === word);
export const asBasisWord = (word: string): BasisWord | undefined => BASIS_WORDS.find((basis) => basis === word);
export const asPhaseWord = (word: string): PhaseWord | undefined => PHASE_WORDS.find((phase) => phase === word);
