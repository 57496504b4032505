// The air standard of gas turbines: worked examples with variable specific heats, and the closed forms with constant ones.
import { describe, expect, test } from 'vitest';
import textbook from '../../../../reference/gas-turbine-cycles-textbook.json' with { type: 'json' };
import { gasOf } from '../../../../../server/core/engine/charge.ts';
import { frozenMixture } from '../../../../../server/core/engine/frozen-mixture.ts';
import type { FrozenMixture } from '../../../../../server/core/engine/frozen-mixture.ts';
import { gasByHeatCapacity } from '../../../../../server/core/engine/gas-by-heat-capacity.ts';
import { heatedAirCycle } from '../../../../../server/core/engine/turbine/heated-air.ts';
import type { HeatedAirCycle, HeatedAirInput } from '../../../../../server/core/engine/turbine/heated-air.ts';
import { molarGasConstantJPerMolK } from '../../../../../server/core/quantity/constants.ts';

/** One kilogram. */
function airOf(): FrozenMixture {
  const shares: readonly (readonly [string, number, number])[] = [
    ['N2(g)', 0.78084, 0.0280134],
    ['O2(g)', 0.20946, 0.0319988],
    ['Ar(g)', 0.00934, 0.039948],
    ['CO2(g)', 0.00036, 0.0440095],
  ];
  const kgPerMol = shares.reduce((sum, [, share, molarMass]) => sum + share * molarMass, 0);
  const gas = gasOf(new Map(shares.map(([id, share]) => [id, share / kgPerMol])));
  if ('kind' in gas) throw new Error(gas.ids.join());
  return gas;
}

/** A gas of a constant ratio of heat capacities, one mole. */
function constantGas(gamma: number): FrozenMixture {
  const species = gasByHeatCapacity({
    id: 'constant',
    composition: new Map([['N', 2]]),
    molarMassKgPerMol: 0.028,
    enthalpyJPerMol: 0,
    heatCapacityJPerMolK: (molarGasConstantJPerMolK * gamma) / (gamma - 1),
    heatCapacityRiseJPerMolK2: 0,
    validK: [200, 6000],
  });
  return frozenMixture([{ species, mol: 1 }]);
}

function cycleOf(input: HeatedAirInput): HeatedAirCycle {
  const found = heatedAirCycle(input);
  if (found.kind === 'fault') throw new Error(JSON.stringify(found));
  return found;
}

interface Row {
  readonly example: string;
  readonly pressureRatio: number;
  readonly inletK: number;
  readonly turbineInletK: number;
  readonly compressorEfficiency?: number;
  readonly turbineEfficiency?: number;
  readonly effectiveness?: number;
  readonly intercooledK?: number;
  readonly intercoolFirstRatio?: number;
  readonly reheatK?: number;
  readonly reheatFirstRatio?: number;
  readonly efficiency?: number;
  readonly backWorkRatio?: number;
  readonly risesJPerKg: Readonly<Record<string, number>>;
  readonly temperaturesK: Readonly<Record<string, number>>;
}

function inputOf(row: Row, gas: FrozenMixture): HeatedAirInput {
  const { intercooledK, intercoolFirstRatio, reheatK, reheatFirstRatio } = row;
  return {
    gas,
    inletTemperatureK: row.inletK,
    ambientPressurePa: 1e5,
    turbineInletTemperatureK: row.turbineInletK,
    compressor: {
      pressureRatio: row.pressureRatio,
      law: { law: 'isentropic-efficiency', efficiency: row.compressorEfficiency ?? 1 },
      intercooling:
        intercooledK === undefined ? null : { temperatureK: intercooledK, firstRatio: intercoolFirstRatio ?? null },
      intakeLossShare: 0,
    },
    recuperatorEffectiveness: row.effectiveness ?? null,
    reheat: reheatK === undefined ? null : { temperatureK: reheatK, firstRatio: reheatFirstRatio ?? null },
    combustorLossShare: 0,
    exhaustLossShare: 0,
    turbineEfficiency: row.turbineEfficiency ?? 1,
  };
}

describe('worked examples with variable specific heats', () => {
  test.each(textbook.rows as unknown as readonly Row[])('$example', (row) => {
    const found = cycleOf(inputOf(row, airOf()));
    const rises: Readonly<Record<string, number>> = {
      compressor: found.compressor.workJ,
      turbine: found.turbineWorkJ,
      recuperator: found.heaterInlet.enthalpyJ - found.compressor.delivery.enthalpyJ,
    };
    const temperaturesK: Readonly<Record<string, number>> = {
      delivery: found.compressor.delivery.temperatureK,
      outlet: found.turbineOutlet.temperatureK,
    };
    // States within 0.5 %, efficiencies within 0.3 points; the books' air tables differ from today's by 0.1 % or so.
    if (row.efficiency !== undefined) expect(Math.abs(found.efficiency - row.efficiency)).toBeLessThan(0.003);
    if (row.backWorkRatio !== undefined) expect(Math.abs(found.backWorkRatio - row.backWorkRatio)).toBeLessThan(0.003);
    for (const [name, value] of Object.entries(row.risesJPerKg)) {
      expect(Math.abs((rises[name] ?? Number.NaN) / value - 1)).toBeLessThan(0.005);
    }
    for (const [name, value] of Object.entries(row.temperaturesK)) {
      expect(Math.abs((temperaturesK[name] ?? Number.NaN) / value - 1)).toBeLessThan(0.005);
    }
  });
});

describe('closed forms with constant heat capacities', () => {
  const base: Row = {
    example: '',
    pressureRatio: 10,
    inletK: 300,
    turbineInletK: 1400,
    risesJPerKg: {},
    temperaturesK: {},
  };

  test.each([1.4, 1.33, 1.667, 1.2])('γ = %d', (gamma) => {
    const gas = constantGas(gamma);
    const exponent = (gamma - 1) / gamma;
    const tau = 10 ** exponent;
    const theta = 1400 / 300;
    const simple = cycleOf(inputOf(base, gas));
    expect(simple.efficiency).toBeCloseTo(1 - 1 / tau, 9);
    expect(simple.compressor.delivery.temperatureK).toBeCloseTo(300 * tau, 8);
    expect(simple.turbineOutlet.temperatureK).toBeCloseTo(1400 / tau, 8);
    expect(simple.backWorkRatio).toBeCloseTo(tau / theta, 9);

    const regenerated = cycleOf(inputOf({ ...base, effectiveness: 1 }, gas));
    expect(regenerated.efficiency).toBeCloseTo(1 - tau / theta, 9);

    const [compressor, turbine] = [0.84, 0.88];
    const real = cycleOf(inputOf({ ...base, compressorEfficiency: compressor, turbineEfficiency: turbine }, gas));
    const rise = (tau - 1) / compressor;
    const drop = turbine * theta * (1 - 1 / tau);
    expect(real.efficiency).toBeCloseTo((drop - rise) / (theta - 1 - rise), 9);

    // Two equal stages, cooled back to the inlet and heated again to the turbine inlet.
    const root = Math.sqrt(tau);
    const staged = cycleOf(inputOf({ ...base, intercooledK: 300, reheatK: 1400 }, gas));
    const work = 2 * theta * (1 - 1 / root) - 2 * (root - 1);
    expect(staged.efficiency).toBeCloseTo(work / (theta - root + theta * (1 - 1 / root)), 9);
  });

  test('a polytropic efficiency is that of many small stages', () => {
    const gas = constantGas(1.4);
    const input = inputOf(base, gas);
    const found = cycleOf({
      ...input,
      compressor: { ...input.compressor, law: { law: 'polytropic-efficiency', efficiency: 0.9 } },
    });
    expect(found.compressor.delivery.temperatureK).toBeCloseTo(300 * 10 ** (0.4 / 1.4 / 0.9), 8);
  });
});

test('pressure lost anywhere costs work', () => {
  const input = inputOf(
    { example: '', pressureRatio: 10, inletK: 300, turbineInletK: 1400, risesJPerKg: {}, temperaturesK: {} },
    airOf(),
  );
  const best = cycleOf(input).efficiency;
  const worse = [
    cycleOf({ ...input, combustorLossShare: 0.04 }),
    cycleOf({ ...input, exhaustLossShare: 0.04 }),
    cycleOf({ ...input, compressor: { ...input.compressor, intakeLossShare: 0.04 } }),
  ];
  for (const { efficiency } of worse) {
    expect(best - efficiency).toBeGreaterThan(0.003);
    expect(best - efficiency).toBeLessThan(0.02);
  }
});
