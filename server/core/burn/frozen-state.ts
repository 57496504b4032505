// A composition that no longer reacts, at another temperature: its enthalpy, heat capacity and volume.
// Chemistry and condensation stand still; condensed phases of one composition still change into each other, as melting,
// solidifying and changes of crystal need no partner. Knows no fuel and does not find out when a composition freezes.
// Invariant: atoms, gas and condensed mass are those of the state it comes from.

import { fillGibbs } from '../substance/property-set.ts';
import { compositionKey } from '../substance/formula.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import type { CandidateSet } from '../equilibrium/candidates.ts';
import type { Equilibrium } from '../equilibrium/equilibrium.ts';
import type { FrozenState, MatterState } from './burn.ts';
import { matterState } from './matter-state.ts';

/** What stays the same while the frozen gas cools: pressure in Pa, or the gas's volume in m³. */
export type FrozenHeld = { readonly pressurePa: number } | { readonly volumeM3: number };

/** The composition of `from` at a temperature in K. */
export function frozenState(from: Equilibrium, temperatureK: number, held: FrozenHeld): FrozenState {
  return { kind: 'frozen', from, ...frozenMatter(from, temperatureK, held) };
}

/** The same of any matter, whether or not it is an equilibrium. */
export function frozenMatter(from: MatterState, temperatureK: number, held: FrozenHeld): MatterState {
  const { candidates, gasMol } = from;
  // Without gas there is no volume to hold, and the pressure is whatever it was.
  const pressurePa =
    'pressurePa' in held
      ? held.pressurePa
      : gasMol > 0
        ? (gasMol * molarGasConstantJPerMolK * temperatureK) / held.volumeM3
        : from.pressurePa;
  return matterState(candidates, stablyCondensed(from, temperatureK), temperatureK, pressurePa);
}

/**
 * The amounts with each condensed substance in the form that is stable at the temperature, among the candidates whose data
 * reach it; where none do, it stays in the form it has.
 */
function stablyCondensed(from: MatterState, temperatureK: number): Float64Array {
  const { candidates, amountsMol } = from;
  const moved = amountsMol.slice();
  let gibbs: Float64Array | undefined;
  for (let phase = candidates.gasCount; phase < moved.length; phase += 1) {
    const mol = amountsMol[phase] ?? 0;
    if (mol === 0) continue;
    if (gibbs === undefined) {
      gibbs = new Float64Array(moved.length);
      fillGibbs(candidates.properties, temperatureK, gibbs);
    }
    let best = phase;
    let bestGibbs = isWithinData(candidates, phase, temperatureK) ? (gibbs[phase] ?? 0) : Infinity;
    for (const form of formsOf(candidates, phase)) {
      const value = gibbs[form] ?? Infinity;
      if (value < bestGibbs && isWithinData(candidates, form, temperatureK)) {
        best = form;
        bestGibbs = value;
      }
    }
    if (best === phase) continue;
    moved[phase] = (moved[phase] ?? 0) - mol;
    moved[best] = (moved[best] ?? 0) + mol;
  }
  return moved;
}

function isWithinData({ phases }: CandidateSet, phase: number, temperatureK: number): boolean {
  const range = phases[phase]?.validK;
  return range !== undefined && range[0] <= temperatureK && temperatureK <= range[1];
}

/** For each condensed candidate those of its composition, itself among them; found once a set, as keys of formulas are dear. */
const formsOfSets = new WeakMap<CandidateSet, ReadonlyMap<number, readonly number[]>>();

function formsOf(candidates: CandidateSet, phase: number): readonly number[] {
  let forms = formsOfSets.get(candidates);
  if (forms === undefined) formsOfSets.set(candidates, (forms = groupForms(candidates)));
  return forms.get(phase) ?? [];
}

function groupForms({ phases, gasCount }: CandidateSet): ReadonlyMap<number, readonly number[]> {
  const groups = new Map<string, number[]>();
  const forms = new Map<number, readonly number[]>();
  for (let phase = gasCount; phase < phases.length; phase += 1) {
    const formula = phases[phase]?.formula;
    if (formula === undefined) continue;
    const key = compositionKey(formula);
    const group = groups.get(key) ?? [];
    group.push(phase);
    groups.set(key, group);
    forms.set(phase, group);
  }
  return forms;
}
