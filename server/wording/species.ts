// Names of species for people where the formula of the tables hides what it is: vapours of alkali salts and hydroxides hold
// pairs, written in the tables by their sum. Ids stay what they are; this is for reading only.
// Invariant: atoms and phase are those of the id.

/** `(NaOH)2(g)` for `Na2O2H2(g)`; any other id as it is. */
export function speciesText(id: string): string {
  const found = pair.exec(id);
  return found ? `(${found[1] ?? ''}${partners[found[2] ?? ''] ?? ''})2(g)` : id;
}

const pair = /^(Li|Na|K)2(O2H2|C2N2|Cl2)\(g\)$/;
const partners: Readonly<Record<string, string>> = { O2H2: 'OH', C2N2: 'CN', Cl2: 'Cl' };
