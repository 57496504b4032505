// Reads the `profile` entry of a duty: a file of logged power and the engine that gave it, as a leg. The rows are core's; a
// long file is long work, during which the duty stays unknown and silent. Knows no plan.
// Invariant: what is wrong in the file is said at its path, with the row; a file that is not there has been said already.

import { readProfile } from '../core/duty/profile.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf } from '../core/quantity/quantity.ts';
import { engineNamed, type LegEntry } from './duty-readers.ts';
import type { Reader } from './entries.ts';
import { isConnective, onlyPhrase, refuse, refuseItem } from './readers.ts';

/** `"crossing.csv" on main` */
export const profileReader: Reader<LegEntry> = {
  takes: 'a file in quotes and `on` an engine, such as `"crossing.csv" on main`',
  connectives: { on: '' },
  names: true,
  kinds: ['engine'],
  files: true,
  read(entry, context) {
    const { takes } = profileReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [file, on, who, extra] = phrase?.items ?? [];
    if (!phrase || !file) return undefined;
    if (file.kind !== 'text' || !isConnective(on, 'on') || who?.kind !== 'word') {
      return refuse(entry, phrase, takes, context);
    }
    if (extra) return refuseItem(entry, extra, takes, context);
    const engine = engineNamed(who, context);
    const text = context.scope.fileText(file.value);
    if (!engine || text === null) return undefined;
    const read = context.scope.longWork(readProfile, text, text);
    if (!read) return undefined;
    if (read.kind === 'fault') {
      const { why, row, text: found } = read;
      context.report(file.span, { code: 'duty/profile', path: file.value, why, row, text: found });
      return undefined;
    }
    const timeS = read.steps.reduce((sum, step) => sum + step.timeS, 0);
    const energyJ = read.steps.reduce((sum, step) => sum + step.timeS * step.powerW, 0);
    const meanPower = quantityOf(energyJ / timeS, knownUnit('W').dimension);
    return {
      time: quantityOf(timeS, knownUnit('s').dimension),
      distance: null,
      speed: null,
      calm: false,
      engines: [{ engine, by: 'power', quantity: meanPower, span: phrase.span }],
      shore: null,
      profile: read.steps,
    };
  },
};
