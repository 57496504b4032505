// The hazard rows of the catalogue page: what a hazard record says, fact by fact, each with its source's id. Prints the
// record as it is kept, in its own units. Knows no substance record. Invariant: one row for each source a record names.

import type { ExposureRecord, HazardRecord, TransportRecord } from '../core/substance/hazard-record.ts';
import type { HazardForm } from '../core/substance/hazards.ts';
import { agentsText, formText } from '../wording/hazards.ts';

/** One line of a substance's table. */
export interface PageRow {
  readonly label: string;
  readonly value: string;
  readonly source: string;
}

export function hazardPageRows(record: HazardRecord | undefined): PageRow[] {
  if (record === undefined) return [];
  const { classes = [], withWater = [], pyrophoric, limitingOxygen = [], exposure = [], transport = [] } = record;
  const { extinguishing } = record;
  return [
    ...classes.map(({ all, form, source }) => ({
      label: labelled('GHS classes', form),
      value: all.join(', '),
      source,
    })),
    ...withWater.map(({ gases, pace, form, source }) => ({
      label: labelled('with water', form),
      value: gases.length === 0 ? `${pace}, heat` : `${pace}, ${gases.join(', ')}`,
      source,
    })),
    ...(pyrophoric === undefined
      ? []
      : [{ label: labelled('in air', pyrophoric.form), value: 'takes fire by itself', source: pyrophoric.source }]),
    ...limitingOxygen.map(({ inert, percent, source }) => ({
      label: 'limiting oxygen',
      value: `${percent} vol % with ${inert.replace('-', ' ')}`,
      source,
    })),
    ...exposure.map(exposureRow),
    ...transport.map(transportRow),
    ...(extinguishing === undefined
      ? []
      : [
          {
            label: 'put out with',
            value: `${agentsText(extinguishing.right)}; never with ${agentsText(extinguishing.wrong)}`,
            source: extinguishing.source,
          },
        ]),
  ];
}

/** The statement codes of a record, each once: `H260 H314`, those of one form alone in brackets. */
export function statementCodes(record: HazardRecord | undefined): string {
  const codes = new Set<string>();
  const ofForms = new Set<string>();
  for (const { all, form } of record?.classes ?? []) {
    for (const text of all) (form === undefined ? codes : ofForms).add(text.slice(-4));
  }
  const others = [...ofForms].filter((code) => !codes.has(code));
  return [...codes, ...(others.length > 0 ? [`(${others.join(' ')})`] : [])].join(' ');
}

export function unNumbers(record: HazardRecord | undefined): string {
  return [...new Set((record?.transport ?? []).map(({ unNumber }) => unText(unNumber)))].join(' ');
}

function transportRow(entry: TransportRecord): PageRow {
  const { unNumber, properShippingName, dangerClass, subsidiary = [], packingGroup, form, massPercent, source } = entry;
  const [from, to] = massPercent ?? [];
  const parts = [
    properShippingName,
    `class ${dangerClass}${subsidiary.length > 0 ? ` (${subsidiary.join(', ')})` : ''}`,
    packingGroup === undefined ? '' : `packing group ${packingGroup}`,
    from === undefined ? '' : to === undefined ? `above ${from} % by mass` : `${from} to ${to} % by mass`,
  ];
  return {
    label: labelled(`UN ${unText(unNumber)}`, form),
    value: parts.filter((part) => part !== '').join(', '),
    source,
  };
}

function exposureRow({ authority, kind, ppm, mgPerM3, measuredAs, source }: ExposureRecord): PageRow {
  const values = [...(ppm === undefined ? [] : [`${ppm} ppm`]), ...(mgPerM3 === undefined ? [] : [`${mgPerM3} mg/m³`])];
  const times = {
    'eight-hour': authority === 'NIOSH' ? 'up to 10 h' : '8 h',
    'fifteen-minute': '15 min',
    ceiling: 'ceiling',
    'immediately-dangerous': 'immediately dangerous',
  };
  return {
    label: `limit in air, ${authority}, ${times[kind]}`,
    value: `${values.join(', ')}${measuredAs === undefined ? '' : ` (${measuredAs})`}`,
    source,
  };
}

const unText = (unNumber: number): string => String(unNumber).padStart(4, '0');

function labelled(label: string, form: HazardForm | undefined): string {
  return form === undefined ? label : `${label}, ${formText(form)}`;
}
