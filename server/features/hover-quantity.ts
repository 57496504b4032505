// Tells a number: the same quantity in the units the trade uses beside the one written, and for a name given by `let` its
// value too. Reads and converts by core/quantity and rounds by wording/; works nothing out. Invariant: the value first
// shown is in the unit that was written.
import type { Quantity as QuantityNode } from '../../grammar/tree.ts';
import { siblingUnits } from '../core/quantity/convert.ts';
import { isDimensionless } from '../core/quantity/dimension.ts';
import { isFault, quantityFrom, type Quantity } from '../core/quantity/quantity.ts';
import { readUnit, unitOne } from '../core/quantity/read-unit.ts';
import type { EvaluatedFile, EvaluatedValue, Place } from '../scenario/scenario.ts';
import { formatNumber, SIGNIFICANT_DIGITS } from '../wording/numbers.ts';
import { dimensionPhrase, handyUnit, quantityText } from '../wording/quantities.ts';
import { unitForPeople, withUnit } from '../wording/units.ts';
import { capitalised } from '../wording/words.ts';
import { unitOfValue } from '../wording/written-unit.ts';
import type { HoverLine, HoverText } from './hover-text.ts';

export interface ShownQuantity {
  readonly quantity: Quantity;
  /** The unit it is written in. */
  readonly unit: string;
}

/** Shares above this are not better known in parts per million. */
const SMALL_SHARE = 0.01;

/** null for a plain number, of which nothing more is to be said than stands there. */
export function hoverQuantity(place: Place, shown: ShownQuantity): HoverText | null {
  const lines = siblingLines(shown);
  if (isDimensionless(shown.quantity.dimension) && lines.length === 0) return null;
  return {
    place,
    title: quantityText(shown.quantity, shown.unit),
    origin: capitalised(dimensionPhrase(shown.quantity)),
    lines,
  };
}

export function hoverValue(place: Place, value: EvaluatedValue, file: EvaluatedFile | undefined): HoverText {
  const { name, quantity } = value;
  if (!quantity) return { place, title: name, origin: 'A value that could not be worked out', lines: [] };
  // A share is told in the unit it is written in, `30 %` and not 0.3.
  const isPlain = isDimensionless(quantity.dimension);
  const unit = (isPlain && file && unitOfValue(value.place, quantity, file)) || handyUnit(quantity);
  return {
    place,
    title: `${quantityText(quantity, unit)}: ${name}`,
    origin: capitalised(dimensionPhrase(quantity)),
    lines: siblingLines({ quantity, unit }),
  };
}

/** The quantity in further units, one line each. */
export function siblingLines({ quantity, unit }: ShownQuantity): HoverLine[] {
  if (isDimensionless(quantity.dimension) && Math.abs(quantity.value) >= SMALL_SHARE) return [];
  // One more digit for a temperature, so that 20 °C is 293.15 K.
  const digits = quantity.kind === 'temperature' ? SIGNIFICANT_DIGITS + 1 : SIGNIFICANT_DIGITS;
  return siblingUnits(quantity, unit).map((sibling) => ({
    sentence: `= ${withUnit(formatNumber(sibling.value, 'people', digits), unitForPeople(sibling.unit))}`,
  }));
}

/** A number as it is written, where the evaluation has no meaning for it; null when its unit is at fault. */
export function quantityOfLiteral({ number, unit, uncertainty }: QuantityNode): ShownQuantity | null {
  const reading = unit ? readUnit(unit.tokens) : ({ ok: true, unit: unitOne } as const);
  const step = uncertainty?.unit && readUnit(uncertainty.unit.tokens);
  if (!reading.ok || step?.ok === false) return null;
  const written = uncertainty && {
    number: uncertainty.number.value,
    ...(step ? { unit: step.unit } : {}),
    input: 'the number pointed at',
  };
  const quantity = quantityFrom(number.value, reading.unit, written);
  return isFault(quantity) ? null : { quantity, unit: reading.unit.text };
}
