// Laws that every fitted phase keeps, whatever its numbers: names, ranges, joins, transitions, positive heat capacity.

import { describe, expect, test } from 'vitest';
import { overLimits } from '../../../../server/core/substance/fit/fit-tables.ts';
import { familyOf } from '../../../../server/core/substance/fit/phase-names.ts';
import { reasonsOverLimits } from '../../../../server/core/substance/fit/remarks.ts';
import { molarMassKgPerMol, parseFormula } from '../../../../server/core/substance/formula.ts';
import { gasConstantJPerMolK } from '../../../../server/core/substance/heat-capacity-terms.ts';
import { compileCurve, evaluateCurve } from '../../../../server/core/substance/phase-curve.ts';
import type { FitResiduals, PhaseFit } from '../../../../server/core/substance/phase-fit.ts';
import {
  handPhaseRecords,
  hypotheticalPhases,
  phaseFits,
  phaseLimits,
} from '../../../../server/core/substance/phase-records.ts';
import { allPhases, candidatePhases, phaseOfId, propertiesOfPhase } from '../../../../server/core/substance/phases.ts';
import writtenResiduals from '../../../../server/core/substance/data/phases/residuals.json' with { type: 'json' };
import ironOxideMelt from '../../../reference/iron-oxide-melt.json' with { type: 'json' };
import ironWustite from '../../../reference/iron-wustite.json' with { type: 'json' };
import janafGibbs from '../../../reference/janaf-gibbs-energies.json' with { type: 'json' };

const reference = 298.15;
const handLimits = handPhaseRecords.flatMap(({ id }) => phaseOf(id).limit ?? []);
// The compiler reads a pair in JSON as an array of any length.
const residuals = writtenResiduals as readonly unknown[] as readonly FitResiduals[];

test('there are 603 fitted phases, and every record became a phase, those kept by hand last', () => {
  expect(phaseFits).toHaveLength(603);
  expect(allPhases().map(({ id }) => id)).toEqual([...phaseFits, ...handPhaseRecords].map(({ id }) => id));
});

test('ids are unique and made of formula, phase and form; molar mass comes from the formula alone', () => {
  expect(new Set(phaseFits.map(({ id }) => id)).size).toBe(phaseFits.length);
  for (const record of phaseFits) {
    const formula = parseFormula(record.formula, record.phase);
    if (formula.kind === 'fault') throw new Error(`${record.id}: ${formula.reason}`);
    expect(record.id).toBe(`${formula.text}(${record.phase}${record.form === undefined ? '' : `,${record.form}`})`);
    expect(phaseOfId(record.id)?.molarMassKgPerMol).toBe(molarMassKgPerMol(formula));
    expect(Object.keys(record).filter((key) => /mass/i.test(key))).toEqual([]);
    expect(familyOf(record.formula)).not.toBe('');
  }
});

/** Each law as the list of what breaks it, so that one run names every offender. */
describe('every phase', () => {
  test('has pieces that follow one another inside its range, from 200 K on', () => {
    const broken = phaseFits.filter((record) => {
      const bounds = [...record.pieces.map((piece) => piece.fromK), record.toK];
      const [fromK = 0] = bounds;
      const rises = bounds.every((bound, index) => index === 0 || bound > (bounds[index - 1] ?? bound));
      const holds = (record.stableK ?? []).every(
        ([startK, endK]) => fromK <= startK && startK < endK && endK <= record.toK,
      );
      return !rises || !holds || fromK < 200;
    });
    expect(broken.map(({ id }) => id)).toEqual([]);
  });

  test('has enthalpy and entropy that pass through joins and jump by the heat at a transition, where G is continuous', () => {
    const broken: string[] = [];
    for (const record of phaseFits) {
      const curve = compileCurve(record);
      for (let piece = 1; piece <= record.pieces.length + 1; piece += 1) {
        const boundK = curve.boundsK[piece] ?? 0;
        const below = evaluateCurve(curve, boundK, piece - 1);
        const above = evaluateCurve(curve, boundK, piece);
        const begins = record.pieces[piece - 1]?.begins;
        const heat = (begins?.kJPerMol ?? 0) * 1000;
        // J/mol and J/(mol K): what is left when the terms of a narrow piece cancel.
        const enthalpyOff = above.enthalpyJPerMol - below.enthalpyJPerMol - heat;
        const entropyOff = above.entropyJPerMolK - below.entropyJPerMolK - heat / boundK;
        const gibbsOff = above.gibbsJPerMol - below.gibbsJPerMol;
        // A join that is not physical is smooth too, within the rounding of the terms.
        const heatCapacityOff = begins === undefined ? above.heatCapacityJPerMolK - below.heatCapacityJPerMolK : 0;
        const isWhole =
          Math.abs(enthalpyOff) < 2e-3 &&
          Math.abs(entropyOff) < 1e-6 &&
          Math.abs(gibbsOff) < 2e-3 &&
          Math.abs(heatCapacityOff) < 1e-4;
        if (!isWhole)
          broken.push(`${record.id} at ${boundK} K: ${enthalpyOff} ${entropyOff} ${gibbsOff} ${heatCapacityOff}`);
      }
    }
    expect(broken).toEqual([]);
  });

  test('has a positive heat capacity, so enthalpy and entropy rise and Gibbs energy falls', () => {
    const broken = new Set<string>();
    for (const record of phaseFits) {
      const curve = compileCurve(record);
      const fromK = record.pieces[0]?.fromK ?? 0;
      const steps = 400;
      let before = evaluateCurve(curve, fromK);
      for (let k = 1; k <= steps; k += 1) {
        const now = evaluateCurve(curve, fromK + ((record.toK - fromK) * k) / steps);
        const isRising =
          now.heatCapacityJPerMolK > 0 &&
          now.enthalpyJPerMol > before.enthalpyJPerMol &&
          now.entropyJPerMolK > before.entropyJPerMolK &&
          now.gibbsJPerMol < before.gibbsJPerMol;
        if (!isRising) broken.add(record.id);
        before = now;
      }
    }
    expect([...broken]).toEqual([]);
  });

  test('is exact at its anchor', () => {
    const broken = phaseFits.filter((record) => {
      const atK = record.anchor?.atK ?? reference;
      const values = evaluateCurve(compileCurve(record), atK, atK === record.toK ? record.pieces.length : undefined);
      const enthalpyKJ = record.anchor?.kJPerMol ?? record.formationKJPerMol ?? Number.NaN;
      const entropy = record.anchor?.jPerMolK ?? record.entropyJPerMolK ?? Number.NaN;
      return !(
        Math.abs(values.enthalpyJPerMol / 1000 - enthalpyKJ) < 1e-6 && Math.abs(values.entropyJPerMolK - entropy) < 1e-6
      );
    });
    expect(broken.map(({ id }) => id)).toEqual([]);
  });

  test('is within the limits of the fit, or has a reason not to be', () => {
    const over = residuals.filter((each) => overLimits(each).length > 0).map(({ phase }) => phase);
    expect(over.sort()).toEqual(Object.keys(reasonsOverLimits).sort());
  });
});

describe('two phases that change into each other', () => {
  const changes = phaseFits.flatMap((record) =>
    (record.changes ?? []).filter(({ kind }) => kind !== 'boiling').map((change) => ({ from: record.id, ...change })),
  );

  test('are both there and name each other', () => {
    expect(changes.length).toBeGreaterThan(200);
    for (const change of changes) {
      const other = phaseFits.find(({ id }) => id === change.with);
      expect(other?.changes?.some((back) => back.with === change.from && back.atK === change.atK)).toBe(true);
    }
  });

  test('have the same Gibbs energy there', () => {
    const broken = changes.filter(({ from, with: to, atK }) => {
      // J/mol; the terms are rounded so that cp/R is right to 2e-7 each.
      return !(Math.abs(gibbsAt(fitOf(from), atK) - gibbsAt(fitOf(to), atK)) < 0.2);
    });
    expect(broken).toEqual([]);
  });

  test('meet in the order of their stable ranges', () => {
    for (const { from, with: to, atK, kind } of changes) {
      if (kind !== 'melting') continue;
      const [crystal, liquid] = phaseOfId(from)?.formula.phase === 'l' ? [to, from] : [from, to];
      expect(phaseOfId(liquid)?.formula.phase).toBe('l');
      const below = propertiesOfPhase(phaseOf(crystal), atK)?.entropyJPerMolK ?? 0;
      expect(propertiesOfPhase(phaseOf(liquid), atK)?.entropyJPerMolK).toBeGreaterThan(below);
    }
  });
});

describe('limits kept by hand', () => {
  test('name phases, once each, inside the fitted range', () => {
    expect(new Set(phaseLimits.map(({ phase }) => phase)).size).toBe(phaseLimits.length);
    for (const { phase, atK, source, event } of phaseLimits) {
      const record = phaseFits.find(({ id }) => id === phase);
      expect(record, phase).toBeDefined();
      expect(atK, phase).toBeGreaterThan(record?.pieces[0]?.fromK ?? Number.NaN);
      // A liquid's table may end before its critical point: up to there it is carried on, and said to be.
      if (event !== 'critical point') expect(atK, phase).toBeLessThan(record?.toK ?? Number.NaN);
      expect(source).not.toBe('');
    }
  });

  test('every crystal without a liquid has one, but for those whose real end nobody here knows', () => {
    const liquids = new Set(phaseFits.filter(({ phase }) => phase === 'l').map(({ formula }) => formula));
    const limited = new Set(phaseLimits.map(({ phase }) => phase));
    const open = phaseFits
      .filter(({ phase, formula, id }) => phase === 'cr' && !liquids.has(formula) && !limited.has(id))
      .map(({ id }) => id);
    expect(open.sort()).toEqual(['B3H3O3(cr)', 'K3Al2Cl9(cr)', 'K3AlCl6(cr)', 'MgB4(cr)', 'Na3AlCl6(cr)']);
  });

  const decompositions = [...phaseLimits, ...handLimits].filter(({ products }) => products !== undefined);

  test('some are computed', () => expect(decompositions.length).toBeGreaterThan(15));

  test.each(decompositions)('$phase and its products balance at $atK K', ({ phase, atK, products = {} }) => {
    const { atoms, gibbs, entropy } = change(phase, products, atK);
    for (const rest of atoms) expect(Math.abs(rest)).toBeLessThan(1e-5);
    // Half a kelvin of rounding, times the entropy of the reaction.
    expect(Math.abs(gibbs)).toBeLessThan(0.6 * entropy);
  });

  const byEquilibrium = [...phaseLimits, ...handLimits].filter((limit) => limit.byEquilibrium);

  test.each(byEquilibrium)('$phase is not cut, since the data hold what lies lower at $atK K', (limit) => {
    const { phase, atK, products, into } = limit;
    const { atoms, gibbs, entropy } = change(phase, into ?? products ?? {}, atK);
    for (const rest of atoms) expect(Math.abs(rest)).toBeLessThan(1e-5);
    expect(gibbs).toBeLessThan(0.6 * Math.max(entropy, 0));
    const { endK, validK } = phaseOf(phase);
    expect(endK).toBe(Infinity);
    const givesOffGas = Object.keys(into ?? products ?? {}).some((id) => phaseOf(id).formula.phase === 'g');
    expect(validK[1]).toBeGreaterThanOrEqual(atK);
    expect(validK[1] > atK).toBe(givesOffGas);
  });

  test('that are final cut the phase', () => {
    const final = [...phaseLimits, ...handLimits].filter((limit) => !limit.byEquilibrium);
    expect(final.length).toBeGreaterThan(30);
    for (const { phase, atK, event } of final) {
      expect(phaseOf(phase)).toMatchObject({ endK: atK });
      if (event !== 'critical point') expect(phaseOf(phase)).toMatchObject({ validK: [expect.anything(), atK] });
    }
    // A decomposition into phases of the data needs no cut, so only what melts or changes into the unknown is left.
    expect(final.filter(({ event }) => event === 'decomposes').map(({ phase }) => phase)).toEqual([]);
  });
});

describe('phases that are only tabulated', () => {
  test('exist among the data and may be written, but are no candidates', () => {
    for (const { phase, why } of hypotheticalPhases) expect(phaseOf(phase)).toMatchObject({ hypothetical: why });
    const candidates = new Set(candidatePhases().map(({ id }) => id));
    expect(
      allPhases()
        .filter(({ id }) => !candidates.has(id))
        .map(({ id }) => id),
    ).toEqual(expect.arrayContaining(['Na2SO4(cr,delta)', 'Na2SO4(cr,III)', 'TiO2(cr,anatase)', 'FeO(cr)', 'FeO(l)']));
  });

  test.each(ironWustite.rows)('wustite beside iron has at $temperatureK K the oxygen that was measured', (row) => {
    const { temperatureK, log10OxygenBar } = row;
    const iron = temperatureK < 1184 ? 'Fe(cr,alpha-delta)' : 'Fe(cr,gamma)';
    const { gibbs } = change('Fe0.947O(cr,wustite)', { [iron]: 0.947, 'O2(g)': 0.5 }, temperatureK);
    const measured = -0.5 * gasConstantJPerMolK * temperatureK * Math.LN10 * log10OxygenBar;
    expect(Math.abs(gibbs - measured)).toBeLessThan(ironWustite.toleranceJPerMol);
    // The hypothetical ones are not: that is why they are kept out.
    const { gibbs: stoichiometric } = change('FeO(cr)', { [iron]: 1, 'O2(g)': 0.5 }, temperatureK);
    expect(stoichiometric - measured).toBeGreaterThan(7000);
  });

  test.each(ironOxideMelt.rows)('its melt over liquid iron likewise at $temperatureK K', (row) => {
    const { temperatureK, oxygenJPerMol } = row;
    const { gibbs } = change('Fe0.947O(l)', { 'Fe(l)': 0.947, 'O2(g)': 0.5 }, temperatureK);
    expect(Math.abs(-gibbs - oxygenJPerMol)).toBeLessThan(ironOxideMelt.toleranceJPerMol);
  });
});

describe('Gibbs energies of formation at 298.15 K that the source prints', () => {
  test.each(janafGibbs.rows)('$product', ({ product, elements, kJPerMol }) => {
    let gibbs = gibbsOfWritten(product);
    for (const part of elements.split(' + ')) {
      const [, count = '1', id = ''] = /^(?:([\d.]+) )?(.+)$/.exec(part) ?? [];
      gibbs -= Number(count) * gibbsOfWritten(id);
    }
    // Both sides carry three decimals, and so do the elements' entropies.
    expect(gibbs / 1000).toBeCloseTo(kJPerMol, 2);
  });
});

function phaseOf(id: string): NonNullable<ReturnType<typeof phaseOfId>> {
  const phase = phaseOfId(id);
  if (phase === undefined) throw new Error(`no ${id}`);
  return phase;
}

/** Change of one mole of a phase into others: atoms that do not close, J/mol with the gases together at 1 bar, J/(mol K). */
function change(phase: string, products: Readonly<Record<string, number>>, atK: number) {
  const atoms = new Map<string, number>();
  let gibbs = 0;
  let entropy = 0;
  const gases = Object.entries(products).filter(([id]) => phaseOf(id).formula.phase === 'g');
  const total = gases.reduce((sum, [, count]) => sum + count, 0);
  for (const [id, count] of [...Object.entries(products), [phase, -1] as const]) {
    const one = phaseOf(id);
    const values = propertiesOfPhase(one, atK);
    gibbs += count * (values?.gibbsJPerMol ?? Number.NaN);
    if (id !== phase) entropy += count * (values?.entropyJPerMolK ?? Number.NaN);
    for (const [symbol, number] of one.formula.composition)
      atoms.set(symbol, (atoms.get(symbol) ?? 0) + count * number);
  }
  for (const [, count] of gases) gibbs += count * gasConstantJPerMolK * atK * Math.log(count / total);
  return { atoms: [...atoms.values()], gibbs, entropy };
}

function fitOf(id: string): PhaseFit {
  const record = phaseFits.find((each) => each.id === id);
  if (record === undefined) throw new Error(`no ${id}`);
  return record;
}

function gibbsAt(record: PhaseFit, atK: number): number {
  const curve = compileCurve(record);
  return evaluateCurve(curve, atK, atK === record.toK ? record.pieces.length : undefined).gibbsJPerMol;
}

/** A formula as the reference rows write it: without a phase a gas, and a crystal in its form stable at 298.15 K. */
function gibbsOfWritten(text: string): number {
  const wanted = /\((g|l|cr)\)$/.test(text) ? text : `${text}(g)`;
  const formula = parseFormula(wanted);
  if (formula.kind === 'fault') throw new Error(text);
  const found = allPhases().filter(
    (phase) =>
      phase.formula.text === formula.text &&
      phase.formula.phase === formula.phase &&
      (formula.phase !== 'cr' || phase.stableK.some(([fromK, toK]) => fromK <= reference && reference <= toK)),
  );
  const [only] = found;
  if (only === undefined) throw new Error(`${text}: ${found.length} phases`);
  return propertiesOfPhase(only, reference)?.gibbsJPerMol ?? Number.NaN;
}
