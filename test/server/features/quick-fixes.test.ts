// The mends on offer, applied: the text they give, and that the finding they belong to is gone.
import { describe, it } from 'vitest';
import { checkFix } from '../../support/features.ts';

describe('a preferred fix', () => {
  it('balances an equation', () => {
    checkFix(
      'reaction soda {\n  Na(cr) + O2(g) + C$0O2(g) -> Na2CO3(cr)\n}\n',
      'balance/elements',
      'reaction soda {\n  4 Na(cr) + O2(g) + 2 CO2(g) -> 2 Na2CO3(cr)\n}\n',
    );
  });

  it('closes the shares', () => {
    checkFix(
      'blend $0fuel {\n  30 % mass methanol\n  50 % mass ethanol\n}\n$0',
      'balance/shares',
      'blend fuel {\n  30 % mass methanol\n  rest mass ethanol\n}\n',
    );
  });

  it('writes the name that was meant', () => {
    checkFix('let dist = 38 nmi\nlet b = 2 * $0dits\n', 'name/unknown', 'let dist = 38 nmi\nlet b = 2 * dist\n');
  });
});
