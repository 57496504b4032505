// Our minimum against two general minimisers on the same Gibbs function (rows of `npm run oracles -- equilibrium-scipy`). The
// energies are worked here from the amounts that each found, by our present data: none may be below ours, and none of the
// compositions may be further from ours than the method's own end allows.

import { describe, expect, test } from 'vitest';
import type { CandidateSet } from '../../../../server/core/equilibrium/candidates.ts';
import type { Equilibrium } from '../../../../server/core/equilibrium/equilibrium.ts';
import { gasConstantJPerMolK } from '../../../../server/core/substance/heat-capacity-terms.ts';
import { propertiesOfPhase } from '../../../../server/core/substance/phases.ts';
import scipy from '../../../reference/equilibrium-scipy.json' with { type: 'json' };
import { faultsOf } from '../../../support/equilibrium-proof.ts';
import { solverOf } from '../../../support/equilibrium.ts';

interface Found {
  readonly balance: number;
  readonly amountsMol: Readonly<Record<string, number>>;
}

interface Row {
  readonly elements: readonly string[];
  readonly elementMol: readonly number[];
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly trustConstr: Found & { readonly gibbsOverRT: number };
  readonly slsqp: Found & { readonly boundOverRT: number };
}

const rows = (scipy.rows as readonly unknown[] as readonly Row[]).map((row) => ({
  ...row,
  name: `${row.elements.join(' ')} at ${row.temperatureK} K`,
}));

function ours(row: Row): Equilibrium {
  const held = { held: 'temperature-pressure', temperatureK: row.temperatureK, pressurePa: row.pressurePa } as const;
  const amounts = Float64Array.from(row.elementMol);
  const answer = solverOf(row.elements.join(' ')).solve(amounts, held);
  if (answer.kind === 'none') throw new Error(JSON.stringify(answer));
  expect(faultsOf(amounts, held, answer)).toEqual([]);
  return answer;
}

/** g/RT of the candidates, the logarithm of the pressure in that of the gases. */
function gibbsOverRT(set: CandidateSet, { temperatureK, pressurePa }: Row): number[] {
  return set.phases.map((phase, index) => {
    const gibbs = propertiesOfPhase(phase, temperatureK)?.gibbsJPerMol ?? NaN;
    return gibbs / (gasConstantJPerMolK * temperatureK) + (index < set.gasCount ? Math.log(pressurePa / 1e5) : 0);
  });
}

function energyOf(set: CandidateSet, gibbs: readonly number[], amounts: readonly number[]): number {
  const gas = amounts.slice(0, set.gasCount).reduce((sum, mol) => sum + mol, 0);
  return amounts.reduce((sum, mol, index) => {
    const mixing = index < set.gasCount && mol > 0 ? Math.log(mol / gas) : 0;
    return sum + mol * ((gibbs[index] ?? NaN) + mixing);
  }, 0);
}

const named = (set: CandidateSet, found: Found): number[] => set.phases.map(({ id }) => found.amountsMol[id] ?? 0);

describe(scipy.source, () => {
  test('there are twenty-four mixtures, and the two methods met on each', () => {
    expect(rows).toHaveLength(24);
    for (const { name, trustConstr, slsqp } of rows) {
      expect(trustConstr.gibbsOverRT - slsqp.boundOverRT, name).toBeLessThan(1e-8);
      expect(trustConstr.gibbsOverRT - slsqp.boundOverRT, name).toBeGreaterThan(-1e-9);
    }
  });

  test.each(rows)('$name: neither has less Gibbs energy', (row) => {
    const answer = ours(row);
    const { candidates } = answer;
    const gibbs = gibbsOverRT(candidates, row);
    const our = energyOf(candidates, gibbs, [...answer.amountsMol]);
    for (const found of [row.trustConstr, row.slsqp]) {
      const amounts = named(candidates, found);
      // Atoms it has too much or too little are worth the potentials of the elements.
      let atoms = 0;
      amounts.forEach((mol, index) => {
        candidates.elements.forEach((_, e) => {
          const count = candidates.atoms[index * candidates.elements.length + e] ?? NaN;
          atoms += mol * count * (answer.potentials[e] ?? NaN);
        });
      });
      row.elementMol.forEach((mol, e) => (atoms -= mol * (answer.potentials[e] ?? NaN)));
      const theirs = energyOf(candidates, gibbs, amounts) - atoms;
      expect(theirs - our).toBeGreaterThan(-1e-12 * Math.abs(our));
      expect(theirs - our).toBeLessThan(1e-8);
    }
    // The bound of the other form of the problem is one and the same number.
    expect(Math.abs(our - row.slsqp.boundOverRT)).toBeLessThan(1e-9 * Math.abs(our));
  });

  test.each(rows)('$name: both have our composition', (row) => {
    const answer = ours(row);
    const { candidates } = answer;
    // The energy is flat at its minimum: one that is 1e-9 above it may be the root of that away in an amount.
    for (const [found, within] of [
      [row.trustConstr, 3e-5],
      [row.slsqp, 1e-6],
    ] as const) {
      named(candidates, found).forEach((mol, index) => {
        const distance = Math.abs(mol - (answer.amountsMol[index] ?? NaN));
        expect(distance, candidates.phases[index]?.id).toBeLessThan(within);
      });
    }
  });
});
