// An engine by its measured consumption or efficiency against load: read onto the heating value and fuel it was measured
// with, carried over to the fuel it burns by the heat set free above exhaust temperature, and handed to duties and
// services. Reports points and fuels that cannot be. Draws the curve by core/engine/consumption.ts.
// Sources: ISO 3046-1 (what a declared consumption holds for); the rule for other fuels is the program's own and stated.

import { measuredConsumption, scaledConsumption, type Consumption } from '../../core/engine/consumption.ts';
import { celsiusZeroK } from '../../core/quantity/constants.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import type { Context } from '../context.ts';
import { dryAir } from '../dry-air.ts';
import { consumptionFigures, consumptionValues, loadTable } from '../engine-consumption.ts';
import type { AtLoad } from '../engine-readers.ts';
import type { ReadEntry } from '../entries.ts';
import { lowerHeatingValueOf, shareAboveExhaust, workFrozenBelowC, type LeanBurning } from '../heat-above-exhaust.ts';
import type { BurningEngine, EngineMachine, EngineSlips, NotBurning } from '../machinery.ts';
import type { Material } from '../material.ts';
import { figuresOfMaterial } from '../material-figures.ts';
import { propagatedFigures } from '../propagated-figures.ts';
import type { Absent, Figure } from '../scenario.ts';
import type { AssumptionId, Working } from '../working.ts';
import type { EngineAsked, EngineRead } from './engine-entries.ts';
import { engineMachine, slipsOf } from './engine-machine.ts';
import { lazyAnswer, unknownAnswer, type KindAnswer } from './kind.ts';

/** λ and exhaust of a measured engine where none is given (common practice of diesels at load); stated in the entries' help. */
export const measuredLambda = 2.2;
export const measuredExhaustC = 350;

export function evaluateMeasured({ read, broken, context, definition }: EngineAsked): KindAnswer {
  const nothing = unknownAnswer({ figures: consumptionFigures });
  const points = pointsOf(read, context);
  const rating = read.maximumContinuousRating?.value.quantity ?? null;
  if (!rating && !broken.has('maximumContinuousRating')) {
    context.report(definition.name?.span ?? definition.header, {
      code: 'name/missing-entry',
      kind: 'engine',
      name: context.owner,
      entries: ['maximum continuous rating'],
      all: true,
    });
  }
  const fuel = read.fuel?.value;
  // What was written but could not be read may be what the rest means: its own finding says enough.
  if (!points || !rating || !fuel || broken.size > 0) return nothing;
  const oxidant = read.oxidant?.value ?? dryAir();
  const measured: Measured = {
    points,
    isEfficiency: read.specificFuelConsumption === undefined,
    rating,
    tolerance: read.measuredOn?.value.tolerance ?? quantityOf(0),
    idle: read.idleConsumption?.value.quantity ?? null,
    fuel,
    on: read.measuredOn?.value.fuel ?? fuel,
    onHeatingValue: null,
    condensationJPerKg: 0,
    lean: {
      oxidant,
      lambda: read.lambda?.value.quantity.value ?? measuredLambda,
      exhaustK: read.exhaustTemperature?.value.quantity.value ?? measuredExhaustC + celsiusZeroK,
      frozenBelowK: read.frozenBelow?.value.quantity.value ?? workFrozenBelowC + celsiusZeroK,
    },
    slips: slipsOf(read),
  };
  const heatingValue = measuredHeatingValue(read, measured, context);
  if (!heatingValue) return { ...nothing, absent: missingHeatingValue(measured.on) };
  const given = read.measuredOn?.value;
  const higher = given?.basis === 'higher' ? given.heatingValue : null;
  const condensationJPerKg = higher === null ? 0 : higher.value - heatingValue.value;
  const whole: Measured = { ...measured, onHeatingValue: heatingValue, condensationJPerKg };
  const machine = engineMachine(context.owner, read, fuel, (other) => burningOn(other, whole));
  const own = machine.burning(fuel);
  if (own.kind === 'not-burning' || !own.consumption) {
    const missing = own.kind === 'not-burning' ? own.missing : [];
    return { ...nothing, absent: new Map(consumptionFigures.map(({ id }) => [id, missing])), machinery: machine };
  }
  return answerOf(read, machine, own, heatingValue, context);
}

interface Measured {
  readonly points: readonly AtLoad[];
  readonly isEfficiency: boolean;
  readonly rating: Quantity;
  readonly tolerance: Quantity;
  readonly idle: Quantity | null;
  /** What it burns, and what it was measured with. */
  readonly fuel: Material;
  readonly on: Material;
  /** J/kg the consumption refers to. */
  readonly onHeatingValue: Quantity | null;
  /** What an efficiency was measured on besides: 0, or the heat of the water's condensation. */
  readonly condensationJPerKg: number;
  readonly lean: LeanBurning;
  readonly slips: EngineSlips;
}

/** The points in rising load; null where two share a load (said) or none is written. */
function pointsOf(read: EngineRead, context: Context): readonly AtLoad[] | null {
  const { specificFuelConsumption: consumption, efficiency } = read;
  const entry: ReadEntry<readonly AtLoad[]> | undefined = consumption ?? efficiency;
  if (consumption && efficiency) {
    context.report(efficiency.entry.wordsSpan, {
      code: 'balance/contradiction',
      what: 'what was measured',
      first: consumption.entry.words,
      second: efficiency.entry.words,
      compared: null,
    });
  }
  if (!entry) return null;
  const sorted = [...entry.value].sort((left, right) => left.load.value - right.load.value);
  const twice = sorted.find((point, index) => point.load.value === sorted[index - 1]?.load.value);
  if (twice) {
    context.report(twice.item.span, { code: 'engine/repeated-load', load: twice.load });
    return null;
  }
  return sorted;
}

/** J/kg that the measured consumption refers to, lower; null where it cannot be had. Says where it is another fuel's. */
function measuredHeatingValue(read: EngineRead, { on, fuel }: Measured, context: Context): Quantity | null {
  const own = lowerHeatingValueOf(on);
  const given = read.measuredOn?.value;
  const written = given?.heatingValue ?? null;
  if (!given || !written) return own;
  const lower = given.basis === 'lower' ? written : onLowerBasis(written, on);
  if (!lower) return null;
  const isFarOff = own !== null && Math.abs(lower.value / own.value - 1) > nearHeatingValue;
  if (isFarOff && given.fuel === null) {
    context.report(read.measuredOn?.entry.span ?? { start: 0, end: 0 }, {
      code: 'engine/measured-fuel',
      fuel: fuel.name,
      measured: lower,
      own,
    });
  }
  return lower;
}

/** Fuels of one kind differ by less in their heating values: marine gas oils lie within 2 % of each other (common practice). */
const nearHeatingValue = 0.05;

/** A higher heating value less the heat of the water that the fuel makes. */
function onLowerBasis(higher: Quantity, fuel: Material): Quantity | null {
  const figures = figuresOfMaterial(fuel);
  const find = (id: string): number | undefined => figures.find((figure) => figure.id === id)?.quantity.value;
  const [ownHigher, ownLower] = [find('higher-heating-value'), find('lower-heating-value')];
  if (ownHigher === undefined || ownLower === undefined) return null;
  return { ...higher, value: higher.value - (ownHigher - ownLower) };
}

function missingHeatingValue(fuel: Material): Absent {
  const missing = [`the lower heating value of ${fuel.name}`];
  return new Map(consumptionFigures.map(({ id }) => [id, missing]));
}

function burningOn(fuel: Material, measured: Measured): BurningEngine | NotBurning {
  const { points, rating, tolerance, idle, on, onHeatingValue, condensationJPerKg, lean, isEfficiency } = measured;
  if (!onHeatingValue) return { kind: 'not-burning', missing: [] };
  const factor = factorBetween(on, fuel, lean);
  if (factor.kind === 'not-burning') return factor;
  const uncertain = [
    rating,
    tolerance,
    onHeatingValue,
    idle ?? quantityOf(NaN),
    ...points.flatMap(({ load, value }) => [load, value]),
  ];
  const consumptionAt = (values: readonly number[]): Consumption => {
    const [ratedPowerW = NaN, share = 0, heatingValue = NaN, idleKgPerS = NaN, ...rest] = values;
    const at = points.map((_, index) => {
      const [load = NaN, value = NaN] = [rest[2 * index], rest[2 * index + 1]];
      const lowerShare = heatingValue / (heatingValue + condensationJPerKg);
      return { load, heatRate: isEfficiency ? lowerShare / value : value * heatingValue };
    });
    const idleW = Number.isNaN(idleKgPerS) ? null : idleKgPerS * heatingValue;
    return scaledConsumption(measuredConsumption(at, ratedPowerW, share, idleW), factor.value);
  };
  const consumption = consumptionAt(uncertain.map(({ value }) => value));
  const assumptions: readonly AssumptionId[] = [
    'lower-heating-value-basis',
    'reference-ambient',
    ...(tolerance.value > 0 ? (['tolerance-upwards'] as const) : []),
    ...(fuel === on ? [] : (['same-use-of-heat'] as const)),
  ];
  return {
    kind: 'burning',
    consumption,
    ratedHeatRate: consumption.heatRateAt(1).heatRate,
    uncertain,
    consumptionAt,
    pilot: null,
    slips: measured.slips,
    assumptions,
  };
}

/** How much more of a fuel's energy is needed than of the other's for the same heat above exhaust temperature. */
function factorBetween(
  from: Material,
  to: Material,
  lean: LeanBurning,
): { readonly kind: 'factor'; readonly value: number } | NotBurning {
  if (from === to) return { kind: 'factor', value: 1 };
  const [fromShare, toShare] = [shareAboveExhaust(from, lean), shareAboveExhaust(to, lean)];
  const missing = [
    ...(fromShare === null || fromShare <= 0 ? [from] : []),
    ...(toShare === null || toShare <= 0 ? [to] : []),
  ].map(({ name }) => `heat of ${name} above exhaust temperature`);
  if (fromShare === null || toShare === null || missing.length > 0) return { kind: 'not-burning', missing };
  return { kind: 'factor', value: fromShare / toShare };
}

function answerOf(
  read: EngineRead,
  machine: EngineMachine,
  own: BurningEngine,
  onHeatingValue: Quantity,
  context: Context,
): KindAnswer {
  const ownHeatingValue = lowerHeatingValueOf(machine.fuel);
  const nothing = unknownAnswer({ figures: consumptionFigures });
  if (!ownHeatingValue) return { ...nothing, absent: missingHeatingValue(machine.fuel), machinery: machine };
  const speed = read.speed?.value.quantity ?? null;
  const working = workingOf(read, machine.fuel, onHeatingValue, ownHeatingValue, own.assumptions, context);
  const measuredLoads = (read.specificFuelConsumption ?? read.efficiency)?.value.map(({ load }) => load.value) ?? [];
  const loads = [...new Set([...[0.1, 0.25, 0.5, 0.75, 0.85, 1], ...measuredLoads])].sort((a, b) => a - b);
  const figures = (): readonly Figure[] =>
    propagatedFigures(
      consumptionFigures,
      [ownHeatingValue, ...own.uncertain],
      ([heatingValue = NaN, ...values]) => {
        const consumption = own.consumptionAt(values);
        return consumption ? consumptionValues(consumption, heatingValue, speed?.value ?? null) : {};
      },
      working,
    );
  return lazyAnswer(
    { machinery: machine },
    {
      figures,
      tables: () => (own.consumption ? [loadTable(own.consumption, ownHeatingValue.value, loads)] : []),
    },
  );
}

function workingOf(
  read: EngineRead,
  fuel: Material,
  onHeatingValue: Quantity,
  ownHeatingValue: Quantity,
  assumptions: readonly AssumptionId[],
  context: Context,
): (row: (typeof consumptionFigures)[number] | { readonly id: string; readonly method: Working['method'] }) => Working {
  const measured = read.specificFuelConsumption ?? read.efficiency;
  const place = measured && context.place(measured.entry.span);
  const onPlace = read.measuredOn && context.place(read.measuredOn.entry.span);
  const ratingPlace = read.maximumContinuousRating && context.place(read.maximumContinuousRating.entry.span);
  const speedPlace = read.speed && context.place(read.speed.entry.span);
  return ({ method }) => {
    if (method === 'nitrogen-oxide-limit') {
      const inputs = [{ label: 'rated speed', quantity: read.speed?.value.quantity ?? null, unit: 'rpm' }];
      return {
        method,
        inputs: inputs.map((input) => (speedPlace ? { ...input, place: speedPlace } : input)),
        sources: ['MARPOL Annex VI, regulation 13 (text of resolution MEPC.328(76))'],
        assumptions: [],
      };
    }
    const unit = read.specificFuelConsumption ? 'g/kWh' : '%';
    return {
      method,
      inputs: [
        ...(measured?.value ?? []).map(({ value, load }) => ({
          label: `measured at a load of ${Number((load.value * 100).toPrecision(6))} %`,
          quantity: value,
          unit,
          ...(place ? { place } : {}),
        })),
        {
          label: 'heating value it was measured on, lower',
          quantity: onHeatingValue,
          unit: 'MJ/kg',
          ...(onPlace ? { place: onPlace } : {}),
        },
        { label: `lower heating value of ${fuel.name}`, quantity: ownHeatingValue, unit: 'MJ/kg' },
        {
          label: 'maximum continuous rating',
          quantity: read.maximumContinuousRating?.value.quantity ?? null,
          unit: 'kW',
          ...(ratingPlace ? { place: ratingPlace } : {}),
        },
      ],
      sources: fuel.sources,
      assumptions,
    };
  };
}
