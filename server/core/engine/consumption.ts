// What an engine takes of a fuel's energy for the work at its shaft, over its load: the one thing a duty and a service ask
// of an engine, whether it was measured or its cycle was worked out. Per energy (lower heating value) and never per mass,
// since only that compares fuels. Knows no fuel and no cycle.
// Invariants: a band has low ≤ high, and `value` is its unfavourable end; at a load outside the known range the answer
// says so. Sources: monotone-cubic.ts for measured points; P. W. Willans, Min. Proc. Inst. Civ. Eng. 93 (1888) 128, that an
// engine at constant speed takes fuel in a straight line with its load (the friction of the rating is there at any load).

import { monotoneCubic, type Point } from './monotone-cubic.ts';

/** A number with what is not known about it: `value` is the end that an engineer has to reckon with. */
export interface Band {
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

/** Where a load lies against what is known of an engine: below all points, within them, or above. */
export type LoadRange = 'below' | 'within' | 'above';

export interface Consumption {
  /** Shaft power at a load of 1, W. */
  readonly ratedPowerW: number;
  /** The loads (power over rating) that are known. */
  readonly fromLoad: number;
  readonly toLoad: number;
  /** Fuel energy running without load, W; null where it is not known. */
  readonly idleFuelW: Band | null;
  /** J of fuel per J of work at a load above 0, and where that load lies. Outside, the line of Willans goes on. */
  heatRateAt(load: number): { readonly heatRate: Band; readonly range: LoadRange };
}

export interface MeasuredPoint {
  /** Power over rating, above 0. */
  readonly load: number;
  /** J of fuel (lower heating value) per J of work at the shaft. */
  readonly heatRate: number;
}

/**
 * From points of rising, different load; at least one. `tolerance` is the share by which consumption may be higher.
 * With idle consumption the fuel goes in a straight line from there to the first point, and that range counts as known.
 * A single point without idle consumption is known at that load only; elsewhere its heat rate is kept.
 */
export function measuredConsumption(
  points: readonly MeasuredPoint[],
  ratedPowerW: number,
  tolerance: number,
  idleFuelW: number | null,
): Consumption {
  const [first = { load: 1, heatRate: NaN }] = points;
  const last = points.at(-1) ?? first;
  const curve = monotoneCubic(points.map(({ load, heatRate }): Point => ({ x: load, y: heatRate })));
  const belowFirst =
    idleFuelW === null ? willansLine(first, points[1]) : willansLine({ load: 0, fuel: idleFuelW / ratedPowerW }, first);
  const aboveLast = willansLine(last, points.at(-2));
  const nominal = (load: number): number => {
    const within = curve(load);
    return within ?? (load < first.load ? belowFirst(load) : aboveLast(load));
  };
  const fromLoad = idleFuelW === null ? first.load : 0;
  return {
    ratedPowerW,
    fromLoad,
    toLoad: last.load,
    idleFuelW: idleFuelW === null ? null : withTolerance(idleFuelW, tolerance),
    heatRateAt: (load) => ({
      heatRate: withTolerance(nominal(load), tolerance),
      range: load < fromLoad * (1 - rounding) ? 'below' : load > last.load * (1 + rounding) ? 'above' : 'within',
    }),
  };
}

/**
 * From a cycle worked out at the rating: its indicated efficiency is kept at all loads, and so is the power lost to
 * friction. `mechanicalEfficiency` is that at the rating, above 0.
 */
export function consumptionOfCycle(
  indicatedEfficiency: Band,
  mechanicalEfficiency: number,
  ratedPowerW: number,
): Consumption {
  const frictionShare = 1 / mechanicalEfficiency - 1;
  const perIndicated = (efficiency: number, share: number): number => share / efficiency;
  const band = (share: number): Band => {
    const ends = [indicatedEfficiency.low, indicatedEfficiency.high].map((one) => perIndicated(one, share));
    return { value: Math.max(...ends), low: Math.min(...ends), high: Math.max(...ends) };
  };
  return {
    ratedPowerW,
    fromLoad: 0,
    toLoad: 1,
    idleFuelW: band(frictionShare * ratedPowerW),
    heatRateAt: (load) => ({
      heatRate: band((load + frictionShare) / load),
      range: load > 1 + rounding ? 'above' : 'within',
    }),
  };
}

/**
 * From a plant worked out at its rating alone, whose idle consumption is no matter of friction (a compressor or a boiler is
 * there at any load): with idle consumption the fuel goes in a straight line from there, without it only the rating is known.
 */
export function consumptionAtRating(heatRate: Band, ratedPowerW: number, idleFuelW: number | null): Consumption {
  const end = (rate: number): Consumption =>
    measuredConsumption([{ load: 1, heatRate: rate }], ratedPowerW, 0, idleFuelW);
  const ends = { value: end(heatRate.value), low: end(heatRate.low), high: end(heatRate.high) };
  return {
    ...ends.value,
    heatRateAt(load) {
      const { heatRate: own, range } = ends.value.heatRateAt(load);
      const [low, high] = [ends.low, ends.high].map((one) => one.heatRateAt(load).heatRate.value);
      return { heatRate: { value: own.value, low: low ?? NaN, high: high ?? NaN }, range };
    },
  };
}

/** Fuel power in W at a shaft power in W, idling where that is 0; null where it idles and that is not known. */
export function fuelPowerAt(
  consumption: Consumption,
  powerW: number,
): { readonly fuelW: Band | null; readonly range: LoadRange } {
  if (powerW === 0) return { fuelW: consumption.idleFuelW, range: 'within' };
  const { heatRate, range } = consumption.heatRateAt(powerW / consumption.ratedPowerW);
  const { value, low, high } = heatRate;
  return { fuelW: { value: value * powerW, low: low * powerW, high: high * powerW }, range };
}

/** The same engine on a fuel of which it takes `factor` times the energy for the same work. */
export function scaledConsumption(consumption: Consumption, factor: number): Consumption {
  const scaled = ({ value, low, high }: Band): Band => ({
    value: value * factor,
    low: low * factor,
    high: high * factor,
  });
  return {
    ...consumption,
    idleFuelW: consumption.idleFuelW && scaled(consumption.idleFuelW),
    heatRateAt(load) {
      const { heatRate, range } = consumption.heatRateAt(load);
      return { heatRate: scaled(heatRate), range };
    },
  };
}

/** Loads that differ by less, relative, are the same: 85 % of 6.4 MW comes back as 0.8499999. */
const rounding = 1e-9;

function withTolerance(value: number, tolerance: number): Band {
  const high = value * (1 + tolerance);
  return { value: high, low: value, high };
}

/** Where fuel is known directly, in units of the rated power. */
interface FuelAt {
  readonly load: number;
  readonly fuel: number;
}

/** Heat rate against load where the fuel goes in a straight line through two points; through one it is kept. */
function willansLine(first: MeasuredPoint | FuelAt, second: MeasuredPoint | undefined): (load: number) => number {
  const fuelAt = (point: MeasuredPoint | FuelAt): number =>
    'fuel' in point ? point.fuel : point.load * point.heatRate;
  if (!second) return () => fuelAt(first) / first.load;
  const slope = (fuelAt(second) - fuelAt(first)) / (second.load - first.load);
  const atZero = fuelAt(first) - slope * first.load;
  // A line that would take nothing at some load says nothing there; the nearest heat rate is kept.
  return (load) => (atZero + slope * load > 0 ? atZero / load + slope : fuelAt(first) / first.load);
}
