// The figures every material has, be it substance or blend: heating values with their product slate, air, carbon dioxide,
// water, alkali against carbon, density and molar mass. One computation on plain numbers per material; uncertainty goes
// through it by the law of propagation, so that correlations between shares and properties are kept.
// Knows no syntax. Invariant: a figure that cannot be had is in `absent` with what is missing, never a number.

import type { Slate } from '../core/balance/combustion.ts';
import type { EnergyFault } from '../core/balance/formation-enthalpy.ts';
import {
  heatingValueOnSlate,
  slateOfChoice,
  type HeatingValue,
  type SlateChoice,
} from '../core/balance/heating-value.ts';
import {
  alkaliCarbonRatio,
  stoichiometricAirKgPerKg,
  waterMadeKgPerKg,
  waterMissingKgPerKg,
} from '../core/balance/stoichiometry.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { dimensionless } from '../core/quantity/dimension.ts';
import { quantityOf, quantityOfOutcome, type Quantity } from '../core/quantity/quantity.ts';
import { propagate } from '../core/quantity/uncertainty.ts';
import { alkaliMetals, atomicWeightKgPerMol } from '../core/substance/elements.ts';
import { molarMassKgPerMol } from '../core/substance/formula.ts';
import { lazily } from './lazily.ts';
import type { Material } from './material.ts';
import { sourceText } from './material-card.ts';
import type { Absent, Figure, Table } from './scenario.ts';
import type { AssumptionId, MethodId, Working, WorkingInput } from './working.ts';

export interface MaterialAnswer {
  readonly figures: readonly Figure[];
  readonly tables: readonly Table[];
  readonly absent: Absent;
  /** Why there is no heating value, where data of elements or products are missing. */
  readonly fault: EnergyFault | null;
}

/** A figure's id, what it is called with its basis, its contract unit, and how it is worked out. */
export interface FigureRow {
  readonly id: string;
  readonly label: string;
  readonly unit: string;
  readonly method: MethodId;
}

/** Every figure a material may have. Ids and units are the contract: they never change. */
export const materialFigures = [
  { id: 'molar-mass', label: 'Molar mass', unit: 'g/mol', method: 'molar-mass' },
  { id: 'density', label: 'Density', unit: 'kg/m3', method: 'ideal-volume-mixing' },
  { id: 'formation-enthalpy', label: 'Enthalpy of formation at 25 °C', unit: 'kJ/mol', method: 'formation-enthalpy' },
  { id: 'lower-heating-value', label: 'Lower heating value, per kg', unit: 'MJ/kg', method: 'lower-heating-value' },
  { id: 'higher-heating-value', label: 'Higher heating value, per kg', unit: 'MJ/kg', method: 'higher-heating-value' },
  {
    id: 'volumetric-lower-heating-value',
    label: 'Lower heating value, per litre',
    unit: 'MJ/L',
    method: 'volumetric-heating-value',
  },
  {
    id: 'volumetric-higher-heating-value',
    label: 'Higher heating value, per litre',
    unit: 'MJ/L',
    method: 'volumetric-heating-value',
  },
  {
    id: 'hydroxide-lower-heating-value',
    label: 'Lower heating value if the alkali ends as hydroxide',
    unit: 'MJ/kg',
    method: 'lower-heating-value',
  },
  {
    id: 'oxide-lower-heating-value',
    label: 'Lower heating value if the alkali ends as oxide',
    unit: 'MJ/kg',
    method: 'lower-heating-value',
  },
  { id: 'stoichiometric-air', label: 'Stoichiometric dry air, per kg', unit: 'kg/kg', method: 'stoichiometric-air' },
  {
    id: 'carbon-factor',
    label: 'Carbon dioxide if all carbon left as CO2, per kg',
    unit: 'kg/kg',
    method: 'carbon-factor',
  },
  { id: 'biogenic-carbon-share', label: 'Biogenic share of the carbon', unit: '1', method: 'biogenic-carbon-share' },
  { id: 'water-made', label: 'Water made on the product slate, per kg', unit: 'kg/kg', method: 'water-made' },
  {
    id: 'water-missing',
    label: 'Water missing to turn all alkali into hydroxide, per kg',
    unit: 'kg/kg',
    method: 'water-missing',
  },
  { id: 'alkali-carbon-ratio', label: 'Alkali per carbon, by mole', unit: '1', method: 'alkali-carbon-ratio' },
] as const satisfies readonly FigureRow[];

type FigureId = (typeof materialFigures)[number]['id'];

/** The figures of a material, worked out once. */
export function figuresOfMaterial(material: Material): readonly Figure[] {
  return answerMaterial(material).figures;
}

/** Figures, tables and what is missing; the same object for the same material. */
export function answerMaterial(material: Material): MaterialAnswer {
  const known = answers.get(material);
  if (known) return known;
  const answer = workOut(material);
  answers.set(material, answer);
  return answer;
}

const answers = new WeakMap<Material, MaterialAnswer>();

/** The plain numbers one evaluation takes. NaN stands for what is not known. */
interface MaterialNumbers {
  readonly molPerKg: ReadonlyMap<string, number>;
  readonly enthalpyJPerKg: number;
  readonly biogenicShare: number;
  readonly densityKgPerM3: number;
  readonly molarMassKgPerMol: number;
}

function workOut(material: Material): MaterialAnswer {
  const unknown = quantityOf(NaN, dimensionless);
  const symbols = [...material.elements.keys()];
  const inputs = [
    material.formationEnthalpy ?? unknown,
    material.biogenicShare,
    material.density ?? unknown,
    material.molarMass ?? unknown,
    ...material.elements.values(),
  ];
  const choice: SlateChoice = material.products ? { products: material.products } : 'as-ruled';
  const ownAmounts = [...material.elements.values()].map(({ value }) => value);
  const ownMolPerKg = new Map(symbols.map((symbol, index) => [symbol, ownAmounts[index] ?? 0]));
  const ownSlates = slatesOf(ownMolPerKg, choice);
  const outcomes = propagate(inputs, ([enthalpy = NaN, biogenic = NaN, density = NaN, molarMass = NaN, ...amounts]) => {
    // Most uncertain inputs are energies and densities, which leave the slates as they are.
    const isMoved = amounts.some((amount, index) => amount !== ownAmounts[index]);
    const molPerKg = isMoved ? new Map(symbols.map((symbol, index) => [symbol, amounts[index] ?? 0])) : ownMolPerKg;
    const values = figureValues(
      {
        molPerKg,
        enthalpyJPerKg: enthalpy,
        biogenicShare: biogenic,
        densityKgPerM3: density,
        molarMassKgPerMol: molarMass,
      },
      burnings(isMoved ? slatesOf(molPerKg, choice) : ownSlates, enthalpy),
    );
    return materialFigures.map((row) => values[row.id] ?? NaN);
  });

  const heats = burnings(ownSlates, material.formationEnthalpy?.value ?? 0);
  const { heat } = heats.ruled;
  const slate = heat.kind === 'heating-value' ? heat.slate : null;
  const figures: Figure[] = [];
  const absent = new Map<string, readonly string[] | null>();
  for (const [index, row] of materialFigures.entries()) {
    if (!isExpected(row.id, material)) continue;
    const outcome = outcomes[index];
    if (outcome && Number.isFinite(outcome.value)) {
      const quantity = quantityOfOutcome(outcome, knownUnit(row.unit).dimension);
      const { id, label, unit, method } = row;
      const figure: Figure = { id, label, quantity, unit, working: unreadWorking(method) };
      figures.push(lazily(figure, { working: () => workingOf(row, material, burningOf(id, heats)) }));
    } else {
      const missing = missingFor(row.id, material, burningOf(row.id, heats).heat);
      if (missing.length > 0) absent.set(row.id, missing);
    }
  }
  const tables = [elementsTable(ownMolPerKg), ...(slate ? [productsTable(slate)] : [])];
  return { figures, tables, absent, fault: heat.kind === 'fault' ? heat : null };
}

/** One fuel burnt on each slate it has a figure for; on the last two only where it holds alkali. */
interface Burnings {
  /** By the rule, or to the products that are named. */
  readonly ruled: Burning;
  readonly hydroxide: Burning | null;
  readonly oxide: Burning | null;
}

interface Burning {
  readonly slate: Slate | null;
  readonly heat: HeatingValue | EnergyFault;
}

type ChosenSlate = ReturnType<typeof slateOfChoice>;
type Slates = { readonly [Key in keyof Burnings]: ChosenSlate | Extract<Burnings[Key], null> };

function slatesOf(molPerKg: ReadonlyMap<string, number>, choice: SlateChoice): Slates {
  const hasAlkali = alkaliMetals.some((metal) => (molPerKg.get(metal) ?? 0) > 0);
  return {
    ruled: slateOfChoice(molPerKg, choice),
    hydroxide: hasAlkali ? slateOfChoice(molPerKg, 'hydroxide') : null,
    oxide: hasAlkali ? slateOfChoice(molPerKg, 'oxide') : null,
  };
}

function burnings({ ruled, hydroxide, oxide }: Slates, enthalpyJPerKg: number): Burnings {
  const on = (slate: ChosenSlate): Burning =>
    slate.kind === 'fault' ? { slate: null, heat: slate } : { slate, heat: heatingValueOnSlate(slate, enthalpyJPerKg) };
  return { ruled: on(ruled), hydroxide: hydroxide && on(hydroxide), oxide: oxide && on(oxide) };
}

/** All figures from plain numbers, in SI; one that does not apply or cannot be had is left out. */
function figureValues(
  numbers: MaterialNumbers,
  { ruled: { heat }, hydroxide, oxide }: Burnings,
): Partial<Record<FigureId, number>> {
  const { molPerKg, densityKgPerM3, enthalpyJPerKg } = numbers;
  const values: Partial<Record<FigureId, number>> = {
    'molar-mass': numbers.molarMassKgPerMol,
    density: densityKgPerM3,
    'formation-enthalpy': enthalpyJPerKg * numbers.molarMassKgPerMol,
  };
  const carbon = molPerKg.get('C') ?? 0;
  values['carbon-factor'] = carbon * ((atomicWeightKgPerMol('C') ?? NaN) + 2 * (atomicWeightKgPerMol('O') ?? NaN));
  if (carbon > 0) values['biogenic-carbon-share'] = numbers.biogenicShare;
  const air = stoichiometricAirKgPerKg(molPerKg);
  if (air !== undefined && air > 0) values['stoichiometric-air'] = air;
  if (heat.kind === 'heating-value') {
    values['lower-heating-value'] = heat.lowerJPerKg;
    values['higher-heating-value'] = heat.higherJPerKg;
    values['volumetric-lower-heating-value'] = heat.lowerJPerKg * densityKgPerM3;
    values['volumetric-higher-heating-value'] = heat.higherJPerKg * densityKgPerM3;
    values['water-made'] = waterMadeKgPerKg(heat.slate);
  }
  if (hydroxide?.heat.kind === 'heating-value') values['hydroxide-lower-heating-value'] = hydroxide.heat.lowerJPerKg;
  if (oxide?.heat.kind === 'heating-value') values['oxide-lower-heating-value'] = oxide.heat.lowerJPerKg;
  if (hydroxide?.slate) {
    values['water-missing'] = waterMissingKgPerKg(hydroxide.slate);
    const ratio = alkaliCarbonRatio(molPerKg);
    if (ratio !== undefined) values['alkali-carbon-ratio'] = ratio;
  }
  return values;
}

const needsEnthalpy: ReadonlySet<string> = new Set<FigureId>([
  'formation-enthalpy',
  'lower-heating-value',
  'higher-heating-value',
  'volumetric-lower-heating-value',
  'volumetric-higher-heating-value',
  'hydroxide-lower-heating-value',
  'oxide-lower-heating-value',
]);
const needsDensity: ReadonlySet<string> = new Set<FigureId>([
  'density',
  'volumetric-lower-heating-value',
  'volumetric-higher-heating-value',
]);
const needsMolarMass: ReadonlySet<string> = new Set<FigureId>(['molar-mass', 'formation-enthalpy']);
const needsSlate: ReadonlySet<string> = new Set([...needsEnthalpy, 'water-made']);

/** Names, in words, of the data a figure lacks; empty when it simply does not apply. */
function missingFor(id: FigureId, material: Material, heat: Burning['heat']): readonly string[] {
  const missing: string[] = [];
  const say = (what: string, names: readonly string[] | undefined): void => {
    for (const name of names ?? []) missing.push(`${what} of ${name}`);
  };
  if (needsEnthalpy.has(id)) say('the enthalpy of formation', material.missing.get('formationEnthalpy'));
  if (needsDensity.has(id)) say('the density', material.missing.get('density'));
  if (needsMolarMass.has(id)) say('the molar mass', material.missing.get('molarMass'));
  if (needsSlate.has(id) && heat.kind === 'fault') missing.push(...slateGaps(heat));
  return missing;
}

/** What a slate lacks, in words. */
export function slateGaps(fault: EnergyFault): readonly string[] {
  switch (fault.reason) {
    case 'no-ruled-product':
      return fault.elements.map((element) => `a ruled product of ${element}`);
    case 'no-product-data':
      return fault.species.map((species) => `the enthalpy of formation of ${species}`);
    case 'no-fuel-data':
      return fault.substances.map((substance) => `the enthalpy of formation of ${substance}`);
    default:
      return ['a slate that its `products` can make'];
  }
}

/** A molar enthalpy of formation is asked of pure substances only. */
function isExpected(id: FigureId, material: Material): boolean {
  return id !== 'formation-enthalpy' || material.formula !== null;
}

/** The burning a figure rests on. */
function burningOf(id: FigureId, { ruled, hydroxide, oxide }: Burnings): Burning {
  if (id === 'hydroxide-lower-heating-value' || id === 'water-missing') return hydroxide ?? ruled;
  return id === 'oxide-lower-heating-value' ? (oxide ?? ruled) : ruled;
}

/** Stands in for a working until it is read; `lazily` puts the real one in its place. */
function unreadWorking(method: MethodId): Working {
  return { method, inputs: [], sources: [], assumptions: [] };
}

function workingOf(row: FigureRow, material: Material, { slate, heat }: Burning): Working {
  const assumptions: AssumptionId[] = [...material.assumptions];
  const inputs: WorkingInput[] = [];
  const add = (label: string, quantity: Quantity | null, unit: string): void => {
    if (quantity) inputs.push({ label, quantity, unit });
  };
  if (needsEnthalpy.has(row.id)) {
    add('Enthalpy of formation, per kg', material.formationEnthalpy, 'MJ/kg');
    assumptions.push('reference-state');
  }
  if (needsSlate.has(row.id) && slate && row.id !== 'formation-enthalpy') {
    for (const product of slate.products) {
      add(product.species, quantityOf(product.molPerKg, knownUnit('mol/kg').dimension), 'mol/kg');
    }
    assumptions.push(slateAssumptions[slate.rule]);
    const alkali = alkaliMetals.filter((metal) => (material.elements.get(metal)?.value ?? 0) > 0);
    if (slate.rule !== 'given' && alkali.length > 1) assumptions.push('several-alkalis-proportional');
  }
  if (needsDensity.has(row.id)) add('Density', material.density, 'kg/m3');
  if (row.id === 'stoichiometric-air') assumptions.push('dry-air');
  if (row.id === 'biogenic-carbon-share') assumptions.push('usual-carbon-origin');
  if (row.id === 'stoichiometric-air' || row.id === 'carbon-factor' || row.id === 'alkali-carbon-ratio') {
    for (const [symbol, amount] of material.elements) add(symbol, amount, 'mol/kg');
  }
  if (needsMolarMass.has(row.id)) add('Molar mass', material.molarMass, 'g/mol');
  const ofProducts = needsSlate.has(row.id) && heat.kind === 'heating-value' ? heat.sources.map(sourceText) : [];
  return {
    method: methodOf(row, material),
    inputs,
    sources: [...new Set([...material.sources, ...ofProducts])],
    assumptions: [...new Set(assumptions)],
  };
}

const slateAssumptions: Readonly<Record<Slate['rule'], AssumptionId>> = {
  'as-ruled': 'carbonate-slate',
  hydroxide: 'hydroxide-slate',
  oxide: 'oxide-slate',
  given: 'given-slate',
};

/** A substance's own density and molar mass are given, a blend's are mixed. */
function methodOf(row: FigureRow, material: Material): MethodId {
  if (row.id === 'density' && !material.portions) return 'as-given';
  if (row.id === 'formation-enthalpy' && material.energyFrom === 'heating-value') {
    return 'formation-enthalpy-from-heating-value';
  }
  if (row.id === 'molar-mass' && material.portions) return 'mean-molar-mass';
  return row.method;
}

function elementsTable(molPerKg: ReadonlyMap<string, number>): Table {
  return {
    id: 'elements',
    label: 'Elements, per kg',
    columns: [
      { id: 'element', label: 'Element', unit: null },
      { id: 'amount', label: 'Amount', unit: 'mol/kg' },
      { id: 'mass-share', label: 'Mass share', unit: '1' },
    ],
    rows: [...molPerKg].map(([symbol, mol]) => {
      const weight = atomicWeightKgPerMol(symbol);
      return [symbol, mol, weight === undefined ? null : mol * weight];
    }),
  };
}

function productsTable(slate: Slate): Table {
  return {
    id: 'complete-combustion-products',
    label: 'Products of complete combustion, per kg',
    columns: [
      { id: 'substance', label: 'Product', unit: null },
      { id: 'amount', label: 'Amount', unit: 'mol/kg' },
      { id: 'mass', label: 'Mass', unit: 'kg/kg' },
    ],
    rows: slate.products.map((product) => {
      const molarMass = molarMassKgPerMol(product.formula);
      return [product.species, product.molPerKg, molarMass === undefined ? null : product.molPerKg * molarMass];
    }),
  };
}
