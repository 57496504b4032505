// How long the fuzz tests run and from which seed: FUZZ_INPUTS inputs, or FUZZ_SECONDS seconds, half a minute for each test
// where neither is given; FUZZ_SEED gives a printed seed back. Invariant: without FUZZ_SEED every run has a seed of its own.

export interface FuzzRun {
  readonly seed: number;
  readonly title: string;
  readonly timeoutMs: number;
  /** Fewer inputs than this mean that the test did not test. */
  readonly leastCount: number;
  /** For `fc.assert`. */
  readonly parameters: { readonly seed: number; readonly numRuns: number; readonly interruptAfterTimeLimit?: number };
}

export function fuzzRun(): FuzzRun {
  const seed = numberIn('FUZZ_SEED') ?? Date.now() % 2 ** 31;
  const inputs = numberIn('FUZZ_INPUTS');
  if (inputs !== null) {
    const parameters = { seed, numRuns: inputs };
    return { seed, title: `${inputs} of them`, timeoutMs: 1000 * inputs, leastCount: inputs - 1, parameters };
  }
  const seconds = numberIn('FUZZ_SECONDS') ?? 30;
  return {
    seed,
    title: `for ${seconds} s`,
    timeoutMs: (seconds + 60) * 1000,
    leastCount: seconds,
    parameters: { seed, numRuns: Number.MAX_SAFE_INTEGER, interruptAfterTimeLimit: seconds * 1000 },
  };
}

function numberIn(variable: string): number | null {
  const text = process.env[variable];
  return text === undefined || text === '' ? null : Number(text);
}

/** How long the work of this program took since `before`, however busy the machine is with others. */
export function workedMs(before: NodeJS.CpuUsage): number {
  const { user, system } = process.cpuUsage(before);
  return (user + system) / 1000;
}
