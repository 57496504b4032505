// The schema of the records in data/substances/, run by the tests and by whoever adds a record; never part of a bundle.
// It checks shape and closed sums; names that must be unique and sources that must exist are checked across files by the tests.
// Keep it equal to record.ts: the compiler refuses a schema whose result is not a SubstanceRecord.

import * as z from 'zod';
import type { SourceRecord, SubstanceRecord } from './record.ts';

const name = z.string().regex(/^[a-z][a-z0-9]*(_[a-z0-9]+)*$/);
const sourced = { source: z.string().min(1), uncertainty: z.number().positive().exactOptional() };
const positive = z.number().positive();
const celsius = z.number().min(-273.15);
const day = z.iso.date();
const temperature = z.strictObject({ celsius, ...sourced });

const density = z
  .strictObject({
    kgPerM3: positive,
    temperatureK: positive,
    points: z
      .array(z.tuple([positive, positive]))
      .min(1)
      .exactOptional(),
    expansionPerK: positive.max(0.01).exactOptional(),
    expansionSource: z.string().min(1).exactOptional(),
    ...sourced,
  })
  .refine(
    (given) => given.points === undefined || given.expansionPerK === undefined,
    'points or an expansion, not both',
  );

const heatCapacity = z.union([
  z.strictObject({ kJPerKgK: positive, ...sourced }),
  z.strictObject({ jPerMolK: positive, ...sourced }),
  z
    .strictObject({
      jPerMolKTerms: z.record(z.string().regex(/^-?[0-9](\.5)?$/), z.number()),
      fromK: positive,
      toK: positive,
      ...sourced,
    })
    .refine((given) => given.fromK < given.toK, 'fromK below toK'),
]);

const phaseRecord = z.strictObject({
  phase: z.enum(['g', 'l', 'cr', 'aq']),
  stable: z.boolean().exactOptional(),
  aliases: z.array(name).exactOptional(),
  formationEnthalpy: z.strictObject({ kJPerMol: z.number(), ...sourced }).exactOptional(),
  entropy: z.strictObject({ jPerMolK: z.number(), ...sourced }).exactOptional(),
  heatingValue: z.strictObject({ basis: z.enum(['lower', 'higher']), mJPerKg: positive, ...sourced }).exactOptional(),
  density: density.exactOptional(),
  heatCapacity: heatCapacity.exactOptional(),
});

const ruleRecord = z.strictObject({
  source: z.string().min(1),
  rule: z.string().min(1),
  version: z.string().min(1),
  fuel: z.string().min(1),
  inForceFrom: day,
  seenOn: day,
  lowerHeatingValueMJPerKg: positive.exactOptional(),
  carbonContent: positive.max(1).exactOptional(),
  carbonDioxideFactor: z.number().nonnegative().exactOptional(),
});

const flammableLimits = z.strictObject({
  lowerPercent: positive.max(100),
  upperPercent: positive.max(100).exactOptional(),
  celsius: celsius.exactOptional(),
  ...sourced,
});

const shares = z
  .record(z.string(), z.number().nonnegative())
  .refine(
    (all) => Math.abs(Object.values(all).reduce((sum, share) => sum + share, 0) - 1) < 1e-9,
    'shares must add up to 1',
  );

/** One substance. */
export const substanceRecordSchema: z.ZodType<SubstanceRecord> = z
  .strictObject({
    name,
    aliases: z.array(name).exactOptional(),
    formula: z.string().exactOptional(),
    compositionByMass: shares.exactOptional(),
    mixtureByMole: shares.exactOptional(),
    compositionSource: z.string().exactOptional(),
    phases: z.array(phaseRecord).min(1),
    meltingPoint: temperature.exactOptional(),
    boilingPoint: temperature.exactOptional(),
    sublimationPoint: temperature.exactOptional(),
    decompositionPoint: temperature.exactOptional(),
    flashPoint: z
      .strictObject({ celsius, cup: z.enum(['closed', 'open']).exactOptional(), ...sourced })
      .exactOptional(),
    autoignition: temperature.exactOptional(),
    flammableLimits: flammableLimits.exactOptional(),
    carbonOrigin: z.enum(['fossil', 'biogenic', 'mineral', 'air']).exactOptional(),
    carbonBiogenicShare: z.number().min(0).max(1).exactOptional(),
    rules: z.array(ruleRecord).exactOptional(),
    note: z.string().min(1).exactOptional(),
  })
  .refine(
    (record) =>
      [record.formula, record.compositionByMass, record.mixtureByMole].filter((part) => part !== undefined).length ===
      1,
    'exactly one of formula, compositionByMass and mixtureByMole',
  )
  .refine((record) => record.phases.filter((phase) => phase.stable === true).length === 1, 'exactly one stable phase')
  .refine(
    (record) => record.formula !== undefined || record.compositionSource !== undefined,
    'a composition that is no formula needs its source',
  );

/** One source. */
export const sourceRecordSchema: z.ZodType<SourceRecord> = z.strictObject({
  id: z.string().regex(/^[a-z0-9]+(-[a-z0-9]+)*$/),
  author: z.string().min(1),
  year: z.number().int(),
  title: z.string().min(1),
  where: z.string(),
  provenance: z.enum(['seen', 'from memory', 'common practice', 'estimate']),
});
