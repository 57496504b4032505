// A measured profile of power over time out of a comma-separated text: rows of seconds and watts (or other units, named in
// the header), as loggers write them. Gathers rows as they are read into bins of power, so that a million of them become a
// few hundred steps that hold the same time and the same energy. Knows no file and no engine.
// Invariants: the steps hold the time and the energy of the rows to rounding; the first fault ends the reading and names its
// row (the first of the text is 1). Method: power is held from one row to the next; the last row ends the profile.

import type { Step } from './plan.ts';

/** What is wrong with a profile, and in which row; `text` is what stands there. */
export type ProfileFault =
  | { readonly kind: 'fault'; readonly why: 'no-header' | 'no-rows'; readonly row: number; readonly text: string }
  | { readonly kind: 'fault'; readonly why: 'gap' | 'text' | 'negative'; readonly row: number; readonly text: string }
  | { readonly kind: 'fault'; readonly why: 'time-falls'; readonly row: number; readonly text: string };

export interface Profile {
  readonly kind: 'profile';
  readonly steps: readonly Step[];
  readonly rows: number;
}

/** SI units in one of each that a header may name. */
export interface ProfileUnits {
  readonly timeS: Readonly<Record<string, number>>;
  readonly powerW: Readonly<Record<string, number>>;
}

export const profileUnits: ProfileUnits = {
  timeS: { s: 1, min: 60, h: 3600 },
  powerW: { W: 1, kW: 1e3, MW: 1e6 },
};

/** So many bins between nothing and the greatest power: loads differ by less than 0.1 % of it within one. */
const bins = 1024;

/** The header is `time (s), power (kW)` in this or the other order, with `,`, `;` or a tab between. */
export function readProfile(text: string): Profile | ProfileFault {
  const headerEnd = endOfLine(text, 0);
  const header = headerOf(text.slice(0, headerEnd));
  if (!header) return { kind: 'fault', why: 'no-header', row: 1, text: text.slice(0, Math.min(headerEnd, 80)).trim() };
  const { separator, timeFirst, timeS, powerW } = header;
  let [times, powers] = [new Float64Array(1024), new Float64Array(1024)];
  let [count, row, greatestW, start] = [0, 1, 0, headerEnd + 1];
  while (start < text.length) {
    row += 1;
    const end = endOfLine(text, start);
    const line = text.slice(start, end);
    start = end + 1;
    // An empty line at the end of the text is no gap.
    if (line.trim() === '' && text.slice(start).trim() === '') break;
    const cut = line.indexOf(separator);
    const [left, right] = [
      line.slice(0, cut < 0 ? line.length : cut).trim(),
      cut < 0 ? '' : line.slice(cut + 1).trim(),
    ];
    const shown = line.trim().slice(0, 80);
    if (left === '' || right === '') return { kind: 'fault', why: 'gap', row, text: shown };
    const [first, second] = [Number(left), Number(right)];
    if (!Number.isFinite(first) || !Number.isFinite(second)) return { kind: 'fault', why: 'text', row, text: shown };
    const time = (timeFirst ? first : second) * timeS;
    const power = (timeFirst ? second : first) * powerW;
    if (power < 0) return { kind: 'fault', why: 'negative', row, text: shown };
    if (count > 0 && !(time > (times[count - 1] ?? NaN))) return { kind: 'fault', why: 'time-falls', row, text: shown };
    if (count === times.length) [times, powers] = [grown(times), grown(powers)];
    times[count] = time;
    powers[count] = power;
    greatestW = Math.max(greatestW, power);
    count += 1;
  }
  if (count < 2) return { kind: 'fault', why: 'no-rows', row, text: '' };
  return { kind: 'profile', steps: stepsOf(times, powers, count, greatestW), rows: count };
}

function stepsOf(times: Float64Array, powers: Float64Array, count: number, greatestW: number): readonly Step[] {
  const [timeS, energyJ] = [new Float64Array(bins + 1), new Float64Array(bins + 1)];
  for (let index = 0; index + 1 < count; index += 1) {
    const power = powers[index] ?? 0;
    const lastsS = (times[index + 1] ?? 0) - (times[index] ?? 0);
    // Idling is a bin of its own: fuel there is not in proportion to the power.
    const bin = power === 0 ? 0 : Math.max(1, Math.ceil((power / greatestW) * bins));
    timeS[bin] = (timeS[bin] ?? 0) + lastsS;
    energyJ[bin] = (energyJ[bin] ?? 0) + power * lastsS;
  }
  const steps: Step[] = [];
  for (let bin = 0; bin <= bins; bin += 1) {
    const [lastsS = 0, workJ = 0] = [timeS[bin], energyJ[bin]];
    if (lastsS > 0) steps.push({ timeS: lastsS, powerW: workJ / lastsS });
  }
  return steps;
}

interface Header {
  readonly separator: string;
  readonly timeFirst: boolean;
  readonly timeS: number;
  readonly powerW: number;
}

function headerOf(line: string): Header | null {
  const separator = [';', '\t', ','].find((one) => line.includes(one));
  if (separator === undefined) return null;
  const cells = line
    .replace(/^\uFEFF/, '')
    .split(separator)
    .map((cell) => /^"?\s*(time|power)\s*[([]\s*(\w+)\s*[)\]]\s*"?$/i.exec(cell.trim()));
  if (cells.length !== 2) return null;
  const timeFirst = cells[0]?.[1]?.toLowerCase() === 'time';
  const [time, power] = timeFirst ? cells : [cells[1], cells[0]];
  if (time?.[1]?.toLowerCase() !== 'time' || power?.[1]?.toLowerCase() !== 'power') return null;
  const timeS = profileUnits.timeS[time[2] ?? ''];
  const powerW = profileUnits.powerW[power[2] ?? ''];
  return timeS === undefined || powerW === undefined ? null : { separator, timeFirst, timeS, powerW };
}

function endOfLine(text: string, start: number): number {
  const end = text.indexOf('\n', start);
  return end < 0 ? text.length : end;
}

function grown(from: Float64Array): Float64Array<ArrayBuffer> {
  const to = new Float64Array(2 * from.length);
  to.set(from);
  return to;
}
