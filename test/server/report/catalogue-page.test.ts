// The generated page is that of the records as they are, and leaves out no number that a record gives a source for.

import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import type { HazardRecord } from '../../../server/core/substance/hazard-record.ts';
import { hazardRecords, hazardSourceRecords } from '../../../server/core/substance/hazard-records.ts';
import type { SourceRecord, SubstanceRecord } from '../../../server/core/substance/record.ts';
import { sourceRecords, substanceRecords } from '../../../server/core/substance/records.ts';
import { cataloguePage } from '../../../server/report/catalogue-page.ts';

const handbook: SourceRecord = {
  id: 'handbook',
  author: 'A. Author',
  year: 2001,
  title: 'Handbook | tables',
  where: 'table 1',
  provenance: 'seen',
};

const spirit: SubstanceRecord = {
  name: 'spirit',
  aliases: ['wood_spirit'],
  formula: 'CH3OH',
  phases: [
    {
      phase: 'l',
      stable: true,
      formationEnthalpy: { kJPerMol: -239.2, uncertainty: 0.2, source: 'handbook' },
      heatCapacity: { jPerMolKTerms: { '1': -0.5, '0': 80, '-2': 2 }, fromK: 200, toK: 300, source: 'handbook' },
      density: { kgPerM3: 792, temperatureK: 293.15, points: [[273.15, 810]], source: 'handbook' },
    },
  ],
  flashPoint: { celsius: 9, cup: 'closed', source: 'handbook' },
  flammableLimits: { lowerPercent: 6, celsius: 20, source: 'handbook' },
  carbonOrigin: 'fossil',
};

const dangers: HazardRecord = {
  name: 'spirit',
  families: ['alcohol'],
  classes: [
    { source: 'handbook', all: ['Flam. Liq. 2 H225', 'STOT SE 1 H370'] },
    { source: 'handbook', form: 'solution', all: ['Eye Irrit. 2 H319'] },
  ],
  transport: [
    {
      unNumber: 1230,
      properShippingName: 'METHANOL',
      dangerClass: '3',
      subsidiary: ['6.1'],
      packingGroup: 'II',
      source: 'handbook',
    },
  ],
  withWater: [{ gases: ['H2'], pace: 'slow', form: 'powder', source: 'handbook' }],
  pyrophoric: { form: 'molten', source: 'handbook' },
  limitingOxygen: [{ inert: 'carbon-dioxide', percent: 12, source: 'handbook' }],
  exposure: [{ authority: 'NIOSH', kind: 'eight-hour', ppm: 200, measuredAs: 'vapour', source: 'handbook' }],
  extinguishing: { right: ['dry-powder-bc'], wrong: ['foam'], source: 'handbook' },
};

const whole = {
  records: substanceRecords,
  hazards: hazardRecords,
  sources: [...sourceRecords, ...hazardSourceRecords],
};

test('the page is not stale (npm run pages writes it)', () => {
  expect(readFileSync('examples/reference/catalogue.md', 'utf8')).toBe(cataloguePage(whole, 'npm run pages'));
});

test('each number stands with its conditions and its source', () => {
  const page = cataloguePage({ records: [spirit], hazards: [dangers], sources: [handbook] }, 'npm run pages');
  for (const line of [
    '1 substances, 13 entries:',
    '13 seen, 0 from memory, 0 common practice, 0 estimate.',
    '| [spirit](#spirit) | CH3OH | liquid | 792 |  |  | 9 | from 6 | H225 H370 (H319) | 1230 |',
    'CH3OH, 32.042 g/mol; also wood_spirit; carbon fossil; reacts as alcohol.',
    '| liquid: formation enthalpy | -239.2 kJ/mol, standard uncertainty 0.2 kJ/mol | handbook |',
    '| liquid: heat capacity | 2 t^-2 + 80 - 0.5 t J/(mol K), 200 to 300 K | handbook |',
    '| liquid: density | 810 at 273.15 K, 792 at 293.15 K, kg/m³ | handbook |',
    '| flash point | 9 °C, closed cup | handbook |',
    '| flammable limits in air | from 6 vol % at 20 °C | handbook |',
    '| handbook | A. Author, Handbook \\| tables (2001): table 1 | seen | 13 |',
    '| GHS classes | Flam. Liq. 2 H225, STOT SE 1 H370 | handbook |',
    '| GHS classes, in solution | Eye Irrit. 2 H319 | handbook |',
    '| UN 1230 | METHANOL, class 3 (6.1), packing group II | handbook |',
    '| with water, as powder | slow, H2 | handbook |',
    '| in air, molten | takes fire by itself | handbook |',
    '| limiting oxygen | 12 vol % with carbon dioxide | handbook |',
    '| limit in air, NIOSH, up to 10 h | 200 ppm (vapour) | handbook |',
    '| put out with | dry powder (BC); never with foam | handbook |',
  ])
    expect(page.split('\n')).toContain(line);
});

test('no sourced number of the catalogue is left out', () => {
  const page = cataloguePage(whole, 'npm run pages');
  const ids = new Set(whole.sources.map(({ id }) => id));
  const inPage = page.split('\n').filter((line) => ids.has(line.split(' | ').at(-1)?.replace(/ \|$/, '') ?? ''));
  expect(inPage.length).toBe(sourcesNamedIn(substanceRecords) + sourcesNamedIn(hazardRecords));
});

/** How often a record names a source, wherever it stands. */
function sourcesNamedIn(value: unknown): number {
  if (typeof value !== 'object' || value === null) return 0;
  return Object.entries(value).reduce(
    (sum, [key, inner]) => sum + (/^source$|Source$/.test(key) ? 1 : sourcesNamedIn(inner)),
    0,
  );
}
