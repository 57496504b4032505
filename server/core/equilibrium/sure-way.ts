// The sure way to each state problem, taken when the quick one does not rest at a certified minimum: temperature and pressure
// by the interior path; whatever else is held by narrowing temperature or pressure between bounds, since at equilibrium
// enthalpy, entropy and energy only rise with temperature, and volume only falls with pressure.
// Where the held property jumps, two states share it: phases that change into one another at that temperature, or a crystal at
// the end of its data.
// Knows no speed. Invariant: every state it passes through is certified.

import { molarGasConstantJPerMolK, standardPressurePa } from '../quantity/constants.ts';
import { answerOf, isCertified, responseOf, stateOf } from './answer.ts';
import type { Check } from './answer.ts';
import { blended } from './blend.ts';
import { findZero } from './bracket.ts';
import type { Rising } from './bracket.ts';
import { followCentre } from './centre.ts';
import { descend, takePresentBasis } from './descent.ts';
import type { Descent } from './descent.ts';
import type { Equilibrium, NoEquilibrium } from './equilibrium.ts';
import { keep, keepBasis, restore, restoreBasis } from './kept.ts';
import { offProportion } from './off-proportion.ts';
import { takeFractions, takePressure, takeStep } from './newton.ts';
import type { Aim } from './newton.ts';
import { spansOf } from './spans.ts';
import type { Range } from './spans.ts';
import { startCold, startNear } from './start.ts';
import { admitPhases, takeAmounts } from './work.ts';
import type { Work } from './work.ts';

/** Pressures in Pa between which a held volume is sought; far outside anything real. */
const lowestPressurePa = 1e-250;
const highestPressurePa = 1e15;

/** Temperature and pressure held: quick from cold, then by the interior path. Undefined when neither is certified. */
export function atTemperatureAndPressure(
  work: Work,
  elementMol: Float64Array,
  temperatureK: number,
  pressurePa: number,
  descent: Descent,
  near?: Equilibrium,
): Equilibrium | undefined {
  const aim = pressureAim(pressurePa);
  admitPhases(work, temperatureK);
  const bounds = { lowestK: temperatureK, highestK: temperatureK };
  const reachedFrom = (): Equilibrium | undefined => {
    if (near !== undefined && startNear(work, aim, temperatureK, near)) {
      const warm = descendAndCertify(work, elementMol, aim, bounds, pressurePa, descent);
      if (warm !== undefined) return warm;
    }
    return byInterior(work, elementMol, aim, temperatureK, pressurePa, descent);
  };
  const beside = (): Equilibrium | undefined => {
    takeAmounts(work, offProportion(work, elementMol));
    const answer = reachedFrom();
    takeAmounts(work, elementMol);
    return answer;
  };
  // What one state of a search needed the next one needs as well.
  if (descent.isOffProportion) return beside() ?? reachedFrom();
  const answer = reachedFrom();
  if (answer !== undefined) return answer;
  const found = beside();
  descent.isOffProportion = found !== undefined;
  return found;
}

/** For the amounts that `work` holds: quick from cold, then along the interior path, certified against `elementMol`. */
function byInterior(
  work: Work,
  elementMol: Float64Array,
  aim: Aim,
  temperatureK: number,
  pressurePa: number,
  descent: Descent,
): Equilibrium | undefined {
  const bounds = { lowestK: temperatureK, highestK: temperatureK };
  if (startCold(work, aim, temperatureK, temperatureK, temperatureK) !== undefined) return undefined;
  const quick = descendAndCertify(work, elementMol, aim, bounds, pressurePa, descent);
  if (quick !== undefined) return quick;
  startCold(work, aim, temperatureK, temperatureK, temperatureK);
  const basis = keepBasis(work);
  return followCentre(work, aim, () => {
    const before = keep(work);
    const asItIs = certified(work, elementMol, aim, pressurePa, descent);
    const polished = (prepare: () => void): Equilibrium | undefined => {
      restoreBasis(work, basis);
      restore(work, before, aim);
      prepare();
      return descendAndCertify(work, elementMol, aim, bounds, pressurePa, descent);
    };
    const answer =
      polished(() => undefined) ??
      // Balances written in what is rare now are lost in the rounding of what is plentiful.
      polished(() => takePresentBasis(work, aim)) ??
      // Where the elements fit some phases exactly, whole balances are left to traces that decide nothing: they keep their
      // potentials while the others are solved.
      polished(() => (work.idleBelow = idleShare * leastGiven(work)));
    work.idleBelow = 0;
    restoreBasis(work, basis);
    return answer ?? asItIs;
  });
}

/** A balance with less in it than this share of the rarest element is not needed for the certificate. */
const idleShare = 1e-11;

function leastGiven({ given }: Work): number {
  return given.reduce((least, amount) => (amount > 0 ? Math.min(least, amount) : least), Infinity);
}

/** Temperature and volume held: quick from cold, then by narrowing the pressure. */
export function atTemperatureAndVolume(
  work: Work,
  elementMol: Float64Array,
  temperatureK: number,
  volumeM3: number,
  descent: Descent,
): Equilibrium | undefined {
  const aim = volumeAim(work, volumeM3);
  admitPhases(work, temperatureK);
  const bounds = { lowestK: temperatureK, highestK: temperatureK };
  if (startCold(work, aim, temperatureK, temperatureK, temperatureK) !== undefined) return undefined;
  const quick = descendAndCertify(work, elementMol, aim, bounds, 0, descent);
  if (quick !== undefined) return quick;
  const answer = byPressure(work, elementMol, elementMol, temperatureK, volumeM3, descent);
  if (answer !== undefined) return answer;
  admitPhases(work, temperatureK);
  const beside = offProportion(work, elementMol);
  takeAmounts(work, beside);
  const found = byPressure(work, beside, elementMol, temperatureK, volumeM3, descent);
  takeAmounts(work, elementMol);
  return found;
}

/** The state of `sought` that fills the volume, certified against `elementMol`. */
function byPressure(
  work: Work,
  sought: Float64Array,
  elementMol: Float64Array,
  temperatureK: number,
  volumeM3: number,
  descent: Descent,
): Equilibrium | undefined {
  let last: Equilibrium | undefined;
  let slope = 1;
  const end = reach(
    {
      stateAt: (logPressure, near) => {
        const state = atTemperatureAndPressure(work, sought, temperatureK, Math.exp(logPressure), descent, near);
        // How fast ln V falls with ln p: as fast as an ideal gas's, and faster where some of it condenses.
        if (state !== undefined && last !== undefined && state.volumeM3 > 0 && last.volumeM3 > 0)
          slope = Math.log(last.volumeM3 / state.volumeM3) / Math.log(state.pressurePa / last.pressurePa);
        last = state;
        return state;
      },
      valueOf: (state) => Math.log(volumeM3 / state.volumeM3),
      slopeOf: ({ volumeM3: found }) => (found > 0 ? Math.max(1, slope) : null),
      nearEnough,
    },
    [Math.log(lowestPressurePa), Math.log(highestPressurePa)],
    Math.log(standardPressurePa),
    (state) => state.volumeM3,
    volumeM3,
    sought,
  );
  if (typeof end === 'string') return undefined;
  if (end.pinned === null && sought === elementMol) return end;
  const bounds = { lowestK: temperatureK, highestK: temperatureK };
  const state = settled(work, elementMol, volumeAim(work, volumeM3), end, bounds, descent);
  if (state !== undefined) return state;
  return sought === elementMol && isCertified(end.certificate) ? end : undefined;
}

/** Enthalpy, entropy or energy held with pressure or volume, by narrowing the temperature. */
export function byTemperature(
  work: Work,
  elementMol: Float64Array,
  aim: Aim,
  check: Check & { readonly value: number },
  held: { readonly pressurePa: number } | { readonly volumeM3: number },
  range: Range,
  descent: Descent,
): Equilibrium | NoEquilibrium | undefined {
  let atoms = 0;
  for (const amount of elementMol) atoms += amount;
  const perAtoms = 1 / (molarGasConstantJPerMolK * atoms);
  const valueOf = (state: Equilibrium): number =>
    ((reached(state, check) - check.value) * perAtoms) / (check.kind === 'entropy' ? 1 : state.temperatureK);
  const searchIn = ({ lowestK, highestK }: Range): ReturnType<typeof reach> =>
    reach(
      {
        stateAt: (temperatureK, near) =>
          'pressurePa' in held
            ? atTemperatureAndPressure(work, elementMol, temperatureK, held.pressurePa, descent, near)
            : atTemperatureAndVolume(work, elementMol, temperatureK, held.volumeM3, descent),
        valueOf,
        // The heat capacity is that at constant pressure.
        slopeOf: ({ heatCapacityJPerK, temperatureK }) =>
          heatCapacityJPerK === null || 'volumeM3' in held ? null : (heatCapacityJPerK * perAtoms) / temperatureK,
        nearEnough: 'volumeM3' in held ? nearEnoughInVolume : nearEnough,
        // Where phases change into one another, or nearly so, both sides have all that takes part.
        between: (low, high) =>
          settled(
            work,
            elementMol,
            aim,
            blended(low, high, { held: check.value, low: reached(low, check), high: reached(high, check) }, elementMol),
            range,
            descent,
            check,
          ),
      },
      [lowestK, highestK],
      firstTemperatureK,
      (state) => reached(state, check),
      check.value,
      elementMol,
    );
  let span = range;
  let end = searchIn(span);
  if (end === 'failed') {
    // Somewhere in the range there may be no state at all: each span that has states is searched by itself. What is asked
    // between the end of one and the start of the next is beyond the first.
    for (const next of spansOf(work, aim, range)) {
      const found = searchIn(next);
      if (found === 'below' && end === 'above') break;
      [span, end] = [next, found];
      if (found !== 'above') break;
    }
  }
  if (end === 'failed') return undefined;
  if (end === 'below') return { kind: 'none', reason: 'outside-tables', side: 'below', limitK: span.lowestK };
  if (end === 'above') return { kind: 'none', reason: 'outside-tables', side: 'above', limitK: span.highestK };
  if (end.pinned !== null && end.pinned.by !== 'end-of-phase') {
    const state = settled(work, elementMol, aim, end, range, descent, check);
    if (state !== undefined) return state;
  }
  const certificate = { ...end.certificate, heldResidual: Math.abs(valueOf(end)) };
  return isCertified(certificate) ? { ...end, certificate } : undefined;
}

const firstTemperatureK = 1500;

function reached(state: Equilibrium, check: Check): number {
  if (check.kind === 'entropy') return state.entropyJPerK;
  return check.kind === 'energy' ? state.enthalpyJ - state.pressurePa * state.volumeM3 : state.enthalpyJ;
}

/** The state at the zero, or the blend of those at a jump in the shares that hold what is held. */
function reach(
  rising: Rising<Equilibrium>,
  bounds: readonly [number, number],
  start: number,
  amountHeld: (state: Equilibrium) => number,
  held: number,
  elementMol: Float64Array,
): Equilibrium | 'below' | 'above' | 'failed' {
  const end = findZero(rising, bounds, start);
  if (end.kind === 'root') return end.state;
  if (end.kind !== 'jump') return end.kind;
  // The last step of a continuous function between two neighbouring numbers is no jump.
  if (Math.max(-end.lowValue, end.highValue) < certifiedValue) {
    return -end.lowValue < end.highValue ? end.low : end.high;
  }
  return blended(end.low, end.high, { held, low: amountHeld(end.low), high: amountHeld(end.high) }, elementMol);
}

/** The exact state beside a blend of phases that change into one another: what is rare follows the blend's potentials. */
function settled(
  work: Work,
  elementMol: Float64Array,
  aim: Aim,
  blend: Equilibrium,
  range: Range,
  descent: Descent,
  check: Check = { kind: 'none' },
): Equilibrium | undefined {
  const { temperatureK, pressurePa } = blend;
  admitPhases(work, temperatureK);
  if (!startNear(work, aim, aim.seeks === 'temperature' ? temperatureK : undefined, blend)) return undefined;
  return descendAndCertify(work, elementMol, aim, range, pressurePa, descent, check);
}

/** A held property this near (over R times the atoms, and T) is met. */
const nearEnough = 1e-12;
/** With a volume held each state is itself the end of a search, and no better than that. */
const nearEnoughInVolume = 1e-10;
const certifiedValue = 1e-9;

export function pressureAim(pressurePa: number): Aim {
  return {
    isVolume: false,
    logPressure: Math.log(pressurePa / standardPressurePa),
    gasKPerBar: 0,
    seeks: 'temperature',
    aimed: 0,
  };
}

export function volumeAim(work: Work, volumeM3: number): Aim {
  const gasKPerBar = (volumeM3 * standardPressurePa) / (molarGasConstantJPerMolK * work.scaleMol);
  return { isVolume: true, logPressure: 0, gasKPerBar, seeks: 'temperature', aimed: 0 };
}

/**
 * Goes down to rest and answers when the certificate holds. A balance of traces may want a step or two more than the potentials
 * show, and be lost in rounding until it is written in the phases that have turned out the most abundant.
 */
export function descendAndCertify(
  work: Work,
  elementMol: Float64Array,
  aim: Aim,
  range: Range,
  pressurePa: number,
  descent: Descent,
  check: Check = { kind: 'none' },
): Equilibrium | undefined {
  if (descend(work, aim, range, descent) !== 'rest') return undefined;
  for (let extra = 0; extra < 4; extra += 1) {
    const before = aim.isVolume ? keep(work) : undefined;
    const answer = certified(work, elementMol, aim, pressurePa, descent, check);
    if (answer !== undefined) return answer;
    if (before !== undefined) restore(work, before, aim);
    if (extra === 1) takePresentBasis(work, aim);
    takeStep(work, aim, descent.step, range.lowestK, range.highestK);
    descent.steps += 1;
    if (!(descent.step.change < 1e-4)) return undefined;
  }
  return undefined;
}

/** The answer of the state at rest, when its certificate holds. */
function certified(
  work: Work,
  elementMol: Float64Array,
  aim: Aim,
  pressurePa: number,
  descent: Descent,
  check: Check = { kind: 'none' },
): Equilibrium | undefined {
  let atPressure = aim;
  let pressure = pressurePa;
  if (aim.isVolume) {
    // Partial pressures become fractions of their sum.
    pressure = ((work.gasAmount * work.temperatureK) / aim.gasKPerBar) * standardPressurePa;
    if (!(pressure > 0)) return undefined;
    atPressure = { ...aim, isVolume: false, logPressure: Math.log(pressure / standardPressurePa) };
    takePressure(work, atPressure.logPressure);
    takeFractions(work, atPressure);
  }
  const response = responseOf(work, atPressure);
  const answer = answerOf(work.set, stateOf(work, pressure), response, elementMol, check, descent.steps);
  return isCertified(answer.certificate) ? answer : undefined;
}
