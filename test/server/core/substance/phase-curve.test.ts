// Curves against their own terms: the written-out functions are the powers of heat-capacity-terms.ts and their integrals.

import { describe, expect, test } from 'vitest';
import {
  fillEnthalpyTerms,
  fillEntropyTerms,
  fillHeatCapacityTerms,
  gasConstantJPerMolK,
  termCount,
} from '../../../../server/core/substance/heat-capacity-terms.ts';
import { compileCurve, evaluateCurve, pieceAt } from '../../../../server/core/substance/phase-curve.ts';
import type { PhaseFit } from '../../../../server/core/substance/phase-fit.ts';

const record: PhaseFit = {
  id: 'X(cr)',
  label: 'x',
  formula: 'NaCl',
  phase: 'cr',
  formationKJPerMol: -100,
  entropyJPerMolK: 50,
  pieces: [
    { fromK: 250, terms: [0.01, -0.2, 3, 0.4, -0.05, 0.006, -0.0007] },
    { fromK: 700, begins: { kind: 'crystal-crystal', kJPerMol: 3 }, terms: [0, 0, 4] },
  ],
  toK: 1500,
  table: 'X-001',
};
const curve = compileCurve(record);

function sum(fill: (t: number, terms: Float64Array) => void, temperatureK: number): number {
  const terms = new Float64Array(termCount);
  fill(temperatureK / 1000, terms);
  return (record.pieces[0]?.terms ?? []).reduce((total, factor, index) => total + factor * (terms[index] ?? 0), 0);
}

describe('a curve', () => {
  test('starts from its anchor and follows its terms', () => {
    const values = evaluateCurve(curve, 600);
    const enthalpy =
      -100000 + 1000 * gasConstantJPerMolK * (sum(fillEnthalpyTerms, 600) - sum(fillEnthalpyTerms, 298.15));
    const entropy = 50 + gasConstantJPerMolK * (sum(fillEntropyTerms, 600) - sum(fillEntropyTerms, 298.15));
    expect(values.heatCapacityJPerMolK).toBeCloseTo(gasConstantJPerMolK * sum(fillHeatCapacityTerms, 600), 10);
    expect(values.enthalpyJPerMol).toBeCloseTo(enthalpy, 7);
    expect(values.entropyJPerMolK).toBeCloseTo(entropy, 10);
    expect(values.gibbsJPerMol).toBeCloseTo(enthalpy - 600 * entropy, 7);
  });

  test('the integrals are those of the heat capacity: H by T and S by ln T', () => {
    for (const temperatureK of [260, 400, 699, 701, 1200]) {
      const step = 1e-3;
      const below = evaluateCurve(curve, temperatureK - step);
      const above = evaluateCurve(curve, temperatureK + step);
      const { heatCapacityJPerMolK } = evaluateCurve(curve, temperatureK);
      expect((above.enthalpyJPerMol - below.enthalpyJPerMol) / (2 * step)).toBeCloseTo(heatCapacityJPerMolK, 4);
      const slope = (temperatureK * (above.entropyJPerMolK - below.entropyJPerMolK)) / (2 * step);
      expect(slope).toBeCloseTo(heatCapacityJPerMolK, 4);
    }
  });

  test('takes up the heat of a transition, and the upper side counts there', () => {
    const below = evaluateCurve(curve, 700, 1);
    const at = evaluateCurve(curve, 700);
    expect(at.enthalpyJPerMol - below.enthalpyJPerMol).toBeCloseTo(3000, 7);
    expect(at.gibbsJPerMol).toBeCloseTo(below.gibbsJPerMol, 7);
    expect(pieceAt(curve.boundsK, 700)).toBe(2);
    expect(pieceAt(curve.boundsK, 699.999)).toBe(1);
  });

  test('keeps its last heat capacity beyond either end', () => {
    expect(evaluateCurve(curve, 100).heatCapacityJPerMolK).toBeCloseTo(
      evaluateCurve(curve, 250).heatCapacityJPerMolK,
      9,
    );
    const end = evaluateCurve(curve, 1500);
    expect(evaluateCurve(curve, 1600).enthalpyJPerMol).toBeCloseTo(
      end.enthalpyJPerMol + 100 * 4 * gasConstantJPerMolK,
      6,
    );
  });

  test('can start from an anchor that is its very end', () => {
    const ended = compileCurve({ ...record, anchor: { atK: 1500, kJPerMol: 7, jPerMolK: 9 } });
    expect(evaluateCurve(ended, 1500, 2).enthalpyJPerMol).toBeCloseTo(7000, 7);
    expect(evaluateCurve(ended, 1500).entropyJPerMolK).toBeCloseTo(9, 9);
  });
});
