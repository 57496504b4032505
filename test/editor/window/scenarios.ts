// Opens the editor, with the packaged extension installed, on a folder of scenarios made for one test file.
// Knows no answer of the extension. Invariant: the folder is new and is removed when the window closes.
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { openWorkbench } from '../host/workbench.ts';
import type { Workbench } from '../host/workbench.ts';

/** A window on a folder of its own. */
export interface ScenarioWindow extends Workbench {
  readonly folder: string;
}

/** Writes the files (name to text) into a new folder and opens a window on it. */
export async function openScenarios(
  files: Readonly<Record<string, string>>,
  options: { settings?: Record<string, unknown>; trusted?: boolean } = {},
): Promise<ScenarioWindow> {
  const extensionsDir = process.env['STOKEHOLD_EXTENSIONS'];
  if (extensionsDir === undefined) throw new Error('Run these tests by: node .ci/editor-tests.mjs');
  const folder = mkdtempSync(path.join(os.tmpdir(), 'stokehold-scenarios-'));
  for (const [name, text] of Object.entries(files)) {
    mkdirSync(path.dirname(path.join(folder, name)), { recursive: true });
    writeFileSync(path.join(folder, name), text);
  }
  const workbench = await openWorkbench(folder, { extensionsDir, ...options });
  return {
    ...workbench,
    folder,
    async close() {
      await workbench.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}
