// Writes messages into a byte stream, each in a buffer of the length it needs. The protocol library has the buffer made for
// the longest that the text could become, three bytes a character, and cut down: for the findings of a large file, at
// every key, that costs several times what writing them costs. Knows no message. Needs Node.
// Invariant: the bytes are those the library would write. Source: Language Server Protocol 3.18, "Base Protocol".
import { StreamMessageWriter, type MessageWriter } from 'vscode-languageserver/node';

/** Messages as JSON into `output`, with a header before each. */
export function messageWriter(output: NodeJS.WritableStream): MessageWriter {
  return new StreamMessageWriter(output, {
    contentTypeEncoder: { name: 'application/json', encode: (message) => Promise.resolve(encoded(message)) },
  });
}

function encoded(message: object): Uint8Array {
  const json = JSON.stringify(message);
  const bytes = Buffer.allocUnsafe(Buffer.byteLength(json));
  bytes.write(json);
  return bytes;
}
