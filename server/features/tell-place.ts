// Says in words where a place is: its line, and its file where that is another one. For sentences only; everything that
// jumps or underlines uses offsets. Invariant: lines are counted from 1, and CR LF ends one line.
import type { EvaluatedScenario } from '../scenario/scenario.ts';
import type { TellPlace } from '../wording/explain.ts';

/** How to tell places to a reader who is looking at the file `from`. */
export function tellPlace(scenario: EvaluatedScenario, from: string): TellPlace {
  return ({ path, start }) => {
    const text = scenario.files.find((file) => file.path === path)?.tree.text;
    if (text === undefined) return null;
    const line = text.slice(0, start).split(/\r\n|\r|\n/).length;
    return path === from ? `line ${line}` : `line ${line} of ${fileName(path)}`;
  };
}

function fileName(path: string): string {
  const escaped = path.slice(path.lastIndexOf('/') + 1);
  try {
    return decodeURIComponent(escaped);
  } catch {
    return escaped; // a `%` that escapes nothing is part of the name
  }
}
