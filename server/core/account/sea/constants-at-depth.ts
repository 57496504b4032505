// The equilibrium constants of sea water at depth: each surface constant times what hydrostatic pressure makes of it, on the
// pH scale on which its change of volume was measured, and put back on the total scale.
// It does not know how the pressure came about. Invariant: at no applied pressure the constants are those of the surface.
// The solubility for CO2 stays that at 1 atm: a fugacity at depth is the one the water would have if it were brought up as it is.
// Sources: Millero 1995 (Geochim. Cosmochim. Acta 59, 661), with the signs and values put right since (Lewis and Wallace
// 1998; Zeebe and Wolf-Gladrow 2001, appendix A.11); for water Millero 1983, in sea water.

import { conservedIons, type BoronSource, type ConservedIons } from './conserved-ions.ts';
import { surfaceConstants, type SurfaceConstants } from './surface-constants.ts';

/** What a water's constants follow from. */
export interface SeaPlace {
  readonly salinity: number;
  readonly temperatureK: number;
  /** Above the atmosphere's; 0 at the surface. */
  readonly appliedPressureBar: number;
  readonly boron: BoronSource;
}

/** Acidity constants on the total scale at the place's pressure; hydrogen sulphate and fluoride on the free scale. */
export interface SeaConstants extends SurfaceConstants {
  readonly ions: ConservedIons;
  /** Hydrogen ions on the total scale over free ones. */
  readonly totalPerFree: number;
}

/** The constants at a place. */
export function seaConstants({ salinity, temperatureK, appliedPressureBar, boron }: SeaPlace): SeaConstants {
  const ions = conservedIons(salinity, boron);
  const surface = surfaceConstants(salinity, temperatureK, ions);
  const under = (reaction: keyof typeof volumeChanges): number =>
    pressureFactor(reaction, temperatureK, appliedPressureBar);
  const hydrogenSulphateFree = surface.hydrogenSulphateFree * under('hydrogenSulphateFree');
  const hydrogenFluorideFree = surface.hydrogenFluorideFree * under('hydrogenFluorideFree');
  const deep = { hydrogenSulphateFree, hydrogenFluorideFree };
  // Volumes were measured on the seawater scale, which counts HF too.
  const rescale = seawaterPerTotal(surface, ions) / seawaterPerTotal(deep, ions);
  return {
    ...deep,
    carbonDioxide: surface.carbonDioxide,
    carbonic1: surface.carbonic1 * under('carbonic1') * rescale,
    carbonic2: surface.carbonic2 * under('carbonic2') * rescale,
    boric: surface.boric * under('boric') * rescale,
    water: surface.water * under('water') * rescale,
    phosphoric1: surface.phosphoric1 * under('phosphoric1') * rescale,
    phosphoric2: surface.phosphoric2 * under('phosphoric2') * rescale,
    phosphoric3: surface.phosphoric3 * under('phosphoric3') * rescale,
    silicic: surface.silicic * under('silicic') * rescale,
    calcite: surface.calcite * under('calcite'),
    aragonite: surface.aragonite * under('aragonite'),
    ions,
    totalPerFree: 1 + ions.sulphate / hydrogenSulphateFree,
  };
}

type ScaleConstants = Pick<SurfaceConstants, 'hydrogenSulphateFree' | 'hydrogenFluorideFree'>;

function seawaterPerTotal(constants: ScaleConstants, ions: ConservedIons): number {
  const total = 1 + ions.sulphate / constants.hydrogenSulphateFree;
  return (total + ions.fluoride / constants.hydrogenFluorideFree) / total;
}

/** Molar gas constant, cm³ bar/(mol K). */
const gasConstantCm3Bar = 83.1446261815324;

/** What a constant is multiplied by under that pressure, on the scale its volumes belong to. */
export function pressureFactor(
  reaction: keyof typeof volumeChanges,
  temperatureK: number,
  appliedPressureBar: number,
): number {
  const celsius = temperatureK - 273.15;
  const [v0, v1, v2, b0, b1] = volumeChanges[reaction];
  const volumeCm3 = v0 + v1 * celsius + v2 * celsius ** 2;
  const compressionCm3PerBar = (b0 + b1 * celsius) / 1000;
  const work = -volumeCm3 * appliedPressureBar + 0.5 * compressionCm3PerBar * appliedPressureBar ** 2;
  return Math.exp(work / (gasConstantCm3Bar * temperatureK));
}

/**
 * Change of molar volume, cm³/mol: v0 + v1 t + v2 t²; and of its compression, 10⁻³ cm³/(mol bar): b0 + b1 t; t in °C.
 * Silicic acid is taken as boric acid, for want of a measurement; aragonite lies 2.8 cm³/mol above calcite.
 */
const volumeChanges = {
  carbonic1: [-25.5, 0.1271, 0, -3.08, 0.0877],
  carbonic2: [-15.82, -0.0219, 0, 1.13, -0.1475],
  boric: [-29.48, 0.1622, -0.002608, -2.84, 0],
  silicic: [-29.48, 0.1622, -0.002608, -2.84, 0],
  water: [-20.02, 0.1119, -0.001409, -5.13, 0.0794],
  hydrogenSulphateFree: [-18.03, 0.0466, 0.000316, -4.53, 0.09],
  hydrogenFluorideFree: [-9.78, -0.009, -0.000942, -3.91, 0.054],
  phosphoric1: [-14.51, 0.1211, -0.000321, -2.67, 0.0427],
  phosphoric2: [-23.12, 0.1758, -0.002647, -5.15, 0.09],
  phosphoric3: [-26.57, 0.202, -0.003042, -4.08, 0.0714],
  calcite: [-48.76, 0.5304, 0, -11.76, 0.3692],
  aragonite: [-45.96, 0.5304, 0, -11.76, 0.3692],
} as const satisfies Readonly<Record<string, readonly [number, number, number, number, number]>>;
