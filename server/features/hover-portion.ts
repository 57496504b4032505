// Tells what a portion comes to: its share by mass, by amount, by volume and of the heating value, then what is known of
// the substance. A share that could not be had is left out. Works nothing out.
import type { EvaluatedDefinition, LineResult, Place, Shares } from '../scenario/scenario.ts';
import type { PortionState } from '../scenario/portion-state.ts';
import { formatPercent } from '../wording/numbers.ts';
import { celsiusText, quantityText } from '../wording/quantities.ts';
import { capitalised } from '../wording/words.ts';
import { cardLines, cardTitle } from './hover-card.ts';
import type { HoverText } from './hover-text.ts';

export function hoverPortion(
  place: Place,
  definition: EvaluatedDefinition,
  { material, shares, state }: Extract<LineResult, { kind: 'portion' }>,
): HoverText {
  const [first, ...others] = shareTexts(shares);
  const of = definition.name === '' ? `this ${definition.kind}` : definition.name;
  return {
    place,
    title: first === undefined ? cardTitle(material) : `${first}: ${material.name} in ${of}`,
    origin: others.length > 0 ? others.join(', ') : null,
    lines: [
      ...(first === undefined ? [] : [{ sentence: cardTitle(material) }]),
      ...(state ? [{ sentence: stateText(state) }] : []),
      ...cardLines(material),
    ],
  };
}

/** `Solid at 20 °C, 200 kg/m³ heavier than the liquid around it: it settles unless it is kept moving.` */
function stateText({ phase, temperature, excessDensity }: PortionState): string {
  const where = `${capitalised(phase)} at ${celsiusText(temperature)}`;
  if (!excessDensity || excessDensity.value === 0) return where;
  const [weight, does] = excessDensity.value > 0 ? ['heavier', 'settles'] : ['lighter', 'floats'];
  const by = quantityText({ ...excessDensity, value: Math.abs(excessDensity.value) }, 'kg/m3');
  return `${where}, ${by} ${weight} than the liquid around it: it ${does} unless it is kept moving`;
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
