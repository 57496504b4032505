// Gases that are stored as liquids near their boiling point: what boiling takes, and the liquid's heat capacity there.
// Knows no pressures: a liquid under its own pressure at 25 °C is another state. Invariant: a value holds from the boiling point
// at 1 atm down to `harmlessBelowK` under it, and nowhere else.
// Sources beside each; latent heats are those at the boiling point.

export interface LiquefiedGas {
  readonly latentJPerMol: number;
  readonly liquidJPerMolK: number;
  readonly source: string;
}

const felder = 'Felder and Rousseau, Elementary Principles of Chemical Processes, table B.1';

const gases: ReadonlyMap<string, LiquefiedGas> = new Map([
  // Latent heat seen in a transcription (23.351 kJ/mol at −33.43 °C); heat capacities, and what follows, from memory.
  ['ammonia', { latentJPerMol: 23351, liquidJPerMolK: 75.8, source: `${felder}; liquid heat capacity from memory` }],
  ['propane', { latentJPerMol: 18770, liquidJPerMolK: 98.4, source: `${felder}, from memory` }],
  ['butane', { latentJPerMol: 22305, liquidJPerMolK: 132, source: `${felder}, from memory` }],
]);

/** So far below the boiling point one heat capacity serves. */
export const harmlessBelowK = 40;

/** Of a substance of the catalogue by its name; undefined where that is not known. */
export function liquefiedGas(name: string): LiquefiedGas | undefined {
  return gases.get(name);
}
