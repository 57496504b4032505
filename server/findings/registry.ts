// The findings of a scenario: each fact handed to the file that bears its code, sorted as they stand in the text. The
// map is over the codes of all facts, so that the compiler asks for a missing file. Knows no wording and no editor.
// Invariant: the findings of a file are in order of their places, and the same facts give the same list.

import type { Fact } from '../scenario/facts.ts';
import { sourceOf } from '../scenario/placing.ts';
import type { EvaluatedFile, EvaluatedScenario, PlacedFact } from '../scenario/scenario.ts';
import { accountPrecipitation } from './account-precipitation.ts';
import { accountReceivingLimit } from './account-receiving-limit.ts';
import { accountSeaState } from './account-sea-state.ts';
import { accountSeaVariables } from './account-sea-variables.ts';
import { balanceCharge } from './balance-charge.ts';
import { balanceContradiction } from './balance-contradiction.ts';
import { balanceElements } from './balance-elements.ts';
import { balanceNegative } from './balance-negative.ts';
import { balanceNoData } from './balance-no-data.ts';
import { balanceNoDensity } from './balance-no-density.ts';
import { balanceNoEquilibrium } from './balance-no-equilibrium.ts';
import { balanceNoPortions } from './balance-no-portions.ts';
import { balanceProducts } from './balance-products.ts';
import { balanceShares } from './balance-shares.ts';
import { balanceTwoRests } from './balance-two-rests.ts';
import { balanceWaterMissing } from './balance-water-missing.ts';
import { engineBasicAttack } from './engine-basic-attack.ts';
import { engineBoilerHeat } from './engine-boiler-heat.ts';
import { engineCompressionRatio } from './engine-compression-ratio.ts';
import { engineDeposits } from './engine-deposits.ts';
import { engineFiringPressure } from './engine-firing-pressure.ts';
import { engineHotCorrosion } from './engine-hot-corrosion.ts';
import { engineKnock } from './engine-knock.ts';
import { engineMeasuredFuel } from './engine-measured-fuel.ts';
import { engineMeasuredRange } from './engine-measured-range.ts';
import { engineMisfire } from './engine-misfire.ts';
import { engineNoCycle } from './engine-no-cycle.ts';
import { engineNoIdle } from './engine-no-idle.ts';
import { engineNoPlant } from './engine-no-plant.ts';
import { engineNoStandardFuel } from './engine-no-standard-fuel.ts';
import { engineOverload } from './engine-overload.ts';
import { enginePressureRatio } from './engine-pressure-ratio.ts';
import { engineRepeatedLoad } from './engine-repeated-load.ts';
import { engineSteamStates } from './engine-steam-states.ts';
import { engineTurbineInlet } from './engine-turbine-inlet.ts';
import { engineTurbineSolids } from './engine-turbine-solids.ts';
import { engineWetSteam } from './engine-wet-steam.ts';
import { dutyLegName } from './duty-leg-name.ts';
import { dutyProfile } from './duty-profile.ts';
import { dutySpeed } from './duty-speed.ts';
import { dutyTestCycle } from './duty-test-cycle.ts';
import { dutyUnused } from './duty-unused.ts';
import { expectFailed } from './expect-failed.ts';
import type { Finding } from './finding.ts';
import { hazardRules } from './hazard.ts';
import { kindSuspended } from './kind-suspended.ts';
import { kindNotEvaluated } from './kind-not-evaluated.ts';
import { nameAcknowledged } from './name-acknowledged.ts';
import { nameArguments } from './name-arguments.ts';
import { nameCycle } from './name-cycle.ts';
import { nameDuplicate } from './name-duplicate.ts';
import { nameLikeCatalogue } from './name-like-catalogue.ts';
import { nameMissingEntry } from './name-missing-entry.ts';
import { nameMissingFile } from './name-missing-file.ts';
import { nameRepeatedEntry } from './name-repeated-entry.ts';
import { nameReserved } from './name-reserved.ts';
import { nameUnexpectedLine } from './name-unexpected-line.ts';
import { nameUnknownEntry } from './name-unknown-entry.ts';
import { nameUnknownKind } from './name-unknown-kind.ts';
import { nameUnknownPhrase } from './name-unknown-phrase.ts';
import { nameUnknownState } from './name-unknown-state.ts';
import { nameUnknown } from './name-unknown.ts';
import { nameUseCycle } from './name-use-cycle.ts';
import { nameWrongKind } from './name-wrong-kind.ts';
import { programFailed } from './program-failed.ts';
import { rangeBurnOut } from './range-burn-out.ts';
import { rangeColdCharge } from './range-cold-charge.ts';
import { rangeHeatingValue } from './range-heating-value.ts';
import { rangeHumidity } from './range-humidity.ts';
import { rangeNumber } from './range-number.ts';
import { rangePhase } from './range-phase.ts';
import { rangePositive } from './range-positive.ts';
import { rangeRealGas } from './range-real-gas.ts';
import { rangeRich } from './range-rich.ts';
import { rangeSeaWater } from './range-sea-water.ts';
import { rangeShare } from './range-share.ts';
import { rangeSticky } from './range-sticky.ts';
import { rangeTemperature } from './range-temperature.ts';
import type { FactOf, Rule } from './rule.ts';
import { serviceTank } from './service-tank.ts';
import { syntax } from './syntax.ts';
import { unitAmbiguous } from './unit-ambiguous.ts';
import { unitExponent } from './unit-exponent.ts';
import { unitGauge } from './unit-gauge.ts';
import { unitMismatch } from './unit-mismatch.ts';
import { unitMissing } from './unit-missing.ts';
import { unitTemperature } from './unit-temperature.ts';
import { unitTwoTemperatures } from './unit-two-temperatures.ts';
import { unitUncertainty } from './unit-uncertainty.ts';
import { unitUnknown } from './unit-unknown.ts';

/** The findings of all files of a scenario, in the order of its files, each file's in order of place. */
export function findingsOf(scenario: EvaluatedScenario): readonly Finding[] {
  return scenario.files.flatMap(findingsIn);
}

/** The findings of one file, in order of place. */
export function findingsIn(file: EvaluatedFile): readonly Finding[] {
  const findings = file.facts.map((placed) => findingOf(placed, file));
  return findings.sort(
    (left, right) =>
      left.place.start - right.place.start ||
      left.place.end - right.place.end ||
      (left.code < right.code ? -1 : left.code > right.code ? 1 : 0),
  );
}

/** Every code there is, in alphabetical order. */
export function allCodes(): readonly Fact['code'][] {
  // The keys of a mapped type are its codes; Object.keys forgets that.
  return (Object.keys(rules) as Fact['code'][]).sort();
}

const rules: { readonly [Code in Fact['code']]: Rule<FactOf<Code>> } = {
  'syntax/unexpected': syntax,
  'syntax/missing': syntax,
  'syntax/unclosed': syntax,
  'syntax/too-deep': syntax,
  'syntax/too-large': syntax,
  'name/unknown': nameUnknown,
  'name/unknown-kind': nameUnknownKind,
  'name/duplicate': nameDuplicate,
  'name/reserved': nameReserved,
  'name/like-catalogue': nameLikeCatalogue,
  'name/cycle': nameCycle,
  'name/use-cycle': nameUseCycle,
  'name/missing-file': nameMissingFile,
  'name/unknown-entry': nameUnknownEntry,
  'name/repeated-entry': nameRepeatedEntry,
  'name/missing-entry': nameMissingEntry,
  'name/unknown-phrase': nameUnknownPhrase,
  'name/unknown-state': nameUnknownState,
  'name/arguments': nameArguments,
  'name/unexpected-line': nameUnexpectedLine,
  'name/wrong-kind': nameWrongKind,
  'name/acknowledged': nameAcknowledged,
  'service/tank': serviceTank,
  'unit/unknown': unitUnknown,
  'unit/missing': unitMissing,
  'unit/mismatch': unitMismatch,
  'unit/two-temperatures': unitTwoTemperatures,
  'unit/temperature': unitTemperature,
  'unit/gauge': unitGauge,
  'unit/exponent': unitExponent,
  'unit/uncertainty': unitUncertainty,
  'unit/ambiguous': unitAmbiguous,
  'balance/elements': balanceElements,
  'balance/shares': balanceShares,
  'balance/two-rests': balanceTwoRests,
  'balance/negative': balanceNegative,
  'balance/no-density': balanceNoDensity,
  'balance/no-portions': balanceNoPortions,
  'balance/no-data': balanceNoData,
  'balance/products': balanceProducts,
  'balance/water-missing': balanceWaterMissing,
  'balance/contradiction': balanceContradiction,
  'balance/charge': balanceCharge,
  'balance/no-equilibrium': balanceNoEquilibrium,
  'range/heating-value': rangeHeatingValue,
  'range/humidity': rangeHumidity,
  'range/number': rangeNumber,
  'range/temperature': rangeTemperature,
  'range/share': rangeShare,
  'range/sea-water': rangeSeaWater,
  'account/sea-variables': accountSeaVariables,
  'account/sea-state': accountSeaState,
  'account/receiving-limit': accountReceivingLimit,
  'account/precipitation': accountPrecipitation,
  'range/phase': rangePhase,
  'range/positive': rangePositive,
  'range/rich': rangeRich,
  'range/burn-out': rangeBurnOut,
  'range/sticky': rangeSticky,
  'range/cold-charge': rangeColdCharge,
  'range/real-gas': rangeRealGas,
  ...hazardRules,
  'engine/basic-attack': engineBasicAttack,
  'engine/boiler-heat': engineBoilerHeat,
  'engine/compression-ratio': engineCompressionRatio,
  'engine/deposits': engineDeposits,
  'engine/firing-pressure': engineFiringPressure,
  'engine/hot-corrosion': engineHotCorrosion,
  'engine/knock': engineKnock,
  'engine/measured-fuel': engineMeasuredFuel,
  'engine/measured-range': engineMeasuredRange,
  'engine/misfire': engineMisfire,
  'engine/no-cycle': engineNoCycle,
  'engine/no-idle': engineNoIdle,
  'engine/no-plant': engineNoPlant,
  'engine/no-standard-fuel': engineNoStandardFuel,
  'engine/overload': engineOverload,
  'engine/pressure-ratio': enginePressureRatio,
  'engine/repeated-load': engineRepeatedLoad,
  'engine/steam-states': engineSteamStates,
  'engine/turbine-inlet': engineTurbineInlet,
  'engine/turbine-solids': engineTurbineSolids,
  'engine/wet-steam': engineWetSteam,
  'duty/leg-name': dutyLegName,
  'duty/profile': dutyProfile,
  'duty/speed': dutySpeed,
  'duty/test-cycle': dutyTestCycle,
  'duty/unused': dutyUnused,
  'expect/failed': expectFailed,
  'kind/suspended': kindSuspended,
  'kind/not-evaluated': kindNotEvaluated,
  'program/failed': programFailed,
};

function findingOf({ fact, place }: PlacedFact, file: EvaluatedFile): Finding {
  // The map gives each code the rule of its own fact; the compiler cannot follow that through a union of codes.
  const rule = rules[fact.code] as Rule<Fact>;
  const site = { place, file };
  return {
    code: fact.code,
    severity: typeof rule.severity === 'string' ? rule.severity : rule.severity(fact),
    message: 'messageAt' in rule ? rule.messageAt(fact, site) : messageOf(fact, rule.message),
    place,
    related: rule.related?.(fact, site) ?? [],
    fixes: rule.fixes?.(fact, site) ?? [],
    acknowledged: 'acknowledged' in fact && fact.acknowledged === true,
  };
}

/** A key in a large file leaves nearly all of its facts as they are, though half of them move. */
function messageOf(fact: Fact, make: (fact: Fact) => string): string {
  const source = sourceOf(fact);
  const known = messages.get(source);
  if (known !== undefined) return known;
  const message = make(fact);
  messages.set(source, message);
  return message;
}

const messages = new WeakMap<Fact, string>();
