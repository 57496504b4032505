// A small closed set of unit words for tests of the grammar, which must not depend on the real table of units.
const UNIT_WORDS: ReadonlySet<string> = new Set(
  (
    'g kg t mg umol mol mmol kmol m mm km cm s min h d year years J kJ MJ kWh MWh W kW MW Pa kPa MPa bar atm uatm ' +
    'K degC degF °C °F % ppm m3 L nmi kn EUR inch V A N µm'
  ).split(' '),
);

/** Whether a word (without its power) is a unit word in the tests. */
export const isTestUnit = (word: string): boolean => UNIT_WORDS.has(word);
