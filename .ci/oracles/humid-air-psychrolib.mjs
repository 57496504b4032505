// psychrolib (npm): humidity ratio of moist air from relative humidity, by the ASHRAE formulations.
import { createRequire } from 'node:module';

const psychrolib = createRequire(import.meta.url)('psychrolib');

export const packages = [];
export const program = [process.execPath, '--version'];

/** °C, relative humidity, Pa */
const states = [
  [25, 0.5, 101325],
  [18, 0.75, 101300],
  [5, 0.9, 100000],
  [40, 0.3, 99000],
  [35, 1, 101325],
  [-10, 0.6, 101325],
  [60, 0.2, 150000],
];

export async function answer() {
  psychrolib.SetUnitSystem(psychrolib.SI);
  return {
    source: 'psychrolib 1.1.1 (npm): GetHumRatioFromRelHum, after ASHRAE Handbook Fundamentals (2017), chapter 1',
    command: 'psychrolib.GetHumRatioFromRelHum(celsius, relativeHumidity, pressurePa)',
    rows: states.map(([celsius, relativeHumidity, pressurePa]) => ({
      celsius,
      relativeHumidity,
      pressurePa,
      humidityRatio: psychrolib.GetHumRatioFromRelHum(celsius, relativeHumidity, pressurePa),
      provenance: 'seen',
    })),
  };
}
