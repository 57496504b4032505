// Reads the hazards a user's own substance says of itself: `hazards: H260, H314, UN 1428, alkali-metal`, in any order. Codes
// are looked up in the table of the GHS, families in the closed list the rules speak of, a UN number in the entries of the
// catalogue; a number the catalogue lacks is kept as it is, for the dangerous goods list is longer than it.
// Knows no rule. Invariant: a phrase is a code, a number or a family, or it is reported; each counts once.

import type { Entry, Phrase } from '../../grammar/tree.ts';
import { classOfStatement, ghsClasses } from '../core/substance/ghs.ts';
import { transportRecordOf } from '../core/substance/hazard-records.ts';
import {
  nothingRecorded,
  reactiveFamilies,
  type Hazards,
  type ReactiveFamily,
  type TransportEntry,
} from '../core/substance/hazards.ts';
import type { SourceRecord } from '../core/substance/record.ts';
import type { Context } from './context.ts';
import type { Reader } from './entries.ts';
import { refuse, reportListedWord } from './readers.ts';

/** What was written, each once, in the order written. */
export interface HazardsSaid {
  readonly statements: readonly string[];
  readonly unNumbers: readonly number[];
  readonly families: readonly ReactiveFamily[];
}

const codes: readonly string[] = [...new Set(ghsClasses.flatMap(({ statements }) => statements))].sort();

export const hazardsReader: Reader<HazardsSaid> = {
  takes: 'GHS statement codes, UN numbers and what it reacts as, such as `H260, H314, UN 1428, alkali-metal`',
  words: [...reactiveFamilies, ...codes],
  read(entry, context) {
    const statements = new Set<string>();
    const unNumbers = new Set<number>();
    const families = new Set<ReactiveFamily>();
    for (const phrase of entry.phrases) {
      const said = readPhrase(entry, phrase, context);
      if (said === undefined) return undefined;
      if (typeof said === 'number') unNumbers.add(said);
      else if (isFamily(said)) families.add(said);
      else statements.add(said);
    }
    return { statements: [...statements], unNumbers: [...unNumbers], families: [...families] };
  },
};

/** A UN number, a statement code or a family; undefined when the phrase is none of them (said). */
function readPhrase(entry: Entry, phrase: Phrase, context: Context): number | string | undefined {
  const [first, second, ...rest] = phrase.items;
  if (first?.kind !== 'word' || first.phase !== undefined || rest.length > 0) {
    return refuse(entry, phrase, hazardsReader.takes, context);
  }
  if (second) {
    const isNumber =
      first.text === 'UN' &&
      second.kind === 'quantity' &&
      !second.unit &&
      !second.uncertainty &&
      Number.isInteger(second.number.value) &&
      second.number.value >= 1 &&
      second.number.value <= largestUnNumber;
    return isNumber ? second.number.value : refuse(entry, phrase, hazardsReader.takes, context);
  }
  const [, number] = /^UN(\d{4})$/.exec(first.text) ?? [];
  if (number !== undefined) return Number(number);
  // H360FD, H361d: the letters say which of the two, the class is the same.
  const code = first.text.replace(/^(H\d{3})[DFdf]{1,2}$/, '$1');
  if (isFamily(code) || codes.includes(code)) return code;
  reportListedWord(first, entry.words, hazardsReader.words ?? [], context);
  return undefined;
}

/** UN numbers have four digits; 0004 to 3560 are in use. */
const largestUnNumber = 9999;

const isFamily = (word: string): word is ReactiveFamily => (reactiveFamilies as readonly string[]).includes(word);

/** What was said, as hazards of a substance with the definition's own source. */
export function hazardsSaid({ statements, unNumbers, families }: HazardsSaid, source: SourceRecord): Hazards {
  return {
    ...nothingRecorded,
    families,
    classes: statements.flatMap((code) => {
      const found = classOfStatement(code);
      if (found === undefined) return [];
      const { hazardClass, category, statement } = found;
      return [{ hazardClass, category, statement, source }];
    }),
    transport: unNumbers.map((unNumber) => transportSaid(unNumber, source)),
  };
}

function transportSaid(unNumber: number, source: SourceRecord): TransportEntry {
  const known = transportRecordOf(unNumber);
  if (known === undefined) return { unNumber, subsidiary: [], source };
  const { properShippingName, dangerClass, subsidiary = [], packingGroup } = known;
  return { unNumber, properShippingName, dangerClass, subsidiary, ...(packingGroup && { packingGroup }), source };
}
