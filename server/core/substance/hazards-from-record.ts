// Turns a hand-kept hazard record into the run-time hazards of its substance: per cent, ppm and mg/m³ to SI, source ids to
// sources. Knows no lookup: a source it asks of the caller.
// Invariant: a record that passes the schema loses nothing here.

import { readGhsClass } from './ghs.ts';
import type { ExposureRecord, HazardRecord, TransportRecord } from './hazard-record.ts';
import type { ExposureLimit, HazardClass, Hazards, TransportEntry } from './hazards.ts';
import type { SourceRecord } from './record.ts';

export function hazardsOfRecord(record: HazardRecord, sourceOf: (id: string) => SourceRecord): Hazards {
  const { families = [], classes = [], transport = [], withWater = [], pyrophoric, exposure = [] } = record;
  const { limitingOxygen = [], extinguishing } = record;
  return {
    families,
    classes: classes.flatMap(({ all, form, source }) =>
      all.flatMap((text): HazardClass[] => {
        const read = readGhsClass(text);
        if (read === undefined) return [];
        const { hazardClass, category, statement } = read;
        return [{ hazardClass, category, statement, ...(form && { form }), source: sourceOf(source) }];
      }),
    ),
    transport: transport.map((entry) => transportOf(entry, sourceOf)),
    withWater: withWater.map((reaction) => ({ ...reaction, source: sourceOf(reaction.source) })),
    ...(pyrophoric && { pyrophoric: { ...pyrophoric, source: sourceOf(pyrophoric.source) } }),
    limitingOxygen: limitingOxygen.map(({ inert, percent, source }) => ({
      inert,
      moleFraction: percent / 100,
      source: sourceOf(source),
    })),
    exposure: exposure.map((limit) => exposureOf(limit, sourceOf)),
    ...(extinguishing && { extinguishing: { ...extinguishing, source: sourceOf(extinguishing.source) } }),
  };
}

function transportOf(entry: TransportRecord, sourceOf: (id: string) => SourceRecord): TransportEntry {
  const { massPercent, subsidiary = [], source, ...others } = entry;
  const [from, to] = massPercent ?? [];
  return {
    ...others,
    subsidiary,
    ...(from !== undefined && { massFraction: { from: from / 100, ...(to !== undefined && { to: to / 100 }) } }),
    source: sourceOf(source),
  };
}

function exposureOf(limit: ExposureRecord, sourceOf: (id: string) => SourceRecord): ExposureLimit {
  const { ppm, mgPerM3, source, ...others } = limit;
  return {
    ...others,
    ...(ppm !== undefined && { moleFraction: ppm * 1e-6 }),
    ...(mgPerM3 !== undefined && { kgPerM3: mgPerM3 * 1e-6 }),
    source: sourceOf(source),
  };
}
