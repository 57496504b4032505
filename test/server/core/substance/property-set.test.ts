// The inner loop's evaluation against the one a person asks, over all phases and temperatures on both sides of every bound.

import { describe, expect, test } from 'vitest';
import { gasConstantJPerMolK } from '../../../../server/core/substance/heat-capacity-terms.ts';
import { evaluateCurve } from '../../../../server/core/substance/phase-curve.ts';
import { allPhases } from '../../../../server/core/substance/phases.ts';
import { fillEnthalpies, fillGibbs, preparePropertySet } from '../../../../server/core/substance/property-set.ts';

const phases = allPhases();
const curves = phases.map(({ curve }) => curve);
const temperaturesK = [150, 200, 250, 298.15, 300, 372.78, 500, 723.15, 999.9, 1000, 1665, 2500, 4300, 6000, 7500];

describe('a property set', () => {
  test.each(temperaturesK)('agrees with each phase at %d K', (temperatureK) => {
    const set = preparePropertySet(curves);
    const gibbs = new Float64Array(set.size);
    const enthalpies = new Float64Array(set.size);
    const heatCapacities = new Float64Array(set.size);
    fillGibbs(set, temperatureK, gibbs);
    fillEnthalpies(set, temperatureK, enthalpies, heatCapacities);
    curves.forEach((curve, index) => {
      const values = evaluateCurve(curve, temperatureK);
      const scale = gasConstantJPerMolK * temperatureK;
      // Terms of neighbouring powers cancel to a few parts in 1e9 where a piece is narrow.
      expect(gibbs[index]).toBeCloseTo(values.gibbsJPerMol / scale, 6);
      expect(enthalpies[index]).toBeCloseTo(values.enthalpyJPerMol / scale, 6);
      expect(heatCapacities[index]).toBeCloseTo(values.heatCapacityJPerMolK / gasConstantJPerMolK, 6);
    });
  });

  test('answers the same to the last bit whatever was asked before', () => {
    const used = preparePropertySet(curves);
    const wandering = new Float64Array(used.size);
    for (const temperatureK of [...temperaturesK, ...[...temperaturesK].reverse(), 6000, 200, 1665, 298.15]) {
      fillGibbs(used, temperatureK, wandering);
      const fresh = preparePropertySet(curves);
      const once = new Float64Array(fresh.size);
      fillGibbs(fresh, temperatureK, once);
      expect(wandering).toEqual(once);
    }
  });

  test('an impossible temperature gives no number and harms nothing', () => {
    const set = preparePropertySet(curves.slice(0, 3));
    const gibbs = new Float64Array(3);
    fillGibbs(set, Number.NaN, gibbs);
    expect([...gibbs]).toEqual([Number.NaN, Number.NaN, Number.NaN]);
    fillGibbs(set, 500, gibbs);
    expect(gibbs.every(Number.isFinite)).toBe(true);
  });
});
