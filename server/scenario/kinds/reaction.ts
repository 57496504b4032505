// `reaction`: one written equation. Its elements are counted on both sides; where they do not close, the balanced equation
// is offered. A balanced equation is valued: enthalpy, Gibbs energy and log10 K at its state, per equation as written and
// per kilogram of its left side, and over temperature (reaction-temperatures.ts).

import type { Definition, Equation, Span, Term } from '../../../grammar/tree.ts';
import { equationElements } from '../../core/balance/elements.ts';
import { balanceEquation, type Balance } from '../../core/balance/equation.ts';
import { reactionValues, type ReactionTerm } from '../../core/balance/reaction.ts';
import { inUnit, knownUnit } from '../../core/quantity/convert.ts';
import { noParts } from '../../core/quantity/parts.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { propagate } from '../../core/quantity/uncertainty.ts';
import type { Formula } from '../../core/substance/formula.ts';
import { referenceTemperatureK } from '../../core/substance/substance.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines } from '../entries.ts';
import type { Material } from '../material.ts';
import type { FigureRow } from '../material-figures.ts';
import { materialNamed } from '../materials.ts';
import { stateReader, type State } from '../readers.ts';
import { lazily } from '../lazily.ts';
import type { Figure, LineResult, Table } from '../scenario.ts';
import { isReference, valueSpecies, type ValuedSpecies } from '../valued-species.ts';
import type { AssumptionId, Working, WorkingInput } from '../working.ts';
import { unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';
import { equilibriumTemperature, overTemperature } from './reaction-temperatures.ts';

const entries = {
  state: {
    name: 'state',
    reader: stateReader,
    help: 'The temperature and pressure it is valued at.',
    default: { text: '25 °C, 1 bar', source: 'standard reference state' },
  },
};

const stateFigures = [
  { id: 'enthalpy', label: 'Enthalpy of reaction, per equation as written', unit: 'kJ', method: 'reaction-enthalpy' },
  {
    id: 'specific-enthalpy',
    label: 'Enthalpy of reaction, per kg of the left side',
    unit: 'kJ/kg',
    method: 'specific-reaction-enthalpy',
  },
  {
    id: 'gibbs-energy',
    label: 'Gibbs energy of reaction, per equation as written',
    unit: 'kJ',
    method: 'reaction-gibbs-energy',
  },
  { id: 'log10-k', label: 'Decimal logarithm of the equilibrium constant', unit: '1', method: 'equilibrium-constant' },
] as const satisfies readonly FigureRow[];

const figures: readonly FigureRow[] = [...stateFigures, equilibriumTemperature];

const evaluated: EvaluatedKind = { entries, lines: ['equation'], figures, evaluate };

export const reaction: Kind = {
  kind: 'reaction',
  help: 'One written equation: whether it balances, and what it releases.',
  evaluated,
};

/** A term with its formula; its material may lack data, never a formula. */
interface ReadTerm {
  readonly term: Term;
  readonly coefficient: number;
  readonly material: Material;
  readonly formula: Formula;
}

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, entries, context);
  refuseLines(definition, ['equation'], context);
  const equations = definition.lines.flatMap((line, index) => (line.kind === 'equation' ? [{ line, index }] : []));
  const [first, second] = equations;
  const header = definition.name?.span ?? definition.header;
  if (second) {
    context.report(second.line.span, { code: 'name/unexpected-line', kind: 'reaction', line: 'equation' });
  }
  if (!first) {
    const isBroken = definition.lines.some((line) => line.kind === 'broken-line' || line.kind === 'portion');
    const name = definition.name?.text ?? '';
    if (!isBroken)
      context.report(header, { code: 'name/missing-entry', kind: 'reaction', name, entries: ['an equation'] });
    return unknownAnswer(evaluated);
  }
  const left = readSide(first.line.left, context);
  const right = readSide(first.line.right, context);
  if (!left || !right) return unknownAnswer(evaluated);

  const count = equationElements(left.map(countedTerm), right.map(countedTerm));
  const tables = [elementsTable(count.sums)];
  if (!count.balanced) {
    reportUnbalanced(first.line, count.sums, left, right, context);
    return { ...unknownAnswer(evaluated), tables };
  }
  if (broken.has('state')) return { ...unknownAnswer(evaluated), tables };
  const state = stateOf(read.state?.value);
  const valued = (terms: readonly ReadTerm[]): ValuedTerm[] => terms.map((term) => valueTerm(term, state));
  const sides = { left: valued(left), right: valued(right) };
  reportData(sides, first.line, read.state?.entry.span, state, context);
  const answer = value(sides, state, context);
  const atState = { ...answer, tables: [...tables, speciesTable(sides, context)] };
  if (answer.figures.length === 0) return { ...atState, lines: [equationLine(first.index, [])], material: null };
  const lacking = answer.absent.get('gibbs-energy') ?? ['a Gibbs energy at 25 °C'];
  const over = overTemperature({ left, right }, state.pressure.value, lacking, (temperatureK) => {
    const there = { ...state, temperature: temperatureOf(temperatureK) };
    const termsThere = (terms: readonly ReadTerm[]): ValuedTerm[] => terms.map((term) => valueTerm(term, there));
    const sidesThere = { left: termsThere(left), right: termsThere(right) };
    return workingOf(equilibriumTemperature, sidesThere, there.temperature, context);
  });
  const all = (): readonly Figure[] => [...answer.figures, ...over.figures()];
  return lazily<KindAnswer>(
    { ...atState, tables: [...atState.tables, ...over.tables], lines: [], material: null },
    {
      figures: all,
      absent: () => new Map([...answer.absent, ...over.absent()]),
      lines: () => [equationLine(first.index, all())],
    },
  );
}

function equationLine(line: number, told: readonly Figure[]): LineResult {
  return { kind: 'equation', line, figures: told.map((figure) => figure.id) };
}

/** The state a reaction is valued at. */
interface ReactionState {
  readonly temperature: Quantity;
  readonly pressure: Quantity;
}

function temperatureOf(temperatureK: number): Quantity {
  return quantityOf(temperatureK, knownUnit('K').dimension, noParts, 'temperature');
}

function stateOf(state: State | undefined): ReactionState {
  return {
    temperature: state?.temperature ?? temperatureOf(referenceTemperatureK),
    pressure: state?.pressure ?? quantityOf(1e5, knownUnit('Pa').dimension),
  };
}

interface ValuedTerm extends ReadTerm {
  readonly species: ValuedSpecies;
}

interface Sides {
  readonly left: readonly ValuedTerm[];
  readonly right: readonly ValuedTerm[];
}

function valueTerm(read: ReadTerm, { temperature, pressure }: ReactionState): ValuedTerm {
  const isWritten = read.term.species.phase !== undefined;
  const species = valueSpecies(read.material, read.formula, isWritten, temperature.value, pressure.value);
  return { ...read, species };
}

/** Says which species have no energy, and which are asked for beyond their data. */
function reportData(
  { left, right }: Sides,
  equation: Equation,
  stateSpan: Span | undefined,
  { temperature }: ReactionState,
  context: Context,
): void {
  const terms = [...left, ...right];
  const missing = [...new Set(terms.filter(({ species }) => !species.enthalpy).map(({ material }) => material.name))];
  if (missing.length > 0) {
    const isAtReference = isReference(temperature.value);
    const names = missing.map((name) =>
      isAtReference ? `the enthalpy of formation of ${name}` : `the enthalpy of ${name} at that temperature`,
    );
    context.report(equation.span, { code: 'balance/no-data', what: 'enthalpy of reaction', missing: names });
  }
  const beyond = terms.flatMap(({ species }) =>
    species.beyond && species.enthalpy ? [{ name: species.takenAs, range: species.beyond }] : [],
  );
  if (beyond.length > 0) {
    context.report(stateSpan ?? equation.span, {
      code: 'range/temperature',
      why: 'extrapolated',
      temperature,
      species: beyond,
    });
  }
}

function readSide(terms: readonly Term[], context: Context): readonly ReadTerm[] | null {
  const read: ReadTerm[] = [];
  let isComplete = true;
  for (const term of terms) {
    const material = materialNamed(term.species, context, 'composition');
    if (term.coefficient?.value === 0) {
      const text = context.written(term.coefficient.span);
      context.report(term.coefficient.span, { code: 'range/positive', text, entry: 'coefficient' });
      isComplete = false;
      continue;
    }
    if (material?.formula) {
      read.push({ term, coefficient: term.coefficient?.value ?? 1, material, formula: material.formula });
      continue;
    }
    isComplete = false;
    if (material) {
      const needed = 'a substance with a formula';
      context.report(term.species.span, { code: 'name/wrong-kind', name: material.name, is: 'a mixture', needed });
    }
  }
  return isComplete ? read : null;
}

function countedTerm({ term, formula }: ReadTerm): {
  coefficient: number | readonly [number, number];
  formula: Formula;
} {
  return { coefficient: term.coefficient?.fraction ?? term.coefficient?.value ?? 1, formula };
}

function reportUnbalanced(
  equation: Equation,
  sums: readonly {
    readonly element: string;
    readonly left: number;
    readonly right: number;
    readonly difference: number;
  }[],
  left: readonly ReadTerm[],
  right: readonly ReadTerm[],
  context: Context,
): void {
  const balance = balanceEquation(
    left.map((term) => term.formula),
    right.map((term) => term.formula),
  );
  context.report(equation.span, {
    code: 'balance/elements',
    differences: sums.filter((sum) => sum.difference !== 0),
    solution: solutionOf(balance, equation, context),
  });
}

function solutionOf(balance: Balance, equation: Equation, context: Context) {
  if (balance.kind === 'none') return { kind: 'none', why: balance.why } as const;
  const side = (terms: readonly Term[], coefficients: readonly number[]): string =>
    terms
      .map((term, index) => {
        const coefficient = coefficients[index] ?? 1;
        const species = context.written(term.species.span);
        return coefficient === 1 ? species : `${coefficient} ${species}`;
      })
      .join(' + ');
  const arrow = context.written(equation.arrow);
  const { coefficients } = balance;
  const text = `${side(equation.left, coefficients.left)} ${arrow} ${side(equation.right, coefficients.right)}`;
  return balance.kind === 'unique'
    ? ({ kind: 'unique', equation: text } as const)
    : ({ kind: 'several', equation: text, freedom: balance.dimension } as const);
}

function value(
  { left, right }: Sides,
  { temperature }: ReactionState,
  context: Context,
): Pick<KindAnswer, 'figures' | 'absent'> {
  const terms = [...left, ...right];
  if (terms.some(({ species }) => !species.enthalpy)) return unknownAnswer(evaluated);
  const unknown = quantityOf(NaN);
  const inputs = [
    temperature,
    ...terms.flatMap(({ species }) => [species.enthalpy ?? unknown, species.entropy ?? unknown]),
  ];
  const outcomes = propagate(inputs, ([temperatureK = NaN, ...values]) => {
    const termAt = ({ material, coefficient }: ValuedTerm, index: number): ReactionTerm => {
      const entropy = values[2 * index + 1] ?? NaN;
      return {
        name: material.name,
        coefficient,
        molarMassKgPerMol: material.molarMass?.value,
        enthalpyJPerMol: values[2 * index],
        entropyJPerMolK: Number.isNaN(entropy) ? undefined : entropy,
      };
    };
    const answer = reactionValues(
      left.map((term, index) => termAt(term, index)),
      right.map((term, index) => termAt(term, left.length + index)),
      temperatureK,
    );
    if (answer.kind === 'fault') return [NaN, NaN, NaN, NaN];
    return [answer.enthalpyJ, answer.enthalpyJPerKgOfLeft ?? NaN, answer.gibbsEnergyJ ?? NaN, answer.log10K ?? NaN];
  });
  const withoutEntropy = new Set(terms.filter(({ species }) => !species.entropy).map(({ material }) => material.name));
  const found: Figure[] = [];
  const absent = new Map<string, readonly string[] | null>();
  for (const [index, row] of stateFigures.entries()) {
    const outcome = outcomes[index];
    if (!outcome || !Number.isFinite(outcome.value)) {
      absent.set(
        row.id,
        [...withoutEntropy].map((name) => `the entropy of ${name}`),
      );
      continue;
    }
    const quantity = quantityOf(outcome.value, knownUnit(row.unit).dimension, outcome.parts ?? noParts);
    const working = workingOf(row, { left, right }, temperature, context);
    found.push({ id: row.id, label: row.label, quantity, unit: row.unit, working });
  }
  return { figures: found, absent };
}

function workingOf(row: FigureRow, { left, right }: Sides, temperature: Quantity, context: Context): Working {
  const isEnergyOnly = row.id === 'enthalpy' || row.id === 'specific-enthalpy';
  const inputs: WorkingInput[] = [{ label: 'Temperature', quantity: temperature, unit: 'degC' }];
  for (const [terms, sign] of [
    [left, -1],
    [right, 1],
  ] as const) {
    for (const { term, coefficient, species } of terms) {
      const place = context.place(term.span);
      const counted = `${sign * coefficient} × ${species.takenAs}`;
      inputs.push({ label: `${counted}, enthalpy`, quantity: species.enthalpy, unit: 'kJ/mol', place });
      if (!isEnergyOnly && species.entropy) {
        inputs.push({ label: `${counted}, entropy`, quantity: species.entropy, unit: 'J/(mol K)', place });
      }
    }
  }
  const terms = [...left, ...right];
  const sources = [...new Set(terms.flatMap(({ species }) => species.sources))];
  const assumptions: AssumptionId[] = ['element-scale', 'ideal-gas'];
  if (terms.some(({ species }) => species.guessed)) assumptions.push('stable-phase');
  return { method: row.method, inputs, sources, assumptions };
}

/** What each species was taken as, with its values at the state. */
function speciesTable({ left, right }: Sides, context: Context): Table {
  const inUnitOf = (quantity: Quantity | null, unit: string): number | null => quantity && inUnit(quantity, unit);
  return {
    id: 'species',
    label: 'Species at the state given',
    columns: [
      { id: 'substance', label: 'Species', unit: null },
      { id: 'taken-as', label: 'taken as', unit: null },
      { id: 'coefficient', label: 'Amount', unit: '1' },
      { id: 'enthalpy', label: 'Enthalpy', unit: 'kJ/mol' },
      { id: 'entropy', label: 'Entropy', unit: 'J/(mol K)' },
    ],
    rows: [...left.map((term) => ({ ...term, coefficient: -term.coefficient })), ...right].map(
      ({ term, coefficient, species }) => [
        context.written(term.species.span),
        species.takenAs,
        coefficient,
        inUnitOf(species.enthalpy, 'kJ/mol'),
        inUnitOf(species.entropy, 'J/(mol K)'),
      ],
    ),
  };
}

function elementsTable(
  sums: readonly {
    readonly element: string;
    readonly left: number;
    readonly right: number;
    readonly difference: number;
  }[],
): Table {
  return {
    id: 'elements',
    label: 'Elements on both sides',
    columns: [
      { id: 'element', label: 'Element', unit: null },
      { id: 'left', label: 'left', unit: '1' },
      { id: 'right', label: 'right', unit: '1' },
      { id: 'difference', label: 'right less left', unit: '1' },
    ],
    rows: sums.map((sum) => [sum.element, sum.left, sum.right, sum.difference]),
  };
}
