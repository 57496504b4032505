// How long droplets and particles of a fuel take to burn out in a burn, portion by portion: liquids as droplets, metals as
// particles, each by the law it burns by. Joins materials and states to core/burn/burn-out.ts; decides no law but by phase
// and element. Invariant: a portion whose data are missing is named, and never given a time.
// The gas around is taken halfway between the oxidant as it comes in and the burnt gas of the whole charge.

import { oxygenDemand } from '../../core/balance/stoichiometry.ts';
import {
  burnOutOfAluminium,
  burnOutOfVapour,
  burnOutOnSurface,
  burnOutWithin,
  burntShareAfter,
  type BurnOut,
  type NoBurnOut,
  type Surroundings,
} from '../../core/burn/burn-out.ts';
import type { Burn } from '../../core/burn/burn.ts';
import { distillateDroplet, type DistillateDroplet } from '../../core/burn/distillate-droplets.ts';
import { prepareBurn } from '../../core/burn/prepare-burn.ts';
import { amountOf } from '../../core/burn/products.ts';
import { vaporisationOf } from '../../core/burn/vaporisation.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import type { Quantity } from '../../core/quantity/quantity.ts';
import { findSubstance, phasesOfSubstance } from '../../core/substance/catalogue.ts';
import { atomicWeightKgPerMol } from '../../core/substance/elements.ts';
import { parseFormula, molarMassKgPerMol } from '../../core/substance/formula.ts';
import { lazily } from '../lazily.ts';
import type { Material } from '../material.ts';
import { figuresOfMaterial } from '../material-figures.ts';
import type { OxidantStream } from '../oxidant-stream.ts';
import type { Table } from '../scenario.ts';

/** What was written of sizes and time. */
export interface BurnOutEntries {
  readonly dropletSize: Quantity | null;
  readonly particleSize: Quantity | null;
  readonly residenceTime: Quantity | null;
}

/** A portion's time, or what it lacks. */
export interface PortionBurnOut {
  readonly name: string;
  readonly diameterM: number;
  readonly burnOut: BurnOut | NoBurnOut | null;
  readonly missing: readonly string[];
  readonly verdict: 'burnt' | 'open' | 'unburnt' | null;
  /** Where its boiling point and molar mass are those typical of the trade, their source. */
  readonly typical: string | null;
}

/**
 * One a portion that has a size and burns at all: water and salts have no time and hold up none. A blend is judged portion
 * by portion, as if each came in droplets or particles of its own. Empty where no size is written.
 */
export function burnOutsOf(
  fuel: Material,
  { dropletSize, particleSize, residenceTime }: BurnOutEntries,
  burn: Burn,
  flame: Equilibrium,
  oxidant: OxidantStream,
): readonly PortionBurnOut[] {
  const sized = portionsOf(fuel).flatMap((material) => {
    const size = isParticle(material) ? particleSize : dropletSize;
    return size && material.phase !== 'g' && oxygenNeedKgPerKg(material) > 0
      ? [{ material, diameterM: size.value }]
      : [];
  });
  if (sized.length === 0) return [];
  const surroundings = surroundingsOf(burn, flame, oxidant);
  const hasOtherOxidiser = [...oxidant.moleShares].some(
    ([gas, share]) => share.value >= leastOxygenMoleShare && !countedGases.has(gas),
  );
  return sized.map(({ material, diameterM }) => {
    const found = burnOutOf(material, diameterM, surroundings, hasOtherOxidiser);
    const burnOut = 'missing' in found ? null : found;
    return {
      name: material.name,
      diameterM,
      burnOut,
      missing: 'missing' in found ? found.missing : [],
      verdict: burnOut && residenceTime ? burnOutWithin(burnOut, residenceTime.value) : null,
      typical: burnOut ? (typicalOf(material)?.source ?? null) : null,
    };
  });
}

/** The longest time of all, s; null where one is missing or never burns out. */
export function longestBurnOutS(burnOuts: readonly PortionBurnOut[]): number | null {
  const times = burnOuts.map(({ burnOut }) => (burnOut && burnOut.law !== 'none' ? burnOut.timeS : null));
  return times.length === 0 || times.includes(null) ? null : Math.max(...times.flatMap((time) => time ?? []));
}

export function burnOutTable(burnOuts: () => readonly PortionBurnOut[], residenceTime: Quantity | null): Table {
  const columns: Table['columns'] = [
    { id: 'substance', label: 'Portion', unit: null },
    { id: 'size', label: 'Diameter', unit: 'um' },
    { id: 'burn-out-time', label: 'Burn-out time', unit: 'ms' },
    { id: 'factor', label: 'good within a factor', unit: '1' },
    { id: 'burnt-share', label: 'Burnt in the time it has', unit: '1' },
    { id: 'law', label: 'Law', unit: null },
    { id: 'verdict', label: 'Verdict', unit: null },
  ];
  const rows = (): Table['rows'] =>
    burnOuts().map(({ name, diameterM, burnOut, verdict, typical }) => {
      const known = burnOut && burnOut.law !== 'none' ? burnOut : null;
      return [
        name,
        diameterM * 1e6,
        known && known.timeS * 1000,
        known && known.factor,
        known && residenceTime ? burntShareAfter(known, residenceTime.value) : null,
        burnOut && `${lawNames[burnOut.law]}${typical ? ', typical of its trade' : ''}`,
        verdict,
      ];
    });
  return lazily<Table>({ id: 'burn-out', label: 'Burn-out', columns, rows: [] }, { rows });
}

const lawNames = {
  vapour: 'flame of its vapour',
  surface: 'oxygen to its surface',
  aluminium: 'aluminium correlation',
  none: 'too little oxygen for a flame',
} as const;

/** A blend's portions and theirs, each once. */
function portionsOf(material: Material): readonly Material[] {
  if (!material.portions) return [material];
  return [...new Set(material.portions.flatMap((portion) => portionsOf(portion.material)))];
}

/** Metals burn as particles, molten or not; so does whatever is solid. */
function isParticle(material: Material): boolean {
  return material.phase === 'cr' || elementOf(material) !== null;
}

/** The symbol of a metal that is one element; null for all else. */
function elementOf({ formula }: Material): string | null {
  const [symbol, ...others] = formula ? [...formula.composition.keys()] : [];
  return symbol !== undefined && others.length === 0 && formula?.phase !== 'g' ? symbol : null;
}

function elementMolPerKgOf({ elements }: Material): ReadonlyMap<string, number> {
  return new Map([...elements].map(([symbol, amount]) => [symbol, amount.value]));
}

function oxygenNeedKgPerKg(material: Material): number {
  return oxygenDemand(elementMolPerKgOf(material)).molPerKg * 2 * (atomicWeightKgPerMol('O') ?? NaN);
}

/**
 * Whether the laws, which know free oxygen only, speak of this gas. Metals and other elements also burn in steam and carbon
 * dioxide, some in nitrogen, so that a time by the little oxygen beside them would be false; fuels of carbon and hydrogen do
 * not, but they do in oxidants that are neither, as nitrous oxide. Aluminium's correlation counts steam and carbon dioxide.
 */
function hasLawFor(element: string | null, gas: Surroundings, hasOtherOxidiser: boolean): boolean {
  const { oxygenMoleShare, waterMoleShare, carbonDioxideMoleShare } = gas;
  if (hasOtherOxidiser) return false;
  const combined = waterMoleShare + carbonDioxideMoleShare;
  if (element === 'Al') return oxygenMoleShare + combined >= leastOxygenMoleShare;
  if (element === null) return true;
  return oxygenMoleShare >= Math.max(leastOxygenMoleShare, combined / 4);
}

/** Less oxygen than this is what dissociation leaves, not what was brought. */
const leastOxygenMoleShare = 0.01;

/** Of an oxidant: free oxygen, what keeps no flame of carbon and hydrogen, and what is itself a fuel. */
const countedGases: ReadonlySet<string> = new Set(
  ['O2', 'N2', 'Ar', 'He', 'Ne', 'Kr', 'Xe', 'H2O', 'CO2', 'SO2', 'CO', 'H2', 'CH4'].map((gas) => `${gas}(g)`),
);

function burnOutOf(
  material: Material,
  diameterM: number,
  gas: Surroundings,
  hasOtherOxidiser: boolean,
): BurnOut | NoBurnOut | { readonly missing: readonly string[] } {
  const { name, density } = material;
  const element = elementOf(material);
  if (!hasLawFor(element, gas, hasOtherOxidiser)) {
    return { missing: [`a published law of burn-out for ${name} in ${oxidiserOf(gas, hasOtherOxidiser)}`] };
  }
  if (element === 'Al') return burnOutOfAluminium(diameterM, gas);
  const molPerKg = elementMolPerKgOf(material);
  const oxygenKgPerKg = oxygenNeedKgPerKg(material);
  const heating = figuresOfMaterial(material).find(({ id }) => id === 'lower-heating-value')?.quantity.value;
  const boiling = element === null ? boilingOf(material) : vaporisationOf(element, gas.pressurePa);
  if (element !== null && surfaceBurners.has(element) && density) {
    return burnOutOnSurface({ densityKgPerM3: density.value, oxygenKgPerKg, surfaceK: gas.flameK }, diameterM, gas);
  }
  const missing = [
    ...(density ? [] : [`the density of ${name}`]),
    ...(heating === undefined ? [`the lower heating value of ${name}`] : []),
    ...(boiling ? [] : [`the boiling point and molar mass of ${name}`]),
    ...(element === null && material.phase === 'cr' ? [`a law of burn-out for ${name}`] : []),
  ];
  if (missing.length > 0 || !density || heating === undefined || !boiling) return { missing };
  const vapour =
    element === null ? { molarMassKgPerMol: molarMassOf(material)?.value ?? NaN, elementMolPerKg: molPerKg } : null;
  const fuel = { densityKgPerM3: density.value, ...boiling, heatingValueJPerKg: heating, oxygenKgPerKg, vapour };
  return burnOutOfVapour(fuel, diameterM, gas);
}

/** Metals that do not boil below the temperature of their flame and keep their oxide. */
const surfaceBurners: ReadonlySet<string> = new Set(['Fe', 'Ti', 'Si', 'B']);

/**
 * Boiling at 1 atm and the heat it takes: by the catalogue's vapour where there is one, else by Trouton's rule,
 * 88 J/(mol K) (common practice).
 */
function boilingOf(material: Material) {
  const { name, origin, formationEnthalpy } = material;
  const molarMass = molarMassOf(material);
  const boilingK = material.boilingPoint?.value ?? typicalOf(material)?.boilingK;
  if (boilingK === undefined || !molarMass) return undefined;
  const substance = origin === 'catalogue' ? findSubstance(name) : undefined;
  const gas = substance && phasesOfSubstance(substance.name).find(({ phase }) => phase === 'g');
  const gasJPerKg = gas?.energy.kind === 'formation-enthalpy' ? gas.energy.jPerKg.value : undefined;
  const latentJPerKg =
    gasJPerKg !== undefined && formationEnthalpy
      ? gasJPerKg - formationEnthalpy.value
      : (troutonJPerMolK * boilingK) / molarMass.value;
  return { boilingK, latentJPerKg };
}

const troutonJPerMolK = 88;

/** Its own, or the one that is typical of its trade. */
function molarMassOf(material: Material): { readonly value: number } | null {
  const typical = typicalOf(material);
  return material.molarMass ?? (typical ? { value: typical.molarMassKgPerMol } : null);
}

function typicalOf({ name, origin, phase, boilingPoint, molarMass }: Material): DistillateDroplet | undefined {
  if (origin !== 'catalogue' || phase !== 'l' || (boilingPoint && molarMass)) return undefined;
  return distillateDroplet(name);
}

/** What it would burn by, where the laws know free oxygen only. */
function oxidiserOf({ waterMoleShare, carbonDioxideMoleShare }: Surroundings, hasOtherOxidiser: boolean): string {
  if (hasOtherOxidiser) return 'an oxidant other than oxygen';
  if (waterMoleShare + carbonDioxideMoleShare < leastOxygenMoleShare) return 'a gas without oxygen';
  return waterMoleShare >= carbonDioxideMoleShare ? 'steam' : 'carbon dioxide';
}

function surroundingsOf(burn: Burn, flame: Equilibrium, oxidant: OxidantStream): Surroundings {
  const oxygenKgPerMol = 2 * (atomicWeightKgPerMol('O') ?? NaN);
  const flameShare = (id: string): number => (flame.gasMol > 0 ? amountOf(flame, id) / flame.gasMol : 0);
  const oxidantShare = (id: string): number => oxidant.moleShares.get(id)?.value ?? 0;
  const halfway = (id: string): number => (flameShare(id) + oxidantShare(id)) / 2;
  const oxidantKgPerMol = [...oxidant.moleShares].reduce((sum, [name, share]) => {
    const formula = parseFormula(name);
    return sum + share.value * (formula.kind === 'formula' ? (molarMassKgPerMol(formula) ?? NaN) : NaN);
  }, 0);
  const oxygenMassShare =
    ((oxidantShare('O2(g)') * oxygenKgPerMol) / oxidantKgPerMol +
      (flame.gasMol > 0 ? (flameShare('O2(g)') * oxygenKgPerMol) / flame.gasMolarMassKgPerMol : 0)) /
    2;
  return {
    temperatureK: (flame.temperatureK + burn.input.oxidant.temperatureK) / 2,
    pressurePa: flame.pressurePa,
    oxygenMoleShare: halfway('O2(g)'),
    waterMoleShare: halfway('H2O(g)'),
    carbonDioxideMoleShare: halfway('CO2(g)'),
    oxygenMassShare,
    flameK: stoichiometricK(burn) ?? flame.temperatureK,
  };
}

/** The flame of the whole at λ = 1, without zone or cooling; null where λ has no meaning or the energy is not known. */
function stoichiometricK(burn: Burn): number | null {
  const { fuel, oxidant, held, lowerHeatingValueJPerKg, allowed, barred, ions } = burn.input;
  if (burn.charge.lambda === null) return null;
  const even = prepareBurn({
    fuel,
    oxidant,
    held,
    lowerHeatingValueJPerKg,
    amount: { by: 'lambda', lambda: 1 },
    heat: { heat: 'adiabatic', lossShare: 0 },
    cooledToK: [],
    ...(allowed && { allowed }),
    ...(barred && { barred }),
    ...(ions && { ions }),
  });
  const state = even.kind === 'burn' ? even.flame() : null;
  return state?.kind === 'equilibrium' ? state.temperatureK : null;
}
