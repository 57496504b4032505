// Counts the reference rows of test/reference by where their values come from. Knows nothing of the values.
// Invariant: a row that does not say where it comes from, and a file that is not `{ source, rows }`, is an error.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

const PROVENANCES = ['seen', 'from memory', 'common practice'];

/** The number of rows of each provenance, and what is wrong with the files. */
export function countReferenceRows(folder) {
  const counts = Object.fromEntries(PROVENANCES.map((provenance) => [provenance, 0]));
  const problems = [];
  const files = existsSync(folder) ? readdirSync(folder, { recursive: true }) : [];
  for (const file of files.filter((name) => name.endsWith('.json')).sort()) {
    const { source, rows } = JSON.parse(readFileSync(path.join(folder, file), 'utf8'));
    if (typeof source !== 'string' || !Array.isArray(rows)) {
      problems.push(`${file} is not { source, rows }`);
      continue;
    }
    rows.forEach((row, index) => {
      if (PROVENANCES.includes(row.provenance)) counts[row.provenance] += 1;
      else problems.push(`${file}, row ${index + 1}: provenance is ${JSON.stringify(row.provenance)}`);
    });
  }
  return { counts, problems };
}
