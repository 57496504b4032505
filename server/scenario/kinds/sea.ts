// `sea`: the water that takes up what is released. Any two variables of its carbonate system settle the others; an effluent
// changes its pH before gas is exchanged, and in the end holds more carbon or less.
// Knows no ship and no stack. Invariant: carbon that is delivered is never counted as taken up from the air.
// Method: core/account/sea. Findings: sea-facts.ts.

import type { Definition } from '../../../grammar/tree.ts';
import { respondTo, type Delivery, type SeaResponse } from '../../core/account/sea/delivery.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { noParts, type Parts } from '../../core/quantity/parts.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { propagate, type Propagated } from '../../core/quantity/uncertainty.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines } from '../entries.ts';
import { lazily } from '../lazily.ts';
import type { ReceivingWater } from '../receiving-water.ts';
import type { Absent, Figure } from '../scenario.ts';
import { unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';
import { seaEntries } from './sea-entries.ts';
import {
  checkWater,
  reportNearField,
  reportState,
  reportTooFew,
  reportTooMany,
  takeTwo,
  writtenVariables,
  type SeaRead,
} from './sea-facts.ts';
import { seaFigures, seaNeeds, seaNumbers } from './sea-figures.ts';
import { carbonateEntries, solveSea, withConstants, type SeaKey, type SeaQuestion } from './sea-question.ts';
import { seaTables } from './sea-tables.ts';
import { seaWorking } from './sea-working.ts';

const evaluated: EvaluatedKind = { entries: seaEntries, lines: [], figures: seaFigures, evaluate };

export const sea: Kind = {
  kind: 'sea',
  help: 'The water that takes up what is released: salinity, temperature and its carbonate system.',
  evaluated,
};

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, seaEntries, context, evaluated.lines);
  refuseLines(definition, evaluated.lines, context);
  const { practicalSalinity, temperature } = read;
  const hasConstants = checkWater(read, context);
  if (!practicalSalinity || !temperature || !hasConstants || broken.has('depth')) return unknownAnswer(evaluated);
  const written = writtenVariables(read);
  const variables = takeTwo(written);
  const isBroken = carbonateEntries.some(({ key }) => broken.has(key)) || nutrients.some((key) => broken.has(key));
  if (!variables.taken && !isBroken) {
    reportTooFew(written, definition.name?.span ?? definition.header, context);
  }
  const taken = isBroken ? null : variables.taken;
  const question: SeaQuestion = {
    inputs: inputsOf(read, taken),
    boron: read.boron?.value ?? 'uppstrom',
    known: taken && [taken[0].entry, taken[1].entry],
  };
  const solved = solveSea(question, (key) => question.inputs.get(key)?.value);
  if (taken) {
    reportTooMany(variables, solved, context);
    reportState(taken, solved, context);
  }
  const { receivingLimit, nearFieldDilution } = read;
  reportNearField(
    solved,
    {
      way: read.deliveredAs?.value ?? 'solution',
      limit: receivingLimit ? { value: receivingLimit.value, span: receivingLimit.entry.span } : null,
      dilution: nearFieldDilution
        ? { value: nearFieldDilution.value.quantity.value, span: nearFieldDilution.entry.span }
        : null,
    },
    context,
  );
  const answer: KindAnswer = {
    figures: figuresOf(question, read, context),
    tables: [],
    absent: absentOf(solved, broken),
    lines: [],
    material: null,
    machinery: solved.state ? waterOf(question, context.owner) : null,
  };
  return lazily(answer, { tables: () => seaTables(question, solved) });
}

const nutrients = ['phosphate', 'silicate'] as const;

function inputsOf(read: SeaRead, taken: ReturnType<typeof takeTwo>['taken']): ReadonlyMap<SeaKey, Quantity> {
  const inputs = new Map<SeaKey, Quantity>();
  const put = (key: SeaKey, quantity: Quantity | undefined): void => {
    if (quantity) inputs.set(key, quantity);
  };
  put('salinity', read.practicalSalinity?.value.quantity);
  put('temperature', read.temperature?.value.quantity);
  put('depth', read.depth?.value.quantity);
  put('phosphate', read.phosphate?.value.quantity);
  put('silicate', read.silicate?.value.quantity);
  put('first', taken?.[0].quantity);
  put('second', taken?.[1].quantity);
  for (const [form, quantity] of read.effluent?.value ?? []) put(form, quantity);
  put('dilution', read.nearFieldDilution?.value.quantity);
  put('mixed-layer', read.mixedLayer?.value.quantity);
  put('wind', read.wind?.value.quantity);
  put('residence', read.mixedLayerResidence?.value.quantity);
  return inputs;
}

/** The same question asked with numbers moved, for the propagation of what is uncertain. */
function askedWith(keys: readonly SeaKey[], values: readonly number[]): (key: SeaKey) => number | undefined {
  const byKey = new Map(keys.map((key, index) => [key, values[index]]));
  return (key) => byKey.get(key);
}

function figuresOf(question: SeaQuestion, read: SeaRead, context: Context): readonly Figure[] {
  const inputs = withConstants(question.inputs);
  const keys = [...inputs.keys()];
  const outcomes = propagate([...inputs.values()], (values) => {
    const numbers = seaNumbers(solveSea(question, askedWith(keys, values)));
    return seaFigures.map(({ id }) => numbers[id] ?? NaN);
  });
  const working = seaWorking(question, read, context);
  return seaFigures.flatMap((row, index): Figure[] => {
    const outcome = outcomes[index];
    if (!outcome || !Number.isFinite(outcome.value)) return [];
    const quantity = lazily(quantityOf(outcome.value, knownUnit(row.unit).dimension), {
      parts: () => soundParts(outcome),
    });
    return [{ id: row.id, label: row.label, quantity, unit: row.unit, working: working(row) }];
  });
}

/** The parts but for rounding: what is given stays as certain as it is written, whatever constants it was taken through. */
function soundParts({ value, parts }: Propagated): Parts {
  if (!parts) return noParts;
  return new Map([...parts].filter(([, part]) => Math.abs(part) > 1e-9 * Math.abs(value)));
}

function absentOf(solved: ReturnType<typeof solveSea>, broken: ReadonlySet<keyof typeof seaEntries>): Absent {
  const numbers = seaNumbers(solved);
  const isAsked = (['effluent', 'nearFieldDilution', 'mixedLayer', 'wind', 'mixedLayerResidence'] as const).some(
    (key) => broken.has(key),
  );
  const absent = new Map<string, readonly string[] | null>();
  for (const { id, needs } of seaFigures) {
    if (numbers[id] !== undefined) continue;
    absent.set(id, solved.state && !isAsked ? seaNeeds[needs] : null);
  }
  return absent;
}

/** The water for those who deliver to it. */
function waterOf(question: SeaQuestion, name: string): ReceivingWater {
  const inputs = withConstants(question.inputs);
  const keys = [...inputs.keys()];
  return {
    machinery: 'sea',
    name,
    inputs: [...inputs.values()],
    respond: (values: readonly number[], delivery: Delivery): SeaResponse | null => {
      const { state } = solveSea(question, askedWith(keys, values));
      return state && respondTo(state, delivery);
    },
    uptakePerAlkalinity: (values: readonly number[]): number => {
      const numbers = seaNumbers(solveSea(question, askedWith(keys, values)));
      return numbers['uptake-efficiency'] ?? NaN;
    },
  };
}
