// Figures that the hazard rules rest on, for a person to look at before a rule fires: flash point and flammable range of a
// blend, what a spilled kilogram does with water, hydrogen gathering over it in its tank, and which code governs it aboard.
// Knows no rule and no wording; the sums are core/hazard's. Invariants: an upper bound is absent, with what it lacks, rather
// than too low; a figure that does not apply is left out.

import { approvalRouteOf, knownAsOf } from '../core/hazard/approval-route.ts';
import { ownHydrogenMolPerKg } from '../core/hazard/find-hazards.ts';
import { gasMixtureOf } from '../core/hazard/gas-mixtures.ts';
import { molarVolumeM3PerMol } from '../core/hazard/rule.ts';
import { isGas, liquids } from '../core/hazard/store.ts';
import type { Store } from '../core/hazard/store.ts';
import { flashPointK, vapourLimitsOf } from '../core/hazard/vapour.ts';
import type { VapourLimits } from '../core/hazard/vapour.ts';
import { hydrogenForShare, hydrogenOver, waterContactOf, waterKgPerMol } from '../core/hazard/water-contact.ts';
import type { WaterContact } from '../core/hazard/water-contact.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { dimensionless } from '../core/quantity/dimension.ts';
import { asKind, isFault, quantityOf, quantityOfOutcome, type Quantity } from '../core/quantity/quantity.ts';
import { propagate } from '../core/quantity/uncertainty.ts';
import { lazily } from './lazily.ts';
import type { FigureRow } from './material-figures.ts';
import type { Figure, Table } from './scenario.ts';
import type { StoredBlend } from './stored-blend.ts';
import type { AssumptionId, Working, WorkingInput } from './working.ts';

export const hazardFigures = [
  { id: 'flash-point', label: 'Flash point, closed cup, estimated', unit: 'K', method: 'blend-flash-point' },
  {
    id: 'lower-flammable-limit',
    label: 'Lower flammable limit in air, by volume, as stored',
    unit: '1',
    method: 'le-chatelier',
  },
  {
    id: 'upper-flammable-limit',
    label: 'Upper flammable limit in air, by volume',
    unit: '1',
    method: 'le-chatelier',
  },
  {
    id: 'limiting-oxygen-share',
    label: 'Limiting oxygen concentration with nitrogen, by volume',
    unit: '1',
    method: 'limiting-oxygen',
  },
  {
    id: 'water-contact-heat',
    label: 'Heat per kg spilled into water, at most',
    unit: 'MJ/kg',
    method: 'water-contact',
  },
  {
    id: 'water-contact-hydrogen',
    label: 'Hydrogen per kg spilled into water, at most (25 °C)',
    unit: 'L/kg',
    method: 'water-contact',
  },
  {
    id: 'own-hydrogen',
    label: 'Hydrogen its portions make, per kg, at most (25 °C)',
    unit: 'L/kg',
    method: 'own-hydrogen',
  },
  {
    id: 'ullage-hydrogen-share',
    label: 'Hydrogen over it in a vented tank, by volume, at most',
    unit: '1',
    method: 'ullage-hydrogen',
  },
  {
    id: 'ullage-pressure-rise',
    label: 'Pressure rise by hydrogen in a closed tank, at most',
    unit: 'bar',
    method: 'ullage-pressure',
  },
  {
    id: 'ullage-water-limit',
    label: 'Water let in that makes its ullage 4 % hydrogen, per kg',
    unit: 'mg/kg',
    method: 'ullage-water',
  },
] as const satisfies readonly FigureRow[];

type Row = (typeof hazardFigures)[number];
type FigureId = Row['id'];

/** The lower limit of hydrogen in air, upward: Coward and Jones 1952, U.S. Bureau of Mines Bulletin 503. */
const hydrogenLowerLimit = 0.04;
const litresPerM3 = 1000;

/** What the figures take beside the blend as it is stored. */
export interface TankInputs {
  readonly temperature: Quantity;
  readonly pressure: Quantity;
  /** Null where a density is missing. */
  readonly density: Quantity | null;
  /** What share of the tank it fills. */
  readonly filling: Quantity;
}

export interface HazardFigures {
  readonly figures: readonly Figure[];
  readonly absent: ReadonlyMap<string, readonly string[]>;
}

/** One state of the store worked out; the same for the figures, what they lack and their workings. */
interface Looked {
  readonly flash: number | null;
  readonly limits: VapourLimits | null;
  readonly spill: WaterContact | null;
  readonly ownHydrogen: number;
}

export function hazardFiguresOf(stored: StoredBlend, tank: TankInputs): HazardFigures {
  const { store } = stored;
  const looked = look(store);
  const shares = stored.massShares();
  const inputs = [...shares, tank.temperature, tank.pressure, tank.density ?? quantityOf(NaN), tank.filling];
  const outcomes = propagate(inputs, (values) => {
    const massShares = values.slice(0, shares.length);
    const [temperatureK = NaN, pressurePa = NaN, density = NaN, filling = NaN] = values.slice(shares.length);
    const isMoved =
      massShares.some((share, index) => share !== store.portions[index]?.massShare) ||
      temperatureK !== store.temperatureK ||
      pressurePa !== store.pressurePa;
    const moved = {
      ...store,
      temperatureK,
      pressurePa,
      portions: store.portions.map((portion, index) => ({ ...portion, massShare: massShares[index] ?? 0 })),
    };
    const found = valuesOf(isMoved ? moved : store, isMoved ? look(moved) : looked, density, filling);
    return hazardFigures.map(({ id }) => found[id] ?? NaN);
  });
  const figures: Figure[] = [];
  for (const [index, row] of hazardFigures.entries()) {
    const outcome = outcomes[index];
    if (!outcome || !Number.isFinite(outcome.value)) continue;
    const { id, label, unit, method } = row;
    const { dimension } = knownUnit(unit);
    const value = isEstimate(id) ? quantityOf(outcome.value, dimension) : quantityOfOutcome(outcome, dimension);
    const quantity = asTemperature(value, unit);
    const unread: Working = { method, inputs: [], sources: [], assumptions: [] };
    figures.push(
      lazily<Figure>(
        { id, label, quantity, unit, working: unread },
        { working: () => workingOf(row, stored, looked, tank) },
      ),
    );
  }
  return { figures, absent: absentOf(looked, tank) };
}

/**
 * Estimates bear no ±: what the inputs bring is far below what the method may err by, and would pass for it. The rest are
 * sums by stoichiometry.
 */
function isEstimate(id: FigureId): boolean {
  return !['water-contact-heat', 'water-contact-hydrogen', 'own-hydrogen', 'ullage-water-limit'].includes(id);
}

function asTemperature(quantity: Quantity, unit: string): Quantity {
  const temperature = unit === 'K' ? asKind(quantity, 'temperature') : quantity;
  return isFault(temperature) ? quantity : temperature;
}

function look(store: Store): Looked {
  return {
    flash: isGas(store) ? null : flashPointK(store),
    limits: isGas(store) ? gasLimitsOf(store) : vapourLimitsOf(store),
    spill: waterContactOf(store),
    ownHydrogen: ownHydrogenMolPerKg(store),
  };
}

/** Of a gas that burns in air: its limits as a whole. Inert gas in it lowers the upper one in no simple way. */
function gasLimitsOf(store: Store): VapourLimits | null {
  const mixture = gasMixtureOf(store);
  if (!mixture?.isFlammableInAir || mixture.oxygenShare > 0) return null;
  const isPure = mixture.fuelShare > 1 - 1e-6;
  return {
    lower: 1 / mixture.overLowerLimit,
    upper: isPure && mixture.overUpperLimit !== null ? 1 / mixture.overUpperLimit : null,
    limitingOxygenShare: mixture.limitingOxygenShare,
    vapours: [],
  };
}

function valuesOf(
  { temperatureK, pressurePa }: Store,
  { flash, limits, spill, ownHydrogen }: Looked,
  densityKgPerM3: number,
  filledShare: number,
): Partial<Record<FigureId, number>> {
  const values: Partial<Record<FigureId, number>> = {};
  if (flash !== null) values['flash-point'] = flash;
  // Vapour of an oil far below its flash point is a trace, and its limits are still those it burns within.
  if (limits !== null) {
    values['lower-flammable-limit'] = limits.lower;
    if (limits.upper !== null) values['upper-flammable-limit'] = limits.upper;
    values['limiting-oxygen-share'] = limits.limitingOxygenShare;
  }
  if (spill?.withoutReaction.length === 0) {
    if (spill.withoutHeat.length === 0) values['water-contact-heat'] = spill.heatJPerKg;
    if (spill.hydrogenM3PerKg > 0) values['water-contact-hydrogen'] = spill.hydrogenM3PerKg;
  }
  const hasUllage = filledShare > 0 && filledShare < 1;
  if (ownHydrogen > 0) {
    values['own-hydrogen'] = ownHydrogen * molarVolumeM3PerMol;
    if (hasUllage) {
      const over = hydrogenOver(ownHydrogen, densityKgPerM3, filledShare, temperatureK, pressurePa);
      values['ullage-hydrogen-share'] = over.ventedShare;
      values['ullage-pressure-rise'] = over.closedRisePa;
    }
  }
  const perWater = hydrogenPerWater(spill);
  if (perWater > 0 && hasUllage) {
    const needed = hydrogenForShare(hydrogenLowerLimit, densityKgPerM3, filledShare, temperatureK, pressurePa);
    // More than all of it can give is no limit.
    if (!(needed > (spill?.gasMolPerKg['H2'] ?? 0))) values['ullage-water-limit'] = (needed / perWater) * waterKgPerMol;
  }
  return values;
}

/** mol of hydrogen by mol of water, as the portions share it; 0 where none is made or not all is known. */
function hydrogenPerWater(spill: WaterContact | null): number {
  if (!spill || spill.withoutReaction.length > 0 || !(spill.waterKgPerKg > 0)) return 0;
  return (spill.gasMolPerKg['H2'] ?? 0) / (spill.waterKgPerKg / waterKgPerMol);
}

/** What figures that one would look for lack. */
function absentOf({ limits, spill, ownHydrogen }: Looked, { density }: TankInputs): Map<string, readonly string[]> {
  const absent = new Map<string, readonly string[]>();
  const noUpper = limits?.vapours.filter(({ portion }) => (portion.flammableLimits?.upper ?? null) === null) ?? [];
  if (noUpper.length > 0) {
    absent.set(
      'upper-flammable-limit',
      noUpper.map(({ portion }) => `the upper flammable limit of ${portion.name}`),
    );
  }
  const unknown = spill?.withoutReaction.map((name) => `what water makes of ${name}`) ?? [];
  const heats = [...unknown, ...(spill?.withoutHeat.map((name) => `the heat of ${name} with water`) ?? [])];
  if (heats.length > 0) absent.set('water-contact-heat', heats);
  if (unknown.length > 0) absent.set('water-contact-hydrogen', unknown);
  if (density === null) {
    if (ownHydrogen > 0)
      for (const id of ['ullage-hydrogen-share', 'ullage-pressure-rise']) absent.set(id, ['a density']);
    if (hydrogenPerWater(spill) > 0) absent.set('ullage-water-limit', ['a density']);
  }
  return absent;
}

function workingOf(row: Row, stored: StoredBlend, looked: Looked, tank: TankInputs): Working {
  const inputs: WorkingInput[] = [];
  const add = (label: string, quantity: Quantity | null, unit: string): void => {
    if (quantity) inputs.push({ label, quantity, unit });
  };
  const sources = new Set<string>();
  const property = (name: string, id: string): void => {
    const index = stored.store.portions.findIndex((portion) => portion.name === name);
    const found = stored.materials[index]?.card.properties.find((one) => one.id === id);
    if (!found) return;
    add(`${found.label} of ${name}`, found.quantity, found.unit === 'K' ? 'degC' : '%');
    if (found.source !== '') sources.add(found.source);
  };
  const addTank = (): void => {
    add('Density', tank.density, 'kg/m3');
    add('Filled share of the tank', tank.filling, '%');
    add('Stored temperature', tank.temperature, 'degC');
    add('Stored pressure', tank.pressure, 'bar');
  };
  const { store } = stored;
  switch (row.method) {
    case 'blend-flash-point':
      for (const { name } of liquids(store)) {
        property(name, 'flash-point');
        property(name, 'boiling-point');
      }
      break;
    case 'le-chatelier':
    case 'limiting-oxygen':
      add('Stored temperature', tank.temperature, 'degC');
      for (const { portion, moleShare } of looked.limits?.vapours ?? []) {
        add(`${portion.name}, by mole of the vapour`, quantityOf(moleShare), '%');
      }
      for (const { name, flammableLimits, hazards } of store.portions) {
        if (flammableLimits === null) continue;
        property(name, row.id === 'upper-flammable-limit' ? 'upper-flammable-limit' : 'lower-flammable-limit');
        if (row.method !== 'limiting-oxygen') continue;
        for (const { inert, moleFraction, source } of hazards.limitingOxygen) {
          if (inert !== 'nitrogen') continue;
          add(`Limiting oxygen of ${name}`, quantityOf(moleFraction, dimensionless), '%');
          sources.add(`${source.author} (${String(source.year)}), ${source.title}`);
        }
      }
      break;
    case 'water-contact':
      for (const [index, { name }] of store.portions.entries()) {
        if (waterContactOf({ ...store, portions: store.portions.slice(index, index + 1) }) === null) continue;
        add(`${name}, by mass`, stored.massShares()[index] ?? null, '%');
      }
      break;
    case 'own-hydrogen':
      store.portions.forEach(({ name }, index) => {
        add(`${name}, by mass`, stored.massShares()[index] ?? null, '%');
      });
      break;
    case 'ullage-hydrogen':
    case 'ullage-pressure':
      add('Hydrogen made, per kg', quantityOf(looked.ownHydrogen, knownUnit('mol/kg').dimension), 'mol/kg');
      addTank();
      break;
    case 'ullage-water':
      add('Lower limit of hydrogen in air', quantityOf(hydrogenLowerLimit), '%');
      add('Hydrogen made, mol per mol of water', quantityOf(hydrogenPerWater(looked.spill)), '1');
      addTank();
      sources.add(
        'Coward and Jones (1952), Limits of Flammability of Gases and Vapors, U.S. Bureau of Mines Bulletin 503',
      );
  }
  return { method: row.method, inputs, sources: [...sources], assumptions: assumptionsOf(row, looked) };
}

function assumptionsOf({ method }: Row, { limits }: Looked): readonly AssumptionId[] {
  const usual: AssumptionId[] = limits?.vapours.some(({ isUsual }) => isUsual) ? ['usual-oil-limit'] : [];
  switch (method) {
    case 'blend-flash-point':
      return ['vapours-by-layers', ...usual];
    case 'le-chatelier':
    case 'limiting-oxygen':
      return limits?.vapours.length === 0 ? ['ideal-gas'] : ['vapours-by-layers', 'ideal-gas', ...usual];
    case 'water-contact':
      return ['everything-reacts', 'reference-state'];
    case 'own-hydrogen':
      return ['everything-reacts'];
    default:
      return ['everything-reacts', 'ideal-gas'];
  }
}

/** Each gas a spilled kilogram makes with water, where it makes any; and which code governs the fuel aboard a ship. */
export function hazardTables({ store }: StoredBlend): readonly Table[] {
  const spill = waterContactOf(store);
  const gases = Object.entries(spill?.gasMolPerKg ?? {});
  // Hydrogen alone is a figure.
  const isMore = gases.some(([gas]) => gas !== 'H2');
  const route = approvalRouteOf(store);
  return [
    ...(isMore
      ? [
          {
            id: 'water-contact-gases',
            label: 'Gases per kg spilled into water, at most',
            columns: [
              { id: 'substance', label: 'Gas', unit: null },
              { id: 'amount', label: 'Amount', unit: 'mol/kg' },
              { id: 'volume', label: 'Volume at 25 °C and 1 bar', unit: 'L/kg' },
            ],
            rows: gases.map(([gas, mol]) => [gas, mol, mol * molarVolumeM3PerMol * litresPerM3]),
          },
        ]
      : []),
    ...(route
      ? [
          {
            id: 'approval-route',
            label: `Approval route as a ship’s fuel, as known in ${knownAsOf}`,
            columns: [
              { id: 'instrument', label: 'What governs', unit: null },
              { id: 'status', label: 'Standing', unit: null },
              { id: 'since', label: 'Since', unit: null },
              { id: 'known-as', label: 'Known as of', unit: null },
              { id: 'says', label: 'Says', unit: null },
            ],
            rows: [[route.instrument, route.status, route.since, knownAsOf, route.says]],
          },
        ]
      : []),
  ];
}
