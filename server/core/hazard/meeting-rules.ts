// Pairs of portions that react with each other, by families: what happens, how much heat and gas, and how badly.
// Knows neither walls nor the gas over them. Invariant: a pair is named by the first rule of this list that fits it, so the
// order says which cause is told of; what no rule fits is left to chemistry (found-pairs.ts).

import { oxygenDemand } from '../balance/stoichiometry.ts';
import { dissolves, isOxidiser, waterReactionOf } from './alone-rules.ts';
import type { HazardCode, HazardSeverity } from './hazard-codes.ts';
import {
  ammoniaByCaustic,
  burningTogether,
  causticMolPerKg,
  esterMolPerKg,
  gasByAcid,
  neutralisation,
  saponification,
  withCaustic,
  withHydrogen,
  withWater,
} from './reactions.ts';
import { ruleSources } from './rule.ts';
import type { HazardNumbers } from './rule.ts';
import { holdsWater, isIn, isMolten, isPowder, soleElement } from './store.ts';
import type { Store, StoredPortion } from './store.ts';

/** One rule about two portions; `first` is the one the finding stands at. */
export interface MeetingRule {
  readonly id: string;
  readonly code: HazardCode;
  readonly happens: string;
  readonly mend: string;
  readonly source: string;
  readonly first: (portion: StoredPortion, store: Store) => boolean;
  readonly second: (portion: StoredPortion, store: Store, first: StoredPortion) => boolean;
  readonly numbers: (store: Store, first: StoredPortion, second: StoredPortion) => HazardNumbers;
  readonly severity: (
    numbers: HazardNumbers,
    store: Store,
    first: StoredPortion,
    second: StoredPortion,
  ) => HazardSeverity | null;
}

/** From here a reaction is an error: the blend warms by 20 K, or a litre of it gives off some 5 L of gas. */
const greatRiseK = 20;
const greatGasMolPerKg = 0.2;

/** By how far it would warm the blend and how much gas it makes; unknown counts as great. */
export function byAmount({ riseK, gasMolPerKg }: HazardNumbers): HazardSeverity {
  if (riseK === undefined && gasMolPerKg === undefined) return 'error';
  const gas = Object.values(gasMolPerKg ?? {}).reduce((sum, mol) => sum + mol, 0);
  return (riseK ?? 0) >= greatRiseK || gas >= greatGasMolPerKg ? 'error' : 'warning';
}

/** By heat alone; what warms by less than a kelvin is not told. */
function byRise(numbers: HazardNumbers): HazardSeverity | null {
  if (numbers.riseK === undefined) return 'error';
  return numbers.riseK < 1 ? null : numbers.riseK >= greatRiseK ? 'error' : 'warning';
}

const always = (severity: HazardSeverity) => (): HazardSeverity => severity;

const takesHydrogen = (portion: StoredPortion): boolean =>
  isIn(portion, 'alkali-metal', 'metal-hydride', 'alkaline-earth-metal') && portion.phase !== 'gas';

/** Magnesium, aluminium, zinc and iron: what an acid dissolves. Titanium, silicon and boron hold out. */
const acidDissolves = (portion: StoredPortion): boolean =>
  ['Mg', 'Al', 'Zn', 'Fe', 'Ca'].includes(soleElement(portion) ?? '');

/** Strong enough, and of few enough carbon atoms, to attack metals and carbonates in the cold. */
export const isSharpAcid = (portion: StoredPortion): boolean =>
  isIn(portion, 'mineral-acid') ||
  (isIn(portion, 'organic-acid') && portion.molarMassKgPerMol !== null && portion.molarMassKgPerMol < 0.1);

const holdsChloride = (store: Store): boolean =>
  store.portions.some((portion) => portion.molPerKg.has('Cl') && !isIn(portion, 'oxidiser', 'halogenated-solvent'));

/** What burns when an oxidiser is at hand: fuels by family, and organic or elementary matter by its oxygen demand. */
export function burns(portion: StoredPortion): boolean {
  if (isIn(portion, ...fuelFamilies)) return true;
  const element = soleElement(portion);
  if (element !== null) return ['C', 'S', 'P', 'B'].includes(element);
  const { molPerKg } = portion;
  // Urea's carbon is as oxidised as carbonic acid's: only carbon that holds hydrogen feeds a fire.
  const isOrganic =
    molPerKg.has('C') && molPerKg.has('H') && !isIn(portion, 'carbonate', 'water') && holdsCarbonHydrogen(portion);
  return isOrganic && oxygenDemand(molPerKg).molPerKg > leastDemandMolPerKg;
}

function holdsCarbonHydrogen({ formula }: StoredPortion): boolean {
  return formula === null || /C\d*H|HC/.test(formula.text);
}

/** mol O2 per kg: sugar takes 35; what takes less than 5 hardly burns. */
const leastDemandMolPerKg = 5;

const fuelFamilies = [
  'alkali-metal',
  'alkaline-earth-metal',
  'active-metal-powder',
  'passivated-metal',
  'metal-hydride',
  'strong-reducer',
  'hydrocarbon',
  'unsaturated-hydrocarbon',
  'alcohol',
  'ether',
  'ester',
  'ketone-or-aldehyde',
  'organic-acid',
  'amine',
  'fuel-gas',
  'ammonia',
  'carbide',
] as const;

/** Below this heat a kilogram of blend with oxidiser and fuel only warms. */
const fieryJPerKg = 1e5;

export const meetingRules: readonly MeetingRule[] = [
  {
    id: 'metal-with-halogen',
    code: 'hazard/metal-and-halogen',
    happens: 'The metal reacts with the halogen, on impact or at once, with white heat.',
    mend: 'Use a fluid without chlorine, bromine or fluorine; never clean with halogenated solvent.',
    source: ruleSources.bretherick,
    first: (portion, store) =>
      isIn(portion, 'alkali-metal', 'alkaline-earth-metal', 'metal-hydride') ||
      (isIn(portion, 'passivated-metal') && (isPowder(portion, store) || isMolten(portion))),
    second: (portion) => isIn(portion, 'halogen', 'halogenated-solvent', 'fluoropolymer'),
    numbers: () => ({}),
    severity: always('error'),
  },
  {
    id: 'ammonia-with-halogen',
    code: 'hazard/ammonia-and-halogen',
    happens: 'Nitrogen halides form, which explode at a touch.',
    mend: 'Keep them in separate spaces with separate drains.',
    source: ruleSources.bretherick,
    first: (portion) => isIn(portion, 'ammonia', 'ammonium-salt'),
    second: (portion) => isIn(portion, 'halogen'),
    numbers: () => ({}),
    severity: always('error'),
  },
  {
    id: 'metal-with-acid',
    code: 'hazard/metal-and-acid',
    happens: 'The acid’s hydrogen comes off as gas and a salt is left.',
    mend: 'Use a dispersant without free acid, such as its soap; vent what is left.',
    source: ruleSources.bretherick,
    first: (portion, store) =>
      takesHydrogen(portion) || (acidDissolves(portion) && (isPowder(portion, store) || isMolten(portion))),
    second: (portion, _, first) =>
      isIn(portion, 'alkali-metal')
        ? false
        : takesHydrogen(first)
          ? isIn(portion, 'organic-acid', 'mineral-acid') && !isOxidiser(portion)
          : isSharpAcid(portion) && !isOxidiser(portion),
    numbers: withHydrogen,
    severity: byAmount,
  },
  {
    id: 'metal-with-alcohol',
    code: 'hazard/metal-and-alcohol',
    happens: 'The hydrogen of the hydroxyl groups comes off as gas and an alkoxide is left.',
    mend: 'Use a carrier without hydroxyl groups, such as an alkane.',
    source: ruleSources.bretherick,
    first: takesHydrogen,
    // An acid's hydroxyl is told of as an acid, a wet alcohol's water as water.
    second: (portion) => isIn(portion, 'alcohol') && !isIn(portion, 'organic-acid'),
    numbers: withHydrogen,
    severity: byAmount,
  },
  {
    id: 'magnesium-with-methanol',
    code: 'hazard/metal-and-alcohol',
    happens: 'Methanol dissolves the film and then the powder, as methoxide and hydrogen.',
    mend: 'Use an oil, or a longer alcohol, for magnesium powder.',
    source: ruleSources.bretherick,
    first: (portion, store) => soleElement(portion) === 'Mg' && isPowder(portion, store),
    second: (portion) => isIn(portion, 'alcohol') && portion.formula?.composition.get('C') === 1,
    numbers: withHydrogen,
    severity: always('warning'),
  },
  {
    id: 'metal-with-carbonyl',
    code: 'hazard/metal-and-carbonyl',
    happens: 'The metal or hydride reduces and condenses it, hot and sometimes late.',
    mend: 'Use a carrier that is neither ester, fat, ketone nor aldehyde; biodiesel is an ester.',
    source: ruleSources.bretherick,
    first: (portion) =>
      isIn(portion, 'alkali-metal') || (isIn(portion, 'metal-hydride') && isIn(portion, 'strong-reducer')),
    second: (portion) => isIn(portion, 'ester', 'ketone-or-aldehyde'),
    numbers: () => ({}),
    severity: (_, __, ___, second) => (carbonylMolPerKg(second) < greatGasMolPerKg ? 'warning' : 'error'),
  },
  {
    id: 'metal-with-caustic',
    code: 'hazard/metal-and-caustic',
    happens: 'Caustic dissolves it and hydrogen comes off.',
    mend: 'Keep caustic from aluminium, zinc and silicon.',
    source: ruleSources.bretherick,
    first: (portion, store) => isIn(portion, 'amphoteric-element') && (isPowder(portion, store) || isMolten(portion)),
    second: (portion, store) => isIn(portion, 'caustic') && holdsWater(store),
    numbers: withCaustic,
    severity: byAmount,
  },
  {
    id: 'reactive-with-water',
    code: 'hazard/water-in-contact',
    happens: 'It reacts with the water that is there.',
    mend: 'Take the water out: dry the carrier, or keep the two apart.',
    source: ruleSources.bretherick,
    first: (portion, store) => {
      const reaction = waterReactionOf(portion, store);
      return reaction !== null && !(isIn(portion, 'passivated-metal') && reaction.gases.length === 0);
    },
    second: (portion, store, first) =>
      isIn(portion, 'water') && !(acidDissolves(first) && store.portions.some(isSharpAcid)),
    numbers: withWater,
    severity: (numbers, store, first) => {
      // Caustic keeps borohydride for months: it is sold in lye.
      if (first.molPerKg.has('B') && store.portions.some((other) => isIn(other, 'caustic'))) return 'information';
      if (!isIn(first, 'passivated-metal')) return byAmount(numbers);
      return holdsChloride(store) || isMolten(first) ? 'error' : 'warning';
    },
  },
  {
    id: 'passive-with-water',
    code: 'hazard/water-in-contact',
    happens: 'Its film keeps water off; without air a little hydrogen forms.',
    mend: 'Vent the tank, and keep chloride and caustic out.',
    source: ruleSources.practice,
    first: (portion, store) =>
      isIn(portion, 'passivated-metal') &&
      isPowder(portion, store) &&
      waterReactionOf(portion, store) === null &&
      (portion.hazards.withWater.some(({ form }) => form !== 'molten') || isIn(portion, 'amphoteric-element')),
    second: (portion, store) =>
      isIn(portion, 'water') && !store.portions.some((other) => isSharpAcid(other) || isIn(other, 'caustic')),
    numbers: () => ({}),
    severity: (_, store) => (holdsChloride(store) ? 'warning' : 'information'),
  },
  {
    id: 'reactive-with-hydrate',
    code: 'hazard/water-in-contact',
    happens: 'Water of crystallisation is water: it comes off when the crystals warm.',
    mend: 'Use the salt without its water.',
    source: ruleSources.practice,
    first: (portion, store) => {
      const reaction = waterReactionOf(portion, store);
      return reaction !== null && reaction.gases.length > 0 && !isIn(portion, 'passivated-metal');
    },
    second: (portion) => isIn(portion, 'hydrate'),
    numbers: withWater,
    severity: always('warning'),
  },
  {
    id: 'fuel-with-oxidiser',
    code: 'hazard/fuel-and-oxidiser',
    happens: 'They can burn or explode together without air.',
    mend: 'Never in one tank; keep them in separate spaces.',
    source: ruleSources.bretherick,
    first: isOxidiser,
    // Gases that are mixed with oxygen or air are judged by their flammable range.
    second: (portion, store, first) =>
      burns(portion) &&
      !isOxidiser(portion) &&
      !(isIn(portion, 'passivated-metal') && !isPowder(portion, store) && !isMolten(portion)) &&
      !(first.phase === 'gas' && portion.phase === 'gas' && isIn(first, 'oxygen')),
    numbers: (store, first, second) =>
      burningTogether(
        store,
        Math.max(0, oxygenDemand(second.molPerKg).molPerKg * second.massShare),
        Math.max(0, -oxygenDemand(first.molPerKg).molPerKg * first.massShare),
      ),
    // A crust of superoxide is set off by a knock, however little there is.
    severity: ({ heatJPerKg }, _, first) =>
      heatJPerKg !== undefined && heatJPerKg < fieryJPerKg && !isIn(first, 'superoxide') ? 'warning' : 'error',
  },
  {
    id: 'acid-with-salt',
    code: 'hazard/acid-makes-gas',
    happens: 'The acid drives gas out of the salt, and a closed tank bursts or poisons.',
    mend: 'Keep acids from carbonates, sulphides, sulphites and cyanides.',
    source: ruleSources.bretherick,
    first: (portion) =>
      portion.usualPhase === 'solid' && (isIn(portion, 'carbonate', 'sulphide', 'cyanide') || isSulphite(portion)),
    second: isSharpAcid,
    numbers: gasByAcid,
    severity: (numbers, _, salt) => (isIn(salt, 'carbonate') ? byAmount(numbers) : 'error'),
  },
  {
    id: 'caustic-with-ammonium',
    code: 'hazard/caustic-makes-gas',
    happens: 'Caustic drives ammonia out of the salt.',
    mend: 'Keep ammonium salts from caustic and lime.',
    source: ruleSources.bretherick,
    first: (portion) => isIn(portion, 'ammonium-salt'),
    second: (portion) => isIn(portion, 'caustic'),
    numbers: ammoniaByCaustic,
    severity: byAmount,
  },
  {
    id: 'acid-with-base',
    code: 'hazard/acid-and-base',
    happens: 'They neutralise each other with heat.',
    mend: 'Mix them only diluted, cooled and stirred, one slowly into the other.',
    source: ruleSources.practice,
    first: (portion) => isIn(portion, 'mineral-acid', 'organic-acid') && !dissolvesAsSalt(portion),
    second: (portion) => isIn(portion, 'caustic', 'basic-oxide', 'amine', 'ammonia') && causticMolPerKg(portion) > 0,
    numbers: neutralisation,
    severity: byRise,
  },
  {
    id: 'caustic-with-ester',
    code: 'hazard/caustic-and-ester',
    happens: 'The ester is split to soap and alcohol, with heat.',
    mend: 'Keep caustic from esters, fats and biodiesel.',
    source: ruleSources.practice,
    first: (portion) => isIn(portion, 'ester') && portion.phase === 'liquid',
    second: (portion) => isIn(portion, 'caustic') && !isIn(portion, 'oxidiser'),
    numbers: saponification,
    severity: byRise,
  },
];

/** The salt of an alkali or earth with one sulphur to three oxygen atoms. */
function isSulphite({ formula }: StoredPortion): boolean {
  return formula !== null && /^(Li|Na|K|Mg|Ca)2?SO3$/.test(formula.text);
}

/** Acid salts such as NaHSO4 bring their own alkali and are mild. */
function dissolvesAsSalt(portion: StoredPortion): boolean {
  return portion.usualPhase === 'solid' && dissolves(portion);
}

/** One group a molecule at least; in fats and other mixtures one for two oxygen atoms. */
function carbonylMolPerKg(portion: StoredPortion): number {
  const { molarMassKgPerMol, massShare } = portion;
  return molarMassKgPerMol === null ? esterMolPerKg(portion) : massShare / molarMassKgPerMol;
}
