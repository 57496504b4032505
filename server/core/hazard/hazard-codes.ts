// The hazard codes: what each says in a sentence, and whether one portion (or the blend as a whole) earns it alone or only
// by what it meets or how it is kept.
// Knows no rule and no substance. Invariant: a code is one kind of cause, so that acknowledging it accepts one kind of risk.

/** `alone`: by what a portion or the blend is · `storage`: by how it is kept · `meeting`: by what is beside it. */
export type HazardCause = 'alone' | 'storage' | 'meeting';

export type HazardSeverity = 'error' | 'warning' | 'information';

export interface HazardCodeRecord {
  readonly cause: HazardCause;
  readonly says: string;
}

export const hazardCodes = {
  'hazard/water-reactive': {
    cause: 'alone',
    says: 'A portion reacts with water: it gives off a gas that burns or poisons, or much heat.',
  },
  'hazard/pyrophoric': { cause: 'alone', says: 'A portion takes fire in air by itself.' },
  'hazard/unstable': {
    cause: 'alone',
    says: 'A portion can decompose or polymerise by itself, with heat; worse where it is warm or meets a catalyst.',
  },
  'hazard/oxidiser': { cause: 'alone', says: 'A portion makes other things burn without air.' },
  'hazard/peroxide-former': {
    cause: 'alone',
    says: 'A portion forms explosive peroxides where air reaches it; without air it is information.',
  },
  'hazard/toxic': { cause: 'alone', says: 'The blend is acutely toxic by its portions’ classes.' },
  'hazard/combustible-dust': { cause: 'alone', says: 'A dry solid whose dust burns or explodes in air.' },
  'hazard/low-flash-point': {
    cause: 'alone',
    says: 'A fuel gas, or a liquid that flashes below 60 °C: rules of its own apply aboard ship.',
  },
  'hazard/molten-metal': { cause: 'storage', says: 'A metal is kept above its melting point.' },
  'hazard/near-flash-point': {
    cause: 'storage',
    says: 'An oil is kept within 10 K of its flash point with air above it.',
  },
  'hazard/flammable-range': {
    cause: 'storage',
    says: 'The gas over a liquid, or the gas itself, is inside its flammable range (warning: above it).',
  },
  'hazard/above-autoignition': {
    cause: 'storage',
    says: 'It is kept above the temperature at which it takes fire in air.',
  },
  'hazard/oxygen-enriched': {
    cause: 'storage',
    says: 'More oxygen than in air, or walls so cold that air condenses on them.',
  },
  'hazard/blanket': { cause: 'storage', says: 'The gas over it reacts with a portion, or is absorbed by it.' },
  'hazard/superoxide': {
    cause: 'storage',
    says: 'Potassium or its alloy where oxygen reaches it: a superoxide crust that explodes with metal and oil.',
  },
  'hazard/water-in-contact': { cause: 'meeting', says: 'Water beside a portion that reacts with it.' },
  'hazard/metal-and-alcohol': { cause: 'meeting', says: 'A reactive metal or hydride beside an alcohol: hydrogen.' },
  'hazard/metal-and-acid': {
    cause: 'meeting',
    says: 'A metal or hydride, or a wall of one, beside an acid: hydrogen.',
  },
  'hazard/metal-and-carbonyl': {
    cause: 'meeting',
    says: 'A reactive metal or hydride beside an ester, a fat, a ketone or an aldehyde.',
  },
  'hazard/metal-and-halogen': {
    cause: 'meeting',
    says: 'A reactive metal beside a halogen, a halogenated solvent or a fluoropolymer.',
  },
  'hazard/metal-and-caustic': {
    cause: 'meeting',
    says: 'Aluminium, zinc, silicon or a galvanised wall beside caustic: hydrogen.',
  },
  'hazard/fuel-and-oxidiser': { cause: 'meeting', says: 'Something that burns beside an oxidiser, in one tank.' },
  'hazard/ammonia-and-halogen': { cause: 'meeting', says: 'Ammonia or its salts beside chlorine: explosive halides.' },
  'hazard/ammonia-and-copper': {
    cause: 'meeting',
    says: 'Ammonia beside copper, zinc or their alloys (it cracks them) or mercury (it explodes).',
  },
  'hazard/acetylide': { cause: 'meeting', says: 'Acetylene beside copper, silver or mercury.' },
  'hazard/acid-and-base': { cause: 'meeting', says: 'An acid beside a base: heat.' },
  'hazard/acid-makes-gas': {
    cause: 'meeting',
    says: 'An acid beside a carbonate, sulphide, sulphite or cyanide: gas, some of it deadly.',
  },
  'hazard/caustic-makes-gas': { cause: 'meeting', says: 'Caustic beside an ammonium salt: ammonia.' },
  'hazard/caustic-and-ester': { cause: 'meeting', says: 'Caustic beside an ester or a fat: soap and heat.' },
  'hazard/reactive-pair': {
    cause: 'meeting',
    says: 'Two portions that no other code names, but that react by their chemistry.',
  },
  'hazard/extinguishing': {
    cause: 'meeting',
    says: 'An extinguishing agent that feeds or spreads the fire of a portion.',
  },
} as const satisfies Readonly<Record<string, HazardCodeRecord>>;

export type HazardCode = keyof typeof hazardCodes;

export function isHazardCode(text: string): text is HazardCode {
  return Object.hasOwn(hazardCodes, text);
}
