// What products do to hot metal in their way (valves, nozzles, blades, superheater tubes): deposits that stick, sulphate hot
// corrosion in its two windows, vanadate melts, and the attack of molten carbonate and caustic on the metal's own oxide.
// Knows no machine: whoever asks says which temperatures the metal has and what the products are there. An answer is an
// indication from equilibrium and published windows of temperature, never a rate of corrosion.
// Invariant: metal is looked at in the products' equilibrium at its own temperature, as what meets it is cooled to that.
// Sources: windows of type I and II hot corrosion by N. Eliaz, G. Shemesh, R. M. Latanision, Eng. Fail. Anal. 9 (2002) 31 (from
// memory: about 800 to 950 °C, 650 to 800 °C; a conference abstract of 2011 that was seen has 850 to 950 °C and 600 to 800 °C);
// vanadates of sodium melt from about 535 °C on and attack from about 590 °C on (common practice); molten alkali carbonates and
// hydroxides flux protective oxides basically (R. A. Rapp, Corros. Sci. 44 (2002) 209, from memory).

import type { MatterState } from '../burn/burn.ts';
import { depositOf } from '../burn/deposit.ts';
import type { SaltMelting } from '../equilibrium/melts.ts';
import { celsiusZeroK } from '../quantity/constants.ts';

export interface Metal {
  readonly fromK: number;
  readonly toK: number;
}

export type AttackKind =
  /** A deposit of at least 15 % melt, or one of which that is not known. */
  'sticky' | 'not-known' | 'sulphate-type-1' | 'sulphate-type-2' | 'vanadate' | 'basic';

export interface Attack {
  readonly kind: AttackKind;
  /** Of the metal looked at, the coldest and the hottest that meets it. */
  readonly fromK: number;
  readonly toK: number;
  /** Formulas of the salts behind it, the most by mass first; of vanadates none, as they are not among the products. */
  readonly salts: readonly string[];
  /** On the coldest of that metal; null where it counts for nothing. */
  readonly melting: SaltMelting | null;
}

/** Metal is looked at at both ends and at what lies evenly between them; how many is a matter of time, not of a source. */
const mostPlaces = 7;

/** K, from the sources above. */
const windowsK: readonly { readonly kind: AttackKind; readonly fromK: number; readonly toK: number }[] = [
  { kind: 'sulphate-type-2', fromK: 650 + celsiusZeroK, toK: 800 + celsiusZeroK },
  { kind: 'sulphate-type-1', fromK: 800 + celsiusZeroK, toK: 950 + celsiusZeroK },
];
const vanadateK = { fromK: 590 + celsiusZeroK, toK: 950 + celsiusZeroK } as const;
/** A share of a deposit's mass that matters: chosen here, no source. */
const leastShare = 0.02;

/**
 * The attacks on a metal, each once. `stateAt` gives the products at a temperature in K, null where there is no state;
 * `vanadiumMolPerKg` is what the fuel brings, as vanadium is no element of the products' tables.
 */
export function attacksOn(
  metal: Metal,
  stateAt: (temperatureK: number) => MatterState | null,
  vanadiumMolPerKg = 0,
): readonly Attack[] {
  const count = metal.fromK === metal.toK ? 1 : mostPlaces;
  const found = new Map<AttackKind, Attack>();
  let colderK = metal.fromK;
  for (let place = 0; place < count; place += 1) {
    const metalK = metal.fromK + (place * (metal.toK - metal.fromK)) / Math.max(1, count - 1);
    const state = stateAt(metalK);
    if (state !== null) {
      for (const one of attacksAt(metalK, state, vanadiumMolPerKg)) {
        const before = found.get(one.kind);
        const fromK = Math.min(metalK, Math.max(colderK, beginsAtK(one)));
        found.set(one.kind, before === undefined ? { ...one, fromK } : { ...before, toK: metalK });
      }
    }
    colderK = metalK;
  }
  return [...found.values()];
}

/** Between the last place that is not met and the first that is, the attack's own limit is known better. */
function beginsAtK({ kind, fromK, melting }: Attack): number {
  if (kind === 'vanadate') return vanadateK.fromK;
  const window = windowsK.find((one) => one.kind === kind);
  if (window !== undefined) return window.fromK;
  return (kind === 'sticky' ? melting?.stickyK : melting?.firstMeltingK) ?? fromK;
}

function attacksAt(metalK: number, state: MatterState, vanadiumMolPerKg: number): readonly Attack[] {
  const at = (kind: AttackKind, salts: readonly string[], melting: SaltMelting | null): Attack => ({
    kind,
    fromK: metalK,
    toK: metalK,
    salts,
    melting,
  });
  const attacks: Attack[] = [];
  const melting = depositOf(state) ?? null;
  const deposit = depositRows(state);
  const all = deposit.map(({ formula }) => formula);
  if (melting !== null) {
    const isKnown = melting.stickyK !== null;
    if (isKnown && metalK >= (melting.stickyK ?? Infinity)) attacks.push(at('sticky', all.slice(0, 3), melting));
    const mayMelt = melting.firstMeltingK === null || metalK >= melting.firstMeltingK;
    if (!isKnown && mayMelt) attacks.push(at('not-known', all.slice(0, 3), melting));
    const basic = deposit.filter(({ formula }) => basicSalt.test(formula));
    if (shareOf(basic) >= leastShare && melting.firstMeltingK !== null && metalK >= melting.firstMeltingK) {
      const formulas = basic.map(({ formula }) => formula);
      attacks.push(at('basic', formulas, melting));
    }
  }
  const sulphates = deposit.filter(({ formula }) => sulphate.test(formula));
  for (const { kind, fromK, toK } of windowsK) {
    if (metalK < fromK || metalK > toK || shareOf(sulphates) < leastShare) continue;
    const formulas = sulphates.map(({ formula }) => formula);
    attacks.push(at(kind, formulas, melting));
  }
  if (vanadiumMolPerKg > 0 && metalK >= vanadateK.fromK && metalK <= vanadateK.toK) {
    attacks.push(at('vanadate', [], null));
  }
  return attacks;
}

const sulphate = /^(Li|Na|K)2SO4$/;
/** Carbonate, hydroxide, and the oxides that turn into them. */
const basicSalt = /^((Li|Na|K)2CO3|(Li|Na|K)OH|(Li|Na|K)2O2?)$/;

interface DepositRow {
  readonly formula: string;
  /** Of all that is condensed but water. */
  readonly share: number;
}

/** What is condensed, each formula once, the most by mass first. */
function depositRows({ candidates, amountsMol }: MatterState): readonly DepositRow[] {
  const masses = new Map<string, number>();
  for (let phase = candidates.gasCount; phase < candidates.phases.length; phase += 1) {
    const formula = candidates.phases[phase]?.formula.text;
    const massKg = (amountsMol[phase] ?? 0) * (candidates.molarMassKgPerMol[phase] ?? 0);
    if (formula === undefined || formula === 'H2O' || !(massKg > 0)) continue;
    masses.set(formula, (masses.get(formula) ?? 0) + massKg);
  }
  const totalKg = [...masses.values()].reduce((sum, massKg) => sum + massKg, 0);
  return [...masses]
    .map(([formula, massKg]): DepositRow => ({ formula, share: massKg / totalKg }))
    .sort((a, b) => b.share - a.share);
}

function shareOf(rows: readonly DepositRow[]): number {
  return rows.reduce((sum, { share }) => sum + share, 0);
}
