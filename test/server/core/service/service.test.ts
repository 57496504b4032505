// A service as core adds it up: closed in mass, energy and carbon for any duty, in proportion to it, and by hand for one.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { measuredConsumption } from '../../../../server/core/engine/consumption.ts';
import { serviceSums, type FuelNumbers, type ServiceInput } from '../../../../server/core/service/service.ts';

const noSlip = { perFuel: 0, perWorkKgPerJ: 0 };
const noSlips = { methane: noSlip, nitrousOxide: noSlip, ammonia: noSlip, urea: noSlip };
const oil: FuelNumbers = {
  heatingValueJPerKg: 42.7e6,
  densityKgPerM3: 850,
  carbonDioxideKgPerKg: 3.206,
  heldCarbonDioxideKgPerKg: 0,
  alkaliSaltKgPerKg: 0,
  ashKgPerKg: 0,
  alkaliMolPerKg: 0,
  waterMadeKgPerKg: 1.2,
  waterMissingKgPerKg: 0,
};
const slurry: FuelNumbers = {
  ...oil,
  heatingValueJPerKg: 30e6,
  densityKgPerM3: 830,
  alkaliSaltKgPerKg: 1.6,
  ashKgPerKg: 0.1,
  waterMissingKgPerKg: 0.2,
};
const consumption = measuredConsumption(
  [
    { load: 0.5, heatRate: 2.4 },
    { load: 1, heatRate: 2.2 },
  ],
  1e6,
  0,
  100e3,
);
const input: ServiceInput = {
  plan: [
    {
      timeS: 3600,
      distanceM: 20e3,
      speedMPerS: null,
      demands: [{ engine: 0, timeS: 3600, powerW: 1e6 }],
      shoreJ: 0,
      boilerJ: [0],
    },
    {
      timeS: 1800,
      distanceM: null,
      speedMPerS: null,
      demands: [{ engine: 0, timeS: 1800, powerW: 0.5e6 }],
      shoreJ: 0,
      boilerJ: [1e8],
    },
  ],
  engines: [
    {
      consumption,
      fuel: 0,
      pilot: { fuel: 1, energyShare: 0.05 },
      slips: { ...noSlips, methane: { perFuel: 0.02, perWorkKgPerJ: 0 } },
    },
  ],
  boilers: [{ fuel: 1, efficiency: 0.8 }],
  fuels: [slurry, oil],
  reserveShare: 0.2,
  dutiesPerBunkering: 3,
  periodS: null,
  tanks: { maximumFilling: 0.95, packingShare: 0.65, massPerFuel: [0.5, 0], boilOffPerS: 0 },
  keepsResidue: true,
  carriesWater: true,
};

describe('a service by hand', () => {
  const sums = serviceSums(input, 'value');
  const engineJ = 2.2 * 3.6e9 + 2.4 * 0.9e9;
  const [main, pilot] = [(0.95 * engineJ) / 30e6, (0.05 * engineJ + 1e8 / 0.8) / 42.7e6];

  test('fuel, pilot and boiler', () => {
    expect(sums.fuelKg[0]).toBeCloseTo(main, 9);
    expect(sums.fuelKg[1]).toBeCloseTo(pilot, 9);
    expect(sums.fuelJ).toBeCloseTo(engineJ + 1e8 / 0.8, 3);
    expect(sums.slipKg.methane).toBeCloseTo(0.02 * main, 9);
    expect(sums.carbonDioxideKg).toBeCloseTo(3.206 * (main + pilot), 9);
  });

  test('tanks, water and what the ship weighs at most', () => {
    const carried = 3 * 1.2 * (main + pilot);
    expect(sums.carriedKg).toBeCloseTo(carried, 9);
    expect(sums.tankM3).toBeCloseTo((3 * 1.2 * (main / 830 + pilot / 850)) / 0.95 / 0.65, 9);
    expect(sums.tankKg).toBeCloseTo(0.5 * 3 * 1.2 * main, 9);
    expect(sums.onBoardKg).toBeCloseTo(carried + sums.tankKg + 3 * 0.2 * main, 9);
    // Each kilogram of the slurry leaves 1.7 kg of residue, so the ship is heaviest at the end.
    const end = 0.6 * (main + pilot) + sums.tankKg + 3 * 1.7 * main;
    expect(sums.heaviestKg).toBeCloseTo(end, 9);
    expect(serviceSums({ ...input, keepsResidue: false }, 'value').heaviestKg).toBeCloseTo(sums.onBoardKg, 9);
  });

  test('it lasts three duties and the reserve', () => {
    expect(sums.enduranceS).toBeCloseTo(3 * 1.2 * 5400, 6);
    expect(sums.rangeM).toBeCloseTo(3 * 1.2 * 20e3, 6);
  });

  test('what boils off is carried besides', () => {
    const boiling = serviceSums({ ...input, tanks: { ...input.tanks, boilOffPerS: 1e-7 } }, 'value');
    const meanKg = 1.5 * (main + pilot) + 0.6 * (main + pilot);
    expect(boiling.boiledOffKg * 3).toBeCloseTo(meanKg * 1e-7 * 3 * 5400, 9);
    expect(boiling.carriedKg - sums.carriedKg).toBeCloseTo(boiling.boiledOffKg * 3, 9);
  });

  test('what boils off is taken off by the time of each leg', () => {
    const boiling = serviceSums({ ...input, tanks: { ...input.tanks, boilOffPerS: 1e-7 } }, 'value');
    const [first, second] = boiling.afterLegs;
    const [still] = sums.afterLegs;
    const firstKg = sums.carriedKg - (still?.fuelKg ?? NaN);
    expect(boiling.carriedKg - (first?.fuelKg ?? NaN)).toBeCloseTo(firstKg + (boiling.boiledOffKg * 2) / 3, 9);
    expect(boiling.carriedKg - (second?.fuelKg ?? NaN)).toBeCloseTo(main + pilot + boiling.boiledOffKg, 9);
  });

  test('it boils off between duties too, where it is known how often they are done', () => {
    const tanks = { ...input.tanks, boilOffPerS: 1e-7 };
    const boiling = serviceSums({ ...input, tanks }, 'value');
    const lying = serviceSums({ ...input, tanks, periodS: 54e3 }, 'value');
    expect(lying.boiledOffKg / boiling.boiledOffKg).toBeCloseTo(10, 9);
    expect(lying.carriedKg - (lying.afterLegs.at(-1)?.fuelKg ?? NaN)).toBeCloseTo(
      main + pilot + lying.boiledOffKg / 10,
      9,
    );
  });

  test('residue of one fuel, then another that leaves none: the ship is heaviest between', () => {
    const [engine] = input.engines;
    const two = {
      ...input,
      engines: engine
        ? [
            { ...engine, pilot: null },
            { ...engine, pilot: null, fuel: 1 },
          ]
        : [],
      plan: input.plan.map((leg, index) => ({
        ...leg,
        demands: [{ engine: index, timeS: 3600, powerW: 1e6 }],
        boilerJ: [0],
      })),
      reserveShare: 0,
      dutiesPerBunkering: 1,
    };
    const between = serviceSums(two, 'value');
    const [slurryKg, oilKg] = [(2.2 * 3.6e9) / 30e6, (2.2 * 3.6e9) / 42.7e6];
    expect(between.heaviestKg).toBeCloseTo(oilKg + 1.7 * slurryKg + between.tankKg, 9);
    const greatest = Math.max(
      ...between.afterLegs.map(({ fuelKg, residueKg, waterKg }) => fuelKg + residueKg + waterKg),
    );
    expect(between.heaviestKg).toBeCloseTo(greatest + between.tankKg, 9);
    // Over three duties it is heaviest within the first or, where a duty leaves more than it burns, within the last.
    const thrice = serviceSums({ ...two, dutiesPerBunkering: 3 }, 'value');
    expect(thrice.heaviestKg).toBeCloseTo(3 * oilKg + (2 + 2 * 0.2 + 1.7) * slurryKg + thrice.tankKg, 9);
    const heavy = { ...two, dutiesPerBunkering: 3, fuels: [{ ...slurry, alkaliSaltKgPerKg: 2.9 }, oil] };
    const last = serviceSums(heavy, 'value');
    expect(last.heaviestKg).toBeCloseTo(oilKg + 3 * 3 * slurryKg + last.tankKg, 9);
  });

  test('an engine of which nothing is known leaves work and time', () => {
    const [engine] = input.engines;
    const unknown = serviceSums({ ...input, engines: engine ? [{ ...engine, consumption: null }] : [] }, 'value');
    expect(unknown.workJ).toBeCloseTo(4.5e9, 3);
    expect(unknown.fuelJ).toBeNaN();
  });
});

describe('for any duty', () => {
  const leg = fc.record({
    timeS: fc.integer({ min: 1, max: 1e6 }),
    load: fc.integer({ min: 0, max: 100 }),
    boilerJ: fc.integer({ min: 0, max: 1e9 }),
  });
  const plans = fc.array(leg, { minLength: 1, maxLength: 6 }).map((legs) =>
    legs.map(({ timeS, load, boilerJ }) => ({
      timeS,
      distanceM: 1e3,
      speedMPerS: null,
      demands: [{ engine: 0, timeS, powerW: load * 1e4 }],
      shoreJ: 0,
      boilerJ: [boilerJ],
    })),
  );

  test('masses, energies and carbon close, and legs add up to the duty', () => {
    fc.assert(
      fc.property(plans, (plan) => {
        const sums = serviceSums({ ...input, plan }, 'value');
        const burnt = sums.fuelKg.reduce((sum, kg) => sum + kg, 0);
        expect(sums.fuelJ).toBeCloseTo((sums.fuelKg[0] ?? 0) * 30e6 + (sums.fuelKg[1] ?? 0) * 42.7e6, -1);
        expect(sums.carbonDioxideKg / (3.206 * burnt)).toBeCloseTo(1, 9);
        const last = sums.afterLegs.at(-1);
        expect((sums.carriedKg - (last?.fuelKg ?? NaN)) / burnt).toBeCloseTo(1, 9);
        expect(last?.residueKg).toBeCloseTo(sums.alkaliSaltKg + sums.ashKg, 3);
        const halves = plan.map((one) => serviceSums({ ...input, plan: [one] }, 'value').fuelJ);
        expect(halves.reduce((sum, one) => sum + one, 0) / sums.fuelJ).toBeCloseTo(1, 9);
      }),
      { numRuns: 60 },
    );
  });

  test('twice the duty is twice the fuel, gas and residue', () => {
    fc.assert(
      fc.property(plans, (plan) => {
        const [once, twice] = [plan, [...plan, ...plan]].map((of) => serviceSums({ ...input, plan: of }, 'value'));
        expect((twice?.fuelJ ?? NaN) / (once?.fuelJ ?? NaN)).toBeCloseTo(2, 9);
        expect((twice?.carriedKg ?? NaN) / (once?.carriedKg ?? NaN)).toBeCloseTo(2, 9);
      }),
      { numRuns: 40 },
    );
  });
});
