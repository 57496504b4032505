// Takes the README's picture, client/media/editor.png, from the real editor with the packaged extension installed: the
// example open and the hover of its fuel shown. Run by `npm run picture` and by nothing else, so that
// tests leave the tree as it was. Invariant: a picture of 150 kB or more is refused.
import { cpSync, mkdtempSync, readFileSync, rmSync, statSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { placeInText } from '../support/place-in-text.ts';
import { openWorkbench } from './host/workbench.ts';

const LARGEST_BYTES = 150_000;

const scratch = mkdtempSync(path.join(os.tmpdir(), 'stokehold-picture-'));
const folder = path.join(scratch, 'dunlin');
cpSync('examples/dunlin.stoke', path.join(folder, 'dunlin.stoke'));
cpSync('examples/house', path.join(folder, 'house'), { recursive: true });

const workbench = await openWorkbench(folder, {
  extensionsDir: process.env['STOKEHOLD_EXTENSIONS'] ?? '',
  settings: {
    'window.title': '${activeEditorShort}',
    'workbench.activityBar.location': 'hidden',
    'breadcrumbs.enabled': false,
    'editor.stickyScroll.enabled': false,
    'outline.showVariables': true,
  },
});
const picture = 'client/media/editor.png';
try {
  await workbench.page.setViewportSize({ width: 980, height: 640 });
  await workbench.openFile('dunlin.stoke');
  await workbench.runCommand('View: Toggle Primary Side Bar Visibility');
  const text = readFileSync(path.join(folder, 'dunlin.stoke'), 'utf8');
  const { line, column } = placeInText(text, 'slurry {');
  await workbench.placeCursor(line + 12, 1); // brings what stands above the blend into view, for the hover to lie on
  await workbench.placeCursor(line, column + 1);
  await workbench.readHover();
  await workbench.page.waitForTimeout(800); // the hover fades in
  await workbench.page.screenshot({ path: picture });
} finally {
  await workbench.close();
  rmSync(scratch, { recursive: true, force: true });
}
const { size } = statSync(picture);
if (size >= LARGEST_BYTES)
  throw new Error(`${picture} has ${size} bytes; a README's picture stays under ${LARGEST_BYTES}`);
console.log(`${picture}: ${size} bytes`);
