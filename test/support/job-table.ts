// Jobs for the tests of the runner: one that works out something real, ones that take long with and without heeding that
// they are told to stop, and ones that fail in each way there is. Invariant: the same table serves on the thread and in
// the worker of job-worker.ts.
import type { JobTable } from '../../server/jobs/job.ts';
import { allPhases, phaseOfId, propertiesOfPhase } from '../../server/core/substance/phases.ts';

interface Curve {
  readonly phase: string;
  readonly temperaturesK: Float64Array;
}

/** Molar Gibbs energies of a phase in J/mol, from the property tables. */
export function gibbsEnergies({ phase, temperaturesK }: Curve, shouldStop: () => boolean): Float64Array | null {
  const found = phaseOfId(phase);
  if (!found) throw new Error(`there is no phase ${phase}`);
  const energies = new Float64Array(temperaturesK.length);
  for (const [index, temperatureK] of temperaturesK.entries()) {
    if (shouldStop()) return null;
    energies[index] = propertiesOfPhase(found, temperatureK)?.gibbsJPerMol ?? NaN;
  }
  return energies;
}

/** The sum of the whole numbers up to one, one by one. 13 fails, and 666 ends the worker. */
export function sumUpTo(last: number, shouldStop: () => boolean): number | null {
  if (last === 13) throw new Error('thirteen is not summed');
  if (last === 666) process.exit(3);
  let sum = 0;
  for (let next = 1; next <= last; next++) {
    if (shouldStop()) return null;
    sum += next;
  }
  return sum;
}

export const jobTable = {
  gibbsEnergies,
  sumUpTo,
  /** Reads all there is of property tables: how many phases have a Gibbs energy at a temperature. */
  everyPhase(temperatureK: number): number | null {
    return allPhases().filter((phase) => propertiesOfPhase(phase, temperatureK)).length;
  },
  /** Goes on until it is told to stop. */
  endless(_input: undefined, shouldStop: () => boolean): string | null {
    while (!shouldStop());
    return null;
  },
  /** Goes on whatever it is told. */
  deaf(): string | null {
    for (;;);
  },
  throwing({ message }: { message: string }): string | null {
    throw new RangeError(message);
  },
  /** Ends its worker. */
  ending(): string | null {
    return process.exit(3);
  },
  /** Fills all the memory there is. */
  filling(): string | null {
    const kept: number[][] = [];
    for (;;) kept.push(new Array<number>(10_000).fill(kept.length));
  },
  /** Gives what cannot be copied to another thread. */
  unsendable(): (() => string) | null {
    return () => 'here';
  },
  /** Gives up untold. */
  silent(): string | null {
    return null;
  },
} as const satisfies JobTable;
