// The JSON contract of `evaluate` and `check`, schema 1, as a check of its own: strict, so that a key too many fails, too.
// Written from the language reference and not from the code. Invariant: every document the command line prints fits.

import * as z from 'zod';

const severity = z.enum(['error', 'warning', 'information', 'hint']);
const position = z.number().int().min(1);
const unit = z.string().regex(/^[^%]+$/);
const range = { line: position, column: position, endLine: position, endColumn: position };

const finding = z.strictObject({
  code: z.string().regex(/^[a-z]+\/[a-z]+(-[a-z]+)*$/),
  severity,
  message: z.string().min(1),
  ...range,
  acknowledged: z.boolean(),
});

const expectation = z.strictObject({
  ...range,
  holds: z.boolean().nullable(),
  found: z.number().nullable(),
  unit: unit.nullable(),
});

const figure = z.strictObject({
  id: z.string().regex(/^[a-z][a-z0-9]*(-[a-z0-9]+)*$/),
  label: z.string().min(1),
  value: z.number(),
  unit,
  uncertainty: z.number().positive().nullable(),
  low: z.number().optional(),
  high: z.number().optional(),
});

const table = z
  .strictObject({
    id: z.string(),
    columns: z.array(z.strictObject({ id: z.string(), unit: unit.nullable() })),
    rows: z.array(z.array(z.union([z.string(), z.number(), z.null()]))),
  })
  .refine(({ columns, rows }) => rows.every((row) => row.length === columns.length), 'every row has every column');

const definition = z.strictObject({
  kind: z.string(),
  name: z.string(),
  line: position,
  figures: z.array(figure),
  tables: z.array(table),
  screening: z
    .strictObject({
      rulesLookedAt: z.number().int().positive(),
      found: z.array(z.string().regex(/^hazard\/[a-z]+(-[a-z]+)*$/)),
      unrecorded: z.array(z.string()),
      caution: z.string().nullable(),
    })
    .optional(),
});

const value = z.strictObject({
  name: z.string(),
  line: position,
  value: z.number(),
  unit,
  uncertainty: z.number().positive().nullable(),
});

const checked = { path: z.string(), used: z.boolean(), findings: z.array(finding), expectations: z.array(expectation) };

export const checkContract = z.strictObject({ schema: z.literal(1), files: z.array(z.strictObject(checked)) });

export const evaluateContract = z.strictObject({
  schema: z.literal(1),
  files: z.array(z.strictObject({ ...checked, definitions: z.array(definition), values: z.array(value) })),
});
