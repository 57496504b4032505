// Humid air against psychrolib. That library takes the ratio of molar masses as 0.621945 and the saturation pressure of
// Hyland and Wexler (1983); ours are 18.015/28.965 = 0.62196 and IF97. The two saturation pressures are stated good to 0.03 %
// and 0.025 % (both from memory), which is what may lie between them; the largest difference seen is 0.02 %.
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { checkFacts, figureOf } from '../../support/facts.ts';

interface Rows {
  readonly rows: readonly {
    readonly celsius: number;
    readonly relativeHumidity: number;
    readonly pressurePa: number;
    readonly humidityRatio: number;
  }[];
}

const { rows } = JSON.parse(readFileSync('test/reference/humid-air-psychrolib.json', 'utf8')) as Rows;

test.each(rows)('$relativeHumidity at $celsius °C', ({ celsius, relativeHumidity, pressurePa, humidityRatio }) => {
  const scenario = checkFacts(`
    oxidant intake {
      100 % air
      state: ${celsius} degC, ${pressurePa} Pa
      relative humidity: ${relativeHumidity * 100} %
    }
  `);
  const found = figureOf(scenario, 'intake', 'humidity-ratio') ?? NaN;
  expect(Math.abs(found / humidityRatio - 1)).toBeLessThan(5.5e-4);
});
