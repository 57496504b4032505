// Opens the editor, with the packaged extension installed, on a folder of scenarios made for one test file.
// Knows no answer of the extension. Invariant: the folder is new and is removed when the window closes.
import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { expect } from 'vitest';
import { openWorkbench } from '../host/workbench.ts';
import type { Workbench } from '../host/workbench.ts';

/** A window on a folder of its own. */
export interface ScenarioWindow extends Workbench {
  readonly folder: string;
  /** Saves the active file, waits until the disk holds another text than before, and returns that text. */
  saveChange(name: string): Promise<string>;
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
  shownNow = workbench;
  return {
    ...workbench,
    folder,
    async saveChange(name) {
      const read = (): string => readFileSync(path.join(folder, name), 'utf8');
      const before = read();
      await workbench.save();
      await expect.poll(read).not.toBe(before);
      return read();
    },
    async close() {
      await workbench.close();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

let shownNow: Workbench | undefined;

/** A picture of the window opened last, for a test that failed: test-results/failed-<name>.png. */
export async function pictureOfFailure(name: string): Promise<void> {
  await shownNow?.screenshot(`failed-${name.replace(/[^a-z0-9]+/gi, '-')}`);
}

/** Files of examples/, name to text, for a folder of a test's own. */
export function exampleFiles(...names: string[]): Record<string, string> {
  return Object.fromEntries(names.map((name) => [name, readFileSync(path.join('examples', name), 'utf8')]));
}
