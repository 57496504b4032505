// ASE: experimental formation enthalpies of gases from the G2 set (Curtiss et al. 1997), for those molecules that stand in our
// catalogue as gases. The set is in kcal/mol at 298 K with one decimal; rows are converted with 4.184 kJ/kcal.

export const packages = ['python3-ase'];
/** Debian's own interpreter: another python3 earlier in the path does not see Debian's modules. */
const python = '/usr/bin/python3';
export const program = [python, '-c', 'import ase'];

/** Names of the set, and our formula for the same gas (isomers share sums of atoms, so formulas are written out). */
const molecules = {
  H2: 'H2',
  O2: 'O2',
  N2: 'N2',
  F2: 'F2',
  Cl2: 'Cl2',
  CO: 'CO',
  CO2: 'CO2',
  H2O: 'H2O',
  NH3: 'NH3',
  HCl: 'HCl',
  HF: 'HF',
  SO2: 'SO2',
  SH2: 'H2S',
  NO: 'NO',
  NO2: 'NO2',
  CH4: 'CH4',
  C2H2: 'C2H2',
  C2H4: 'C2H4',
  C2H6: 'C2H6',
  C3H8: 'C3H8',
  'trans-butane': 'C4H10',
  isobutane: '(CH3)3CH',
  CH3OH: 'CH3OH',
  CH3CH2OH: 'C2H5OH',
  CH3OCH3: 'CH3OCH3',
  C6H6: 'C6H6',
};

const script = `
import json, sys
import ase
from ase.data.g2 import data
names = json.load(sys.stdin)
print(json.dumps({
    "version": ase.__version__,
    "rows": [{"name": n, "kcal": data[n].get("enthalpy"), "database": data[n].get("database")} for n in names if n in data],
    "absent": [n for n in names if n not in data],
}))
`;

export async function answer({ run }) {
  const { version, rows, absent } = JSON.parse(run(python, ['-c', script], JSON.stringify(Object.keys(molecules))));
  if (absent.length > 0) throw new Error(`not in the set: ${absent.join(', ')}`);
  return {
    source: `ASE ${version} (Debian python3-ase), ase.data.g2, experimental enthalpies of formation of gases at 298 K`,
    command: `${python} -c "from ase.data.g2 import data"`,
    rows: rows
      .filter((row) => typeof row.kcal === 'number')
      .map((row) => ({
        molecule: row.name,
        formula: molecules[row.name],
        phase: 'g',
        kcalPerMol: row.kcal,
        kJPerMol: Math.round(row.kcal * 4184) / 1000,
        provenance: 'seen',
      })),
  };
}
