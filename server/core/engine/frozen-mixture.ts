// A mixture that does not react: gases that share one pressure, and condensed substances that keep their heat with them.
// From two held properties to its state, by the same enthalpies and entropies as the minimiser has, so that a state frozen
// out of an equilibrium has the energy and the entropy that one had.
// Knows no fuel, no engine and no reactions; a condensed substance still melts and changes its crystal, as that needs no
// partner, and has no volume. Invariant: what is held is met to rounding; where a phase change holds the temperature, both
// forms share what is held. Ideal gas; entropies contain those of mixing.

import type { Equilibrium, Held, NoEquilibrium } from '../equilibrium/equilibrium.ts';
import { tablesK } from '../equilibrium/solver.ts';
import { molarGasConstantJPerMolK, standardPressurePa } from '../quantity/constants.ts';
import { compositionKey } from '../substance/formula.ts';
import type { Formula } from '../substance/formula.ts';
import type { ThermoPhase } from '../substance/phases.ts';
import { fillEnthalpies, fillGibbs, preparePropertySet } from '../substance/property-set.ts';
import type { PropertySet } from '../substance/property-set.ts';

/** What a species of a mixture needs; every phase of the tables is one. */
export interface MixtureSpecies extends Pick<ThermoPhase, 'id' | 'curve' | 'molarMassKgPerMol' | 'validK'> {
  readonly formula: Pick<Formula, 'composition' | 'phase' | 'charge'>;
}

export interface MixturePart {
  readonly species: MixtureSpecies;
  readonly mol: number;
}

/** A mixture with its working arrays; it belongs to one thread. */
export interface FrozenMixture {
  /** Gases first, each once, none without an amount. */
  readonly parts: readonly MixturePart[];
  readonly gasMol: number;
  readonly massKg: number;
  /** mol of each element. */
  readonly elementMol: ReadonlyMap<string, number>;
  /** `nearK`: a temperature to start from; it never changes the answer but in rounding. */
  solve(held: Held, nearK?: number): MixtureState | NoEquilibrium;
}

/** Everything of the whole mixture, on the minimiser's scales; without gas the pressure is whatever was held. */
export interface MixtureState {
  readonly kind: 'mixture';
  readonly mixture: FrozenMixture;
  readonly temperatureK: number;
  readonly pressurePa: number;
  /** Of the gas. */
  readonly volumeM3: number;
  readonly enthalpyJ: number;
  readonly energyJ: number;
  readonly entropyJPerK: number;
  /** At constant pressure; that of one side where a phase change holds the temperature. */
  readonly heatCapacityJPerK: number;
  /** Ratio of heat capacities of the whole; 1 without gas. */
  readonly gamma: number;
}

/** Parts of the same species are added up; those of no amount are left out. */
export function frozenMixture(parts: readonly MixturePart[]): FrozenMixture {
  const sums = new Map<string, { species: MixtureSpecies; mol: number }>();
  for (const { species, mol } of parts) {
    if (!(mol > 0)) continue;
    const known = sums.get(species.id);
    if (known === undefined) sums.set(species.id, { species, mol });
    else known.mol += mol;
  }
  const all = [...sums.values()];
  const gases = all.filter(({ species }) => species.formula.phase === 'g');
  const sorted = [...gases, ...all.filter(({ species }) => species.formula.phase !== 'g')];
  const elementMol = new Map<string, number>();
  for (const { species, mol } of sorted) {
    for (const [symbol, atoms] of species.formula.composition) {
      elementMol.set(symbol, (elementMol.get(symbol) ?? 0) + atoms * mol);
    }
  }
  return mixtureOver(sorted, gases.length, elementMol, []);
}

/** A gas with less of the amount than this is below rounding in every sum. */
const traceShare = 1e-15;

/**
 * The composition of an equilibrium; its condensed substances may take any of their forms among the candidates. Traces of
 * gas are left out.
 */
export function mixtureFrozenFrom({ candidates, amountsMol, gasMol }: Equilibrium): FrozenMixture {
  const present: MixturePart[] = [];
  const forms: MixtureSpecies[] = [];
  const keys = new Set<string>();
  candidates.phases.forEach((species, phase) => {
    const mol = amountsMol[phase] ?? 0;
    if (!(mol > (phase < candidates.gasCount ? traceShare * gasMol : 0))) return;
    present.push({ species, mol });
    if (phase >= candidates.gasCount) keys.add(compositionKey(species.formula));
  });
  if (keys.size > 0) {
    const ids = new Set(present.map(({ species }) => species.id));
    for (const species of candidates.phases.slice(candidates.gasCount)) {
      if (!ids.has(species.id) && keys.has(compositionKey(species.formula))) forms.push(species);
    }
  }
  const gasCount = present.filter(({ species }) => species.formula.phase === 'g').length;
  const elementMol = new Map<string, number>();
  for (const { species, mol } of present) {
    for (const [symbol, atoms] of species.formula.composition) {
      elementMol.set(symbol, (elementMol.get(symbol) ?? 0) + atoms * mol);
    }
  }
  return mixtureOver(present, gasCount, elementMol, forms);
}

/** A condensed substance and the places of its forms in the property set. */
interface CondensedGroup {
  readonly mol: number;
  readonly forms: readonly { readonly place: number; readonly validK: readonly [number, number] }[];
}

function mixtureOver(
  parts: readonly MixturePart[],
  gasCount: number,
  elementMol: ReadonlyMap<string, number>,
  otherForms: readonly MixtureSpecies[],
): FrozenMixture {
  const all = [...parts.map(({ species }) => species), ...otherForms];
  const properties = preparePropertySet(all.map(({ curve }) => curve));
  let gasMol = 0;
  let massKg = 0;
  parts.forEach(({ species, mol }, place) => {
    if (place < gasCount) gasMol += mol;
    massKg += mol * species.molarMassKgPerMol;
  });
  let mixing = 0;
  for (const { mol } of parts.slice(0, gasCount)) mixing -= mol * Math.log(mol / gasMol);
  const sums = sumsOf(properties, parts, gasCount, groupsOf(parts, gasCount, all), mixing);
  const mixture: FrozenMixture = {
    parts,
    gasMol,
    massKg,
    elementMol,
    solve: (held, nearK) => solve(mixture, sums, held, nearK),
  };
  return mixture;
}

function groupsOf(
  parts: readonly MixturePart[],
  gasCount: number,
  all: readonly MixtureSpecies[],
): readonly CondensedGroup[] {
  const groups = new Map<string, { mol: number; forms: CondensedGroup['forms'][number][] }>();
  all.forEach((species, place) => {
    if (place < gasCount) return;
    const key = compositionKey(species.formula);
    const group = groups.get(key) ?? { mol: 0, forms: [] };
    group.mol += parts[place]?.mol ?? 0;
    group.forms.push({ place, validK: species.validK });
    groups.set(key, group);
  });
  return [...groups.values()];
}

/** H in J, S at 1 bar in J/K with mixing, and cp in J/K, at the last temperature asked for. */
interface Sums {
  enthalpyJ: number;
  standardEntropyJPerK: number;
  heatCapacityJPerK: number;
  at(temperatureK: number): void;
}

function sumsOf(
  properties: PropertySet,
  parts: readonly MixturePart[],
  gasCount: number,
  groups: readonly CondensedGroup[],
  mixing: number,
): Sums {
  const gibbs = new Float64Array(properties.size);
  const enthalpy = new Float64Array(properties.size);
  const capacity = new Float64Array(properties.size);
  const amounts = Float64Array.from(parts, ({ mol }) => mol);
  const sums: Sums = {
    enthalpyJ: 0,
    standardEntropyJPerK: 0,
    heatCapacityJPerK: 0,
    at(temperatureK) {
      fillGibbs(properties, temperatureK, gibbs);
      fillEnthalpies(properties, temperatureK, enthalpy, capacity);
      let h = 0;
      let g = 0;
      let cp = 0;
      const add = (place: number, mol: number): void => {
        h += mol * (enthalpy[place] as number);
        g += mol * (gibbs[place] as number);
        cp += mol * (capacity[place] as number);
      };
      for (let place = 0; place < gasCount; place += 1) add(place, amounts[place] as number);
      for (const group of groups) add(stableForm(group, gibbs, temperatureK), group.mol);
      sums.enthalpyJ = h * molarGasConstantJPerMolK * temperatureK;
      sums.standardEntropyJPerK = (h - g + mixing) * molarGasConstantJPerMolK;
      sums.heatCapacityJPerK = cp * molarGasConstantJPerMolK;
    },
  };
  return sums;
}

/** The form of lowest Gibbs energy among those whose data reach the temperature; where none do, the first. */
function stableForm({ forms }: CondensedGroup, gibbs: Float64Array, temperatureK: number): number {
  let best = forms[0]?.place ?? 0;
  let lowest = Infinity;
  for (const { place, validK } of forms) {
    const value = gibbs[place] as number;
    if (validK[0] <= temperatureK && temperatureK <= validK[1] && value < lowest) {
      best = place;
      lowest = value;
    }
  }
  return best;
}

function solve(mixture: FrozenMixture, sums: Sums, held: Held, nearK = 1000): MixtureState | NoEquilibrium {
  for (const value of Object.values(held)) {
    if (typeof value === 'number' && !Number.isFinite(value)) return { kind: 'none', reason: 'not-finite' };
  }
  if (mixture.parts.length === 0) return { kind: 'none', reason: 'nothing' };
  if ('volumeM3' in held ? !(held.volumeM3 > 0) : !(held.pressurePa > 0)) return { kind: 'none', reason: 'not-finite' };
  if ('volumeM3' in held && !(mixture.gasMol > 0)) return { kind: 'none', reason: 'no-gas' };
  if ('temperatureK' in held) {
    const limit = outside(held.temperatureK);
    if (limit !== undefined) return limit;
    sums.at(held.temperatureK);
    return stateOf(mixture, sums, held, held.temperatureK);
  }
  return searched(mixture, sums, held, nearK);
}

function outside(temperatureK: number): NoEquilibrium | undefined {
  const { lowestK, highestK } = tablesK;
  if (temperatureK < lowestK) return { kind: 'none', reason: 'outside-tables', side: 'below', limitK: lowestK };
  if (temperatureK > highestK) return { kind: 'none', reason: 'outside-tables', side: 'above', limitK: highestK };
  return undefined;
}

/** Newton's method inside a bracket that only shrinks; what is held rises with temperature, by jumps at phase changes. */
function searched(
  mixture: FrozenMixture,
  sums: Sums,
  held: Exclude<Held, { readonly temperatureK: number }>,
  nearK: number,
): MixtureState | NoEquilibrium {
  let lowK = tablesK.lowestK * (1 - 1e-12);
  let highK = tablesK.highestK * (1 + 1e-12);
  let temperatureK = Math.min(Math.max(nearK, tablesK.lowestK), tablesK.highestK);
  for (let step = 0; step < 200; step += 1) {
    sums.at(temperatureK);
    const excess = excessOf(mixture, sums, held, temperatureK);
    if (excess > 0) highK = temperatureK;
    else lowK = temperatureK;
    const next = temperatureK - excess / slopeOf(mixture, sums, held, temperatureK);
    if (Math.abs(next - temperatureK) <= 1e-13 * temperatureK) {
      return outside(temperatureK) ?? stateOf(mixture, sums, held, temperatureK);
    }
    if (highK - lowK <= 2e-13 * highK)
      return outside(lowK) ?? outside(highK) ?? shared(mixture, sums, held, lowK, highK);
    temperatureK = next > lowK && next < highK ? next : (lowK + highK) / 2;
  }
  return { kind: 'none', reason: 'not-converged', detail: JSON.stringify({ held, parts: listed(mixture) }) };
}

function listed({ parts }: FrozenMixture): readonly (readonly [string, number])[] {
  return parts.map(({ species, mol }) => [species.id, mol] as const);
}

/** Held property at the temperature the sums stand at, less what is asked. */
function excessOf(
  { gasMol }: FrozenMixture,
  sums: Sums,
  held: Exclude<Held, { readonly temperatureK: number }>,
  temperatureK: number,
): number {
  const gasJPerK = gasMol * molarGasConstantJPerMolK;
  switch (held.held) {
    case 'enthalpy-pressure':
      return sums.enthalpyJ - held.enthalpyJ;
    case 'energy-volume':
      return sums.enthalpyJ - gasJPerK * temperatureK - held.energyJ;
    case 'entropy-pressure':
      return sums.standardEntropyJPerK - gasJPerK * logPressure(held.pressurePa) - held.entropyJPerK;
    case 'entropy-volume':
      return (
        sums.standardEntropyJPerK -
        gasJPerK * logPressure((gasJPerK * temperatureK) / held.volumeM3) -
        held.entropyJPerK
      );
  }
}

function slopeOf({ gasMol }: FrozenMixture, sums: Sums, { held }: Held, temperatureK: number): number {
  const atVolume = held === 'energy-volume' || held === 'entropy-volume';
  const capacity = sums.heatCapacityJPerK - (atVolume ? gasMol * molarGasConstantJPerMolK : 0);
  return held === 'entropy-pressure' || held === 'entropy-volume' ? capacity / temperatureK : capacity;
}

/** Two forms at one temperature that share what is held between them. */
function shared(
  mixture: FrozenMixture,
  sums: Sums,
  held: Exclude<Held, { readonly temperatureK: number }>,
  lowK: number,
  highK: number,
): MixtureState {
  sums.at(lowK);
  const below = stateOf(mixture, sums, held, lowK);
  const missing = -excessOf(mixture, sums, held, lowK);
  sums.at(highK);
  const above = stateOf(mixture, sums, held, highK);
  const jump = excessOf(mixture, sums, held, highK) + missing;
  const share = jump > 0 ? missing / jump : 0;
  const mix = (a: number, b: number): number => a + share * (b - a);
  return {
    ...below,
    enthalpyJ: mix(below.enthalpyJ, above.enthalpyJ),
    energyJ: mix(below.energyJ, above.energyJ),
    entropyJPerK: mix(below.entropyJPerK, above.entropyJPerK),
  };
}

function stateOf(mixture: FrozenMixture, sums: Sums, held: Held, temperatureK: number): MixtureState {
  const gasJPerK = mixture.gasMol * molarGasConstantJPerMolK;
  const pressurePa = 'pressurePa' in held ? held.pressurePa : (gasJPerK * temperatureK) / held.volumeM3;
  const { enthalpyJ, heatCapacityJPerK } = sums;
  return {
    kind: 'mixture',
    mixture,
    temperatureK,
    pressurePa,
    volumeM3: 'volumeM3' in held ? held.volumeM3 : (gasJPerK * temperatureK) / pressurePa,
    enthalpyJ,
    energyJ: enthalpyJ - gasJPerK * temperatureK,
    entropyJPerK: sums.standardEntropyJPerK - gasJPerK * logPressure(pressurePa),
    heatCapacityJPerK,
    gamma: heatCapacityJPerK / (heatCapacityJPerK - gasJPerK),
  };
}

function logPressure(pressurePa: number): number {
  return Math.log(pressurePa / standardPressurePa);
}
