// One cycle of an engine with pistons, in one corner: filled, compressed, burnt, expanded, blown down; with the residual gas
// found that the exhaust of the very same cycle leaves behind.
// Knows no figures and no tables. Invariant: what comes in with fuel and fresh gas goes out as work, heat and exhaust, and the
// residual gas that goes in is the one that stays, to `closure` of the heating value.
// The residual's temperature is found by secants on what one cycle makes of it, which hardly depends on what it was.

import type { Equilibrium, Held, NoEquilibrium } from '../equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { referenceTemperatureK } from '../substance/substance.ts';
import { compressed, joined } from './charge.ts';
import type { Compressed } from './charge.ts';
import { expansionFrom } from './expansion.ts';
import type { Corner, Expansion, ExpandingState } from './expansion.ts';
import { frozenMixture, mixtureFrozenFrom } from './frozen-mixture.ts';
import type { FrozenMixture, MixtureState } from './frozen-mixture.ts';
import { fill, pumpingWork } from './gas-exchange.ts';
import type { Filling, Fresh, Staying } from './gas-exchange.ts';
import { reactingCharge } from './reacting-charge.ts';
import type { ReactingCharge } from './reacting-charge.ts';
import type { CycleFault, ReciprocatingInput, WorkCycle } from './reciprocating.ts';

/** Gap of the residual gas's enthalpy between going in and staying, over the heating value. */
const closure = 2e-12;

/** What all corners of an engine share: sums over its fuels, and the solvers of what burns. */
export interface EngineCharge {
  readonly input: ReciprocatingInput;
  readonly fresh: Fresh;
  /** Of what burns of 1 kg of fuel, with the fresh gas; the residual gas has the same elements. */
  readonly reacting: ReactingCharge;
  readonly burningMol: ReadonlyMap<string, number>;
  readonly lowerHeatingValueJ: number;
  /** As it comes in, of what is injected. */
  readonly injectedEnthalpyJ: number;
  readonly fuelSensibleJ: number;
  readonly freshSensibleJ: number;
  readonly unburntVapour: FrozenMixture | null;
  /** Fresh gas and fuel at 25 °C, less the heating value of what burns: what complete combustion leaves, cold. */
  readonly completeColdJ: number;
  /** At 25 °C, of what does not burn. */
  readonly unburntReferenceJ: number;
}

/** Sums over fresh gas and fuels; a fault where a number is out of range or the fresh gas has no state. */
export function engineCharge(input: ReciprocatingInput): EngineCharge | CycleFault {
  const bad = outOfRange(input);
  if (bad !== undefined) return { kind: 'fault', reason: 'not-in-range', of: bad };
  const { fuels, freshGas, completeness, intakeTemperatureK, intakePressurePa } = input;
  const atIntake = (temperatureK: number): MixtureState | NoEquilibrium =>
    freshGas.solve({ held: 'temperature-pressure', temperatureK, pressurePa: intakePressurePa });
  const drawnIn = atIntake(intakeTemperatureK);
  if (drawnIn.kind === 'none') return { kind: 'fault', reason: 'no-state', state: 'intake', why: drawnIn };
  const cold = atIntake(referenceTemperatureK);
  if (cold.kind === 'none') return { kind: 'fault', reason: 'no-state', state: 'intake', why: cold };
  const vaporised = fuels.filter(({ vapour }) => vapour !== null);
  const sum = (of: (fuel: (typeof fuels)[number]) => number): number =>
    fuels.reduce((total, fuel) => total + of(fuel), 0);
  const vapours = vaporised.flatMap(({ vapour }) => vapour?.parts ?? []);
  const burningMol = new Map(freshGas.elementMol);
  for (const { elementMol } of fuels) {
    for (const [symbol, mol] of elementMol) {
      burningMol.set(symbol, (burningMol.get(symbol) ?? 0) + completeness * mol);
    }
  }
  const lowerHeatingValueJ = sum((fuel) => fuel.lowerHeatingValueJ);
  const referenceJ = sum((fuel) => fuel.referenceEnthalpyJ);
  const unburnt = 1 - completeness;
  return {
    input,
    fresh: {
      gas: joined(freshGas, frozenMixture(vapours)),
      enthalpyJ: drawnIn.enthalpyJ + vaporised.reduce((total, { enthalpyJ }) => total + enthalpyJ, 0),
    },
    reacting: reactingCharge(burningMol, input.admits),
    burningMol,
    lowerHeatingValueJ,
    injectedEnthalpyJ: sum((fuel) => (fuel.vapour === null ? fuel.enthalpyJ : 0)),
    fuelSensibleJ: sum((fuel) => fuel.enthalpyJ - fuel.referenceEnthalpyJ),
    freshSensibleJ: drawnIn.enthalpyJ - cold.enthalpyJ,
    unburntVapour:
      unburnt > 0 && vapours.length > 0
        ? frozenMixture(vapours.map(({ species, mol }) => ({ species, mol: unburnt * mol })))
        : null,
    completeColdJ: cold.enthalpyJ + completeness * (referenceJ - lowerHeatingValueJ),
    unburntReferenceJ: unburnt * referenceJ,
  };
}

function outOfRange(input: ReciprocatingInput): keyof ReciprocatingInput | undefined {
  const isPositive = (value: number): boolean => value > 0 && Number.isFinite(value);
  const isShare = (value: number): boolean => value >= 0 && value <= 1;
  if (!(input.compressionRatio > 1) || !Number.isFinite(input.compressionRatio)) return 'compressionRatio';
  if (!isPositive(input.intakeTemperatureK)) return 'intakeTemperatureK';
  if (!isPositive(input.intakePressurePa)) return 'intakePressurePa';
  if (!isPositive(input.exhaustPressurePa)) return 'exhaustPressurePa';
  if (input.residual.by === 'share' && !(input.residual.share >= 0 && input.residual.share < 1)) return 'residual';
  if (!(input.completeness > 0 && input.completeness <= 1)) return 'completeness';
  if (!isShare(input.wallLossShare)) return 'wallLossShare';
  if (!isShare(input.wallLossInCombustion)) return 'wallLossInCombustion';
  if (!(input.mechanicalEfficiency > 0 && input.mechanicalEfficiency <= 1)) return 'mechanicalEfficiency';
  if (input.heatRelease.at === 'limited' && !isPositive(input.heatRelease.maximumPressurePa)) return 'heatRelease';
  if (input.compression.law === 'exponent' && !isPositive(input.compression.exponent)) return 'compression';
  return undefined;
}

/** What one passage through the cylinder makes of what stayed. */
interface Passage {
  readonly kind: 'passage';
  readonly filling: Filling;
  readonly compression: Compressed;
  /** Products of 1 kg of fuel times this are in the cylinder. */
  readonly contentTimes: number;
  readonly combustion: Combustion;
  readonly expansion: Expansion;
  readonly expanded: ExpandingState;
  readonly cooled: MixtureState;
  readonly blownDown: MixtureState;
  readonly stays: Staying;
}

interface Combustion {
  readonly burnt: Equilibrium;
  readonly limit: WorkCycle['limit'];
  readonly unburntEnergyJ: number;
  readonly compressedEnergyJ: number;
  readonly heatJ: number;
  readonly workJ: number;
}

/** Where solvers may start: the states of another round of the same question. */
interface Near {
  readonly burnt?: Equilibrium;
  readonly expanded?: ExpandingState;
}

export interface SolvedCycle {
  readonly cycle: WorkCycle;
  readonly expansion: Expansion;
  /** Products of 1 kg of fuel times this are in the cylinder. */
  readonly contentTimes: number;
  /** Of the residual gas's particles. */
  readonly passengersJ: number;
}

/** The cycle in a corner. `near`: one of another corner of the same engine. */
export function workCycle(
  engine: EngineCharge,
  corner: Corner,
  near?: SolvedCycle,
): (SolvedCycle & { readonly kind: 'solved' }) | CycleFault {
  const { input, lowerHeatingValueJ } = engine;
  let staying: Staying | null = null;
  let starts: Near = near === undefined ? {} : { burnt: near.cycle.burnt };
  let before: { readonly inK: number; readonly outK: number } | undefined;
  const hasResidual = input.residual.by === 'clearance' || input.residual.share > 0;
  for (let rounds = 1; rounds <= 80; rounds += 1) {
    const passage = pass(engine, corner, staying, starts);
    if (passage.kind === 'fault') return passage;
    const { stays, filling } = passage;
    const gapJ =
      staying === null
        ? hasResidual
          ? Infinity
          : 0
        : filling.staysTimes *
          (stays.gasEnthalpyJ + stays.particlesEnthalpyJ - staying.gasEnthalpyJ - staying.particlesEnthalpyJ);
    if (Math.abs(gapJ) <= closure * lowerHeatingValueJ) return finished(engine, corner, passage, rounds);
    starts = { burnt: passage.combustion.burnt, expanded: passage.expanded };
    const inK: number | undefined = staying?.temperatureK;
    let nextK = stays.temperatureK;
    if (inK !== undefined && before !== undefined && before.inK !== inK) {
      const slope = (stays.temperatureK - before.outK) / (inK - before.inK);
      // Where a cycle would carry its residual's heat on, plain rounds are the certain way.
      if (slope > -0.9 && slope < 0.9) nextK = inK + (stays.temperatureK - inK) / (1 - slope);
    }
    if (inK !== undefined) before = { inK, outK: stays.temperatureK };
    const moved = nextK === stays.temperatureK ? stays : atTemperature(stays, nextK, input.exhaustPressurePa);
    staying = moved ?? stays;
  }
  return {
    kind: 'fault',
    reason: 'no-state',
    state: 'residual',
    why: { kind: 'none', reason: 'not-converged', detail: JSON.stringify({ residual: input.residual, before }) },
  };
}

function atTemperature(staying: Staying, temperatureK: number, pressurePa: number): Staying | undefined {
  const state = staying.gas.solve({ held: 'temperature-pressure', temperatureK, pressurePa });
  return state.kind === 'none' ? undefined : { ...staying, temperatureK, gasEnthalpyJ: state.enthalpyJ };
}

function pass(engine: EngineCharge, corner: Corner, staying: Staying | null, near: Near): Passage | CycleFault {
  const { input, fresh } = engine;
  const none = (state: 'compression' | 'expansion' | 'blow-down', why: NoEquilibrium): CycleFault => ({
    kind: 'fault',
    reason: 'no-state',
    state,
    why,
  });
  const filling = fill(input, fresh, staying);
  if (filling.kind === 'fault') return filling;
  const largestM3 = filling.state.volumeM3;
  const smallestM3 = largestM3 / input.compressionRatio;
  const compression = compressed(filling.state, { volumeM3: smallestM3 }, input.compression);
  if (compression.kind === 'none') return none('compression', compression);
  const contentTimes = 1 + filling.staysTimes;
  const amounts = new Map([...engine.burningMol].map(([symbol, mol]) => [symbol, mol * contentTimes]));
  const reacting = engine.reacting.withAmounts(amounts);
  const passengersJ = filling.staysTimes * (staying?.particlesEnthalpyJ ?? 0);
  const combustion = burn(engine, reacting, compression.state, passengersJ, near.burnt);
  if ('kind' in combustion) return combustion;
  const { burnt } = combustion;
  const expansion = expansionFrom(reacting, burnt, corner, input.frozenBelowK);
  const { entropyJPerK } = expansion.start;
  const expanded = expansion.to({ held: 'entropy-volume', entropyJPerK, volumeM3: largestM3 }, near.expanded);
  if (expanded.kind === 'none') return none('expansion', expanded);
  const mixture = expanded.near.kind === 'mixture' ? expanded.near.mixture : mixtureFrozenFrom(expanded.near);
  const apartJ = expanded.apart?.enthalpyJ ?? 0;
  const heatJ = engine.lowerHeatingValueJ * input.wallLossShare * (1 - input.wallLossInCombustion);
  const cooled = mixture.solve(
    { held: 'energy-volume', energyJ: expanded.energyJ - apartJ - heatJ, volumeM3: largestM3 },
    expanded.temperatureK,
  );
  if (cooled.kind === 'none') return none('expansion', cooled);
  const blownDown = mixture.solve(
    { held: 'entropy-pressure', entropyJPerK: cooled.entropyJPerK, pressurePa: input.exhaustPressurePa },
    cooled.temperatureK,
  );
  if (blownDown.kind === 'none') return none('blow-down', blownDown);
  const gas = frozenMixture(
    mixture.parts
      .filter(({ species }) => species.formula.phase === 'g')
      .map(({ species, mol }) => ({ species, mol: mol / contentTimes })),
  );
  const gasState = gas.solve({
    held: 'temperature-pressure',
    temperatureK: blownDown.temperatureK,
    pressurePa: input.exhaustPressurePa,
  });
  if (gasState.kind === 'none') return none('blow-down', gasState);
  return {
    kind: 'passage',
    filling,
    compression,
    contentTimes,
    combustion,
    expansion,
    expanded,
    cooled,
    blownDown,
    stays: {
      gas,
      temperatureK: blownDown.temperatureK,
      gasEnthalpyJ: gasState.enthalpyJ,
      particlesEnthalpyJ: (blownDown.enthalpyJ + apartJ) / contentTimes - gasState.enthalpyJ,
    },
  };
}

/**
 * State 3. Over a part at constant volume and one at constant pressure p the first law gives the enthalpy at the end without
 * asking how the fuel is shared between them: the energy at the start, p times the smallest volume, less the heat.
 */
function burn(
  engine: EngineCharge,
  reacting: ReactingCharge,
  start: MixtureState,
  passengersJ: number,
  near: Equilibrium | undefined,
): Combustion | CycleFault {
  const { input, unburntVapour } = engine;
  const { heatRelease, completeness, wallLossShare, wallLossInCombustion } = input;
  const { volumeM3, pressurePa, temperatureK } = start;
  const leaves = unburntVapour?.solve({ held: 'temperature-volume', temperatureK, volumeM3 });
  const noState = (why: NoEquilibrium): CycleFault => ({
    kind: 'fault',
    reason: 'no-state',
    state: 'combustion',
    why,
  });
  if (leaves?.kind === 'none') return noState(leaves);
  const unburntEnergyJ = leaves?.energyJ ?? 0;
  const heatJ = engine.lowerHeatingValueJ * wallLossShare * wallLossInCombustion;
  const energyJ = start.energyJ + passengersJ + completeness * engine.injectedEnthalpyJ - unburntEnergyJ - heatJ;
  const atPressure = (heldPa: number): Held => ({
    held: 'enthalpy-pressure',
    enthalpyJ: energyJ + heldPa * volumeM3,
    pressurePa: heldPa,
  });
  const ended = (state: Equilibrium | NoEquilibrium, limit: WorkCycle['limit']): Combustion | CycleFault =>
    state.kind === 'none'
      ? noState(state)
      : {
          burnt: state,
          limit,
          unburntEnergyJ,
          compressedEnergyJ: start.energyJ,
          heatJ,
          workJ: state.pressurePa * (state.volumeM3 - volumeM3),
        };
  const maximumPa = heatRelease.at === 'limited' ? heatRelease.maximumPressurePa : Infinity;
  if (heatRelease.at === 'pressure') return ended(reacting.burnt(atPressure(pressurePa), near), 'none');
  if (pressurePa >= maximumPa) return ended(reacting.burnt(atPressure(pressurePa), near), 'passed-by-compression');
  const atVolume = reacting.burnt({ held: 'energy-volume', energyJ, volumeM3 }, near);
  if (atVolume.kind === 'none') return noState(atVolume);
  if (!(atVolume.pressurePa > maximumPa)) {
    const combustion = ended(atVolume, heatRelease.at === 'limited' ? 'kept' : 'none');
    // The volume is the one that was held: a difference of roundings is no work.
    return 'kind' in combustion ? combustion : { ...combustion, workJ: 0 };
  }
  return ended(reacting.burnt(atPressure(maximumPa), atVolume), 'reached');
}

function finished(
  engine: EngineCharge,
  corner: Corner,
  passage: Passage,
  rounds: number,
): (SolvedCycle & { readonly kind: 'solved' }) | CycleFault {
  const { input, fresh } = engine;
  const { filling, compression, combustion, expansion, expanded, cooled, blownDown, contentTimes } = passage;
  const { burnt, unburntEnergyJ } = combustion;
  const largestM3 = filling.state.volumeM3;
  const sweptM3 = largestM3 * (1 - 1 / input.compressionRatio);
  const pumpingWorkJ = pumpingWork(input, sweptM3);
  const gasRT = burnt.gasMol * molarGasConstantJPerMolK * burnt.temperatureK;
  const expansionWorkJ = combustion.workJ + (burnt.enthalpyJ - gasRT - expanded.energyJ);
  const expansionHeatJ = expanded.energyJ - (expanded.apart?.enthalpyJ ?? 0) - cooled.energyJ;
  const passengersJ = filling.staysTimes * passage.stays.particlesEnthalpyJ;
  // First law over the exchange of gas, from 4 back to 1; unburnt fuel leaves beside it.
  const apartJ = expanded.apart?.enthalpyJ ?? 0;
  const exhaustEnthalpyJ =
    fresh.enthalpyJ + (cooled.energyJ + apartJ) - (filling.state.energyJ + passengersJ) + pumpingWorkJ;
  const pressurePa = input.exhaustPressurePa;
  const { mixture } = blownDown;
  const exhaust = mixture.solve(
    { held: 'enthalpy-pressure', enthalpyJ: contentTimes * exhaustEnthalpyJ - apartJ, pressurePa },
    blownDown.temperatureK,
  );
  if (exhaust.kind === 'none') return { kind: 'fault', reason: 'no-state', state: 'exhaust', why: exhaust };
  const cold = coldEnthalpy(expanded, pressurePa);
  const indicatedWorkJ = expansionWorkJ - compression.pistonWorkJ;
  const netJ = indicatedWorkJ - pumpingWorkJ;
  const brakeWorkJ = netJ > 0 ? netJ * input.mechanicalEfficiency : netJ;
  const cycle: WorkCycle = {
    kind: 'cycle',
    corner,
    filled: filling.state,
    compressed: compression.state,
    burnt,
    expanded,
    cooled,
    blownDown,
    exhaustTemperatureK: exhaust.temperatureK,
    exhaustEnthalpyJ,
    exhaustColdEnthalpyJ: cold / contentTimes,
    residualShare: filling.staysTimes / contentTimes,
    balance: {
      sweptM3,
      compressionWorkJ: compression.pistonWorkJ,
      expansionWorkJ,
      indicatedWorkJ,
      pumpingWorkJ,
      frictionWorkJ: netJ - brakeWorkJ,
      brakeWorkJ,
      compressionHeatJ: compression.heatOutJ,
      combustionHeatJ: combustion.heatJ,
      expansionHeatJ,
      unburntSensibleJ: unburntSensible(engine, unburntEnergyJ),
      freshSensibleJ: engine.freshSensibleJ,
      fuelSensibleJ: engine.fuelSensibleJ,
    },
    limit: combustion.limit,
    rounds,
  };
  return { kind: 'solved', cycle, expansion, contentTimes, passengersJ };
}

/** Everything frozen at 25 °C, particles set apart included. */
function coldEnthalpy(expanded: ExpandingState, pressurePa: number): number {
  return expanded.matter({ temperatureK: referenceTemperatureK, pressurePa }).enthalpyJ;
}

/** Vapour leaves with the energy of the end of compression, what was to be injected as it came. */
function unburntSensible({ input, injectedEnthalpyJ, unburntReferenceJ }: EngineCharge, energyJ: number): number {
  return energyJ + (1 - input.completeness) * injectedEnthalpyJ - unburntReferenceJ;
}
