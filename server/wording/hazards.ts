// Hazards in words: the one caution line, and a few rows for a card. Texts are our own short words for what a GHS statement
// code stands for; the codes are printed beside them, for the prescribed sentences are in the safety data sheet.
// Knows no rule of what must not meet. Invariants: no code of the GHS table is without words; nothing is ever called safe.

import { sourceText } from '../scenario/material-card.ts';
import type { MaterialCard, Table } from '../scenario/scenario.ts';
import type { Screening } from '../scenario/screening.ts';
import { formatNumber } from './numbers.ts';
import { listed } from './words.ts';

type Hazards = NonNullable<MaterialCard['hazards']>;
type HazardForm = NonNullable<Hazards['classes'][number]['form']>;

/** One row of a card: what, in words, and where it is from. */
export interface HazardRow {
  readonly label: string;
  readonly text: string;
  readonly source: string;
}

/** What a statement code stands for, the gravest first: a brief line takes from the top. */
const dangers: Readonly<Record<string, string>> = {
  H200: 'unstable explosive',
  H201: 'explodes in mass',
  H202: 'explodes and throws pieces',
  H203: 'burns or explodes with blast or pieces',
  H240: 'explodes when heated',
  H241: 'takes fire or explodes when heated',
  H250: 'takes fire in air',
  H232: 'may take fire in air',
  H260: 'water makes flammable gas that may take fire',
  H261: 'water makes flammable gas',
  H300: 'deadly if swallowed',
  H310: 'deadly through the skin',
  H330: 'deadly if inhaled',
  H230: 'may explode even without air',
  H231: 'may explode even without air under pressure or heat',
  H220: 'extremely flammable gas',
  H224: 'extremely flammable liquid',
  H271: 'may cause fire or explosion, strong oxidiser',
  H270: 'feeds fire, oxidising gas',
  H331: 'toxic if inhaled',
  H311: 'toxic through the skin',
  H301: 'toxic if swallowed',
  H314: 'burns skin and eyes',
  H225: 'highly flammable liquid',
  H221: 'flammable gas',
  H228: 'flammable solid',
  H242: 'takes fire when heated',
  H204: 'burns or throws pieces',
  H251: 'heats itself, may take fire',
  H370: 'damages organs',
  H350: 'may cause cancer',
  H340: 'may cause genetic defects',
  H360: 'may damage fertility or the unborn child',
  H372: 'damages organs over time',
  H226: 'flammable liquid',
  H304: 'may be deadly if swallowed and drawn into the lungs',
  H272: 'feeds fire, oxidiser',
  H252: 'heats itself in large amounts, may take fire',
  H318: 'damages the eyes',
  H281: 'very cold gas, cold burns',
  H280: 'gas under pressure',
  H317: 'skin allergy',
  H371: 'may damage organs',
  H373: 'may damage organs over time',
  H351: 'suspected of causing cancer',
  H341: 'suspected of causing genetic defects',
  H361: 'suspected of damaging fertility or the unborn child',
  H332: 'harmful if inhaled',
  H312: 'harmful through the skin',
  H302: 'harmful if swallowed',
  H227: 'combustible liquid',
  H319: 'irritates the eyes',
  H315: 'irritates the skin',
  H335: 'irritates the airways',
  H336: 'makes drowsy',
  H290: 'corrodes metals',
  H400: 'very toxic to water life',
  H410: 'very toxic to water life for long',
  H411: 'toxic to water life for long',
  H412: 'harmful to water life for long',
  H413: 'may harm water life for long',
};
const rank = new Map(Object.keys(dangers).map((code, index) => [code, index]));

/** The words for a statement code; the code itself where the table has none. */
export function dangerText(code: string): string {
  return dangers[code] ?? code;
}

/** Three ways in are one danger where only the gravest few are told. */
const briefly: Readonly<Record<string, string>> = {
  H300: 'deadly poison',
  H310: 'deadly poison',
  H330: 'deadly poison',
  H301: 'toxic',
  H311: 'toxic',
  H331: 'toxic',
};

/** From here up the GHS has the signal word "Danger"; below it, "Warning", which a hover need not repeat each time. */
const leastGrave = rank.get('H304') ?? 0;
const mostTold = 3;

/**
 * One short caution for a substance of grave danger, in words that any reader knows; null where nothing grave is recorded.
 * It tells the gravest few, not all.
 */
export function cautionText(name: string, hazards: Hazards): string | null {
  const dangers = gravestDangers(hazards);
  return dangers === null ? null : `Caution, ${name}: ${dangers.text}. ${standingCaution}`;
}

/** The gravest few dangers of a substance in a few words, and the rank of the first; null where nothing grave is recorded. */
function gravestDangers(hazards: Hazards): Told | null {
  // Some metals are classed by what water does to them, though they take fire in air as well.
  const inAir = hazards.pyrophoric && hazards.pyrophoric.form === undefined ? [{ statement: 'H250' }] : [];
  const ofAllForms = [...inAir, ...hazards.classes.filter(({ form }) => form === undefined)].map(toldOf);
  const known = new Set(ofAllForms.map(({ text }) => text));
  // What holds of a powder or a solution alone is told where it adds something, and once for all such forms.
  const ofOneForm: Told[] = [];
  for (const found of hazards.classes) {
    const { text, order } = toldOf(found);
    if (found.form === undefined || known.has(text)) continue;
    known.add(text);
    ofOneForm.push({ text: `${formText(found.form)} ${text}`, order });
  }
  const grave = [...ofAllForms, ...ofOneForm].filter(({ order }) => order <= leastGrave);
  const words = [...new Set(grave.sort((a, b) => a.order - b.order).map(({ text }) => text))].slice(0, mostTold);
  const all = [...words, ...(hazards.families.includes('inert-gas') ? ['displaces the air to breathe'] : [])];
  return all.length === 0 ? null : { text: all.join('; '), order: grave[0]?.order ?? rank.size };
}

/** The one caution of a report: its most dangerous substances, each once, and what stands above any program. */
export function reportCaution(screenings: readonly Screening[]): string | null {
  const substances = new Map(screenings.flatMap((screening) => screening.substances).map((card) => [card.name, card]));
  const told = [...substances.values()].flatMap(({ name, hazards }) => {
    const dangers = hazards && gravestDangers(hazards);
    return dangers === null ? [] : [{ ...dangers, text: `${name.replaceAll('_', ' ')}: ${dangers.text}.` }];
  });
  if (told.length === 0) return null;
  const shown = told.sort((a, b) => a.order - b.order).slice(0, mostSubstancesTold);
  const others = told.length - shown.length;
  const more = others === 0 ? [] : [`${others === 1 ? 'One' : String(others)} more with dangers of their own.`];
  return ['Caution.', ...shown.map(({ text }) => text), ...more, standingCaution].join(' ');
}

const mostSubstancesTold = 5;

/** What the rules came to for one definition: never that it is harmless. */
export function screeningText({ rulesLookedAt, found, unrecorded }: Screening): string {
  const fired =
    found.length === 0
      ? 'none fired'
      : `found ${listed(found.map((code) => code.replace('hazard/', '').replaceAll('-', ' ')))}`;
  const unseen =
    unrecorded.length === 0
      ? ''
      : ` Nothing is recorded of the hazards of ${listed(unrecorded)}: rules cannot see that.`;
  return `Hazard rules: ${String(rulesLookedAt)} looked at, ${fired}.${unseen}`;
}

/** The row of an approval route in a sentence. */
export function routeText([instrument, status, since, knownAsOf, says]: Table['rows'][number]): string {
  const standing = status === 'none' ? '' : ` (${String(status)}, since ${String(since)})`;
  return `${String(instrument)}${standing}, as known in ${String(knownAsOf)}. ${String(says)}`;
}

/** What every report and first hover of such a substance says beside its dangers. */
export const standingCaution =
  'Screening only: follow the safety data sheet, class, flag and local rules; a competent person approves the design.';

interface Told {
  readonly text: string;
  readonly order: number;
}

function toldOf({ statement }: { readonly statement: string }): Told {
  return { text: briefly[statement] ?? dangerText(statement), order: rank.get(statement) ?? rank.size };
}

/** `as powder`; empty where it is about every form. */
export function formText(form: HazardForm | undefined): string {
  return form === undefined ? '' : forms[form];
}

const forms: Readonly<Record<HazardForm, string>> = {
  massive: 'in one piece',
  powder: 'as powder',
  'coated-powder': 'as coated powder',
  'wetted-powder': 'as wetted powder',
  molten: 'molten',
  dispersion: 'as dispersion',
  'dispersion-in-flammable-liquid': 'as dispersion in a flammable liquid',
  solution: 'in solution',
  'compressed-gas': 'as compressed gas',
  'liquefied-gas': 'as liquefied gas',
  'refrigerated-liquid': 'as refrigerated liquid',
};

/** The rows of a card, each with its source. */
export function hazardRows(hazards: Hazards): readonly HazardRow[] {
  return [
    ...classRows(hazards),
    ...hazards.withWater.map(({ gases, pace, form, source }) => ({
      label: 'With water',
      text: withForm(`${pace}, ${gases.length > 0 ? `gives off ${listed(gases)}` : 'heat'}`, form),
      source: sourceText(source),
    })),
    ...(hazards.pyrophoric
      ? [
          {
            label: 'In air',
            text: withForm('takes fire by itself', hazards.pyrophoric.form),
            source: sourceText(hazards.pyrophoric.source),
          },
        ]
      : []),
    ...hazards.limitingOxygen.map(({ inert, moleFraction, source }) => ({
      label: 'Limiting oxygen concentration',
      text: `${formatNumber(moleFraction * 100)} % by volume, with ${inert.replace('-', ' ')}`,
      source: sourceText(source),
    })),
    ...exposureRows(hazards),
    ...hazards.transport.map((entry) => ({
      label: 'Carried as',
      text: transportText(entry),
      source: sourceText(entry.source),
    })),
    ...extinguishingRows(hazards),
  ];
}

function classRows({ classes }: Hazards): HazardRow[] {
  const groups = new Map<string, Hazards['classes'][number][]>();
  for (const found of classes) {
    const key = `${found.form ?? ''} ${found.source.id}`;
    groups.set(key, [...(groups.get(key) ?? []), found]);
  }
  return [...groups.values()].flatMap((group) => {
    const [first] = group;
    if (first === undefined) return [];
    const text = group.map(({ statement }) => `${dangerText(statement)} (${statement})`).join(', ');
    const label = first.form === undefined ? 'Hazards' : `Hazards ${formText(first.form)}`;
    return [{ label, text, source: sourceText(first.source) }];
  });
}

/** `UN 1428 SODIUM, class 4.3, packing group I`. */
export function transportText(entry: Hazards['transport'][number]): string {
  const { unNumber, properShippingName, dangerClass, subsidiary, packingGroup, form, massFraction } = entry;
  const also = subsidiary.length > 0 ? ` (${subsidiary.join(', ')})` : '';
  const parts = [
    [`UN ${String(unNumber).padStart(4, '0')}`, properShippingName ?? ''].filter((part) => part !== '').join(' '),
    dangerClass === undefined ? '' : `class ${dangerClass}${also}`,
    packingGroup === undefined ? '' : `packing group ${packingGroup}`,
    massFraction === undefined ? '' : strengthText(massFraction),
    formText(form),
  ];
  return parts.filter((part) => part !== '').join(', ');
}

function strengthText({ from, to }: { readonly from: number; readonly to?: number }): string {
  const least = formatNumber(from * 100);
  return to === undefined ? `above ${least} % by mass` : `${least} to ${formatNumber(to * 100)} % by mass`;
}

function exposureRows({ exposure }: Hazards): HazardRow[] {
  const groups = new Map<string, Hazards['exposure'][number][]>();
  for (const limit of exposure) {
    const key = `${limit.authority} ${limit.source.id}`;
    groups.set(key, [...(groups.get(key) ?? []), limit]);
  }
  return [...groups.values()].flatMap((group) => {
    const [first] = group;
    if (first === undefined) return [];
    const text = group.map((limit) => exposureText(limit)).join('; ');
    return [{ label: `Limits in air, ${first.authority}`, text, source: sourceText(first.source) }];
  });
}

/** `25 ppm over 8 h`. */
export function exposureText({
  authority,
  kind,
  moleFraction,
  kgPerM3,
  measuredAs,
}: Hazards['exposure'][number]): string {
  const values = [
    ...(moleFraction === undefined ? [] : [`${formatNumber(moleFraction * 1e6)} ppm`]),
    ...(kgPerM3 === undefined ? [] : [`${formatNumber(kgPerM3 * 1e6)} mg/m³`]),
  ];
  const times = {
    'eight-hour': authority === 'NIOSH' ? 'over up to 10 h' : 'over 8 h',
    'fifteen-minute': 'over 15 min',
    ceiling: 'never above',
    'immediately-dangerous': 'immediately dangerous',
  };
  const as = measuredAs === undefined ? '' : ` (${measuredAs})`;
  return `${values.join(', ')} ${times[kind]}${as}`;
}

function extinguishingRows({ extinguishing }: Hazards): HazardRow[] {
  if (extinguishing === undefined) return [];
  const { right, wrong, source } = extinguishing;
  return [
    { label: 'Put out with', text: agentsText(right), source: sourceText(source) },
    { label: 'Never with', text: agentsText(wrong), source: sourceText(source) },
  ];
}

/** `foam, carbon dioxide or dry powder (BC)`. */
export function agentsText(agents: readonly string[]): string {
  return listed(
    agents.map((agent) =>
      agent.replace(/-(a?bc)$/, (_, letters: string) => ` (${letters.toUpperCase()})`).replaceAll('-', ' '),
    ),
    'or',
  );
}

/** What it counts as where it meets something else. */
export function familiesText({ families }: Hazards): string {
  return listed(families.map((family) => family.replaceAll('-', ' ')));
}

function withForm(text: string, form: HazardForm | undefined): string {
  return form === undefined ? text : `${text}, ${formText(form)}`;
}
