// What is said of slips in burns, at their places; what is unknown for a cause told elsewhere stays silent.
import { test } from 'vitest';
import { checkFacts } from '../../../support/facts.ts';

test('how much oxidant: not said, said twice, said of what has none to spare', () => {
  checkFacts(`
    burn none {
    #    ^^^^ name/missing-entry
      fuel: methanol
      oxidant: air
    }
    burn twice {
      fuel: methanol
      oxidant: air
      lambda: 1.2
      oxidant per fuel: 8 kg/kg
    # ^^^^^^^^^^^^^^^^ balance/contradiction
    }
    burn bound {
      fuel: magnesium
      oxidant: steam
      lambda: 1.2
    # ^^^^^^^^^^^ balance/charge
    }
    burn bound_by_mass {
      fuel: magnesium
      oxidant: steam
      oxidant per fuel: 1 kg/kg
    }
    burn wet {
      fuel: water
      oxidant: air
      lambda: 1.2
    # ^^^^^^^^^^^ balance/charge
    }
    burn nothing_at_all {
    #    ^^^^^^^^^^^^^^ name/missing-entry
    #    ^^^^^^^^^^^^^^ name/missing-entry
    }
  `);
});

test('oxidants: unknown, of another kind, without molecules', () => {
  checkFacts(`
    reaction route {
      2 H2(g) + O2(g) -> 2 H2O(g)
    }
    burn one {
      fuel: methanol
      oxidant: route
    #          ^^^^^ name/wrong-kind
      lambda: 1
    }
    burn two {
      fuel: methanol
      oxidant: aire
    #          ^^^^ name/unknown
      lambda: 1
    }
    burn three {
      fuel: methanol
      oxidant: gas_oil
    #          ^^^^^^^ balance/no-data
      lambda: 1
    }
    oxidant broken {
      50 % air
      50 % nonsense
    #      ^^^^^^^^ name/unknown
    }
    burn silent {
      fuel: methanol
      oxidant: broken
      lambda: 1
    }
  `);
});

test('phrases are checked like those of other kinds', () => {
  checkFacts(`
    burn one {
      fuel: methanol
      oxidant: air
      lambda: 1.2 at sea
    #             ^^ name/unknown-phrase
      held: presure 3 bar
    #       ^^^^^^^ name/unknown
      heat loss: 14 % of fule energy
    #                 ^^ name/unknown-phrase
      flame zone: 0.9
    #             ^^^ name/unknown-phrase
      cooled to: 900 degC, 3 bar
    #                      ^^^^^ unit/mismatch
      ions: maybe
    #       ^^^^^ name/unknown
      wall temperature: 400 degC until 500 degC
    #                            ^^^^^ name/unknown-phrase
      barred products: NO(g), Na2O2 3
    #                               ^ name/unknown-phrase
    }
    burn two {
      fuel: methanol
      oxidant: air
      equivalence ratio: 0
    #                    ^ range/positive
      held: pressure
    #       ^^^^^^^^ name/unknown-phrase
      heat loss: 140 %
    #            ^^^^^ range/share
      flame zone: lambda
    #             ^^^^^^ name/unknown-phrase
      cooled to: -300 degC
    #            ^^^^^^^^^ range/temperature
      wall temperature: from 400 degC
    #                   ^^^^^^^^^^^^^ name/unknown-phrase
      barred products: C60(cr)
    #                  ^^^^^^^ balance/no-data
      temperatur: 900 degC
    # ^^^^^^^^^^ name/unknown-entry
      2 H2(g) + O2(g) -> 2 H2O(g)
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^ name/unexpected-line
    }
  `);
});

test('switches, ranges and zones in every spelling are read', () => {
  checkFacts(`
    burn one {
      fuel: methanol
      oxidant: air
      lambda: 1.2
      held: volume
      ions: on
      flame zone: equivalence ratio 1
      wall temperature: between 400 degC and 500 degC
    }
    burn two {
      fuel: methanol
      oxidant: air
      lambda: 1.2
      ions: off
      flame zone: lambda 0.9
      wall temperature: from 400 degC to 500 degC
    }
    burn three {
      fuel: methanol
      oxidant: air
      lambda: 1.2
      wall temperature: 500 degC to 400 degC
      heat loss: 5 %
    }
    burn four {
      fuel: methanol
      oxidant: air
      lambda: 1.2
      wall temperature: 500 degC
    }
  `);
});

test('data that are not there are named once, where they are needed', () => {
  checkFacts(`
    substance lees {
      phase: liquid
      composition: 50 % C, 7 % H, 43 % O
    }
    burn cold {
      fuel: lees
    # ^^^^^^^^^^ balance/no-data
      oxidant: air
      lambda: 1.2
    }
    substance certified {
      phase: liquid
      composition: 85 % C, 15 % H
      lower heating value: 43 MJ/kg
    }
    burn warm {
      fuel: certified
    # ^^^^^^^^^^^^^^^ balance/no-data
      fuel temperature: 90 degC
      oxidant: air
      lambda: 1.2
    }
    blend unknown_blend {
      50 % nonsense
    #      ^^^^^^^^ name/unknown
      rest methanol
    }
    burn silent {
      fuel: unknown_blend
      oxidant: air
      lambda: 1.2
    }
    expect flame temperature of silent > 300 K
    expect flame temperature of cold > 300 K
  `);
});

test('rich, dry and cold: what is easily missed', () => {
  checkFacts(`
    burn rich {
      fuel: methanol
      oxidant: air
      lambda: 0.7
    # ^^^^^^^^^^^ range/rich
    }
    burn sooty_zone {
      fuel: gas_oil
      oxidant: air
      lambda: 2
      flame zone: lambda 0.4
    # ^^^^^^^^^^^^^^^^^^^^^^ range/rich
    }
    burn rich_zone {
      fuel: methanol
      oxidant: air
      lambda: 2
      flame zone: lambda 0.8
    }
    burn leaner_zone {
      fuel: methanol
      oxidant: air
      lambda: 2
      flame zone: lambda 2.5
    # ^^^^^^^^^^^^^^^^^^^^^^ balance/charge
    }
    burn dry_metal {
    #    ^^^^^^^^^ balance/water-missing
      fuel: sodium
      oxidant: air
      lambda: 1.5
    }
    burn cold_air {
      fuel: methanol
      oxidant: air
    # ^^^^^^^^^^^^ range/cold-charge
      lambda: 1.5
      held: pressure 30 bar
    }
    burn warm_air {
      fuel: methanol
      oxidant: air
      oxidant state: 550 degC, 30 bar
      lambda: 1.5
    }
    burn metal_in_water {
      fuel: magnesium
      oxidant: water
      oxidant per fuel: 2 kg/kg
      held: volume
    # ^^^^^^^^^^^^ balance/charge
    }
    burn barren {
      fuel: methanol
      oxidant: air
      lambda: 1.5
      allowed products: CO2, H2O, O2, Ar
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ balance/no-equilibrium
    }
  `);
});

test('a state that the burn does not tell', () => {
  checkFacts(`
    burn lamp {
      fuel: methanol
      oxidant: air
      lambda: 1.2
      cooled to: 900 degC
    }
    burn bare {
      fuel: methanol
      oxidant: air
      lambda: 1.2
    }
    expect condensed share of lamp at 500 degC < 1 %
    #                                 ^^^^^^^^ name/unknown-state
    expect mass share of CO2(g) in lamp at 500 degC < 1 %
    #                                      ^^^^^^^^ name/unknown-state
    expect condensed share of bare at 900 degC < 1 %
    #                                 ^^^^^^^^ name/unknown-state
    expect flame temperature of bare at 900 degC < 1 %
    #                                   ^^^^^^^^ name/unknown-phrase
  `);
});

test('droplets and particles: too little time, no data, nothing of that size', () => {
  checkFacts(`
    blend dispersion {
      30 % mass sodium
      rest methanol
    }
    burn quick {
      fuel: dispersion
      oxidant: air
      lambda: 1.3
      droplet size: 50 um
      particle size: 20 um
      residence time: 100 ms
    }
    burn hasty {
      fuel: dispersion
      oxidant: air
      lambda: 1.3
      droplet size: 200 um
      particle size: 20 um
      residence time: 1 ms
    # ^^^^^^^^^^^^^^^^^^^^ range/burn-out
    }
    burn distillate {
      fuel: gas_oil
      oxidant: air
      lambda: 1.3
      droplet size: 50 um
    }
    burn coking {
      fuel: heavy_fuel_oil
      oxidant: air
      lambda: 1.3
      droplet size: 50 um
    # ^^^^^^^^^^^^^^^^^^^ balance/no-data
    }
    burn gaseous {
      fuel: hydrogen
      oxidant: air
      lambda: 1.3
      droplet size: 50 um
    # ^^^^^^^^^^^^^^^^^^^ balance/no-data
    }
  `);
});

test('vapour that froze in the gas makes a deposit stick where its own solids would not', () => {
  const frozen = (below: string, mark: string): string => `
    blend slurry {
      40 % mass  sodium
      rest       methanol
    }
    burn furnace {
      fuel: slurry
      oxidant: air
      lambda: 1.2
      frozen below: ${below}
      wall temperature: 450 degC
      ${mark}
    }
  `;
  // Frozen while hot, hydroxide arrives as vapour and melts with the carbonate it finds; cooled in equilibrium it has become carbonate.
  checkFacts(frozen('1200 degC', '# ^^^^^^^^^^^^^^^^^^^^^^^^^^ range/sticky').replace('      # ^', '    # ^'));
  checkFacts(frozen('600 degC', ''));
});

test('cooled products far beyond their data are told once, not at every state', () => {
  checkFacts(`
    burn boat {
      fuel: magnesium
      oxidant: air
      lambda: 0.6
    # ^^^^^^^^^^^ range/rich
      cooled to: -20 degC, 15 degC, -40 degC
    # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ range/temperature
    }
  `);
});

test('walls on which the deposit sticks, walls on which it does not, and such of which that is not known', () => {
  const furnace = (wall: string, mark = '', salts = '25 % mass sodium'): string => `
    blend dispersion {
      ${salts}
      rest gas_oil
    }
    burn furnace {
      fuel: dispersion
      oxidant: air
      lambda: 1.25
      wall temperature: ${wall}
      ${mark}
    }
  `;
  checkFacts(furnace('400 degC to 700 degC'));
  checkFacts(furnace('1500 degC'));
  checkFacts(
    furnace('800 degC to 950 degC', '# ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ range/sticky').replace(
      '      # ^',
      '    # ^',
    ),
  );
  // With lithium beside sodium only first melting is published, and that a deposit is wet does not make it stick.
  const mixed = '24 % mass sodium\n      1 % mass lithium';
  const marks = (text: string): string => text.replace('      # ^', '    # ^');
  checkFacts(furnace('400 degC', '', mixed));
  checkFacts(marks(furnace('700 degC', '# ^^^^^^^^^^^^^^^^^^^^^^^^^^ range/sticky', mixed)));
  // Lithium salts alone melt where their tables say.
  const lithium = '20 % mass lithium';
  checkFacts(furnace('500 degC', '', lithium));
  checkFacts(marks(furnace('300 degC to 860 degC', '# ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ range/sticky', lithium)));
});
