// Answers "why?": the working of a figure as short paragraphs, for hovers and reports. What was done and its equation,
// the inputs with the lines they come from, the sources, what was assumed, where it is valid. Works nothing out.
// Invariant: every input of the working is shown, and every source once.

import type { Figure, Place } from '../scenario/scenario.ts';
import type { WorkingInput } from '../scenario/working.ts';
import { assumptionText } from './assumptions.ts';
import { methodText } from './methods.ts';
import { toldText } from './quantities.ts';
import { sentences } from './words.ts';

/** The working of one figure in words; every part may be empty. */
export interface Explanation {
  readonly method: string;
  /** The equation in symbols, or null. */
  readonly equation: string | null;
  /** What the symbols stand for. */
  readonly symbols: string;
  /** One line an input: `density of gas_oil = 850 kg/m³ (line 12)`. */
  readonly inputs: readonly string[];
  readonly assumptions: readonly string[];
  readonly validity: string;
  readonly sources: readonly string[];
}

/** Tells a person where a place is (`line 12`); null where that needs no saying. */
export type TellPlace = (place: Place) => string | null;

/** The working of a figure in words. */
export function explain(figure: Pick<Figure, 'working'>, tellPlace: TellPlace): Explanation {
  const { method, inputs, sources, assumptions } = figure.working;
  const text = methodText(method);
  return {
    method: text.words,
    equation: text.equation,
    symbols: text.symbols,
    inputs: inputs.map((input) => inputLine(input, tellPlace)),
    assumptions: assumptions.map(assumptionText),
    validity: text.validity,
    sources: [...new Set(sources)],
  };
}

/** The same as paragraphs of plain text, the empty ones left out. Lists are one line an item. */
export function explanationParagraphs(explanation: Explanation): string[] {
  const { method, equation, symbols, inputs, assumptions, validity, sources } = explanation;
  const paragraphs = [
    method,
    equation === null ? '' : `${equation}\nwith ${symbols}`,
    inputs.length === 0 ? '' : ['From:', ...inputs.map(item)].join('\n'),
    sentences(...assumptions),
    validity,
    sources.length === 0
      ? ''
      : sources.length === 1
        ? `Source: ${sources[0] ?? ''}`
        : ['Sources:', ...sources.map(item)].join('\n'),
  ];
  return paragraphs.filter((paragraph) => paragraph !== '');
}

function inputLine({ label, quantity, unit, place, source }: WorkingInput, tellPlace: TellPlace): string {
  const value = quantity === null ? 'not known' : toldText(quantity, unit);
  const notes = [place ? tellPlace(place) : null, source].filter((note): note is string => Boolean(note));
  return `${label} = ${value}${notes.length > 0 ? ` (${notes.join('; ')})` : ''}`;
}

function item(text: string): string {
  return `- ${text}`;
}
