// Times what a year of work takes: a measured profile of a million rows read and worked into a service, with the memory it
// needs, and eight fuels set side by side over one service. Judges nothing.

import { planOf } from '../../server/core/duty/plan.ts';
import { readProfile } from '../../server/core/duty/profile.ts';
import { measuredConsumption } from '../../server/core/engine/consumption.ts';
import { serviceSums, type FuelNumbers, type ServiceEngine } from '../../server/core/service/service.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';
import { print, quantile, timed } from './measured.ts';

const rows = 1_000_000;

const noSlip = { perFuel: 0, perWorkKgPerJ: 0 };
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
const engine: ServiceEngine = {
  consumption: measuredConsumption(
    [
      { load: 0.25, heatRate: 2.6 },
      { load: 0.75, heatRate: 2.2 },
      { load: 1, heatRate: 2.25 },
    ],
    6.4e6,
    0.05,
    6e5,
  ),
  fuel: 0,
  pilot: null,
  slips: { methane: noSlip, nitrousOxide: noSlip, ammonia: noSlip, urea: noSlip },
};

function profileText(): string {
  const lines = ['time (s),power (kW)'];
  for (let row = 0; row < rows; row += 1) lines.push(`${row * 10},${Math.round(3200 + 3100 * Math.sin(row / 97))}`);
  return lines.join('\n');
}

function serviceOfProfile(text: string): number {
  const profile = readProfile(text);
  if (profile.kind === 'fault') throw new Error(profile.why);
  const leg = { timeS: rows * 10, distanceM: null, speedMPerS: null, calm: false, isOnShore: false, shoreW: 0 };
  const plan = planOf({
    ratedPowerW: [6.4e6],
    legs: [{ ...leg, engines: [{ engine: 0, asked: { by: 'load', load: 1 } }], profile: profile.steps }],
    service: null,
    hotel: [],
    auxiliaries: [],
    boilerHeatW: [],
  });
  const sums = serviceSums(
    {
      plan,
      engines: [engine],
      boilers: [],
      fuels: [oil],
      reserveShare: 0.2,
      dutiesPerBunkering: 1,
      periodS: null,
      tanks: { maximumFilling: 0.95, packingShare: 1, massPerFuel: [0], boilOffPerS: 0 },
      keepsResidue: true,
      carriesWater: false,
    },
    'value',
  );
  return sums.fuelJ;
}

const fuels = ['gas_oil', 'heavy_fuel_oil', 'methanol', 'ethanol', 'kerosene', 'propane', 'butane', 'slurry'];
const scenario = (round: number): string => `blend slurry {
  ${30 + round / 100} % mass sodium
  rest gas_oil
  stored: 20 degC, 1 atm
  blanket: argon
}
engine main {
  maximum continuous rating: 6.4 MW
  fuel: gas_oil
  specific fuel consumption: 199 g/kWh at 25 %, 181 g/kWh at 75 %, 184 g/kWh at 100 %
}
duty work {
  dredge: 5.5 h at 85 % on main
  sail: 38 nmi at 11 kn on main
  service speed: 13 kn at 85 %
}
service annual {
  duty: work
  repeated: 210 per year
  against: gas_oil
}
`;
const comparison = `compare fuels {
  service: annual
  across: ${fuels.join(', ')}
}
`;

function evaluated(text: string): number {
  const { files } = evaluate('bench.stoke', () => ({ text }));
  const table = files[0]?.definitions.find(({ name }) => name === 'fuels')?.tables[0];
  const year = files[0]?.definitions.find(({ name }) => name === 'annual')?.figures;
  if (text.includes('compare') && table?.rows.length !== fuels.length) throw new Error('not all fuels are compared');
  return (table?.rows.length ?? 0) + (year?.length ?? 0);
}

const text = profileText();
serviceOfProfile(text);
const profileRounds = [];
for (let round = 0; round < 5; round += 1) profileRounds.push(await timed(() => serviceOfProfile(text)));
print({
  name: 'a profile of a million rows, read and worked into a service',
  value: quantile(
    profileRounds.map(({ ms }) => ms),
    0.5,
  ),
  cpu: quantile(
    profileRounds.map(({ cpuMs }) => cpuMs),
    0.5,
  ),
  unit: 'ms',
  budget: 2000,
});
print({
  name: 'memory of the process, the text among it',
  value: process.memoryUsage.rss() / 2 ** 20,
  unit: 'MB',
  budget: 300,
});

evaluated(scenario(0) + comparison);
const [without, withFuels] = [[], []] as { ms: number; cpuMs: number }[][];
for (let round = 1; round <= 5; round += 1) {
  without?.push(await timed(() => evaluated(scenario(round))));
  withFuels?.push(await timed(() => evaluated(scenario(round) + comparison)));
}
const [alone, together] = [without, withFuels].map((rounds) =>
  quantile(
    (rounds ?? []).map(({ ms }) => ms),
    0.5,
  ),
);
const cpus = [without, withFuels].map((rounds) =>
  quantile(
    (rounds ?? []).map(({ cpuMs }) => cpuMs),
    0.5,
  ),
);
print({
  name: 'eight fuels over one service, one of them new and metal-bearing',
  value: (together ?? NaN) - (alone ?? NaN),
  cpu: (cpus[1] ?? NaN) - (cpus[0] ?? NaN),
  unit: 'ms',
  budget: 300,
});
