// The syntax tree of a scenario file: what was written, and where; nothing about what it means.
// A file is cut into sections (one top-level statement or one definition each), and every position inside a section
// is an offset from that section's own start, so that a section whose text is unchanged can be kept as it is.
// Parts that may be missing in a broken text are optional in the types. Invariant: any text gives a tree.

/** A half-open range of UTF-16 offsets, relative to the start of the section it belongs to. */
export interface Span {
  readonly start: number;
  readonly end: number;
}

/** A whole file: its sections in order. Leading blank lines and comments stand between sections and belong to none. */
export interface SyntaxTree {
  readonly text: string;
  readonly sections: readonly PlacedSection[];
  /** Problems of the file as a whole (too large); their spans are offsets in the file. */
  readonly fileProblems: readonly Problem[];
  /** More syntax problems were found than are shown (see `MOST_PROBLEMS` in parse.ts). */
  readonly truncated: boolean;
}

/** Where a section stands in the file. Only this record changes when text above the section is edited. */
export interface PlacedSection {
  readonly start: number;
  readonly end: number;
  readonly section: Section;
}

/** One parsed statement or definition; a pure function of its own text (and of the set of unit words). */
export interface Section {
  readonly text: string;
  /** The `##` comment lines right above a definition, joined, without their marks. */
  readonly doc: string;
  readonly statement: Statement;
  readonly problems: readonly Problem[];
}

/** A syntax problem with everything its message needs; the words themselves are in messages.ts. */
export interface Problem {
  readonly code: 'syntax/unexpected' | 'syntax/missing' | 'syntax/unclosed' | 'syntax/too-deep' | 'syntax/too-large';
  readonly span: Span;
  readonly message: string;
  /** A mechanical mend, where there is one. */
  readonly fix?: { readonly title: string; readonly span: Span; readonly newText: string };
}

export type Statement = TitleStatement | UseStatement | LetStatement | ExpectStatement | Definition | BrokenStatement;

/** `scenario "title"` */
export interface TitleStatement {
  readonly kind: 'title';
  readonly span: Span;
  readonly keyword: Span;
  readonly title?: TextLiteral;
}

/** `use "path"` */
export interface UseStatement {
  readonly kind: 'use';
  readonly span: Span;
  readonly keyword: Span;
  readonly path?: TextLiteral;
}

/** `let name = expression` */
export interface LetStatement {
  readonly kind: 'let';
  readonly span: Span;
  readonly keyword: Span;
  readonly name?: Word;
  readonly value?: Expression;
}

/** `expect claim` */
export interface ExpectStatement {
  readonly kind: 'expect';
  readonly span: Span;
  readonly keyword: Span;
  readonly claim?: Expression;
}

/** `kind name { lines }` */
export interface Definition {
  readonly kind: 'definition';
  /** From the kind word to the closing brace (or to where the definition ends without one). */
  readonly span: Span;
  /** The kind word as written; whether such a kind exists is not the grammar's business. */
  readonly keyword: Word;
  readonly name?: Word;
  /** From the kind word to the opening brace, for findings that speak of the whole definition. */
  readonly header: Span;
  readonly lines: readonly Line[];
  readonly closed: boolean;
}

/** A stretch that is no statement; its problems are in the section. */
export interface BrokenStatement {
  readonly kind: 'broken';
  readonly span: Span;
  /** The name it would have given, so that whoever uses that name can stay silent (`slurry {` without its kind). */
  readonly name?: Word;
}

export type Line = Entry | Portion | Equation | Acknowledge | BrokenLine;

/** `words: phrase, phrase` */
export interface Entry {
  readonly kind: 'entry';
  readonly span: Span;
  /** The entry's words joined by single spaces, as written (`lower heating value`, `by-product`). */
  readonly words: string;
  readonly wordsSpan: Span;
  /** Empty when nothing stands behind the colon. */
  readonly phrases: readonly Phrase[];
}

/** `amount [mass|mole|volume] substance` or `rest substance` */
export interface Portion {
  readonly kind: 'portion';
  readonly span: Span;
  /** `rest`, or the amount: a quantity as a rule, any expression in brackets. */
  readonly amount: Expression | RestAmount;
  readonly basis?: { readonly basis: 'mass' | 'mole' | 'volume'; readonly span: Span };
  readonly substance?: Word;
}

export interface RestAmount {
  readonly kind: 'rest';
  readonly span: Span;
}

/** `terms -> terms` */
export interface Equation {
  readonly kind: 'equation';
  readonly span: Span;
  readonly left: readonly Term[];
  readonly right: readonly Term[];
  readonly arrow: Span;
}

/** `2 Na(cr)`: a coefficient (1 when not written) and a species. */
export interface Term {
  readonly span: Span;
  readonly coefficient?: NumberLiteral;
  readonly species: Word;
}

/** `acknowledge code: "reason"` */
export interface Acknowledge {
  readonly kind: 'acknowledge';
  readonly span: Span;
  readonly keyword: Span;
  readonly code?: { readonly text: string; readonly span: Span };
  readonly reason?: TextLiteral;
}

export interface BrokenLine {
  readonly kind: 'broken-line';
  readonly span: Span;
  /** The words of an entry whose value cannot be read, so that it is not called missing as well. */
  readonly words?: string;
  readonly wordsSpan?: Span;
}

/** One comma-separated part of an entry's value: a flat run of operands and connectives. */
export interface Phrase {
  readonly span: Span;
  readonly items: readonly PhraseItem[];
}

export type PhraseItem = Connective | Expression;

/**
 * `at`, `on`, `from`, `to`, `between`, `and`, `until`, `within`, `by`, `per`, `of` and `in` where they are no part of an
 * operand (`14 % of fuel energy`), and `mass mole volume` behind an amount.
 */
export interface Connective {
  readonly kind: 'connective';
  readonly word: string;
  readonly span: Span;
}

/**
 * An expression. In an entry's phrase neighbouring operands stay separate items (`pressure 120 bar` is a word and a
 * quantity); operators join operands into one expression.
 */
export type Expression =
  | Quantity
  | Word
  | TextLiteral
  | Reference
  | Membership
  | Call
  | Bracket
  | Unary
  | Binary
  | Comparison
  | Within
  | LoneUnit;

/**
 * A number with its ± and unit. In `44.0 ± 0.2 MJ/kg` the unit is the quantity's and the uncertainty has none of its own;
 * in `44 MJ/kg ± 2 %` each has its own.
 */
export interface Quantity {
  readonly kind: 'quantity';
  readonly span: Span;
  readonly number: NumberLiteral;
  readonly unit?: UnitWords;
  readonly uncertainty?: Uncertainty;
}

/** The number's value: `6.4`, `-20`, `1/2`, `1e-3`. `value` is finite; an unreadable number is a problem and no node. */
export interface NumberLiteral {
  readonly span: Span;
  readonly value: number;
  /** Numerator and denominator when written as a fraction of two whole numbers (exact balancing needs it). */
  readonly fraction?: readonly [number, number];
}

export interface Uncertainty {
  readonly span: Span;
  readonly number: NumberLiteral;
  readonly unit?: UnitWords;
}

/**
 * The unit as separate tokens, in the order written: words with their powers and the marks between them. The scenario
 * reads them (and may give the last word back to the substance it really is).
 */
export interface UnitWords {
  readonly span: Span;
  readonly tokens: readonly UnitToken[];
}

export interface UnitToken {
  /** `word` = a unit word without its power; `times` = a space, `*` or `·`; `over` = `/` or `per`; brackets group. */
  readonly kind: 'word' | 'times' | 'over' | 'open' | 'close';
  readonly text: string;
  /** Whole-number power written on a word or behind a bracket (`m3`, `m^3`, `s^-2`); 1 when none is written. */
  readonly power: number;
  readonly span: Span;
}

/** A unit standing without a number (`0.45 kg tank per kg slurry`: the second `kg`). */
export interface LoneUnit {
  readonly kind: 'lone-unit';
  readonly span: Span;
  readonly unit: UnitWords;
}

/**
 * One name, formula or listed word. `main`, `'sodium oleate'`, `Na2CO3`, `K(l)`, `D`, `CO3--`: which of these it is
 * stays open unless the form decides (`quoted`, `formula`); position and the kind's table decide the rest.
 */
export interface Word {
  readonly kind: 'word';
  readonly span: Span;
  /** Without quotes and without the phase; hyphens kept for listed words. Formula text as written. */
  readonly text: string;
  readonly form: 'name' | 'quoted' | 'formula' | 'open';
  /** `(g) (l) (cr) (aq)` attached to a formula. */
  readonly phase?: 'g' | 'l' | 'cr' | 'aq';
}

/** `"text"`, without its quotes. */
export interface TextLiteral {
  readonly kind: 'text';
  readonly span: Span;
  readonly value: string;
  readonly closed: boolean;
}

/**
 * `lower heating value of slurry`, `flame temperature of burn_1 at 900 degC`, and a table row:
 * `mass share of Na2CO3(l) in test_combustor at 350 degC` (then `row` is the substance, `name` the definition).
 */
export interface Reference {
  readonly kind: 'reference';
  readonly span: Span;
  /** The words before `of`, joined by single spaces. */
  readonly words: string;
  readonly wordsSpan: Span;
  readonly row?: Word;
  readonly name?: Word;
  readonly at?: Expression;
}

/** `sodium in slurry`, with `by mole` or `by volume` where written: a portion's share. */
export interface Membership {
  readonly kind: 'membership';
  readonly span: Span;
  readonly substance: Word;
  readonly name?: Word;
  readonly basis?: { readonly basis: 'mass' | 'mole' | 'volume'; readonly span: Span };
}

/** `min(3 kW, rated power of main)`, `molar_mass(Na2CO3)` */
export interface Call {
  readonly kind: 'call';
  readonly span: Span;
  readonly name: { readonly text: string; readonly span: Span };
  readonly arguments: readonly Expression[];
}

export interface Bracket {
  readonly kind: 'bracket';
  readonly span: Span;
  readonly inner?: Expression;
}

export interface Unary {
  readonly kind: 'unary';
  readonly span: Span;
  readonly operator: '-';
  readonly operand: Expression;
}

export interface Binary {
  readonly kind: 'binary';
  readonly span: Span;
  readonly operator: '+' | '-' | '*' | '/' | '^';
  readonly operatorSpan: Span;
  readonly left: Expression;
  readonly right: Expression;
}

/** Only in `expect` and `until`. */
export interface Comparison {
  readonly kind: 'comparison';
  readonly span: Span;
  readonly operator: '<' | '<=' | '>' | '>=' | '=';
  readonly operatorSpan: Span;
  readonly left: Expression;
  readonly right: Expression;
}

/** `left within target ± tolerance`; only in `expect` and `until`. */
export interface Within {
  readonly kind: 'within';
  readonly span: Span;
  readonly left: Expression;
  readonly target: Quantity | Expression;
  /** The tolerance written with ±; never an uncertainty here. */
  readonly tolerance?: Uncertainty;
}
