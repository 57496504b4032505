// Seas: the carbonate system from what is written, what an effluent does to it, and what is said of slips.
import { describe, expect, test } from 'vitest';
import { checkFacts, evaluateText, figureOf, uncertaintyOf } from '../../../support/facts.ts';

const water = `
        practical salinity: 34.5
        temperature: 11 degC`;

describe('a sea', () => {
  test('any two variables give the others back', () => {
    const scenario = checkFacts(`
      sea one {${water}
        total alkalinity: 2310 umol/kg
        pCO2: 424 uatm
      }
      let carbon = dissolved inorganic carbon of one
      let acidity = ph total scale of one
      sea two {${water}
        pH: acidity
        dissolved inorganic carbon: carbon
      }
    `);
    for (const id of ['total-alkalinity', 'carbon-dioxide-partial-pressure', 'aragonite-saturation', 'density']) {
      const [one, two] = [figureOf(scenario, 'one', id), figureOf(scenario, 'two', id)];
      expect(one).toBeGreaterThan(0);
      expect((two ?? NaN) / (one ?? NaN)).toBeCloseTo(1, 9);
    }
    expect(figureOf(scenario, 'two', 'total-alkalinity')).toBeCloseTo(2310, 6);
    expect(figureOf(scenario, 'two', 'carbon-dioxide-partial-pressure')).toBeCloseTo(424, 6);
  });

  test('partial pressure, fugacity and the share of dry air say one thing', () => {
    const scenario = checkFacts(`
      sea one {${water}
        total alkalinity: 2310 umol/kg
        dry-air CO2: 430 ppm
      }
      let fugacity = carbon dioxide fugacity of one
      sea two {${water}
        total alkalinity: 2310 umol/kg
        fCO2: fugacity
      }
    `);
    const pressure = figureOf(scenario, 'one', 'carbon-dioxide-partial-pressure') ?? NaN;
    // Vapour takes 1.3 % of an atmosphere at 11 °C.
    expect(pressure / 430).toBeCloseTo(1 - 0.0127, 3);
    expect(figureOf(scenario, 'two', 'carbon-dioxide-partial-pressure')).toBeCloseTo(pressure, 8);
  });

  test('depth presses on the constants, not on the fugacity of what is brought up', () => {
    const scenario = checkFacts(`
      sea shallow {${water}
        total alkalinity: 2310 umol/kg
        dissolved inorganic carbon: 2150 umol/kg
      }
      sea deep {${water}
        depth: 4000 m
        total alkalinity: 2310 umol/kg
        dissolved inorganic carbon: 2150 umol/kg
      }
    `);
    expect(figureOf(scenario, 'deep', 'applied-pressure')).toBeCloseTo(407, 0);
    const saturation = (name: string): number => figureOf(scenario, name, 'calcite-saturation') ?? NaN;
    expect(saturation('deep') / saturation('shallow')).toBeLessThan(0.6);
    expect(figureOf(scenario, 'deep', 'density')).toBeGreaterThan(1040);
  });

  test('the budget adds up in squares to what is propagated', () => {
    const scenario = evaluateText(`
      sea one {
        practical salinity: 34.5 ± 0.2
        temperature: 11 degC ± 0.3 K
        total alkalinity: 2310 ± 5 umol/kg
        pCO2: 424 ± 4 uatm
        silicate: 10 ± 5 umol/kg
      }
    `);
    const [definition] = scenario.files[0]?.definitions ?? [];
    const budget = definition?.tables.find(({ id }) => id === 'uncertainty-budget');
    expect(budget?.rows.map(([name]) => name)).toEqual(
      expect.arrayContaining(['practical salinity', 'temperature', 'pCO2', 'silicate', 'K1, carbonic acid']),
    );
    for (const [index, { id }] of (budget?.columns ?? []).entries()) {
      if (index === 0) continue;
      const sum = Math.hypot(...(budget?.rows ?? []).map((row) => Number(row[index])));
      expect(sum).toBeGreaterThan(0);
      expect(sum / (uncertaintyOf(scenario, 'one', id) ?? NaN)).toBeCloseTo(1, 2);
    }
  });

  test('without any uncertainty written, that of the constants is left', () => {
    const scenario = checkFacts(`
      sea one {${water}
        total alkalinity: 2310 umol/kg
        dissolved inorganic carbon: 2130 umol/kg
      }
    `);
    expect(uncertaintyOf(scenario, 'one', 'total-alkalinity')).toBe(0);
    // Orr et al. 2018: about 0.01 in pH and 5 to 6 % in the saturation, from the constants alone.
    expect(uncertaintyOf(scenario, 'one', 'ph-total-scale')).toBeGreaterThan(0.005);
    expect(uncertaintyOf(scenario, 'one', 'ph-total-scale')).toBeLessThan(0.03);
    const relative =
      (uncertaintyOf(scenario, 'one', 'aragonite-saturation') ?? NaN) /
      (figureOf(scenario, 'one', 'aragonite-saturation') ?? NaN);
    expect(relative).toBeGreaterThan(0.04);
    expect(relative).toBeLessThan(0.07);
  });

  test('boron by choice', () => {
    const scenario = checkFacts(`
      sea one {${water}
        total alkalinity: 2310 umol/kg
        dissolved inorganic carbon: 2130 umol/kg
      }
      sea two {${water}
        total alkalinity: 2310 umol/kg
        dissolved inorganic carbon: 2130 umol/kg
        boron: lee
      }
    `);
    expect(figureOf(scenario, 'two', 'ph-total-scale')).toBeLessThan(figureOf(scenario, 'one', 'ph-total-scale') ?? 0);
  });
});

describe('an effluent', () => {
  const written = `
        total alkalinity: 2310 umol/kg
        pCO2: 424 uatm`;

  test('its alkalinity and carbon are one change; its carbon is not taken up twice', () => {
    const scenario = checkFacts(`
      sea one {${water}${written}
        effluent: 20 mmol/kg hydroxide, 5 mmol/kg carbonate, 2 mmol/kg hydrogen-carbonate, 1 mmol/kg acid
        near-field dilution: 1000
      }
    `);
    expect(figureOf(scenario, 'one', 'effluent-alkalinity')).toBeCloseTo(31, 9);
    expect(figureOf(scenario, 'one', 'effluent-carbon')).toBeCloseTo(7, 9);
    const perMole = figureOf(scenario, 'one', 'uptake-efficiency') ?? NaN;
    expect(figureOf(scenario, 'one', 'effluent-uptake')).toBeCloseTo(31 * perMole - 7, 9);
    expect(figureOf(scenario, 'one', 'near-field-uptake')).toBeCloseTo(31 * perMole - 7, 1);
    expect(figureOf(scenario, 'one', 'near-field-ph-change')).toBeGreaterThan(0);
    expect(figureOf(scenario, 'one', 'equilibrium-ph-change')).toBeLessThan(
      figureOf(scenario, 'one', 'near-field-ph-change') ?? 0,
    );
  });

  test('hydrogen carbonate gives some back, acid gives off', () => {
    const scenario = checkFacts(`
      sea one {${water}${written}
        effluent: 10 mmol/kg hydrogen-carbonate
      }
      sea two {${water}${written}
        effluent: 10 mmol/kg acid
        near-field dilution: 2000
      }
      expect effluent uptake of one < 0 mol/kg
      expect near field ph change of two < 0
    `);
    expect(scenario.files[0]?.expectations.map(({ holds }) => holds)).toEqual([true, true]);
    expect(figureOf(scenario, 'one', 'near-field-ph')).toBeUndefined();
  });

  test('limits and precipitation, with the dilution that would do', () => {
    const scenario = checkFacts(`
      sea one {${water}${written}
        effluent: 40 mmol/kg hydroxide
        near-field dilution: 60
      # ^^^^^^^^^^^^^^^^^^^^^^^ account/precipitation
        delivered as: particles
        receiving limit: pH between 6.5 and 8.5, change within 0.2
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ account/receiving-limit
      }
      sea two {${water}${written}
        receiving limit: pH between 7.0 and 7.9
      # ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ account/receiving-limit
      }
    `);
    const [limit] = scenario.files[0]?.facts.filter(({ fact }) => fact.code === 'account/receiving-limit') ?? [];
    const enough = limit?.fact.code === 'account/receiving-limit' ? Math.ceil(limit.fact.enough ?? NaN) : NaN;
    const mended = checkFacts(`
      sea one {${water}${written}
        effluent: 40 mmol/kg hydroxide
        near-field dilution: ${String(enough)}
        delivered as: particles
        receiving limit: pH between 6.5 and 8.5, change within 0.2
      }
    `);
    expect(figureOf(mended, 'one', 'near-field-ph-change')).toBeLessThanOrEqual(0.2);
    expect(figureOf(mended, 'one', 'near-field-ph-change')).toBeGreaterThan(0.195);
  });

  test('how long it takes', () => {
    const scenario = checkFacts(`
      sea one {${water}${written}
        mixed layer: 40 m
        wind: 7 m/s
        mixed-layer residence: 200 d
      }
    `);
    const time = figureOf(scenario, 'one', 'equilibration-time') ?? NaN;
    // Weeks to months.
    expect(time).toBeGreaterThan(30);
    expect(time).toBeLessThan(365);
    // The transfer velocity is known to 20 %.
    expect((uncertaintyOf(scenario, 'one', 'equilibration-time') ?? NaN) / time).toBeCloseTo(0.2, 1);
    expect(figureOf(scenario, 'one', 'mixed-layer-share')).toBeCloseTo(200 / (200 + time), 12);
  });
});

describe('slips', () => {
  test('too few variables, and two that say the same: the other figures are still given', () => {
    const scenario = checkFacts(`
      sea one {
        # ^^^ account/sea-variables
        practical salinity: 34.5
        temperature: 11 degC
        pH: 8.05
      }
      sea two {
        # ^^^ account/sea-variables
        practical salinity: 34.5
        temperature: 11 degC
        pCO2: 424 uatm
        fCO2: 422 uatm
      }
      let silent = ph total scale of one
    `);
    expect(figureOf(scenario, 'one', 'density')).toBeGreaterThan(1020);
    expect(figureOf(scenario, 'one', 'ph-total-scale')).toBeUndefined();
  });

  test('too many, no state, and two', () => {
    checkFacts(`
      sea one {${water}
        total alkalinity: 2310 umol/kg
        pCO2: 424 uatm
        pH: 8.1
      # ^^^^^^^ account/sea-variables
      }
      sea two {${water}
        dissolved inorganic carbon: 2000 umol/kg
        carbonate: 2100 umol/kg
      # ^^^^^^^^^^^^^^^^^^^^^^^ account/sea-state
      }
      sea three {${water}
        total alkalinity: 2310 umol/kg
        carbonate: 150 umol/kg
      # ^^^^^^^^^^^^^^^^^^^^^^ account/sea-state
      }
    `);
  });

  test('water beyond the constants, and far beyond', () => {
    const scenario = checkFacts(`
      sea estuary {
        practical salinity: 12
      # ^^^^^^^^^^^^^^^^^^^^^^ range/sea-water
        temperature: 11 degC
        total alkalinity: 1700 umol/kg
        pCO2: 424 uatm
      }
      sea brine {
        practical salinity: 120
      # ^^^^^^^^^^^^^^^^^^^^^^^ range/sea-water
        temperature: 60 degC
      # ^^^^^^^^^^^^^^^^^^^^ range/sea-water
        depth: -3 m
      # ^^^^^^^^^^^ range/sea-water
        total alkalinity: 1700 umol/kg
        pCO2: 424 uatm
      }
      expect ph total scale of brine > 8
    `);
    expect(figureOf(scenario, 'estuary', 'ph-total-scale')).toBeGreaterThan(7);
    expect(figureOf(scenario, 'brine', 'density')).toBeUndefined();
  });

  test('effluents and limits that cannot be read', () => {
    checkFacts(`
      sea one {${water}
        total alkalinity: 2310 umol/kg
        pCO2: 424 uatm
        effluent: 20 mmol/kg lye
        #                    ^^^ name/unknown
        receiving limit: between 6.5 and 9.0
        #                ^^^^^^^^^^^^^^^^^^^ name/unknown-phrase
      }
      sea two {${water}
        total alkalinity: 2310 umol/kg
        pCO2: 424 uatm
        effluent: 20 mmol/kg hydroxide, 3 mmol/kg hydroxide
        #                               ^^^^^^^^^^^^^^^^^^^ name/unknown-phrase
        receiving limit: pH between 6.5 and 9.0, change within 0.2 pH
        #                                                          ^^ unit/unknown
      }
      sea three {${water}
        total alkalinity: 2310 umol/kg
        pCO2: 424 uatm
        effluent: 20 hydroxide
        #         ^^ unit/missing
        receiving limit: change within 0.2, change within 0.3
        #                                   ^^^^^^^^^^^^^^^^^ name/unknown-phrase
      }
    `);
  });
});
