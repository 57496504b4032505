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
}

type Row = readonly [hazardClass: string, categories: string, statements: string];

const physical: readonly Row[] = [
  ['Unst. Expl.', '', 'H200'],
  ['Expl.', '1.1', 'H201'],
  ['Expl.', '1.2', 'H202'],
  ['Expl.', '1.3', 'H203'],
  ['Expl.', '1.4', 'H204'],
  ['Flam. Gas', '1A', 'H220 H230 H231 H232'],
  ['Flam. Gas', '1B 2', 'H221'],
  ['Flam. Liq.', '1', 'H224'],
  ['Flam. Liq.', '2', 'H225'],
  ['Flam. Liq.', '3', 'H226'],
  ['Flam. Liq.', '4', 'H227'],
  ['Flam. Sol.', '1 2', 'H228'],
  ['Self-react.', 'A', 'H240'],
  ['Self-react.', 'B', 'H241'],
  ['Self-react.', 'C D E F', 'H242'],
  ['Org. Perox.', 'A', 'H240'],
  ['Org. Perox.', 'B', 'H241'],
  ['Org. Perox.', 'C D E F', 'H242'],
  ['Pyr. Liq.', '1', 'H250'],
  ['Pyr. Sol.', '1', 'H250'],
  ['Self-heat.', '1', 'H251'],
  ['Self-heat.', '2', 'H252'],
  ['Water-react.', '1', 'H260'],
  ['Water-react.', '2 3', 'H261'],
  ['Ox. Gas', '1', 'H270'],
  ['Ox. Liq.', '1', 'H271'],
  ['Ox. Liq.', '2 3', 'H272'],
  ['Ox. Sol.', '1', 'H271'],
  ['Ox. Sol.', '2 3', 'H272'],
  ['Press. Gas', 'Comp. Liq. Diss.', 'H280'],
  ['Press. Gas', 'Ref.', 'H281'],
  ['Met. Corr.', '1', 'H290'],
];

const health: readonly Row[] = [
  ['Acute Tox.', '1 2', 'H300 H310 H330'],
  ['Acute Tox.', '3', 'H301 H311 H331'],
  ['Acute Tox.', '4', 'H302 H312 H332'],
  ['Skin Corr.', '1 1A 1B 1C', 'H314'],
  ['Skin Irrit.', '2', 'H315'],
  ['Eye Dam.', '1', 'H318'],
  ['Eye Irrit.', '2', 'H319'],
  ['Skin Sens.', '1 1A 1B', 'H317'],
  ['Muta.', '1A 1B', 'H340'],
  ['Muta.', '2', 'H341'],
  ['Carc.', '1A 1B', 'H350'],
  ['Carc.', '2', 'H351'],
  ['Repr.', '1A 1B', 'H360'],
  ['Repr.', '2', 'H361'],
  ['STOT SE', '1', 'H370'],
  ['STOT SE', '2', 'H371'],
  ['STOT SE', '3', 'H335 H336'],
  ['STOT RE', '1', 'H372'],
  ['STOT RE', '2', 'H373'],
  ['Asp. Tox.', '1', 'H304'],
];

const environment: readonly Row[] = [
  ['Aquatic Acute', '1', 'H400'],
  ['Aquatic Chronic', '1', 'H410'],
  ['Aquatic Chronic', '2', 'H411'],
  ['Aquatic Chronic', '3', 'H412'],
  ['Aquatic Chronic', '4', 'H413'],
];

export const ghsClasses: readonly GhsClass[] = (
  [
    ['physical', physical],
    ['health', health],
    ['environment', environment],
  ] as const
).flatMap(([area, rows]) =>
  rows.flatMap(([hazardClass, categories, statements]) =>
    categories.split(' ').map((category) => ({
      hazardClass,
      category,
      statements: statements.split(' '),
      area,
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
