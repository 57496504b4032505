// Hot metal in words: one temperature or a range of them. Knows no findings. Invariant: temperatures in °C.

import type { Quantity } from '../core/quantity/quantity.ts';
import { celsiusText } from './quantities.ts';

/** `metal of 700 °C`, `metal from 650 °C to 800 °C`. */
export function metalText(from: Quantity, to: Quantity): string {
  return from.value === to.value
    ? `metal of ${celsiusText(from)}`
    : `metal from ${celsiusText(from)} to ${celsiusText(to)}`;
}
