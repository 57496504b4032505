// iapws (Debian python3-iapws): saturation pressure of water and heat of vaporisation by IAPWS-IF97, sublimation
// pressure of ice by IAPWS R14-08, and steam at 700 Pa, where it is an ideal gas to about 0.1 %.

export const packages = ['python3-iapws'];
/** Debian's own interpreter: another python3 earlier in the path does not see Debian's modules. */
const python = '/usr/bin/python3';
export const program = [python, '-c', 'import iapws'];

const temperaturesK = {
  ice: [200, 230, 250, 263.15, 273],
  steam: [400, 500, 700, 1000],
  liquid: [273.16, 283.15, 291.15, 298.15, 300, 313.15, 333.15, 373.15, 473.15, 573.15, 640],
};

const script = `
import json, sys
import iapws
from iapws._iapws import _Sublimation_Pressure
from iapws.iapws97 import _PSat_T
temperatures = json.load(sys.stdin)
rows = [{"over": "ice", "temperatureK": t, "pressurePa": _Sublimation_Pressure(t) * 1e6} for t in temperatures["ice"]]
rows += [{"over": "liquid", "temperatureK": t, "pressurePa": _PSat_T(t) * 1e6} for t in temperatures["liquid"]]
from iapws import IAPWS97
rows += [{"over": "steam", "temperatureK": t, "heatCapacityKJPerKgK": IAPWS97(T=t, P=7e-4).cp,
          "enthalpyRiseKJPerKg": IAPWS97(T=t, P=7e-4).h - IAPWS97(T=298.15, P=7e-4).h} for t in temperatures["steam"]]
vapour, liquid = IAPWS97(T=298.15, x=1), IAPWS97(T=298.15, x=0)
rows += [{"over": "vaporisation", "temperatureK": 298.15, "heatKJPerKg": vapour.h - liquid.h}]
print(json.dumps({"version": iapws.__version__, "rows": rows}))
`;

export async function answer({ run }) {
  const { version, rows } = JSON.parse(run(python, ['-c', script], JSON.stringify(temperaturesK)));
  return {
    source: `iapws ${version} (Debian): saturation pressure by IAPWS-IF97, sublimation pressure by IAPWS R14-08`,
    command: '/usr/bin/python3 -c "from iapws.iapws97 import _PSat_T; …"',
    rows: rows.map((row) => ({ ...row, provenance: 'seen' })),
  };
}
