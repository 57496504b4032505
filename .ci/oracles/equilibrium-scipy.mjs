// SciPy (Debian python3-scipy): the composition of least Gibbs energy of random mixtures, by two general minimisers, each on its
// own form of the problem (equilibrium-scipy.py beside this file says which). It is given nothing of ours but g/RT of the
// candidate phases and their atoms. The mixtures are drawn with a fixed seed.

import { readFileSync } from 'node:fs';

export const packages = ['python3-scipy'];
/** Debian's own interpreter: another python3 earlier in the path does not see Debian's modules. */
const python = '/usr/bin/python3';
export const program = [python, '-c', 'import scipy'];

const standardPressurePa = 1e5;
const gasConstantJPerMolK = 8.314462618;
const systems = [
  'H O',
  'C H O',
  'C H O N',
  'C H O N',
  'C H O N Ar',
  'C H N',
  'S O H N',
  'C H O N S',
  'Na H O',
  'C H O N Na',
  'Na Cl H O',
  'K C O H',
  'Li O H N',
  'Mg O N',
  'Mg C O H',
  'Ca C O H',
  'Al O H',
  'Al Cl H O',
  'B O H N',
  'Si O C H',
  'Fe O C',
  'Fe O H S',
  'Ti Cl O',
  'Na B H O',
];

export async function answer({ run, load }) {
  const { candidateSet } = await load('server/core/equilibrium/candidates.ts');
  const { propertiesOfPhase } = await load('server/core/substance/phases.ts');
  const random = randomSource(20_261_201);
  const mixtures = systems.map((text) => {
    const elements = text.split(' ');
    const parts = elements.map(() => 10 ** (-1.5 + 1.5 * random()));
    const whole = parts.reduce((sum, part) => sum + part, 0);
    return {
      elements,
      elementMol: parts.map((part) => Number((part / whole).toPrecision(6))),
      temperatureK: Math.round(700 + 3300 * random()),
      pressurePa: Number((1e5 * 10 ** (-1 + 3 * random())).toPrecision(4)),
    };
  });
  const sets = mixtures.map(({ elements, temperatureK }) => {
    const { phases, gasCount, atoms, startK, endK } = candidateSet(elements);
    const indices = phases
      .map((_, index) => index)
      .filter((index) => temperatureK >= startK[index] && temperatureK < endK[index]);
    return {
      ids: indices.map((index) => phases[index].id),
      gasCount,
      atoms: indices.map((index) => [...atoms.subarray(index * elements.length, (index + 1) * elements.length)]),
      standard: indices.map(
        (index) => propertiesOfPhase(phases[index], temperatureK).gibbsJPerMol / (gasConstantJPerMolK * temperatureK),
      ),
    };
  });
  const problems = mixtures.map(({ elementMol, pressurePa }, at) => ({
    elementMol,
    gasCount: sets[at].gasCount,
    atoms: sets[at].atoms,
    gibbs: sets[at].standard.map((g, k) => (k < sets[at].gasCount ? g + Math.log(pressurePa / standardPressurePa) : g)),
  }));
  const script = readFileSync(new URL('equilibrium-scipy.py', import.meta.url), 'utf8');
  const { version, answers } = JSON.parse(run(python, ['-c', script], JSON.stringify({ problems })));
  return {
    source: `SciPy ${version} (Debian): Gibbs energy of our g/RT minimised by trust-constr over the amounts and by SLSQP over the element potentials`,
    command: '/usr/bin/python3 .ci/oracles/equilibrium-scipy.py < problems.json',
    rows: mixtures.map((mixture, at) => {
      const { trustConstr, slsqp } = answers[at];
      const named = (amounts) =>
        Object.fromEntries(amounts.map((mol, k) => [sets[at].ids[k], Number(mol.toPrecision(12))]));
      return {
        ...mixture,
        candidates: sets[at].ids.length,
        trustConstr: {
          gibbsOverRT: trustConstr.gibbsOverRT,
          balance: Number(trustConstr.balance.toPrecision(2)),
          amountsMol: named(trustConstr.amounts),
        },
        slsqp: {
          boundOverRT: slsqp.boundOverRT,
          balance: Number(slsqp.balance.toPrecision(2)),
          amountsMol: Object.fromEntries(Object.entries(named(slsqp.amounts)).filter(([, mol]) => mol > 1e-12)),
        },
        provenance: 'seen',
      };
    }),
  };
}

/** Numbers in [0, 1), the same in every run. */
function randomSource(seed) {
  let state = seed;
  return () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return state / 2 ** 32;
  };
}
