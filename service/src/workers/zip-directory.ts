import { crc32 } from 'node:zlib';
import type { Readable } from 'node:stream';
import yauzl from 'yauzl';
import { countInWords, sizeInWords, type ReadLimits } from './limits';
import { UploadRefused } from './upload-refused';

/** The members a workbook reader may want, by name, with the bytes that were counted while they inflated. */
export type ZipMembers = Map<string, Buffer>;

/** Pictures, macros and embedded files are counted and dropped: nothing here looks at them. */
const wanted = /\.(xml|rels|bin)$|^mimetype$/i;
const unwanted =
  /(^|\/)vbaProject\.bin$|(^|\/)(embeddings|media|printerSettings|activeX|Pictures|Thumbnails)\//i;

/**
 * Inflates a zip archive into memory, believing none of its stated sizes.
 * Names are labels only: no path is ever followed, and those that climb upwards are left out.
 */
export async function readZipMembers(
  path: string,
  fileName: string,
  limits: ReadLimits,
): Promise<ZipMembers> {
  const zip = await open(path, fileName);
  try {
    return await inflateAll(zip, fileName, limits);
  } finally {
    zip.close();
  }
}

async function inflateAll(zip: yauzl.ZipFile, fileName: string, limits: ReadLimits): Promise<ZipMembers> {
  if (zip.entryCount > limits.zipMembers) {
    throw new UploadRefused(
      'too-many-members',
      `"${fileName}" lists ${countInWords(zip.entryCount)} parts; ${countInWords(limits.zipMembers)} are allowed. ` +
        'Copy the tables into a new workbook and send that.',
      limits.zipMembers,
    );
  }
  const members: ZipMembers = new Map();
  const names = new Set<string>();
  let leftBytes = limits.unpackedBytes;
  for (let entry = await nextEntry(zip, fileName); entry; entry = await nextEntry(zip, fileName)) {
    const name = memberName(entry);
    if (name.endsWith('/')) continue;
    if (entry.isEncrypted()) throw encrypted(fileName);
    if (names.has(name)) throw damaged(fileName, `it lists "${name}" twice`);
    names.add(name);
    const keep = wanted.test(name) && !unwanted.test(name) && !name.split('/').includes('..');
    const member = await inflate(zip, entry, { name, fileName, limits, leftBytes, keep });
    leftBytes -= member.bytes;
    if (keep) members.set(name, Buffer.concat(member.chunks));
  }
  return members;
}

interface Inflating {
  name: string;
  fileName: string;
  limits: ReadLimits;
  leftBytes: number;
  keep: boolean;
}

async function inflate(
  zip: yauzl.ZipFile,
  entry: yauzl.Entry,
  { name, fileName, limits, leftBytes, keep }: Inflating,
): Promise<{ bytes: number; chunks: Buffer[] }> {
  const chunks: Buffer[] = [];
  let bytes = 0;
  let checksum = 0;
  try {
    for await (const chunk of (await openStream(zip, entry)) as AsyncIterable<Buffer>) {
      bytes += chunk.length;
      checksum = crc32(chunk, checksum);
      if (bytes > leftBytes)
        throw bomb(
          fileName,
          `its parts unpack to more than ${sizeInWords(limits.unpackedBytes)}`,
          limits.unpackedBytes,
        );
      if (bytes > entry.uncompressedSize)
        throw bomb(
          fileName,
          `"${name}" unpacks to more than the ${countInWords(entry.uncompressedSize)} bytes it states`,
          entry.uncompressedSize,
        );
      if (bytes > limits.ratioFromBytes && bytes > entry.compressedSize * limits.unpackRatio) {
        throw bomb(
          fileName,
          `"${name}" unpacks to more than ${limits.unpackRatio} times its packed size`,
          limits.unpackRatio,
        );
      }
      if (keep) chunks.push(chunk);
    }
  } catch (cause) {
    if (cause instanceof UploadRefused) throw cause;
    throw damaged(fileName, `"${name}" does not unpack (${reasonOf(cause)})`);
  }
  if (bytes < entry.uncompressedSize) throw damaged(fileName, `"${name}" unpacks to less than it states`);
  if (checksum !== entry.crc32) throw damaged(fileName, `the checksum of "${name}" does not fit its bytes`);
  return { bytes, chunks };
}

function open(path: string, fileName: string): Promise<yauzl.ZipFile> {
  const options = { lazyEntries: true, autoClose: false, decodeStrings: false, validateEntrySizes: false };
  return new Promise((resolve, reject) => {
    yauzl.open(path, options, (error, zip) => {
      if (error) reject(damaged(fileName, `its zip directory cannot be read (${reasonOf(error)})`));
      else resolve(zip);
    });
  });
}

function nextEntry(zip: yauzl.ZipFile, fileName: string): Promise<yauzl.Entry | null> {
  return new Promise((resolve, reject) => {
    const settle = () =>
      zip.removeAllListeners('entry').removeAllListeners('end').removeAllListeners('error');
    zip.on('entry', (entry: yauzl.Entry) => (settle(), resolve(entry)));
    zip.on('end', () => (settle(), resolve(null)));
    zip.on('error', (error: Error) => {
      settle();
      reject(damaged(fileName, `its zip directory cannot be read (${reasonOf(error)})`));
    });
    zip.readEntry();
  });
}

function openStream(zip: yauzl.ZipFile, entry: yauzl.Entry): Promise<Readable> {
  return new Promise((resolve, reject) => {
    zip.openReadStream(entry, (error, stream) => (error ? reject(error) : resolve(stream)));
  });
}

/** With `decodeStrings` off the name comes as bytes. */
function memberName(entry: yauzl.Entry): string {
  const raw: unknown = entry.fileName;
  return (Buffer.isBuffer(raw) ? raw.toString('utf8') : String(raw))
    .replaceAll('\\', '/')
    .replace(/^\/+/, '');
}

const reasonOf = (cause: unknown): string => (cause instanceof Error ? cause.message : String(cause));

const bomb = (fileName: string, what: string, limit: number): UploadRefused =>
  new UploadRefused(
    'zip-bomb',
    `"${fileName}" is not read: ${what}. Save the tables alone as a new workbook or as .csv.`,
    limit,
  );

export const damaged = (fileName: string, what: string): UploadRefused =>
  new UploadRefused(
    'damaged-file',
    `"${fileName}" is damaged: ${what}. Open it in a spreadsheet program, save it anew and send that copy.`,
  );

export const encrypted = (fileName: string): UploadRefused =>
  new UploadRefused(
    'encrypted-workbook',
    `"${fileName}" is protected by a password. Remove the password in the program that set it and send the open copy.`,
  );
