// Tells a figure that a reference stands for: its value, whose it is and how it came about, then inputs, assumptions and
// sources, as many as a person reads in a hover; the whole working is told elsewhere. Works nothing out.
import type { Figure, Place } from '../scenario/scenario.ts';
import { explain, type TellPlace } from '../wording/explain.ts';
import { counted } from '../wording/words.ts';
import { figureText } from '../wording/quantities.ts';
import { shortened, type HoverLine, type HoverText } from './hover-text.ts';

const MOST_INPUTS = 5;
const MOST_ASSUMPTIONS = 2;
const MOST_SOURCES = 2;

export function hoverFigure(place: Place, of: string, figure: Figure, tell: TellPlace): HoverText {
  const { method, inputs, assumptions, sources } = explain(figure, tell);
  const lines: HoverLine[] = [
    ...cut(inputs, MOST_INPUTS, 'input').map(asSentence),
    ...assumptions.slice(0, MOST_ASSUMPTIONS).map(asSentence),
    ...cut(sources, MOST_SOURCES, 'source').map((source) => ({ label: 'Source', text: shortened(source, 160) })),
  ];
  return {
    place,
    title: `${figureText(figure)}: ${figure.label}${of === '' ? '' : `, ${of}`}`,
    origin: method,
    lines,
  };
}

function asSentence(text: string): HoverLine {
  return { sentence: shortened(text) };
}

function cut(items: readonly string[], most: number, noun: string): readonly string[] {
  if (items.length <= most) return items;
  return [...items.slice(0, most), `and ${counted(items.length - most, `more ${noun}`)}`];
}
