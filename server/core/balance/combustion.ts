// The products of complete oxidation at 25 °C, element by element: the slate on which heating values rest.
// Knows no energies. Invariant: fuel plus the oxygen demanded holds the same atoms as the products, to rounding.
// The rule: halogens, sulphur and the fuel's own carbon take alkali first, in the order chloride, fluoride, sulphate,
// carbonate; then boron, aluminium and silicon take alkali as metaborate, aluminate and metasilicate where the catalogue
// has the salt (LiAlO2 and NaAlO2 but no KAlO2; none for Rb and Cs); then hydroxide, then oxide. Where several alkali
// metals compete for too little of a partner, each gets of it in proportion to its amount still free.

import { alkaliMetals } from '../substance/elements.ts';
import { parseFormula } from '../substance/formula.ts';
import type { Formula } from '../substance/formula.ts';
import { findSubstance } from '../substance/catalogue.ts';

/**
 * `as-ruled` is the whole rule. `hydroxide` skips carbonate and the mixed oxides, so that alkali left after halides and
 * sulphate ends as hydroxide as far as hydrogen reaches; `oxide` skips hydroxide too.
 */
export type SlateRule = 'as-ruled' | 'hydroxide' | 'oxide';

/** A product and its amount in mol per kg of fuel. */
export interface Product {
  /** With its phase; water is listed as vapour. */
  readonly formula: Formula;
  /** `Na2CO3(cr)` */
  readonly species: string;
  readonly molPerKg: number;
}

export interface Slate {
  readonly kind: 'slate';
  readonly rule: SlateRule | 'given';
  /** In the order of the rule (or as given), without zero amounts. */
  readonly products: readonly Product[];
  /** mol O2 per kg of fuel; negative when the fuel holds more oxygen than its products, and O2 is then a product. */
  readonly oxygenDemandMolPerKg: number;
}

/** No slate: the elements for which the rule names no product. */
export interface SlateFault {
  readonly kind: 'fault';
  readonly reason: 'no-ruled-product';
  readonly elements: readonly string[];
}

/**
 * The slate of a fuel given as mol of each element per kg. Nitrogen leaves as N2, noble gases as themselves, chlorine and
 * fluorine beyond the alkali as HF and HCl (as F2 and Cl2 beyond the hydrogen), phosphorus as P4O10, vanadium as V2O5.
 * Returns a fault with the elements that have no ruled product.
 */
export function completeCombustion(
  fuelMolPerKg: ReadonlyMap<string, number>,
  rule: SlateRule = 'as-ruled',
): Slate | SlateFault {
  const unruled = [...fuelMolPerKg].filter(([symbol, mol]) => mol > 0 && !ruledElements.has(symbol));
  if (unruled.length > 0)
    return { kind: 'fault', reason: 'no-ruled-product', elements: unruled.map(([symbol]) => symbol) };
  const account = new Account(fuelMolPerKg);
  account.bindAlkali('Cl', 1, (metal) => `${metal}Cl(cr)`);
  account.bindAlkali('F', 1, (metal) => `${metal}F(cr)`);
  account.bindAlkali('S', 2, (metal) => `${metal}2SO4(cr)`);
  if (rule === 'as-ruled') {
    account.bindAlkali('C', 2, (metal) => `${metal}2CO3(cr)`);
    account.bindAlkali('B', 1, (metal) => `${metal}BO2(cr)`);
    account.bindAlkali('Al', 1, (metal) => `${metal}AlO2(cr)`);
    account.bindAlkali('Si', 2, (metal) => `${metal}2SiO3(cr)`);
  }
  if (rule !== 'oxide') account.bindAlkali('H', 1, (metal) => `${metal}OH(cr)`);
  for (const metal of alkaliMetals) account.convert(metal, 2, `${metal}2O(cr)`);
  for (const [symbol, atoms, species] of oxides) account.convert(symbol, atoms, species);
  account.bindHydrogen('F', 'HF(g)');
  account.bindHydrogen('Cl', 'HCl(g)');
  account.convert('F', 2, 'F2(g)');
  account.convert('Cl', 2, 'Cl2(g)');
  account.convert('C', 1, 'CO2(g)');
  account.convert('S', 1, 'SO2(g)');
  account.convert('H', 2, 'H2O(g)');
  account.convert('N', 2, 'N2(g)');
  for (const symbol of nobleGases) account.convert(symbol, 1, `${symbol}(g)`);
  return slateOfProducts(fuelMolPerKg, account.products, rule);
}

/** Completes a list of products to a slate: counts the oxygen they need beyond the fuel's own, and frees what is too much. */
export function slateOfProducts(
  fuelMolPerKg: ReadonlyMap<string, number>,
  products: readonly Product[],
  rule: Slate['rule'],
): Slate {
  const oxygenInProducts = products.reduce(
    (sum, product) => sum + product.molPerKg * (product.formula.composition.get('O') ?? 0),
    0,
  );
  const oxygenDemandMolPerKg = (oxygenInProducts - (fuelMolPerKg.get('O') ?? 0)) / 2;
  const surplus = -oxygenDemandMolPerKg;
  const withSurplus = surplus > negligibleMolPerKg ? [...products, productOf('O2(g)', surplus)] : products;
  return { kind: 'slate', rule, products: withSurplus, oxygenDemandMolPerKg };
}

/** Below this an amount is rounding: a nanogram of hydrogen in a kilogram. */
export const negligibleMolPerKg = 1e-9;

const nobleGases: readonly string[] = ['He', 'Ne', 'Ar', 'Kr', 'Xe'];

/** Element, its atoms in one formula, species: the oxides the rule names, and V2O5, which λ counts with. */
const oxides: readonly (readonly [string, number, string])[] = [
  ['Mg', 1, 'MgO(cr)'],
  ['Ca', 1, 'CaO(cr)'],
  ['Zn', 1, 'ZnO(cr)'],
  ['Al', 2, 'Al2O3(cr)'],
  ['B', 2, 'B2O3(cr)'],
  ['Si', 1, 'SiO2(cr)'],
  ['Fe', 2, 'Fe2O3(cr)'],
  ['Ti', 1, 'TiO2(cr)'],
  ['V', 2, 'V2O5(cr)'],
  ['P', 4, 'P4O10(cr)'],
];

const ruledElements: ReadonlySet<string> = new Set([
  ...['C', 'H', 'O', 'N', 'S', 'Cl', 'F'],
  ...alkaliMetals,
  ...nobleGases,
  ...oxides.map(([symbol]) => symbol),
]);

/** Atoms not yet in a product, and the products so far. */
class Account {
  readonly products: Product[] = [];
  private readonly free: Map<string, number>;

  constructor(fuelMolPerKg: ReadonlyMap<string, number>) {
    this.free = new Map(fuelMolPerKg);
  }

  /**
   * Binds free alkali to a partner, `alkaliPerPartner` atoms to one, as far as the scarcer of the two reaches; the metals
   * share in proportion to what is free of each. Metals whose salt the catalogue lacks take no part in mixed oxides.
   */
  bindAlkali(partner: string, alkaliPerPartner: number, speciesOf: (metal: string) => string): void {
    if (this.amount(partner) <= 0) return;
    const metals = alkaliMetals.filter((metal) => this.amount(metal) > 0 && hasData(partner, speciesOf(metal)));
    const alkali = metals.reduce((sum, metal) => sum + this.amount(metal), 0);
    if (alkali <= 0) return;
    const boundFraction = Math.min(1, (this.amount(partner) * alkaliPerPartner) / alkali);
    for (const metal of metals) {
      const bound = this.amount(metal) * boundFraction;
      this.take(metal, bound);
      this.take(partner, bound / alkaliPerPartner);
      // One salt formula holds one partner atom in every case of the rule.
      this.add(speciesOf(metal), bound / alkaliPerPartner);
    }
  }

  /** Turns all that is left of an element into a species that holds `atoms` of it. */
  convert(symbol: string, atoms: number, species: string): void {
    const amount = this.amount(symbol);
    if (amount <= 0) return;
    this.take(symbol, amount);
    this.add(species, amount / atoms);
  }

  bindHydrogen(halogen: string, species: string): void {
    const bound = Math.min(this.amount(halogen), this.amount('H'));
    this.take(halogen, bound);
    this.take('H', bound);
    this.add(species, bound);
  }

  private amount(symbol: string): number {
    return this.free.get(symbol) ?? 0;
  }

  private take(symbol: string, mol: number): void {
    this.free.set(symbol, Math.max(0, this.amount(symbol) - mol));
  }

  private add(species: string, molPerKg: number): void {
    if (molPerKg > negligibleMolPerKg) this.products.push(productOf(species, molPerKg));
  }
}

const mixedOxidePartners: ReadonlySet<string> = new Set(['B', 'Al', 'Si']);

/** Salts of the main chain are ruled whether or not their energy is known; mixed oxides only where data exist. */
function hasData(partner: string, species: string): boolean {
  return !mixedOxidePartners.has(partner) || findSubstance(species) !== undefined;
}

const formulas = new Map<string, Formula>();

function productOf(species: string, molPerKg: number): Product {
  return { formula: formulaOfSpecies(species), species, molPerKg };
}

/** The species here are written above, so they always parse; one that does not is a mistake in the rule, and throws. */
function formulaOfSpecies(species: string): Formula {
  const known = formulas.get(species);
  if (known !== undefined) return known;
  const formula = parseFormula(species);
  if (formula.kind !== 'formula') throw new Error(`The slate names ${species}, which is no formula.`);
  formulas.set(species, formula);
  return formula;
}
