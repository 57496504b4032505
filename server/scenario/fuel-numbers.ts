// What a kilogram of a fuel gives to a service: heating value, density, carbon dioxide, residue, alkali and water, each with
// its uncertainty, out of the material's figures and its slate of complete combustion. Knows no engine.
// Invariant: what a fuel does not have is 0; what is not known of it is NaN.

import { slateOfChoice } from '../core/balance/heating-value.ts';
import type { FuelNumbers } from '../core/service/service.ts';
import { alkaliMetals, atomicWeightKgPerMol } from '../core/substance/elements.ts';
import { molarMassKgPerMol } from '../core/substance/formula.ts';
import type { Material } from './material.ts';
import { figuresOfMaterial } from './material-figures.ts';
import type { QuantityList } from './quantity-list.ts';

/** Adds what is uncertain about a fuel to the list; gives its numbers for any values of that. */
export function fuelNumbers(fuel: Material, list: QuantityList): (values: readonly number[]) => FuelNumbers {
  const figures = figuresOfMaterial(fuel);
  const find = (id: string, otherwise = NaN): ReturnType<QuantityList['add']> =>
    list.add(figures.find((figure) => figure.id === id)?.quantity ?? null, otherwise);
  const heatingValue = find('lower-heating-value');
  const density = find('density');
  const carbon = find('carbon-factor', 0);
  const waterMade = find('water-made');
  const waterMissing = find('water-missing', 0);
  const residue = residueOf(fuel);
  return (values) => ({
    heatingValueJPerKg: heatingValue(values),
    densityKgPerM3: density(values),
    carbonDioxideKgPerKg: carbon(values),
    waterMadeKgPerKg: waterMade(values),
    waterMissingKgPerKg: waterMissing(values),
    ...residue,
  });
}

type Residue = Pick<FuelNumbers, 'heldCarbonDioxideKgPerKg' | 'alkaliSaltKgPerKg' | 'ashKgPerKg' | 'alkaliMolPerKg'>;

function residueOf(fuel: Material): Residue {
  const molPerKg = new Map([...fuel.elements].map(([symbol, { value }]) => [symbol, value]));
  const slate = slateOfChoice(molPerKg, fuel.products ? { products: fuel.products } : 'as-ruled');
  const alkaliMolPerKg = alkaliMetals.reduce((sum, metal) => sum + (molPerKg.get(metal) ?? 0), 0);
  if (slate.kind === 'fault') {
    return { heldCarbonDioxideKgPerKg: NaN, alkaliSaltKgPerKg: NaN, ashKgPerKg: NaN, alkaliMolPerKg };
  }
  const carbonDioxideKgPerMol = (atomicWeightKgPerMol('C') ?? NaN) + 2 * (atomicWeightKgPerMol('O') ?? NaN);
  let [held, salt, ash] = [0, 0, 0];
  for (const { formula, molPerKg: mol } of slate.products) {
    if (formula.phase === 'g') continue;
    const massKg = mol * (molarMassKgPerMol(formula) ?? NaN);
    if (alkaliMetals.some((metal) => formula.composition.has(metal))) salt += massKg;
    else ash += massKg;
    held += mol * (formula.composition.get('C') ?? 0) * carbonDioxideKgPerMol;
  }
  return { heldCarbonDioxideKgPerKg: held, alkaliSaltKgPerKg: salt, ashKgPerKg: ash, alkaliMolPerKg };
}
