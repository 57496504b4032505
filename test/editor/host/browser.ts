// Opens the headless browser in which the workbench's page runs. Knows neither server nor extension.
// Invariant: nothing is downloaded; the browser is the machine's own Chromium.
import { existsSync } from 'node:fs';
import { chromium } from 'playwright-core';
import type { Browser, Page } from 'playwright-core';

/** A browser with one page; the caller closes the browser. */
export interface OpenBrowser {
  readonly browser: Browser;
  readonly page: Page;
}

/** Opens Chromium (`STOKEHOLD_CHROMIUM`, or where Debian puts it) with one page of 1400 × 900 points. */
export async function openBrowser(): Promise<OpenBrowser> {
  const executablePath = process.env['STOKEHOLD_CHROMIUM'] ?? '/usr/bin/chromium';
  if (!existsSync(executablePath)) throw new Error(`No Chromium at ${executablePath}: apt-get install chromium`);
  const browser = await chromium.launch({
    executablePath,
    args: ['--disable-gpu', '--disable-quic'],
    handleSIGINT: false,
    handleSIGTERM: false,
    handleSIGHUP: false,
  });
  return { browser, page: await browser.newPage({ viewport: { width: 1400, height: 900 } }) };
}
