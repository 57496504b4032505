// The chemical elements: number, symbol, name, standard atomic weight and, where λ needs one, the valence in complete oxidation.
// Knows no formula, no substance and no isotope: an atomic weight is that of normal terrestrial material.
// Where the commission gives an interval, `atomicWeight` is its conventional value and the interval is kept beside it;
// elements without a standard atomic weight carry none, so nothing that holds them has a molar mass.
// Source: Prohaska et al., Standard atomic weights of the elements 2021 (IUPAC Technical Report), Pure Appl. Chem. 94 (2022).

/** One element. Atomic weights are in g/mol (equal to the dimensionless relative atomic mass). */
export interface Element {
  readonly number: number;
  readonly symbol: string;
  readonly name: string;
  /** Conventional or standard value in g/mol; absent for elements without a standard atomic weight. */
  readonly atomicWeight?: number;
  /** The published uncertainty of the value in g/mol; absent where an interval is given instead. */
  readonly atomicWeightUncertainty?: number;
  /** The published interval in g/mol, for elements whose weight varies in nature. */
  readonly atomicWeightInterval?: readonly [number, number];
  /** Electrons an atom gives in complete oxidation, as λ counts them; negative for what oxidises. Absent where no rule exists. */
  readonly valence?: number;
}

/** All 118 elements, in order of their number. */
export function allElements(): readonly Element[] {
  return elements;
}

/** The element of a symbol written exactly (`Na`, not `NA`), or undefined. */
export function elementOfSymbol(symbol: string): Element | undefined {
  return elementsBySymbol.get(symbol);
}

/** Atomic weight in kg/mol, or undefined for an unknown symbol or an element without a standard atomic weight. */
export function atomicWeightKgPerMol(symbol: string): number | undefined {
  const weight = elementsBySymbol.get(symbol)?.atomicWeight;
  return weight === undefined ? undefined : weight / 1000;
}

/** The alkali metals that the combustion rules treat alike, in order of their number. */
export const alkaliMetals: readonly string[] = ['Li', 'Na', 'K', 'Rb', 'Cs'];

/** Valences that λ counts with; N counts as none because it leaves as N2. Noble gases take no part and count as none. */
const valences: Readonly<Record<string, number>> = {
  C: 4,
  H: 1,
  S: 4,
  N: 0,
  P: 5,
  Li: 1,
  Na: 1,
  K: 1,
  Rb: 1,
  Cs: 1,
  Mg: 2,
  Ca: 2,
  Zn: 2,
  Al: 3,
  B: 3,
  Fe: 3,
  Si: 4,
  Ti: 4,
  V: 5,
  O: -2,
  Cl: -1,
  F: -1,
  Br: -1,
  He: 0,
  Ne: 0,
  Ar: 0,
  Kr: 0,
  Xe: 0,
};

/**
 * Symbol, name and atomic weight as published: `39.0983(1)` carries its uncertainty in the last digits,
 * `1.008 [1.00784, 1.00811]` is a conventional value with its interval, nothing means no standard atomic weight.
 */
const publishedRows = `
H hydrogen 1.008 [1.00784, 1.00811]
He helium 4.002602(2)
Li lithium 6.94 [6.938, 6.997]
Be beryllium 9.0121831(5)
B boron 10.81 [10.806, 10.821]
C carbon 12.011 [12.0096, 12.0116]
N nitrogen 14.007 [14.00643, 14.00728]
O oxygen 15.999 [15.99903, 15.99977]
F fluorine 18.998403162(5)
Ne neon 20.1797(6)
Na sodium 22.98976928(2)
Mg magnesium 24.305 [24.304, 24.307]
Al aluminium 26.9815384(3)
Si silicon 28.085 [28.084, 28.086]
P phosphorus 30.973761998(5)
S sulfur 32.06 [32.059, 32.076]
Cl chlorine 35.45 [35.446, 35.457]
Ar argon 39.95 [39.792, 39.963]
K potassium 39.0983(1)
Ca calcium 40.078(4)
Sc scandium 44.955907(4)
Ti titanium 47.867(1)
V vanadium 50.9415(1)
Cr chromium 51.9961(6)
Mn manganese 54.938043(2)
Fe iron 55.845(2)
Co cobalt 58.933194(3)
Ni nickel 58.6934(4)
Cu copper 63.546(3)
Zn zinc 65.38(2)
Ga gallium 69.723(1)
Ge germanium 72.630(8)
As arsenic 74.921595(6)
Se selenium 78.971(8)
Br bromine 79.904 [79.901, 79.907]
Kr krypton 83.798(2)
Rb rubidium 85.4678(3)
Sr strontium 87.62(1)
Y yttrium 88.905838(2)
Zr zirconium 91.224(2)
Nb niobium 92.90637(1)
Mo molybdenum 95.95(1)
Tc technetium
Ru ruthenium 101.07(2)
Rh rhodium 102.90549(2)
Pd palladium 106.42(1)
Ag silver 107.8682(2)
Cd cadmium 112.414(4)
In indium 114.818(1)
Sn tin 118.710(7)
Sb antimony 121.760(1)
Te tellurium 127.60(3)
I iodine 126.90447(3)
Xe xenon 131.293(6)
Cs caesium 132.90545196(6)
Ba barium 137.327(7)
La lanthanum 138.90547(7)
Ce cerium 140.116(1)
Pr praseodymium 140.90766(1)
Nd neodymium 144.242(3)
Pm promethium
Sm samarium 150.36(2)
Eu europium 151.964(1)
Gd gadolinium 157.25(3)
Tb terbium 158.925354(7)
Dy dysprosium 162.500(1)
Ho holmium 164.930329(5)
Er erbium 167.259(3)
Tm thulium 168.934219(5)
Yb ytterbium 173.045(10)
Lu lutetium 174.9668(1)
Hf hafnium 178.486(6)
Ta tantalum 180.94788(2)
W tungsten 183.84(1)
Re rhenium 186.207(1)
Os osmium 190.23(3)
Ir iridium 192.217(2)
Pt platinum 195.084(9)
Au gold 196.966570(4)
Hg mercury 200.592(3)
Tl thallium 204.38 [204.382, 204.385]
Pb lead 207.2 [206.14, 207.94]
Bi bismuth 208.98040(1)
Po polonium
At astatine
Rn radon
Fr francium
Ra radium
Ac actinium
Th thorium 232.0377(4)
Pa protactinium 231.03588(1)
U uranium 238.02891(3)
Np neptunium
Pu plutonium
Am americium
Cm curium
Bk berkelium
Cf californium
Es einsteinium
Fm fermium
Md mendelevium
No nobelium
Lr lawrencium
Rf rutherfordium
Db dubnium
Sg seaborgium
Bh bohrium
Hs hassium
Mt meitnerium
Ds darmstadtium
Rg roentgenium
Cn copernicium
Nh nihonium
Fl flerovium
Mc moscovium
Lv livermorium
Ts tennessine
Og oganesson
`;

const elements: readonly Element[] = publishedRows
  .trim()
  .split('\n')
  .map((row, index) => readRow(row, index + 1));

const elementsBySymbol: ReadonlyMap<string, Element> = new Map(elements.map((element) => [element.symbol, element]));

function readRow(row: string, number: number): Element {
  const [symbol = '', name = '', weight, ...interval] = row.split(' ');
  const valence = valences[symbol];
  return {
    number,
    symbol,
    name,
    ...(weight === undefined ? {} : readWeight(weight, interval)),
    ...(valence === undefined ? {} : { valence }),
  };
}

function readWeight(weight: string, interval: readonly string[]): Partial<Element> {
  const [low, high] = interval.join('').replace(/[[\]]/g, '').split(',').map(Number);
  if (low !== undefined && high !== undefined) {
    return { atomicWeight: Number(weight), atomicWeightInterval: [low, high] };
  }
  const [digits = '', uncertaintyDigits = ''] = weight.replace(')', '').split('(');
  const decimals = digits.split('.')[1]?.length ?? 0;
  return { atomicWeight: Number(digits), atomicWeightUncertainty: Number(`${uncertaintyDigits}e-${decimals}`) };
}
