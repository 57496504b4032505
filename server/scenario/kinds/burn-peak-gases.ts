// NO and CO of a flame in the units emissions are told in: parts per million of the wet and of the dry gas, and a mass per
// cubic metre of dry gas, as it is and brought to 15 % of oxygen as for engines and gas turbines.
// Knows no kinetics: these are what equilibrium leaves if nothing reacts back. Invariant: a reference oxygen content is told
// of burning in air only, and not where the gas is nearly air.
// Source: Directive 2010/75/EU, annexes V and VI (from memory): dry gas at 273.15 K and 101.3 kPa, nitrogen oxides as NO2,
// brought to a reference by (21 − reference) / (21 − found), all in per cent by volume.

import type { BurnInput, MatterState } from '../../core/burn/burn.ts';
import { amountOf, dryGasMol, peakGases } from '../../core/burn/products.ts';
import { celsiusZeroK, molarGasConstantJPerMolK, standardAtmospherePa } from '../../core/quantity/constants.ts';
import { molarMassKgPerMol, parseFormula } from '../../core/substance/formula.ts';
import type { Column, Table } from '../scenario.ts';

type Row = Table['rows'][number];

export const peakGasColumns: readonly Column[] = [
  { id: 'wet-concentration', label: 'wet', unit: 'ppm' },
  { id: 'dry-concentration', label: 'dry', unit: 'ppm' },
  { id: 'mass-concentration', label: 'dry, as it is', unit: 'mg/m3' },
  { id: 'reference-mass-concentration', label: 'dry, at 15 % O2', unit: 'mg/m3' },
  { id: 'told-as', label: 'mass of', unit: null },
];

/** What stands for what in a mass concentration. */
const toldAs = [
  ['NO(g)', 'NO2'],
  ['CO(g)', 'CO'],
] as const;

const referenceOxygenShare = 0.15;
const airOxygenShare = 0.21;

export function peakGasRows(state: MatterState, input: BurnInput): readonly Row[] {
  const gases = peakGases(state);
  const dryMol = dryGasMol(state);
  const oxygenShare = dryMol > 0 ? amountOf(state, 'O2(g)') / dryMol : null;
  const toReference =
    oxygenShare !== null && oxygenShare < mostOxygenShare && isAir(input)
      ? (airOxygenShare - referenceOxygenShare) / (airOxygenShare - oxygenShare)
      : null;
  return toldAs.flatMap(([id, as]): Row[] => {
    const gas = gases.find((one) => one.id === id);
    if (!gas) return [];
    const { wetMoleShare, dryMoleShare } = gas;
    const mgPerM3 = dryMoleShare === null ? null : dryMoleShare * 1e6 * kgPerM3(as);
    return [
      [
        id,
        wetMoleShare * 1e6,
        dryMoleShare === null ? null : dryMoleShare * 1e6,
        mgPerM3,
        mgPerM3 === null || toReference === null ? null : mgPerM3 * toReference,
        as,
      ],
    ];
  });
}

/** Nearer to air than this, what is left of the difference is noise. */
const mostOxygenShare = 0.2;

/** Of the pure gas where the cubic metre is counted: 0 °C and 1 atm. */
function kgPerM3(text: string): number {
  const formula = parseFormula(text);
  const kgPerMol = (formula.kind === 'formula' ? molarMassKgPerMol(formula) : undefined) ?? Number.NaN;
  return (kgPerMol * standardAtmospherePa) / (molarGasConstantJPerMolK * celsiusZeroK);
}

/** Oxygen and nitrogen as in air, whatever vapour is with them: water's own oxygen is taken off. */
function isAir({ oxidant: { elementMolPerKg } }: BurnInput): boolean {
  const atoms = (symbol: string): number => elementMolPerKg.get(symbol) ?? 0;
  const oxygen = (atoms('O') - atoms('H') / 2 - 2 * atoms('C')) / 2;
  const share = oxygen / (oxygen + atoms('N') / 2);
  return share > 0.19 && share < 0.23;
}
