// The figures of a sea: what each is called, how it is worked out, and its number in SI from a water worked out. Ids and units
// are the contract. Knows no uncertainty; that is propagated over `seaNumbers`. Invariant: NaN where there is no such figure.

import { revelleFactor, uptakePerAlkalinity } from '../../core/account/sea/buffering.ts';
import { uptakePerMole } from '../../core/account/sea/delivery.ts';
import { fugacityCoefficient } from '../../core/account/sea/fugacity.ts';
import { standardAtmospherePa } from '../../core/quantity/constants.ts';
import type { FigureRow } from '../material-figures.ts';
import type { SolvedSea } from './sea-question.ts';

/** What a figure cannot be had without, in words; `state` is the carbonate system, of which a finding speaks. */
export type SeaNeed = 'water' | 'state' | 'effluent' | 'near-field' | 'layer' | 'residence';

export const seaNeeds: Readonly<Record<SeaNeed, readonly string[] | null>> = {
  water: null,
  state: null,
  effluent: ['an effluent'],
  'near-field': ['an effluent and its near-field dilution'],
  layer: ['the depth of the mixed layer and the wind'],
  residence: ['the depth of the mixed layer, the wind and the mixed-layer residence'],
};

interface SeaFigureRow extends FigureRow {
  readonly needs: SeaNeed;
}

const carbonate = { method: 'carbonate-system', needs: 'state' } as const;
const mixed = { method: 'near-field-mixing', needs: 'near-field' } as const;

export const seaFigures = [
  { id: 'ph-total-scale', label: 'pH, total scale', unit: '1', ...carbonate },
  { id: 'total-alkalinity', label: 'Total alkalinity, per kg of sea water', unit: 'umol/kg', ...carbonate },
  {
    id: 'dissolved-inorganic-carbon',
    label: 'Dissolved inorganic carbon, per kg of sea water',
    unit: 'umol/kg',
    ...carbonate,
  },
  {
    id: 'carbon-dioxide-partial-pressure',
    label: 'Partial pressure of CO2, brought to the surface',
    unit: 'uatm',
    ...carbonate,
  },
  { id: 'carbon-dioxide-fugacity', label: 'Fugacity of CO2, brought to the surface', unit: 'uatm', ...carbonate },
  { id: 'dissolved-carbon-dioxide', label: 'Dissolved CO2, per kg of sea water', unit: 'umol/kg', ...carbonate },
  { id: 'hydrogen-carbonate', label: 'Hydrogen carbonate, per kg of sea water', unit: 'umol/kg', ...carbonate },
  { id: 'carbonate', label: 'Carbonate, per kg of sea water', unit: 'umol/kg', ...carbonate },
  {
    id: 'calcite-saturation',
    label: 'Calcite saturation state Ω, in situ',
    unit: '1',
    method: 'saturation-state',
    needs: 'state',
  },
  {
    id: 'aragonite-saturation',
    label: 'Aragonite saturation state Ω, in situ',
    unit: '1',
    method: 'saturation-state',
    needs: 'state',
  },
  { id: 'revelle-factor', label: 'Revelle factor', unit: '1', method: 'revelle-factor', needs: 'state' },
  {
    id: 'uptake-efficiency',
    label: 'CO2 uptake at equilibrium with the air, per mole of alkalinity added as hydroxide',
    unit: 'mol/mol',
    method: 'uptake-efficiency',
    needs: 'state',
  },
  {
    id: 'carbonate-uptake',
    label: 'CO2 uptake at equilibrium with the air, per mole of carbonate added',
    unit: 'mol/mol',
    method: 'uptake-efficiency',
    needs: 'state',
  },
  {
    id: 'hydrogen-carbonate-uptake',
    label: 'CO2 uptake at equilibrium with the air (below zero: release), per mole of hydrogen carbonate added',
    unit: 'mol/mol',
    method: 'uptake-efficiency',
    needs: 'state',
  },
  {
    id: 'effluent-alkalinity',
    label: 'Alkalinity delivered, per kg of effluent',
    unit: 'mmol/kg',
    method: 'effluent-sums',
    needs: 'effluent',
  },
  {
    id: 'effluent-carbon',
    label: 'Dissolved carbon delivered, per kg of effluent',
    unit: 'mmol/kg',
    method: 'effluent-sums',
    needs: 'effluent',
  },
  {
    id: 'effluent-uptake',
    label: 'CO2 uptake at equilibrium with the air (below zero: release), per kg of effluent, well diluted',
    unit: 'mmol/kg',
    method: 'uptake-efficiency',
    needs: 'effluent',
  },
  { id: 'near-field-ph', label: 'pH in the near field before gas exchange, total scale', unit: '1', ...mixed },
  { id: 'near-field-ph-change', label: 'Change of pH in the near field before gas exchange', unit: '1', ...mixed },
  {
    id: 'near-field-fugacity',
    label: 'Fugacity of CO2 in the near field before gas exchange',
    unit: 'uatm',
    ...mixed,
  },
  {
    id: 'near-field-aragonite-saturation',
    label: 'Aragonite saturation state Ω in the near field before gas exchange',
    unit: '1',
    ...mixed,
  },
  {
    id: 'near-field-uptake',
    label: 'CO2 uptake at equilibrium with the air (below zero: release), per kg of sea water in the near field',
    unit: 'umol/kg',
    method: 'equilibrium-uptake',
    needs: 'near-field',
  },
  {
    id: 'equilibrium-ph-change',
    label: 'Change of pH in the near field at equilibrium with the air',
    unit: '1',
    method: 'equilibrium-uptake',
    needs: 'near-field',
  },
  {
    id: 'equilibration-time',
    label: 'Equilibration time of the mixed layer with the air (e-folding)',
    unit: 'd',
    method: 'equilibration-time',
    needs: 'layer',
  },
  {
    id: 'mixed-layer-share',
    label: 'Share of the uptake reached before the water leaves the mixed layer',
    unit: '1',
    method: 'mixed-layer-share',
    needs: 'residence',
  },
  {
    id: 'density',
    label: 'Density of the sea water, in situ',
    unit: 'kg/m3',
    method: 'sea-density',
    needs: 'water',
  },
  {
    id: 'applied-pressure',
    label: 'Hydrostatic pressure, above that of the air',
    unit: 'bar',
    method: 'hydrostatic-pressure',
    needs: 'water',
  },
] as const satisfies readonly SeaFigureRow[];

export type SeaFigureId = (typeof seaFigures)[number]['id'];

const pascalPerBar = 1e5;

/** Every figure's number in SI; those that cannot be had are not there. */
export function seaNumbers(sea: SolvedSea): Readonly<Partial<Record<SeaFigureId, number>>> {
  const { state, effluent, nearField } = sea;
  const water = { density: sea.densityKgPerM3, 'applied-pressure': sea.pressureBar * pascalPerBar };
  const sums = effluent ? { 'effluent-alkalinity': effluent.alkalinity, 'effluent-carbon': effluent.carbon } : {};
  if (!state) return { ...water, ...sums };
  const fugacityPa = state.fugacityAtm * standardAtmospherePa;
  const perAlkalinity = uptakePerAlkalinity(state);
  return {
    ...water,
    ...sums,
    'ph-total-scale': state.ph,
    'total-alkalinity': state.totalAlkalinity,
    'dissolved-inorganic-carbon': state.dissolvedCarbon,
    'carbon-dioxide-partial-pressure': fugacityPa / fugacityCoefficient(sea.water.temperatureK),
    'carbon-dioxide-fugacity': fugacityPa,
    'dissolved-carbon-dioxide': state.carbonDioxide,
    'hydrogen-carbonate': state.hydrogenCarbonate,
    carbonate: state.carbonate,
    'calcite-saturation': state.calciteSaturation,
    'aragonite-saturation': state.aragoniteSaturation,
    'revelle-factor': revelleFactor(state),
    'uptake-efficiency': perAlkalinity,
    'carbonate-uptake': uptakePerMole(state, 'carbonate'),
    'hydrogen-carbonate-uptake': uptakePerMole(state, 'hydrogen-carbonate'),
    ...(effluent ? { 'effluent-uptake': perAlkalinity * effluent.alkalinity - effluent.carbon } : {}),
    ...(nearField
      ? {
          'near-field-ph': nearField.mixed.ph,
          'near-field-ph-change': nearField.mixed.ph - state.ph,
          'near-field-fugacity': nearField.mixed.fugacityAtm * standardAtmospherePa,
          'near-field-aragonite-saturation': nearField.mixed.aragoniteSaturation,
          'near-field-uptake': nearField.uptake,
          'equilibrium-ph-change': nearField.settled.ph - state.ph,
        }
      : {}),
    ...(sea.settlingS === null ? {} : { 'equilibration-time': sea.settlingS }),
    ...(sea.shareReached === null ? {} : { 'mixed-layer-share': sea.shareReached }),
  };
}
