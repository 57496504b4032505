// The figures of a consumption at its edges: an engine without friction idles on nothing and is at its best at every load.
import { expect, test } from 'vitest';
import { consumptionOfCycle } from '../../../server/core/engine/consumption.ts';
import { consumptionValues } from '../../../server/scenario/engine-consumption.ts';

test('without friction no load is better than the rating, and idling takes nothing', () => {
  const values = consumptionValues(consumptionOfCycle({ value: 0.43, low: 0.43, high: 0.43 }, 1, 1e6), 42e6, null);
  expect(values['best-load']).toBe(1);
  expect(values['idle-consumption']).toEqual({ value: 0, low: 0, high: 0 });
});
