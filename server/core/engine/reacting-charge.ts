// What burns in an engine: the elements of fuel, fresh and residual gas, and their state after combustion. The minimiser's
// states at a held volume or pressure, with everything that may form, and of the gas alone where particles are set apart.
// Knows no cycle and no compression. Invariant: atoms are those given; states with the gas alone lie on the same scale of
// energies and over the same gases in the same order. Solvers are made once a charge, as laying out candidates is dear.

import { candidateSet } from '../equilibrium/candidates.ts';
import type { CandidateSet } from '../equilibrium/candidates.ts';
import type { Equilibrium, Held, NoEquilibrium } from '../equilibrium/equilibrium.ts';
import { equilibriumSolver } from '../equilibrium/solver.ts';
import type { EquilibriumSolver } from '../equilibrium/solver.ts';
import { elementOfSymbol } from '../substance/elements.ts';
import type { ThermoPhase } from '../substance/phases.ts';

export interface ReactingCharge {
  readonly candidates: CandidateSet;
  /** In the order of `candidates.elements`. */
  readonly elementMol: Float64Array;
  /** The state of everything with two properties held. */
  burnt(held: Held, near?: Equilibrium): Equilibrium | NoEquilibrium;
  /** The same solvers with other amounts of these elements (those not named: none). */
  withAmounts(elementMol: ReadonlyMap<string, number>): ReactingCharge;
  /** The gas of a state by itself: what it may become without anything condensing. */
  gasAlone(state: Equilibrium): ReactingGas;
}

export interface ReactingGas {
  /** Amounts are over the gases alone, which stand in the order that they have among all candidates. */
  solve(held: Held, near?: Equilibrium): Equilibrium | NoEquilibrium;
}

/** The charge of these elements (mol each; none negative). `admits` as for a burn. */
export function reactingCharge(
  elementMol: ReadonlyMap<string, number>,
  admits: (phase: ThermoPhase) => boolean = () => true,
): ReactingCharge {
  const present = [...elementMol.keys()]
    .filter((symbol) => (elementMol.get(symbol) ?? 0) > 0)
    .sort((a, b) => numberOf(a) - numberOf(b));
  const solver = equilibriumSolver(candidateSet(present, { admits }));
  let gasSolver: EquilibriumSolver | undefined;
  const gases = (): EquilibriumSolver =>
    (gasSolver ??= equilibriumSolver(
      candidateSet(present, { admits: (phase) => phase.formula.phase === 'g' && admits(phase) }),
    ));
  const of = (amounts: ReadonlyMap<string, number>): ReactingCharge => {
    const amountsMol = Float64Array.from(present, (symbol) => amounts.get(symbol) ?? 0);
    return {
      candidates: solver.candidates,
      elementMol: amountsMol,
      burnt: (held, near) => solver.solve(amountsMol, held, near),
      withAmounts: of,
      gasAlone(state) {
        const inGas = atomsOfGas(state);
        return { solve: (held, near) => gases().solve(inGas, held, near) };
      },
    };
  };
  return of(elementMol);
}

/** mol of each element in the gas of a state. */
function atomsOfGas({ candidates, amountsMol }: Equilibrium): Float64Array {
  const width = candidates.elements.length;
  const found = new Float64Array(width);
  for (let phase = 0; phase < candidates.gasCount; phase += 1) {
    const mol = amountsMol[phase] ?? 0;
    if (!(mol > 0)) continue;
    for (let row = 0; row < width; row += 1) {
      found[row] = (found[row] ?? 0) + mol * (candidates.atoms[phase * width + row] ?? 0);
    }
  }
  return found;
}

function numberOf(symbol: string): number {
  return elementOfSymbol(symbol)?.number ?? Number.POSITIVE_INFINITY;
}
