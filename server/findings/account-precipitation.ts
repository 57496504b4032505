/**
 * Alkali that would come out of the sea again: magnesium hydroxide and then aragonite where a dissolved alkali makes it very
 * basic, aragonite on its own grains where it comes as particles. Calcium carbonate that precipitates is uptake lost.
 */
import { formatNumber } from '../wording/numbers.ts';
import { sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

type Precipitation = FactOf<'account/precipitation'>;

export const accountPrecipitation: Rule<Precipitation> = {
  severity: 'warning',
  message: (fact) =>
    sentences(
      what(fact),
      'Calcium carbonate that precipitates is lost uptake: each mole takes away two of alkalinity.',
      fact.enough !== null && `A dilution of ${formatNumber(Math.ceil(fact.enough))} would do.`,
    ),
};

function what({ risk, ph, aragoniteSaturation }: Precipitation): string {
  const saturation = `an aragonite saturation of ${formatNumber(aragoniteSaturation)}`;
  switch (risk) {
    case 'runaway':
      return `With particles in it the near field is at ${saturation}: above about 7 aragonite was seen to precipitate on them and to run away, taking more alkalinity than was added. Keep it below 5.`;
    case 'careful':
      return `With particles in it the near field is at ${saturation}: nothing was seen to precipitate up to about 5, and a runaway above about 7. Keep it below 5.`;
    case 'brucite':
      return `The near field is at pH ${formatNumber(ph)}: above about 10 magnesium hydroxide was seen to precipitate within hours, and aragonite after it within a day.`;
    case 'aragonite':
      return `The near field is at ${saturation}: above about 30 aragonite was seen to precipitate from dissolved alkali.`;
  }
}
