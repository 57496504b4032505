// References: a figure of a definition (`density of slurry`), a cell of one of its tables, and the share of a portion
// (`sodium in slurry`), each found by the words that name it. Where nothing is found, the cause is said once, at its place,
// and null is returned. Knows no arithmetic but that of adding a portion's shares.

import type { Membership, Reference, Word } from '../../grammar/tree.ts';
import type { Basis } from '../core/balance/mixture.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { add, isFault, quantityOf, type Quantity, type QuantityFault } from '../core/quantity/quantity.ts';
import { toSi } from '../core/quantity/read-unit.ts';
import { near, type Context, type Unknowable } from './context.ts';
import { givenFigures } from './given-figures.ts';
import type { PortionShare } from './material.ts';
import { figuresOfMaterial } from './material-figures.ts';
import { materialNamed } from './materials.ts';
import type { Absent, EvaluatedDefinition, Figure, Table } from './scenario.ts';
import { nearByTrade } from './trade-names.ts';
/** A name of a kind that is not evaluated yet: it can be gone to, and that is all; its own finding says so. */
export function silent(word: Word, definition: EvaluatedDefinition, context: Context): null {
  context.mean(word.span, { kind: 'definition', name: word.text, definition });
  return null;
}

/** A figure met through a reference: its value and, where it is one of a definition's own, the figure. */
export interface ReferredFigure {
  readonly quantity: Quantity;
  readonly unit: string;
}

/** `words of NAME`, or a cell of one of its tables. */
export function evaluateReference(reference: Reference, context: Context): ReferredFigure | null {
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
  const owner = named
    ? { ...named.definition, portions: named.material?.portions ?? null }
    : catalogueOwner(name, context);
  if (!owner) return null;
  if (reference.row) return evaluateCell(reference, reference.row, owner, context);
  const id = reference.words.replaceAll(' ', '-');
  const figure = owner.figures.find((candidate) => candidate.id === id);
  if (!figure) {
    const missing = owner.absent.get(id);
    if (missing)
      context.report(reference.span, { code: 'balance/no-data', what: context.written(reference.span), missing });
    if (missing !== undefined) return null;
    const ids = [...owner.figures.map((candidate) => candidate.id), ...owner.absent.keys()];
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

interface Owner {
  readonly figures: readonly Figure[];
  readonly tables: readonly Table[];
  readonly absent: Absent;
  /** Of a blend. */
  readonly portions: readonly PortionShare[] | null;
}

function catalogueOwner(name: Word, context: Context): Owner | null {
  const material = materialNamed(name, context);
  return (
    material && {
      figures: [...figuresOfMaterial(material), ...givenFigures(material.card)],
      tables: [],
      absent: new Map(),
      portions: null,
    }
  );
}

function evaluateCell(reference: Reference, row: Word, owner: Owner, context: Context): ReferredFigure | null {
  const columnId = reference.words.replaceAll(' ', '-');
  const wanted = context.written(row.span).replaceAll("'", '');
  const material = materialNamed(row, context, 'quiet');
  const basis = shareColumns[columnId];
  if (basis && material && owner.portions?.some(({ name }) => name === material.name)) {
    const quantity = shareOf(owner.portions, material.name, basis);
    return quantity && { quantity, unit: '1' };
  }
  for (const table of owner.tables) {
    const column = table.columns.findIndex((candidate) => candidate.id === columnId && candidate.unit !== null);
    if (column < 0) continue;
    const found = table.rows.find((cells) => cells[0] === wanted || (material && cells[0] === material.name));
    const cell = found?.[column];
    const unit = table.columns[column]?.unit;
    if (!found || !unit) continue;
    if (typeof cell !== 'number') return null; // the table itself shows that it could not be had
    const known = knownUnit(unit);
    return { quantity: quantityOf(toSi(cell, known), known.dimension), unit };
  }
  // A definition that could not be worked out has no tables, and why has been said there.
  if ([...owner.absent.values()].includes(null)) return null;
  const rows = owner.tables.flatMap((table) => table.rows.map((cells) => String(cells[0]))).slice(0, 12);
  context.report(row.span, {
    code: 'name/unknown',
    what: 'portion',
    word: wanted,
    near: near(wanted, rows),
    owner: reference.name?.text ?? '',
    allowed: rows,
  });
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
