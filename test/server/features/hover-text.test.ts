// A hover's two renderings. The Markdown one is read back by a Markdown reader (with tables, autolinks and HTML switched
// on, more than any editor allows), so that "no name becomes markup" is a fact about documents and not about backslashes.
import MarkdownIt from 'markdown-it';
import { describe, expect, it } from 'vitest';
import { asMarkdown, asPlainText, MOST_LINES, shortened, type HoverText } from '../../../server/features/hover-text.ts';

const place = { path: 'a', start: 0, end: 1 };
const reader = new MarkdownIt({ html: true, linkify: true });

/** What a reader of the Markdown sees, and every element in it. */
function rendered(hover: HoverText): { text: string; elements: string[] } {
  const html = reader.render(asMarkdown(hover));
  const unescape = (text: string): string =>
    text
      .replace(/&lt;/g, '<')
      .replace(/&gt;/g, '>')
      .replace(/&quot;/g, '"')
      .replace(/&amp;/g, '&');
  return {
    text: unescape(html.replace(/<[^>]*>/g, ''))
      .replace(/\n+/g, '\n')
      .trim(),
    elements: [...new Set(Array.from(html.matchAll(/<(\w+)/g), ([, name]) => name ?? ''))].sort(),
  };
}

const hostile = [
  '**bold** _it_ ~~gone~~ `code`',
  '[a link](https://example.org)',
  '![a picture](https://example.org/x.png)',
  '<img src=x onerror=alert(1)>',
  '<script>alert(1)</script>',
  '<https://example.org>',
  'see https://example.org and www.example.org and me@example.org',
  '# heading',
  '- item',
  '+ item',
  '1. item',
  '12) item',
  '> quote',
  '    indented code',
  '```js',
  '| a | b |',
  '--- ',
  '===',
  '&copy; &#35;',
  'back\\slash \\[x\\]',
  '$(alert) $x^2$',
  ':::note',
  '[x]: https://example.org',
  '[ ] task',
  '\\',
  '*',
  '***',
  '**',
];

describe('a text from a scenario', () => {
  it.each(hostile)('%j stays what was written, wherever it stands', (text) => {
    const { text: seen, elements } = rendered({
      place,
      title: text,
      origin: text,
      lines: [{ label: text, text }, { sentence: text }],
    });
    expect(elements).toEqual(['li', 'p', 'strong', 'ul']);
    const shown = text.replace(/ {2,}/g, ' ').trim();
    expect(seen.split('\n')).toEqual([shown, shown, `${shown}: ${shown}`, shown]);
  });

  it.each(['two\nlines', 'two\r\n\r\nlines', 'two\u2028lines', 'two\u0000lines', 'two\u202Elines', 'two\tlines'])(
    '%j is one line',
    (text) => {
      const hover = { place, title: text, origin: null, lines: [{ sentence: text }] };
      expect(rendered(hover).text).toBe('two lines\ntwo lines');
      expect(asPlainText(hover)).toBe('two lines\ntwo lines');
    },
  );
});

describe('a hover', () => {
  const hover: HoverText = {
    place,
    title: '35.46 MJ/kg: Lower heating value of slurry',
    origin: 'Worked out from 3 portions.',
    lines: [{ label: 'Density', text: '812.4 kg/m³' }, { sentence: '= 9.85 kWh/kg' }],
  };

  it('reads well as plain text', () => {
    expect(asPlainText(hover)).toBe(
      [
        '35.46 MJ/kg: Lower heating value of slurry',
        'Worked out from 3 portions.',
        'Density: 812.4 kg/m³',
        '= 9.85 kWh/kg',
      ].join('\n'),
    );
  });

  it('has its numbers and units unescaped in Markdown, for clients that show it as it is', () => {
    expect(asMarkdown(hover)).toBe(
      [
        '**35.46 MJ/kg: Lower heating value of slurry**',
        '',
        'Worked out from 3 portions.',
        '',
        '- Density: 812.4 kg/m³',
        '- = 9.85 kWh/kg',
      ].join('\n'),
    );
  });

  it('is never longer than a person reads', () => {
    const lines = Array.from({ length: 40 }, (_, line) => ({ sentence: `line ${line}` }));
    expect(asPlainText({ ...hover, lines }).split('\n')).toHaveLength(MOST_LINES);
    expect(asPlainText({ ...hover, origin: null, lines }).split('\n')).toHaveLength(MOST_LINES);
  });

  it('cuts a long text between characters', () => {
    expect(shortened('𝛼𝛽𝛾𝛿', 3)).toBe('𝛼𝛽…');
    expect(shortened('𝛼𝛽𝛾', 3)).toBe('𝛼𝛽𝛾');
  });
});
