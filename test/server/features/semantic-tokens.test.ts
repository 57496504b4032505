// Colours by meaning: what each word of a small scenario is, and that the extension's manifest explains what is no standard.
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { semanticTokens, TOKEN_MODIFIERS, TOKEN_TYPES } from '../../../server/features/semantic-tokens.ts';
import { evaluateFixture } from '../../support/features.ts';

/** `word type modifiers` each. */
function tokensOf(marked: string): string[] {
  const { scenario, file, files } = evaluateFixture(marked);
  const text = files.get(file) ?? '';
  return semanticTokens(scenario, file).map(({ start, end, type, modifiers }) =>
    [text.slice(start, end), type, ...modifiers].join(' '),
  );
}

describe('the meaning of', () => {
  it.each<[what: string, text: string, tokens: string[]]>([
    ['a value', 'let a = 1\n', ['a variable declaration readonly']],
    [
      'a use of it',
      'let a = 1\nlet b = a\n',
      ['a variable declaration readonly', 'b variable declaration readonly', 'a variable readonly'],
    ],
    [
      'a blend',
      'blend f {\n  30 % mass sodium\n  rest Na(l)\n}\n',
      [
        'blend kind',
        'f class declaration',
        '% unit',
        'sodium substance defaultLibrary',
        'Na(l) substance defaultLibrary',
      ],
    ],
    [
      'a name of its own that the catalogue has too',
      'substance sodium {\n}\nblend f {\n  rest sodium\n}\n',
      ['substance kind', 'sodium class declaration', 'blend kind', 'f class declaration', 'sodium class'],
    ],
    ['an unknown name', 'blend f {\n  rest sodum\n}\n', ['blend kind', 'f class declaration']],
    [
      'an entry and its listed word',
      'substance x {\n  phase: liquid\n}\n',
      ['substance kind', 'x class declaration', 'phase property', 'liquid enumMember'],
    ],
    [
      'an entry its kind does not take',
      'substance x {\n  zzyzx: liquid\n}\n',
      ['substance kind', 'x class declaration'],
    ],
    [
      'elements of a composition',
      'substance x {\n  composition: 86 % C, 14 % H\n}\n',
      ['substance kind', 'x class declaration', 'composition property', '% unit', '% unit'],
    ],
    ['a compound unit', 'let a = 2 kJ/(kg K)\n', ['a variable declaration readonly', 'kJ unit', 'kg unit', 'K unit']],
    [
      'a figure',
      'expect lower heating value of methanol > 3 MJ/kg\n',
      ['lower heating value figure', 'methanol substance defaultLibrary', 'MJ unit', 'kg unit'],
    ],
    [
      'a share',
      'blend f {\n}\nlet a = methanol in f\n',
      [
        'blend kind',
        'f class declaration',
        'a variable declaration readonly',
        'methanol substance defaultLibrary',
        'f class',
      ],
    ],
    [
      'a function',
      'let a = min(1, 2)\nlet b = mni(1)\n',
      ['a variable declaration readonly', 'min function', 'b variable declaration readonly'],
    ],
    [
      'an equation',
      'reaction r {\n  2 Na(cr) -> 2 Na(l)\n}\n',
      ['reaction kind', 'r class declaration', 'Na(cr) substance defaultLibrary', 'Na(l) substance defaultLibrary'],
    ],
    [
      'an acknowledged hazard',
      'blend f {\n  acknowledge hazard/water-reactive: "a"\n}\n',
      ['blend kind', 'f class declaration', 'hazard/water-reactive findingCode acknowledged'],
    ],
    [
      'a definition that is not worked out',
      'supply b {\n  of: methanol\n}\n',
      ['supply kind', 'b class declaration', 'methanol substance defaultLibrary'],
    ],
    [
      'a name of a used file',
      'use "u.stoke"\nlet b = a\n#- u.stoke\nlet a = 1\n',
      ['b variable declaration readonly', 'a variable readonly'],
    ],
    [
      'words over two lines',
      'let a = min(density\n of methanol, 1)\n',
      ['a variable declaration readonly', 'min function', 'density figure', 'methanol substance defaultLibrary'],
    ],
  ])('%s', (_, text, tokens) => {
    expect(tokensOf(text)).toEqual(tokens);
  });
});

describe('the tokens of the examples', () => {
  it.each(['examples/dunlin.stoke', 'examples/constructs.stoke'])(
    '%s are in order, apart, and in one line each',
    (path) => {
      const { scenario, file, files } = evaluateFixture(readFileSync(path, 'utf8'));
      const text = files.get(file) ?? '';
      const tokens = semanticTokens(scenario, file);
      expect(tokens.length).toBeGreaterThan(20);
      let last = 0;
      for (const { start, end } of tokens) {
        expect(start).toBeGreaterThanOrEqual(last);
        expect(end).toBeGreaterThan(start);
        expect(text.slice(start, end)).not.toContain('\n');
        last = end;
      }
      const [middle] = tokens.slice(Math.floor(tokens.length / 2));
      const part = semanticTokens(scenario, file, middle?.start, middle?.end);
      expect(part).toContainEqual(middle);
      expect(part.length).toBeLessThan(tokens.length);
    },
  );
});

describe('the manifest', () => {
  interface Named {
    readonly id: string;
  }
  const { contributes } = JSON.parse(readFileSync('package.json', 'utf8')) as {
    contributes: {
      semanticTokenTypes: Named[];
      semanticTokenModifiers: Named[];
      semanticTokenScopes: { language: string; scopes: Record<string, string[]> }[];
    };
  };
  const standardTypes = ['class', 'variable', 'property', 'enumMember', 'function'];
  const standardModifiers = ['declaration', 'readonly', 'defaultLibrary'];

  it('explains every type and modifier that is no standard', () => {
    const ids = (list: Named[]): string[] => list.map(({ id }) => id);
    expect([...ids(contributes.semanticTokenTypes), ...standardTypes].sort()).toEqual([...TOKEN_TYPES].sort());
    expect([...ids(contributes.semanticTokenModifiers), ...standardModifiers].sort()).toEqual(
      [...TOKEN_MODIFIERS].sort(),
    );
  });

  it('gives each type a scope, for themes that know no meanings', () => {
    const [{ language, scopes } = { language: '', scopes: {} }] = contributes.semanticTokenScopes;
    expect(language).toBe('stokehold');
    expect(
      Object.keys(scopes)
        .map((key) => key.split('.')[0])
        .sort(),
    ).toEqual([...TOKEN_TYPES].sort());
  });
});
