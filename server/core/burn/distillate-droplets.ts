// Boiling point and molar mass of technical fuels for the sake of their droplets alone, where no certificate gives them: a
// drop of a distillate boils over a hundred kelvin and more, and the middle of that stands for it.
// Knows no heating values and no densities. Invariant: what leaves coke behind (residual fuels) is not here, as its drops burn
// in two stages that no vapour law tells. A burn-out time goes with the latent heat through a logarithm: 20 K and a tenth of
// the molar mass move it by some per cent, far less than such times scatter.

export interface DistillateDroplet {
  readonly boilingK: number;
  readonly molarMassKgPerMol: number;
  readonly source: string;
}

const carbonNumbers =
  'typical of the trade: middle of the boiling range and of the carbon numbers in Committee on Toxicology, Permissible Exposure Levels for Selected Military Fuel Vapors (1996), after IARC 1989';

/** DF2: 160 to 360 °C, C11 to C20; at CH1.9. */
const gasOil: DistillateDroplet = { boilingK: 533, molarMassKgPerMol: 0.215, source: carbonNumbers };
/** DF1, essentially kerosene: 150 to 300 °C, C9 to C16. */
const kerosene: DistillateDroplet = { boilingK: 498, molarMassKgPerMol: 0.174, source: carbonNumbers };
/** Hydrotreated vegetable oil: C15 to C18 paraffins; methyl esters of C18 acids. */
const paraffins: DistillateDroplet = {
  boilingK: 555,
  molarMassKgPerMol: 0.226,
  source: 'typical of the trade, from memory',
};
const methylEsters: DistillateDroplet = {
  boilingK: 620,
  molarMassKgPerMol: 0.294,
  source: 'typical of the trade, from memory',
};

const byName: ReadonlyMap<string, DistillateDroplet> = new Map([
  ['gas_oil', gasOil],
  ['dmx', gasOil],
  ['dma', gasOil],
  ['dmz', gasOil],
  ['dmb', gasOil],
  ['kerosene', kerosene],
  ['renewable_diesel', paraffins],
  ['fame', methylEsters],
]);

/** Of a fuel of the catalogue by its name; undefined where nothing typical is known. */
export function distillateDroplet(name: string): DistillateDroplet | undefined {
  return byName.get(name);
}
