// What atoms alone prove of a substance that nothing is recorded of: metal that is all but pure is that metal, whatever it is
// called; carbon with halogen is a halogenated solvent; carbon and hydrogen alone are a hydrocarbon. And what the classes
// that a user gives a substance of his own say of how it reacts.
// Knows no names. Invariant: it adds to what is recorded of the catalogue's only where no family is; it never takes anything
// away, and what it cannot prove stays unknown.

import { findSubstance } from '../substance/catalogue.ts';
import { alkaliMetals, atomicWeightKgPerMol } from '../substance/elements.ts';
import { nothingRecorded } from '../substance/hazards.ts';
import type { Hazards } from '../substance/hazards.ts';

/** Share by mass from which a technical metal counts as the metal itself. */
const nearlyPure = 0.9;
/** Halogen atoms per carbon atom from which it counts as halogenated. */
const leastHalogenPerCarbon = 0.1;

/** Recorded hazards, or else those the composition (mol of each element per kg) proves. */
export function hazardsOrProven(recorded: Hazards | null, molPerKg: ReadonlyMap<string, number>): Hazards {
  if (recorded !== null && recorded.families.length > 0) return recorded;
  const proven = provenBy(molPerKg);
  if (recorded === null) return proven;
  return { ...proven, ...recorded, families: proven.families, withWater: proven.withWater };
}

/**
 * Hazards of a user's own substance: what its author says of it, what its classes say in turn (H260 is a reaction with
 * water, H250 fire in air, H272 an oxidiser), and what its atoms prove besides.
 */
export function hazardsOfOwn(said: Hazards | null, molPerKg: ReadonlyMap<string, number>): Hazards {
  const proven = provenBy(molPerKg);
  if (said === null) return proven;
  const bearing = (...statements: readonly string[]) =>
    said.classes.find(({ statement }) => statements.includes(statement));
  const families = new Set([...said.families, ...proven.families]);
  if (bearing('H270', 'H271', 'H272')) families.add('oxidiser');
  if (bearing('H220', 'H221')) families.add('fuel-gas');
  if (bearing(...unstableStatements)) families.add('unstable');
  const withWater = said.withWater.length > 0 ? said.withWater : proven.withWater;
  const wet = bearing('H260', 'H261');
  const inAir = bearing('H250');
  const pyrophoric = said.pyrophoric ?? (inAir && { source: inAir.source }) ?? proven.pyrophoric;
  return {
    ...proven,
    ...said,
    families: [...families],
    // Which gas is not said, but that it burns is.
    withWater:
      withWater.length === 0 && wet ? [{ gases: gasOf(molPerKg), pace: 'violent', source: wet.source }] : withWater,
    ...(pyrophoric && { pyrophoric }),
  };
}

const unstableStatements = ['H200', 'H201', 'H202', 'H203', 'H204', 'H230', 'H231', 'H240', 'H241', 'H242'];

/** Hydrogen, where there is nothing that could make a carbon, nitrogen, phosphorus or sulphur gas of it. */
function gasOf(molPerKg: ReadonlyMap<string, number>): readonly string[] {
  return ['C', 'N', 'P', 'S', 'Si'].some((symbol) => molPerKg.has(symbol)) ? [] : ['H2'];
}

function provenBy(molPerKg: ReadonlyMap<string, number>): Hazards {
  const shares = [...molPerKg].map(([symbol, mol]) => [symbol, mol * (atomicWeightKgPerMol(symbol) ?? 0)] as const);
  const alkali = shares.reduce((sum, [symbol, share]) => sum + (isAlkali(symbol) ? share : 0), 0);
  const [most] = [...shares].sort((a, b) => b[1] - a[1]);
  if (most && (alkali >= nearlyPure || most[1] >= nearlyPure)) {
    const element = findSubstance(most[0])?.hazards;
    if (element) return { ...element, transport: [], exposure: [] };
  }
  const mol = (symbol: string): number => molPerKg.get(symbol) ?? 0;
  const halogen = mol('Cl') + mol('Br') + mol('I') + mol('F');
  if (mol('C') > 0 && halogen >= leastHalogenPerCarbon * mol('C')) {
    return { ...nothingRecorded, families: ['halogenated-solvent'] };
  }
  const isHydrocarbon = mol('C') > 0 && mol('H') > 0 && molPerKg.size === 2;
  return isHydrocarbon ? { ...nothingRecorded, families: ['hydrocarbon'] } : nothingRecorded;
}

function isAlkali(symbol: string): boolean {
  return alkaliMetals.includes(symbol);
}
