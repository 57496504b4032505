// The entries of the page of codes, from the project's own files: the comment of each code's file, and the example that
// earns it with what is then said. Used by the script that writes the page and by the test that finds it stale.
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { allCodes, findingsOf } from '../../server/findings/registry.ts';
import { openingComment, type CodeEntry } from '../../server/report/codes-page.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';
import { hazardCodes, isHazardCode } from '../../server/scenario/hazard-fact.ts';

export function codeEntries(root: string): readonly CodeEntry[] {
  return allCodes().map((code) => {
    const file = code.replace('/', '-');
    const [area = ''] = code.split('/');
    // One file speaks for all problems of form, and one for all hazards.
    const source = path.join(root, 'server/findings', `${['syntax', 'hazard'].includes(area) ? area : file}.ts`);
    const general = openingComment(readFileSync(source, 'utf8'));
    const meaning = isHazardCode(code) ? `${hazardCodes[code].says}\n\n${general}` : general;
    return { code, meaning, example: exampleOf(code, path.join(root, 'examples/errors', `${file}.stoke`)) };
  });
}

function exampleOf(code: string, file: string): CodeEntry['example'] {
  if (!existsSync(file)) return null;
  const text = readFileSync(file, 'utf8');
  const name = path.basename(file);
  const scenario = evaluate(name, (asked) => {
    const beside = path.join(path.dirname(file), asked);
    return existsSync(beside) ? { text: readFileSync(beside, 'utf8') } : { fault: 'missing' };
  });
  const finding = findingsOf(scenario).find((candidate) => candidate.code === code);
  return finding ? { text, severity: finding.severity, message: finding.message } : null;
}
