// Tells an expectation that holds: the value found, which is nowhere else to be seen. One that fails is a finding, and the
// finding says the value. Works nothing out.
import type { Expectation, Place } from '../scenario/scenario.ts';
import { toldText } from '../wording/quantities.ts';
import type { HoverText } from './hover-text.ts';

/** null for a claim that does not hold or could not be worked out. */
export function hoverExpectation(place: Place, { holds, found, unit }: Expectation): HoverText | null {
  if (holds !== true || !found) return null;
  return { place, title: `${toldText(found, unit)} found`, origin: 'The claim holds', lines: [] };
}
