// The rules against the table of verdicts: misses and false alarms are printed, and there must be none of either.

import { expect, test } from 'vitest';
import { hazardsOf } from '../../../../server/core/hazard/find-hazards.ts';
import type { HazardSeverity } from '../../../../server/core/hazard/hazard-codes.ts';
import { storeOf } from './stores.ts';
import { titleOf, verdicts } from './verdicts.ts';
import type { Verdict } from './verdicts.ts';

/** The worst severity of each code. */
function earnedBy(verdict: Verdict): Readonly<Record<string, HazardSeverity>> {
  const earned: Record<string, HazardSeverity> = {};
  for (const { code, severity } of hazardsOf(storeOf(verdict))) earned[code] ??= severity;
  return earned;
}

const rows = verdicts.map((verdict) => {
  const earned = earnedBy(verdict);
  const codes = [...new Set([...Object.keys(verdict.earns), ...Object.keys(earned)])];
  return {
    verdict,
    misses: codes.filter((code) => earned[code] === undefined),
    falseAlarms: codes.filter((code) => verdict.earns[code] === undefined),
    otherSeverity: codes.filter(
      (code) => earned[code] !== undefined && verdict.earns[code] !== undefined && earned[code] !== verdict.earns[code],
    ),
    earned,
  };
});

test('no miss and no false alarm on the whole table', () => {
  const count = (of: 'misses' | 'falseAlarms' | 'otherSeverity'): number =>
    rows.reduce((sum, row) => sum + row[of].length, 0);
  const verdictsGiven = verdicts.reduce((sum, { earns }) => sum + Object.keys(earns).length, 0);
  const told = rows.flatMap(({ verdict, misses, falseAlarms, otherSeverity, earned }) => [
    ...misses.map((code) => `missed ${code}: ${titleOf(verdict)}`),
    ...falseAlarms.map((code) => `false alarm ${code} (${earned[code] ?? ''}): ${titleOf(verdict)}`),
    ...otherSeverity.map(
      (code) => `${code} is ${earned[code] ?? ''}, not ${verdict.earns[code] ?? ''}: ${titleOf(verdict)}`,
    ),
  ]);
  console.log(
    `${String(verdicts.length)} blends and states, ${String(verdictsGiven)} verdicts: ${String(count('misses'))} misses, ` +
      `${String(count('falseAlarms'))} false alarms, ${String(count('otherSeverity'))} of another severity`,
  );
  expect(told).toEqual([]);
});
