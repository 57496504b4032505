// ASE: the atomic weight of each element that has a standard one in our table.
// ASE 3.22 carries the values of 2016 (`atomic_masses_iupac2016`), so a few weights were revised since; the test names them.

export const packages = ['python3-ase'];
/** Debian's own interpreter: another python3 earlier in the path does not see Debian's modules. */
const python = '/usr/bin/python3';
export const program = [python, '-c', 'import ase'];

const script = `
import json, sys
import ase
from ase.data import atomic_masses, chemical_symbols
symbols = json.load(sys.stdin)
print(json.dumps({
    "version": ase.__version__,
    "rows": [{"symbol": s, "number": chemical_symbols.index(s), "weight": atomic_masses[chemical_symbols.index(s)]} for s in symbols],
}))
`;

export async function answer({ run, load }) {
  const { allElements } = await load('server/core/substance/elements.ts');
  const symbols = allElements()
    .filter((element) => element.atomicWeight !== undefined)
    .map((element) => element.symbol);
  const { version, rows } = JSON.parse(run(python, ['-c', script], JSON.stringify(symbols)));
  return {
    source: `ASE ${version} (Debian python3-ase), ase.data.atomic_masses, in g/mol`,
    command: `${python} -c "from ase.data import atomic_masses"`,
    rows: rows.map((row) => ({ ...row, provenance: 'seen' })),
  };
}
