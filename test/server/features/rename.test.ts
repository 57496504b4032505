// Renaming: the texts it gives, and what it refuses.
import { describe, expect, it } from 'vitest';
import { evaluateFixture } from '../../support/features.ts';
import { checkRefusal, checkRename, renamedTexts } from '../../support/navigation.ts';

const BLEND = 'blend $0f {\n  rest methanol\n}\nexpect density of f > 1 kg/m3\n';

describe('a rename', () => {
  it('changes a definition and all its uses', () => {
    checkRename(BLEND, 'fuel', 'blend fuel {\n  rest methanol\n}\nexpect density of fuel > 1 kg/m3\n');
  });

  it('works from a use', () => {
    checkRename('let a = 1\nlet b = 2 * $0a - a\n', 'c', 'let c = 1\nlet b = 2 * c - c\n');
  });

  it('puts quotes where the new name needs them', () => {
    checkRename('let a = 1\nlet b = $0a\n', 'my value', "let 'my value' = 1\nlet b = 'my value'\n");
  });

  it('takes quotes away where it does not', () => {
    checkRename("let 'my a' = 1\nlet b = $0'my a'\n", 'a', 'let a = 1\nlet b = a\n');
  });

  it('reads a new name in quotes as the name', () => {
    checkRename('let $0a = 1\n', "'new a'", "let 'new a' = 1\n");
  });

  it('reaches over used files, both ways', () => {
    const main = 'use "u.stoke"\nlet b = $0a\n#- u.stoke\nlet a = 1\nlet c = a\n';
    checkRename(main, 'e', 'use "u.stoke"\nlet b = e\n#- u.stoke\nlet e = 1\nlet c = e\n');
  });

  it('reaches definitions that are not evaluated', () => {
    checkRename(
      'blend $0f {\n}\nburn b {\n  fuel: f\n}\nsweep s {\n  vary: sodium in f from 0 % to 80 % at 33 points\n}\n',
      'slurry',
      'blend slurry {\n}\nburn b {\n  fuel: slurry\n}\nsweep s {\n  vary: sodium in slurry from 0 % to 80 % at 33 points\n}\n',
    );
  });

  it('leaves words alone that only look the same', () => {
    checkRename(
      'let $0liquid = 1\nsubstance x { # liquid\n  phase: liquid\n  source: "liquid"\n}\n',
      'a',
      'let a = 1\nsubstance x { # liquid\n  phase: liquid\n  source: "liquid"\n}\n',
    );
  });

  it('of a name given twice changes the one at the cursor', () => {
    checkRename('let a = 1\nlet $0a = 2\nlet b = a\n', 'c', 'let a = 1\nlet c = 2\nlet b = a\n');
  });

  it('to the same name changes nothing', () => {
    checkRename(BLEND, 'f', BLEND.replace('$0', ''));
  });

  it('and back gives the text as it was', () => {
    const texts = renamedTexts(BLEND, 'fuel oil');
    const there = typeof texts === 'string' ? '' : (texts['main.stoke'] ?? '');
    checkRename(there.replace("blend '", "blend $0'"), 'f', BLEND.replace('$0', ''));
  });

  it('leaves a scenario as free of findings as it was', () => {
    const texts = renamedTexts(BLEND, 'heavy fuel');
    const after = evaluateFixture(typeof texts === 'string' ? '' : (texts['main.stoke'] ?? ''));
    expect(after.findings.map(({ code }) => code).filter((code) => !code.startsWith('hazard/'))).toEqual([]);
  });
});

describe('a rename is refused', () => {
  it.each<[what: string, marked: string, newName: string, says: RegExp]>([
    ['to a reserved word', BLEND, 'rest', /^`rest` is a word of the language/],
    ['to a unit', BLEND, 'kJ', /^`kJ` is a unit/],
    ['to a catalogue substance', BLEND, 'sodium', /^`sodium` is a substance of the catalogue/],
    ['to a name of this file', 'let a = 1\nlet $0b = 2\n', 'a', /^`a` is taken already \(line 1\)/],
    ['to a name of a used file', 'use "u.stoke"\nlet $0b = 2\n#- u.stoke\n\nlet a = 1\n', 'a', /line 2 of u\.stoke/],
    ['to nothing', BLEND, '  ', /at least one character/],
    ['to a name with a quote in it', BLEND, "it's", /holds no `'`/],
    ['to two lines', BLEND, 'a\nb', /one line/],
    [
      'of a catalogue substance',
      BLEND.replace('$0', '').replace('methanol', '$0methanol'),
      'x',
      /of the catalogue, and/,
    ],
    ['of a number', 'let a = $01\n', 'b', /no name/],
    ['of a use of a name given twice', 'let a = 1\nlet a = 2\nlet b = $0a\n', 'c', /given more than once/],
  ])('%s', (_, marked, newName, says) => {
    checkRefusal(marked, newName, says);
  });
});
