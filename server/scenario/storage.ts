// How a blend stands in its tank: which portions are solid, liquid or gas at the stored temperature, what share of the
// volume is solid, and whether a solid is heavier than the liquid around it. By melting and boiling points at 1 atm alone:
// solution, depression of freezing and gelling are not seen. Knows no syntax.

import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, quantityOfOutcome, type Quantity } from '../core/quantity/quantity.ts';
import { propagate } from '../core/quantity/uncertainty.ts';
import { deepestUnread, type Material, type PortionShare } from './material.ts';
import type { PortionState, StoredPhase } from './portion-state.ts';

export interface StoredAt {
  readonly temperature: Quantity;
  readonly pressure: Quantity;
}

/** Above this (1.2 bar) a boiling point at 1 atm says nothing of a tank. */
const boilingPressurePa = 1.2e5;

/** The state of each portion at a temperature; null for one that is a mixture of its own. */
export function portionStates(
  portions: readonly PortionShare[],
  { temperature, pressure }: StoredAt,
): readonly (PortionState | null)[] {
  const isPressed = pressure.value > boilingPressurePa;
  const phases = portions.map(({ material }) => phaseAt(material, temperature, isPressed));
  const liquid = liquidDensityKgPerM3(portions, phases);
  return portions.map(({ material }, index) => {
    const phase = phases[index];
    if (!phase) return null;
    const density = material.density?.value;
    const excess = phase === 'solid' && density !== undefined && liquid !== null ? density - liquid : null;
    const usual = phaseWords[material.phase ?? ''];
    const limit = phase === 'gas' || usual === 'gas' ? material.boilingPoint : material.meltingPoint;
    return {
      phase,
      temperature,
      changed: usual !== undefined && usual !== phase ? { from: usual, at: limit } : null,
      excessDensity: excess === null ? null : quantityOf(excess, material.density?.dimension),
    };
  });
}

/** The share of the volume that is solid; null where a volume is missing. A blend in the blend counts by its own portions. */
export function solidsVolumeShare(
  portions: readonly PortionShare[],
  temperature: Quantity,
  depth = 1,
): Quantity | null {
  const inputs: Quantity[] = [];
  for (const { material, volume } of portions) {
    if (!volume) return null;
    const own = material.portions
      ? solidsVolumeShare(material.portions, temperature, depth + 1)
      : quantityOf(phaseAt(material, temperature) === 'solid' ? 1 : 0);
    if (!own) return null;
    inputs.push(volume, own);
  }
  const [total] = propagate(inputs, (values) => [
    portions.reduce((sum, _, index) => sum + (values[2 * index] ?? NaN) * (values[2 * index + 1] ?? NaN), 0),
  ]);
  // As in mixing: parts are not left unread in a long chain.
  if (total && depth % deepestUnread === 0) void total.parts;
  return total && Number.isFinite(total.value) ? quantityOfOutcome(total) : null;
}

/** The phase of one material at a temperature in K and a pressure in Pa; null for a mixture or a solution. */
export function storedPhase(material: Material, temperatureK: number, pressurePa: number): StoredPhase | null {
  const temperature = quantityOf(temperatureK, knownUnit('K').dimension, undefined, 'temperature');
  return phaseAt(material, temperature, pressurePa > boilingPressurePa);
}

const phaseWords: Readonly<Record<string, StoredPhase>> = { cr: 'solid', l: 'liquid', g: 'gas' };

/** By the points at 1 atm where they are known, otherwise as the material is given; null for a mixture or a solution. */
function phaseAt(material: Material, temperature: Quantity, isPressed = false): StoredPhase | null {
  const { meltingPoint, boilingPoint, phase } = material;
  const usual = phaseWords[phase ?? ''] ?? null;
  if (!usual || material.portions) return null;
  if (boilingPoint && !isPressed && temperature.value > boilingPoint.value) return 'gas';
  if (meltingPoint && temperature.value < meltingPoint.value) return 'solid';
  if (usual === 'solid') return meltingPoint ? 'liquid' : 'solid';
  return usual === 'gas' && boilingPoint && !isPressed ? 'liquid' : usual;
}

function liquidDensityKgPerM3(
  portions: readonly PortionShare[],
  phases: readonly (StoredPhase | null)[],
): number | null {
  let mass = 0;
  let volume = 0;
  for (const [index, portion] of portions.entries()) {
    if (phases[index] !== 'liquid') continue;
    const density = portion.material.density?.value;
    if (density === undefined) return null;
    mass += portion.mass.value;
    volume += portion.mass.value / density;
  }
  return volume > 0 ? mass / volume : null;
}
