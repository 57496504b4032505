// Tells what a portion comes to: its share by mass, by amount, by volume and of the heating value, then what is known of
// the substance. A share that could not be had is left out. Works nothing out.
import type { EvaluatedDefinition, LineResult, Place, Shares } from '../scenario/scenario.ts';
import { formatPercent } from '../wording/numbers.ts';
import { cardLines, cardTitle } from './hover-card.ts';
import type { HoverText } from './hover-text.ts';

export function hoverPortion(
  place: Place,
  definition: EvaluatedDefinition,
  { material, shares }: Extract<LineResult, { kind: 'portion' }>,
): HoverText {
  const [first, ...others] = shareTexts(shares);
  const of = definition.name === '' ? `this ${definition.kind}` : definition.name;
  return {
    place,
    title: first === undefined ? cardTitle(material) : `${first}: ${material.name} in ${of}`,
    origin: others.length > 0 ? others.join(', ') : null,
    lines: [...(first === undefined ? [] : [{ sentence: cardTitle(material) }]), ...cardLines(material)],
  };
}

function shareTexts(shares: Shares): string[] {
  const bases = [
    [shares.mass, 'by mass'],
    [shares.mole, 'by mole'],
    [shares.volume, 'by volume'],
    [shares.energy, 'of the lower heating value'],
  ] as const;
  return bases.flatMap(([share, basis]) => (share === null ? [] : [`${formatPercent(share)} ${basis}`]));
}
