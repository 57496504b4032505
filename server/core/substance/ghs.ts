// The classes of the UN GHS with their categories and the statement codes each carries: the table that hazard records and a
// user's own `hazards:` entry are checked against. Knows no substance and no statement's text.
// Invariant: a code that the table lacks is no statement about a substance.
// Source: UN GHS, revision 9, annexes 1 and 3, abbreviated as in Regulation (EC) No 1272/2008, annex VI, table 1.1.

/** What kind of danger a class is about. */
export type HazardArea = 'physical' | 'health' | 'environment';

export interface GhsClass {
  /** As abbreviated in lists: `Water-react.`. */
  readonly hazardClass: string;
  readonly category: string;
  /** The codes it may carry, one each time: acute toxicity has one a route. */
  readonly statements: readonly string[];
  readonly area: HazardArea;
  /** The danger in a few words, small letters. */
  readonly danger: string;
}

type Row = readonly [hazardClass: string, categories: string, statements: string, danger: string];

const physical: readonly Row[] = [
  ['Unst. Expl.', '', 'H200', 'unstable explosive'],
  ['Expl.', '1.1', 'H201', 'mass explosion'],
  ['Flam. Gas', '1A', 'H220 H230 H231 H232', 'extremely flammable gas'],
  ['Flam. Gas', '1B 2', 'H221', 'flammable gas'],
  ['Flam. Liq.', '1', 'H224', 'extremely flammable liquid'],
  ['Flam. Liq.', '2', 'H225', 'highly flammable liquid'],
  ['Flam. Liq.', '3', 'H226', 'flammable liquid'],
  ['Flam. Liq.', '4', 'H227', 'combustible liquid'],
  ['Flam. Sol.', '1 2', 'H228', 'flammable solid'],
  ['Pyr. Liq.', '1', 'H250', 'takes fire in air'],
  ['Pyr. Sol.', '1', 'H250', 'takes fire in air'],
  ['Self-heat.', '1', 'H251', 'heats itself in air'],
  ['Self-heat.', '2', 'H252', 'heats itself in air in large amounts'],
  ['Water-react.', '1', 'H260', 'water makes flammable gas that may take fire'],
  ['Water-react.', '2 3', 'H261', 'water makes flammable gas'],
  ['Ox. Gas', '1', 'H270', 'oxidising gas'],
  ['Ox. Liq.', '1', 'H271', 'strong oxidiser'],
  ['Ox. Liq.', '2 3', 'H272', 'oxidiser'],
  ['Ox. Sol.', '1', 'H271', 'strong oxidiser'],
  ['Ox. Sol.', '2 3', 'H272', 'oxidiser'],
  ['Press. Gas', 'Comp. Liq. Diss.', 'H280', 'gas under pressure'],
  ['Press. Gas', 'Ref.', 'H281', 'refrigerated gas, cold burns'],
  ['Met. Corr.', '1', 'H290', 'corrodes metals'],
];

const health: readonly Row[] = [
  ['Acute Tox.', '1 2', 'H300 H310 H330', 'fatal poison'],
  ['Acute Tox.', '3', 'H301 H311 H331', 'toxic'],
  ['Acute Tox.', '4', 'H302 H312 H332', 'harmful'],
  ['Skin Corr.', '1 1A 1B 1C', 'H314', 'burns skin and eyes'],
  ['Skin Irrit.', '2', 'H315', 'irritates the skin'],
  ['Eye Dam.', '1', 'H318', 'damages the eyes'],
  ['Eye Irrit.', '2', 'H319', 'irritates the eyes'],
  ['Skin Sens.', '1 1A 1B', 'H317', 'skin allergy'],
  ['Muta.', '1A 1B', 'H340', 'genetic defects'],
  ['Muta.', '2', 'H341', 'suspected of genetic defects'],
  ['Carc.', '1A 1B', 'H350', 'causes cancer'],
  ['Carc.', '2', 'H351', 'suspected of causing cancer'],
  ['Repr.', '1A 1B', 'H360', 'damages fertility or the unborn child'],
  ['Repr.', '2', 'H361', 'suspected of damaging fertility or the unborn child'],
  ['STOT SE', '1', 'H370', 'damages organs'],
  ['STOT SE', '2', 'H371', 'may damage organs'],
  ['STOT SE', '3', 'H335 H336', 'irritates the airways or makes drowsy'],
  ['STOT RE', '1', 'H372', 'damages organs over time'],
  ['STOT RE', '2', 'H373', 'may damage organs over time'],
  ['Asp. Tox.', '1', 'H304', 'fatal if swallowed into the airways'],
];

const environment: readonly Row[] = [
  ['Aquatic Acute', '1', 'H400', 'very toxic to water life'],
  ['Aquatic Chronic', '1', 'H410', 'very toxic to water life, lasting'],
  ['Aquatic Chronic', '2', 'H411', 'toxic to water life, lasting'],
  ['Aquatic Chronic', '3', 'H412', 'harmful to water life, lasting'],
  ['Aquatic Chronic', '4', 'H413', 'may harm water life, lasting'],
];

export const ghsClasses: readonly GhsClass[] = (
  [
    ['physical', physical],
    ['health', health],
    ['environment', environment],
  ] as const
).flatMap(([area, rows]) =>
  rows.flatMap(([hazardClass, categories, statements, danger]) =>
    categories.split(' ').map((category) => ({
      hazardClass,
      category,
      statements: statements.split(' '),
      area,
      danger,
    })),
  ),
);

/** The class of a written triple such as `Water-react. 1 H260`; undefined where the table has none like it. */
export function readGhsClass(text: string): (GhsClass & { readonly statement: string }) | undefined {
  const [statement = ''] = /H\d{3}$/.exec(text) ?? [];
  const found = ghsClasses.find(
    ({ hazardClass, category, statements }) =>
      statements.includes(statement) && text === [hazardClass, category, statement].filter((part) => part).join(' '),
  );
  return found && { ...found, statement };
}

/**
 * The first class that carries a statement code, for a source that gives codes alone. Where several categories share a
 * code (H261, H272, H300) the category is the first, the more severe one.
 */
export function classOfStatement(code: string): (GhsClass & { readonly statement: string }) | undefined {
  const found = ghsClasses.find(({ statements }) => statements.includes(code));
  return found && { ...found, statement: code };
}

/**
 * The category of a flammable liquid by the GHS criteria (chapter 2.6): null above 93 °C, and where the boiling point decides
 * between 1 and 2 and is not known, the lesser danger is not assumed.
 */
export function flammableLiquidCategory(
  flashPointK: number,
  boilingPointK: number | undefined,
): '1' | '2' | '3' | '4' | null {
  // 23, 60 and 93 °C; 35 °C boiling.
  if (flashPointK < 296.15) return boilingPointK !== undefined && boilingPointK > 308.15 ? '2' : '1';
  if (flashPointK <= 333.15) return '3';
  return flashPointK <= 366.15 ? '4' : null;
}
