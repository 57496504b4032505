// Colours for a terminal, or none. A paint wraps a text that is already whole, so that widths are counted without it.
// Knows no terminal: who calls decides. Source: ECMA-48, 8.3.117 (select graphic rendition).

export interface Paint {
  readonly strong: (text: string) => string;
  readonly faint: (text: string) => string;
  readonly good: (text: string) => string;
  readonly bad: (text: string) => string;
  readonly doubtful: (text: string) => string;
  readonly informing: (text: string) => string;
}

const plain = (text: string): string => text;

export const noPaint: Paint = {
  strong: plain,
  faint: plain,
  good: plain,
  bad: plain,
  doubtful: plain,
  informing: plain,
};

export const terminalPaint: Paint = {
  strong: rendition(1, 22),
  faint: rendition(2, 22),
  good: rendition(32, 39),
  bad: rendition(31, 39),
  doubtful: rendition(33, 39),
  informing: rendition(36, 39),
};

function rendition(on: number, off: number): (text: string) => string {
  return (text) => (text === '' ? '' : `\u001b[${on}m${text}\u001b[${off}m`);
}
