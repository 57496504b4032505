// The outline: what a file holds, in its order, each with the one number a person looks for.
import { describe, it } from 'vitest';
import { checkSymbols } from '../../support/features.ts';

describe('the outline', () => {
  it('has the title, definitions, values and expectations of the file in their order', () => {
    checkSymbols(
      `
      scenario "Dunlin"
      let days = 210 per year
      blend fuel {
        100 % methanol
      }
      engine main {
        cycle: diesel
      }
      expect lower heating value of fuel > 10 MJ/kg
      expect lower heating value of fuel > 50 MJ/kg
      expect lower heating value of nothing > 50 MJ/kg
      `,
      [
        'title Dunlin: scenario',
        'value days: 210 per year',
        /^definition fuel: blend, 19[.]9\d* MJ\/kg$/,
        'definition main: engine',
        'expectation expect lower heating value of fuel > 10 MJ/kg: holds',
        'expectation expect lower heating value of fuel > 50 MJ/kg: fails',
        'expectation expect lower heating value of nothing > 50 MJ/kg: not known',
      ],
    );
  });

  it('leaves out what stands in used files', () => {
    checkSymbols('use "house.stoke"\nlet b = 2\n#- house.stoke\nlet a = 1\n', ['value b: 2']);
  });

  it('names what has no name, or none that can be shown', () => {
    checkSymbols("blend {\n  100 % methanol\n}\nblend '\u202E ' {\n}\n", [
      /^definition blend: /,
      /^definition blend: /,
    ]);
  });

  it('is empty for an empty file, and for one of comments', () => {
    checkSymbols('', []);
    checkSymbols('# nothing yet\n', []);
  });
});
