// How the figures of a sea came about: which of its entries each method takes, the sources of its constants, and what is
// assumed. Holds no sentences; wording/ turns the ids into text. Invariant: an entry that is written is named by its words.

import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf } from '../../core/quantity/quantity.ts';
import type { Context } from '../context.ts';
import type { AssumptionId, MethodId, Working, WorkingInput } from '../working.ts';
import { seaEntries } from './sea-entries.ts';
import type { SeaRead } from './sea-facts.ts';
import type { SeaNeed } from './sea-figures.ts';
import type { SeaKey, SeaQuestion } from './sea-question.ts';

interface Row {
  readonly method: MethodId;
  readonly needs: SeaNeed;
}

const guide =
  'Guide to best practices for ocean CO2 measurements, PICES Special Publication 3 (2007): equations and total concentrations';
const carbonic = 'Lueker et al. 2000: K1 and K2 of carbonic acid';
const uncertainty = 'Orr et al. 2018: standard uncertainties of the constants';
const density = 'Unesco technical papers in marine science 36 (1981): equation of state of sea water';
const pressure = 'Saunders 1981: pressure by depth, at a latitude of 45 degrees';
const pressed = 'Millero 1995, with its errata: constants under pressure';
const solids = 'Mucci 1983: solubility of calcite and aragonite';
const wind = 'Wanninkhof 2014: gas exchange by wind, its uncertainty, and Schmidt numbers';
const uptake =
  'Schulz, Bach and Dickson 2023: uptake by alkalinity; published as 0.84 mol/mol in the mean of the ocean';
const times = 'Ringham et al. 2024: settling in weeks to months, measured';

/** The working of each row. */
export function seaWorking(question: SeaQuestion, read: SeaRead, context: Context): (row: Row) => Working {
  const inputs = inputsOf(question, read, context);
  const isDeep = question.inputs.has('depth');
  const boron = question.boron === 'lee' ? 'Lee et al. 2010: boron per salinity' : 'Uppström 1974: boron per salinity';
  return ({ method, needs }) => {
    const keys = keysOf(needs);
    const own = inputs.filter(({ key }) => keys.includes(key)).map(({ input }) => input);
    const deep = isDeep ? [pressure, ...(needs === 'water' ? [] : [pressed])] : [];
    if (needs === 'water') {
      return { method, inputs: own, sources: method === 'sea-density' ? [density, ...deep] : deep, assumptions: [] };
    }
    const constants = method === 'effluent-sums' ? [] : [guide, carbonic, boron, uncertainty];
    const more = moreSources(method, needs);
    return {
      method,
      inputs: own,
      sources: [...constants, ...deep, ...more],
      assumptions: assumptionsOf(method, question),
    };
  };
}

function moreSources(method: MethodId, needs: SeaNeed): readonly string[] {
  if (method === 'saturation-state') return [solids];
  if (method === 'uptake-efficiency' || method === 'equilibrium-uptake') return [uptake, times];
  return needs === 'layer' || needs === 'residence' ? [wind, times] : [];
}

const waterKeys: readonly SeaKey[] = ['salinity', 'temperature', 'depth'];
const stateKeys: readonly SeaKey[] = [...waterKeys, 'phosphate', 'silicate', 'first', 'second'];
const effluentKeys: readonly SeaKey[] = ['hydroxide', 'carbonate', 'hydrogen-carbonate', 'acid'];

function keysOf(needs: SeaNeed): readonly SeaKey[] {
  switch (needs) {
    case 'water':
      return waterKeys;
    case 'state':
      return stateKeys;
    case 'effluent':
      return [...stateKeys, ...effluentKeys];
    case 'near-field':
      return [...stateKeys, ...effluentKeys, 'dilution'];
    case 'layer':
      return [...stateKeys, 'mixed-layer', 'wind'];
    case 'residence':
      return [...stateKeys, 'mixed-layer', 'wind', 'residence'];
  }
}

function assumptionsOf(method: MethodId, { inputs }: SeaQuestion): readonly AssumptionId[] {
  const nutrients: readonly AssumptionId[] = inputs.has('phosphate') || inputs.has('silicate') ? [] : ['no-nutrients'];
  const scale: readonly AssumptionId[] = ['total-ph-scale', 'surface-fugacity', ...nutrients];
  switch (method) {
    case 'effluent-sums':
      return [];
    case 'uptake-efficiency':
      return [...scale, 'air-held', 'carbon-once', 'nothing-precipitates'];
    case 'equilibrium-uptake':
      return [...scale, 'air-held', 'carbon-once', 'nothing-precipitates', 'effluent-water'];
    case 'near-field-mixing':
      return [...scale, 'effluent-water', 'no-gas-yet', 'nothing-precipitates'];
    case 'equilibration-time':
    case 'mixed-layer-share':
      return [...scale, 'even-layer'];
    default:
      return scale;
  }
}

function inputsOf(
  { inputs, known }: SeaQuestion,
  read: SeaRead,
  context: Context,
): readonly { readonly key: SeaKey; readonly input: WorkingInput }[] {
  const rows: { key: SeaKey; input: WorkingInput }[] = [];
  const put = (key: SeaKey, entry: keyof typeof seaEntries, unit: string, label = seaEntries[entry].name): void => {
    const quantity = inputs.get(key);
    const written = read[entry];
    if (!quantity || !written) return;
    const place = context.place(written.entry.span);
    rows.push({ key, input: { label: titled(label), quantity, unit, place } });
  };
  put('salinity', 'practicalSalinity', '1');
  put('temperature', 'temperature', 'degC');
  put('depth', 'depth', 'm');
  if (!inputs.has('depth')) {
    const surface = quantityOf(0, knownUnit('m').dimension);
    rows.push({ key: 'depth', input: { label: 'Depth', quantity: surface, unit: 'm' } });
  }
  put('phosphate', 'phosphate', 'umol/kg');
  put('silicate', 'silicate', 'umol/kg');
  if (known) {
    put('first', known[0].key, known[0].unit);
    put('second', known[1].key, known[1].unit);
  }
  for (const form of effluentKeys) put(form, 'effluent', 'mmol/kg', `effluent: ${form}`);
  put('dilution', 'nearFieldDilution', 'kg/kg');
  put('mixed-layer', 'mixedLayer', 'm');
  put('wind', 'wind', 'm/s');
  put('residence', 'mixedLayerResidence', 'd');
  return rows;
}

/** `pH` and `pCO2` stay as they are written. */
function titled(label: string): string {
  return /^p[HC]|^f[C]/.test(label) ? label : label.charAt(0).toUpperCase() + label.slice(1);
}
