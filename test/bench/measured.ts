// What the benches have in common: times of many rounds made into one figure, printed as a JSON line. The processor's time
// stands beside the clock's, because other work on the machine adds to the clock's alone. Judges nothing.

export interface Round {
  readonly ms: number;
  readonly cpuMs: number;
}

/** Wall and processor time (of this whole process) of some work. */
export async function timed(work: () => unknown): Promise<Round> {
  const cpu = process.cpuUsage();
  const start = performance.now();
  await work();
  const ms = performance.now() - start;
  const { user, system } = process.cpuUsage(cpu);
  return { ms, cpuMs: (user + system) / 1000 };
}

/** The value that this share of the rounds does not exceed (0.5: the median). */
export function quantile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((left, right) => left - right);
  return sorted[Math.min(sorted.length - 1, Math.ceil(share * sorted.length) - 1)] ?? NaN;
}

export interface Measurement {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  /** What it should stay under. */
  readonly budget?: number | undefined;
  /** Processor time for the same, where it was taken. */
  readonly cpu?: number | undefined;
  readonly note?: string | undefined;
}

export function print({ value, cpu, ...rest }: Measurement): void {
  const rounded = (number: number): number => Number(number.toPrecision(3));
  const line = { ...rest, value: rounded(value), ...(cpu === undefined ? {} : { cpu: rounded(cpu) }) };
  console.log(JSON.stringify(line));
}

/** Median or 95th percentile of rounds, the first tenth left out to warm up. */
export function printRounds(
  name: string,
  rounds: readonly Round[],
  { of, budget }: { of: 'median' | 'p95'; budget?: number },
): void {
  const warm = rounds.slice(Math.ceil(rounds.length / 10));
  const share = of === 'median' ? 0.5 : 0.95;
  print({
    name: `${name}, ${of}`,
    value: quantile(
      warm.map(({ ms }) => ms),
      share,
    ),
    cpu: quantile(
      warm.map(({ cpuMs }) => cpuMs),
      share,
    ),
    unit: 'ms',
    budget,
  });
}
