// References: a figure of a definition (`density of slurry`), a cell of one of its tables, and the share of a portion
// (`sodium in slurry`), each found by the words that name it. Where nothing is found, the cause is said once, at its place,
// and null is returned. Knows no arithmetic but that of adding a portion's shares.

import type { Expression, Membership, Reference, Word } from '../../grammar/tree.ts';
import type { Basis } from '../core/balance/mixture.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { add, isFault, quantityOf, type Quantity, type QuantityFault } from '../core/quantity/quantity.ts';
import { near, type Context, type Unknowable } from './context.ts';
import { givenFigures } from './given-figures.ts';
import type { PortionShare } from './material.ts';
import { figuresOfMaterial } from './material-figures.ts';
import { materialNamed } from './materials.ts';
import { fit } from './read-quantity.ts';
import type { Absent, EvaluatedDefinition, Figure, Table } from './scenario.ts';
import { findCell, findFigureAt, isToldOverTemperature, type ReferredFigure } from './table-cells.ts';
import { nearByTrade } from './trade-names.ts';

/** A name of a kind that is not evaluated yet: it can be gone to, and that is all; its own finding says so. */
export function silent(word: Word, definition: EvaluatedDefinition, context: Context): null {
  context.mean(word.span, { kind: 'definition', name: word.text, definition });
  return null;
}

/** `words of NAME`, or a cell of one of its tables. */
export function evaluateReference(
  reference: Reference,
  context: Context,
  evaluateAt: EvaluateAt,
): ReferredFigure | null {
  const { name } = reference;
  if (!name) return null; // the grammar has said that a name is missing
  const named = context.scope.lookup(name.text);
  if (named?.kind === 'unknown') return null;
  if (named?.kind === 'unevaluated') return silent(name, named.definition, context);
  if (named?.kind === 'value') {
    context.mean(name.span, { kind: 'value', name: name.text, value: named.value });
    context.report(name.span, { code: 'name/wrong-kind', name: name.text, is: 'a number', needed: 'a definition' });
    return null;
  }
  if (named) context.mean(name.span, { kind: 'definition', name: name.text, definition: named.definition });
  const owner: Owner | null = named
    ? { of: named.definition, portions: named.material?.portions ?? null }
    : catalogueOwner(name, context);
  if (!owner) return null;
  if (reference.row) return evaluateCell(reference, reference.row, owner, evaluateAt, context);
  const id = reference.words.replaceAll(' ', '-');
  if (reference.at && isToldOverTemperature(owner.of.tables, id)) {
    return evaluateAtTemperature(reference, reference.at, owner.of, id, evaluateAt, context);
  }
  const { figures, absent } = owner.of;
  const figure = figures.find((candidate) => candidate.id === id);
  if (!figure) {
    const missing = absent.get(id);
    if (missing)
      context.report(reference.span, { code: 'balance/no-data', what: context.written(reference.span), missing });
    if (missing !== undefined) return null;
    const ids = [...figures.map((candidate) => candidate.id), ...absent.keys()];
    const known = ids.map((candidate) => candidate.replaceAll('-', ' '));
    const suggestions = nearByTrade(reference.words, known);
    context.report(reference.wordsSpan, {
      code: 'name/unknown',
      what: 'figure',
      word: reference.words,
      near: suggestions,
      owner: name.text,
      allowed: known,
    });
    return null;
  }
  if (reference.at) {
    const text = context.written(reference.at.span);
    const takes = 'no `at`: this figure holds at its reference state';
    context.report(reference.at.span, {
      code: 'name/unknown-phrase',
      entry: reference.words,
      text: `at ${text}`,
      takes,
    });
    return null;
  }
  context.mean(reference.wordsSpan, { kind: 'figure', of: name.text, figure });
  return figure;
}

/** What a reference is asked of. Its figures are read only when one is asked for: a burn solves its states then. */
interface Owner {
  readonly of: { readonly figures: readonly Figure[]; readonly tables: readonly Table[]; readonly absent: Absent };
  /** Of a blend. */
  readonly portions: readonly PortionShare[] | null;
}

function catalogueOwner(name: Word, context: Context): Owner | null {
  const material = materialNamed(name, context);
  return (
    material && {
      of: {
        figures: [...figuresOfMaterial(material), ...givenFigures(material.card)],
        tables: [],
        absent: new Map(),
      },
      portions: null,
    }
  );
}

function evaluateCell(
  reference: Reference,
  row: Word,
  owner: Owner,
  evaluateAt: EvaluateAt,
  context: Context,
): ReferredFigure | null {
  const columnId = reference.words.replaceAll(' ', '-');
  const wanted = context.written(row.span).replaceAll("'", '');
  const material = materialNamed(row, context, 'quiet');
  const basis = shareColumns[columnId];
  if (basis && material && owner.portions?.some(({ name }) => name === material.name)) {
    const quantity = shareOf(owner.portions, material.name, basis);
    return quantity && { quantity, unit: '1' };
  }
  const temperature = reference.at ? readTemperature(reference.at, evaluateAt, context) : undefined;
  if (temperature === null) return null;
  const { tables, absent } = owner.of;
  const isNamed = (name: string): boolean => name === wanted || name === material?.name;
  const answer = findCell(tables, isNamed, columnId, temperature, context.scope.longWork);
  if (answer.kind === 'cell') return answer.cell;
  if (answer.kind === 'awaited') return null;
  // A definition that could not be worked out has no tables, and why has been said there.
  if ([...absent.values()].includes(null)) return null;
  if (answer.kind === 'no-state' && reference.at)
    return reportNoState(reference, reference.at, answer.statesK, context);
  const allowed = answer.kind === 'no-row' ? answer.names.slice(0, 12) : [];
  context.report(row.span, {
    code: 'name/unknown',
    what: 'portion',
    word: wanted,
    near: near(wanted, allowed),
    owner: reference.name?.text ?? '',
    allowed,
  });
  return null;
}

/** `condensed share of test_combustor at 350 degC`: a cell of the table whose rows are temperatures. */
function evaluateAtTemperature(
  reference: Reference,
  at: Expression,
  { tables, absent }: Owner['of'],
  id: string,
  evaluateAt: EvaluateAt,
  context: Context,
): ReferredFigure | null {
  const temperature = readTemperature(at, evaluateAt, context);
  if (!temperature) return null;
  const answer = findFigureAt(tables, id, temperature);
  if (answer.kind === 'cell') return answer.cell;
  if ([...absent.values()].includes(null)) return null;
  return reportNoState(reference, at, answer.statesK, context);
}

/** Works out what stands behind `at`; handed in, since expressions hold references and not the other way round. */
export type EvaluateAt = (at: Expression) => Quantity | null;

function readTemperature(at: Expression, evaluateAt: EvaluateAt, context: Context): Quantity | null {
  const quantity = evaluateAt(at);
  const needed = { dimension: knownUnit('K').dimension, kind: 'temperature', example: 'degC' } as const;
  return quantity && fit(quantity, needed, at.span, context);
}

/** Says at which temperatures there is an answer. */
function reportNoState(reference: Reference, at: Expression, statesK: readonly number[], context: Context): null {
  const owner = reference.name?.text ?? '';
  const named = context.scope.lookup(owner);
  const kind = named?.kind === 'definition' ? named.definition.kind : '';
  const states = statesK.map((stateK) => quantityOf(stateK, knownUnit('K').dimension, undefined, 'temperature'));
  context.report(at.span, { code: 'name/unknown-state', text: context.written(at.span), owner, kind, states });
  return null;
}

/** Columns of a blend's portions that are worked out with their uncertainty. */
const shareColumns: Readonly<Record<string, Basis>> = {
  'mass-share': 'mass',
  'mole-share': 'mole',
  'volume-share': 'volume',
};

/** The share of all portions of that name together; null when it could not be had. */
function shareOf(portions: readonly PortionShare[], name: string, basis: Basis): Unknowable {
  let total: Unknowable = null;
  for (const share of portions) {
    if (share.name !== name) continue;
    const next = share[basis];
    if (!next) return null;
    const sum: Quantity | QuantityFault = total ? add(total, next) : next;
    if (isFault(sum)) return null;
    total = sum;
  }
  return total;
}

/** `SUBSTANCE in BLEND`: that portion's share, by mass unless `by mole` or `by volume` is written. */
export function evaluateMembership(membership: Membership, context: Context): Unknowable {
  const { name, substance } = membership;
  if (!name) return null;
  const named = context.scope.lookup(name.text);
  if (named?.kind === 'unknown') return null;
  if (named?.kind === 'unevaluated') return silent(name, named.definition, context);
  const material = named?.kind === 'definition' ? named.material : null;
  if (!named) {
    context.report(name.span, {
      code: 'name/unknown',
      what: 'definition',
      word: name.text,
      near: near(name.text, context.scope.names()),
    });
    return null;
  }
  if (named.kind === 'value' || named.definition.kind !== 'blend') {
    const is = named.kind === 'value' ? 'a number' : `a ${named.definition.kind}`;
    context.report(name.span, { code: 'name/wrong-kind', name: name.text, is, needed: 'a blend' });
    return null;
  }
  context.mean(name.span, { kind: 'definition', name: name.text, definition: named.definition });
  if (!material?.portions) return null;
  const part = materialNamed(substance, context);
  if (!part) return null;
  const basis = membership.basis?.basis ?? 'mass';
  const shares = material.portions.filter((portion) => portion.name === part.name);
  if (shares.length === 0) {
    const allowed = material.portions.map((portion) => portion.name);
    const word = context.written(substance.span);
    context.report(substance.span, {
      code: 'name/unknown',
      what: 'portion',
      word,
      near: near(word, allowed),
      owner: name.text,
      allowed,
    });
    return null;
  }
  const total = shareOf(material.portions, part.name, basis);
  if (!total) {
    // The share wants this property of every portion, and another portion than the one asked for may lack it.
    const property = basis === 'mole' ? 'molarMass' : 'density';
    const substance = material.missing.get(property)?.[0] ?? part.name;
    const why = basis === 'mole' ? 'molar-mass' : 'density';
    context.report(membership.span, { code: 'balance/no-density', substance, why });
  }
  return total;
}
