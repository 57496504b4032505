// Whether a blend is acutely toxic by the classes of its portions: GHS categories 1 to 3 by mouth, skin or breath.
// Knows no exposure limit and no dose. Invariant: diluting with something harmless never makes a blend more toxic.
// Method: additivity of acute toxicity estimates, UN GHS 3.1.3.6, with the point estimates of table 3.1.2 for portions of
// which only the category is known. A gas dissolved in a liquid is left to that liquid's own classes.

import { isGas } from './store.ts';
import type { Store, StoredPortion } from './store.ts';

type Route = 'oral' | 'dermal' | 'gas' | 'vapour' | 'dust';

/** mg/kg, ppm for gases, mg/L for vapour and dust; by category 1 to 4. */
const pointEstimates: Readonly<Record<Route, readonly [number, number, number, number]>> = {
  oral: [0.5, 5, 100, 500],
  dermal: [5, 50, 300, 1100],
  gas: [10, 100, 700, 4500],
  vapour: [0.05, 0.5, 3, 11],
  dust: [0.005, 0.05, 0.5, 1.5],
};

/** The upper end of category 3 on each route. */
const endOfCategory3: Readonly<Record<Route, number>> = { oral: 300, dermal: 1000, gas: 2500, vapour: 10, dust: 1 };

const routes = Object.keys(pointEstimates) as Route[];

/** Indexes of the portions that make the blend toxic, the weightiest first; empty where it is not. */
export function toxicPortions(store: Store): readonly number[] {
  const found = new Map<number, number>();
  for (const route of routes) {
    // Parts per million of a gas are by volume.
    const shares = route === 'gas' ? moleShares(store) : null;
    const parts = store.portions.map(
      (portion, index) => (shares?.[index] ?? portion.massShare) / (estimateOf(portion, store, route) ?? Infinity),
    );
    const sum = parts.reduce((total, part) => total + part, 0);
    // A share written as 30 % is not quite 0.3.
    if (!(sum > 0) || 1 / sum > endOfCategory3[route] * (1 + 1e-9)) continue;
    parts.forEach((part, index) => {
      if (part > 0) found.set(index, Math.max(found.get(index) ?? 0, part / sum));
    });
  }
  return [...found].sort((a, b) => b[1] - a[1]).map(([index]) => index);
}

/** Null where a molar mass is missing. */
function moleShares(store: Store): readonly number[] | null {
  const mols: number[] = [];
  for (const { massShare, molarMassKgPerMol } of store.portions) {
    if (molarMassKgPerMol === null) return null;
    mols.push(massShare / molarMassKgPerMol);
  }
  const total = mols.reduce((sum, mol) => sum + mol, 0);
  return mols.map((mol) => mol / total);
}

function estimateOf(portion: StoredPortion, store: Store, route: Route): number | null {
  let least: number | null = null;
  for (const { hazardClass, category, statement, form } of portion.hazards.classes) {
    if (!hazardClass.startsWith('Acute Tox') || form === 'solution') continue;
    if (routeOf(statement, portion) !== route) continue;
    if (route === 'gas' && portion.phase === 'gas' && !isGas(store)) continue;
    const estimate = pointEstimates[route][Number(category) - 1];
    if (estimate !== undefined && (least === null || estimate < least)) least = estimate;
  }
  return least;
}

function routeOf(statement: string, { usualPhase }: StoredPortion): Route | null {
  if (/^H30[012]/.test(statement)) return 'oral';
  if (/^H31[012]/.test(statement)) return 'dermal';
  if (!/^H33[0-2]/.test(statement)) return null;
  return usualPhase === 'gas' ? 'gas' : usualPhase === 'liquid' ? 'vapour' : 'dust';
}
