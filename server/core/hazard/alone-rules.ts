// What a blend earns by what is in it, whatever it meets: water-reactive, pyrophoric, unstable, oxidising, peroxide-forming,
// toxic, dusty, or a low-flash-point fuel.
// Knows no pairs. Invariant: a portion earns the same in any tank, but for air over a peroxide former and heat or a catalyst
// on what is unstable.

import { gasMixtureOf } from './gas-mixtures.ts';
import type { HazardSeverity } from './hazard-codes.ts';
import { molPerKg, waterStoichiometry } from './reactions.ts';
import { ruleSources } from './rule.ts';
import type { HazardRule, Hit } from './rule.ts';
import { isGas, isIn, isPowder, shareOver, soleElement } from './store.ts';
import type { ContactMaterial, Store, StoredPortion } from './store.ts';
import { toxicPortions } from './toxicity.ts';
import { flashPointK } from './vapour.ts';

/** Below 60 °C closed cup: SOLAS II-2/4.2.1.1, and where the IGF Code begins. */
export const lowFlashPointK = 333.15;

/** Oxygen over a blend below which peroxides, crusts and fires are not told of. */
export const traceOxygen = 0.005;

/** A hit for each portion the function answers a severity for. */
export function eachPortion(
  store: Store,
  judge: (portion: StoredPortion) => HazardSeverity | null,
  numbers: (portion: StoredPortion) => Hit['numbers'] = () => ({}),
): readonly Hit[] {
  return store.portions.flatMap((portion, index): Hit[] => {
    const severity = judge(portion);
    return severity === null ? [] : [{ severity, portion: index, partner: null, numbers: numbers(portion) }];
  });
}

/** True where it dissolves rather than reacts: lye and acids are made with water. */
export function dissolves(portion: StoredPortion): boolean {
  return isIn(portion, 'mineral-acid') || (isIn(portion, 'caustic') && !isIn(portion, 'basic-oxide', 'oxidiser'));
}

/** How water goes with it in the shape it has here: gases (none: heat alone) and pace; null where nothing is known. */
export function waterReactionOf(
  portion: StoredPortion,
  store: Store,
): StoredPortion['hazards']['withWater'][number] | null {
  if (dissolves(portion)) return null;
  const shapes = isIn(portion, 'passivated-metal')
    ? portion.phase === 'liquid'
      ? ['molten']
      : isPowder(portion, store)
        ? ['powder']
        : []
    : [undefined, 'powder'];
  return portion.hazards.withWater.find(({ form }) => shapes.includes(form)) ?? null;
}

/** What gives oxygen to a fuel. A nitro compound carries its own fuel, and ores give theirs up only when hot. */
export function isOxidiser(portion: StoredPortion): boolean {
  if (!isIn(portion, 'oxidiser') || isIn(portion, 'nitro-compound', 'reducible-oxide')) return false;
  return !isWeakPeroxide(portion);
}

/** Hydrogen peroxide, which rust and copper take apart. */
export function isPeroxideLiquid(portion: StoredPortion): boolean {
  return isIn(portion, 'oxidiser') && [...portion.molPerKg.keys()].sort().join() === 'H,O';
}

/** Peroxide below 8 % is no oxidiser by its class, and steady. */
function isWeakPeroxide(portion: StoredPortion): boolean {
  return isPeroxideLiquid(portion) && portion.massShare < 0.08;
}

/** Potassium that meets sodium: between 40 and 90 % of it by mass the alloy is liquid at room temperature. */
function isPartOfLiquidAlloy(portion: StoredPortion, store: Store): boolean {
  if (soleElement(portion) !== 'K') return false;
  const sodium = store.portions.reduce((sum, other) => sum + (soleElement(other) === 'Na' ? other.massShare : 0), 0);
  const share = portion.massShare / (portion.massShare + sodium);
  return share >= 0.4 && share <= 0.9;
}

/** Hydrazine: hydrogen and nitrogen alone, and a reducer. */
function isHydrazine(portion: StoredPortion): boolean {
  return isIn(portion, 'strong-reducer') && [...portion.molPerKg.keys()].sort().join() === 'H,N';
}

const catalysts: readonly ContactMaterial[] = [
  'steel',
  'cast-iron',
  'copper',
  'brass',
  'bronze',
  'silver',
  'lead',
  'zinc',
  'galvanised-steel',
  'mercury',
];

/** What falls apart in stages that feed themselves, or bursts, once it is hot enough. */
function endsBadly(portion: StoredPortion): boolean {
  return isIn(portion, 'metal-hydride', 'oxidiser', 'metal-peroxide', 'ammonium-salt', 'nitro-compound', 'unstable');
}

export const aloneRules: readonly HazardRule[] = [
  {
    id: 'water-reactive',
    code: 'hazard/water-reactive',
    happens: 'It reacts with water and gives off a gas that burns or poisons, or much heat.',
    mend: 'Keep it closed, dry and under its blanket; no water, foam or steam near it.',
    source: ruleSources.ghs,
    find: (store) =>
      eachPortion(
        store,
        (portion) => {
          const reaction = waterReactionOf(portion, store);
          if (reaction === null) return null;
          if (reaction.gases.length > 0) return 'warning';
          if (isIn(portion, 'passivated-metal')) return null;
          return reaction.pace === 'violent' ? 'warning' : 'information';
        },
        (portion) => {
          const stoichiometry = waterStoichiometry(portion);
          const mol = molPerKg(portion);
          if (stoichiometry === undefined || mol === null) return {};
          const { gasMol, heatJ } = stoichiometry;
          return {
            gasMolPerKg: Object.fromEntries(Object.entries(gasMol).map(([gas, each]) => [gas, each * mol])),
            ...(heatJ === null ? {} : { heatJPerKg: heatJ * mol }),
          };
        },
      ),
  },
  {
    id: 'pyrophoric',
    code: 'hazard/pyrophoric',
    happens: 'It takes fire where air reaches it.',
    mend: 'Keep air from it in tanks, lines and pumps; purge before opening.',
    source: ruleSources.ghs,
    find: (store) =>
      eachPortion(store, (portion) => {
        const { pyrophoric } = portion.hazards;
        if (pyrophoric === undefined) return isPartOfLiquidAlloy(portion, store) ? 'warning' : null;
        // Fineness is not known of a metal; a dry hydride is a powder. A liquid keeps powders from taking fire.
        const counts =
          pyrophoric.form === undefined ||
          (!isIn(portion, 'passivated-metal', 'alkaline-earth-metal') &&
            store.portions.every(({ phase }) => phase === 'solid'));
        return counts ? 'warning' : null;
      }),
  },
  {
    id: 'unstable',
    code: 'hazard/unstable',
    happens: 'It can decompose by itself, with heat and gas.',
    mend: 'Keep it cool, clean and vented, and away from what sets it off.',
    source: ruleSources.bretherick,
    find: (store) =>
      eachPortion(
        store,
        (portion) => {
          const limitK = portion.decompositionPointK;
          if (limitK !== null && store.temperatureK >= limitK && endsBadly(portion)) return 'error';
          const isCatalysed =
            ((isPeroxideLiquid(portion) && !isWeakPeroxide(portion)) || isHydrazine(portion)) &&
            (store.contact.some((material) => catalysts.includes(material)) ||
              store.portions.some((other) => isIn(other, 'reducible-oxide') || soleElement(other) === 'Fe'));
          if (isCatalysed) return 'error';
          return isIn(portion, 'unstable') && !isWeakPeroxide(portion) ? 'warning' : null;
        },
        ({ decompositionPointK }) => (decompositionPointK === null ? {} : { limitK: decompositionPointK }),
      ),
  },
  {
    id: 'oxidiser',
    code: 'hazard/oxidiser',
    happens: 'It feeds fires without air.',
    mend: 'Keep it from everything that burns.',
    source: ruleSources.ghs,
    find: (store) =>
      store.kind === 'oxidant' ? [] : eachPortion(store, (portion) => (isOxidiser(portion) ? 'information' : null)),
  },
  {
    id: 'peroxide-former',
    code: 'hazard/peroxide-former',
    happens: 'Air makes peroxides in it that explode when it is boiled down.',
    mend: 'Keep it under nitrogen, with an inhibitor, and test it.',
    source: ruleSources.bretherick,
    find: (store) =>
      eachPortion(store, (portion) => {
        // Peroxides gather in what is boiled down: a gas leaves none behind.
        const isGasByNature = portion.phase === 'gas' && portion.usualPhase === 'gas';
        if (!isIn(portion, 'peroxide-former') || isGasByNature) return null;
        return shareOver(store, 'O2') > traceOxygen ? 'warning' : 'information';
      }),
  },
  {
    id: 'toxic',
    code: 'hazard/toxic',
    happens: 'Acutely toxic by its GHS classes.',
    mend: 'Follow the safety data sheet: closed handling, detection, protection.',
    source: ruleSources.ghs,
    find: (store) =>
      toxicPortions(store)
        .slice(0, 1)
        .map((portion) => ({ severity: 'information', portion, partner: null, numbers: {} })),
  },
  {
    id: 'combustible-dust',
    code: 'hazard/combustible-dust',
    happens: 'Its dust burns or explodes when stirred up in air.',
    mend: 'Keep dust down and sparks away; handle fine powder under inert gas.',
    source: ruleSources.nfpa484,
    find: (store) =>
      store.portions.every(({ phase }) => phase === 'solid')
        ? eachPortion(store, (portion) => (isIn(portion, 'combustible-dust') ? 'information' : null))
        : [],
  },
  {
    id: 'low-flash-point',
    code: 'hazard/low-flash-point',
    happens: 'A fuel that gives off flammable vapour or gas below 60 °C.',
    mend: 'Rules for low-flashpoint fuels apply: closed, inerted tanks, double pipes, detection.',
    source: ruleSources.solas,
    find: lowFlashPoint,
  },
];

function lowFlashPoint(store: Store): readonly Hit[] {
  if (isGas(store)) {
    const mixture = store.kind === 'oxidant' ? null : gasMixtureOf(store);
    const isFuel = mixture === null ? false : mixture.isFlammableInAir;
    // A vapour above its boiling point without limits on record still has its flash point.
    const isVapour = store.portions.some(({ flashPointK: own }) => own !== null && own < lowFlashPointK);
    const isRecorded = store.portions.some(
      (portion) => portion.flammableLimits === null && isIn(portion, 'fuel-gas') && portion.massShare > 0.5,
    );
    if (!isFuel && !isVapour && !isRecorded) return [];
    return [{ severity: 'information', portion: null, partner: null, numbers: {} }];
  }
  // A liquefied gas among the liquids has no flash point on record and needs none.
  const isFuelGas = store.portions.some(
    (portion) => portion.phase === 'liquid' && isIn(portion, 'fuel-gas') && portion.massShare > leastFuelGas,
  );
  const flash = flashPointK(store);
  if (!isFuelGas && (flash === null || flash >= lowFlashPointK)) return [];
  return [
    { severity: 'information', portion: null, partner: null, numbers: flash === null ? {} : { flashPointK: flash } },
  ];
}

const leastFuelGas = 0.01;
