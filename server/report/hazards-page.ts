// The hazard rules as a page: code by code what it says, and each rule with what happens, what mends it and its source.
// Made from the rules' own words, so that a rule is written once. Knows no scenario.

import { hazardCodes, hazardRuleWords } from '../scenario/hazard-fact.ts';

const causes = {
  alone: 'of the substance itself',
  storage: 'of how it is stored',
  meeting: 'of what it meets',
} as const;

export function hazardsPage(command: string): string {
  const lines = [
    `<!-- Written by \`${command}\` from the program's own rules. -->`,
    '',
    '# Hazards',
    '',
    'What the rules look at in a blend or oxidant, code by code. Screening only: rules name families of substances, and',
    'what they do not know they do not tell. An empty list of findings says which rules were looked at and that none fired;',
    'it never says that a blend is safe. Follow the safety data sheet, class, flag and local rules; a competent person',
    'approves the design. Numbers are per kilogram of the blend and upper bounds.',
    '',
    'A blend without a `blanket` is taken to have air over it, as a vented tank has. What rests on that guess alone is a',
    'warning, not an error: a blend that is still being written down should not stop a run for a tank nobody has spoken of.',
    'Write `blanket: air` and it is an error where it is one, or write the gas that is really there.',
    '',
    'A fuel that another definition names without a blend (`fuel: sodium`) is told there, by what it is alone, for nothing is',
    'said of how it is kept. A blend is told where it is defined, once, however many definitions burn it.',
    '',
    'A code is accepted with a reason inside its definition: `acknowledge hazard/water-reactive: "closed tanks; note 7"`.',
  ];
  for (const [code, { cause, says }] of Object.entries(hazardCodes)) {
    lines.push('', `## \`${code}\``, '', `${says} A hazard ${causes[cause]}.`, '');
    for (const rule of hazardRuleWords.filter((one) => one.code === code)) {
      lines.push(`- ${rule.happens} ${rule.mend} Source: ${rule.source}.`);
    }
  }
  return `${lines.join('\n')}\n`;
}
