// From the question about a burn to its states: what is held in each, which candidates it has, and where it starts from.
// Knows the minimiser by its face only. Nothing is solved before somebody looks, and nothing twice.
// Invariant: every state holds the atoms of the charge; adiabatic ones its enthalpy (or energy) less the loss; a state's
// answer does not depend on which others were looked at.

import { referenceTemperatureK } from '../substance/substance.ts';
import { candidateSet } from '../equilibrium/candidates.ts';
import type { Equilibrium, Held } from '../equilibrium/equilibrium.ts';
import { equilibriumSolver } from '../equilibrium/solver.ts';
import type { EquilibriumSolver } from '../equilibrium/solver.ts';
import { admittanceOf } from './admitted-products.ts';
import { ionsAboveK } from './burn.ts';
import type { Burn, BurnFault, BurnInput, BurnStateOrNone, Charge, CoolingPath, FrozenState, NoState } from './burn.ts';
import { heatGivenOff, heatReleased, heldAdiabatic, heldByFlame, heldCooling } from './burn-held.ts';
import { chargeOf } from './charge.ts';
import { coolingPath } from './cooling-path.ts';
import { frozenState } from './frozen-state.ts';

/**
 * The burn of an input, or why nothing can be burnt. `shouldStop` is asked before each state is solved; once it has said yes
 * every state that is not there yet is `stopped`, for good, so ask a new burn afterwards. Without it none ever is.
 */
export function prepareBurn(input: BurnInput, shouldStop?: () => boolean): Burn | BurnFault {
  const charge = chargeOf(input.fuel, input.oxidant, input.amount, input.held);
  if (charge.kind === 'fault') return charge;
  const zoneCharge = input.zone && chargeOf(input.fuel, input.oxidant, input.zone, input.held, 'zone');
  if (zoneCharge?.kind === 'fault') return zoneCharge;
  const fault = faultOf(input, charge, zoneCharge);
  if (fault !== undefined) return fault;

  let isStopped = false;
  const stops = (): boolean => (isStopped ||= shouldStop?.() === true);
  const whole = new Matter(charge, input, stops);
  const zone = zoneCharge && new Matter(zoneCharge, input, stops);

  const flame = once((): Equilibrium | NoState => whole.solveHot(heldByFlame(input, charge)));
  const zoneState = once((): Equilibrium | NoState | null =>
    zone === undefined || zoneCharge === undefined || zoneCharge.enthalpyJ === null
      ? null
      : zone.solveHot(heldAdiabatic(input, zoneCharge, 0)),
  );
  const solveCooling = (temperatureK: number, near?: Equilibrium): Equilibrium | NoState =>
    whole.solve(heldCooling(input, charge, temperatureK), near);
  const frozenAt = once((): Equilibrium | NoState | null => {
    if (input.frozenBelowK === undefined) return null;
    const burnt = flame();
    // A flame cooler than that has nowhere to freeze but where it is.
    if (burnt.kind === 'equilibrium' && burnt.temperatureK <= input.frozenBelowK) return burnt;
    return solveCooling(input.frozenBelowK);
  });
  const freeze = (from: Equilibrium, temperatureK: number): FrozenState => {
    const held = heldCooling(input, charge, temperatureK);
    return frozenState(from, temperatureK, 'pressurePa' in held ? held : { volumeM3: charge.volumeM3 });
  };
  const at = (temperatureK: number): BurnStateOrNone => {
    if (input.frozenBelowK !== undefined && temperatureK <= input.frozenBelowK) {
      const from = frozenAt();
      if (from !== null) return from.kind === 'equilibrium' ? freeze(from, temperatureK) : from;
    }
    return whole.solveHot(heldCooling(input, charge, temperatureK));
  };
  const defaultPath = once((): CoolingPath => {
    const burnt = flame();
    return pathOver(defaultPathK(burnt.kind === 'equilibrium' ? burnt.temperatureK : hottestPathK));
  });
  const pathOver = (temperaturesK: readonly number[]): CoolingPath => {
    const from = frozenAt();
    const frozen = from === null ? {} : { frozen: { atK: input.frozenBelowK ?? -Infinity, from, state: freeze } };
    return coolingPath({ candidates: whole.candidates, solve: solveCooling, ...frozen }, temperaturesK);
  };

  return {
    kind: 'burn',
    input,
    charge,
    zoneCharge: zoneCharge ?? null,
    flame,
    zone: zoneState,
    cooled: input.cooledToK.map((temperatureK) => ({ temperatureK, state: once(() => at(temperatureK)) })),
    frozenAt,
    at,
    path: (temperaturesK) => (temperaturesK === undefined ? defaultPath() : pathOver(temperaturesK)),
    heat: once(() => {
      if (charge.enthalpyJ === null) return null;
      const slate = at(referenceTemperatureK);
      if (slate.kind === 'none') return slate;
      const heat = heatReleased(input, charge, slate);
      return heat && { ...heat, slate };
    }),
    heatAbove: (temperatureK) => {
      if (charge.enthalpyJ === null) return null;
      const state = at(temperatureK);
      return state.kind === 'none' ? state : heatGivenOff(input, charge, state);
    },
  };
}

/** Evenly from a temperature in K down to 25 °C, both among them. */
export function defaultPathK(fromK: number): readonly number[] {
  const startK = Math.max(Math.min(fromK, hottestPathK), referenceTemperatureK);
  const stepK = (startK - referenceTemperatureK) / (defaultPathLength - 1);
  return Array.from({ length: defaultPathLength }, (_, index) => startK - index * stepK);
}

const defaultPathLength = 60;
/** Nothing that condenses does so above. */
const hottestPathK = 4500;

/** The atoms of a charge with the candidates they may form; sets and solvers are made when first needed. */
class Matter {
  private readonly plain: () => EquilibriumSolver;
  private readonly withIons: () => EquilibriumSolver;

  constructor(
    private readonly charge: Charge,
    private readonly input: BurnInput,
    private readonly stops: () => boolean,
  ) {
    const admitted = admittanceOf(input);
    const admits = admitted === undefined ? {} : { admits: admitted };
    this.plain = once(() => equilibriumSolver(candidateSet(charge.elements, admits)));
    this.withIons = once(() => equilibriumSolver(candidateSet(charge.elements, { ...admits, ions: true })));
  }

  get candidates(): EquilibriumSolver['candidates'] {
    return this.plain().candidates;
  }

  solve(held: Held, near?: Equilibrium): Equilibrium | NoState {
    if (this.stops()) return { kind: 'none', reason: 'stopped' };
    return this.plain().solve(this.charge.elementMol, held, near);
  }

  /** With ions where they are asked for and the state without them is hot enough to have any. */
  solveHot(held: Held): Equilibrium | NoState {
    const state = this.solve(held);
    if (this.input.ions !== true || state.kind === 'none' || state.temperatureK <= ionsAboveK) return state;
    const neutral = new Float64Array(this.charge.elementMol.length + 1);
    neutral.set(this.charge.elementMol);
    if (this.stops()) return { kind: 'none', reason: 'stopped' };
    return this.withIons().solve(neutral, held);
  }
}

function faultOf(input: BurnInput, charge: Charge, zone: Charge | undefined): BurnFault | undefined {
  if (zone !== undefined && zone.oxidantKgPerKg > charge.oxidantKgPerKg * (1 + 1e-9)) {
    return {
      kind: 'fault',
      reason: 'zone-leaner',
      zoneKgPerKg: zone.oxidantKgPerKg,
      wholeKgPerKg: charge.oxidantKgPerKg,
    };
  }
  if (input.held.held === 'volume' && !(charge.volumeM3 > 0)) return { kind: 'fault', reason: 'no-gas' };
  if (input.heat.heat === 'temperature') return undefined;
  if (charge.enthalpyJ === null) {
    return { kind: 'fault', reason: 'no-energy', stream: input.fuel.enthalpyJPerKg === null ? 'fuel' : 'oxidant' };
  }
  const hasLoss = input.heat.lossShare !== 0;
  return hasLoss && input.lowerHeatingValueJPerKg === null ? { kind: 'fault', reason: 'no-heating-value' } : undefined;
}

function once<T>(compute: () => T): () => T {
  let kept: { readonly value: T } | undefined;
  return () => (kept ??= { value: compute() }).value;
}
