// The bench's large file is what its figures say it is.
import { expect, it } from 'vitest';
import { findingsOf } from '../../server/findings/registry.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';
import { largeScenario } from './large-scenario.ts';

it('has 300 definitions on about 2,000 lines, and no error', () => {
  const text = largeScenario();
  const scenario = evaluate('large.stoke', () => ({ text }));
  expect(scenario.files[0]?.definitions).toHaveLength(300);
  expect(text.split('\n').length).toBeGreaterThanOrEqual(2000);
  expect(text.split('\n').length).toBeLessThan(2100);
  expect(findingsOf(scenario).filter(({ severity }) => severity === 'error')).toEqual([]);
});
