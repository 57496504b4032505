// The shape of the hand-kept hazard records under data/hazards/, as the JSON files are written: trade units, one record a
// substance, named as in data/substances/. Types only: the schema that checks the files is hazard-schema.ts.
// Every fact names its source by an id of data/hazards/sources.json. Flash point, autoignition temperature and flammable
// limits are kept in the substance's own record and never here.

import type {
  ExposureKind,
  ExtinguishingAgent,
  HazardForm,
  LimitAuthority,
  LimitingOxygen,
  ReactiveFamily,
  WaterReaction,
} from './hazards.ts';

export interface ClassesRecord {
  readonly source: string;
  readonly form?: HazardForm;
  /** Each as class, category and statement code with blanks between: `Water-react. 1 H260`, `STOT SE 3 H335`. */
  readonly all: readonly string[];
}

export interface TransportRecord {
  readonly unNumber: number;
  readonly properShippingName: string;
  readonly dangerClass: string;
  readonly subsidiary?: readonly string[];
  readonly packingGroup?: 'I' | 'II' | 'III';
  readonly form?: HazardForm;
  /** From and to, per cent by mass. */
  readonly massPercent?: readonly [number] | readonly [number, number];
  readonly source: string;
}

export interface ExposureRecord {
  readonly authority: LimitAuthority;
  readonly kind: ExposureKind;
  readonly ppm?: number;
  readonly mgPerM3?: number;
  readonly measuredAs?: string;
  readonly source: string;
}

export interface HazardRecord {
  /** The name of a substance of the catalogue. */
  readonly name: string;
  readonly families?: readonly ReactiveFamily[];
  readonly classes?: readonly ClassesRecord[];
  readonly transport?: readonly TransportRecord[];
  readonly withWater?: readonly (Omit<WaterReaction, 'source'> & { readonly source: string })[];
  readonly pyrophoric?: { readonly form?: HazardForm; readonly source: string };
  /** Per cent by volume in the mixture. */
  readonly limitingOxygen?: readonly {
    readonly inert: LimitingOxygen['inert'];
    readonly percent: number;
    readonly source: string;
  }[];
  readonly exposure?: readonly ExposureRecord[];
  readonly extinguishing?: {
    readonly right: readonly ExtinguishingAgent[];
    readonly wrong: readonly ExtinguishingAgent[];
    readonly source: string;
  };
}
