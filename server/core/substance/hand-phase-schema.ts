// The schema of the records in data/phases-by-hand/, run by the tests and by whoever adds a phase; never part of a bundle.
// It checks shape and closed sums; ids, sources and laws across files are checked by the tests.
// Keep it equal to hand-phase.ts: the compiler refuses a schema whose result is not a HandPhaseRecord.

import * as z from 'zod';
import type { HandPhaseRecord } from './hand-phase.ts';

const positive = z.number().positive();
const source = z.string().min(1);
const amounts = z.record(z.string(), positive);

/** One phase kept by hand. */
export const handPhaseSchema: z.ZodType<HandPhaseRecord> = z
  .strictObject({
    id: z.string().min(1),
    label: z.string().min(1),
    formula: z.string().min(1),
    phase: z.enum(['g', 'l', 'cr', 'aq']),
    form: z.string().min(1).exactOptional(),
    formationEnthalpy: z.strictObject({ kJPerMol: z.number(), source }).exactOptional(),
    entropy: z.strictObject({ jPerMolK: positive, source }).exactOptional(),
    meltsFrom: z.strictObject({ phase: z.string(), atK: positive, kJPerMol: positive, source }).exactOptional(),
    heatCapacity: z
      .array(
        z.strictObject({
          jPerMolKTerms: z.record(z.string().regex(/^(-[12]|[0-4])$/), z.number()),
          fromK: positive,
          toK: positive,
          source,
        }),
      )
      .min(1)
      .refine(
        (ranges) => ranges.every(({ fromK, toK }, k) => fromK < toK && (k === 0 || ranges[k - 1]?.toK === fromK)),
        'ranges that follow one another',
      ),
    extended: z.strictObject({ toK: positive, because: z.string().min(1) }).exactOptional(),
    limit: z
      .strictObject({
        atK: positive,
        event: z.enum(['melts', 'melts incongruently', 'decomposes', 'sublimes', 'changes form']),
        products: amounts.exactOptional(),
        byEquilibrium: z.literal(true).exactOptional(),
        into: amounts.exactOptional(),
        source,
      })
      .exactOptional(),
    slow: z.literal(true).exactOptional(),
    note: z.string().min(1).exactOptional(),
  })
  .refine(
    ({ formationEnthalpy, entropy, meltsFrom }) =>
      meltsFrom === undefined ? formationEnthalpy !== undefined && entropy !== undefined : entropy === undefined,
    'either enthalpy and entropy at 298.15 K, or the crystal it melts from',
  );
