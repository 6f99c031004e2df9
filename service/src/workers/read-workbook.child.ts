import path from 'node:path';
import { Worker } from 'node:worker_threads';
import { wallSecondsOf, type Post, type ReadRequest, type ReaderMessage } from './reader-messages';
import type { Watched } from './reader-watchdog';
import { readTextTable } from './text-table';
import { readWorkbook, type SpreadsheetParser } from './read-workbook';
import { isTextFormat } from './sniff';
import { UploadRefused } from './upload-refused';

/** Reads one file and ends. It has no secrets, no database, and prototypes that nothing can add to. */
function freezePrototypes(): void {
  const builtIns = [
    Object,
    Array,
    Function,
    String,
    Number,
    Boolean,
    Symbol,
    Date,
    Promise,
    Map,
    Set,
    Uint8Array,
    ArrayBuffer,
  ];
  // RegExp is left out: a changed prototype takes every regular expression off its fast path, four times slower.
  for (const { prototype } of builtIns) Object.freeze(prototype);
  // Errors are named by assignment, also within Node.js, which frozen prototypes would turn into failures.
  for (const { prototype } of [Error, TypeError, RangeError, SyntaxError]) Object.seal(prototype);
}

const loadParser = (): SpreadsheetParser => {
  // eslint-disable-next-line @typescript-eslint/no-require-imports -- loaded after the prototypes are frozen
  return require('xlsx') as SpreadsheetParser;
};

const post: Post = (message: ReaderMessage) =>
  new Promise((resolve, reject) => {
    process.send!(message, (error: Error | null) => (error ? reject(error) : resolve()));
  });

async function read(request: ReadRequest): Promise<void> {
  try {
    if (isTextFormat(request.format)) await post({ type: 'done', ...(await readTextTable(request, post)) });
    else await post({ type: 'done', notes: await readWorkbook(request, loadParser, post) });
  } catch (cause) {
    if (!(cause instanceof UploadRefused)) throw cause;
    await post({ type: 'refused', code: cause.code, detail: cause.detail, limit: cause.limit });
  }
}

process.once('disconnect', () => process.exit(0));
process.once('message', (request: ReadRequest) => {
  const { residentBytes, cpuSeconds } = request.limits;
  const watched: Watched = { residentBytes, cpuSeconds, wallSeconds: wallSecondsOf(request) };
  new Worker(path.join(__dirname, 'reader-watchdog.js'), {
    workerData: watched,
  }).unref();
  freezePrototypes();
  // Once all is sent the parent ends this process; leaving earlier could cut the last messages short.
  read(request).catch((cause: unknown) => {
    process.stderr.write(cause instanceof Error ? `${cause.stack}\n` : String(cause), () => process.exit(1));
  });
});
