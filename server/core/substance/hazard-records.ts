// Gathers the hand-kept hazard records into one list and finds them by a substance's name; the only place that names the
// files. Does not check them: the tests run every record through hazard-schema.ts.
// Invariant: at most one record a substance.

import acidsAndGases from './data/hazards/acids-and-gases.json';
import alkaliSalts from './data/hazards/alkali-salts.json';
import fuelsAndSolvents from './data/hazards/fuels-and-solvents.json';
import hydrocarbons from './data/hazards/hydrocarbons.json';
import metalsAndHydrides from './data/hazards/metals-and-hydrides.json';
import oxidesAndMinerals from './data/hazards/oxides-and-minerals.json';
import oxygenates from './data/hazards/oxygenates.json';
import sources from './data/hazards/sources.json';
import type { HazardRecord, TransportRecord } from './hazard-record.ts';
import type { SourceRecord } from './record.ts';

// The compiler reads JSON strings as `string`; the schema test vouches for the closed lists.
export const hazardRecords = [
  ...acidsAndGases,
  ...hydrocarbons,
  ...oxygenates,
  ...fuelsAndSolvents,
  ...metalsAndHydrides,
  ...alkaliSalts,
  ...oxidesAndMinerals,
] as readonly unknown[] as readonly HazardRecord[];

export const hazardSourceRecords = sources as readonly unknown[] as readonly SourceRecord[];

/** The record of the substance of that name. */
export function hazardRecordOf(name: string): HazardRecord | undefined {
  byName ??= new Map(hazardRecords.map((record) => [record.name, record]));
  return byName.get(name);
}

/** What the dangerous goods list says of a number, where some substance here has it. */
export function transportRecordOf(unNumber: number): TransportRecord | undefined {
  byUnNumber ??= new Map(
    hazardRecords.flatMap(({ transport = [] }) => transport).map((entry) => [entry.unNumber, entry]),
  );
  return byUnNumber.get(unNumber);
}

let byUnNumber: ReadonlyMap<number, TransportRecord> | undefined;
let byName: ReadonlyMap<string, HazardRecord> | undefined;
