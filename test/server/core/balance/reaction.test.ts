// Reaction enthalpy, Gibbs energy and log10 K at 25 °C.

import { describe, expect, test } from 'vitest';
import { reactionTermOf, reactionValues } from '../../../../server/core/balance/reaction.ts';
import type { ReactionTerm } from '../../../../server/core/balance/reaction.ts';
import { findSubstance } from '../../../../server/core/substance/catalogue.ts';
import janaf from '../../../reference/janaf-gibbs-energies.json' with { type: 'json' };

/** Reads `2 Na(cr) + 0.5 O2`; gases of elements need no phase. */
function side(text: string): readonly ReactionTerm[] {
  return text.split(' + ').map((term) => {
    const [first = '', second] = term.split(' ');
    const substance = findSubstance(second ?? first);
    if (substance === undefined) throw new Error(term);
    return reactionTermOf(substance, second === undefined ? 1 : Number(first));
  });
}

function values(left: string, right: string) {
  const outcome = reactionValues(side(left), side(right));
  if (outcome.kind === 'fault') throw new Error(outcome.substances.join());
  return outcome;
}

describe(`formation from the elements against ${janaf.source}`, () => {
  // Three decimals of enthalpy and entropy: 0.001 kJ, and 298.15 K times 0.0005 J/K for each entropy.
  test.each(janaf.rows)('$product', ({ elements, product, kJPerMol }) => {
    const { gibbsEnergyJ, log10K } = values(elements, product);
    expect(Math.abs((gibbsEnergyJ ?? 0) / 1000 - kJPerMol)).toBeLessThanOrEqual(0.003);
    expect(log10K).toBeCloseTo(-(kJPerMol * 1000) / (8.314462618 * 298.15 * Math.log(10)), 2);
  });
});

describe('an equation', () => {
  test('carbonate from sodium, oxygen and carbon dioxide', () => {
    const { enthalpyJ, enthalpyJPerKgOfLeft } = values('2 Na(cr) + 0.5 O2(g) + CO2(g)', 'Na2CO3(cr)');
    // -1130.768 + 393.522 kJ; the left side weighs what the right does, 105.99 g.
    expect(enthalpyJ).toBeCloseTo(-737_246, 3);
    expect(enthalpyJPerKgOfLeft).toBeCloseTo(-737_246 / 0.10598753856, 0);
  });

  test('reversed changes every sign, doubled doubles all but the value per kilogram', () => {
    const forward = values('CaO + CO2', 'CaCO3');
    const reverse = values('CaCO3', 'CaO + CO2');
    const doubled = values('2 CaO + 2 CO2', '2 CaCO3');
    expect(reverse.enthalpyJ).toBeCloseTo(-forward.enthalpyJ, 6);
    expect(reverse.log10K).toBeCloseTo(-(forward.log10K ?? 0), 9);
    expect(doubled.enthalpyJ).toBeCloseTo(2 * forward.enthalpyJ, 6);
    expect(doubled.enthalpyJPerKgOfLeft).toBeCloseTo(forward.enthalpyJPerKgOfLeft ?? 0, 6);
  });

  test('with an entropy missing still has its enthalpy, and names what is missing', () => {
    const outcome = values('2 Rb(cr) + 0.5 O2', 'Rb2O(cr)');
    expect(outcome.enthalpyJ).toBeCloseTo(-339_000, 6);
    expect(outcome).toMatchObject({ gibbsEnergyJ: undefined, log10K: undefined, withoutEntropy: ['rubidium_oxide'] });
  });

  test('with a formation enthalpy missing is a fault that names each substance once', () => {
    const nameless = {
      name: 'mystery',
      coefficient: 1,
      molarMassKgPerMol: 0.05,
      enthalpyJPerMol: undefined,
      entropyJPerMolK: 1,
    };
    expect(reactionValues([nameless, nameless], side('H2O'))).toEqual({
      kind: 'fault',
      reason: 'no-data',
      substances: ['mystery'],
    });
  });

  test('of nothing weighs nothing', () => {
    expect(reactionValues([], [])).toMatchObject({ enthalpyJ: 0, enthalpyJPerKgOfLeft: undefined });
  });

  test('a technical fuel has no mole', () => {
    const gasOil = findSubstance('gas_oil');
    if (gasOil === undefined) throw new Error();
    expect(reactionValues([reactionTermOf(gasOil, 1)], [])).toMatchObject({ kind: 'fault', substances: ['gas_oil'] });
  });
});
