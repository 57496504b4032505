// gsw (Debian python3-gsw): density of sea water by TEOS-10, of the reference composition, and pressure at a depth. It is
// another equation of state than ours (that of 1980), on another temperature scale: the two differ by what both leave open.

export const packages = ['python3-gsw'];
/** Debian's own interpreter: another python3 earlier in the path does not see Debian's modules. */
const python = '/usr/bin/python3';
export const program = [python, '-c', 'import gsw'];

const waters = [];
for (const salinity of [5, 20, 35, 41]) {
  for (const celsius of [0, 11, 25, 35]) for (const decibar of [0, 2000]) waters.push({ salinity, celsius, decibar });
}
const depths = [10, 200, 1000, 4000, 10000];

const script = `
import json, sys
import gsw
asked = json.load(sys.stdin)
def density(salinity, celsius, decibar):
    absolute = gsw.SR_from_SP(salinity)
    return float(gsw.rho_t_exact(absolute, celsius, decibar))
rows = [{**water, "densityKgPerM3": density(**water)} for water in asked["waters"]]
rows += [{"depthM": z, "latitude": 45, "decibar": float(gsw.p_from_z(-z, 45))} for z in asked["depths"]]
print(json.dumps({"version": gsw.__version__, "rows": rows}))
`;

export async function answer({ run }) {
  const { version, rows } = JSON.parse(run(python, ['-c', script], JSON.stringify({ waters, depths })));
  return {
    source: `gsw ${version} (Debian): TEOS-10, density of sea water of the reference composition and pressure at a depth`,
    command: 'gsw.rho_t_exact(gsw.SR_from_SP(salinity), celsius, decibar); gsw.p_from_z(-depth, 45)',
    rows: rows.map((row) => ({ ...row, provenance: 'seen' })),
  };
}
