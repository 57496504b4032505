// The written reactions of the rules: what reacts with water, with the hydrogen of alcohols and acids, with caustic, and
// acids with bases and salts; how much of it a blend can do, the heat it gives off and the gas it makes.
// Knows no equilibrium (pair-equilibrium.ts does) and no rate. Invariant: the element balance of each water reaction is
// exact; amounts are upper bounds, as if all that is there came together.
// Heats: enthalpies of formation of the catalogue. Where products have none, the same metal's heat with water stands in:
// −140 kJ per mol of hydrogen replaced for sodium, and −136 kJ as ethoxide by published enthalpies of formation.

import { balanceEquation } from '../balance/equation.ts';
import { reactionTermOf, reactionValues } from '../balance/reaction.ts';
import { findSubstanceOfFormula } from '../substance/catalogue.ts';
import { alkaliMetals } from '../substance/elements.ts';
import { parseFormula } from '../substance/formula.ts';
import type { Formula } from '../substance/formula.ts';
import type { HazardNumbers } from './rule.ts';
import { heatCapacityJPerKgK, isIn } from './store.ts';
import type { Store, StoredPortion } from './store.ts';

/** What one mol of formula does with water. */
export interface WaterStoichiometry {
  readonly waterMol: number;
  readonly gasMol: Readonly<Record<string, number>>;
  /** J per mol of formula, given off; null where a product has no enthalpy of formation. */
  readonly heatJ: number | null;
  /** The same in plenty of water, in which alkali hydroxides, metaborates, hydrogen chloride and ammonia dissolve. */
  readonly dissolvedHeatJ: number | null;
}

/** Heat of strong acid with strong base, J/mol of water made; of aqueous ions at 25 °C. */
const neutralisationJPerMol = 55.8e3;
/** Heat of saponification of simple esters, J/mol, from memory. */
const saponificationJPerMol = 55e3;
/** Heat of burning per mol of oxygen taken up, near the same for most fuels (Thornton 1917), J/mol. */
const thorntonJPerMol = 420e3;

/** `left` with water to hydroxides and the gases named; undefined where it has no formula or no single balance. */
export function waterStoichiometry(portion: StoredPortion): WaterStoichiometry | undefined {
  const formula = formulaOf(portion);
  if (formula === undefined) return undefined;
  const known = ofFormula.get(formula.text);
  if (known !== undefined) return known;
  const gases = new Set(portion.hazards.withWater.flatMap((reaction) => reaction.gases));
  const answer = balanced(formula, [...gases]);
  if (answer !== undefined) ofFormula.set(formula.text, answer);
  return answer;
}

const ofFormula = new Map<string, WaterStoichiometry>();

/** Its own, or the element of a technical metal that is all but pure. */
function formulaOf({ formula, hazards, molPerKg: elements }: StoredPortion): Formula | undefined {
  if (formula !== null) return formula;
  const [most] = [...elements].sort((a, b) => b[1] - a[1]);
  if (most === undefined || !hazards.families.includes('alkali-metal')) return undefined;
  const element = parseFormula(most[0], 'cr');
  return element.kind === 'formula' ? element : undefined;
}

function balanced(formula: Formula, gases: readonly string[]): WaterStoichiometry | undefined {
  const products = [...solidProducts(formula), ...gases.map((gas) => `${gas}(g)`)].map((text) => parseFormula(text));
  const water = parseFormula('H2O(l)');
  if (water.kind === 'fault') return undefined;
  const right = products.filter((product): product is Formula => product.kind === 'formula');
  const balance = balanceEquation([formula, water], right);
  if (balance.kind !== 'unique') return undefined;
  const [own = 0, waterMol = 0] = balance.coefficients.left;
  if (!(own > 0)) return undefined;
  const term = (species: Formula, coefficient: number) => {
    const substance = findSubstanceOfFormula(species);
    return substance && reactionTermOf(substance, coefficient);
  };
  const left = [term(formula, own), term(water, waterMol)].filter((one) => one !== undefined);
  const made = right.map((species, index) => term(species, balance.coefficients.right[index] ?? 0));
  const values =
    left.length === 2 && made.every((one) => one !== undefined)
      ? reactionValues(
          left,
          made.filter((one) => one !== undefined),
        )
      : undefined;
  const heatJ = values?.kind === 'reaction' ? -values.enthalpyJ / own : null;
  const dissolvingJ = right.reduce(
    (sum, species, index) => sum + ((balance.coefficients.right[index] ?? 0) / own) * dissolvingHeatJPerMol(species),
    0,
  );
  const gasMol: Record<string, number> = {};
  right.forEach(({ text, phase }, index) => {
    if (phase === 'g') gasMol[text] = (balance.coefficients.right[index] ?? 0) / own;
  });
  return {
    waterMol: waterMol / own,
    gasMol,
    heatJ,
    dissolvedHeatJ: heatJ === null ? null : heatJ + dissolvingJ,
  };
}

/** Given off when a mol of it dissolves in plenty of water; 0 for what stays as it is or whose ions are not known. */
function dissolvingHeatJPerMol({ text, phase }: Formula): number {
  const [, metal = '', anion = ''] = /^(Li|Na|K|Rb|Cs)(OH|BO2)$/.exec(text) ?? [];
  const pieces =
    text === 'HCl'
      ? ['H+(aq)', 'Cl-(aq)']
      : text === 'NH3'
        ? ['NH3(aq)']
        : metal === ''
          ? []
          : [`${metal}+(aq)`, `${anion}-(aq)`];
  if (pieces.length === 0) return 0;
  const enthalpies = [`${text}(${phase ?? 'cr'})`, ...pieces].map((piece) => {
    const formula = parseFormula(piece);
    const substance = formula.kind === 'formula' ? findSubstanceOfFormula(formula) : undefined;
    return substance && reactionTermOf(substance, 1).enthalpyJPerMol;
  });
  const [whole, ...parts] = enthalpies;
  if (whole === undefined || parts.some((part) => part === undefined)) return 0;
  return whole - parts.reduce((sum: number, part) => sum + (part ?? 0), 0);
}

/** Hydroxides of the metals, and what water makes of the rest. */
function solidProducts({ composition }: Formula): readonly string[] {
  const alkali = alkaliMetals.filter((metal) => composition.has(metal));
  const [first] = alkali;
  const products: string[] = [];
  for (const element of composition.keys()) {
    if (element === 'B') products.push(first === undefined ? 'H3BO3(cr)' : `${first}BO2(cr)`);
    else if (waterProducts[element] !== undefined) products.push(waterProducts[element]);
  }
  // An alkali metal beside boron is bound by it.
  return composition.has('B') ? products : [...products, ...alkali.map((metal) => `${metal}OH(cr)`)];
}

const waterProducts: Readonly<Partial<Record<string, string>>> = {
  Mg: 'Mg(OH)2(cr)',
  Ca: 'Ca(OH)2(cr)',
  Zn: 'Zn(OH)2(cr)',
  Fe: 'Fe(OH)2(cr)',
  Al: 'Al(OH)3(cr)',
  Si: 'SiO2(cr)',
  Ti: 'TiO2(cr)',
  P: 'H3PO4(cr)',
};

/** The mol of water a portion can give up per kg of the blend: all its hydrogen counted as water, an upper bound. */
export function waterMolPerKg(portion: StoredPortion): number {
  const { formula, molarMassKgPerMol } = portion;
  const bound = formula === null ? null : /·([0-9.]*)H2O$/.exec(formula.text);
  if (bound && molarMassKgPerMol !== null) return (portion.massShare * Number(bound[1] || 1)) / molarMassKgPerMol;
  return (portion.massShare * (portion.molPerKg.get('H') ?? 0)) / 2;
}

/** mol of formula per kg of the blend; of a technical metal the mol of its atoms. */
export function molPerKg(portion: StoredPortion): number | null {
  const { molarMassKgPerMol, massShare, formula, molPerKg: elements } = portion;
  if (molarMassKgPerMol !== null) return massShare / molarMassKgPerMol;
  if (formula !== null || !isIn(portion, 'alkali-metal')) return null;
  return massShare * [...elements.values()].reduce((sum, mol) => sum + mol, 0);
}

function numbersOf(
  store: Store,
  heatJPerKg: number | null,
  gasMolPerKg: Readonly<Record<string, number>>,
): HazardNumbers {
  return {
    ...(heatJPerKg === null ? {} : { heatJPerKg, riseK: heatJPerKg / heatCapacityJPerKgK(store) }),
    ...(Object.keys(gasMolPerKg).length > 0 ? { gasMolPerKg } : {}),
  };
}

function scaled(gasMol: Readonly<Record<string, number>>, factor: number): Readonly<Record<string, number>> {
  return Object.fromEntries(Object.entries(gasMol).map(([gas, mol]) => [gas, mol * factor]));
}

/** What reacts with water, and water. */
export function withWater(store: Store, portion: StoredPortion, water: StoredPortion): HazardNumbers {
  const stoichiometry = waterStoichiometry(portion);
  const mol = molPerKg(portion);
  if (stoichiometry === undefined || mol === null) return {};
  const extent = Math.min(mol, waterMolPerKg(water) / stoichiometry.waterMol);
  const { heatJ, gasMol } = stoichiometry;
  return numbersOf(store, heatJ === null ? null : heatJ * extent, scaled(gasMol, extent));
}

/** What reacts with water, and the replaceable hydrogen of an alcohol or acid. */
export function withHydrogen(store: Store, portion: StoredPortion, donor: StoredPortion): HazardNumbers {
  const stoichiometry = waterStoichiometry(portion);
  const mol = molPerKg(portion);
  const hydrogen = replaceableMolPerKg(donor);
  if (stoichiometry === undefined || mol === null || hydrogen === null) return {};
  const { waterMol, heatJ, gasMol } = stoichiometry;
  const extent = Math.min(mol * waterMol, hydrogen);
  const isAcid = isIn(donor, 'organic-acid', 'mineral-acid');
  const perHydrogenJ = heatJ === null ? null : heatJ / waterMol + (isAcid ? neutralisationJPerMol : 0);
  return numbersOf(store, perHydrogenJ === null ? null : perHydrogenJ * extent, scaled(gasMol, extent / waterMol));
}

/** Aluminium, zinc or silicon in caustic: the gas of its reaction with water, as far as alkali and metal go. */
export function withCaustic(store: Store, portion: StoredPortion, caustic: StoredPortion): HazardNumbers {
  const mol = molPerKg(portion);
  const [element] = portion.molPerKg.keys();
  const valence = { Al: 3, Zn: 2, Si: 4 }[element ?? ''];
  if (mol === null || valence === undefined) return {};
  // One alkali holds one metal atom in solution (two for zinc and silicon); without it a film stops the rest.
  const extent = Math.min(mol, causticMolPerKg(caustic) / (valence === 3 ? 1 : 2));
  const heatJ = waterStoichiometry(portion)?.heatJ ?? null;
  return numbersOf(store, heatJ === null ? null : heatJ * extent, { H2: (extent * valence) / 2 });
}

/** Acid and base: each hydrogen with each hydroxide. */
export function neutralisation(store: Store, acid: StoredPortion, base: StoredPortion): HazardNumbers {
  const hydrogen = replaceableMolPerKg(acid);
  if (hydrogen === null) return {};
  return numbersOf(store, Math.min(hydrogen, causticMolPerKg(base)) * neutralisationJPerMol, {});
}

/** The gas an acid drives out of a salt. */
export function gasByAcid(store: Store, salt: StoredPortion, acid: StoredPortion): HazardNumbers {
  const hydrogen = replaceableMolPerKg(acid);
  const freed = saltGas(salt);
  if (hydrogen === null || freed === null) return {};
  const mol = freed.molPerKg * salt.massShare;
  return numbersOf(store, null, { [freed.gas]: Math.min(mol, hydrogen / freed.hydrogenPerGas) });
}

function saltGas(
  salt: StoredPortion,
): { readonly gas: string; readonly molPerKg: number; readonly hydrogenPerGas: number } | null {
  const carbon = salt.molPerKg.get('C') ?? 0;
  const sulphur = salt.molPerKg.get('S') ?? 0;
  if (isIn(salt, 'cyanide')) return { gas: 'HCN', molPerKg: carbon, hydrogenPerGas: 1 };
  if (isIn(salt, 'carbonate')) {
    const isHydrogenCarbonate = (salt.formula?.text ?? '').includes('HCO3');
    return { gas: 'CO2', molPerKg: carbon, hydrogenPerGas: isHydrogenCarbonate ? 1 : 2 };
  }
  if (sulphur === 0) return null;
  return { gas: isIn(salt, 'sulphide') ? 'H2S' : 'SO2', molPerKg: sulphur, hydrogenPerGas: 2 };
}

/** Ammonia that caustic drives out of its salt. */
export function ammoniaByCaustic(store: Store, salt: StoredPortion, caustic: StoredPortion): HazardNumbers {
  const ions = (salt.formula?.text.match(/NH4/g)?.length ?? 0) * (/\(NH4\)2/.test(salt.formula?.text ?? '') ? 2 : 1);
  const mol = (molPerKg(salt) ?? 0) * ions;
  return numbersOf(store, null, { NH3: Math.min(mol, causticMolPerKg(caustic)) });
}

/** Caustic and an ester or fat; two oxygen atoms make an ester group. */
export function saponification(store: Store, ester: StoredPortion, caustic: StoredPortion): HazardNumbers {
  const extent = Math.min(esterMolPerKg(ester), causticMolPerKg(caustic));
  return numbersOf(store, extent * saponificationJPerMol, {});
}

export function esterMolPerKg(portion: StoredPortion): number {
  return (portion.massShare * (portion.molPerKg.get('O') ?? 0)) / 2;
}

/** Fuel and oxidiser by the oxygen they can pass on, in mol O2 per kg of the blend. */
export function burningTogether(store: Store, neededMolPerKg: number, offeredMolPerKg: number): HazardNumbers {
  return numbersOf(store, Math.min(neededMolPerKg, offeredMolPerKg) * thorntonJPerMol, {});
}

/** Hydroxide (or what makes it) per kg of the blend: each alkali atom one, each alkaline earth two, an amine one. */
export function causticMolPerKg(portion: StoredPortion): number {
  if (isIn(portion, 'amine', 'ammonia')) return portion.massShare * (portion.molPerKg.get('N') ?? 0);
  let sum = 0;
  for (const metal of alkaliMetals) sum += portion.molPerKg.get(metal) ?? 0;
  for (const metal of ['Mg', 'Ca']) sum += 2 * (portion.molPerKg.get(metal) ?? 0);
  return portion.massShare * sum;
}

/** mol of hydrogen per kg of the blend that a metal can take from it; null where its molecule is not known. */
export function replaceableMolPerKg(donor: StoredPortion): number | null {
  const mol = molPerKg(donor);
  const { formula } = donor;
  // A mixture or polymer: no more hydroxyl than oxygen.
  if (formula === null || mol === null) return donor.massShare * (donor.molPerKg.get('O') ?? 0);
  if (isIn(donor, 'mineral-acid')) return mol * (formula.composition.get('H') ?? 0);
  if (isIn(donor, 'organic-acid')) return mol * Math.max(1, groups(formula.text, /OOH/g));
  if (isIn(donor, 'alcohol')) return mol * Math.max(1, groups(formula.text, /OH/g));
  return mol;
}

/** How often a group stands in a condensed formula, those in brackets as often as the bracket. */
function groups(text: string, group: RegExp): number {
  let count = 0;
  const open = text.replace(/\(([^()]*)\)(\d*)/g, (_, inner: string, times: string) => {
    count += (inner.match(group)?.length ?? 0) * Number(times || 1);
    return ' ';
  });
  return count + (open.match(group)?.length ?? 0);
}
