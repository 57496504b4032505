// What a sea is to those who deliver to it: the same water as its figures tell of, at its own numbers and at moved ones.
import { expect, test } from 'vitest';
import { parse } from '../../../grammar/parse.ts';
import { isUnitWord } from '../../../server/core/quantity/read-unit.ts';
import { propagate } from '../../../server/core/quantity/uncertainty.ts';
import { answerStatement, type Answer } from '../../../server/scenario/answer.ts';
import { standardUncertaintyOf } from '../../../server/core/quantity/parts.ts';
import type { ReceivingWater } from '../../../server/scenario/receiving-water.ts';
import { evaluateText, figureOf, uncertaintyOf } from '../../support/facts.ts';

const text = `sea bank {
  practical salinity: 34.6 ± 0.1
  temperature: 10.5 degC
  total alkalinity: 2312 ± 4 umol/kg
  pCO2: 421 ± 5 uatm
  effluent: 30 mmol/kg hydroxide, 20 mmol/kg carbonate
  near-field dilution: 600
}
`;

function waterOf(source: string): ReceivingWater | null {
  const [placed] = parse(source, isUnitWord).sections;
  const { statement } = placed?.section ?? {};
  if (!placed || statement?.kind !== 'definition') throw new Error('no definition');
  const answer: Answer = answerStatement(placed.section, statement, {
    lookup: () => undefined,
    names: () => [],
    longWork: () => null,
    fileText: () => null,
  });
  const { named } = answer;
  return named?.kind === 'definition' && named.machinery?.machinery === 'sea' ? named.machinery : null;
}

test('it responds as its figures say, and as uncertainly', () => {
  const water = waterOf(text);
  const scenario = evaluateText(text);
  if (!water) throw new Error('no water');
  const values = water.inputs.map(({ value }) => value);
  const delivery = { alkalinity: 0.07 / 600, carbon: 0.02 / 600 };
  const response = water.respond(values, delivery);
  expect((response?.uptake ?? NaN) * 1e6).toBeCloseTo(figureOf(scenario, 'bank', 'near-field-uptake') ?? NaN, 9);
  expect(response?.mixed.ph).toBeCloseTo(figureOf(scenario, 'bank', 'near-field-ph') ?? NaN, 12);
  const efficiency = figureOf(scenario, 'bank', 'uptake-efficiency') ?? NaN;
  expect(water.uptakePerAlkalinity(values)).toBeCloseTo(efficiency, 12);
  const [outcome] = propagate(water.inputs, (moved) => [water.uptakePerAlkalinity(moved)]);
  const uncertainty = standardUncertaintyOf(outcome?.parts ?? new Map());
  expect(uncertainty / (uncertaintyOf(scenario, 'bank', 'uptake-efficiency') ?? NaN)).toBeCloseTo(1, 6);
});

test('no state, no water', () => {
  expect(waterOf(text.replace('  pCO2: 421 ± 5 uatm\n', ''))).toBeNull();
});
