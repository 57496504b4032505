// Turns a written number with its unit into a quantity, and says what is wrong with the unit where something is.
// Also the one place that turns a fault of quantity arithmetic into a fact. Knows nothing of names or entries.

import type { Quantity as QuantityNode, Span, Uncertainty, UnitWords } from '../../grammar/tree.ts';
import {
  asKind,
  isFault,
  quantityFrom,
  type Quantity,
  type QuantityFault,
  type QuantityKind,
} from '../core/quantity/quantity.ts';
import { isDimensionless, sameDimension, type Dimension } from '../core/quantity/dimension.ts';
import { readUnit, unitOne, type Unit } from '../core/quantity/read-unit.ts';
import type { Context, Unknowable } from './context.ts';
import type { Sided } from './facts.ts';

/** The quantity a literal stands for; null when its unit or number is at fault (said). */
export function readQuantity(node: QuantityNode, context: Context): Unknowable {
  const unit = readUnitWords(node.unit, context);
  if (!unit) return null;
  const uncertainty = node.uncertainty && readUncertainty(node.uncertainty, context);
  if (uncertainty === null) return null;
  const answer = quantityFrom(node.number.value, unit, uncertainty);
  if (isFault(answer)) return reportFault(answer, node.span, undefined, context);
  const read = aboveAbsoluteZero(answer, node.span, context);
  if (read) context.mean(node.span, { kind: 'quantity', quantity: read, unit: unit.text });
  return read;
}

/** The quantity, unless it is a temperature below absolute zero (said). Numbers in K that may be differences pass. */
export function aboveAbsoluteZero(quantity: Quantity, span: Span, context: Context): Unknowable {
  if (quantity.kind !== 'temperature' || quantity.value >= 0) return quantity;
  const text = context.written(span);
  context.report(span, { code: 'range/temperature', text, why: 'below-absolute-zero' });
  return null;
}

/** The unit of a literal (none: a plain number); null when it cannot be read (said). */
export function readUnitWords(words: UnitWords | undefined, context: Context): Unit | null {
  if (!words) return unitOne;
  const reading = readUnit(words.tokens);
  if (reading.ok) return reading.unit;
  const { fault } = reading;
  const blamed = words.tokens[fault.index]?.span ?? words.span;
  const text = context.written(words.span);
  switch (fault.fault) {
    case 'unknown':
      context.report(blamed, { code: 'unit/unknown', word: fault.word, near: fault.offers, hint: fault.why ?? null });
      break;
    case 'ambiguous':
      context.report(words.span, { code: 'unit/ambiguous', text, offers: [fault.offer], why: 'brackets' });
      break;
    case 'scale-in-compound':
      context.report(words.span, { code: 'unit/ambiguous', text, offers: [fault.offer], why: 'scale' });
      break;
    case 'stray':
    case 'power':
      context.report(blamed, { code: 'unit/ambiguous', text, offers: [], why: 'form' });
  }
  return null;
}

function readUncertainty(node: Uncertainty, context: Context): { number: number; unit?: Unit; input: string } | null {
  const input = context.nextInput();
  if (!node.unit) return { number: node.number.value, input };
  const unit = readUnitWords(node.unit, context);
  return unit && { number: node.number.value, unit, input };
}

/** What a place asks of a quantity. `example` is a unit that would fit. */
export interface Needed {
  readonly dimension: Dimension;
  readonly kind: QuantityKind;
  readonly example: string;
}

/** The quantity as its place needs it; null when it does not fit (said). */
export function fit(quantity: Quantity, needed: Needed, span: Span, context: Context): Unknowable {
  if (!sameDimension(quantity.dimension, needed.dimension)) {
    if (isDimensionless(quantity.dimension) && !/[%a-z]/i.test(context.written(span))) {
      context.report(span, { code: 'unit/missing', needed: needed.dimension, example: needed.example });
    } else {
      const found = sided(quantity, span, context);
      context.report(span, { code: 'unit/mismatch', form: 'place', found, needed, example: needed.example });
    }
    return null;
  }
  const answer = asKind(quantity, needed.kind);
  return isFault(answer) ? reportFault(answer, span, undefined, context) : aboveAbsoluteZero(answer, span, context);
}

export function sided(quantity: Quantity, span: Span, context: Context): Sided {
  return { text: context.written(span), dimension: quantity.dimension, kind: quantity.kind };
}

/** Says a fault of quantity arithmetic; `span` is the left (or only) operand's, `right` the right one's. */
export function reportFault(fault: QuantityFault, span: Span, right: Span | undefined, context: Context): null {
  const whole = right ? { start: span.start, end: right.end } : span;
  const text = context.written(whole);
  const leftSide = sided(fault.left, span, context);
  const rightSide = fault.right && right ? sided(fault.right, right, context) : leftSide;
  switch (fault.fault) {
    case 'mismatch': {
      const operation = fault.operation === 'add' || fault.operation === 'subtract' ? fault.operation : 'compare';
      context.report(whole, { code: 'unit/mismatch', form: 'sides', operation, left: leftSide, right: rightSide });
      break;
    }
    case 'two-temperatures': {
      const written = /^(-?[\d.]+) *(?:degC|°C)$/.exec(rightSide.text);
      const asDifference = written ? `${written[1] ?? ''} K` : null;
      context.report(right ?? whole, { code: 'unit/two-temperatures', left: leftSide, right: rightSide, asDifference });
      break;
    }
    case 'difference-needed':
    case 'temperature-needed':
      context.report(right ?? whole, { code: 'unit/temperature', why: fault.fault, text: rightSide.text });
      break;
    case 'temperature-scaled':
      context.report(whole, { code: 'unit/temperature', why: 'scaled', text });
      break;
    case 'gauge-and-absolute':
      context.report(whole, { code: 'unit/gauge', why: 'absolute-needed', text, absolutePa: fault.absolutePa ?? null });
      break;
    case 'gauge-needed':
      context.report(whole, { code: 'unit/gauge', why: 'gauge-needed', text, absolutePa: null });
      break;
    case 'gauge-scaled':
      context.report(whole, { code: 'unit/gauge', why: 'scaled', text, absolutePa: null });
      break;
    case 'exponent':
      context.report(right ?? whole, { code: 'unit/exponent', text: rightSide.text, base: leftSide });
      break;
    case 'uncertainty-negative':
      context.report(whole, { code: 'unit/uncertainty', text, why: 'negative' });
      break;
    case 'uncertainty-mismatch':
      context.report(whole, { code: 'unit/uncertainty', text, why: 'mismatch' });
      break;
    case 'uncertainty-relative':
      context.report(whole, { code: 'unit/uncertainty', text, why: 'relative' });
      break;
    case 'range': {
      const divided = fault.operation === 'divide' && fault.right?.value === 0;
      context.report(whole, { code: 'range/number', text, why: divided ? 'division-by-zero' : 'not-finite' });
    }
  }
  return null;
}
