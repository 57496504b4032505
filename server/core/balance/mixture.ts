// From portions as people write them (shares by mass, amount or volume, or plain amounts, and one `rest`) to mass shares,
// and from mass shares to shares on the other bases. Volumes are taken to add up. Shares on different bases in one mixture
// are solved together as a linear system, so that each holds in the finished mixture.
// Knows no names, no energies and no units but SI. Invariant: returned shares are not negative and add up to 1.

/** How much of a part there is. Shares are fractions of the whole (1 = all). */
export type PartAmount =
  | { readonly kind: 'share'; readonly basis: Basis; readonly value: number }
  /** kg, mol or m³ */
  | { readonly kind: 'amount'; readonly basis: Basis; readonly value: number }
  | { readonly kind: 'rest' };

export type Basis = 'mass' | 'mole' | 'volume';

export interface MixturePart {
  readonly amount: PartAmount;
  /** kg/mol; null when unknown. */
  readonly molarMassKgPerMol: number | null;
  /** kg/m³; null when unknown. */
  readonly densityKgPerM3: number | null;
}

/**
 * Why there are no mass shares. `index` is the part to blame.
 * `sum`: shares on one basis without a rest do not add up to 1 (`sum`) · `no-room`: what is given leaves less than
 * nothing for the rest · `inconsistent`: shares on different bases contradict each other (`found` is what the last one
 * would have to be) · `mixed-amounts`: shares beside plain amounts · `rest-with-amounts` · `two-rests` · `negative` ·
 * `nothing`: no part, or only zeros · `no-density`, `no-molar-mass`: needed to bring the parts to one basis.
 */
export type MixtureFault =
  | { readonly fault: 'sum' | 'no-room'; readonly sum: number }
  | { readonly fault: 'inconsistent'; readonly index: number; readonly found: number }
  | { readonly fault: 'mixed-amounts' | 'rest-with-amounts' | 'two-rests' | 'negative'; readonly index: number }
  | { readonly fault: 'nothing' }
  | { readonly fault: 'no-density' | 'no-molar-mass'; readonly index: number };

/** Shares that miss 1 by no more than this are taken as rounded and scaled to 1 (a tenth of a percentage point; the last digit lets 99.9 % itself through). */
export const roundingOfShares = 1e-3 + 1e-9;

/**
 * Mass shares of the parts, in their order; `scaled` when rounding was taken up. Without a rest, shares whose sum misses 1
 * by more than `largestGap` are a fault; with Infinity they are scaled whatever they add up to, for one who moves the
 * shares of a whole by their uncertainties.
 */
export function massSharesOf(
  parts: readonly MixturePart[],
  largestGap = roundingOfShares,
): { readonly massShares: readonly number[]; readonly scaled: boolean } | MixtureFault {
  const fault = faultOfForm(parts);
  if (fault) return fault;
  const bases = new Set<Basis>();
  for (const { amount } of parts) if (amount.kind !== 'rest') bases.add(amount.basis);
  if (parts.every((part) => part.amount.kind === 'rest')) return { massShares: parts.map(() => 1), scaled: false };
  if (parts.some((part) => part.amount.kind === 'amount')) return fromAmounts(parts);
  const [only] = bases;
  return bases.size === 1 && only ? fromSharesOnOneBasis(parts, only, largestGap) : fromMixedShares(parts, largestGap);
}

/** Shares on another basis from mass shares; null when a part that is there lacks the property it takes. */
export function sharesOn(
  basis: Basis,
  massShares: readonly number[],
  parts: readonly MixturePart[],
): readonly number[] | null {
  const amounts: number[] = [];
  for (const [index, part] of parts.entries()) {
    const share = massShares[index] ?? 0;
    const perKg = perKilogram(part, basis);
    if (perKg === null && share > 0) return null;
    amounts.push(share * (perKg ?? 0));
  }
  return normalised(amounts);
}

function faultOfForm(parts: readonly MixturePart[]): MixtureFault | undefined {
  let rest = -1;
  let share = -1;
  for (const [index, { amount }] of parts.entries()) {
    if (amount.kind === 'rest') {
      if (rest >= 0) return { fault: 'two-rests', index };
      rest = index;
      continue;
    }
    if (!(amount.value >= 0)) return { fault: 'negative', index };
    if (amount.kind === 'share') share = index;
  }
  const amountIndex = parts.findIndex((part) => part.amount.kind === 'amount');
  if (amountIndex >= 0 && share >= 0) return { fault: 'mixed-amounts', index: Math.max(amountIndex, share) };
  if (amountIndex >= 0 && rest >= 0) return { fault: 'rest-with-amounts', index: rest };
  return parts.length === 0 ? { fault: 'nothing' } : undefined;
}

function fromAmounts(parts: readonly MixturePart[]): { massShares: readonly number[]; scaled: boolean } | MixtureFault {
  const masses: number[] = [];
  for (const [index, part] of parts.entries()) {
    if (part.amount.kind !== 'amount') continue;
    const perKg = perKilogram(part, part.amount.basis);
    if (perKg === null) return lacking(part.amount.basis, index);
    masses.push(part.amount.value / perKg);
  }
  const massShares = normalised(masses);
  return massShares ? { massShares, scaled: false } : { fault: 'nothing' };
}

function fromSharesOnOneBasis(
  parts: readonly MixturePart[],
  basis: Basis,
  largestGap: number,
): { massShares: readonly number[]; scaled: boolean } | MixtureFault {
  let sum = 0;
  for (const { amount } of parts) if (amount.kind === 'share') sum += amount.value;
  const hasRest = parts.some((part) => part.amount.kind === 'rest');
  if (hasRest && sum > 1 + roundingOfShares) return { fault: 'no-room', sum };
  if (!hasRest && Math.abs(sum - 1) > largestGap) return { fault: 'sum', sum };
  const masses: number[] = [];
  for (const [index, part] of parts.entries()) {
    const share = part.amount.kind === 'share' ? part.amount.value : Math.max(0, 1 - sum);
    const perKg = perKilogram(part, basis);
    if (perKg === null && share > 0) return lacking(basis, index);
    masses.push(share / (perKg ?? 1));
  }
  const massShares = normalised(masses);
  // A sum that differs from 1 only by floating-point rounding has not been scaled in any sense a reader would know.
  return massShares ? { massShares, scaled: !hasRest && Math.abs(sum - 1) > 1e-9 } : { fault: 'nothing' };
}

/**
 * Shares on different bases. With masses m (adding up to 1) and conversions c (mol or m³ per kg), part j's share s on its
 * basis says m_j c_j - s Σ m_k c_k = 0: one linear equation each; the rest's equation is Σ m = 1. Without a rest there is
 * one equation too many: the last is left out and must come true by itself.
 */
function fromMixedShares(
  parts: readonly MixturePart[],
  largestGap: number,
): { massShares: readonly number[]; scaled: boolean } | MixtureFault {
  for (const { amount } of parts) {
    if (amount.kind !== 'share') continue;
    for (const [index, part] of parts.entries()) {
      if (perKilogram(part, amount.basis) === null) return lacking(amount.basis, index);
    }
  }
  const restIndex = parts.findIndex((part) => part.amount.kind === 'rest');
  const freed = restIndex >= 0 ? restIndex : parts.length - 1;
  const rows = parts.map((_, row) => {
    const amount = parts[row]?.amount;
    if (row === freed || amount?.kind !== 'share') return [...parts.map(() => 1), 1];
    const coefficients = parts.map((part, column) => {
      const perKg = perKilogram(part, amount.basis) ?? 0;
      return (column === row ? perKg : 0) - amount.value * perKg;
    });
    return [...coefficients, 0];
  });
  const masses = solveLinear(rows);
  if (!masses) return { fault: 'nothing' };
  const negative = masses.findIndex((mass) => mass < -roundingOfShares);
  if (negative >= 0) {
    const sum = masses.reduce((total, mass, index) => (index === negative ? total : total + mass), 0);
    return { fault: 'no-room', sum };
  }
  const massShares = normalised(masses.map((mass) => Math.max(0, mass)));
  if (!massShares) return { fault: 'nothing' };
  const last = parts[freed]?.amount;
  if (last?.kind === 'share') {
    const found = sharesOn(last.basis, massShares, parts)?.[freed] ?? 0;
    if (Math.abs(found - last.value) > largestGap) return { fault: 'inconsistent', index: freed, found };
  }
  return { massShares, scaled: false };
}

function perKilogram(part: MixturePart, basis: Basis): number | null {
  if (basis === 'mass') return 1;
  const property = basis === 'mole' ? part.molarMassKgPerMol : part.densityKgPerM3;
  return property === null ? null : 1 / property;
}

function lacking(basis: Basis, index: number): MixtureFault {
  return { fault: basis === 'mole' ? 'no-molar-mass' : 'no-density', index };
}

function normalised(values: readonly number[]): number[] | null {
  const sum = values.reduce((total, value) => total + value, 0);
  return sum > 0 && Number.isFinite(sum) ? values.map((value) => value / sum) : null;
}

/** Solves a square system given as rows with the right side last, by elimination with row pivoting; null if singular. */
function solveLinear(rows: number[][]): number[] | null {
  const size = rows.length;
  for (let column = 0; column < size; column++) {
    let best = column;
    for (let row = column + 1; row < size; row++) {
      if (Math.abs(rows[row]?.[column] ?? 0) > Math.abs(rows[best]?.[column] ?? 0)) best = row;
    }
    const pivotRow = rows[best];
    const pivot = pivotRow?.[column] ?? 0;
    if (!pivotRow || Math.abs(pivot) < 1e-300) return null;
    rows[best] = rows[column] ?? pivotRow;
    rows[column] = pivotRow;
    for (let row = 0; row < size; row++) {
      const other = rows[row];
      if (!other || row === column) continue;
      const factor = (other[column] ?? 0) / pivot;
      if (factor === 0) continue;
      for (let at = column; at <= size; at++) other[at] = (other[at] ?? 0) - factor * (pivotRow[at] ?? 0);
    }
  }
  return rows.map((row, index) => (row[size] ?? 0) / (row[index] ?? 1));
}
