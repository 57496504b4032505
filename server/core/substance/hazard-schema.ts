// The schema of the records in data/hazards/, run by the tests and by whoever adds a record; never part of a bundle.
// It checks shape, closed lists and GHS triples; names and sources across files are checked by the tests.
// Keep it equal to hazard-record.ts: the compiler refuses a schema whose result is not a HazardRecord.

import * as z from 'zod';
import { readGhsClass } from './ghs.ts';
import type { HazardRecord } from './hazard-record.ts';
import { exposureKinds, extinguishingAgents, hazardForms, limitAuthorities, reactiveFamilies } from './hazards.ts';

const source = z.string().min(1);
const positive = z.number().positive();
const form = z.enum(hazardForms).exactOptional();
const unique = <T>(all: readonly T[]): boolean => new Set(all).size === all.length;

const dangerClass = z.string().regex(/^(1\.[1-6][A-S]?|2\.[123]|3|4\.[123]|5\.[12]|6\.[12]|8|9)$/);

const transport = z.strictObject({
  unNumber: z.number().int().min(1).max(3999),
  properShippingName: z.string().min(1),
  dangerClass,
  subsidiary: z.array(dangerClass).min(1).exactOptional(),
  packingGroup: z.enum(['I', 'II', 'III']).exactOptional(),
  form,
  massPercent: z.union([z.tuple([positive]), z.tuple([positive, positive])]).exactOptional(),
  source,
});

const exposure = z
  .strictObject({
    authority: z.enum(limitAuthorities),
    kind: z.enum(exposureKinds),
    ppm: positive.exactOptional(),
    mgPerM3: positive.exactOptional(),
    measuredAs: z.string().min(1).exactOptional(),
    source,
  })
  .refine((limit) => limit.ppm !== undefined || limit.mgPerM3 !== undefined, 'a limit without a number');

const agents = z.array(z.enum(extinguishingAgents)).min(1).refine(unique, 'an agent twice');

/** One substance's hazards. */
export const hazardRecordSchema: z.ZodType<HazardRecord> = z.strictObject({
  name: z.string().regex(/^[a-z][a-z0-9]*(_[a-z0-9]+)*$/),
  families: z.array(z.enum(reactiveFamilies)).min(1).refine(unique, 'a family twice').exactOptional(),
  classes: z
    .array(
      z.strictObject({
        source,
        form,
        all: z
          .array(z.string().refine((text) => readGhsClass(text) !== undefined, 'no GHS class, category and code'))
          .min(1)
          .refine(unique, 'a class twice'),
      }),
    )
    .min(1)
    .exactOptional(),
  transport: z.array(transport).min(1).exactOptional(),
  withWater: z
    .array(z.strictObject({ gases: z.array(z.string()), pace: z.enum(['violent', 'brisk', 'slow']), form, source }))
    .min(1)
    .exactOptional(),
  pyrophoric: z.strictObject({ form, source }).exactOptional(),
  limitingOxygen: z
    .array(z.strictObject({ inert: z.enum(['nitrogen', 'carbon-dioxide']), percent: positive.max(21), source }))
    .min(1)
    .exactOptional(),
  exposure: z.array(exposure).min(1).exactOptional(),
  extinguishing: z
    .strictObject({ right: agents, wrong: agents, source })
    .refine(({ right, wrong }) => !right.some((agent) => wrong.includes(agent)), 'an agent both right and wrong')
    .exactOptional(),
});
