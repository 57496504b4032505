// Engines for tests: fuels of the catalogue or by elements, in plain air, compressed and burnt.

import { heatingValueOfFuel } from '../../../../server/core/balance/heating-value.ts';
import type { BurnStream } from '../../../../server/core/burn/burn.ts';
import { oxidantForLambda } from '../../../../server/core/burn/charge.ts';
import { gasOf } from '../../../../server/core/engine/charge.ts';
import { corners } from '../../../../server/core/engine/expansion.ts';
import type { Corner } from '../../../../server/core/engine/expansion.ts';
import type { FrozenMixture } from '../../../../server/core/engine/frozen-mixture.ts';
import type { EngineFuel, ReciprocatingInput } from '../../../../server/core/engine/reciprocating.ts';
import { engineCharge, workCycle } from '../../../../server/core/engine/work-cycle.ts';
import type { EngineCharge, SolvedCycle } from '../../../../server/core/engine/work-cycle.ts';
import { plainAir } from '../burn/streams.ts';

export function gas(amounts: Readonly<Record<string, number>>): FrozenMixture {
  const found = gasOf(new Map(Object.entries(amounts)));
  if ('kind' in found) throw new Error(found.ids.join());
  return found;
}

const airKgPerMol = 0.21 * 0.031998 + 0.79 * 0.028014;

/** Oxygen and nitrogen, 21 to 79 by volume, kg of it. */
export function air(massKg: number): FrozenMixture {
  return gas({ 'O2(g)': (0.21 * massKg) / airKgPerMol, 'N2(g)': (0.79 * massKg) / airKgPerMol });
}

/** 1 kg of a stream as it is injected, its heating value on the usual slate. */
export function injected(stream: BurnStream): EngineFuel {
  const value = heatingValueOfFuel(stream.elementMolPerKg, stream.referenceEnthalpyJPerKg ?? Number.NaN);
  if (value.kind !== 'heating-value') throw new Error(JSON.stringify(value));
  return {
    massKg: 1,
    elementMol: stream.elementMolPerKg,
    enthalpyJ: stream.enthalpyJPerKg ?? Number.NaN,
    referenceEnthalpyJ: stream.referenceEnthalpyJPerKg ?? Number.NaN,
    lowerHeatingValueJ: value.lowerJPerKg,
    vapour: null,
  };
}

/** A diesel engine on a fuel, aspirated from 300 K and 1 bar, without losses, with what is given changed. */
export function engine(stream: BurnStream, lambda: number, more: Partial<ReciprocatingInput> = {}): EngineCharge {
  const ratio = oxidantForLambda(stream, plainAir());
  if (typeof ratio !== 'number') throw new Error(JSON.stringify(ratio));
  return engineOf({
    compressionRatio: 16,
    compression: { law: 'isentropic' },
    heatRelease: { at: 'pressure' },
    fuels: [injected(stream)],
    freshGas: air(lambda * ratio),
    intakeTemperatureK: 300,
    intakePressurePa: 1e5,
    exhaustPressurePa: 1e5,
    strokes: 4,
    residual: { by: 'clearance' },
    completeness: 1,
    wallLossShare: 0,
    wallLossInCombustion: 1,
    frozenBelowK: null,
    mechanicalEfficiency: 1,
    ...more,
  });
}

export function engineOf(input: ReciprocatingInput): EngineCharge {
  const charge = engineCharge(input);
  if ('kind' in charge) throw new Error(JSON.stringify(charge));
  return charge;
}

export function solvedCycle(charge: EngineCharge, corner: Corner = corners[0] as Corner): SolvedCycle {
  const solved = workCycle(charge, corner);
  if (solved.kind === 'fault') throw new Error(JSON.stringify(solved));
  return solved;
}
