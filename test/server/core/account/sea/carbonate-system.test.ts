// The carbonate system as a whole: any two variables give back the state they were taken from, sums and charges close, and small
// changes are the slopes in closed form. Waters are drawn over the whole range that is taken.
import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import {
  revelleFactor,
  slopesByPair,
  uncertainConstants,
  uptakePerAlkalinity,
  type SlopeOf,
} from '../../../../../server/core/account/sea/buffering.ts';
import { carbonateState, type CarbonateState } from '../../../../../server/core/account/sea/carbonate-state.ts';
import { seaConstants, type SeaConstants } from '../../../../../server/core/account/sea/constants-at-depth.ts';
import {
  deliveryOf,
  deliveredForms,
  respondTo,
  uptakePerMole,
} from '../../../../../server/core/account/sea/delivery.ts';
import { precipitationRisk } from '../../../../../server/core/account/sea/precipitation.ts';
import { solvePair, type CarbonateVariable, type Known } from '../../../../../server/core/account/sea/solve-pair.ts';
import type { SeaMedium } from '../../../../../server/core/account/sea/speciation.ts';

const mediums = fc
  .record({
    salinity: fc.double({ min: 1, max: 45, noNaN: true }),
    celsius: fc.double({ min: -1.5, max: 40, noNaN: true }),
    appliedPressureBar: fc.constantFrom(0, 0, 20, 400, 1000),
    boron: fc.constantFrom('uppstrom', 'lee'),
    phosphate: fc.constantFrom(0, 0, 2e-6),
    silicate: fc.constantFrom(0, 0, 1.5e-4),
  })
  .map(({ celsius, phosphate, silicate, ...place }): SeaMedium => ({
    constants: seaConstants({ ...place, temperatureK: 273.15 + celsius }),
    nutrients: { phosphate, silicate },
  }));

const states = fc
  .record({
    medium: mediums,
    ph: fc.double({ min: 5, max: 10.5, noNaN: true }),
    carbon: fc.double({ min: 2e-4, max: 6e-3, noNaN: true }),
  })
  .map(({ medium, ph, carbon }) => carbonateState(medium, 10 ** -ph, carbon));

const variables: readonly CarbonateVariable[] = [
  'total-alkalinity',
  'dissolved-carbon',
  'hydrogen',
  'carbon-dioxide',
  'hydrogen-carbonate',
  'carbonate',
];

const pairs = variables.flatMap((first, index) => variables.slice(index + 1).map((second) => [first, second] as const));

function known(state: CarbonateState, variable: CarbonateVariable): Known {
  const values: Readonly<Record<CarbonateVariable, number>> = {
    'total-alkalinity': state.totalAlkalinity,
    'dissolved-carbon': state.dissolvedCarbon,
    hydrogen: state.hydrogen,
    'carbon-dioxide': state.carbonDioxide,
    'hydrogen-carbonate': state.hydrogenCarbonate,
    carbonate: state.carbonate,
  };
  return { variable, molPerKg: values[variable] };
}

function oceanWater(celsius: number, alkalinity = 2305e-6, fugacityAtm = 415e-6, salinity = 34.7): CarbonateState {
  const constants = seaConstants({
    salinity,
    temperatureK: 273.15 + celsius,
    appliedPressureBar: 0,
    boron: 'uppstrom',
  });
  const found = solvePair(
    { constants, nutrients: { phosphate: 0, silicate: 0 } },
    { variable: 'total-alkalinity', molPerKg: alkalinity },
    { variable: 'carbon-dioxide', molPerKg: fugacityAtm * constants.carbonDioxide },
  );
  if (found.kind !== 'solved') throw new Error('no such water');
  return found.state;
}

describe('any two variables', () => {
  test.each(pairs)('%s and %s give the state back', (first, second) => {
    fc.assert(
      fc.property(states, (state) => {
        const found = solvePair(state.medium, known(state, first), known(state, second));
        expect(found.kind).toBe('solved');
        if (found.kind !== 'solved') return;
        for (const variable of [first, second]) {
          const [was, is] = [known(state, variable).molPerKg, known(found.state, variable).molPerKg];
          expect(Math.abs(is - was)).toBeLessThan(1e-9 * Math.abs(was) + 2e-13);
        }
        // One of the two states where there are two.
        const near = [found.state, ...(found.other ? [found.other] : [])].map(({ ph }) => Math.abs(ph - state.ph));
        expect(Math.min(...near)).toBeLessThan(1e-5);
      }),
      { numRuns: 150 },
    );
  });

  test('two states where alkalinity meets carbonate, and hydrogen carbonate the carbon; the usual one is taken', () => {
    const water = oceanWater(15);
    const ofAlkalinity = solvePair(water.medium, known(water, 'total-alkalinity'), known(water, 'carbonate'));
    const ofCarbon = solvePair(water.medium, known(water, 'dissolved-carbon'), known(water, 'hydrogen-carbonate'));
    for (const found of [ofAlkalinity, ofCarbon]) {
      expect(found.kind).toBe('solved');
      if (found.kind !== 'solved') return;
      expect(found.state.ph).toBeCloseTo(water.ph, 6);
      expect(found.other).not.toBeNull();
    }
    if (ofAlkalinity.kind === 'solved') expect(ofAlkalinity.other?.ph).toBeGreaterThan(9);
    // The two lie as far on either side of where hydrogen carbonate is at its most.
    const { carbonic1, carbonic2 } = water.medium.constants;
    const sum = -Math.log10(carbonic1 * carbonic2);
    if (ofCarbon.kind === 'solved') expect(ofCarbon.other?.ph).toBeCloseTo(sum - water.ph, 6);
  });

  test('no state, and one variable twice', () => {
    const water = oceanWater(15);
    const { medium } = water;
    const of = (first: Known, second: Known): string => solvePair(medium, first, second).kind;
    const carbon = known(water, 'dissolved-carbon');
    expect(of(carbon, { variable: 'carbonate', molPerKg: 3e-3 })).toBe('none');
    expect(of(carbon, { variable: 'carbon-dioxide', molPerKg: carbon.molPerKg })).toBe('none');
    expect(of(carbon, { variable: 'hydrogen-carbonate', molPerKg: carbon.molPerKg * 0.9999 })).toBe('none');
    expect(of(known(water, 'total-alkalinity'), { variable: 'carbonate', molPerKg: 2e-3 })).toBe('none');
    expect(of({ variable: 'hydrogen', molPerKg: 1e-11 }, known(water, 'total-alkalinity'))).toBe('none');
    expect(of(carbon, { variable: 'hydrogen', molPerKg: 0 })).toBe('none');
    expect(of(carbon, { variable: 'total-alkalinity', molPerKg: NaN })).toBe('none');
    expect(of(carbon, carbon)).toBe('same');
  });

  test('an acidified water has less than no alkalinity, and a state', () => {
    const { medium } = oceanWater(15);
    const found = solvePair(
      medium,
      { variable: 'total-alkalinity', molPerKg: -1e-3 },
      { variable: 'dissolved-carbon', molPerKg: 2e-3 },
    );
    expect(found.kind === 'solved' && found.state.ph).toBeCloseTo(3, 0);
  });
});

describe('closures', () => {
  test('carbon adds up, and charges to the alkalinity, written out species by species', () => {
    fc.assert(
      fc.property(states, (state) => {
        const { others, medium } = state;
        const { ions } = medium.constants;
        const sum = state.carbonDioxide + state.hydrogenCarbonate + state.carbonate;
        expect(sum / state.dissolvedCarbon).toBeCloseTo(1, 12);
        const charges =
          state.hydrogenCarbonate +
          2 * state.carbonate +
          others.borate +
          others.hydroxide +
          others.phosphateAlkalinity +
          others.silicateAlkalinity -
          others.freeHydrogen -
          others.hydrogenSulphate -
          others.hydrogenFluoride;
        expect(Math.abs(charges - state.totalAlkalinity)).toBeLessThan(1e-15);
        // Total hydrogen is what is free and what sulphate holds.
        expect(Math.abs(others.freeHydrogen * medium.constants.totalPerFree - state.hydrogen)).toBeLessThan(1e-18);
        expect(others.borate).toBeLessThan(ions.boron);
        expect(others.hydrogenSulphate).toBeLessThan(ions.sulphate);
      }),
    );
  });

  test('more alkalinity raises pH and lowers the fugacity; more carbon does the opposite', () => {
    fc.assert(
      fc.property(states, fc.double({ min: 1e-6, max: 1e-3, noNaN: true }), (state, added) => {
        const base = respondTo(state, { alkalinity: added, carbon: 0 });
        const gas = respondTo(state, { alkalinity: 0, carbon: added });
        if (!base || !gas) throw new Error('no response');
        expect(base.mixed.ph).toBeGreaterThan(state.ph);
        expect(base.mixed.fugacityAtm).toBeLessThan(state.fugacityAtm);
        expect(gas.mixed.ph).toBeLessThan(state.ph);
        expect(gas.mixed.fugacityAtm).toBeGreaterThan(state.fugacityAtm);
        expect(base.settled.fugacityAtm / state.fugacityAtm).toBeCloseTo(1, 6);
      }),
    );
  });

  test('at no pressure the constants are those of the surface, and they rise with it', () => {
    const at = (appliedPressureBar: number): SeaConstants =>
      seaConstants({ salinity: 35, temperatureK: 278.15, appliedPressureBar, boron: 'uppstrom' });
    expect(at(1e-9).carbonic1 / at(0).carbonic1).toBeCloseTo(1, 9);
    for (const of of ['carbonic1', 'carbonic2', 'boric', 'water', 'calcite', 'aragonite'] as const) {
      expect(at(400)[of]).toBeGreaterThan(at(0)[of]);
    }
  });
});

describe('slopes in closed form', () => {
  const slopesOf: readonly SlopeOf[] = [
    ...variables,
    'ph',
    'ln-fugacity',
    'ln-calcite-saturation',
    'ln-aragonite-saturation',
  ];
  const valueOf = (state: CarbonateState, of: SlopeOf): number => {
    if (of === 'ph') return state.ph;
    if (of === 'ln-fugacity') return Math.log(state.fugacityAtm);
    if (of === 'ln-calcite-saturation') return Math.log(state.calciteSaturation);
    if (of === 'ln-aragonite-saturation') return Math.log(state.aragoniteSaturation);
    return known(state, of).molPerKg;
  };
  const solve = (medium: SeaMedium, first: Known, second: Known, near: number): CarbonateState => {
    const found = solvePair(medium, first, second);
    if (found.kind !== 'solved') throw new Error('no state');
    const { state, other } = found;
    return other && Math.abs(other.ph - near) < Math.abs(state.ph - near) ? other : state;
  };
  const moved = ({ constants, nutrients }: SeaMedium, of: string, by: number): SeaMedium => {
    if (of === 'boron') {
      return { nutrients, constants: { ...constants, ions: { ...constants.ions, boron: constants.ions.boron * by } } };
    }
    const value = constants[of as 'water'];
    return { nutrients, constants: { ...constants, [of]: value * by } };
  };

  test.each(pairs)('%s and %s held', (first, second) => {
    const water = oceanWater(12);
    for (const of of slopesOf) {
      const slopes = slopesByPair(water, first, second, of);
      const at = (medium: SeaMedium, by1: number, by2: number): number => {
        const [one, two] = [known(water, first), known(water, second)];
        const state = solve(
          medium,
          { ...one, molPerKg: one.molPerKg * by1 },
          { ...two, molPerKg: two.molPerKg * by2 },
          water.ph,
        );
        return valueOf(state, of);
      };
      const step = 1e-5;
      const size = Math.abs(valueOf(water, of)) + 1e-9;
      const isNear = (slope: number, change: number): void => {
        expect(Math.abs(slope - change)).toBeLessThan(2e-5 * (Math.abs(slope) + size));
      };
      isNear(
        slopes.byFirst * known(water, first).molPerKg,
        (at(water.medium, 1 + step, 1) - at(water.medium, 1 - step, 1)) / (2 * step),
      );
      isNear(
        slopes.bySecond * known(water, second).molPerKg,
        (at(water.medium, 1, 1 + step) - at(water.medium, 1, 1 - step)) / (2 * step),
      );
      for (const constant of uncertainConstants) {
        const [above, below] = [moved(water.medium, constant, 1 + step), moved(water.medium, constant, 1 - step)];
        // A fugacity that is held is held as dissolved gas here, as the pair is.
        isNear(slopes.byConstant[constant], (at(above, 1, 1) - at(below, 1, 1)) / (2 * step));
      }
    }
  });

  test('Revelle factor and uptake are small finite changes', () => {
    const water = oceanWater(20);
    const step = 1e-8;
    const carbon = respondTo(water, { alkalinity: 0, carbon: step });
    const alkali = respondTo(water, { alkalinity: step, carbon: 0 });
    const relative = Math.log((carbon?.mixed.fugacityAtm ?? NaN) / water.fugacityAtm);
    expect((relative / step) * water.dissolvedCarbon).toBeCloseTo(revelleFactor(water), 2);
    expect((alkali?.uptake ?? NaN) / step).toBeCloseTo(uptakePerAlkalinity(water), 3);
    expect(revelleFactor(water)).toBeGreaterThan(9);
    expect(revelleFactor(water)).toBeLessThan(12);
  });
});

describe('uptake', () => {
  const { rows } = JSON.parse(readFileSync('test/reference/sea-water-gas.json', 'utf8')) as {
    rows: readonly { of: string; value: number }[];
  };
  const published = (of: string): number => rows.find((row) => row.of === of)?.value ?? NaN;

  test('is what is published', () => {
    // Surface water of the world's mean, 18 °C and salinity 34.7, gives 0.847. The source names neither its water nor its air:
    // half a digit of 0.84, 0.004 for a kelvin, 0.006 for 25 µatm.
    expect(Math.abs(uptakePerAlkalinity(oceanWater(18)) - published('uptake, global mean'))).toBeLessThan(0.015);
    for (const celsius of [5, 12, 20, 28]) {
      const found = uptakePerAlkalinity(oceanWater(celsius));
      expect(found).toBeGreaterThan(published('uptake, least measured'));
      expect(found).toBeLessThan(published('uptake, most measured'));
    }
  });

  test('of hydroxide between none and one mole; carbonate a mole less per two; hydrogen carbonate gives some back', () => {
    fc.assert(
      fc.property(states, (state) => {
        const [hydroxide, carbonate, hydrogenCarbonate, acid] = deliveredForms.map((form) =>
          uptakePerMole(state, form),
        );
        if (hydroxide === undefined || carbonate === undefined || hydrogenCarbonate === undefined) return;
        expect(hydroxide).toBeGreaterThan(0);
        expect(hydroxide).toBeLessThanOrEqual(1);
        expect(carbonate / 2).toBeCloseTo(hydroxide - 0.5, 12);
        expect(hydrogenCarbonate).toBeLessThanOrEqual(0);
        expect(acid).toBeCloseTo(-hydroxide, 12);
      }),
    );
  });

  test('carbon fixed on the way is not counted twice: hydroxide that met CO2 first holds as much in the end', () => {
    const water = oceanWater(12);
    const fresh = respondTo(water, deliveryOf({ hydroxide: 2e-4 }));
    const fixed = respondTo(water, deliveryOf({ carbonate: 1e-4 }));
    if (!fresh || !fixed) throw new Error('no response');
    expect(fixed.response).toBeCloseTo(fresh.response, 12);
    expect(fixed.uptake).toBeCloseTo(fresh.uptake - 1e-4, 12);
    expect(fixed.settled.dissolvedCarbon - water.dissolvedCarbon).toBeCloseTo(fixed.uptake + 1e-4, 15);
  });

  test('what is too acid for a solution has no response', () => {
    expect(respondTo(oceanWater(12), deliveryOf({ acid: 20 }))).toBeNull();
  });

  test('what comes out as a solid, by the way the alkali came', () => {
    const water = oceanWater(20);
    const after = (hydroxide: number): CarbonateState => respondTo(water, deliveryOf({ hydroxide }))?.mixed ?? water;
    expect(precipitationRisk(water, 'particles')).toBe('none');
    expect(precipitationRisk(after(3e-4), 'particles')).toBe('careful');
    expect(precipitationRisk(after(3e-4), 'solution')).toBe('none');
    expect(precipitationRisk(after(7e-4), 'particles')).toBe('runaway');
    expect(precipitationRisk(after(4e-3), 'solution')).toBe('brucite');
  });
});
