// Names over one file and several, and `use`: what is reached, what is refused, what is said where.
import { describe, expect, test } from 'vitest';
import { findingsOf } from '../../../server/findings/registry.ts';
import { evaluate } from '../../../server/scenario/evaluate.ts';
import { resolveUse } from '../../../server/scenario/files.ts';
import { checkFacts, figureOf, valueOf } from '../../support/facts.ts';

describe('names', () => {
  test('given twice: a fact at both, and the name stands for neither', () => {
    checkFacts(`
      let p = 1
      #   ^ name/duplicate
      let p = 2
      #   ^ name/duplicate
      let q = p + 1
    `);
  });

  test('given twice over two files', () => {
    checkFacts(`
      use "other.stoke"
      let p = 1
      #   ^ name/duplicate
      #- other.stoke
      let p = 2
      #   ^ name/duplicate
    `);
  });

  test('a long ring is told by its start and its end', () => {
    const text = Array.from({ length: 9 }, (_, index) => `let a${index} = a${(index + 1) % 9}\n`).join('');
    const [finding, ...others] = findingsOf(evaluate('ring.stoke', () => ({ text })));
    expect(others).toEqual([]);
    expect(finding?.message).toBe(
      'These definitions depend on each other in a circle: `a0` needs `a1`, `a1` needs `a2`, `a2` needs `a3`, so on through 4 more and ' +
        '`a8` needs `a0` again. Break the circle at one of them.',
    );
  });

  test('what stands on a ring is still looked at for slips of its own', () => {
    const scenario = checkFacts(`
      let a = b + 3 kgg
      #             ^^^ unit/unknown
      let b = a
      #       ^ name/cycle
      blend c {
        100 % c
      #       ^ name/cycle
        stored: 20 kgg
      #            ^^^ unit/unknown
      }
      let heat = lower heating value of c
    `);
    expect(scenario.files[0]?.definitions.map(({ name }) => name)).toEqual(['c']);
    expect(scenario.files[0]?.values.map(({ quantity }) => quantity)).toEqual([null, null, null]);
  });

  test('a value may be given below the definition whose entry it stands in', () => {
    const scenario = checkFacts(`
      substance x {
        composition: 86 % C, 14 % H
        lower heating value: 43 MJ/kg
        density: rho
      }
      let rho = 780 kg/m3
    `);
    expect(figureOf(scenario, 'x', 'density')).toBe(780);
  });

  test('a row of a table may be given below what speaks of it', () => {
    const scenario = checkFacts(`
      let share = mass share of 'fuel x' in f
      blend f {
        40 % 'fuel x'
        rest methanol
      }
      substance 'fuel x' {
        composition: 86 % C, 14 % H
      }
    `);
    expect(valueOf(scenario, 'share')).toBeCloseTo(0.4, 12);
  });

  test('a listed word, or one of an entry that nobody reads, names nothing', () => {
    checkFacts(`
        site twin {
      # ^^^^ kind/not-evaluated
          wind: twin
        }
      blend b {
        100 % methanol
        cycle: b
      # ^^^^^ name/unknown-entry
      }
    `);
  });

  test('a share of a blend that is defined further down, and is no portion', () => {
    checkFacts(`
      blend slurry {
        30 % sodium
        rest methanol
      }
      let x = later in slurry
      #       ^^^^^ name/unknown
      blend later {
        100 % ethanol
      }
    `);
  });

  test('spelt like a unit', () => {
    checkFacts(`
      let bar = 3
      #   ^^^ name/reserved
      let q = 3 * 2
    `);
  });

  test('a definition may be called like a catalogue substance, with an information; it then stands for it', () => {
    const scenario = checkFacts(`
      substance methanol {
      #         ^^^^^^^^ name/like-catalogue
        formula: CH3OH
        lower heating value: 19.9 MJ/kg
      }
      blend b {
        100 % methanol
      }
    `);
    expect(figureOf(scenario, 'b', 'lower-heating-value')).toBeCloseTo(19.9, 9);
  });

  test('an unknown kind of definition', () => {
    checkFacts(`
      let x = 1
        blends x2 {
      # ^^^^^^ name/unknown-kind
          100 % gas_oil
        }
    `);
  });
});

describe('use', () => {
  test('reaches on, and each file once', () => {
    const scenario = checkFacts(`
      use "a.stoke"
      use "b.stoke"
      let x = of_a + of_b
      #- a.stoke
      use "b.stoke"
      let of_a = of_b + 1
      #- b.stoke
      let of_b = 2
    `);
    expect(scenario.files.map((file) => file.path)).toEqual(['main.stoke', 'a.stoke', 'b.stoke']);
    expect(scenario.files.map((file) => file.used)).toEqual([false, true, true]);
    expect(valueOf(scenario, 'x')).toBe(5);
  });

  test('a cycle of files is one fact, at the `use` that closes it, and the files are answered', () => {
    const scenario = checkFacts(`
      use "a.stoke"
      let x = of_a
      #- a.stoke
      use "main.stoke"
      #   ^^^^^^^^^^^^ name/use-cycle
      let of_a = 7
    `);
    expect(valueOf(scenario, 'x')).toBe(7);
  });

  test('a missing file, and paths that are not relative', () => {
    checkFacts(`
      use "nowhere.stoke"
      #   ^^^^^^^^^^^^^^^ name/missing-file
      use "/etc/passwd"
      #   ^^^^^^^^^^^^^ name/missing-file
      use "file:///a.stoke"
      #   ^^^^^^^^^^^^^^^^^ name/missing-file
      use "C:/a.stoke"
      #   ^^^^^^^^^^^^ name/missing-file
      let x = 1
    `);
  });

  test('a file still to be fetched: it is asked for, and names that may be in it are not called unknown', () => {
    const scenario = evaluate('main.stoke', (path) =>
      path === 'main.stoke' ? { text: 'use "a.stoke"\nlet x = of_a + 1\n' } : 'wanted',
    );
    expect(scenario.wanted).toEqual(['a.stoke']);
    expect(scenario.files[0]?.facts).toEqual([]);
  });

  test.each(['main.stoke', './main.stoke', './/main.stoke'])('%s is reached once, by a file that uses it', (root) => {
    const texts = new Map([
      ['main.stoke', 'use "a.stoke"\nlet x = 1\n'],
      ['a.stoke', 'use "main.stoke"\nlet y = x\n'],
    ]);
    const scenario = evaluate(root, (path) => {
      const text = texts.get(path.replace(/^\.\/+/, ''));
      return text === undefined ? { fault: 'missing' } : { text };
    });
    expect(scenario.files.map(({ path }) => path)).toEqual([root, 'a.stoke']);
    expect(scenario.files.flatMap(({ facts }) => facts.map(({ fact }) => fact.code))).toEqual(['name/use-cycle']);
  });

  test('paths are resolved against the using file, plain or URI', () => {
    expect(resolveUse('a/b.stoke', 'c.stoke')).toBe('a/c.stoke');
    expect(resolveUse('a/b.stoke', '../c.stoke')).toBe('c.stoke');
    expect(resolveUse('b.stoke', '../c.stoke')).toBe('../c.stoke');
    expect(resolveUse('./b.stoke', '../c.stoke')).toBe('../c.stoke');
    expect(resolveUse('./a/b.stoke', '../c.stoke')).toBe('c.stoke');
    expect(resolveUse('file:///w/b.stoke', 'my house/c.stoke')).toBe('file:///w/my%20house/c.stoke');
    expect(resolveUse('file:///b.stoke', '../c.stoke')).toBeNull();
    expect(resolveUse('b.stoke', 'a\\c.stoke')).toBeNull();
  });
});

describe('many syntax slips', () => {
  test('sixteen of them suspend what is computed, fifteen do not', () => {
    const text = (slips: number): string =>
      [...Array.from({ length: slips }, () => 'let 3 = 4'), 'let good = 3 kg + 2 m'].join('\n');
    const codes = (slips: number): string[] =>
      evaluate('main.stoke', () => ({ text: text(slips) })).files[0]?.facts.map(({ fact }) => fact.code) ?? [];
    expect(codes(15)).toContain('unit/mismatch');
    expect(codes(16)).not.toContain('unit/mismatch');
    expect(codes(16)).toContain('kind/suspended');
    expect(codes(15)).not.toContain('kind/suspended');
  });
});
