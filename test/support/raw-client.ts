// A client for the fuzz tests that sends whatever it is told, bytes that are no messages among them, and answers the
// server's own questions. The server runs in this process, behind the same framing as the program over stdio. Knows no
// scenario. Invariant: every answer that comes is found by the id of its question, and what the server logs is kept.
import { Duplex } from 'node:stream';
import { createConnection, StreamMessageReader, StreamMessageWriter } from 'vscode-languageserver/node';
import { startServer } from '../../server/lsp/connection.ts';
import { wholeMessages } from '../../server/lsp/framing.ts';

export interface Answer {
  readonly result?: unknown;
  readonly error?: { readonly code: number; readonly message: string };
}

export class RawClient {
  /** What the server logged as an error. */
  readonly logged: string[] = [];
  readonly #toServer: Duplex;
  readonly #waiting = new Map<number, (answer: Answer) => void>();
  #heard = Buffer.alloc(0);
  /** Out of the way of the numbers that hostile messages name. */
  #nextId = 2 ** 40;

  constructor(
    private readonly options: {
      readonly settings: unknown;
      readonly fileAt: (uri: string) => unknown;
    },
  ) {
    const server = new Duplex({
      read: () => undefined,
      write: (chunk: Buffer, _encoding, done) => {
        this.#hear(chunk);
        done();
      },
    });
    this.#toServer = server;
    startServer(createConnection(new StreamMessageReader(wholeMessages(server)), new StreamMessageWriter(server)));
  }

  bytes(text: string): void {
    this.#toServer.push(Buffer.from(text));
  }

  /** Any value, framed as a message. */
  message(value: unknown): void {
    const body = JSON.stringify(value);
    this.bytes(`Content-Length: ${Buffer.byteLength(body)}\r\n\r\n${body}`);
  }

  notify(method: string, params: unknown): void {
    this.message({ jsonrpc: '2.0', method, params });
  }

  /** Resolves with the answer; `id` is what `$/cancelRequest` takes. */
  ask(method: string, params: unknown): { readonly id: number; readonly answer: Promise<Answer> } {
    const id = this.#nextId++;
    const answer = new Promise<Answer>((resolve) => this.#waiting.set(id, resolve));
    this.message({ jsonrpc: '2.0', id, method, params });
    return { id, answer };
  }

  #hear(chunk: Buffer): void {
    this.#heard = Buffer.concat([this.#heard, chunk]);
    for (;;) {
      const end = this.#heard.indexOf('\r\n\r\n');
      const length = Number(/Content-Length: (\d+)/.exec(this.#heard.toString('latin1', 0, Math.max(0, end)))?.[1]);
      if (end < 0 || this.#heard.length < end + 4 + length) return;
      const body = this.#heard.toString('utf8', end + 4, end + 4 + length);
      this.#heard = this.#heard.subarray(end + 4 + length);
      this.#take(JSON.parse(body) as Message);
    }
  }

  #take({ id, method, params, result, error }: Message): void {
    if (method === undefined) {
      if (typeof id !== 'number') return;
      this.#waiting.get(id)?.({ result, ...(error ? { error } : {}) });
      this.#waiting.delete(id);
    } else if (method === 'window/logMessage') {
      this.logged.push(String(params?.['message']));
    } else if (id !== undefined) {
      this.message({ jsonrpc: '2.0', id, ...this.#reply(method, params) });
    }
  }

  #reply(method: string, params: Record<string, unknown> | undefined): Answer {
    if (method === 'stokehold/readFile') return { result: this.options.fileAt(String(params?.['uri'])) };
    if (method === 'workspace/configuration') return { result: [this.options.settings] };
    return { result: null };
  }
}

interface Message {
  readonly id?: number | string | null;
  readonly method?: string;
  readonly params?: Record<string, unknown>;
  readonly result?: unknown;
  readonly error?: { readonly code: number; readonly message: string };
}
