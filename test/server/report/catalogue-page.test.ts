// The generated page is that of the records as they are, and leaves out no number that a record gives a source for.

import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
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

test('the page is not stale (npm run pages writes it)', () => {
  expect(readFileSync('examples/reference/catalogue.md', 'utf8')).toBe(
    cataloguePage(substanceRecords, sourceRecords, 'npm run pages'),
  );
});

test('each number stands with its conditions and its source', () => {
  const page = cataloguePage([spirit], [handbook], 'npm run pages');
  for (const line of [
    '1 substances, 5 entries:',
    '5 seen, 0 from memory, 0 common practice, 0 estimate.',
    '| [spirit](#spirit) | CH3OH | liquid | 792 |  |  | 9 | from 6 |',
    'CH3OH, 32.042 g/mol; also wood_spirit; carbon fossil.',
    '| liquid: formation enthalpy | -239.2 kJ/mol, standard uncertainty 0.2 kJ/mol | handbook |',
    '| liquid: heat capacity | 2 t^-2 + 80 - 0.5 t J/(mol K), 200 to 300 K | handbook |',
    '| liquid: density | 810 at 273.15 K, 792 at 293.15 K, kg/m³ | handbook |',
    '| flash point | 9 °C, closed cup | handbook |',
    '| flammable limits in air | from 6 vol % at 20 °C | handbook |',
    '| handbook | A. Author, Handbook \\| tables (2001): table 1 | seen | 5 |',
  ])
    expect(page.split('\n')).toContain(line);
});

test('no sourced number of the catalogue is left out', () => {
  const page = cataloguePage(substanceRecords, sourceRecords, 'npm run pages');
  const ids = new Set(sourceRecords.map(({ id }) => id));
  const inPage = page.split('\n').filter((line) => ids.has(line.split(' | ').at(-1)?.replace(/ \|$/, '') ?? ''));
  expect(inPage.length).toBe(sourcesNamedIn(substanceRecords));
});

/** How often a record names a source, wherever it stands. */
function sourcesNamedIn(value: unknown): number {
  if (typeof value !== 'object' || value === null) return 0;
  return Object.entries(value).reduce(
    (sum, [key, inner]) => sum + (/^source$|Source$/.test(key) ? 1 : sourcesNamedIn(inner)),
    0,
  );
}
