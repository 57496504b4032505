// Proves an answer of the minimiser without using anything of the minimiser: from temperature, pressure, amounts and
// potentials alone it recomputes every balance, every affinity, the held property, and the distance between the Gibbs energy
// of the answer and a bound that no composition can go below. Properties come phase by phase from the curves, not from the
// prepared set. Knows no iteration and no reference value.
// Source of the bound: Lagrangian duality of the Gibbs energy of ideal gases and pure phases (a convex function of amounts):
// if no candidate's formula is worth less than its atoms' potentials, no composition has less energy than the potentials
// times the amounts of the elements.

import type { Equilibrium, Held } from '../../server/core/equilibrium/equilibrium.ts';
import { charge } from '../../server/core/equilibrium/candidates.ts';
import { ionsFromK } from '../../server/core/equilibrium/work.ts';
import { gasConstantJPerMolK } from '../../server/core/substance/heat-capacity-terms.ts';
import { evaluateCurve, pieceAt } from '../../server/core/substance/phase-curve.ts';
import { propertiesOfPhase } from '../../server/core/substance/phases.ts';
import type { ThermoPhase } from '../../server/core/substance/phases.ts';

const standardPressurePa = 1e5;

/** Each is zero in an exact answer. */
export interface Proof {
  /** Largest |found - given| / given over the elements. */
  readonly balance: number;
  /** Net charge over the amount of atoms. */
  readonly netCharge: number;
  /** By how much a candidate that is absent would lower the energy, in RT per mole of it. */
  readonly affinity: number;
  /** Largest |potentials of the atoms - chemical potential| / RT over the phases present. */
  readonly residual: number;
  /** |sum of the gas's mole fractions - 1|; by how much it exceeds 1 where there is no gas. */
  readonly fractions: number;
  /** Largest relative difference between an amount and its fraction of the gas. */
  readonly amounts: number;
  /** |found - asked| of the held energy or entropy over R (and T) and the amount of atoms; relative for a volume. */
  readonly held: number;
  /** |found - asked| of the held temperature or pressure, relative. */
  readonly state: number;
  /** |Gibbs energy of the answer - bound| over the sum of the bound's parts. */
  readonly gap: number;
  /** Largest relative error of the totals the answer states. */
  readonly totals: number;
  /** Faults that are no numbers. */
  readonly faults: readonly string[];
}

export const proofLimits: Readonly<Record<Exclude<keyof Proof, 'faults'>, number>> = {
  balance: 1e-10,
  netCharge: 1e-10,
  affinity: 1e-8,
  residual: 1e-8,
  fractions: 1e-8,
  amounts: 1e-8,
  held: 1e-8,
  state: 1e-12,
  gap: 1e-9,
  totals: 1e-9,
};

/** What is over its limit, in words; empty for a proven answer. Not for a crystal at its end, which no energy holds there. */
export function faultsOf(elementMol: Float64Array, held: Held, answer: Equilibrium): string[] {
  const proof = prove(elementMol, held, answer);
  const over = Object.entries(proofLimits)
    .filter(([name, limit]) => !(proof[name as keyof typeof proofLimits] <= limit))
    .map(([name]) => `${name} ${proof[name as keyof typeof proofLimits].toExponential(2)}`);
  return [...proof.faults, ...over];
}

export function prove(elementMol: Float64Array, held: Held, answer: Equilibrium): Proof {
  const { candidates, temperatureK, pressurePa, amountsMol, logFractions, potentials } = answer;
  const { elements, phases, gasCount, atoms } = candidates;
  const width = elements.length;
  const faults: string[] = [];
  /** Signs of the ions that have no potential. */
  const leftOut = new Set<number>();
  const atomsMol = elementMol.reduce((sum, mol, e) => sum + (elements[e] === charge ? 0 : mol), 0);
  const rt = gasConstantJPerMolK * temperatureK;

  const found = new Float64Array(width);
  let [affinity, residual, amounts, fractionSum] = [0, 0, 0, 0];
  let [enthalpyJ, entropyJPerK, gibbsJ, massKg, gasMassKg, frozenJPerK, gasMol] = [0, 0, 0, 0, 0, 0, 0];
  let transitionJ = 0;
  const logPressure = Math.log(pressurePa / standardPressurePa);
  for (let index = 0; index < gasCount; index += 1) gasMol += amountsMol[index] ?? NaN;

  phases.forEach((phase, index) => {
    const mol = amountsMol[index] ?? NaN;
    if (!(mol >= 0)) faults.push(`amount of ${phase.id} is ${mol}`);
    let worth = 0;
    const lacking = new Set<string>();
    for (let e = 0; e < width; e += 1) {
      const count = atoms[index * width + e] ?? NaN;
      if (count === 0) continue;
      // Without a potential of the charge there are no ions: allowed where it is too cold for any to matter.
      const isMissing = elements[e] === charge ? Number.isNaN(potentials[e]) : elementMol[e] === 0;
      if (isMissing) lacking.add(elements[e] ?? '');
      worth += count * (potentials[e] ?? NaN);
      found[e] = (found[e] ?? NaN) + count * mol;
    }
    if (lacking.size > 0) {
      if (mol !== 0) faults.push(`${phase.id} is present without ${[...lacking].join(' ')}`);
      if (lacking.size === 1 && lacking.has(charge)) leftOut.add(Math.sign(phase.formula.charge));
      return;
    }
    const properties = propertiesOfPhase(phase, temperatureK);
    if (properties === undefined) throw new Error(`no properties at ${temperatureK} K`);
    const standard = properties.gibbsJPerMol / rt;
    const isGas = index < gasCount;
    if (isGas) {
      const logFraction = worth - standard - logPressure;
      fractionSum += Math.exp(logFraction);
      if (gasMol > 0) {
        residual = Math.max(residual, Math.abs(logFraction - (logFractions[index] ?? NaN)));
        // Below this an amount has few digits left, or none.
        const expected = gasMol * Math.exp(logFractions[index] ?? NaN);
        if (expected > 1e-290) amounts = Math.max(amounts, Math.abs(mol - expected) / expected);
        else if (mol > 2e-290) faults.push(`${phase.id} is present beside its fraction`);
      }
    } else {
      if (!Number.isNaN(logFractions[index] ?? 0)) faults.push(`${phase.id} has a fraction of the gas`);
      const [startK, endK] = [candidates.startK[index] ?? NaN, candidates.endK[index] ?? NaN];
      if (mol > 0) {
        residual = Math.max(residual, Math.abs(worth - standard));
        const isOut = temperatureK > endK * (1 + 1e-12) || temperatureK < startK * (1 - 1e-12);
        if (isOut) faults.push(`${phase.id} is present outside ${startK} to ${endK} K`);
      } else if (temperatureK > startK && temperatureK < endK) affinity = Math.max(affinity, worth - standard);
    }
    if (mol === 0) return;
    const logActivity = isGas ? (logFractions[index] ?? NaN) + logPressure : 0;
    const molarEntropy = properties.entropyJPerMolK - gasConstantJPerMolK * logActivity;
    enthalpyJ += mol * properties.enthalpyJPerMol;
    entropyJPerK += mol * molarEntropy;
    transitionJ += mol * transitionHeatJPerMol(phase, temperatureK);
    gibbsJ += mol * (properties.gibbsJPerMol + rt * logActivity);
    frozenJPerK += mol * properties.heatCapacityJPerMolK;
    massKg += mol * phase.molarMassKgPerMol;
    if (isGas) gasMassKg += mol * phase.molarMassKgPerMol;
  });

  if (leftOut.size === 2 && temperatureK >= ionsFromK) faults.push('ions are left out');

  let [balance, netCharge, bound, boundScale] = [0, 0, 0, 0];
  elements.forEach((element, e) => {
    const given = elementMol[e] ?? NaN;
    if (element === charge) {
      netCharge = Math.abs(found[e] ?? NaN) / atomsMol;
      return;
    }
    if (given === 0) {
      if (found[e] !== 0) faults.push(`${element} is found and was not given`);
      return;
    }
    const worth = given * (potentials[e] ?? NaN);
    bound += worth;
    boundScale += Math.abs(worth);
    balance = Math.max(balance, Math.abs((found[e] ?? NaN) - given) / given);
  });

  // At a change inside one phase's table, whose energy at that temperature is any from the lower side to the upper.
  if (transitionJ !== 0) {
    const behindJ = Math.min(Math.max(enthalpyJ - answer.enthalpyJ, 0), transitionJ);
    enthalpyJ -= behindJ;
    entropyJPerK -= behindJ / temperatureK;
    frozenJPerK = answer.frozenHeatCapacityJPerK;
  }

  const volumeM3 = (gasMol * rt) / pressurePa;
  const energyJ = enthalpyJ - pressurePa * volumeM3;
  const relative = (stated: number, own: number, scale = Math.abs(own)): number =>
    stated === own ? 0 : Math.abs(stated - own) / scale;
  const totals = Math.max(
    relative(answer.gasMol, gasMol),
    relative(answer.massKg, massKg),
    relative(answer.volumeM3, volumeM3),
    gasMol === 0 ? answer.gasMolarMassKgPerMol : relative(answer.gasMolarMassKgPerMol, gasMassKg / gasMol),
    relative(answer.condensedMassShare, (massKg - gasMassKg) / massKg, 1),
    relative(answer.enthalpyJ, enthalpyJ, rt * atomsMol),
    relative(answer.entropyJPerK, entropyJPerK, gasConstantJPerMolK * atomsMol),
    relative(answer.gibbsEnergyJ, gibbsJ, rt * atomsMol),
    relative(answer.frozenHeatCapacityJPerK, frozenJPerK),
  );
  return {
    balance,
    netCharge,
    affinity,
    residual,
    fractions: gasMol > 0 ? Math.abs(fractionSum - 1) : Math.max(0, fractionSum - 1),
    amounts,
    ...heldErrors(held, { temperatureK, pressurePa, volumeM3, enthalpyJ, entropyJPerK, energyJ }, atomsMol),
    gap: Math.abs(gibbsJ / rt - bound) / boundScale,
    totals,
    faults,
  };
}

/** J/mol taken up by a transition inside the phase's own table, where the temperature is exactly that of one. */
function transitionHeatJPerMol({ curve }: ThermoPhase, temperatureK: number): number {
  const [below, above] = [
    pieceAt(curve.boundsK, temperatureK * (1 - 1e-9)),
    pieceAt(curve.boundsK, temperatureK * (1 + 1e-9)),
  ];
  if (below === above) return 0;
  const heat =
    evaluateCurve(curve, temperatureK, above).enthalpyJPerMol -
    evaluateCurve(curve, temperatureK, below).enthalpyJPerMol;
  return heat > 1 ? heat : 0;
}

interface State {
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly volumeM3: number;
  readonly enthalpyJ: number;
  readonly entropyJPerK: number;
  readonly energyJ: number;
}

function heldErrors(held: Held, state: State, atomsMol: number): { held: number; state: number } {
  const perAtoms = gasConstantJPerMolK * atomsMol;
  const perEnergy = perAtoms * state.temperatureK;
  const error = (found: number, asked: number, scale = asked): number => Math.abs(found - asked) / scale;
  switch (held.held) {
    case 'temperature-pressure':
      return {
        held: 0,
        state: Math.max(error(state.temperatureK, held.temperatureK), error(state.pressurePa, held.pressurePa)),
      };
    case 'enthalpy-pressure':
      return {
        held: error(state.enthalpyJ, held.enthalpyJ, perEnergy),
        state: error(state.pressurePa, held.pressurePa),
      };
    case 'entropy-pressure':
      return {
        held: error(state.entropyJPerK, held.entropyJPerK, perAtoms),
        state: error(state.pressurePa, held.pressurePa),
      };
    case 'temperature-volume':
      return {
        held: error(state.volumeM3, held.volumeM3),
        state: error(state.temperatureK, held.temperatureK),
      };
    case 'energy-volume':
      return {
        held: Math.max(error(state.energyJ, held.energyJ, perEnergy), error(state.volumeM3, held.volumeM3)),
        state: 0,
      };
    case 'entropy-volume':
      return {
        held: Math.max(error(state.entropyJPerK, held.entropyJPerK, perAtoms), error(state.volumeM3, held.volumeM3)),
        state: 0,
      };
  }
}
