// Reads a chemical formula as published tables write it: brackets, hydrates, decimal counts, charge and an attached phase.
// Knows which symbols are elements, but not which substances exist: `H20` is twenty hydrogen atoms here, and the catalogue
// is where somebody is asked whether water was meant. Invariant: a formula's canonical text reads back to the same formula.
// Source of the notation: Chase 1998 (NIST-JANAF tables, 4th ed.) for phases and ions; IUPAC Red Book 2005, IR-4, for hydrates.

import { atomicWeightKgPerMol, elementOfSymbol } from './elements.ts';

/** Gas, liquid, crystal, or dissolved in water. */
export type Phase = 'g' | 'l' | 'cr' | 'aq';

/** A formula that could be read. */
export interface Formula {
  readonly kind: 'formula';
  /** Canonical text with the charge, without the phase: `Na2CO3`, `MgCl2·6H2O`, `CO3^2-`, `e-`. */
  readonly text: string;
  /** Atoms of each element in one formula unit, in order of first appearance; empty for the electron. */
  readonly composition: ReadonlyMap<string, number>;
  /** Elementary charges, positive for a cation. */
  readonly charge: number;
  readonly phase?: Phase;
}

/** Why a text is no formula, and where in it. */
export interface FormulaFault {
  readonly kind: 'fault';
  readonly reason: 'empty' | 'unknown-element' | 'unexpected' | 'unclosed' | 'bad-count' | 'too-deep';
  /** Offset into the text that was given, and how many characters are meant. */
  readonly position: number;
  readonly length: number;
  /** The characters meant, as written. */
  readonly found: string;
}

/**
 * Reads a formula. Accepts subscript and superscript digits, `·` or `.` before a hydrate's water, a charge as signs
 * (`CO3--`) or as `^2-`, and a phase in brackets. `phase` is used where the text itself carries none.
 * Returns a fault with its place when the text is no formula; never throws.
 */
export function parseFormula(text: string, phase?: Phase): Formula | FormulaFault {
  const reader = new FormulaReader(text);
  const outcome = reader.readWhole();
  return outcome.kind === 'formula' && outcome.phase === undefined && phase !== undefined
    ? { ...outcome, phase }
    : outcome;
}

/** The formula's text with its phase, as in `Na2CO3(cr)`. */
export function formulaTextWithPhase(formula: Formula): string {
  return formula.phase === undefined ? formula.text : `${formula.text}(${formula.phase})`;
}

/**
 * Molar mass in kg/mol from the conventional atomic weights, less the electrons an ion lacks (CODATA 2018 electron molar
 * mass); undefined when an element has no standard atomic weight.
 */
export function molarMassKgPerMol(formula: Formula): number | undefined {
  let molarMass = -formula.charge * electronMolarMassKgPerMol;
  for (const [symbol, count] of formula.composition) {
    const weight = atomicWeightKgPerMol(symbol);
    if (weight === undefined) return undefined;
    molarMass += count * weight;
  }
  return molarMass;
}

/** A key equal for formulas with the same atoms and charge, however they are written (`C2H5OH` and `C2H6O`). */
export function compositionKey(formula: Pick<Formula, 'composition' | 'charge'>): string {
  const atoms = [...formula.composition].sort(([a], [b]) => (a < b ? -1 : 1)).map(([symbol, count]) => symbol + count);
  return `${atoms.join(' ')} ${formula.charge}`;
}

const electronMolarMassKgPerMol = 5.4857990888e-7;
const mostBracketDepth = 64;
const mostAtoms = 1e6;
const subscripts = '₀₁₂₃₄₅₆₇₈₉';
const superscripts = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** A stretch of formula text together with its atoms. */
interface Part {
  readonly text: string;
  readonly atoms: Map<string, number>;
}

/** Thrown and caught inside this file only, so that a fault deep in brackets need not be passed up by hand. */
class FaultSignal extends Error {
  constructor(readonly fault: FormulaFault) {
    super(fault.reason);
  }
}

class FormulaReader {
  private position = 0;
  /** The text with look-alike characters replaced one for one, so that positions stay those of the original. */
  private readonly plain: string;

  constructor(private readonly original: string) {
    this.plain = /^[ -~]*$/.test(original) ? original : original.replace(/[^ -~]/g, plainCharacter);
  }

  readWhole(): Formula | FormulaFault {
    try {
      const lead = /^\s*/.exec(this.plain)?.[0].length ?? 0;
      this.position = lead;
      if (this.plain.trim() === '') this.fail('empty', 0, this.plain.length);
      if (/^e-(\(g\))?\s*$/.test(this.plain.slice(lead))) return this.electron();
      const body = this.readParts();
      const charge = this.readCharge();
      const phase = this.readPhase();
      if (this.plain.slice(this.position).trim() !== '') this.fail('unexpected', this.position, 1);
      const text = body.text + chargeText(charge);
      return { kind: 'formula', text, composition: body.atoms, charge, ...(phase === undefined ? {} : { phase }) };
    } catch (signal) {
      if (signal instanceof FaultSignal) return signal.fault;
      throw signal;
    }
  }

  private electron(): Formula {
    const gas = this.plain.includes('(g)');
    return { kind: 'formula', text: 'e-', composition: new Map(), charge: -1, ...(gas ? { phase: 'g' as const } : {}) };
  }

  /** Parts joined by hydrate dots: `MgCl2·6H2O`. */
  private readParts(): Part {
    const first = this.readRun(0);
    let text = first.text;
    const atoms = first.atoms;
    while (this.atHydrateDot()) {
      this.position += 1;
      const times = this.readCount(true);
      const part = this.readRun(0);
      text += `·${times.text}${part.text}`;
      addAtoms(atoms, part.atoms, times.value);
    }
    return { text, atoms };
  }

  /** Elements and brackets, each with its count, up to something else. */
  private readRun(depth: number): Part {
    let text = '';
    const atoms = new Map<string, number>();
    for (;;) {
      const unit = this.readUnit(depth);
      if (unit === undefined) break;
      const count = this.readCount(false);
      text += unit.text + count.text;
      addAtoms(atoms, unit.atoms, count.value);
    }
    if (text === '') this.fail(this.position >= this.plain.trimEnd().length ? 'empty' : 'unexpected', this.position, 1);
    return { text, atoms };
  }

  private readUnit(depth: number): Part | undefined {
    const character = this.plain[this.position] ?? '';
    if ((character === '(' || character === '[') && this.phaseHere() === undefined) return this.readBracket(depth);
    const word = this.match(/[A-Z][a-z]*/y)?.[0];
    if (word === undefined) return undefined;
    // `CO` is carbon and oxygen, `Co` cobalt: a small letter belongs to the capital before it, and nothing else can.
    if (elementOfSymbol(word) === undefined) this.fail('unknown-element', this.position, word.length);
    this.position += word.length;
    return { text: word, atoms: new Map([[word, 1]]) };
  }

  private readBracket(depth: number): Part {
    const open = this.position;
    if (depth >= mostBracketDepth) this.fail('too-deep', open, 1);
    const close = this.plain[open] === '(' ? ')' : ']';
    this.position += 1;
    const inner = this.readRun(depth + 1);
    if (this.plain[this.position] !== close) {
      const atEnd = this.position >= this.plain.trimEnd().length;
      this.fail(atEnd ? 'unclosed' : 'unexpected', atEnd ? open : this.position, 1);
    }
    this.position += 1;
    return { text: `(${inner.text})`, atoms: inner.atoms };
  }

  /** A count behind a unit, or the multiplier that opens a hydrate's part; 1 where none is written. */
  private readCount(opensPart: boolean): { readonly text: string; readonly value: number } {
    const written = this.match(/\d+/y)?.[0] ?? '';
    // `MgCl2.6H2O` is a hydrate, `Fe0.947O` and `H2SO4.6.5H2O`'s 6.5 are decimals: see atHydrateDot.
    const afterWhole = this.position + written.length;
    const decimals = this.match(/\.\d+/y, afterWhole)?.[0] ?? '';
    const isDecimal = decimals !== '' && written !== '' && (opensPart || !this.hydrateDotAt(afterWhole, written));
    const text = isDecimal ? written + decimals : written;
    if (text === '') return { text: '', value: 1 };
    const value = Number(text);
    if (!(value > 0) || value > mostAtoms) this.fail('bad-count', this.position, text.length);
    this.position += text.length;
    return value === 1 ? { text: '', value } : { text: String(value), value };
  }

  private atHydrateDot(): boolean {
    const character = this.plain[this.position];
    if (character === '·') return true;
    if (character !== '.') return false;
    const before = /\d*$/.exec(this.plain.slice(0, this.position))?.[0] ?? '';
    return this.hydrateDotAt(this.position, before);
  }

  /**
   * A `·` always joins two parts. A plain dot does so where no digit stands on both sides of it, or where water or
   * ammonia follows with at most a multiplier, the only adducts that tables write with a plain dot. A count that would
   * be 0 before the dot can only be a decimal.
   */
  private hydrateDotAt(position: number, digitsBefore: string): boolean {
    const rest = this.plain.slice(position);
    if (rest.startsWith('·')) return true;
    if (!rest.startsWith('.')) return false;
    if (digitsBefore !== '' && Number(digitsBefore) === 0) return false;
    if (digitsBefore === '' || !/^\.\d/.test(rest)) return true;
    return /^\.(\d+(\.\d+)?)?(H2O|NH3)(?![0-9a-z])/.test(rest);
  }

  private readCharge(): number {
    const match = this.match(/(?:\^(\d*)|([⁰¹²³⁴-⁹]+))([+-])|\++|-+/y);
    if (match === null) return 0;
    const [written, afterCaret, raised, raisedSign] = match;
    const start = this.position;
    this.position += written.length;
    const sign = written.endsWith('+') ? 1 : -1;
    const digits = afterCaret ?? [...(raised ?? '')].map((digit) => superscripts.indexOf(digit)).join('');
    const size = raisedSign === undefined ? written.length : Number(digits || 1);
    if (size === 0 || size > 99) this.fail('bad-count', start, match[0].length);
    return sign * size;
  }

  private readPhase(): Phase | undefined {
    const phase = this.phaseHere();
    if (phase !== undefined) this.position += phase.length + 2;
    return phase;
  }

  /** The phase whose bracket opens here, if one does: `(l)` cannot be a group, since groups hold elements. */
  private phaseHere(): Phase | undefined {
    if (this.plain[this.position] !== '(') return undefined;
    return phases.find((phase) => this.plain.startsWith(`(${phase})`, this.position));
  }

  /** A sticky expression tried at one place, the reader's own unless another is given. */
  private match(expression: RegExp, position = this.position): RegExpExecArray | null {
    expression.lastIndex = position;
    return expression.exec(this.plain);
  }

  private fail(reason: FormulaFault['reason'], position: number, length: number): never {
    const found = this.original.slice(position, position + length);
    throw new FaultSignal({ kind: 'fault', reason, position, length: found.length, found });
  }
}

const phases: readonly Phase[] = ['g', 'l', 'cr', 'aq'];

function plainCharacter(character: string): string {
  const subscript = subscripts.indexOf(character);
  if (subscript >= 0) return String(subscript);
  if (character === '⁺' || character === '＋') return '+';
  if (character === '⁻' || character === '−' || character === '–') return '-';
  if (character === '•' || character === '∙' || character === '⋅') return '·';
  return character;
}

function chargeText(charge: number): string {
  if (charge === 0) return '';
  const sign = charge > 0 ? '+' : '-';
  return Math.abs(charge) === 1 ? sign : `^${Math.abs(charge)}${sign}`;
}

function addAtoms(target: Map<string, number>, more: ReadonlyMap<string, number>, times: number): void {
  // Twelve digits keep 3 × 0.1 equal to 0.3, so that exact balancing sees the decimal that was meant.
  for (const [symbol, count] of more) {
    const sum = (target.get(symbol) ?? 0) + count * times;
    target.set(symbol, Number.isInteger(sum) ? sum : Number(sum.toPrecision(12)));
  }
}
