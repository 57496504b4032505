// The spans of temperature in which some combination of the candidates holds the elements. Where crystals end and nothing else
// has one of their elements there is no state, and a melt that starts higher up opens another span.
// Knows no energy and no pressure. Invariant: whether the elements can be held changes only where a phase starts or ends (ions
// are phases too), so one look between each two of these places is enough.

import type { Aim } from './newton.ts';
import { startCold } from './start.ts';
import { admitPhases, ionsFromK } from './work.ts';
import type { Work } from './work.ts';

export interface Range {
  readonly lowestK: number;
  readonly highestK: number;
}

/** The spans within `range`, from cold to hot. */
export function spansOf(work: Work, aim: Aim, range: Range): Range[] {
  const { lowestK, highestK } = range;
  const places = new Set([lowestK, highestK]);
  for (const ends of [work.set.startK, work.set.endK, work.set.hasCharge ? [ionsFromK] : []]) {
    for (const placeK of ends) if (placeK > lowestK && placeK < highestK) places.add(placeK);
  }
  const sorted = [...places].sort((a, b) => a - b);
  const spans: Range[] = [];
  let startK: number | undefined;
  sorted.forEach((placeK, index) => {
    const nextK = sorted[index + 1];
    const isHeld = nextK !== undefined && canHold(work, aim, placeK + (nextK - placeK) / 2);
    if (isHeld) startK ??= placeK;
    else if (startK !== undefined) {
      spans.push({ lowestK: startK, highestK: placeK });
      startK = undefined;
    }
  });
  return spans;
}

/** Whether phases that may be present at a temperature can hold the elements, and fill the volume where one is held. */
function canHold(work: Work, aim: Aim, temperatureK: number): boolean {
  admitPhases(work, temperatureK);
  if (aim.isVolume && work.gasCount === 0) return false;
  return startCold(work, { ...aim, seeks: 'temperature' }, temperatureK, temperatureK, temperatureK) === undefined;
}
