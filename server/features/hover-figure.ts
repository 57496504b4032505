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
    ...inputs.slice(0, MOST_INPUTS).map(asSentence),
    ...more(inputs.length - MOST_INPUTS, 'input'),
    ...assumptions.slice(0, MOST_ASSUMPTIONS).map(asSentence),
    ...sources.slice(0, MOST_SOURCES).map((source) => ({ label: 'Source', text: shortened(source, 160) })),
    ...more(sources.length - MOST_SOURCES, 'source'),
  ];
  return {
    place,
    title: `${figureText(figure)}: ${figure.label}${of === '' ? '' : ` (${of})`}`,
    origin: method,
    lines,
  };
}

function asSentence(text: string): HoverLine {
  return { sentence: shortened(text) };
}

function more(count: number, noun: string): HoverLine[] {
  return count > 0 ? [{ sentence: `and ${counted(count, `more ${noun}`)}` }] : [];
}
