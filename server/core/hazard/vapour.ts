// Vapour over a liquid blend against its flammable range: vapour pressures, lower limits at a temperature, the sum of both
// over the vapours, the flash point where that sum reaches 1, and the oxygen without which none of it burns.
// Knows no gas blend (gas-mixtures.ts) and no rule. Invariant: a pure liquid's sum is 1 exactly at its own flash point.
// Method: each vapour pressure is the line in ln p over 1/T through lower limit at the flash point and 1 atm at the boiling
// point; Raoult's law within a layer, with van Laar's coefficients for water with the common alcohols and acetone; water and
// polar liquids on one side and oils on the other exert their pressures side by side, as if they did not mix, which errs
// towards danger. Limits add up by Le Chatelier's rule (1891); the lower one falls with temperature by Burgess and Wheeler
// as Zabetakis 1965 writes it (0.75 kcal/mol over the heat of combustion), for vapours of C, H and O only; the upper one is
// taken as it is. Boiling point of a technical fuel: from its flash point, Riazi and Daubert 1987; its molar mass: that of
// the n-alkane that boils there. All four from memory.

import { oxygenDemand } from '../balance/stoichiometry.ts';
import { isIn, liquids } from './store.ts';
import type { Store, StoredPortion } from './store.ts';

export interface Ullage {
  /** Vapour over the lower limit of its mixture. */
  readonly overLowerLimit: number;
  /** Vapour over its upper limit; null where one is not known. */
  readonly overUpperLimit: number | null;
  /** mol of flammable vapour per mol of gas. */
  readonly vapourShare: number;
  readonly limitingOxygenShare: number;
}

export const atmospherePa = 101325;
const referenceK = 298.15;
/**
 * Lower limit of heavy oils' vapour, where none is recorded (common practice: 0.6 to 0.8 %). It nearly drops out of what is told,
 * as the line of vapour pressure starts from it at the flash point.
 */
const oilLowerLimit = 0.007;
/** Oxygen below which tanks count as inert where no better number is known: 8 % by volume, as of cargo tanks. */
const usualLimitingOxygen = 0.08;

/** Vapours of the liquids at a temperature (the stored one if not given); null where none of them can burn. */
export function ullageOf(store: Store, temperatureK: number = store.temperatureK): Ullage | null {
  const vapours = sharesAt(vapoursOf(store), temperatureK, store.pressurePa);
  if (vapours.length === 0) return null;
  const vapourShare = vapours.reduce((sum, { share }) => sum + share, 0);
  const uppers = vapours.map(({ portion, share }) => {
    const upper = portion.flammableLimits?.upper ?? null;
    return upper === null ? null : share / upper;
  });
  return {
    overLowerLimit: overLowerOf(vapours),
    overUpperLimit: uppers.reduce(
      (sum, part) => (sum === null || part === null ? null : sum + part),
      0 as number | null,
    ),
    vapourShare: Math.min(1, vapourShare),
    limitingOxygenShare: limitingOxygenOf(vapours.map(({ portion, share }) => ({ portion, moleShare: share }))),
  };
}

/** The vapours over the liquids as one fuel in air: limits by Le Chatelier's rule, each vapour's share without the gas. */
export interface VapourLimits {
  readonly lower: number;
  /** Null where the upper limit of one is not known. */
  readonly upper: number | null;
  readonly limitingOxygenShare: number;
  readonly vapours: readonly {
    readonly portion: StoredPortion;
    readonly moleShare: number;
    /** At the temperature asked for. */
    readonly lower: number;
    /** No limit of its own is recorded: it is that of heavy oils. */
    readonly isUsual: boolean;
  }[];
}

/** Of the vapours at a temperature (the stored one if not given); null where none of them can burn. */
export function vapourLimitsOf(store: Store, temperatureK: number = store.temperatureK): VapourLimits | null {
  const vapours = sharesAt(vapoursOf(store), temperatureK, store.pressurePa);
  const total = vapours.reduce((sum, { share }) => sum + share, 0);
  if (!(total > 0)) return null;
  const parts = vapours.map(({ portion, share, lower }) => ({
    portion,
    moleShare: share / total,
    lower,
    isUsual: portion.flammableLimits === null,
  }));
  const overUpper = parts.reduce<number | null>((sum, { portion, moleShare }) => {
    const upper = portion.flammableLimits?.upper ?? null;
    return sum === null || upper === null ? null : sum + moleShare / upper;
  }, 0);
  return {
    lower: 1 / parts.reduce((sum, { moleShare, lower }) => sum + moleShare / lower, 0),
    upper: overUpper === null ? null : 1 / overUpper,
    limitingOxygenShare: limitingOxygenOf(parts),
    vapours: parts,
  };
}

/** Where the vapours together reach their lower limit, K; null where nothing in the blend has a flash point. */
export function flashPointK(store: Store): number | null {
  const known = flashOf.get(store);
  if (known !== undefined) return known;
  const flash = searchFlashPointK(store);
  flashOf.set(store, flash);
  return flash;
}

const flashOf = new WeakMap<Store, number | null>();

function searchFlashPointK(store: Store): number | null {
  const [only, ...others] = liquids(store);
  if (only !== undefined && others.length === 0) return only.flashPointK;
  const vapours = vapoursOf(store);
  const over = (temperatureK: number): number => overLowerOf(sharesAt(vapours, temperatureK, atmospherePa));
  let lowK = 150;
  let highK = 700;
  if (!(over(lowK) < 1 && over(highK) >= 1)) return null;
  while (highK - lowK > 1e-2) {
    const middleK = (lowK + highK) / 2;
    if (over(middleK) >= 1) highK = middleK;
    else lowK = middleK;
  }
  return highK;
}

/** The lower limit at a temperature; it falls by Burgess and Wheeler where the vapour is of C, H and O alone. */
export function lowerLimitAt(portion: StoredPortion, lower: number, temperatureK: number): number {
  const isOrganic = [...portion.molPerKg.keys()].every((symbol) => ['C', 'H', 'O'].includes(symbol));
  if (!isOrganic || !portion.molPerKg.has('C')) return lower;
  const heatJPerMol = netHeatJPerMol(portion);
  const slopePerK = heatJPerMol === null ? usualSlopePerK * lower : burgessWheelerJPerMol / heatJPerMol;
  const warmerK = temperatureK - (portion.flammableLimits?.temperatureK ?? referenceK);
  return Math.max(lower - slopePerK * warmerK, lower / 10);
}

/** 0.75 kcal/mol and per cent, in J/mol and shares. */
const burgessWheelerJPerMol = 0.0075 * 4184;
/** The same for the usual 1040 kcal per mol and per cent of lower limit, where a heat is missing. */
const usualSlopePerK = 0.000721;

/** Net heat of combustion of a vapour's molecule; enthalpies of formation of CO2 and H2O(g) by Chase 1998. */
function netHeatJPerMol(portion: StoredPortion): number | null {
  const { molarMassKgPerMol: molarMass, formationEnthalpyJPerKg: enthalpy, molPerKg } = portion;
  if (molarMass === null || enthalpy === null) return null;
  const perKg = enthalpy + 393522 * (molPerKg.get('C') ?? 0) + (241826 / 2) * (molPerKg.get('H') ?? 0);
  return perKg > 0 ? perKg * molarMass : null;
}

/**
 * Limiting oxygen of vapours together, each weighed by its amount; for one without a record the oxygen that burns its lower
 * limit to the end (Crowl and Louvar), or 8 %.
 */
export function limitingOxygenOf(
  vapours: readonly { readonly portion: StoredPortion; readonly moleShare: number }[],
): number {
  let sum = 0;
  let needed = 0;
  for (const { portion, moleShare } of vapours) {
    sum += moleShare;
    needed += moleShare / limitingOxygen(portion);
  }
  return needed > 0 ? sum / needed : usualLimitingOxygen;
}

function limitingOxygen(portion: StoredPortion): number {
  const recorded = portion.hazards.limitingOxygen.find(({ inert }) => inert === 'nitrogen');
  if (recorded !== undefined) return recorded.moleFraction;
  const lower = portion.flammableLimits?.lower;
  const { molarMassKgPerMol } = portion;
  if (lower === undefined || molarMassKgPerMol === null) return usualLimitingOxygen;
  return Math.min(lower * oxygenDemand(portion.molPerKg).molPerKg * molarMassKgPerMol, usualMostLimitingOxygen);
}

/** No estimate is trusted above what is measured of hydrocarbons. */
const usualMostLimitingOxygen = 0.12;

interface Vapour {
  readonly portion: StoredPortion;
  readonly pressurePa: (temperatureK: number) => number;
  readonly lower: number;
  /** Mole fraction times activity coefficient in its own layer. */
  readonly activity: number;
}

/** Each vapour's mole share and lower limit at a temperature and pressure. */
function sharesAt(
  vapours: readonly Vapour[],
  temperatureK: number,
  pressurePa: number,
): readonly { readonly portion: StoredPortion; readonly share: number; readonly lower: number }[] {
  return vapours.map(({ portion, activity, pressurePa: own, lower }) => ({
    portion,
    share: (activity * own(temperatureK)) / pressurePa,
    lower: lowerLimitAt(portion, lower, temperatureK),
  }));
}

function overLowerOf(vapours: readonly { readonly share: number; readonly lower: number }[]): number {
  return vapours.reduce((sum, { share, lower }) => sum + share / lower, 0);
}

/** Worked out once a store: its rules ask for them several times. */
function vapoursOf(store: Store): readonly Vapour[] {
  const known = vapoursOfStore.get(store);
  if (known !== undefined) return known;
  const vapours = workOutVapours(store);
  vapoursOfStore.set(store, vapours);
  return vapours;
}

const vapoursOfStore = new WeakMap<Store, readonly Vapour[]>();

function workOutVapours(store: Store): readonly Vapour[] {
  const all = liquids(store);
  const holdsWater = all.some((portion) => isIn(portion, 'water'));
  const layers = [
    all.filter((portion) => isPolar(portion, holdsWater)),
    all.filter((portion) => !isPolar(portion, holdsWater)),
  ];
  const everything = all.reduce((sum, portion) => sum + molOf(portion), 0);
  return layers.flatMap((layer) => {
    const mols = layer.map(molOf);
    const total = mols.reduce((sum, mol) => sum + mol, 0);
    const water = layer.reduce((sum, one, index) => sum + (isIn(one, 'water') ? (mols[index] ?? 0) / total : 0), 0);
    return layer.flatMap((portion, index): Vapour[] => {
      const curve = vapourCurve(portion);
      if (curve === null) return [];
      const share = (mols[index] ?? 0) / total;
      const inLayer = share * activityInWater(portion, share, water);
      // A trace dissolves in the other layer, and then exerts less than a layer of its own would.
      const dissolved = (mostActivity * (mols[index] ?? 0)) / everything;
      return [{ portion, ...curve, activity: Math.min(inLayer, dissolved) }];
    });
  });
}

/** Activity coefficient of a trace of alcohol in oil: 30 to 60 are measured. */
const mostActivity = 60;

/** What goes with water rather than with oil. Ketones and small ethers go with whatever there is. */
function isPolar(portion: StoredPortion, besideWater: boolean): boolean {
  if (isIn(portion, 'water', 'caustic', 'mineral-acid', 'strong-reducer', 'amine')) return true;
  if (isIn(portion, 'oxidiser') && !portion.molPerKg.has('C')) return true;
  const isSmall = portion.molarMassKgPerMol !== null && portion.molarMassKgPerMol < largestPolarKgPerMol;
  if (isIn(portion, 'alcohol', 'organic-acid')) return isSmall;
  return besideWater && isSmall && isIn(portion, 'ketone-or-aldehyde', 'ether');
}

/** Butanol and glycerol are below; fatty alcohols and acids, which are oils, above. */
const largestPolarKgPerMol = 0.1;

function molOf(portion: StoredPortion): number {
  const { molarMassKgPerMol, boilingPointK, flashPointK: flash, massShare } = portion;
  if (molarMassKgPerMol !== null) return massShare / molarMassKgPerMol;
  // Lye, seawater and the like count as the water they are made of.
  if (isIn(portion, 'water')) return (massShare * (portion.molPerKg.get('H') ?? 0)) / 2;
  const boilingK = boilingPointK ?? (flash === null ? null : boilingOfFlash(flash));
  return massShare / (boilingK === null ? 0.3 : alkaneKgPerMol(boilingK));
}

/** Van Laar's constants A12 and A21 with water as the second, on natural logarithms; the rest are taken as ideal. */
const vanLaarWithWater: Readonly<Partial<Record<string, readonly [number, number]>>> = {
  CH3OH: [0.8041, 0.5619],
  C2H5OH: [1.6798, 0.9227],
  '(CH3)2CHOH': [2.3319, 1.1063],
  CH3CH2CH2OH: [2.9095, 1.1572],
  CH3COCH3: [2.04, 1.5461],
};

function activityInWater(portion: StoredPortion, share: number, water: number): number {
  const constants = vanLaarWithWater[portion.formula?.text ?? ''];
  if (constants === undefined || water <= 0 || share <= 0) return 1;
  const [a12, a21] = constants;
  return Math.exp(a12 / (1 + (a12 * share) / (a21 * water)) ** 2);
}

function vapourCurve(portion: StoredPortion): Pick<Vapour, 'pressurePa' | 'lower'> | null {
  const { flashPointK: flash, boilingPointK, flammableLimits } = portion;
  const lower = flammableLimits?.lower ?? oilLowerLimit;
  if (flash === null) {
    if (flammableLimits === null || boilingPointK === null) return null;
    // Trouton's rule: 88 J/(mol K) to vaporise.
    const pressurePa = (temperatureK: number): number =>
      atmospherePa * Math.exp(10.6 * (1 - boilingPointK / temperatureK));
    return { pressurePa, lower };
  }
  const boilingK = boilingPointK ?? boilingOfFlash(flash);
  const atFlash = lowerLimitAt(portion, lower, flash);
  const slopeK = Math.log(1 / atFlash) / (1 / flash - 1 / boilingK);
  return {
    pressurePa: (temperatureK) => atmospherePa * atFlash * Math.exp(slopeK * (1 / flash - 1 / temperatureK)),
    lower,
  };
}

/** Where a tenth of a petroleum fraction has boiled, from its flash point, K: 1/T_f = a + b/T + c ln T, solved for T. */
function boilingOfFlash(flash: number): number {
  let lowK = flash;
  let highK = 1200;
  for (let step = 0; step < 60; step += 1) {
    const middleK = (lowK + highK) / 2;
    const inverse = -0.024209 + 2.84947 / middleK + 3.4254e-3 * Math.log(middleK);
    if (1 / inverse < flash) lowK = middleK;
    else highK = middleK;
  }
  return (lowK + highK) / 2;
}

/** Molar mass of the n-alkane with that boiling point: T_b = 1070 - exp(6.98291 - 0.02013 M^(2/3)), M in g/mol. */
function alkaneKgPerMol(boilingK: number): number {
  const power = (6.98291 - Math.log(1070 - Math.min(boilingK, 1000))) / 0.02013;
  return Math.max(power, 1) ** 1.5 / 1000;
}
