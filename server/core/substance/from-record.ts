// Turns one hand-kept record into the run-time substances of its phases: trade units to SI, per mole to per kilogram.
// Knows no lookup: what a mixture's members are it asks of the caller. Invariant: a record that passes the schema and whose
// sources exist gives one substance a phase; molar mass and composition always come from the formula.

import { molPerKgOfFormula, molPerKgOfMassShares } from './composition.ts';
import { molarMassKgPerMol, parseFormula } from './formula.ts';
import type { Formula } from './formula.ts';
import type { PhaseRecord, SourceRecord, SubstanceRecord } from './record.ts';
import type { Datum, Energy, RuleValues, Substance } from './substance.ts';

/** What the records refer to: sources by id, and a gas by its formula for mixtures. */
export interface RecordContext {
  readonly sourceOf: (id: string) => SourceRecord;
  readonly gasOf: (formulaText: string) => Substance | undefined;
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
  for (const [formulaText, share] of Object.entries(moleShares)) {
    const gas = context.gasOf(formulaText);
    if (gas?.formula === undefined || gas.molarMassKgPerMol === undefined) return undefined;
    if (gas.energy.kind !== 'formation-enthalpy') return undefined;
    molarMass += share * gas.molarMassKgPerMol;
    enthalpyJPerMol += share * gas.energy.jPerKg.value * gas.molarMassKgPerMol;
    source ??= gas.energy.jPerKg.source;
    for (const [symbol, count] of gas.formula.composition) {
      molPerMol.set(symbol, (molPerMol.get(symbol) ?? 0) + share * count);
    }
  }
  if (source === undefined) return undefined;
  return {
    molPerKg: new Map([...molPerMol].map(([symbol, mol]) => [symbol, mol / molarMass])),
    molarMassKgPerMol: molarMass,
    mixtureEnthalpyJPerKg: { value: enthalpyJPerMol / molarMass, source },
  };
}

function substanceOfPhase(
  record: SubstanceRecord,
  phaseRecord: PhaseRecord,
  matter: Matter,
  context: RecordContext,
): Substance {
  const { phase, entropy, density, heatCapacity } = phaseRecord;
  const datum = (value: number, scale: number, sourced: { source: string; uncertainty?: number }): Datum => ({
    value: value * scale,
    source: context.sourceOf(sourced.source),
    ...(sourced.uncertainty === undefined ? {} : { uncertainty: sourced.uncertainty * scale }),
  });
  const { formula, molarMassKgPerMol: molarMass } = matter;
  return {
    name: record.name,
    label: record.name.replaceAll('_', ' '),
    aliases: [...(record.aliases ?? []), ...(phaseRecord.aliases ?? [])],
    phase,
    ...(formula === undefined ? {} : { formula: { ...formula, phase } }),
    molPerKg: matter.molPerKg,
    chargeMolPerKg: formula === undefined || molarMass === undefined ? 0 : formula.charge / molarMass,
    ...(molarMass === undefined ? {} : { molarMassKgPerMol: molarMass }),
    energy: energyOfPhase(phaseRecord, matter, datum),
    ...(entropy === undefined ? {} : { entropyJPerMolK: datum(entropy.jPerMolK, 1, entropy) }),
    ...(density === undefined
      ? {}
      : { density: { ...datum(density.kgPerM3, 1, density), temperatureK: density.temperatureK } }),
    ...(heatCapacity === undefined ? {} : { heatCapacityJPerKgK: datum(heatCapacity.kJPerKgK, 1000, heatCapacity) }),
    ...(record.flashPoint === undefined
      ? {}
      : {
          flashPointK: {
            ...datum(record.flashPoint.celsius, 1, record.flashPoint),
            value: record.flashPoint.celsius + celsiusZeroK,
          },
        }),
    carbonBiogenicShare: record.carbonBiogenicShare ?? 0,
    ...(record.compositionSource === undefined
      ? {}
      : { compositionSource: context.sourceOf(record.compositionSource) }),
    rules: (record.rules ?? []).map((rule): RuleValues => ({
      source: context.sourceOf(rule.source),
      ...(rule.lowerHeatingValueMJPerKg === undefined
        ? {}
        : { lowerHeatingValueJPerKg: rule.lowerHeatingValueMJPerKg * 1e6 }),
      ...(rule.carbonContent === undefined ? {} : { carbonContentKgPerKg: rule.carbonContent }),
      ...(rule.carbonDioxideFactor === undefined ? {} : { carbonDioxideFactorKgPerKg: rule.carbonDioxideFactor }),
    })),
    stableAtReference: phaseRecord.stable ?? false,
    ...(record.note === undefined ? {} : { note: record.note }),
  };
}

function energyOfPhase(
  phaseRecord: PhaseRecord,
  matter: Matter,
  datum: (value: number, scale: number, sourced: { source: string; uncertainty?: number }) => Datum,
): Energy {
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
