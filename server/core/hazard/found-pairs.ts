// Pairs that no rule names, found by their chemistry: one of a family that gives electrons, one of a family that takes them,
// and a state of lowest energy together that gives off much more heat than either falling apart alone.
// Knows that free energy alone proves nothing: every fuel could become methane and soot. So both must be of families known
// to react, fast ones when cold, the others once lit; and a passivated metal counts as powder or melt only.
// Invariant: what is more stable together by less than a kindling's worth of heat is never told.

import type { PairEquilibrium } from './pair-equilibrium.ts';
import type { HazardSeverity } from './hazard-codes.ts';
import { isIn, isMolten, isPowder, soleElement } from './store.ts';
import type { Store, StoredPortion } from './store.ts';

export interface FoundPair {
  /** `error` where the families react cold (a knock is enough), `warning` where the pair must be lit or goes slowly. */
  readonly severity: HazardSeverity;
  /** Null where data are missing: the families alone speak. */
  readonly equilibrium: PairEquilibrium | null;
}

/** Heat per kg of the pair below which a reaction does not keep itself going: it warms solids by some 500 K. */
const leastHeatJPerKg = 5e5;

/**
 * The pair as it is found, the first giving and the second taking; null where nothing is known to happen. `equilibrium` is
 * the two together: null where data are missing (the families alone then speak), undefined where it is not there yet.
 */
export function findPair(
  giver: StoredPortion,
  taker: StoredPortion,
  store: Store,
  equilibrium: PairEquilibrium | null | undefined,
): FoundPair | null {
  const kind = kindOf(giver, taker, store);
  if (kind === undefined) return null;
  const { severity, needsNoNumbers = false } = kind;
  if (needsNoNumbers) return { severity, equilibrium: null };
  if (equilibrium === undefined) return null;
  if (equilibrium === null || equilibrium.heatJPerKg >= leastHeatJPerKg) return { severity, equilibrium };
  return null;
}

/** True where the state of lowest energy decides. */
export function needsJudging(giver: StoredPortion, taker: StoredPortion, store: Store): boolean {
  const kind = kindOf(giver, taker, store);
  return kind !== undefined && kind.needsNoNumbers !== true;
}

function kindOf(giver: StoredPortion, taker: StoredPortion, store: Store): PairKind | undefined {
  return kinds.find((one) => one.gives(giver, store) && one.takes(taker));
}

interface PairKind {
  readonly gives: (portion: StoredPortion, store: Store) => boolean;
  readonly takes: (portion: StoredPortion) => boolean;
  readonly severity: HazardSeverity;
  /** True where it happens by a compound that the tables do not hold, such as sodium amide. */
  readonly needsNoNumbers?: boolean;
}

const alkali = (portion: StoredPortion): boolean => isIn(portion, 'alkali-metal');

/** A tertiary amine has none, and alkali metals leave it alone. */
const holdsNitrogenHydrogen = ({ formula }: StoredPortion): boolean =>
  formula === null || /NH|HN|H2N/.test(formula.text);

/** Dimethyl sulphoxide and its kin: one sulphur, one oxygen, and carbon. */
const isSulphoxide = ({ formula }: StoredPortion): boolean => formula !== null && /^\(C.*\)2SO$/.test(formula.text);

const reducer = (portion: StoredPortion, store: Store): boolean =>
  isIn(portion, 'alkali-metal', 'alkaline-earth-metal') ||
  (isIn(portion, 'metal-hydride') && portion.phase !== 'gas') ||
  (isIn(portion, 'passivated-metal') && (isPowder(portion, store) || isMolten(portion)));

const kinds: readonly PairKind[] = [
  // Set off by grinding, a knock or gentle warmth.
  {
    gives: alkali,
    takes: (portion) => soleElement(portion) === 'S' || isIn(portion, 'acid-chloride-salt', 'nitro-compound'),
    severity: 'error',
  },
  // Explosive at a knock, and by compounds the tables do not hold.
  {
    gives: alkali,
    takes: (portion) => isIn(portion, 'sulphide') && portion.molPerKg.has('C') && portion.phase === 'liquid',
    severity: 'error',
    needsNoNumbers: true,
  },
  // The solution runs away by itself, hours after it was made.
  {
    gives: (portion) => isIn(portion, 'alkali-metal') || (isIn(portion, 'metal-hydride') && portion.phase !== 'gas'),
    takes: isSulphoxide,
    severity: 'error',
    needsNoNumbers: true,
  },
  // Ammonium nitrite, which goes to nitrogen and steam.
  {
    gives: (portion) => isIn(portion, 'ammonium-salt'),
    takes: ({ formula }) => formula !== null && /[A-Z][a-z]?NO2$/.test(formula.text),
    severity: 'error',
  },
  // Thermites and their like: quiet until lit.
  {
    gives: reducer,
    takes: (portion) =>
      soleElement(portion) === 'S' ||
      isIn(portion, 'reducible-oxide', 'acid-chloride-salt', 'nitro-compound') ||
      (isIn(portion, 'sulphide') && portion.usualPhase === 'solid' && !isIn(portion, 'caustic')),
    severity: 'warning',
  },
  // Amides and hydrogen, slowly; rust and iron speed it up.
  {
    gives: alkali,
    takes: (portion) => isIn(portion, 'ammonia') || (isIn(portion, 'amine') && holdsNitrogenHydrogen(portion)),
    severity: 'warning',
    needsNoNumbers: true,
  },
];
