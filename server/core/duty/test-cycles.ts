// The steady test cycles of type B of ISO 8178-4:2020: their modes, loads and weighting factors. A table and what follows
// from it; knows no engine. Invariant: the weighting factors of a cycle add up to 1.
// Sources: each cycle's row says whether its numbers were seen in a transcription or are from memory; see
// test/reference/test-cycles.json. A test cycle certifies an engine and does not describe a duty.

export type ModeSpeed = 'rated' | 'intermediate' | 'idle' | number;

export interface TestMode {
  /** The rated, intermediate or idle speed, or a share of the rated speed. */
  readonly speed: ModeSpeed;
  /** Share of the torque at that speed, or of the rated power where the cycle is told in power. */
  readonly share: number;
  readonly weight: number;
}

export interface TestCycle {
  readonly name: string;
  readonly use: string;
  readonly of: 'torque' | 'power';
  readonly modes: readonly TestMode[];
}

/** Speed shares of the propeller curve for 100, 75, 50 and 25 % power. */
const propellerSpeeds = [1, 0.91, 0.8, 0.63] as const;

export const testCycles: readonly TestCycle[] = [
  {
    name: 'C1',
    use: 'off-road vehicles and machines, diesel',
    of: 'torque',
    modes: [
      ...at('rated', [1, 0.15], [0.75, 0.15], [0.5, 0.15], [0.1, 0.1]),
      ...at('intermediate', [1, 0.1], [0.75, 0.1], [0.5, 0.1]),
      ...at('idle', [0, 0.15]),
    ],
  },
  {
    name: 'C2',
    use: 'off-road vehicles and machines, spark ignition above 20 kW',
    of: 'torque',
    modes: [
      ...at('rated', [0.25, 0.06]),
      ...at('intermediate', [1, 0.02], [0.75, 0.05], [0.5, 0.32], [0.25, 0.3], [0.1, 0.1]),
      ...at('idle', [0, 0.15]),
    ],
  },
  {
    name: 'D1',
    use: 'constant speed: power stations, irrigation pumps',
    of: 'torque',
    modes: at('rated', [1, 0.3], [0.75, 0.5], [0.5, 0.2]),
  },
  {
    name: 'D2',
    use: 'constant speed: generating sets, compressors, ship auxiliaries',
    of: 'torque',
    modes: at('rated', [1, 0.05], [0.75, 0.25], [0.5, 0.3], [0.25, 0.3], [0.1, 0.1]),
  },
  {
    name: 'E1',
    use: 'craft below 24 m, diesel',
    of: 'torque',
    modes: [
      ...at('rated', [1, 0.08], [0.75, 0.11]),
      ...at('intermediate', [0.75, 0.19], [0.5, 0.32]),
      ...at('idle', [0, 0.3]),
    ],
  },
  {
    name: 'E2',
    use: 'ship propulsion at constant speed, and controllable-pitch propellers',
    of: 'torque',
    modes: at('rated', [1, 0.2], [0.75, 0.5], [0.5, 0.15], [0.25, 0.15]),
  },
  {
    name: 'E3',
    use: 'ship propulsion along the propeller curve',
    of: 'power',
    modes: propeller([0.2, 0.5, 0.15, 0.15]),
  },
  {
    name: 'E4',
    use: 'craft below 24 m, spark ignition',
    of: 'torque',
    modes: [
      { speed: 1, share: 1, weight: 0.06 },
      { speed: 0.8, share: 0.716, weight: 0.14 },
      { speed: 0.6, share: 0.465, weight: 0.15 },
      { speed: 0.4, share: 0.253, weight: 0.25 },
      { speed: 'idle', share: 0, weight: 0.4 },
    ],
  },
  {
    name: 'E5',
    use: 'craft below 24 m along the propeller curve, diesel',
    of: 'power',
    modes: [...propeller([0.08, 0.13, 0.17, 0.32]), ...at('idle', [0, 0.3])],
  },
  {
    name: 'F',
    use: 'rail traction',
    of: 'torque',
    modes: [...at('rated', [1, 0.25]), ...at('intermediate', [0.5, 0.15]), ...at('idle', [0, 0.6])],
  },
  {
    name: 'G1',
    use: 'small engines of utility machines, intermediate speed',
    of: 'torque',
    modes: [
      ...at('intermediate', [1, 0.09], [0.75, 0.2], [0.5, 0.29], [0.25, 0.3], [0.1, 0.07]),
      ...at('idle', [0, 0.05]),
    ],
  },
  {
    name: 'G2',
    use: 'small engines of utility machines, rated speed',
    of: 'torque',
    modes: [...at('rated', [1, 0.09], [0.75, 0.2], [0.5, 0.29], [0.25, 0.3], [0.1, 0.07]), ...at('idle', [0, 0.05])],
  },
  {
    name: 'G3',
    use: 'small engines of hand-held machines',
    of: 'torque',
    modes: [...at('rated', [1, 0.9]), ...at('idle', [0, 0.1])],
  },
  {
    name: 'H',
    use: 'snowmobiles',
    of: 'torque',
    modes: [
      { speed: 1, share: 1, weight: 0.12 },
      { speed: 0.85, share: 0.51, weight: 0.27 },
      { speed: 0.75, share: 0.33, weight: 0.25 },
      { speed: 0.65, share: 0.19, weight: 0.31 },
      { speed: 'idle', share: 0, weight: 0.05 },
    ],
  },
];

export function testCycleNamed(name: string): TestCycle | undefined {
  return testCycles.find((cycle) => cycle.name === name);
}

/**
 * Power over the rated power of each mode. A share of torque counts the torque of the rating at every speed, so that the
 * power is share times speed; `intermediate` is the intermediate speed over the rated one (the standard: 0.6 to 0.75).
 */
export function loadsOfModes({ of, modes }: TestCycle, intermediate: number): readonly number[] {
  return modes.map(({ speed, share }) => {
    if (of === 'power' || speed === 'rated') return share;
    if (speed === 'idle') return 0;
    return share * (speed === 'intermediate' ? intermediate : speed);
  });
}

function at(speed: ModeSpeed, ...rows: readonly (readonly [share: number, weight: number])[]): TestMode[] {
  return rows.map(([share, weight]) => ({ speed, share, weight }));
}

function propeller(weights: readonly [number, number, number, number]): TestMode[] {
  return weights.map((weight, index) => ({
    speed: propellerSpeeds[index] ?? NaN,
    share: 1 - index / 4,
    weight,
  }));
}
