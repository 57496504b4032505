// Our own ids, labels and families for the phases of the tables: `Na2CO3(cr)`, `Al2O3(cr,alpha)`, `HNO2(g,cis)`.
// Knows no numbers. Invariant: the id's formula reads back to the atoms of the table, and ids are unique.

import { compositionKey, parseFormula } from '../formula.ts';
import type { Formula, Phase } from '../formula.ts';
import type { SourceRecord } from './source-table.ts';

export interface PhaseName {
  readonly id: string;
  readonly label: string;
  readonly formula: string;
  readonly phase: Phase;
  readonly form?: string;
}

/** Names a table's phase. Throws when its formula cannot be read, since that is no user's input. */
export function namePhase(record: SourceRecord): PhaseName {
  const phase = phaseLetters[record.phase];
  const formula = readFormula(writtenFormula(record));
  if (compositionKey(formula) !== compositionKey(readFormula(plainFormula(record))))
    throw new Error(`${record.id}: ${formula.text} has other atoms`);
  const form = record.form ?? undefined;
  return {
    id: `${formula.text}(${phase}${form === undefined ? '' : `,${form}`})`,
    label: labelOf(record),
    formula: formula.text,
    phase,
    ...(form === undefined ? {} : { form }),
  };
}

/** The file a phase is kept in, by the first of its elements in the order of the families. */
export function familyOf(formulaText: string): string {
  const { composition } = readFormula(formulaText);
  return families.find(({ elements }) => elements.some((element) => composition.has(element)))?.name ?? 'non-metals';
}

const phaseLetters = { gas: 'g', liquid: 'l', crystal: 'cr' } as const;

const families: readonly { readonly name: string; readonly elements: readonly string[] }[] = [
  { name: 'alkali-metals', elements: ['Li', 'Na', 'K'] },
  { name: 'alkaline-earths', elements: ['Mg', 'Ca'] },
  { name: 'boron-and-aluminium', elements: ['B', 'Al'] },
  { name: 'iron-silicon-titanium', elements: ['Fe', 'Si', 'Ti'] },
];

/** The structure where it is a centre with a bracketed group, as in `Ca(OH)2` or `Fe2(SO4)3`; else the plain formula. */
function writtenFormula(record: SourceRecord): string {
  return /^[A-Z][a-z]?\d*\([A-Z][A-Za-z0-9]*\)\d+$/.test(record.structure) ? record.structure : plainFormula(record);
}

/** The index joins a hydrate's water with a plain dot. */
function plainFormula(record: SourceRecord): string {
  return record.formula.replace(/^([^.]*[A-Za-z)]\d*)\.(?=[\d.]*H2O$)/, '$1·');
}

function readFormula(text: string): Formula {
  const formula = parseFormula(text);
  if (formula.kind === 'fault') throw new Error(`${text} is no formula`);
  return formula;
}

/** `Aluminum Chloride Oxide` and `Carbon, Ion` as we write them; what the form says is left out. */
function labelOf(record: SourceRecord): string {
  const [head = '', ...rest] = record.name.split(', ');
  const ion = rest.includes('Ion') ? ' ion' : '';
  return (
    head
      .toLowerCase()
      .replaceAll('aluminum', 'aluminium')
      .replaceAll('sulfur', 'sulphur')
      .replaceAll('sulfid', 'sulphid')
      .replaceAll('sulfat', 'sulphat') + ion
  );
}
