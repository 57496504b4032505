// Definition, references and highlights on small scenarios, and over the examples: whatever the evaluation says a word
// stands for is found by its name too.
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { definition } from '../../../server/features/definition.ts';
import { references } from '../../../server/features/references.ts';
import { evaluateFixture } from '../../support/features.ts';
import { checkDefinition, checkHighlights, checkReferences } from '../../support/navigation.ts';

describe('the definition of', () => {
  it.each<[what: string, marked: string, places: string[]]>([
    ['a value in an expression', 'let a = 1\nlet b = 2 * $0a\n', ['main.stoke 1:5']],
    ['a name the cursor stands behind', 'let aa = 1\nlet b = aa$0', ['main.stoke 1:5']],
    ['a definition after `of`', 'blend f {\n  rest methanol\n}\nlet b = density of $0f\n', ['main.stoke 1:7']],
    ['the figure of a definition', 'blend f {\n  rest methanol\n}\nlet b = den$0sity of f\n', ['main.stoke 1:7']],
    ['a name that gives itself', 'let $0a = 1\n', ['main.stoke 1:5']],
    ['a portion', 'blend f {\n  rest methanol\n}\nblend g {\n  rest $0f\n}\n', ['main.stoke 1:7']],
    ['a quoted name', "let 'my a' = 1\nlet b = 'm$0y a'\n", ['main.stoke 1:5']],
    [
      'a species of an equation',
      'substance x {\n formula: O2\n}\nreaction r {\n  $0x -> O2(g)\n}\n',
      ['main.stoke 1:11'],
    ],
    [
      'a name in an entry of a kind that is not evaluated',
      'blend f {\n}\nburn b {\n  fuel: $0f\n}\n',
      ['main.stoke 1:7'],
    ],
    ['a name on a leg', 'engine main {\n}\nduty d {\n  sail: 38 nmi at 11 kn on $0main\n}\n', ['main.stoke 1:8']],
    ['the owner of a portion', 'blend f {\n  rest methanol\n}\nlet s = methanol in $0f\n', ['main.stoke 1:7']],
    [
      'the row of a table',
      'substance x {\n}\nblend f {\n  rest x\n}\nlet s = mass share of $0x in f\n',
      ['main.stoke 1:11'],
    ],
    ['a name given twice', 'let a = 1\nlet a = 2\nlet b = $0a\n', ['main.stoke 1:5', 'main.stoke 2:5']],
    ['a name of a used file', 'use "u.stoke"\nlet b = $0a\n#- u.stoke\nlet a = 1\n', ['u.stoke 1:5']],
    ['the path of a used file', 'use "u.s$0toke"\n#- u.stoke\nlet a = 1\n', ['u.stoke 1:1']],
    ['a used file that is missing', 'use "v.s$0toke"\n', []],
    [
      'a name in a value that needs a number',
      'let rho = 780 kg/m3\nsubstance x {\n  density: $0rho\n}\n',
      ['main.stoke 1:5'],
    ],
    ['a catalogue substance', 'blend f {\n  rest $0methanol\n}\n', []],
    ['an unknown name', 'let b = $0nothing\n', []],
    ['a listed word that is also a name', 'let liquid = 1\nsubstance x {\n  phase: $0liquid\n}\n', []],
    ['an element that is also a name', 'let C = 1\nsubstance x {\n  composition: 100 % $0C\n}\n', []],
    ['a formula with its phase', "substance 'K' {\n}\nblend f {\n  rest $0K(l)\n}\n", []],
    ['an entry that shares its word with its definition', 'engine diesel {\n  cycle: $0diesel\n}\n', []],
    ['a word in a comment', 'let a = 1\n# $0a\n', []],
    ['nothing', '\n$0\n', []],
  ])('%s', (_, marked, places) => {
    checkDefinition(marked, places);
  });
});

describe('references', () => {
  const main =
    'use "u.stoke"\nblend f {\n  50 % x\n  rest methanol\n}\nlet s = x in f\nexpect density of f > 1 kg/m3\n';
  const used = '#- u.stoke\nsubstance x {\n  density: 800 kg/m3\n}\n';

  it('of a name reach over used files', () => {
    checkReferences(main.replace('50 % x', '50 % $0x') + used, ['main.stoke 3:8', 'main.stoke 6:9', 'u.stoke 1:11']);
  });

  it('can leave out where the name is given', () => {
    checkReferences(main.replace('50 % x', '50 % $0x') + used, ['main.stoke 3:8', 'main.stoke 6:9'], false);
  });

  it('of a catalogue substance are found under each of its words', () => {
    checkReferences('blend f {\n  50 % meth$0anol\n  rest CH3OH(l)\n}\nblend g {\n  rest methyl_alcohol\n}\n', [
      'main.stoke 2:8',
      'main.stoke 3:8',
      'main.stoke 6:8',
    ]);
  });

  it('of a figure are those of the same definition', () => {
    checkReferences(
      'blend f {\n  rest methanol\n}\nlet a = $0density of f\nlet b = density of f\nlet c = density of methanol\n',
      ['main.stoke 4:9', 'main.stoke 5:9'],
    );
  });

  it('are none where nothing has a name', () => {
    checkReferences('let a = $01\n', []);
  });
});

describe('highlights', () => {
  it('tell where a name is given from where it is used, in this file only', () => {
    checkHighlights('use "u.stoke"\nlet $0a = 1\nlet b = a * a\n#- u.stoke\nlet c = a\n', [
      'definition 2:5',
      'use 3:9',
      'use 3:13',
    ]);
  });

  it('show the places of a catalogue substance', () => {
    checkHighlights('blend f {\n  rest $0methanol\n}\nblend g {\n  rest methanol\n}\n', ['use 2:8', 'use 5:8']);
  });
});

describe('over the examples', () => {
  it.each(['examples/dunlin.stoke', 'examples/constructs.stoke'])(
    '%s: every name that was understood is found',
    (path) => {
      const { scenario } = evaluateFixture(
        `${readFileSync(path, 'utf8').replaceAll('house/', '')}\n#- suppliers.stoke\n${readFileSync('examples/house/suppliers.stoke', 'utf8')}`,
      );
      let seen = 0;
      for (const file of scenario.files) {
        for (const { place, meaning } of file.meanings) {
          if (meaning.kind !== 'definition' && meaning.kind !== 'value') continue;
          const given = meaning.kind === 'definition' ? meaning.definition.namePlace : meaning.value.namePlace;
          seen++;
          expect(definition(scenario.files, file.path, place.start)).toContainEqual(given);
          expect(references(scenario.files, given.path, given.start, true)).toContainEqual(place);
        }
      }
      expect(seen).toBeGreaterThan(10);
    },
  );
});
