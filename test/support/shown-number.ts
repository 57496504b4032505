// Reads a number with its unit out of text made for people, and says whether it is a given value as far as its shown
// digits reach. So a test compares what the editor shows with what the command line prints, and types no number.
// Knows no room of the product. Invariant: only digits that are shown decide; a longer number is not rounded here.

/** A number as it stands in a text: its value and half a unit of its last digit. */
export interface ShownNumber {
  readonly value: number;
  readonly halfDigit: number;
}

const NUMBER =
  /\(?(?<sign>[−-]?)(?<digits>\d+(?:\.\d+)?)(?:\s*±\s*[\d.]+)?\)?(?:\s*[×·]\s*10(?<power>⁻?[⁰¹²³⁴-⁹]+))?\s*(?<unit>[^\s,;:)*|]*(?: [^\s\d,;:)*|]+\))?)/gu;

/** The numbers in the text that carry exactly this unit, in the order of the text. An uncertainty belongs to its number. */
export function numbersShown(text: string, unit: string): ShownNumber[] {
  return [...text.matchAll(NUMBER)].flatMap(({ groups }) => {
    if (groups?.['unit'] !== unit) return [];
    const digits = groups['digits'] ?? '';
    const scale = 10 ** Number(fromSuperscript(groups['power'] ?? '⁰'));
    const places = digits.split('.')[1]?.length ?? 0;
    const value = Number(digits) * scale * (groups['sign'] === '' ? 1 : -1);
    return [{ value, halfDigit: 0.5 * 10 ** -places * scale }];
  });
}

/** Whether the shown number is the value, rounded. */
export function isRounded(shown: ShownNumber, value: number): boolean {
  return Math.abs(shown.value - value) <= shown.halfDigit * (1 + 1e-9);
}

function fromSuperscript(power: string): string {
  return Array.from(power, (character) => (character === '⁻' ? '-' : String('⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(character)))).join('');
}
