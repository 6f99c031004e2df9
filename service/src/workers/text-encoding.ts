import { createReadStream } from 'node:fs';
import { open } from 'node:fs/promises';
import type { TextEncoding } from './reader-messages';
import { utf16Pattern } from './sniff';

export const sniffedBytes = 65_536;
const chunkBytes = 1_048_576;

/** What windows-1252 has where Latin-1 has control codes, 0x80 to 0x9F (WHATWG Encoding, index windows-1252). */
const windows1252 = '€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008dŽ\u008f\u0090‘’“”•–—˜™š›œ\u009džŸ';

/** The first bytes of a file, fewer when it is shorter. */
export async function leadingBytes(path: string, count = sniffedBytes, from = 0): Promise<Buffer> {
  const file = await open(path, 'r');
  try {
    const { bytesRead, buffer } = await file.read(Buffer.alloc(count), 0, count, from);
    return buffer.subarray(0, bytesRead);
  } finally {
    await file.close();
  }
}

/**
 * A byte-order mark decides; then zeros at every other byte; then whether the whole file is valid UTF-8.
 * What is left is one of the Western 8-bit encodings, and windows-1252 contains the printable part of Latin-1.
 */
export async function decideEncoding(path: string): Promise<{ encoding: TextEncoding; because: string }> {
  const start = await leadingBytes(path);
  if (start[0] === 0xef && start[1] === 0xbb && start[2] === 0xbf)
    return { encoding: 'utf-8', because: 'it starts with the UTF-8 mark' };
  const wide = utf16Pattern(start);
  if (wide) {
    const marked = start[0]! + start[1]! === 0xff + 0xfe;
    return {
      encoding: wide,
      because: marked ? 'it starts with the UTF-16 mark' : 'every other byte is zero',
    };
  }
  if (await isValidUtf8(path)) return { encoding: 'utf-8', because: 'all of it is valid UTF-8' };
  return { encoding: 'windows-1252', because: 'it is not valid UTF-8' };
}

async function isValidUtf8(path: string): Promise<boolean> {
  const decoder = new TextDecoder('utf-8', { fatal: true });
  try {
    for await (const chunk of rawChunks(path)) decoder.decode(chunk, { stream: true });
    decoder.decode();
    return true;
  } catch (cause) {
    if (cause instanceof TypeError) return false;
    throw cause;
  }
}

const rawChunks = (path: string): AsyncIterable<Buffer> =>
  createReadStream(path, { highWaterMark: chunkBytes });

/** Bytes to text, chunk by chunk; a leading mark is dropped. */
export function decoderOf(encoding: TextEncoding): (chunk: Buffer | null) => string {
  if (encoding === 'windows-1252') {
    return (chunk) =>
      (chunk ?? Buffer.alloc(0))
        .toString('latin1')
        .replace(/[\x80-\x9f]/g, (c) => windows1252[c.charCodeAt(0) - 0x80]!);
  }
  const decoder = new TextDecoder(encoding);
  return (chunk) => (chunk ? decoder.decode(chunk, { stream: true }) : decoder.decode());
}

/** The file as text with every line end written as "\n". */
export async function* decodedChunks(path: string, encoding: TextEncoding): AsyncGenerator<string> {
  const decode = decoderOf(encoding);
  let held = '';
  for await (const chunk of rawChunks(path)) {
    const text = held + decode(chunk);
    // A carriage return at the very end may be half of a line end.
    held = text.endsWith('\r') ? '\r' : '';
    yield unixLines(held ? text.slice(0, -1) : text);
  }
  yield unixLines(held + decode(null));
}

export const unixLines = (text: string): string =>
  text.includes('\r') ? text.replace(/\r\n?/g, '\n') : text;
