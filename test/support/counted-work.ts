// Counts the work of a piece of the program instead of timing it: how often each of its blocks is run, as V8 counts them
// for coverage. The count is the same on any machine, however busy. It sees neither what built-in functions do inside nor
// functions that were compiled before counting began, so the code to be counted must be imported after `startCounting`.
// Source: Chrome DevTools Protocol, domain "Profiler", `startPreciseCoverage` and `takePreciseCoverage`.
import { Session, type Profiler } from 'node:inspector/promises';

export interface Counting {
  /** How many blocks of the scripts whose address fits are run by `work`. */
  stepsOf(work: () => void, address: RegExp): Promise<number>;
  stop(): void;
}

/** Counts from now on, in this thread. */
export async function startCounting(): Promise<Counting> {
  const session = new Session();
  session.connect();
  await session.post('Profiler.enable');
  await session.post('Profiler.startPreciseCoverage', { callCount: true, detailed: true });
  // Taking the counts sets them back to zero.
  const take = async (): Promise<readonly Profiler.ScriptCoverage[]> =>
    (await session.post('Profiler.takePreciseCoverage')).result;
  return {
    async stepsOf(work, address) {
      await take();
      work();
      const scripts = (await take()).filter(({ url }) => address.test(url));
      const ranges = scripts.flatMap(({ functions }) => functions.flatMap((one) => one.ranges));
      return ranges.reduce((sum, { count }) => sum + count, 0);
    },
    stop() {
      session.disconnect();
    },
  };
}
