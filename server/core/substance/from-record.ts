// Turns one hand-kept record into the run-time substances of its phases: trade units to SI, per mole to per kilogram.
// Knows no lookup: what a mixture's members are it asks of the caller. Invariant: a record that passes the schema and whose
// sources exist gives one substance a phase; molar mass and composition always come from the formula.

import { heatCapacityAt } from './at-temperature.ts';
import { molPerKgOfFormula, molPerKgOfMassShares } from './composition.ts';
import { molarMassKgPerMol, parseFormula } from './formula.ts';
import type { Formula } from './formula.ts';
import type { HazardRecord } from './hazard-record.ts';
import { hazardsOfRecord } from './hazards-from-record.ts';
import type {
  DensityRecord,
  PhaseRecord,
  RuleRecord,
  SourceRecord,
  SubstanceRecord,
  TemperatureRecord,
} from './record.ts';
import { referenceTemperatureK } from './substance.ts';
import type { Datum, Density, Energy, HeatCapacity, RuleValues, Substance } from './substance.ts';

/** What the records refer to: sources by id, a gas by its formula for mixtures, and the hazards kept beside them. */
export interface RecordContext {
  readonly sourceOf: (id: string) => SourceRecord;
  readonly gasOf: (formulaText: string) => Substance | undefined;
  readonly hazardsOf: (name: string) => HazardRecord | undefined;
}

/** The substances of a record, the stable phase first. Empty when the record's composition cannot be read. */
export function substancesOfRecord(record: SubstanceRecord, context: RecordContext): readonly Substance[] {
  const matter = matterOfRecord(record, context);
  if (matter === undefined) return [];
  return [...record.phases]
    .sort((a, b) => Number(b.stable ?? false) - Number(a.stable ?? false))
    .map((phaseRecord) => substanceOfPhase(record, phaseRecord, matter, context));
}

/** What a record is made of, whatever its phase. */
interface Matter {
  readonly formula?: Formula;
  readonly members?: readonly { readonly formula: Formula; readonly moleShare: number }[];
  readonly molPerKg: ReadonlyMap<string, number>;
  readonly molarMassKgPerMol?: number;
  /** Of a mixture, whose members' enthalpies are known. */
  readonly mixtureEnthalpyJPerKg?: Datum;
}

function matterOfRecord(record: SubstanceRecord, context: RecordContext): Matter | undefined {
  if (record.formula !== undefined) {
    const formula = parseFormula(record.formula);
    if (formula.kind === 'fault') return undefined;
    const molPerKg = molPerKgOfFormula(formula);
    const molarMass = molarMassKgPerMol(formula);
    if (molPerKg === undefined || molarMass === undefined) return undefined;
    return { formula, molPerKg, molarMassKgPerMol: molarMass };
  }
  if (record.mixtureByMole !== undefined) return matterOfMixture(record.mixtureByMole, context);
  const composition = molPerKgOfMassShares(new Map(Object.entries(record.compositionByMass ?? {})));
  return 'molPerKg' in composition ? { molPerKg: composition.molPerKg } : undefined;
}

function matterOfMixture(moleShares: Readonly<Record<string, number>>, context: RecordContext): Matter | undefined {
  let molarMass = 0;
  let enthalpyJPerMol = 0;
  let source: SourceRecord | undefined;
  const molPerMol = new Map<string, number>();
  const members: { formula: Formula; moleShare: number }[] = [];
  for (const [formulaText, share] of Object.entries(moleShares)) {
    const gas = context.gasOf(formulaText);
    if (gas?.formula === undefined || gas.molarMassKgPerMol === undefined) return undefined;
    if (gas.energy.kind !== 'formation-enthalpy') return undefined;
    molarMass += share * gas.molarMassKgPerMol;
    enthalpyJPerMol += share * gas.energy.jPerKg.value * gas.molarMassKgPerMol;
    source ??= gas.energy.jPerKg.source;
    members.push({ formula: gas.formula, moleShare: share });
    for (const [symbol, count] of gas.formula.composition) {
      molPerMol.set(symbol, (molPerMol.get(symbol) ?? 0) + share * count);
    }
  }
  if (source === undefined) return undefined;
  return {
    members,
    molPerKg: new Map([...molPerMol].map(([symbol, mol]) => [symbol, mol / molarMass])),
    molarMassKgPerMol: molarMass,
    mixtureEnthalpyJPerKg: { value: enthalpyJPerMol / molarMass, source },
  };
}

type ToDatum = (value: number, scale: number, sourced: { source: string; uncertainty?: number }) => Datum;

function substanceOfPhase(
  record: SubstanceRecord,
  phaseRecord: PhaseRecord,
  matter: Matter,
  context: RecordContext,
): Substance {
  const { phase, entropy, density } = phaseRecord;
  const datum: ToDatum = (value, scale, sourced) => ({
    value: value * scale,
    source: context.sourceOf(sourced.source),
    ...(sourced.uncertainty === undefined ? {} : { uncertainty: sourced.uncertainty * scale }),
  });
  const { formula, molarMassKgPerMol: molarMass } = matter;
  const heatCapacity = heatCapacityOfPhase(phaseRecord, molarMass, context);
  const hazards = context.hazardsOf(record.name);
  return {
    name: record.name,
    label: record.name.replaceAll('_', ' '),
    aliases: [...(record.aliases ?? []), ...(phaseRecord.aliases ?? [])],
    phase,
    ...(formula === undefined ? {} : { formula: { ...formula, phase } }),
    ...(matter.members === undefined ? {} : { members: matter.members }),
    molPerKg: matter.molPerKg,
    chargeMolPerKg: formula === undefined || molarMass === undefined ? 0 : formula.charge / molarMass,
    ...(molarMass === undefined ? {} : { molarMassKgPerMol: molarMass }),
    energy: energyOfPhase(phaseRecord, matter, datum),
    ...(entropy === undefined ? {} : { entropyJPerMolK: datum(entropy.jPerMolK, 1, entropy) }),
    ...(density === undefined ? {} : { density: densityOf(density, datum) }),
    ...(heatCapacity === undefined ? {} : { heatCapacity, heatCapacityJPerKgK: heatCapacityAtReference(heatCapacity) }),
    ...ofTheSubstance(record, datum),
    ...(hazards === undefined ? {} : { hazards: hazardsOfRecord(hazards, context.sourceOf) }),
    carbonBiogenicShare: record.carbonBiogenicShare ?? 0,
    ...(record.compositionSource === undefined
      ? {}
      : { compositionSource: context.sourceOf(record.compositionSource) }),
    rules: (record.rules ?? []).map((rule) => ruleValues(rule, context)),
    stableAtReference: phaseRecord.stable ?? false,
    ...(record.note === undefined ? {} : { note: record.note }),
  };
}

function densityOf(density: DensityRecord, datum: ToDatum): Density {
  const { kgPerM3, temperatureK, points = [], expansionPerK, expansionSource } = density;
  return {
    ...datum(kgPerM3, 1, density),
    temperatureK,
    points: [[temperatureK, kgPerM3] as const, ...points]
      .map(([pointK, pointKgPerM3]) => ({ temperatureK: pointK, kgPerM3: pointKgPerM3 }))
      .sort((a, b) => a.temperatureK - b.temperatureK),
    ...(expansionPerK === undefined
      ? {}
      : { expansionPerK: datum(expansionPerK, 1, { source: expansionSource ?? density.source }) }),
  };
}

function heatCapacityOfPhase(
  { heatCapacity }: PhaseRecord,
  molarMass: number | undefined,
  context: RecordContext,
): HeatCapacity | undefined {
  if (heatCapacity === undefined) return undefined;
  const source = context.sourceOf(heatCapacity.source);
  const near = { fromK: referenceTemperatureK, toK: referenceTemperatureK, source };
  if ('kJPerKgK' in heatCapacity) return { terms: [{ power: 0, jPerKgK: heatCapacity.kJPerKgK * 1000 }], ...near };
  if (molarMass === undefined) return undefined;
  if ('jPerMolK' in heatCapacity) return { terms: [{ power: 0, jPerKgK: heatCapacity.jPerMolK / molarMass }], ...near };
  const { jPerMolKTerms, fromK, toK } = heatCapacity;
  return {
    terms: Object.entries(jPerMolKTerms).map(([power, jPerMolK]) => ({
      power: Number(power),
      jPerKgK: jPerMolK / molarMass,
    })),
    fromK,
    toK,
    source,
  };
}

function heatCapacityAtReference(heatCapacity: HeatCapacity): Datum {
  return { value: heatCapacityAt(heatCapacity, referenceTemperatureK).jPerKgK, source: heatCapacity.source };
}

/** What belongs to the substance whatever its phase. */
function ofTheSubstance(record: SubstanceRecord, datum: ToDatum): Partial<Substance> {
  const { meltingPoint, boilingPoint, sublimationPoint, decompositionPoint, flashPoint, autoignition } = record;
  const kelvin = (given: TemperatureRecord): Datum => ({
    ...datum(given.celsius, 1, given),
    value: given.celsius + celsiusZeroK,
  });
  const limits = record.flammableLimits;
  return {
    ...(meltingPoint === undefined ? {} : { meltingPointK: kelvin(meltingPoint) }),
    ...(boilingPoint === undefined ? {} : { boilingPointK: kelvin(boilingPoint) }),
    ...(sublimationPoint === undefined ? {} : { sublimationPointK: kelvin(sublimationPoint) }),
    ...(decompositionPoint === undefined ? {} : { decompositionPointK: kelvin(decompositionPoint) }),
    ...(flashPoint === undefined ? {} : { flashPointK: kelvin(flashPoint) }),
    ...(flashPoint?.cup === undefined ? {} : { flashPointCup: flashPoint.cup }),
    ...(autoignition === undefined ? {} : { autoignitionK: kelvin(autoignition) }),
    ...(limits === undefined
      ? {}
      : {
          flammableLimits: {
            lower: datum(limits.lowerPercent, 0.01, limits),
            ...(limits.upperPercent === undefined ? {} : { upper: datum(limits.upperPercent, 0.01, limits) }),
            ...(limits.celsius === undefined ? {} : { temperatureK: limits.celsius + celsiusZeroK }),
          },
        }),
    ...(record.carbonOrigin === undefined ? {} : { carbonOrigin: record.carbonOrigin }),
  };
}

function ruleValues(rule: RuleRecord, context: RecordContext): RuleValues {
  const { lowerHeatingValueMJPerKg, carbonContent, carbonDioxideFactor, ...words } = rule;
  return {
    ...words,
    source: context.sourceOf(rule.source),
    ...(lowerHeatingValueMJPerKg === undefined ? {} : { lowerHeatingValueJPerKg: lowerHeatingValueMJPerKg * 1e6 }),
    ...(carbonContent === undefined ? {} : { carbonContentKgPerKg: carbonContent }),
    ...(carbonDioxideFactor === undefined ? {} : { carbonDioxideFactorKgPerKg: carbonDioxideFactor }),
  };
}

function energyOfPhase(phaseRecord: PhaseRecord, matter: Matter, datum: ToDatum): Energy {
  const { formationEnthalpy, heatingValue } = phaseRecord;
  if (formationEnthalpy !== undefined && matter.molarMassKgPerMol !== undefined) {
    const jPerKg = datum(formationEnthalpy.kJPerMol, 1000 / matter.molarMassKgPerMol, formationEnthalpy);
    return { kind: 'formation-enthalpy', jPerKg };
  }
  if (heatingValue !== undefined) {
    return { kind: 'heating-value', basis: heatingValue.basis, jPerKg: datum(heatingValue.mJPerKg, 1e6, heatingValue) };
  }
  if (matter.mixtureEnthalpyJPerKg !== undefined) {
    return { kind: 'formation-enthalpy', jPerKg: matter.mixtureEnthalpyJPerKg };
  }
  return { kind: 'unknown' };
}

const celsiusZeroK = 273.15;
