// What the program knows of a substance's hazards, in SI, and the closed lists the records and rules share: reactive
// families, forms, extinguishing agents, publishers of exposure limits.
// Knows no rule (what happens when two substances meet), no wording and no record. Flash point, autoignition temperature and
// flammable limits stand on the substance itself, where they always were.
// Invariant: nothing here says that a substance is harmless. An empty list means that nothing is recorded.
// Classes and statement codes are those of the UN GHS, transport entries those of the UN Model Regulations (the IMDG Code
// has the same numbers, names, classes and packing groups).

import type { SourceRecord } from './record.ts';

/**
 * What a substance is when it meets another; a rule names families, never substances. A substance may be in several:
 * ethanolamine is an amine and an alcohol.
 */
export const reactiveFamilies = [
  'alkali-metal',
  'alkali-metal-dispersion',
  'metal-hydride',
  // Reacts with water at room temperature whatever its shape: calcium.
  'alkaline-earth-metal',
  // A powder that burns and that water, caustic or an oxidiser attacks.
  'active-metal-powder',
  // Covered by its own oxide: slow unless powdered, molten, or wet with caustic or chloride.
  'passivated-metal',
  // Aluminium, zinc, silicon: caustic makes hydrogen from them even in one piece.
  'amphoteric-element',
  'water',
  'hydrate',
  'alcohol',
  'organic-acid',
  'mineral-acid',
  'ester',
  'ether',
  'ketone-or-aldehyde',
  'amine',
  'nitro-compound',
  // Decomposes with much heat, and explodes with hydrides and acid chlorides.
  'sulphoxide',
  'hydrocarbon',
  'unsaturated-hydrocarbon',
  'halogenated-solvent',
  'fluoropolymer',
  'oxidiser',
  'oxygen',
  'metal-peroxide',
  'superoxide',
  'halogen',
  'ammonia',
  'ammonium-salt',
  'caustic',
  // Oxides that water turns into caustic or slaked lime with much heat.
  'basic-oxide',
  'carbonate',
  'carbon-dioxide',
  'acid-gas',
  'acid-chloride-salt',
  'peroxide-former',
  'carbide',
  'nitride',
  'sulphide',
  'cyanide',
  'strong-reducer',
  'reducible-oxide',
  'fuel-gas',
  'acetylene',
  'sulphur',
  // Its powder, raised in air, explodes.
  'combustible-dust',
  // May fall apart or polymerise by itself, with much heat.
  'unstable',
  'inert-gas',
  'nitrogen',
] as const;
export type ReactiveFamily = (typeof reactiveFamilies)[number];

/** The shape a class, a transport entry or a reaction is about, where it is not about all of them. */
export const hazardForms = [
  'massive',
  'powder',
  'coated-powder',
  'wetted-powder',
  'molten',
  'dispersion',
  'dispersion-in-flammable-liquid',
  'solution',
  'compressed-gas',
  'liquefied-gas',
  'refrigerated-liquid',
] as const;
export type HazardForm = (typeof hazardForms)[number];

export const extinguishingAgents = [
  'water',
  'water-mist',
  'foam',
  'alcohol-resistant-foam',
  'carbon-dioxide',
  'halogenated-agent',
  'dry-powder-bc',
  'dry-powder-abc',
  'metal-fire-powder',
  'dry-sand',
  'dry-salt',
  'dry-soda-ash',
  'dry-lithium-chloride',
  'graphite',
  'lime',
  'nitrogen',
  'argon',
  'shut-off-the-gas',
] as const;
export type ExtinguishingAgent = (typeof extinguishingAgents)[number];

/** Who publishes an exposure limit. */
export const limitAuthorities = ['NIOSH', 'OSHA', 'ACGIH', 'EU', 'UK HSE', 'Ontario'] as const;
export type LimitAuthority = (typeof limitAuthorities)[number];

/** `eight-hour` is a working day's mean; that of NIOSH holds for up to ten hours. */
export const exposureKinds = ['eight-hour', 'fifteen-minute', 'ceiling', 'immediately-dangerous'] as const;
export type ExposureKind = (typeof exposureKinds)[number];

/** One GHS class with its category and statement: `Water-react.`, `1`, `H260`. The table of classes is ghs.ts. */
export interface HazardClass {
  readonly hazardClass: string;
  readonly category: string;
  readonly statement: string;
  /** Absent: of the substance in any form. */
  readonly form?: HazardForm;
  readonly source: SourceRecord;
}

/** One entry of the dangerous goods list. Of a user's own substance the number alone may be known. */
export interface TransportEntry {
  /** Four digits: 1428. */
  readonly unNumber: number;
  readonly properShippingName?: string;
  /** Class or division: `4.3`. */
  readonly dangerClass?: string;
  readonly subsidiary: readonly string[];
  /** Absent where the class has none (gases). */
  readonly packingGroup?: 'I' | 'II' | 'III';
  readonly form?: HazardForm;
  /** Of the substance in its solution, where the entry is for a range of strengths; `to` is left out where it is open. */
  readonly massFraction?: { readonly from: number; readonly to?: number };
  readonly source: SourceRecord;
}

/** What liquid water does to it at room temperature. */
export interface WaterReaction {
  /** Formulas of the gases given off, none where it is heat alone. */
  readonly gases: readonly string[];
  /** `violent`: at once and hot enough to set the gas alight or to splash; `slow`: hours, or only when warm. */
  readonly pace: 'violent' | 'brisk' | 'slow';
  readonly form?: HazardForm;
  readonly source: SourceRecord;
}

/** Takes fire in air at room temperature by itself. */
export interface Pyrophoric {
  readonly form?: HazardForm;
  readonly source: SourceRecord;
}

/** The least oxygen in the mixture with which a flame still passes, at 25 °C and 1 atm. */
export interface LimitingOxygen {
  readonly inert: 'nitrogen' | 'carbon-dioxide';
  /** mol O2 per mol of mixture. */
  readonly moleFraction: number;
  readonly source: SourceRecord;
}

/** A concentration in the air of a workplace; a gas has a mole fraction, a dust or mist a mass concentration. */
export interface ExposureLimit {
  readonly authority: LimitAuthority;
  readonly kind: ExposureKind;
  /** mol per mol of air; the source's own number, in parts per million there. */
  readonly moleFraction?: number;
  /** kg per m³ of air at 25 °C and 1 atm (20 °C in EU and UK lists). */
  readonly kgPerM3?: number;
  /** Where the limit is not of the substance in general: `respirable dust`, `as V, fume`. */
  readonly measuredAs?: string;
  readonly source: SourceRecord;
}

export interface Extinguishing {
  readonly right: readonly ExtinguishingAgent[];
  readonly wrong: readonly ExtinguishingAgent[];
  readonly source: SourceRecord;
}

export interface Hazards {
  readonly classes: readonly HazardClass[];
  readonly transport: readonly TransportEntry[];
  readonly families: readonly ReactiveFamily[];
  readonly withWater: readonly WaterReaction[];
  readonly pyrophoric?: Pyrophoric;
  readonly limitingOxygen: readonly LimitingOxygen[];
  readonly exposure: readonly ExposureLimit[];
  readonly extinguishing?: Extinguishing;
}

/** Of a substance nothing is recorded for; not a statement that it is harmless. */
export const nothingRecorded: Hazards = {
  classes: [],
  transport: [],
  families: [],
  withWater: [],
  limitingOxygen: [],
  exposure: [],
};
