/**
 * An `acknowledge` line that cannot count. Only hazards can be acknowledged (`hazard/…`), by a code that exists and with
 * a reason in quotes, so that whoever reads the scenario later knows who looked at what, and why it is in order.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameAcknowledged: Rule<FactOf<'name/acknowledged'>> = {
  severity: ({ why }) => (why === 'not-there' ? 'warning' : 'error'),
  fixes: (fact) =>
    fact.why === 'not-there'
      ? [{ title: 'Remove this line', preferred: true, edits: [{ place: fact.line, newText: '' }] }]
      : [],
  message: ({ why, acknowledged }) => {
    switch (why) {
      case 'not-a-hazard':
        return `${quoted(acknowledged)} is not a hazard, and only hazards can be acknowledged. Mend what is found, or remove this line.`;
      case 'unknown-code':
        return `No hazard has the code ${quoted(acknowledged)}. Completion lists those there are.`;
      case 'not-there':
        return `${quoted(acknowledged)} is not found here, or no longer: this line accepts nothing. Remove it.`;
      case 'no-reason':
        return `The reason is missing. Say why ${quoted(acknowledged)} is in order here, in quotes: \`acknowledge ${acknowledged}: "…"\`.`;
    }
  },
};
