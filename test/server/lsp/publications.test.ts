// What is sent to the client: replaced and never cleared first, not twice, for the right text, and cleared in the end.
import { DiagnosticSeverity, type Diagnostic } from 'vscode-languageserver';
import { beforeEach, describe, expect, it } from 'vitest';
import { Publications, type Said } from '../../../server/lsp/publications.ts';

const open = new Map<string, { uri: string; version: number; getText(): string }>();
let sent: [uri: string, version: number | null, messages: string[]][] = [];
let publications: Publications;

const diagnostic = (message: string): Diagnostic => ({
  range: { start: { line: 0, character: 0 }, end: { line: 0, character: 1 } },
  severity: DiagnosticSeverity.Error,
  code: 'x/y',
  message,
});
const opened = (address: string, version: number, text: string): void => {
  open.set(address, { uri: `file:///${address}`, version, getText: () => text });
};
const said = (lists: Record<string, [text: string, ...messages: string[]]>): ReadonlyMap<string, Said> =>
  new Map(
    Object.entries(lists).map(([address, [text, ...messages]]) => [
      address,
      { uri: `file:///${address}`, text, diagnostics: messages.map(diagnostic) },
    ]),
  );
/** What was sent since last asked. */
const news = (): typeof sent => {
  const before = sent;
  sent = [];
  return before;
};

beforeEach(() => {
  open.clear();
  sent = [];
  publications = new Publications(
    (address) => open.get(address),
    (uri, version, list) =>
      sent.push([uri, version, list.map(({ message }) => (typeof message === 'string' ? message : message.value))]),
  );
});

describe('an open document', () => {
  it('is told of with its version, also when nothing is wrong', () => {
    opened('a', 1, 'text');
    publications.replace('a', said({ a: ['text'] }));
    expect(news()).toEqual([['file:///a', 1, []]]);
  });

  it('has its list replaced, not cleared first', () => {
    opened('a', 1, 'text');
    publications.replace('a', said({ a: ['text', 'one'] }));
    opened('a', 2, 'text2');
    publications.replace('a', said({ a: ['text2', 'two'] }));
    expect(news()).toEqual([
      ['file:///a', 1, ['one']],
      ['file:///a', 2, ['two']],
    ]);
  });

  it('is not told the same twice for one version', () => {
    opened('a', 1, 'text');
    publications.replace('a', said({ a: ['text', 'one'] }));
    publications.replace('a', said({ a: ['text', 'one'] }));
    expect(news()).toHaveLength(1);
  });

  it('is not told what belongs to another text', () => {
    opened('a', 2, 'newer');
    publications.replace('a', said({ a: ['older', 'one'] }));
    expect(news()).toEqual([]);
  });

  it('is cleared when it closes', () => {
    opened('a', 1, 'text');
    publications.replace('a', said({ a: ['text', 'one'] }));
    news();
    open.delete('a');
    publications.close('a');
    expect(news()).toEqual([['file:///a', null, []]]);
  });
});

describe('a used file', () => {
  beforeEach(() => {
    opened('a', 1, 'use');
  });

  it('that is closed is told of without version, and cleared with the last document that uses it', () => {
    publications.replace('a', said({ a: ['use'], b: ['used', 'wrong'] }));
    expect(news()).toEqual([
      ['file:///a', 1, []],
      ['file:///b', null, ['wrong']],
    ]);
    open.delete('a');
    publications.close('a');
    expect(news()).toEqual([
      ['file:///a', null, []],
      ['file:///b', null, []],
    ]);
  });

  it('that is closed and right is not spoken of', () => {
    publications.replace('a', said({ a: ['use'], b: ['used'] }));
    expect(news()).toEqual([['file:///a', 1, []]]);
  });

  it('shows what two documents say of it, the same thing once', () => {
    opened('c', 1, 'use');
    publications.replace('a', said({ a: ['use'], b: ['used', 'wrong'] }));
    publications.replace('c', said({ c: ['use'], b: ['used', 'wrong', 'also'] }));
    expect(news().at(-1)).toEqual(['file:///b', null, ['wrong', 'also']]);
  });

  it('that is open too shows its own list first and what others add, of the same text only', () => {
    opened('b', 5, 'used');
    publications.replace('a', said({ a: ['use'], b: ['used', 'twice'] }));
    expect(news()).toEqual([['file:///a', 1, []]]); // it waits for its own evaluation
    publications.replace('b', said({ b: ['used', 'own'] }));
    expect(news()).toEqual([['file:///b', 5, ['own', 'twice']]]);
    opened('b', 6, 'edited');
    publications.replace('b', said({ b: ['edited', 'own'] }));
    expect(news()).toEqual([['file:///b', 6, ['own']]]);
  });

  it('that is no longer used is cleared', () => {
    publications.replace('a', said({ a: ['use'], b: ['used', 'wrong'] }));
    news();
    publications.replace('a', said({ a: ['use'] }));
    expect(news()).toEqual([['file:///b', null, []]]);
  });
});
