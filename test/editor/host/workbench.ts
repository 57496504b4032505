// Drives VS Code's own user interface as a person does: keys, the quick input, the palette, the panels. Each function
// waits for what it asked for and rejects after the page's limit. Knows the workbench's page, not our extension.
// Source: the workbench's page as VS Code 1.100 draws it; the selectors stand here and nowhere else.
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { Locator, Page } from 'playwright-core';
import { openBrowser } from './browser.ts';
import { startServer, workbenchUrl } from './server.ts';

/** A window of the editor with a folder open. Lines and columns are 1-based, as the editor shows them. */
export interface Workbench {
  readonly page: Page;
  /** Opens a file of the folder through quick open. */
  openFile(name: string): Promise<void>;
  /** The language's name, as the status bar shows it. */
  readLanguage(): Promise<string>;
  placeCursor(line: number, column: number): Promise<void>;
  /** Shows the hover at the cursor and returns its parts, one a provider. Asks again while the extension starts. */
  readHover(): Promise<string[]>;
  /** Opens the Problems panel and returns each problem as the screen reader hears it, `Error: …` first. */
  readProblems(): Promise<string[]>;
  /** Waits until the Problems panel shows `count` problems of the file and returns them. */
  waitForProblems(file: string, count: number): Promise<string[]>;
  /** Opens the quick fixes at the cursor and applies the one whose title holds the words. */
  applyQuickFix(title: string): Promise<void>;
  formatDocument(): Promise<void>;
  /** Types at the cursor, with a key stroke a character. */
  typeText(text: string): Promise<void>;
  /** Runs a command by its title in the palette. */
  runCommand(title: string): Promise<void>;
  /** Saves the active file, so that a test reads it from the disk. */
  save(): Promise<void>;
  /** The colour of the first piece of coloured text that holds these words, as in `rgb(86, 156, 214)`. */
  readColour(text: string): Promise<string>;
  /** Writes test-results/<name>.png. */
  screenshot(name: string): Promise<void>;
  close(): Promise<void>;
}

/** Opens the installed extension's editor on a folder. The extensions folder is the one the .vsix was put into. */
export async function openWorkbench(
  folder: string,
  options: { extensionsDir: string; settings?: Record<string, unknown>; trusted?: boolean },
): Promise<Workbench> {
  const profile = mkdtempSync(path.join(os.tmpdir(), 'stokehold-profile-'));
  const userDataDir = path.join(profile, 'user-data');
  mkdirSync(path.join(userDataDir, 'User'), { recursive: true });
  const untrusted = options.trusted === false ? RESTRICTED_MODE : {};
  const settings = { ...QUIET_SETTINGS, ...untrusted, ...options.settings };
  writeFileSync(path.join(userDataDir, 'User/settings.json'), JSON.stringify(settings));
  const trust = options.trusted === false ? [] : ['--disable-workspace-trust'];
  const server = await startServer({ userDataDir, extensionsDir: options.extensionsDir }, trust);
  const { browser, page } = await openBrowser();
  page.setDefaultTimeout(30_000);
  const close = async (): Promise<void> => {
    await browser.close();
    server.stop();
    rmSync(profile, { recursive: true, force: true, maxRetries: 10 });
  };
  try {
    await page.goto(workbenchUrl(server.authority, folder));
    await page.locator('.monaco-workbench').waitFor();
    await page.locator('.statusbar-item').first().waitFor();
  } catch (error) {
    await close();
    throw error;
  }
  return driveWorkbench(page, close);
}

/** Settings that keep still what moves, and away what asks. */
const QUIET_SETTINGS = {
  'workbench.colorTheme': 'Default Dark Modern',
  'workbench.startupEditor': 'none',
  'files.autoSave': 'off', // on the web it is on, and a test saves when it means to
  'workbench.tips.enabled': false,
  'workbench.reduceMotion': 'on',
  'workbench.enableExperiments': false,
  'window.commandCenter': false,
  'chat.commandCenter.enabled': false,
  'editor.minimap.enabled': false,
  'telemetry.telemetryLevel': 'off',
};

/** The editor starts in its restricted mode, as if the person had answered that the folder is not to be trusted. */
const RESTRICTED_MODE = {
  'security.workspace.trust.enabled': true,
  'security.workspace.trust.startupPrompt': 'never',
};

function driveWorkbench(page: Page, close: () => Promise<void>): Workbench {
  const quickInput = page.locator('.quick-input-widget input');
  const quickRows = page.locator('.quick-input-list .monaco-list-row');
  const hoverParts = page.locator('.monaco-hover:not(.hidden) .hover-row');
  const problemRows = page.locator('.markers-panel .monaco-list-row[aria-level="2"]');

  /** The rows below the file's own row, up to the next file's. */
  const problemsOf = async (file: string): Promise<string[]> => {
    const rows = await page.locator('.markers-panel .monaco-list-row').evaluateAll((elements: PageElement[]) =>
      elements.map((element) => ({
        level: element.getAttribute('aria-level'),
        label: element.getAttribute('aria-label') ?? '',
      })),
    );
    const start = rows.findIndex(({ level, label }) => level === '1' && label.includes(file));
    if (start < 0) return [];
    const end = rows.findIndex(({ level }, index) => index > start && level === '1');
    return rows.slice(start + 1, end < 0 ? rows.length : end).map(({ label }) => label);
  };

  const runCommand = async (title: string): Promise<void> => {
    await page.keyboard.press('F1');
    await quickInput.fill(`>${title}`);
    await quickRows.filter({ hasText: title }).first().waitFor();
    await quickInput.press('Enter');
    await page.locator('.quick-input-widget').waitFor({ state: 'hidden' });
  };

  return {
    page,
    runCommand,
    close,
    async openFile(name) {
      await page.keyboard.press('Control+P');
      await quickInput.fill(name);
      await quickRows
        .filter({ hasText: path.basename(name) })
        .first()
        .waitFor();
      await quickInput.press('Enter');
      await page.locator('.tab.active', { hasText: path.basename(name) }).waitFor();
      await page.locator('.editor-instance .view-lines').first().waitFor();
    },
    async readLanguage() {
      return page.locator('.statusbar-item[id="status.editor.mode"]').innerText();
    },
    async placeCursor(line, column) {
      await page.keyboard.press('Control+G');
      await quickInput.fill(`:${line}:${column}`);
      await quickInput.press('Enter');
      const position = page.locator('.statusbar-item[id="status.editor.selection"]');
      await position.filter({ hasText: `Ln ${line}, Col ${column}` }).waitFor();
    },
    async readHover() {
      return askAgain(hoverParts, async () => {
        await page.keyboard.press('Control+K');
        await page.keyboard.press('Control+I');
      });
    },
    async readProblems() {
      await runCommand('View: Focus Problems');
      await page.locator('.markers-panel').waitFor();
      return labels(problemRows);
    },
    async waitForProblems(file, count) {
      await runCommand('View: Focus Problems');
      const deadline = Date.now() + 30_000;
      for (;;) {
        const shown = await problemsOf(file);
        if (shown.length === count) return shown;
        if (Date.now() > deadline) {
          throw new Error(`waited for ${count} problems in ${file}, but these are shown: ${shown.join(' | ')}`);
        }
        await page.waitForTimeout(200);
      }
    },
    async applyQuickFix(title) {
      const rows = page.locator('.action-widget .monaco-list-row.action');
      const offered = await askAgain(rows, () => page.keyboard.press('Control+.'));
      // By keys: the list lies under a transparent layer that takes the mouse's clicks.
      for (let step = 0; step < offered.length; step++) {
        if ((await rows.and(page.locator('.focused')).innerText()).includes(title)) {
          await page.keyboard.press('Enter');
          await page.locator('.action-widget').waitFor({ state: 'hidden' });
          return;
        }
        await page.keyboard.press('ArrowDown');
      }
      throw new Error(`no quick fix "${title}"; offered are: ${offered.join(' | ')}`);
    },
    async formatDocument() {
      // Asked before the extension is active, the editor says that there is no formatter.
      const refusal = page.locator('.monaco-dialog-box', { hasText: 'There is no formatter' });
      for (let attempt = 1; attempt <= 10; attempt++) {
        await runCommand('Format Document');
        await page.waitForTimeout(500);
        if (!(await refusal.isVisible())) return;
        await page.keyboard.press('Escape');
        await refusal.waitFor({ state: 'hidden' });
      }
      throw new Error('the editor knows no formatter for this file');
    },
    async typeText(text) {
      await page.keyboard.type(text, { delay: 20 });
    },
    async save() {
      await page.keyboard.press('Control+S');
      await page.locator('.tab.active:not(.dirty)').waitFor();
    },
    async readColour(text) {
      const pattern = text.replace(/[\\^$.*+?()[\]{}|]/g, '\\$&').replaceAll(' ', '\\s'); // shown with no-break spaces
      const span = page.locator('.view-line span span', { hasText: new RegExp(pattern) }).first();
      return span.evaluate((element: PageElement) => {
        const page = globalThis as unknown as PageGlobals; // this function runs in the page
        return page.getComputedStyle(element).color;
      });
    },
    async screenshot(name) {
      mkdirSync('test-results', { recursive: true });
      await page.screenshot({ path: path.join('test-results', `${name}.png`) });
    },
  };
}

/** What the page's own functions below need of the page: the project loads no DOM types, lest other rooms use them. */
interface PageElement {
  getAttribute(name: string): string | null;
}
interface PageGlobals {
  getComputedStyle(element: PageElement): { color: string };
}

/** Repeats a request until something is shown, for ten times two seconds, and returns the texts shown. */
async function askAgain(shown: Locator, ask: () => Promise<void>): Promise<string[]> {
  for (let attempt = 1; ; attempt++) {
    await ask();
    try {
      await shown.first().waitFor({ timeout: 2000 });
      return await shown.allInnerTexts();
    } catch (error) {
      if (attempt === 10) throw error;
    }
  }
}

async function labels(rows: Locator): Promise<string[]> {
  return rows.evaluateAll((elements: PageElement[]) =>
    elements.map((element) => element.getAttribute('aria-label') ?? ''),
  );
}
