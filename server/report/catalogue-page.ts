// The catalogue as a page to read in a browser or an editor: all substances at a glance, then each with every number, the
// conditions it holds at and its source, then the sources with how far each can be trusted.
// Prints the records as they are kept, so that a digit more or less never comes from a conversion; only molar masses are
// worked out, from the formulas. Knows no scenario. Invariant: every sourced number of a record is in the page.

import { molarMassKgPerMol, parseFormula } from '../core/substance/formula.ts';
import type { HazardRecord } from '../core/substance/hazard-record.ts';
import type {
  DensityRecord,
  HeatCapacityRecord,
  PhaseRecord,
  RuleRecord,
  SourceRecord,
  SubstanceRecord,
} from '../core/substance/record.ts';
import { standingCaution } from '../wording/hazards.ts';
import { listed } from '../wording/words.ts';
import { hazardPageRows, statementCodes, unNumbers, type PageRow } from './catalogue-page-hazards.ts';

/** What the page is made of: substances, their hazards, and the sources of both. */
export interface CataloguePageInput {
  readonly records: readonly SubstanceRecord[];
  readonly hazards: readonly HazardRecord[];
  readonly sources: readonly SourceRecord[];
}

/** The page as Markdown, substances and sources in alphabetical order; `command` is what writes it anew. */
export function cataloguePage({ records, hazards, sources }: CataloguePageInput, command: string): string {
  const substances = [...records].sort((a, b) => (a.name < b.name ? -1 : 1));
  const hazardsOf = new Map(hazards.map((record) => [record.name, record]));
  const rowsOf = new Map(
    substances.map((record) => [
      record.name,
      [...substanceRows(record), ...hazardPageRows(hazardsOf.get(record.name))],
    ]),
  );
  const entriesOfSource = new Map<string, number>();
  for (const { source } of [...rowsOf.values()].flat())
    entriesOfSource.set(source, (entriesOfSource.get(source) ?? 0) + 1);
  const used = sources.filter(({ id }) => entriesOfSource.has(id)).sort((a, b) => (a.id < b.id ? -1 : 1));
  return [
    '# Substances',
    '',
    `This page is written by \`${command}\`; edits are lost.`,
    '',
    `${substances.length} substances, ${[...entriesOfSource.values()].reduce((sum, count) => sum + count, 0)} entries:`,
    `${provenanceCounts(used, entriesOfSource)}.`,
    'Formation enthalpies and entropies are those at 298.15 K and 1 bar, melting and boiling points those at 1 atm. In a',
    'heat capacity t is T/1000 K. Molar masses come from the formulas and the conventional atomic weights.',
    'Each source is named by its id; they are listed at the end. Codes in brackets are of one form alone, such as powder.',
    '',
    `Hazards are for screening: ${hazards.length} substances have a record, and one without is not harmless for that.`,
    standingCaution,
    '',
    '## At a glance',
    '',
    ...table(
      [
        'substance',
        'formula',
        'at 25 °C',
        'density, kg/m³',
        'melts, °C',
        'boils, °C',
        'flash point, °C',
        'in air, vol %',
        'GHS',
        'UN',
      ],
      substances.map((record) => glance(record, hazardsOf.get(record.name))),
    ),
    '',
    '## One by one',
    ...substances.flatMap((record) =>
      substanceSection(record, hazardsOf.get(record.name)?.families ?? [], rowsOf.get(record.name) ?? []),
    ),
    '',
    '## Sources',
    '',
    ...table(
      ['id', 'source', 'how we know', 'entries'],
      used.map((source) => [source.id, sourceText(source), source.provenance, String(entriesOfSource.get(source.id))]),
    ),
    '',
  ].join('\n');
}

const phaseWords = { g: 'gas', l: 'liquid', cr: 'crystal', aq: 'in water' } as const;
const originWords = { fossil: 'fossil', biogenic: 'biogenic', mineral: 'mineral', air: 'from the air' } as const;

function glance(record: SubstanceRecord, hazards: HazardRecord | undefined): string[] {
  const stable = record.phases.find((phase) => phase.stable === true);
  const limits = record.flammableLimits;
  return [
    `[${record.name}](#${record.name})`,
    record.formula ?? '',
    stable === undefined ? '' : phaseWords[stable.phase],
    stable?.density === undefined ? '' : String(stable.density.kgPerM3),
    pointText(record.meltingPoint),
    pointText(record.boilingPoint),
    pointText(record.flashPoint),
    limits === undefined ? '' : limitsText(limits.lowerPercent, limits.upperPercent),
    statementCodes(hazards),
    unNumbers(hazards),
  ];
}

function pointText(point: { readonly celsius: number } | undefined): string {
  return point === undefined ? '' : String(point.celsius);
}

function substanceSection(record: SubstanceRecord, families: readonly string[], rows: readonly PageRow[]): string[] {
  const aliases = [record.aliases ?? [], ...record.phases.map((phase) => phase.aliases ?? [])].flat();
  const molarMass = molarMassText(record.formula);
  const facts = [
    ...(record.formula === undefined ? [] : [`${record.formula}${molarMass === '' ? '' : `, ${molarMass}`}`]),
    ...(aliases.length === 0 ? [] : [`also ${aliases.join(', ')}`]),
    ...(record.carbonOrigin === undefined ? [] : [`carbon ${originWords[record.carbonOrigin]}`]),
    ...(record.carbonBiogenicShare === undefined ? [] : [`${record.carbonBiogenicShare} of the carbon biogenic`]),
    ...(families.length === 0 ? [] : [`reacts as ${listed(families.map((family) => family.replaceAll('-', ' ')))}`]),
  ];
  return [
    '',
    `### ${record.name}`,
    '',
    ...(facts.length === 0 ? [] : [`${facts.join('; ')}.`, '']),
    ...(record.note === undefined ? [] : [record.note, '']),
    ...table(
      ['', 'value', 'source'],
      rows.map(({ label, value, source }) => [label, value, source]),
    ),
  ];
}

function molarMassText(formulaText: string | undefined): string {
  if (formulaText === undefined) return '';
  const formula = parseFormula(formulaText);
  const molarMass = formula.kind === 'formula' ? molarMassKgPerMol(formula) : undefined;
  return molarMass === undefined ? '' : `${(molarMass * 1000).toFixed(3)} g/mol`;
}

function substanceRows(record: SubstanceRecord): PageRow[] {
  const limits = record.flammableLimits;
  return [
    ...compositionRows(record),
    ...record.phases.flatMap(phaseRows),
    ...pointRow('melting point', record.meltingPoint),
    ...pointRow('boiling point', record.boilingPoint),
    ...pointRow('sublimation', record.sublimationPoint),
    ...pointRow('decomposition', record.decompositionPoint),
    ...pointRow(
      'flash point',
      record.flashPoint,
      record.flashPoint?.cup === undefined ? '' : `${record.flashPoint.cup} cup`,
    ),
    ...pointRow('autoignition', record.autoignition),
    ...(limits === undefined
      ? []
      : [
          row(
            'flammable limits in air',
            `${limitsText(limits.lowerPercent, limits.upperPercent)} vol %${limits.celsius === undefined ? '' : ` at ${limits.celsius} °C`}`,
            limits,
          ),
        ]),
    ...(record.rules ?? []).flatMap(ruleRows),
  ];
}

function compositionRows(record: SubstanceRecord): PageRow[] {
  const source = record.compositionSource ?? '';
  const shares = (label: string, parts: Readonly<Record<string, number>>): PageRow => ({
    label,
    value: Object.entries(parts)
      .map(([part, share]) => `${part} ${share}`)
      .join(', '),
    source,
  });
  return [
    ...(record.compositionByMass === undefined ? [] : [shares('elements by mass', record.compositionByMass)]),
    ...(record.mixtureByMole === undefined ? [] : [shares('gases by mole', record.mixtureByMole)]),
  ];
}

function phaseRows(phase: PhaseRecord): PageRow[] {
  const { formationEnthalpy, entropy, heatingValue, density, heatCapacity } = phase;
  const word = phaseWords[phase.phase];
  return [
    ...(formationEnthalpy === undefined
      ? []
      : [row(`${word}: formation enthalpy`, `${formationEnthalpy.kJPerMol} kJ/mol`, formationEnthalpy, 'kJ/mol')]),
    ...(entropy === undefined ? [] : [row(`${word}: entropy`, `${entropy.jPerMolK} J/(mol K)`, entropy, 'J/(mol K)')]),
    ...(heatingValue === undefined
      ? []
      : [row(`${word}: ${heatingValue.basis} heating value`, `${heatingValue.mJPerKg} MJ/kg`, heatingValue, 'MJ/kg')]),
    ...(heatCapacity === undefined
      ? []
      : [row(`${word}: heat capacity`, heatCapacityText(heatCapacity), heatCapacity)]),
    ...(density === undefined ? [] : densityRows(`${word}: density`, density)),
  ];
}

function heatCapacityText(heatCapacity: HeatCapacityRecord): string {
  if ('kJPerKgK' in heatCapacity) return `${heatCapacity.kJPerKgK} kJ/(kg K) near 25 °C`;
  if ('jPerMolK' in heatCapacity) return `${heatCapacity.jPerMolK} J/(mol K) near 25 °C`;
  const sum = Object.entries(heatCapacity.jPerMolKTerms)
    .map(([power, coefficient]) => [Number(power), coefficient] as const)
    .sort(([a], [b]) => a - b)
    .map(([power, coefficient]) => `${coefficient}${powerText(power)}`)
    .join(' + ')
    .replaceAll('+ -', '- ');
  return `${sum} J/(mol K), ${heatCapacity.fromK} to ${heatCapacity.toK} K`;
}

function powerText(power: number): string {
  if (power === 0) return '';
  return power === 1 ? ' t' : ` t^${power}`;
}

function densityRows(label: string, density: DensityRecord): PageRow[] {
  const { kgPerM3, temperatureK, points = [], expansionPerK, expansionSource } = density;
  const all = [[temperatureK, kgPerM3] as const, ...points].sort(([a], [b]) => a - b);
  const value = all.map(([atK, value]) => `${value} at ${atK} K`).join(', ');
  return [
    row(label, `${value}, kg/m³`.replace(/^(\S+) (at \S+ K), kg\/m³$/, '$1 kg/m³ $2'), density, 'kg/m³'),
    ...(expansionPerK === undefined
      ? []
      : [{ label: 'expansion', value: `${expansionPerK} per K`, source: expansionSource ?? density.source }]),
  ];
}

function pointRow(
  label: string,
  point: { readonly celsius: number; readonly source: string; readonly uncertainty?: number } | undefined,
  condition = '',
): PageRow[] {
  if (point === undefined) return [];
  return [row(label, [`${point.celsius} °C`, condition].filter((part) => part !== '').join(', '), point, 'K')];
}

function ruleRows(rule: RuleRecord): PageRow[] {
  const values = [
    ...(rule.lowerHeatingValueMJPerKg === undefined ? [] : [`${rule.lowerHeatingValueMJPerKg} MJ/kg`]),
    ...(rule.carbonContent === undefined ? [] : [`${rule.carbonContent} kg C/kg`]),
    ...(rule.carbonDioxideFactor === undefined ? [] : [`${rule.carbonDioxideFactor} kg CO2/kg`]),
  ];
  const text = `${rule.version}, "${rule.fuel}", from ${rule.inForceFrom}, read ${rule.seenOn}`;
  return [{ label: rule.rule, value: `${values.join(', ')} (${text})`, source: rule.source }];
}

function row(
  label: string,
  value: string,
  sourced: { readonly source: string; readonly uncertainty?: number },
  unit = '',
): PageRow {
  const uncertainty = sourced.uncertainty === undefined ? '' : `, standard uncertainty ${sourced.uncertainty} ${unit}`;
  return { label, value: `${value}${uncertainty}`, source: sourced.source };
}

function limitsText(lower: number, upper: number | undefined): string {
  return upper === undefined ? `from ${lower}` : `${lower} to ${upper}`;
}

function sourceText({ author, year, title, where }: SourceRecord): string {
  return `${author}, ${title} (${year})${where === '' ? '' : `: ${where}`}`;
}

function provenanceCounts(sources: readonly SourceRecord[], entriesOfSource: ReadonlyMap<string, number>): string {
  return (['seen', 'from memory', 'common practice', 'estimate'] as const)
    .map((provenance) => {
      const own = sources.filter((source) => source.provenance === provenance);
      return `${own.reduce((sum, { id }) => sum + (entriesOfSource.get(id) ?? 0), 0)} ${provenance}`;
    })
    .join(', ');
}

function table(heads: readonly string[], rows: readonly (readonly string[])[]): string[] {
  const line = (cells: readonly string[]): string =>
    `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`;
  return [line(heads), line(heads.map(() => '---')), ...rows.map(line)];
}
