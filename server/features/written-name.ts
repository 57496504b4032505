// How a name is written where it is given or used: bare where the language allows it, in quotes elsewhere. A bare name is
// `lower_snake` and neither a word of the language nor a unit; anything else needs its quotes.
import { isReservedWord } from '../../grammar/words.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';

export function writtenName(name: string): string {
  return isBareName(name) ? name : `'${name}'`;
}

function isBareName(name: string): boolean {
  return /^[a-z][a-z0-9_]*$/.test(name) && !isReservedWord(name) && !isUnitWord(name);
}
