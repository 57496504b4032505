// The phases kept by hand: each passes the schema, names its sources, keeps the laws of the fitted ones, agrees with the
// catalogue at 298.15 K, and is held against measurements it was not taken from.

import * as z from 'zod';
import { describe, expect, test } from 'vitest';
import { findSubstance } from '../../../../server/core/substance/catalogue.ts';
import { parseFormula } from '../../../../server/core/substance/formula.ts';
import { handPhaseSchema } from '../../../../server/core/substance/hand-phase-schema.ts';
import { evaluateCurve } from '../../../../server/core/substance/phase-curve.ts';
import { handPhaseRecords, handPhaseSources, phaseFits } from '../../../../server/core/substance/phase-records.ts';
import { phaseOfId, propertiesOfPhase } from '../../../../server/core/substance/phases.ts';
import { sourceRecords } from '../../../../server/core/substance/records.ts';
import { sourceRecordSchema } from '../../../../server/core/substance/schema.ts';
import dissociation from '../../../reference/calcite-dissociation.json' with { type: 'json' };
import heatCapacities from '../../../reference/calcite-heat-capacities.json' with { type: 'json' };

const reference = 298.15;

function phaseOf(id: string): NonNullable<ReturnType<typeof phaseOfId>> {
  const phase = phaseOfId(id);
  if (phase === undefined) throw new Error(`no ${id}`);
  return phase;
}

describe('every record', () => {
  test.each(handPhaseRecords)('$id', (record) => {
    expect(z.prettifyError(handPhaseSchema.safeParse(record).error ?? new z.ZodError([]))).toBe('');
    const formula = parseFormula(record.formula, record.phase);
    if (formula.kind === 'fault') throw new Error(formula.reason);
    expect(record.id).toBe(`${formula.text}(${record.phase}${record.form === undefined ? '' : `,${record.form}`})`);
    expect(phaseFits.map(({ id }) => id)).not.toContain(record.id);
    const { source, isSlow } = phaseOf(record.id);
    expect(source).not.toBe('');
    expect(isSlow).toBe(record.slow === true);
  });

  test('has sources that exist, and those kept beside the records are all used', () => {
    const used = new Set<string>();
    JSON.stringify(handPhaseRecords, (key, value: unknown) => {
      if (key === 'source' && typeof value === 'string') used.add(value);
      return value;
    });
    const own = handPhaseSources.map(({ id }) => id);
    const shared = new Set(sourceRecords.map(({ id }) => id));
    for (const source of handPhaseSources) expect(sourceRecordSchema.safeParse(source).success).toBe(true);
    expect(own.filter((id) => shared.has(id) || !used.has(id))).toEqual([]);
    expect([...used].filter((id) => !shared.has(id) && !own.includes(id))).toEqual([]);
  });

  test('has a positive heat capacity over its range, and a join that does not jump by more than a percent', () => {
    for (const { id } of handPhaseRecords) {
      const { curve, validK } = phaseOf(id);
      for (let k = 0; k <= 100; k += 1) {
        const values = evaluateCurve(curve, validK[0] + ((validK[1] - validK[0]) * k) / 100);
        expect(values.heatCapacityJPerMolK, id).toBeGreaterThan(0);
      }
      for (let piece = 2; piece < curve.boundsK.length - 1; piece += 1) {
        const boundK = curve.boundsK[piece] ?? Number.NaN;
        const [below, above] = [evaluateCurve(curve, boundK, piece - 1), evaluateCurve(curve, boundK, piece)];
        expect(Math.abs(above.heatCapacityJPerMolK / below.heatCapacityJPerMolK - 1)).toBeLessThan(0.01);
        expect(above.enthalpyJPerMol).toBeCloseTo(below.enthalpyJPerMol, 3);
        expect(above.entropyJPerMolK).toBeCloseTo(below.entropyJPerMolK, 6);
      }
    }
  });

  test('has the enthalpy and entropy of the catalogue at 298.15 K, where that has the phase', () => {
    let compared = 0;
    for (const { id, phase, formula } of handPhaseRecords) {
      const substance = findSubstance(formula, phase);
      if (substance?.energy.kind !== 'formation-enthalpy' || substance.molarMassKgPerMol === undefined) continue;
      compared += 1;
      const values = propertiesOfPhase(phaseOf(id), reference);
      const kJPerMol = (substance.energy.jPerKg.value * substance.molarMassKgPerMol) / 1000;
      expect((values?.enthalpyJPerMol ?? Number.NaN) / 1000, id).toBeCloseTo(kJPerMol, 6);
      expect(values?.entropyJPerMolK, id).toBeCloseTo(substance.entropyJPerMolK?.value ?? Number.NaN, 6);
    }
    expect(compared).toBeGreaterThan(8);
  });
});

describe(`calcite against ${heatCapacities.source}`, () => {
  const { rows, sharePercent } = heatCapacities;
  test.each(rows)('heat capacity at $temperatureK K', ({ temperatureK, jPerMolK }) => {
    const values = propertiesOfPhase(phaseOf('CaCO3(cr,calcite)'), temperatureK);
    const share = (values?.heatCapacityJPerMolK ?? Number.NaN) / jPerMolK - 1;
    expect(Math.abs(share) * 100).toBeLessThan(sharePercent);
  });
});

describe('dissociation pressures', () => {
  test.each(dissociation.rows)('calcite at $temperatureK K: $source', ({ temperatureK, bar, factor }) => {
    const gibbs = (id: string): number => propertiesOfPhase(phaseOf(id), temperatureK)?.gibbsJPerMol ?? Number.NaN;
    const change = gibbs('CaO(cr)') + gibbs('CO2(g)') - gibbs('CaCO3(cr,calcite)');
    const ratio = Math.exp(-change / (8.31446261815324 * temperatureK)) / bar;
    expect(Math.max(ratio, 1 / ratio)).toBeLessThan(factor);
  });
});

describe('a liquid set on its crystal', () => {
  test('has the Gibbs energy of the crystal at the melting point, and the heat of fusion more enthalpy', () => {
    for (const { id, meltsFrom } of handPhaseRecords) {
      if (meltsFrom === undefined) continue;
      const [liquid, crystal] = [id, meltsFrom.phase].map((one) => propertiesOfPhase(phaseOf(one), meltsFrom.atK));
      expect(liquid?.gibbsJPerMol).toBeCloseTo(crystal?.gibbsJPerMol ?? Number.NaN, 3);
      expect((liquid?.enthalpyJPerMol ?? 0) - (crystal?.enthalpyJPerMol ?? 0)).toBeCloseTo(
        meltsFrom.kJPerMol * 1000,
        3,
      );
      // The fitted crystal knows of it too.
      expect(phaseOf(meltsFrom.phase).changes).toContainEqual(
        expect.objectContaining({ with: id, atK: meltsFrom.atK }),
      );
    }
  });
});

test('what needs hours and moisture is marked, and nothing else', () => {
  expect(
    handPhaseRecords
      .filter(({ slow }) => slow)
      .map(({ formula }) => formula)
      .sort(),
  ).toEqual([
    'CaSO4·2H2O',
    'KHCO3',
    'LiOH·H2O',
    'Na2CO3·10H2O',
    'Na2CO3·H2O',
    'Na2CO3·NaHCO3·2H2O',
    'NaHCO3',
    'NaOH·H2O',
  ]);
});
