// What is shown where a person points: the answer first, where it comes from, then a few lines. One small scenario a case,
// with the cursor in it; numbers are checked against hand calculation, the rest against the words a person needs.
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { hover } from '../../../server/features/hover.ts';
import { asPlainText, MOST_LINES } from '../../../server/features/hover-text.ts';
import { evaluate } from '../../../server/scenario/evaluate.ts';
import { checkHover, evaluateFixture, hoverAt } from '../../support/features.ts';

describe('a number', () => {
  it.each<[string, readonly (string | RegExp)[]]>([
    ['let d = $038 nmi\n', ['38 nmi', /^A length/, /^= 70[.]38 km$/]],
    ['let v = 13$0 kn\n', ['13 kn', /^A speed/, /^= 6[.]688 m\/s$/]],
    ['let t = $025 degC\n', ['25 °C', /^A temperature/, '= 298.15 K', /^= 77 °F$/]],
    ['let p = $02 bar\n', ['2 bar', /^A pressure/, /^= 200 kPa$/]],
    ['let q = $044.0 ± 0.2 MJ/kg\n', [/^\(44[.]00 ± 0[.]20\) MJ\/kg$/, /^A /, /^= 12[.]22 kWh\/kg$/]],
    ['let m = -$020 degC\n', ['−20 °C', /^A temperature/]],
  ])('%j is told in sibling units', (marked, lines) => {
    checkHover(marked, lines);
  });

  it.each(['let n = $012\n', 'let n = $084.9 %\n'])('as in %j has nothing more to tell', (marked) => {
    checkHover(marked, null);
  });

  it('that is a small share is told in parts per million', () => {
    checkHover('let n = $00.05 %\n', ['0.05 %', /^A plain number/, '= 500 ppm']);
  });

  it('in a definition that is not worked out yet is told all the same', () => {
    checkHover('engine main {\n  maximum continuous rating: $06.4 MW\n}\n', ['6.4 MW', /^A power/, '= 6400 kW']);
    checkHover('engine main {\n  heat loss: 6.4 $0MW\n}\n', ['MW: megawatt', '6.4 MW', '= 6400 kW']);
  });

  it('is what the hover is about, with its unit', () => {
    expect(hoverAt('let d = $038 nmi # far\n')?.about).toBe('38 nmi');
  });
});

describe('a definition without figures', () => {
  const sentence = 'No figures yet: findings here, or in what it names, say what stands in the way.';

  it('says where to look, and so does what rests on it', () => {
    const blend = 'blend sludge {\n  20 % mass magnesium\n  rest: gas_oil\n}\n';
    checkHover(blend.replace('sludge', 's$0ludge'), ['Blend sludge', sentence]);
    const burn = 'burn flame {\n  fuel: sludge\n  oxidant: air\n  lambda: 2\n}\n';
    checkHover(blend + burn.replace('flame', 'f$0lame'), ['Burn flame', sentence]);
  });
});

describe('a unit word', () => {
  it.each<[string, readonly (string | RegExp)[], string]>([
    ['let d = 38 n$0mi\n', ['nmi: nautical mile', '1 nmi = 1852 m', /^Source: /, '38 nmi', /^= 70[.]38 km$/], 'nmi'],
    ['let q = 2 kJ/(k$0g K)\n', ['kg: kilogram', /^kg is a base unit$/, /^Source: SI Brochure/], 'kg'],
    ['let q = 2 MJ$0/kg\n', [/^kg|^MJ/], 'MJ'],
  ])('of %j says what it is', (marked, lines, about) => {
    if (!marked.includes('MJ$0')) checkHover(marked, lines);
    else checkHover(marked.replace('MJ$0', '$0MJ'), ['MJ: megajoule']);
    expect(hoverAt(marked.replace('MJ$0', '$0MJ'))?.about).toBe(about);
  });
});

describe('a value', () => {
  it('says its number, at its name and wherever it is used', () => {
    const lines = ['70.38 km: distance', /^A length/, /^= 38 nmi$/];
    checkHover('let $0distance = 38 nmi\n', lines);
    checkHover('let distance = 38 nmi\nlet twice = 2 * dis$0tance\n', lines);
  });

  it('that is a share is told as it is written', () => {
    checkHover('let dose = 30 %\nlet twice = 2 * do$0se\n', ['30 %: dose', 'A plain number']);
  });

  it('that could not be worked out says that, and not why: the finding does', () => {
    checkHover('let $0alpha = nothing_known\n', ['alpha', 'A value that could not be worked out']);
  });
});

describe('a definition', () => {
  const blend = (marked: string): string => `
    ## Stored in the after tank.
    ${marked} {
      60 % mass methanol
      rest ethanol
    }
  `;
  // 0.6 of methanol's 19.9 MJ/kg and 0.4 of ethanol's 26.8 MJ/kg.
  const lines = [
    /^22[.]\d+ MJ\/kg: Lower heating value, per kg$/,
    'Blend fuel. Stored in the after tank.',
    /^Higher heating value, per kg: 25[.]\d+ MJ\/kg$/,
    /^Stoichiometric dry air, per kg: 7[.]\d+ kg\/kg$/,
    /^Density: 79\d/,
    /^Burnt to, in mol\/kg: /,
  ];

  it('tells its first figures and what is written above it', () => {
    checkHover(blend('blend fu$0el'), lines);
    checkHover(`${blend('blend fuel')}expect lower heating value of fu$0el > 20 MJ/kg\n`, [/^22[.]/]);
  });

  it('tells about its kind at the word of the kind', () => {
    checkHover(blend('bl$0end fuel'), ['blend']);
    checkHover('engine ma$0in {\n}\n', ['Engine main']);
    checkHover('en$0gine main {\n}\n', ['engine', /^An engine, /]);
  });

  it('shows no balance of sides where there are none', () => {
    expect(hoverAt(blend('blend fu$0el'))?.lines.join('\n')).not.toMatch(/balanced/i);
  });
});

describe('a portion', () => {
  const fuel = 'blend fuel {\n  30 % mass sodium\n  rest methanol\n}\n';

  it.each([
    ['its amount', '30 %', '$030 %'],
    ['its substance', 'sodium', 'sod$0ium'],
    ['its basis', 'mass', 'ma$0ss'],
  ])('tells its shares and its substance at %s', (_, plain, marked) => {
    checkHover(fuel.replace(plain, marked), [
      '30 %% by mass: sodium in fuel'.replace('%%', '%'),
      /^37[.]\d+ % by mole, .*% by volume, .*% of the lower heating value$/,
      /^Molar mass: 22[.]99 g\/mol/,
    ]);
  });

  it('of a hazardous substance has one caution, before its numbers, and of another none', () => {
    checkHover(fuel.replace('sodium', 'sod$0ium'), [
      /^30 %/,
      /^37[.]/,
      /^sodium: Na, solid$/,
      /^Solid at/,
      /^Caution, sodium: water makes flammable gas that may take fire; burns skin and eyes[.] Screening only: /,
      /^Molar mass/,
    ]);
    const salt = hoverAt('blend brine {\n  3 % mass sodium_ca$0rbonate\n  rest water\n}\n');
    expect(salt?.lines.join('\n')).toMatch(/Molar mass/);
    expect(salt?.lines.join('\n')).not.toMatch(/Caution/);
  });

  it('of a substance of the scenario cautions of what it says of itself', () => {
    const own =
      'substance mix {\n  formula: NaK\n  hazards: H250, H300, alkali-metal\n}\nblend b {\n  100 % m$0ix\n}\n';
    checkHover(own, [/^100 %/, /^Caution, mix: takes fire in air; deadly poison[.] Screening only: /]);
  });

  it('that takes the rest tells what that came to', () => {
    checkHover(fuel.replace('rest', 're$0st'), ['70 % by mass: methanol in fuel']);
  });
});

describe('an equation', () => {
  const soda = (marked: string): string => `reaction soda {\n  ${marked}\n  state: 25 degC, 1 bar\n}\n`;

  it('that balances tells its enthalpy, per equation and per kg of its left side', () => {
    // 2 Na + 1/2 O2 + CO2 = Na2CO3: -1130.77 + 393.52 kJ; 45.98 + 16.00 + 44.01 g on the left.
    checkHover(soda('2 Na(cr) + 1/2 O2(g) + CO2(g) $0-> Na2CO3(cr)'), [
      /^−737[.]\d kJ: /,
      'Balanced: Na 2, O 3, C 1 on each side',
      /: −6956 kJ\/kg$|: −695\d[.]?\d* kJ\/kg$/,
    ]);
  });

  it('that does not balance tells each element that differs', () => {
    checkHover(soda('Na(cr) + O2(g) + CO2(g) $0-> Na2CO3(cr)'), [
      'Not balanced: Na 1 on the left and 2 on the right, O 4 on the left and 3 on the right',
    ]);
  });

  it('tells about a substance at its name', () => {
    checkHover(soda('2 Na(cr) + 1/2 O2(g) + CO2(g) -> Na2C$0O3(cr)'), [
      /Na2CO3/,
      /^Catalogue substance/,
      'Enthalpy of formation: −1131 kJ/mol at 25 °C (M. W. Chase Jr., 1998)',
    ]);
  });

  it('is told of by the name of its reaction too', () => {
    checkHover(soda('2 Na(cr) + 1/2 O2(g) + CO2(g) -> Na2CO3(cr)').replace('soda', 'so$0da'), [
      /^−737[.]\d kJ: /,
      'Reaction soda',
      'Balanced: Na 2, O 3, C 1 on each side',
    ]);
  });
});

describe('a reference', () => {
  it('tells the value, how it came about, and from what', () => {
    const marked = 'blend fuel {\n  100 % methanol\n}\nlet a = lower heat$0ing value of fuel\n';
    checkHover(marked, [
      /^19[.]9\d* MJ\/kg: Lower heating value, per kg \(fuel\)$/,
      /^Heat set free when 1 kg burns completely/,
      /^Source: /,
    ]);
  });

  it('to a substance of the catalogue tells it likewise', () => {
    checkHover('let a = molar $0mass of methanol\n', [/^32[.]04 g\/mol: Molar mass/]);
  });
});

describe('an expectation', () => {
  const claim = (value: string): string => `let far = 38 nmi\n$0expect far > ${value}\n`;

  it('that holds tells the value found', () => {
    checkHover(claim('20 km'), [/^70[.]38 km found$/, 'The claim holds']);
  });

  it('that fails tells nothing: the finding does', () => {
    checkHover(claim('100 km'), null);
  });
});

describe('an entry', () => {
  it('says what it is for and what it takes', () => {
    checkHover('substance oil {\n  den$0sity: 780 kg/m3\n}\n', [
      'density, of a substance',
      'The density, with the temperature it holds at.',
      /^Takes: a density, such as /,
      /^Otherwise: at 15 °C/,
    ]);
  });

  it('that its kind does not know says nothing: the finding does', () => {
    checkHover('substance oil {\n  dens$0ness: 780 kg/m3\n}\n', null);
  });
});

describe('everywhere else', () => {
  it.each(['$0\n\nlet a = 1\n', '# a com$0ment\n', 'let$0 a = 1 kg\n', '$0', 'blend b {\n$0\n}\n'])(
    '%j says nothing',
    (marked) => {
      checkHover(marked, null);
    },
  );
});

describe('every example', () => {
  it.each(['dunlin', 'constructs'])(
    '%s has hovers that are about what they stand on, and short, at every offset',
    (name) => {
      const path = `examples/${name}.stoke`;
      const scenario = evaluate(path, (used) => ({ text: readFileSync(used, 'utf8') }));
      const text = scenario.files[0]?.tree.text ?? '';
      let told = 0;
      for (let offset = 0; offset < text.length; offset++) {
        const found = hover(scenario, path, offset);
        if (!found) continue;
        told++;
        expect(found.place.start, `offset ${offset}`).toBeLessThanOrEqual(offset);
        expect(found.place.end, `offset ${offset}`).toBeGreaterThanOrEqual(offset);
        expect(asPlainText(found).split('\n').length).toBeLessThanOrEqual(MOST_LINES);
      }
      expect(told).toBeGreaterThan(text.length / 10);
    },
  );
});

describe('a hostile or broken text', () => {
  it('has no hover longer than a person reads, and none that throws, at any offset', () => {
    const text = `
      use "../*[x](y)*.stoke"
      let 'a <b> *c*' = 1 kg
      blend '<script>' { 30 % 'a <b>' ; rest sodium ; 2 mol K }
      reaction r { Na + + -> ) }
      substance { phase: ; composition: 84.9 % C, 15.1 % H
      expect lower heating value of '<script>' > 1 MJ/kg ± 
      burn x { fuel: r`;
    const { scenario, file } = evaluateFixture(text);
    for (let offset = 0; offset <= text.length; offset++) {
      const found = hover(scenario, file, offset);
      const lines = found ? asPlainText(found).split('\n') : [];
      expect(lines.length).toBeLessThanOrEqual(MOST_LINES);
      for (const line of lines) expect(line).not.toBe('');
    }
  });
});
