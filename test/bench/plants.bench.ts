// Times gas turbines and steam plants: the turbine's air found for its inlet temperature, for a hydrocarbon and for a fuel with
// metal in it with all four corners of its particles; recuperated and reheated; and a fired steam plant with reheat and feed heater.
// A time is the least of several rounds: other work on the machine only ever adds to it. Judges nothing.

import { steamPlant } from '../../server/core/engine/steam/steam-plant.ts';
import { solveTurbine } from '../../server/core/engine/turbine/solved-turbine.ts';
import type { GasTurbineInput } from '../../server/core/engine/turbine/gas-turbine.ts';
import { heatingValueOfFuel } from '../../server/core/balance/heating-value.ts';
import { mixed, plainAir, stream } from '../server/core/burn/streams.ts';
import { turbineOn } from '../server/core/engine/turbine/turbines.ts';
import { print } from './measured.ts';

const gasOil = stream('gas_oil');
const slurry = mixed([0.25, stream('sodium')], [0.73, gasOil], [0.02, stream('sulfur')]);

function time(calls: number, call: () => unknown): number {
  let least = Infinity;
  for (let round = 0; round < 24; round += 1) {
    const start = performance.now();
    for (let k = 0; k < calls; k += 1) call();
    const took = (performance.now() - start) / calls;
    if (round >= 6) least = Math.min(least, took);
  }
  return least;
}

function turbine(input: GasTurbineInput): number {
  const found = solveTurbine(input);
  if (found.kind === 'fault') throw new Error(JSON.stringify(found));
  return found.cautious.brakeWorkJ;
}

const recuperated = { recuperatorEffectiveness: 0.85 };
const reheated = { reheat: { temperatureK: 1450, firstRatio: null } };
for (const [name, input, budget] of [
  ['a hydrocarbon', turbineOn(gasOil), 10],
  ['a hydrocarbon, recuperated', turbineOn(gasOil, recuperated), 10],
  ['a hydrocarbon, reheated', turbineOn(gasOil, reheated), 10],
  ['sodium in a hydrocarbon, four corners', turbineOn(slurry), 40],
  ['sodium in a hydrocarbon, four corners, recuperated', turbineOn(slurry, recuperated), 40],
] as const) {
  print({ name: `gas turbine on ${name}`, value: time(3, () => turbine(input)), unit: 'ms', budget });
}

const heatingValue = heatingValueOfFuel(gasOil.elementMolPerKg, gasOil.enthalpyJPerKg ?? NaN, 'as-ruled');
if (heatingValue.kind === 'fault') throw new Error(heatingValue.reason);
const plant = {
  boiler: {
    burn: { fuel: gasOil, oxidant: plainAir(), amount: { by: 'lambda', lambda: 1.15 } },
    pressurePa: 101325,
    lowerHeatingValueJPerKg: heatingValue.lowerJPerKg,
    stackTemperatureK: 430,
    completeness: 1,
    wallLossShare: 0.01,
  },
  cycle: {
    boilerPressurePa: 12e6,
    steamTemperatureK: 813.15,
    condenserPressurePa: 5000,
    reheat: { pressurePa: 3e6, temperatureK: 813.15 },
    feedwaterTemperatureK: 420,
    heaterCount: 1,
    turbineEfficiency: 0.87,
    efficiencyOf: 'section',
    pumpEfficiency: 0.75,
  },
  mechanicalEfficiency: 0.97,
} as const;
print({
  name: 'fired steam plant, reheat and feed heater',
  value: time(3, () => {
    const found = steamPlant(plant);
    if (found.kind === 'no-plant') throw new Error(JSON.stringify(found));
  }),
  unit: 'ms',
  budget: 10,
});
