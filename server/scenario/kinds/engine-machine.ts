// The engine as duties and services use it, whichever way it is worked out: what it burns and how much of it, one answer a
// fuel; and what slips through it, as written. Knows no cycle and no measurement. Invariant: a fuel is worked out once.

import type { BurningEngine, EngineMachine, EngineSlips, NotBurning } from '../machinery.ts';
import type { Material } from '../material.ts';
import type { EngineRead } from './engine-entries.ts';

export function engineMachine(
  name: string,
  read: EngineRead,
  fuel: Material,
  burningOn: (fuel: Material) => BurningEngine | NotBurning,
): EngineMachine {
  const known = new Map<Material, BurningEngine | NotBurning>();
  return {
    machinery: 'engine',
    name,
    fuel,
    ratedPower: read.maximumContinuousRating?.value.quantity ?? null,
    burning(other) {
      const found = known.get(other) ?? burningOn(other);
      known.set(other, found);
      return found;
    },
  };
}

export function slipsOf(read: EngineRead): EngineSlips {
  return {
    methane: read.methaneSlip?.value ?? null,
    nitrousOxide: read.nitrousOxide?.value ?? null,
    ammonia: read.ammoniaSlip?.value ?? null,
    urea: read.urea?.value ?? null,
  };
}
