// One place has one address, however a client spells its URI, and the way back names the same place.
import { describe, expect, it } from 'vitest';
import { addressOf, folderOf, isInside, uriOf } from '../../../server/lsp/addresses.ts';
import { resolveUse } from '../../../server/scenario/files.ts';

const sameAddress: readonly (readonly [string, string, string])[] = [
  ['an escaped drive', 'file:///c%3A/ships/a.stoke', 'file:///c:/ships/a.stoke'],
  ['the drive in capitals', 'file:///C:/ships/a.stoke', 'file:///c:/ships/a.stoke'],
  ['an escaped blank', 'file:///my%20ships/a.stoke', 'file:///my ships/a.stoke'],
  ['letters beyond ASCII', 'file:///sj%C3%B6/a.stoke', 'file:///sjö/a.stoke'],
  ['an apostrophe', "file:///it's/a.stoke", 'file:///it%27s/a.stoke'],
  ['a query', 'vscode-vfs://hub/ships/a.stoke?ref=1', 'vscode-vfs://hub/ships/a.stoke'],
];

describe('the address of a document', () => {
  it.each(sameAddress)('is the same with and without %s', (_, first, second) => {
    expect(addressOf(first)).toBe(addressOf(second));
  });

  it.each([
    'file:///c%3A/my%20ships/a.stoke',
    'file:///sj%C3%B6/a%25b%23c.stoke',
    'vscode-remote://ssh-remote%2Bhost/a/b.stoke',
  ])('leads back to %s', (uri) => {
    expect(uriOf(addressOf(uri))).toBe(uri);
  });

  it.each(['untitled:Untitled-1', 'nonsense', '', 'file:///%E0%A4%A'])('of %j does not throw', (uri) => {
    expect(addressOf(uri)).toBeTypeOf('string');
  });

  it.each([
    ['file:///ships/dunlin.stoke', 'house/my suppliers.stoke', 'file:///ships/house/my%20suppliers.stoke'],
    ['file:///ships/deep/dunlin.stoke', "../it's (new).stoke", 'file:///ships/it%27s%20(new).stoke'],
    ['file:///ships/dunlin.stoke', 'sjö.stoke', 'file:///ships/sj%C3%B6.stoke'],
  ])('used from %s by %j is that of the same file opened', (from, path, opened) => {
    expect(resolveUse(addressOf(from), path)).toBe(addressOf(opened));
  });
});

describe('the limit', () => {
  it('is the folder and all below it', () => {
    expect(isInside('file:///ships/a.stoke', ['file:///ships'])).toBe(true);
    expect(isInside('file:///ships/deep/a.stoke', ['file:///ships/'])).toBe(true);
  });

  it.each([
    'file:///shipsyard/a.stoke',
    'file:///other/a.stoke',
    'file:///ships/../etc/a.stoke',
    'vscode-vfs:///ships/a.stoke',
  ])('leaves out %s', (address) => {
    expect(isInside(address, ['file:///ships'])).toBe(false);
  });

  it('of a single file is its own folder; a document without a place has none', () => {
    expect(folderOf('file:///ships/a.stoke')).toBe('file:///ships/');
    expect(folderOf('untitled:Untitled-1')).toBeNull();
  });
});
