// Collects and runs the tests that live inside the editor's extension host, where no test runner is at hand, and
// writes how many passed and failed. Knows no editor. Invariant: every registered test runs and is counted once, and
// a test that neither passes nor fails in time has failed.
import { writeFileSync } from 'node:fs';

const LIMIT_MS = 40_000;
const tests: { name: string; body: () => Promise<void> }[] = [];

/** Registers a test. It fails when the body rejects, or has not settled within 40 seconds. */
export function test(name: string, body: () => Promise<void>): void {
  tests.push({ name, body });
}

/** Runs the registered tests one after the other, writes the counts as JSON and rejects when one failed. */
export async function runRegistered(resultsFile: string): Promise<void> {
  const failures: string[] = [];
  for (const { name, body } of tests) {
    const started = Date.now();
    try {
      await within(LIMIT_MS, body());
      console.log(`  ok    ${name} (${Date.now() - started} ms)`);
    } catch (error) {
      failures.push(name);
      console.log(`  FAIL  ${name}\n${error instanceof Error ? (error.stack ?? error.message) : String(error)}`);
    }
  }
  writeFileSync(resultsFile, JSON.stringify({ passed: tests.length - failures.length, failed: failures.length }));
  if (failures.length > 0) throw new Error(`failed in the editor: ${failures.join('; ')}`);
}

/** Asks again every 100 ms until the answer is not undefined; rejects after the limit, saying what was waited for. */
export async function eventually<T>(what: string, ask: () => T | undefined | Promise<T | undefined>): Promise<T> {
  const deadline = Date.now() + LIMIT_MS / 2;
  for (;;) {
    const answer = await ask();
    if (answer !== undefined) return answer;
    if (Date.now() > deadline) throw new Error(`waited in vain for ${what}`);
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}

async function within(limitMs: number, work: Promise<void>): Promise<void> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => {
      reject(new Error(`not finished after ${limitMs / 1000} s`));
    }, limitMs);
  });
  try {
    await Promise.race([work, late]);
  } finally {
    clearTimeout(timer);
  }
}
