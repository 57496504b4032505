/**
 * A hazard that the rules know: of a portion by itself, of how the blend is kept, or of what meets in it. It is screening
 * by families of substances, not a test. What is in order for a reason is acknowledged with that reason:
 * `acknowledge hazard/…: "…"`. Its numbers are per kilogram of the blend and upper bounds, as if all that can react does.
 */
import { hazardCodes, type HazardCode, type HazardFact } from '../scenario/hazard-fact.ts';
import { formatNumber, formatPercent } from '../wording/numbers.ts';
import { listed, quoted, sentences } from '../wording/words.ts';
import type { Rule } from './rule.ts';

const hazard: Rule<HazardFact> = {
  severity: ({ severity }) => severity,
  message: (fact) =>
    sentences(`${whoMeets(fact)}: ${lower(fact.happens)}`, numbersText(fact), fact.mend, `Source: ${fact.source}.`),
  related: ({ partnerPlace, partner, portion }) => {
    if (partnerPlace === null) return [];
    const name = partner?.kind === 'portion' ? partner.name : (portion ?? '');
    return [{ place: partnerPlace, message: `${quoted(name)} is here` }];
  },
  fixes: ({ mends }) =>
    mends.map(({ title, preferred, place, newText }) => ({ title, preferred, edits: [{ place, newText }] })),
};

/** One rule serves every hazard code. */
export const hazardRules = Object.fromEntries(Object.keys(hazardCodes).map((code) => [code, hazard])) as Readonly<
  Record<HazardCode, Rule<HazardFact>>
>;

function whoMeets({ portion, partner, blend }: HazardFact): string {
  const own = portion === null ? quoted(blend) : quoted(portion);
  switch (partner?.kind) {
    case undefined:
      return own;
    case 'portion':
      return `${own} with ${quoted(partner.name)}`;
    case 'gas': {
      const share = partner.moleShare > 0.999 ? '' : ` (${formatPercent(partner.moleShare)})`;
      return partner.assumed ? `${own} under air, as no blanket is given` : `${own} under ${partner.formula}${share}`;
    }
    case 'contact':
      return `${own} in ${partner.material.replaceAll('-', ' ')}`;
    case 'agent':
      return `${own} and ${partner.agent.replaceAll('-', ' ')}`;
  }
}

function numbersText({ numbers }: HazardFact): string | null {
  const { heatJPerKg, riseK, gasMolPerKg = {}, overLowerLimit, vapourShare, limitK, flashPointK } = numbers;
  const made = [
    ...Object.entries(gasMolPerKg).map(([gas, mol]) => `${formatNumber(mol * litresPerMol, 'people', 3)} L of ${gas}`),
    ...(heatJPerKg === undefined ? [] : [`${formatNumber(heatJPerKg / 1000, 'people', 3)} kJ`]),
  ];
  const warming = riseK === undefined ? '' : ` (${formatNumber(riseK, 'people', 2)} K of warming)`;
  const text = sentences(
    made.length > 0 && `Up to ${listed(made)} per kg of the blend${warming}.`,
    overLowerLimit !== undefined &&
      vapourShare !== undefined &&
      `The gas holds ${formatNumber(vapourShare * 100, 'people', 2)} % vapour, ${formatNumber(overLowerLimit, 'people', 2)} times its lower limit.`,
    flashPointK !== undefined && `It flashes at about ${celsius(flashPointK)}.`,
    limitK !== undefined && `The limit is ${celsius(limitK)}.`,
  );
  return text === '' ? null : text;
}

function celsius(temperatureK: number): string {
  return `${formatNumber(temperatureK - celsiusZeroK, 'people', 3)} °C`;
}

const celsiusZeroK = 273.15;

/** At 25 °C and 1 bar. */
const litresPerMol = 24.78957;

function lower(text: string): string {
  return /^[A-Z][a-z]/.test(text) ? text.charAt(0).toLowerCase() + text.slice(1) : text;
}
