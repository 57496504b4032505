// The grammar of what stands in a line, from retagged tokens straight to tree nodes. One rule call reads one line's
// value, portion, equation or expression; it knows no lines, headers or entry names. It recovers nothing itself: the
// first token that does not fit ends the call, and the caller gives up that line only. One instance serves all calls.
// Precedence, tightest first: literal with sign, unit and ±; call, bracket, reference; `^`; minus; `* /`; `+ -`;
// comparison and `within`. Invariant: chains are read by loops, so only brackets can nest the parser's own calls.
import { EmbeddedActionsParser } from 'chevrotain';
import {
  basisNode,
  binaryNode,
  comparisonNode,
  connectiveNode,
  phraseNode,
  powerNode,
  quantityNode,
  referenceNode,
  unaryNode,
} from './expressions.ts';
import { numberLiteral, spanBetween, spanOf, textNode, unitNode, wordNode } from './nodes.ts';
import * as t from './tokens.ts';
import type { Token } from './tokens.ts';
import type {
  Expression,
  Phrase,
  PhraseItem,
  Portion,
  Reference,
  RestAmount,
  Term,
  Uncertainty,
  Word,
} from './tree.ts';

/** The sides of an equation and the arrow between them. */
export interface EquationSides {
  readonly left: readonly Term[];
  readonly right: readonly Term[];
  readonly arrow: Token;
}

/** Why a line could not be read: the token that does not fit (absent at the line's end) and the one before it. */
export interface Mismatch {
  readonly actual?: Token;
  readonly previous?: Token;
}

export type Outcome<Node> =
  { readonly node: Node; readonly mismatch?: never } | { readonly node?: never; readonly mismatch: Mismatch };

type PortionParts = Pick<Portion, 'amount' | 'basis' | 'substance'>;

export const parsePhrases = (tokens: Token[]): Outcome<Phrase[]> => run(tokens, () => parser.value());
export const parseExpression = (tokens: Token[]): Outcome<Expression> => run(tokens, () => parser.claim());
export const parsePortion = (tokens: Token[]): Outcome<PortionParts> => run(tokens, () => parser.portion());
export const parseEquation = (tokens: Token[]): Outcome<EquationSides> => run(tokens, () => parser.equation());

function run<Node>(tokens: Token[], rule: () => Node): Outcome<Node> {
  parser.input = tokens;
  const node = rule();
  const error = parser.errors[0];
  parser.input = [];
  if (error === undefined) return { node };
  const index = tokens.indexOf(error.token);
  const previous = index < 0 ? tokens.at(-1) : tokens[index - 1];
  return {
    mismatch: { ...(index < 0 ? {} : { actual: error.token }), ...(previous === undefined ? {} : { previous }) },
  };
}

/** The grammar is checked for ambiguities by a test, and not again whenever a program starts. */
export class LineParser extends EmbeddedActionsParser {
  constructor(skipValidations = true) {
    // Our own words come from messages.ts, so the library need not compose any.
    const silent = { buildMismatchTokenMessage: noWords, buildNotAllInputParsedMessage: noWords };
    const errorMessageProvider = { ...silent, buildNoViableAltMessage: noWords, buildEarlyExitMessage: noWords };
    super(t.parserTypes, { recoveryEnabled: false, maxLookahead: 2, errorMessageProvider, skipValidations });
    this.performSelfAnalysis();
  }

  /** `phrase, phrase` */
  readonly value = this.RULE('value', (): Phrase[] => {
    const phrases: Phrase[] = [];
    this.AT_LEAST_ONE_SEP({ SEP: t.Comma, DEF: () => phrases.push(this.SUBRULE(this.phrase)) });
    return phrases;
  });

  readonly phrase = this.RULE('phrase', (): Phrase => {
    const items: PhraseItem[] = [];
    this.AT_LEAST_ONE(() => {
      this.OR([
        { ALT: () => items.push(connectiveNode(this.CONSUME(t.ConnectiveToken))) },
        { ALT: () => items.push(connectiveNode(this.CONSUME(t.Basis))) },
        { ALT: () => items.push(this.SUBRULE(this.claim)) },
      ]);
    });
    return this.ACTION(() => phraseNode(items));
  });

  /** `amount [basis] substance`, `rest substance` */
  readonly portion = this.RULE('portion', (): PortionParts => {
    const amount = this.OR<Expression | RestAmount>([
      { ALT: (): RestAmount => ({ kind: 'rest', span: spanOf(this.CONSUME(t.Rest)) }) },
      { ALT: () => this.SUBRULE(this.quantity) },
      { ALT: () => this.SUBRULE(this.bracket) },
      { ALT: () => this.SUBRULE(this.call) },
    ]);
    const basisToken = this.OPTION(() => this.CONSUME(t.Basis));
    const substance = this.OR1([
      { ALT: () => wordNode(this.CONSUME(t.SubstanceToken)) },
      { ALT: () => wordNode(this.CONSUME(t.Formula)) },
      { ALT: () => wordNode(this.CONSUME(t.QuotedName)) },
    ]);
    return basisToken === undefined
      ? { amount, substance }
      : { amount, basis: this.ACTION(() => basisNode(basisToken)), substance };
  });

  /** `terms -> terms` */
  readonly equation = this.RULE('equation', (): EquationSides => {
    const left = this.SUBRULE(this.terms);
    const arrow = this.CONSUME(t.Arrow);
    const right = this.SUBRULE1(this.terms);
    return { left, right, arrow };
  });

  private readonly terms = this.RULE('terms', (): Term[] => {
    const terms: Term[] = [];
    this.AT_LEAST_ONE_SEP({ SEP: t.Plus, DEF: () => terms.push(this.SUBRULE(this.term)) });
    return terms;
  });

  private readonly term = this.RULE('term', (): Term => {
    const digits = this.OPTION(() => this.CONSUME(t.NumberToken));
    const species = this.SUBRULE(this.name);
    if (digits === undefined) return { span: species.span, species };
    return this.ACTION(() => {
      const coefficient = numberLiteral(undefined, digits);
      return { span: spanBetween(coefficient, species), coefficient, species };
    });
  });

  /** An expression that may be compared; outside claims retagging leaves no sign that this rule takes. */
  readonly claim = this.RULE('claim', (): Expression => {
    const left = this.SUBRULE(this.sum);
    return this.OR<Expression>([
      {
        ALT: () => {
          const sign = this.CONSUME(t.ClaimCompare);
          const right = this.SUBRULE1(this.sum);
          return this.ACTION(() => comparisonNode(left, sign, right));
        },
      },
      {
        ALT: () => {
          this.CONSUME(t.WithinToken);
          const target = this.SUBRULE2(this.sum);
          const tolerance = this.OPTION(() => {
            const sign = this.CONSUME(t.TolerancePlusMinus);
            return this.SUBRULE(this.spread, { ARGS: [sign] });
          });
          return this.ACTION((): Expression => {
            const span = spanBetween(left, tolerance ?? target);
            const within = { kind: 'within' as const, span, left, target };
            return tolerance === undefined ? within : { ...within, tolerance };
          });
        },
      },
      { ALT: () => left },
    ]);
  });

  private readonly sum = this.RULE('sum', (): Expression => {
    let left = this.SUBRULE(this.product);
    this.MANY(() => {
      const sign = this.OR([{ ALT: () => this.CONSUME(t.Plus) }, { ALT: () => this.CONSUME(t.Minus) }]);
      const right = this.SUBRULE1(this.product);
      left = this.ACTION(() => binaryNode(left, sign, right));
    });
    return left;
  });

  private readonly product = this.RULE('product', (): Expression => {
    let left = this.SUBRULE(this.negation);
    this.MANY(() => {
      const sign = this.OR([
        { ALT: () => this.CONSUME(t.Star) },
        { ALT: () => this.CONSUME(t.Dot) },
        { ALT: () => this.CONSUME(t.Slash) },
      ]);
      const right = this.SUBRULE1(this.negation);
      left = this.ACTION(() => binaryNode(left, sign, right));
    });
    return left;
  });

  private readonly negation = this.RULE('negation', (): Expression => {
    const signs: Token[] = [];
    this.MANY(() => signs.push(this.CONSUME(t.UnaryMinus)));
    const operand = this.SUBRULE(this.power);
    return this.ACTION(() => unaryNode(signs, operand));
  });

  /** Right to left: `2^3^2` is 2^(3^2); an exponent may carry its own minus. */
  private readonly power = this.RULE('power', (): Expression => {
    const first = this.SUBRULE(this.operand);
    const further: { caret: Token; exponent: Expression; signs: Token[] }[] = [];
    this.MANY(() => {
      const caret = this.CONSUME(t.Caret);
      const signs: Token[] = [];
      this.MANY1(() => signs.push(this.CONSUME(t.UnaryMinus)));
      further.push({ caret, signs, exponent: this.SUBRULE1(this.operand) });
    });
    return this.ACTION(() => powerNode(first, further));
  });

  private readonly operand = this.RULE('operand', (): Expression =>
    this.OR<Expression>([
      { ALT: () => this.SUBRULE(this.quantity) },
      { ALT: () => this.SUBRULE(this.nameOrMembership) },
      { ALT: () => this.SUBRULE(this.reference) },
      { ALT: () => this.SUBRULE(this.call) },
      { ALT: () => this.SUBRULE(this.bracket) },
      { ALT: () => textNode(this.CONSUME(t.Text)) },
      {
        ALT: () => {
          const token = this.CONSUME(t.LoneUnitToken);
          return this.ACTION((): Expression => {
            const unit = unitNode(token);
            return { kind: 'lone-unit', span: unit.span, unit };
          });
        },
      },
    ]),
  );

  private readonly quantity = this.RULE('quantity', (): Expression => {
    const sign = this.OPTION(() => this.CONSUME(t.Sign));
    const digits = this.CONSUME(t.NumberToken);
    const unit = this.OPTION1(() => this.CONSUME(t.Unit));
    const uncertainty = this.OPTION2(() => {
      const plusMinus = this.CONSUME(t.PlusMinus);
      return this.SUBRULE(this.spread, { ARGS: [plusMinus] });
    });
    return this.ACTION(() => quantityNode(numberLiteral(sign, digits), unit, uncertainty));
  });

  /** What stands behind `±`. */
  private readonly spread = this.RULE('spread', (plusMinus: Token): Uncertainty => {
    const digits = this.CONSUME(t.NumberToken);
    const unitToken = this.OPTION(() => this.CONSUME(t.Unit));
    return this.ACTION(() => {
      const number = numberLiteral(undefined, digits);
      const start = plusMinus.startOffset;
      if (unitToken === undefined) return { span: { start, end: number.span.end }, number };
      const unit = unitNode(unitToken);
      return { span: { start, end: unit.span.end }, number, unit };
    });
  });

  private readonly nameOrMembership = this.RULE('nameOrMembership', (): Expression => {
    const substance = this.SUBRULE(this.name);
    const membership = this.OPTION(() => {
      this.CONSUME(t.MembershipIn);
      const name = this.SUBRULE1(this.name);
      const basis = this.OPTION1(() => {
        this.CONSUME(t.MembershipBy);
        const token = this.CONSUME(t.Basis);
        return this.ACTION(() => basisNode(token));
      });
      return { name, basis };
    });
    if (membership === undefined) return substance;
    const { name, basis } = membership;
    const span = this.ACTION(() => spanBetween(substance, basis ?? name));
    const node = { kind: 'membership' as const, span, substance, name };
    return basis === undefined ? node : { ...node, basis };
  });

  private readonly reference = this.RULE('reference', (): Reference => {
    const words: Token[] = [];
    this.AT_LEAST_ONE(() => words.push(this.CONSUME(t.ReferenceWord)));
    const of = this.CONSUME(t.ReferenceOf);
    const first = this.SUBRULE(this.name);
    const second = this.OPTION(() => {
      this.CONSUME(t.MembershipIn);
      return this.SUBRULE1(this.name);
    });
    const at = this.OPTION1(() => {
      this.CONSUME(t.ReferenceAt);
      return this.SUBRULE(this.condition);
    });
    return this.ACTION(() => referenceNode(words, of, first, second, at));
  });

  /** What may stand behind the `at` of a reference. */
  private readonly condition = this.RULE('condition', (): Expression =>
    this.OR<Expression>([
      { ALT: () => this.SUBRULE(this.quantity) },
      { ALT: () => this.SUBRULE(this.name) },
      { ALT: () => this.SUBRULE(this.call) },
      { ALT: () => this.SUBRULE(this.bracket) },
    ]),
  );

  private readonly call = this.RULE('call', (): Expression => {
    const name = this.CONSUME(t.CallName);
    this.CONSUME(t.OpenBracket);
    const given: Expression[] = [];
    this.MANY_SEP({ SEP: t.Comma, DEF: () => given.push(this.SUBRULE(this.sum)) });
    const close = this.CONSUME(t.CloseBracket);
    return this.ACTION((): Expression => {
      const span = { start: name.startOffset, end: t.endOf(close) };
      return { kind: 'call', span, name: { text: name.image, span: spanOf(name) }, arguments: given };
    });
  });

  private readonly bracket = this.RULE('bracket', (): Expression => {
    const open = this.CONSUME(t.OpenBracket);
    const inner = this.SUBRULE(this.sum);
    const close = this.CONSUME(t.CloseBracket);
    return this.ACTION((): Expression => {
      return { kind: 'bracket', span: { start: open.startOffset, end: t.endOf(close) }, inner };
    });
  });

  private readonly name = this.RULE('name', (): Word => {
    const token = this.OR([
      { ALT: () => this.CONSUME(t.WordToken) },
      { ALT: () => this.CONSUME(t.Formula) },
      { ALT: () => this.CONSUME(t.QuotedName) },
    ]);
    return this.ACTION(() => wordNode(token));
  });
}

const noWords = (): string => '';

const parser = new LineParser();
