// `compare`: fuels set side by side over one service, as a table; the figures of each fuel are its row. Works a service out
// on each fuel and nothing else. Invariant: engines on other fuels than the one replaced keep theirs in every row.

import type { Definition } from '../../../grammar/tree.ts';
import type { Context } from '../context.ts';
import { readEntries, refuseLines } from '../entries.ts';
import { compareTable } from '../service-figures.ts';
import { lazyAnswer, unknownAnswer, type EvaluatedKind, type Kind, type KindAnswer } from './kind.ts';
import { compareEntries } from './service-entries.ts';

const evaluated: EvaluatedKind = { entries: compareEntries, lines: [], figures: [], evaluate };

export const compare: Kind = {
  kind: 'compare',
  help: 'Blends set side by side over one service.',
  evaluated,
};

function evaluate(definition: Definition, context: Context): KindAnswer {
  const { entries: read, broken } = readEntries(definition, compareEntries, context);
  refuseLines(definition, [], context);
  const service = read.service?.value;
  const fuels = read.across?.value;
  if (broken.size > 0 || !service || !fuels) return unknownAnswer(evaluated);
  for (const fuel of fuels) {
    const { missing } = service.burning(fuel);
    if (missing.length === 0 || !read.across) continue;
    context.report(read.across.entry.span, {
      code: 'balance/no-data',
      what: `${service.name} on ${fuel.name}`,
      missing,
    });
  }
  return lazyAnswer(
    {},
    {
      tables: () => {
        const compared = fuels.map((fuel) => {
          const on = service.burning(fuel);
          return { name: fuel.name, sums: on.sumsAt(on.values, 'value') };
        });
        return [compareTable(compared, service.baseline(), service.repeated?.value ?? null, service.ownTanksFor)];
      },
    },
  );
}
