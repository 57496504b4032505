// Settings and abilities: whatever a client sends, there is a sensible value for each.
import { describe, expect, it } from 'vitest';
import { abilitiesOf } from '../../../server/lsp/abilities.ts';
import { asSettings, DEFAULT_SETTINGS } from '../../../server/lsp/settings.ts';

describe('settings', () => {
  it.each([null, undefined, 3, 'pause', [], {}, { pause: 'long' }, { pause: NaN, severity: null }])(
    '%j gives the defaults',
    (sent) => {
      expect(asSettings(sent)).toEqual(DEFAULT_SETTINGS);
    },
  );

  it.each([
    [0, 0],
    [250, 250],
    [-5, 0],
    [1e9, 10_000],
  ])('a pause of %d is %d', (pause, read) => {
    expect(asSettings({ pause }).pauseMs).toBe(read);
  });

  it.each([
    [1, 1_000_000],
    [2.5, 2_500_000],
    [0, 10_000],
    [1e9, 16_000_000],
  ])('a largest file of %d MB is %d characters', (largestFile, read) => {
    expect(asSettings({ largestFile }).largestText).toBe(read);
  });

  it('take single severities and leave out what is none', () => {
    const { severities } = asSettings({
      severity: { 'name/unknown': 'hint', 'unit/missing': 'off', 'x/y': 'loud', 'x/z': 3 },
    });
    expect([...severities]).toEqual([
      ['name/unknown', 'hint'],
      ['unit/missing', 'off'],
    ]);
  });
});

describe('abilities', () => {
  it.each([
    null,
    undefined,
    'client',
    {},
    { capabilities: null },
    { capabilities: { textDocument: 7 }, workspaceFolders: [null, 3] },
  ])('of %j are none', (params) => {
    const { folders, completion, ...abilities } = abilitiesOf(params);
    expect(folders).toEqual([]);
    expect(Object.values(abilities).every((ability) => ability === false)).toBe(true);
    const { suggestCommand, ...others } = completion;
    expect(suggestCommand).toBeNull();
    expect(Object.values(others).every((ability) => ability === false)).toBe(true);
  });

  it('are read where they are said', () => {
    expect(
      abilitiesOf({
        capabilities: {
          textDocument: {
            hover: { contentFormat: ['plaintext', 'markdown'] },
            codeAction: { codeActionLiteralSupport: {} },
            completion: { completionItem: { snippetSupport: true, documentationFormat: ['markdown'] } },
            semanticTokens: {},
          },
          workspace: { configuration: true },
        },
        initializationOptions: { readFile: true, suggestCommand: 'suggest' },
        workspaceFolders: [{ uri: 'file:///C%3A/ships', name: 'ships' }],
      }),
    ).toMatchObject({
      markdown: true,
      codeActions: true,
      semanticTokens: true,
      completion: { snippets: true, markdown: true, insertReplace: false, suggestCommand: 'suggest' },
      configuration: true,
      readFile: true,
      folders: ['file:///c%3A/ships'],
    });
  });

  it('take the one root of older clients for a folder', () => {
    expect(abilitiesOf({ rootUri: 'file:///ships' }).folders).toEqual(['file:///ships']);
  });
});
