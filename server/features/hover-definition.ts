// Tells about a definition: its first figure, its kind and name, what its author wrote above it, then its further
// figures. Shows what the evaluation found and works nothing out. Invariant: a definition without figures still says its
// kind and name.
import type { EvaluatedDefinition, Place } from '../scenario/scenario.ts';
import { routeText, screeningText } from '../wording/hazards.ts';
import { formatNumber } from '../wording/numbers.ts';
import { capitalised, listed } from '../wording/words.ts';
import { figureText } from '../wording/quantities.ts';
import { awaitedByBurn, burnLines } from './hover-burn.ts';
import { balanceText } from './hover-equation.ts';
import { shortened, type HoverLine, type HoverText } from './hover-text.ts';
import { leadingFigures } from './leading-figures.ts';

const MOST_FIGURES = 6;
/** A burn's products and fates take the other lines. */
const MOST_BURN_FIGURES = 4;
const MOST_ABSENT = 2;

export function hoverDefinition(place: Place, definition: EvaluatedDefinition): HoverText {
  const [first, ...others] = leadingFigures(definition);
  const what = capitalised(`${definition.kind} ${definition.name}`.trim());
  const doc = shortened(definition.doc);
  const balance = balanceText(definition.tables.find(({ id }) => id === 'elements'));
  const isBurn = definition.kind === 'burn';
  const ofBurn = isBurn ? burnLines(definition) : [];
  const awaited = isBurn ? { awaits: awaitedByBurn(definition) } : {};
  const shown = others.slice(0, ofBurn.length > 0 ? MOST_BURN_FIGURES : MOST_FIGURES);
  const lines: HoverLine[] = [
    ...(balance === null ? [] : [{ sentence: balance }]),
    ...shown.map((figure) => ({ label: figure.label, text: figureText(figure) })),
    ...ofBurn,
    ...slateLines(definition),
    ...outlookLines(definition),
    ...absentLines(definition),
    ...silentLines(definition),
    ...(shown.length < others.length ? [{ sentence: `and ${others.length - shown.length} more figures` }] : []),
  ];
  if (!first) return { place, title: what, origin: doc === '' ? null : doc, lines, ...awaited };
  return {
    place,
    title: `${figureText(first)}: ${first.label}`,
    origin: doc === '' ? what : `${what}. ${doc}`,
    lines,
    ...awaited,
  };
}

/** What the heating values burn to: without it a heating value of an alkali fuel says nothing. */
function slateLines({ tables }: EvaluatedDefinition): HoverLine[] {
  const slate = tables.find(({ id }) => id === 'complete-combustion-products');
  const products = slate?.rows.flatMap(([product, amount]) =>
    typeof product === 'string' && typeof amount === 'number' ? [`${formatNumber(amount)} ${product}`] : [],
  );
  return products && products.length > 0 ? [{ label: 'Burnt to, in mol/kg', text: products.join(', ') }] : [];
}

/** Which code governs it aboard a ship, and what the hazard rules came to. */
function outlookLines({ tables, screening }: EvaluatedDefinition): HoverLine[] {
  const [route] = tables.find(({ id }) => id === 'approval-route')?.rows ?? [];
  return [
    ...(route ? [{ label: 'As a ship’s fuel', text: shortened(routeText(route)) }] : []),
    ...(screening ? [{ sentence: screeningText(screening) }] : []),
  ];
}

/** A definition that is all silent, because what it rests on is amiss, says where to look. */
function silentLines({ figures, absent }: EvaluatedDefinition): HoverLine[] {
  const isSilent = figures.length === 0 && absent.size > 0 && [...absent.values()].every((missing) => missing === null);
  return isSilent
    ? [{ sentence: 'No figures yet: findings here, or in what it names, say what stands in the way.' }]
    : [];
}

/** The first figures that could not be had for want of data, with what is missing. */
function absentLines({ absent }: EvaluatedDefinition): HoverLine[] {
  return (
    [...absent]
      .flatMap(([id, missing]) => (missing && missing.length > 0 ? [{ id, missing }] : []))
      // That a mixture without a molar mass has no molar mass goes without saying.
      .filter(({ id, missing }) => !missing.every((reason) => reason.startsWith(`the ${id.replaceAll('-', ' ')} of `)))
      .slice(0, MOST_ABSENT)
      .map(({ id, missing }) => ({
        label: capitalised(id.replaceAll('-', ' ')),
        text: `not known; missing ${listed(missing)}`,
      }))
  );
}
