// Keeping messages apart: right lengths pass unchanged however the bytes are cut, wrong ones cost no more than their own
// message, and what is received is copied and searched in proportion to its length.
import { PassThrough } from 'node:stream';
import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { wholeMessages } from '../../../server/lsp/framing.ts';

const frame = (body: string, length = Buffer.byteLength(body)): string => `Content-Length: ${length}\r\n\r\n${body}`;
const GOOD = '{"jsonrpc":"2.0","method":"good","text":"±"}';

/** What comes out of the pieces; ends when they do. */
async function passed(pieces: readonly (string | Buffer)[]): Promise<string> {
  const input = new PassThrough();
  const output = wholeMessages(input);
  const chunks: Buffer[] = [];
  output.on('data', (chunk: Buffer) => void chunks.push(chunk));
  const ended = new Promise((resolve) => output.once('end', resolve));
  for (const piece of pieces) input.write(piece);
  input.end();
  await ended;
  return Buffer.concat(chunks).toString();
}

describe('right lengths', () => {
  it('pass unchanged, however the bytes are cut', async () => {
    const bodies = fc.array(
      fc.oneof(
        fc.json(),
        fc.constant(GOOD),
        fc.json().map((json) => `\r\n\r\n ${json}`),
      ),
      {
        minLength: 1,
        maxLength: 6,
      },
    );
    const holds = fc.asyncProperty(bodies, fc.array(fc.nat(200)), async (list, cuts) => {
      const whole = list.map((body) => frame(body)).join('');
      const bytes = Buffer.from(whole);
      const pieces: Buffer[] = [];
      let done = 0;
      for (const cut of cuts) pieces.push(bytes.subarray(done, (done += cut)));
      expect(await passed([...pieces, bytes.subarray(done)])).toBe(whole);
    });
    await fc.assert(holds, { numRuns: 200 });
  });

  it('may be written in any case and among other headers', async () => {
    const typed = `content-type: application/vscode-jsonrpc; charset=utf-8\r\nCONTENT-LENGTH:${GOOD.length + 1}\r\nX: 1\r\n\r\n${GOOD}`;
    expect(await passed([typed])).toBe(frame(GOOD));
  });

  it('of a message that spells a header out pass', async () => {
    const body = JSON.stringify({ text: 'Content-Length: 5\r\n\r\nhello' });
    expect(await passed([frame(body)])).toBe(frame(body));
  });
});

describe('a wrong length', () => {
  const afterwards = async (wrong: string, lost = 0): Promise<void> => {
    const heard = await passed([wrong, ...Array.from({ length: lost + 2 }, () => frame(GOOD))]);
    expect(heard.endsWith(frame(GOOD) + frame(GOOD))).toBe(true);
  };

  it.each([-43, -20, -1, 40, 60, 90, 1e6, 1e12])('that is off by %d costs its message only', (by) =>
    afterwards(frame(GOOD, Math.max(0, Buffer.byteLength(GOOD) + by))),
  );

  it.each([1, 2, 7, 19, 22])('that is off by %d, and so ends in the next header, costs the next message too', (by) =>
    afterwards(frame(GOOD, Buffer.byteLength(GOOD) + by), 1),
  );

  it.each([
    ['none', `Content-Nonsense: 12\r\n\r\n${GOOD}`],
    ['a header without a colon', `Nonsense\r\n\r\n${GOOD}`],
    ['a length in words', `Content-Length: many\r\n\r\n${GOOD}`],
    ['a negative one', `Content-Length: -5\r\n\r\n${GOOD}`],
    ['a length with more digits than fit', `Content-Length: ${'9'.repeat(400)}\r\n\r\n${GOOD}`],
    ['bytes that are no message', '\u0000\r\n\r\n\n\n{]}'],
    ['a blank line', '\r\n\r\n'],
  ])('or %s', (_, wrong) => afterwards(wrong));

  it('found while its body comes in pieces is left at once', async () => {
    const pieces = [frame('{"half":', 5000), 'Content-Le', `ngth: ${Buffer.byteLength(GOOD)}\r`, '\n\r', `\n${GOOD}`];
    expect((await passed(pieces)).endsWith(frame(GOOD))).toBe(true);
  });

  it('after a megabyte of nonsense does not matter either', () => afterwards('x'.repeat(1_000_000)));
});

describe('work', () => {
  it('is in proportion to the length: a message of 20 MB in 20,000 pieces', async () => {
    const body = `"${'x'.repeat(20_000_000)}"`;
    const bytes = Buffer.from(frame(body));
    let joined = 0;
    const joining = vi.spyOn(Buffer, 'concat');
    try {
      const pieces = Array.from({ length: 20_001 }, (_, index) => bytes.subarray(index * 1000, (index + 1) * 1000));
      const heard = await passed([...pieces, bytes.subarray(20_001_000)]);
      expect(heard.length).toBe(bytes.length);
      for (const { value } of joining.mock.results) joined += Buffer.isBuffer(value) ? value.length : 0;
    } finally {
      joining.mockRestore();
    }
    // Each piece once for the search, with as much of what came before as a header is long; all of them once at the end
    // here, and once by the test itself.
    expect(joined).toBeLessThan(5 * bytes.length);
  });
});
