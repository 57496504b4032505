// Keys as a person presses them in a large scenario: in numbers that much or little rests on, in comments, in names, and
// whole new lines letter by letter. The same keys every time. Knows no server. Invariant: each key is one small change of
// the text that stands after all keys before it.

export interface Keystroke {
  readonly start: number;
  readonly end: number;
  readonly newText: string;
  /** The text behind it. */
  readonly text: string;
}

/** Where something is typed, and what; `\b` takes back the character before. */
const habits: readonly { readonly before: RegExp; readonly keys: string }[] = [
  { before: /\d+ % mass/g, keys: '1\b' },
  { before: /\d+ kg\/m3/g, keys: '1\b' },
  { before: /\d+ %\n/g, keys: '1\b' },
  { before: /(?<=# )\w+/g, keys: 'so \b\b\b' },
  { before: /(?<=blend \w+) \{/g, keys: 'x\b' },
  { before: /(?<=\n)\n/g, keys: 'let extra = 3.5 kg\n' },
];

/** So many keys, one after another, from a text on. */
export function* keystrokes(text: string, count: number): Generator<Keystroke> {
  const random = randomBelow();
  let current = text;
  let pressed = 0;
  while (pressed < count) {
    const { before, keys } = habits[random(habits.length)] ?? { before: /$/g, keys: ' ' };
    const places = [...current.matchAll(before)];
    let offset = places[random(places.length)]?.index ?? 0;
    for (const key of keys) {
      if (pressed++ === count) return;
      const [start, newText] = key === '\b' ? [offset - 1, ''] : [offset, key];
      const end = offset;
      current = current.slice(0, start) + newText + current.slice(end);
      offset = start + newText.length;
      yield { start, end, newText, text: current };
    }
  }
}

/** Whole numbers from 0 to below a limit, the same ones every time. Source: Numerical Recipes' quick generator. */
function randomBelow(): (limit: number) => number {
  let state = 20260417;
  return (limit) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 2 ** 32) * limit);
  };
}
