// The states of a burn after a small step of one of its inputs, along the movements of the converged states: what figures
// read of them on either side of a step gives their slopes without a burn solved anew.
// Knows no figures and no uncertainties. Invariants: the charge is that of the moved input exactly, and the states are moved
// along a line; a state whose movement is not known is null, never one that stands still.

import type { Equilibrium } from '../equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import type { Burn, BurnInput, BurnState, Charge, MatterState } from './burn.ts';
import { heldCooling } from './burn-held.ts';
import type { BurnSensitivities, StateMovement } from './burn-sensitivities.ts';
import type { BurnParameter } from './charge-directions.ts';
import { chargeOf } from './charge.ts';
import { frozenMatter, type FrozenHeld } from './frozen-state.ts';
import { matterState } from './matter-state.ts';

/** What is moved: an input of the charge, or one that only part of the states know. `bystander`: none of the states does. */
export type BurnMove =
  BurnParameter | { readonly of: 'zone-amount' | 'cooling-pressure' | 'frozen-temperature' | 'bystander' };

/** How each state moves per unit of the move; `still` where it does not, null where that is not known. */
export interface BurnMovements {
  readonly flame: () => KnownMovement;
  readonly zone: () => KnownMovement;
  /** Of a state of the cooling gas, at its own temperature. */
  readonly cooled: (state: BurnState) => KnownMovement;
  /** The same per K of its own temperature. */
  readonly warmed: (state: BurnState) => KnownMovement;
}

export type KnownMovement = StateMovement | 'still' | null;

/** The movements that a burn's sensitivities give for a move. */
export function movementsOf(burn: Burn, sensitivities: BurnSensitivities, move: BurnMove): BurnMovements {
  const ofFreezing = (): KnownMovement => {
    const from = burn.frozenAt();
    if (from?.kind !== 'equilibrium') return null;
    switch (move.of) {
      case 'bystander':
      case 'zone-amount':
        return 'still';
      case 'frozen-temperature':
        // A flame that freezes at once stays what it is.
        return from === burn.flame() ? 'still' : sensitivities.cooling(from, { of: 'own-temperature' });
      case 'cooling-pressure':
        return from === burn.flame() ? 'still' : sensitivities.cooling(from, { of: 'cooling-pressure' });
      default:
        return sensitivities.frozenAt(move);
    }
  };
  return {
    flame: () => (isOfCharge(move) ? sensitivities.flame(move) : 'still'),
    zone: () => {
      if (move.of === 'zone-amount') return sensitivities.zone({ of: 'amount' });
      return isOfCharge(move) && !isOfWholeAlone(move) ? sensitivities.zone(move) : 'still';
    },
    cooled: (state) => {
      if (state.kind === 'frozen') return ofFreezing();
      if (move.of === 'cooling-pressure') return sensitivities.cooling(state, { of: 'cooling-pressure' });
      return isOfCharge(move) ? sensitivities.cooling(state, move) : 'still';
    },
    warmed: (state) => (state.kind === 'frozen' ? 'still' : sensitivities.cooling(state, { of: 'own-temperature' })),
  };
}

function isOfCharge(move: BurnMove): move is BurnParameter {
  return !['zone-amount', 'cooling-pressure', 'frozen-temperature', 'bystander'].includes(move.of);
}

/** What the zone has nothing of: its own amount, no loss, and never a given temperature. */
function isOfWholeAlone({ of }: BurnParameter): boolean {
  return of === 'amount' || of === 'loss-share' || of === 'heating-value' || of === 'temperature';
}

/** The states after a step. */
export interface MovedBurn {
  readonly input: BurnInput;
  readonly charge: Charge;
  readonly flame: () => MatterState | null;
  readonly zone: () => MatterState | null;
  /** What `state` of the cooling gas has become, at a temperature of its own. */
  readonly cooled: (state: BurnState, temperatureK: number) => MatterState | null;
}

/** A burn moved by a step; `input` is its input with that step taken. Null where there is no such charge. */
export function movedBurn(burn: Burn, movements: BurnMovements, input: BurnInput, step: number): MovedBurn | null {
  const charge = chargeOf(input.fuel, input.oxidant, input.amount, input.held);
  const zoneCharge = input.zone ? chargeOf(input.fuel, input.oxidant, input.zone, input.held, 'zone') : null;
  if (charge.kind === 'fault' || zoneCharge?.kind === 'fault') return null;
  const burning = (state: Equilibrium, movement: KnownMovement, own: Charge): MatterState | null => {
    const along = moved(state, movement, step);
    return along && withPressure(along, input.held.held === 'pressure' ? input.held : own);
  };
  return {
    input,
    charge,
    flame: () => {
      const state = burn.flame();
      return state.kind === 'equilibrium' ? burning(state, movements.flame(), charge) : null;
    },
    zone: () => {
      const state = burn.zone();
      return state?.kind === 'equilibrium' && zoneCharge ? burning(state, movements.zone(), zoneCharge) : null;
    },
    cooled: (state, temperatureK) => {
      const held = heldCooling(input, charge, temperatureK);
      const own: FrozenHeld = 'pressurePa' in held ? held : { volumeM3: charge.volumeM3 };
      const movement = movements.cooled(state);
      if (state.kind === 'frozen') {
        const from = moved(state.from, movement, step);
        return from && frozenMatter(from, temperatureK, own);
      }
      const along = moved(state, movement, step);
      const warmerK = temperatureK - state.temperatureK;
      const warmed = warmerK === 0 ? 'still' : movements.warmed(state);
      const there = along && moved({ ...along, temperatureK: state.temperatureK }, warmed, warmerK);
      return there && withPressure({ ...there, temperatureK }, own);
    },
  };
}

/** The largest relative change of temperature and of what matters of the amounts, per unit of the move. */
export function relativeSpeed(
  { temperatureK, amountsMol, massKg, candidates }: MatterState,
  movement: KnownMovement,
): number {
  if (movement === 'still' || movement === null) return 0;
  let fastest = Math.abs(movement.temperatureK) / temperatureK;
  amountsMol.forEach((mol, phase) => {
    if (mol * (candidates.molarMassKgPerMol[phase] ?? 0) < leastMassShare * massKg) return;
    fastest = Math.max(fastest, Math.abs(movement.amountsMol[phase] ?? 0) / mol);
  });
  return fastest;
}

/** Less of a phase moves no figure. */
const leastMassShare = 1e-9;

function moved(state: MatterState, movement: KnownMovement, step: number): MatterState | null {
  if (movement === null) return null;
  if (movement === 'still') return state;
  const amountsMol = Float64Array.from(
    state.amountsMol,
    (mol, phase) => mol + step * (movement.amountsMol[phase] ?? 0),
  );
  return matterState(state.candidates, amountsMol, state.temperatureK + step * movement.temperatureK, state.pressurePa);
}

/** The same matter at the pressure that is held, or that the volume held makes. */
function withPressure(
  { candidates, amountsMol, temperatureK, gasMol, pressurePa }: MatterState,
  held: { readonly pressurePa: number } | { readonly volumeM3: number },
): MatterState {
  const gasRTJ = gasMol * molarGasConstantJPerMolK * temperatureK;
  const heldPa = 'pressurePa' in held ? held.pressurePa : gasMol > 0 ? gasRTJ / held.volumeM3 : pressurePa;
  return matterState(candidates, amountsMol, temperatureK, heldPa);
}
