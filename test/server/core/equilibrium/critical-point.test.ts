import { expect, test } from 'vitest';
import { candidateSet } from '../../../../server/core/equilibrium/candidates.ts';
import { equilibriumSolver } from '../../../../server/core/equilibrium/solver.ts';

// Critical temperature of water, 647.096 K (IAPWS-95): above it there is no liquid at any pressure, and an ideal gas carried on
// by a liquid's extrapolated table would condense at flame temperature under 300 bar.
test.each([646, 648, 2000])(
  'water at 300 bar and %d K is liquid below its critical temperature only',
  (temperatureK) => {
    const solver = equilibriumSolver(candidateSet(['H', 'O']));
    const state = solver.solve(Float64Array.of(2, 1), { held: 'temperature-pressure', temperatureK, pressurePa: 3e7 });
    if (state.kind === 'none') throw new Error(state.reason);
    expect(state.condensedMassShare > 0.5).toBe(temperatureK < 647.096);
  },
);
