// Times states of lowest energy: a hydrocarbon flame among gases, sodium and a hydrocarbon burning among gases and condensed
// phases, each from nothing and from a neighbouring state, and a cooling path; then the same flames by two general minimisers of
// SciPy in the same minutes, where Debian's python3-scipy is there. `--long`: memory over a million states.
// A time is the least of several rounds: other work on the machine only ever adds to it. Judges nothing.

import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { candidateSet } from '../../server/core/equilibrium/candidates.ts';
import type { Equilibrium, Held } from '../../server/core/equilibrium/equilibrium.ts';
import { equilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import type { EquilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import { gasConstantJPerMolK } from '../../server/core/substance/heat-capacity-terms.ts';
import { propertiesOfPhase } from '../../server/core/substance/phases.ts';
import { print } from './measured.ts';

const isLong = process.argv.includes('--long');
const pressurePa = 101_325;

interface Case {
  readonly name: string;
  readonly solver: EquilibriumSolver;
  readonly elementMol: Float64Array;
  readonly enthalpyJ: number;
}

/** mol of methane, or of n-dodecane with sodium, some sulphur and some salt, in about the stoichiometric amount of air. */
const gasCase = caseOf('hydrocarbon in air', { C: 1, H: 4, O: 4, N: 15, Ar: 0.09 }, -74_873, true);
const sodiumCase = caseOf(
  'sodium and hydrocarbon in air',
  { C: 12, H: 26, O: 41, N: 153, Ar: 0.9, Na: 8, S: 0.02, Cl: 0.01 },
  -290_900,
  false,
);

function caseOf(name: string, amounts: Readonly<Record<string, number>>, enthalpyJ: number, isGasOnly: boolean): Case {
  const candidates = candidateSet(Object.keys(amounts), {
    admits: ({ formula }) => !isGasOnly || formula.phase === 'g',
  });
  const phases = `${candidates.phases.length} candidates, ${candidates.phases.length - candidates.gasCount} of them condensed`;
  return {
    name: `${name} (${phases})`,
    solver: equilibriumSolver(candidates),
    elementMol: Float64Array.from(Object.values(amounts)),
    enthalpyJ,
  };
}

function solved({ solver, elementMol }: Case, held: Held, near?: Equilibrium): Equilibrium {
  const answer = solver.solve(elementMol, held, near);
  if (answer.kind === 'none') throw new Error(JSON.stringify({ answer, held }));
  return answer;
}

/** Microseconds a call, the least of thirty rounds after some to warm up. */
function time(calls: number, call: (k: number) => unknown): number {
  let least = Infinity;
  for (let round = 0; round < 36; round += 1) {
    const start = performance.now();
    for (let k = 0; k < calls; k += 1) call(k);
    const took = ((performance.now() - start) * 1000) / calls;
    if (round >= 6) least = Math.min(least, took);
  }
  return least;
}

/** Fifty flames, the air a little warmer from one to the next (by 50 K in all), so that no call is the same as the last. */
const flameOf = ({ enthalpyJ, elementMol }: Case, k: number): Held => {
  const airMol = ((elementMol[2] ?? 0) + (elementMol[3] ?? 0)) / 2;
  return { held: 'enthalpy-pressure', enthalpyJ: enthalpyJ + airMol * 29.1 * (k % 50), pressurePa };
};

for (const [each, coldBudget, warmBudget] of [
  [gasCase, 150, 60],
  [sodiumCase, 500, 150],
] as const) {
  const start = solved(each, flameOf(each, 0));
  const counts = Array.from({ length: 50 }, (_, k) => solved(each, flameOf(each, k)).iterations);
  print({
    name: `flame of ${each.name}, from nothing`,
    value: time(100, (k) => solved(each, flameOf(each, k))),
    unit: 'µs',
    budget: coldBudget,
    note: `at most ${Math.max(...counts)} steps`,
  });
  print({
    name: `flame of ${each.name}, from a neighbour`,
    value: time(100, (k) => solved(each, flameOf(each, k), start)),
    unit: 'µs',
    budget: warmBudget,
  });
}

print({
  name: 'cooling path of 60 temperatures, 2600 to 420 K, sodium and hydrocarbon',
  value: time(1, coolingPath) / 1000,
  unit: 'ms',
  budget: 15,
});

function coolingPath(): void {
  let near: Equilibrium | undefined;
  for (let step = 0; step < 60; step += 1) {
    const temperatureK = 2600 * (420 / 2600) ** (step / 59);
    near = solved(sodiumCase, { held: 'temperature-pressure', temperatureK, pressurePa }, near);
  }
}

compareWithScipy();
if (isLong) printMemory();

/** The state at a temperature, by us and by the script of the oracle. */
function compareWithScipy(): void {
  const python = '/usr/bin/python3';
  const isThere = spawnSync(python, ['-c', 'import scipy'], { stdio: 'ignore' }).status === 0;
  const temperatureK = 2200;
  for (const each of [gasCase, sodiumCase]) {
    const ownUs = time(100, () => solved(each, { held: 'temperature-pressure', temperatureK, pressurePa }));
    print({ name: `state at ${temperatureK} K of ${each.name}`, value: ownUs, unit: 'µs' });
    if (!isThere) {
      print({ name: 'the same by SciPy', value: NaN, unit: 'x', note: 'install python3-scipy to compare' });
      continue;
    }
    const { phases, gasCount, atoms, startK, endK, elements } = each.solver.candidates;
    const present = [...phases.keys()].filter(
      (index) => temperatureK >= (startK[index] ?? NaN) && temperatureK < (endK[index] ?? NaN),
    );
    const whole = each.elementMol.reduce((sum, mol) => sum + mol, 0);
    const problem = {
      elementMol: Array.from(each.elementMol, (mol) => mol / whole),
      gasCount,
      atoms: present.map((index) => [...atoms.subarray(index * elements.length, (index + 1) * elements.length)]),
      gibbs: present.map((index) => {
        const phase = phases[index];
        if (phase === undefined) throw new Error('no phase');
        const gibbs = propertiesOfPhase(phase, temperatureK)?.gibbsJPerMol ?? NaN;
        return gibbs / (gasConstantJPerMolK * temperatureK) + (index < gasCount ? Math.log(pressurePa / 1e5) : 0);
      }),
    };
    const script = readFileSync('.ci/oracles/equilibrium-scipy.py', 'utf8');
    const run = spawnSync(python, ['-c', script], {
      input: JSON.stringify({ problems: Array.from({ length: 5 }, () => problem) }),
      encoding: 'utf8',
      env: { ...process.env, OMP_NUM_THREADS: '1', OPENBLAS_NUM_THREADS: '1' },
    });
    const { answers } = JSON.parse(run.stdout) as {
      answers: readonly Record<'trustConstr' | 'slsqp', { readonly seconds: number }>[];
    };
    for (const [method, words] of [
      ['trustConstr', 'trust-constr over the amounts'],
      ['slsqp', 'SLSQP over the potentials'],
    ] as const) {
      const seconds = Math.min(...answers.map((answer) => answer[method].seconds));
      print({
        name: `the same by SciPy's ${words}, times as long`,
        value: (seconds * 1e6) / ownUs,
        unit: 'x',
        note: `${(seconds * 1000).toPrecision(3)} ms; goal over ${method === 'slsqp' ? 30 : 1000}`,
      });
    }
  }
}

/** Bytes on the heap after a million states over what they were after the first hundred thousand. */
function printMemory(): void {
  const collect = (globalThis as { gc?: () => void }).gc;
  const used = (): number => {
    collect?.();
    return process.memoryUsage().heapUsed / 2 ** 20;
  };
  let early = 0;
  for (let k = 0; k < 1_000_000; k += 1) {
    solved(gasCase, flameOf(gasCase, k));
    if (k === 100_000) early = used();
  }
  print({
    name: 'heap after a million states, less that after a tenth',
    value: used() - early,
    unit: 'MB',
    budget: collect === undefined ? 64 : 1,
    note: collect === undefined ? 'without a collection before either' : undefined,
  });
}
