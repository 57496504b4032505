// Properties of a mixture from its mass shares and its parts' properties: elements, formation enthalpy, molar mass,
// density, biogenic share of the carbon. Enthalpies and volumes add; heat and volume of mixing are left out.
// Knows no names and no uncertainty. Invariant: a property that a part with a share lacks is null for the mixture.

export interface PartProperties {
  readonly molPerKg: ReadonlyMap<string, number>;
  readonly enthalpyJPerKg: number | null;
  readonly molarMassKgPerMol: number | null;
  readonly densityKgPerM3: number | null;
  /** Biogenic share of its carbon, 0 to 1. */
  readonly biogenicShare: number;
}

/** Mixes parts by mass shares that add up to 1. The elements keep the order in which the parts bring them. */
export function mixProperties(massShares: readonly number[], parts: readonly PartProperties[]): PartProperties {
  const molPerKg = new Map<string, number>();
  let carbon = 0;
  let biogenic = 0;
  for (const [index, part] of parts.entries()) {
    const share = massShares[index] ?? 0;
    for (const [symbol, mol] of part.molPerKg) molPerKg.set(symbol, (molPerKg.get(symbol) ?? 0) + share * mol);
    const ownCarbon = share * (part.molPerKg.get('C') ?? 0);
    carbon += ownCarbon;
    biogenic += ownCarbon * part.biogenicShare;
  }
  const enthalpyJPerKg = weighted(massShares, parts, (part) => part.enthalpyJPerKg);
  const molPerKgOfAll = weighted(massShares, parts, (part) => reciprocal(part.molarMassKgPerMol));
  const volumePerKg = weighted(massShares, parts, (part) => reciprocal(part.densityKgPerM3));
  return {
    molPerKg,
    enthalpyJPerKg,
    molarMassKgPerMol: reciprocal(molPerKgOfAll),
    densityKgPerM3: reciprocal(volumePerKg),
    biogenicShare: carbon > 0 ? biogenic / carbon : 0,
  };
}

function weighted(
  massShares: readonly number[],
  parts: readonly PartProperties[],
  property: (part: PartProperties) => number | null,
): number | null {
  let sum = 0;
  for (const [index, part] of parts.entries()) {
    const share = massShares[index] ?? 0;
    if (share === 0) continue;
    const value = property(part);
    if (value === null) return null;
    sum += share * value;
  }
  return sum;
}

function reciprocal(value: number | null): number | null {
  return value === null || value === 0 ? null : 1 / value;
}
