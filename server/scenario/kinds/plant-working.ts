// How a figure of a gas turbine or a steam plant came about: what went in with the lines it comes from, the losses beside an
// efficiency, the state points, and what was assumed. Put together when somebody asks. Knows no sentences and no machine: what
// is its own is handed in. Invariant: the places are made with the definition, since an answer's places are gathered then.

import type { Quantity } from '../../core/quantity/quantity.ts';
import { quantityOf } from '../../core/quantity/quantity.ts';
import type { FigureRow } from '../material-figures.ts';
import type { Place } from '../place.ts';
import type { AssumptionId, Working, WorkingInput } from '../working.ts';
import { engineEntries, type EngineKey } from './engine-entries.ts';
import type { EntryPlaces } from './engine-cycle-working.ts';
import type { PlantStreams } from './plant-question.ts';
import type { PlantLoss } from './plant-tables.ts';

/** A state point as a working shows it. */
export interface WorkingPoint {
  readonly name: string;
  readonly temperature: Quantity;
  readonly pressure: Quantity;
}

export interface PlantWorkingParts {
  readonly streams: PlantStreams;
  /** Quantities by the keys of the entries they are written in. */
  readonly own: Readonly<Partial<Record<string, Quantity | null>>>;
  readonly places: EntryPlaces;
  readonly points: readonly WorkingPoint[];
  readonly losses: readonly PlantLoss[];
  readonly more: readonly WorkingInput[];
  readonly sources: readonly string[];
  readonly assumptions: readonly AssumptionId[];
}

const tables =
  'NIST-JANAF Thermochemical Tables, 4th edition (Chase 1998), fitted: enthalpies and entropies of all gases';

/** The working of one figure. */
export function plantWorking(row: FigureRow, parts: PlantWorkingParts): Working {
  const { streams, own, places, points, losses, more, sources, assumptions } = parts;
  const input = (label: string, quantity: Quantity | null, unit: string, place?: Place): WorkingInput[] =>
    quantity ? [{ label, quantity, unit, ...(place ? { place } : {}) }] : [];
  const { material, fuel, lowerHeatingValue, oxidantStream } = streams;
  const written = Object.entries(own).flatMap(([key, quantity]) => {
    const entry = key in engineEntries ? engineEntries[key as EngineKey] : null;
    return entry && quantity
      ? input(sentence(entry.name), quantity, entry.reader.unit ?? '1', places[key as EngineKey])
      : [];
  });
  const isOfEnergy = row.id.endsWith('efficiency') || row.id.endsWith('consumption');
  return {
    method: row.method,
    inputs: [
      ...input(`Enthalpy of ${material.name}, per kg`, fuel.enthalpy, 'MJ/kg', places.fuel),
      ...input(`Lower heating value of ${material.name}`, lowerHeatingValue, 'MJ/kg', places.fuel),
      ...input(`Temperature of ${streams.oxidant.name}`, oxidantStream.temperature, 'degC', places.oxidant),
      ...written,
      ...points.flatMap(({ name, temperature, pressure }) => [
        ...input(`Temperature at ${name}`, temperature, 'degC'),
        ...input(`Pressure at ${name}`, pressure, 'bar'),
      ]),
      ...(isOfEnergy
        ? losses.flatMap(({ id, share }) =>
            input(`Of the heating value: ${id.replaceAll('-', ' ')}`, quantityOf(share), '%'),
          )
        : []),
      ...more,
    ],
    sources: [...new Set([...fuel.sources, ...oxidantStream.sources, tables, ...sources])],
    assumptions,
  };
}

function sentence(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
