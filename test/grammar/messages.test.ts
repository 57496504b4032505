import { describe, expect, test } from 'vitest';
import { problemsOf, parse } from '../../grammar/parse.ts';
import { checkProblems, readSections } from '../support/syntax.ts';
import { isTestUnit } from '../support/units.ts';

describe('slips that are told, not read', () => {
  test.each([
    [
      'a decimal comma',
      `
let x = 44,0 MJ/kg
//      ^^^^ syntax/unexpected: \`44,0\` has a decimal comma. Write \`44.0\``,
    ],
    [
      'grouped digits',
      `
let x = 1 000 kW
//      ^^^^^ syntax/unexpected: \`1 000\` is not one number here. Write it without gaps: \`1000\`.
let y = 1_000 kW
//      ^^^^^ syntax/unexpected: \`1_000\` is not one number here
let z = 1,000,000 kW
//      ^^^^^^^^^ syntax/unexpected: \`1,000,000\` is not a number`,
    ],
    [
      'two numbers',
      `
let x = 12 34
//      ^^^^^ syntax/unexpected: Two numbers stand side by side: \`12\` and \`34\``,
    ],
    [
      'numbers beyond reach',
      `
let x = 1e400
//      ^^^^^ syntax/unexpected: \`1e400\` is too large
let y = 1e-400
//      ^^^^^^ syntax/unexpected: \`1e-400\` is too small
let z = 1/0
//      ^^^ syntax/unexpected: \`1/0\` divides by zero`,
    ],
    [
      'dates',
      `
blend a {
  bought: 2024-03-01
//        ^^^^^^^^^^ syntax/unexpected: \`2024-03-01\` looks like a date. A date stands only inside text
  sold: 1.3.2024
//      ^^^^^^^^ syntax/unexpected: \`1.3.2024\` looks like a date
  kept: "2024-03-01"
}`,
    ],
    [
      'unclosed text and names',
      `
blend a {
  source: "certificate
//        ^^^^^^^^^^^^ syntax/unclosed: This text has no closing \`"\`; it ends at the end of its line.
  2 % mass 'sodium oleate
//         ^^^^^^^^^^^^^^ syntax/unclosed: This quoted name has no closing
  3 % mass ''
//         ^^ syntax/missing: There is no name between these quotes.
}`,
    ],
    [
      'minus signs without space',
      `
let x = 3 kW -2 kW
//           ^ syntax/unexpected: A minus between two values needs a space on both sides
let y = a- b
//       ^ syntax/unexpected: A minus between two values
let z = (a)-3
//         ^ syntax/unexpected: A minus between two values`,
    ],
    [
      'names with a hyphen',
      `
let x = a-b
//      ^^^ syntax/unexpected: \`a-b\` is no name. A minus needs a space on both sides
blend a {
  limit: 3 * (a-b), ends as-product
//            ^^^ syntax/unexpected: \`a-b\` is no name
}`,
    ],
    [
      'a missing closing brace',
      `
blend a {
^^^^^^^ syntax/unclosed: The definition \`a\` has no closing \`}\`
  rest b

blend c {
  rest d
}`,
    ],
    [
      'a missing opening brace',
      `
blend a
^^^^^^^ syntax/missing: A \`{\` is missing behind \`a\`
  rest b
}`,
    ],
    [
      'headers',
      `
slurry {
^^^^^^ syntax/missing: The kind of \`slurry\` is missing
  rest b
}
blend {
^^^^^ syntax/missing: This blend has no name
  rest b
}
blend my slurry {
//       ^^^^^^ syntax/unexpected: This does not fit before a \`{\`
  rest b
}
blend Slurry {
//    ^^^^^^ syntax/unexpected: A bare name is made of small letters, digits and \`_\`. Put this one in quotes: \`'Slurry'\`.
  rest b
}
blend 'my slurry' {
  rest b
}`,
    ],
    [
      'stray things',
      `
}
^ syntax/unexpected: This \`}\` closes no definition.
let a = 3
  foo: 3
//^^^^^^ syntax/unexpected: This stands outside of any definition
  bar: 4`,
    ],
    [
      'statements that break off',
      `
scenario
^^^^^^^^ syntax/missing: The title in quotes is missing
use house/suppliers.stoke
^^^ syntax/missing: The path of a file, in quotes, is missing
let
^^^ syntax/missing: A name is missing
let x
//  ^ syntax/missing: The \`=\` behind the name is missing
let x =
//    ^ syntax/missing: The value is missing
let x = 3 +
//        ^ syntax/missing: A value is missing behind \`+\`.
expect
^^^^^^ syntax/missing: The claim is missing
expect a
//     ^ syntax/missing: A comparison is missing
expect a < b < c
//           ^ syntax/unexpected: Only one comparison can stand here
let y = lower heating value of
//                          ^^ syntax/missing: A name is missing behind \`of\`
use "a" "b"
//      ^^^ syntax/unexpected: This does not belong to the \`use\` before it`,
    ],
    [
      'lines of a definition',
      `
blend a {
  fuel slurry
//^^^^ syntax/unexpected: This line is neither an entry nor a portion
  fuel:
//^^^^ syntax/missing: \`fuel\` has no value
  30 % mass
//     ^^^^ syntax/missing: This portion names no substance
  5 kg
//  ^^ syntax/missing: This portion names no substance
  30 % sodium oleate
//     ^^^^^^ syntax/unexpected: \`sodium\` does not fit here. A portion is an amount and one substance
  fuel: a: b
//       ^ syntax/unexpected: A colon does not fit here
  fuel: a,
//       ^ syntax/missing: Nothing stands behind this comma
  fuel: , a
//      ^ syntax/unexpected: A value is missing before this comma
  fuel: a < b
//        ^ syntax/unexpected: \`<\` compares, and a comparison stands only
  fuel: use a
//      ^^^ syntax/unexpected: \`use\` is a reserved word
  fuel: a ± 2
//        ^ syntax/unexpected: \`±\` belongs right behind a number
  fuel: (a
//      ^ syntax/unclosed: This bracket is not closed
  fuel: a)
//       ^ syntax/unexpected: This \`)\` closes no bracket
  fuel: a @ b
//        ^ syntax/unexpected: The character \`@\` means nothing here
  fuel: -> a
//      ^^ syntax/unexpected: An arrow belongs in the equation
  fuel: ()
//       ^ syntax/unexpected: A value is missing before this \`)\`
  2 Na, 3 K -> NaK
//    ^ syntax/unexpected: A comma does not fit here
  Na 3 -> NaK
//   ^ syntax/unexpected: \`3\` does not fit here. An equation joins
  acknowledge
//^^^^^^^^^^^ syntax/missing: The code that is acknowledged is missing
  acknowledge hazard/fire
//            ^^^^^^^^^^^ syntax/missing: A reason is missing
  acknowledge hazard/fire: "a" b
//                             ^ syntax/unexpected: Nothing but its reason
  acknowledge hazard/fire: ""
}`,
    ],
    [
      'equations that break off',
      `
reaction a {
  2 Na ->
//     ^^ syntax/missing: The right side of this equation is missing
}
reaction b {
  2 Na + H2 -> 2 NaH +
//                   ^ syntax/missing: A value is missing behind \`+\`
}
reaction c {
  2 Na +
//     ^ syntax/missing: This looks like an equation without its arrow
}`,
    ],
    [
      'operators that are missing',
      `
let x = a b
//        ^ syntax/unexpected: \`b\` does not fit behind \`a\`. Is an operator missing
let y = a * / b
//          ^ syntax/unexpected: A value is needed here, but \`/\` stands behind \`*\`
let z = a < b
//        ^ syntax/unexpected: \`<\` compares`,
    ],
  ])('%s', (_name, fixture) => {
    checkProblems(fixture);
  });

  test.each([
    ['let x = 44,0 MJ/kg', 'let x = 44.0 MJ/kg'],
    ['let x = 1 000 kW', 'let x = 1000 kW'],
    ['let x = 1_000.5 kW', 'let x = 1000.5 kW'],
    ['let x = a- b', 'let x = a -  b'],
    ['blend a {\n  source: "b\n}', 'blend a {\n  source: "b"\n}'],
    ['blend a {\n  rest b', 'blend a {\n  rest b\n}'],
    ['# first\n\nblend a\n  rest b\n}', '# first\n\nblend a {\n  rest b\n}'],
    ['let Days = 3', "let 'Days' = 3"],
    ['}', ''],
  ])('%s is mended as offered', (text, mended) => {
    const fix = problemsOf(parse(text, isTestUnit))[0]?.fix;
    const result =
      fix === undefined ? 'no fix' : text.slice(0, fix.span.start) + fix.newText + text.slice(fix.span.end);
    expect(result).toBe(mended);
    expect(problemsOf(parse(result, isTestUnit))).toEqual([]);
  });

  test('no sentence uses words of the parser', () => {
    const snippets = [
      '@',
      '}',
      'let',
      'blend {',
      'blend a {\n x\n y: z:\n 3 ->\n <\n * \n ( \n ± \n rest\n',
      'let a = 3 3 3',
    ];
    for (const snippet of snippets) {
      for (const { message } of problemsOf(parse(snippet, isTestUnit))) {
        expect(message).not.toMatch(/token|expecting|-->|EOF|Redundant/i);
        expect(message).toMatch(/[.?]$/);
      }
    }
  });
});

describe('what can be kept of a broken text is kept', () => {
  test.each([
    ['let x = 3 +', ['let x = ?']],
    ['blend a {\n fuel: 44,0\n rest b\n}', ['blend a {broken fuel; portion rest of b}']],
    ['slurry {\n rest b\n}', ['broken slurry']],
    ['blend a {\n source: "b\n}', ['blend a {source: "b"…}']],
    ['blend a {\n acknowledge x/y\n}', ['blend a {acknowledge x/y "?"}']],
    ['blend (a {\n rest b\n}', ['blend a {portion rest of b}']],
    ['let blend a {\n rest b\n}', ['blend a {portion rest of b}']],
    ['## doc\nlet x = 3\n}', ['[doc] let x = 3', 'broken']],
  ])('%s', (text, outlines) => {
    expect(readSections(text)).toEqual(outlines);
  });
});
