import { fork, type ChildProcess } from 'node:child_process';
import { existsSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import { sizeInWords } from './limits';
import { wallSecondsOf, type ReaderMessage, type ReadRequest } from './reader-messages';
import { isRefusalCode, UploadRefused } from './upload-refused';
import { WorkbookAssembly } from './workbook-assembly';
import { damaged } from './zip-directory';

/** The child runs as plain JavaScript, so under a test runner that reads the sources it is the built one. */
const childPath = path.join(__dirname, '../../dist/workers/read-workbook.child.js');

const keptErrorCharacters = 4000;
const memoryLooksMs = 100;

/** Readers that are alive now; none outlives this process. */
const alive = new Set<ChildProcess>();
process.once('exit', () => {
  for (const child of alive) child.kill('SIGKILL');
});

/** How many reading processes run at this moment. */
export const readersAlive = (): number => alive.size;

/** Reads one checked file in a fresh process and ends that process whatever happens. */
export async function runReader(request: ReadRequest, signal?: AbortSignal): Promise<RawWorkbook> {
  if (!existsSync(childPath))
    throw new Error(
      `The upload reader is not built: ${childPath} is missing. Run "npm run build -w service".`,
    );
  signal?.throwIfAborted();
  const child = fork(childPath, [], {
    env: {},
    execArgv: [`--max-old-space-size=${request.limits.heapMiB}`, '--disable-proto=delete'],
    stdio: ['ignore', 'ignore', 'pipe', 'ipc'],
    serialization: 'json',
  });
  alive.add(child);
  const gone = new Promise<void>((resolve) => child.once('close', () => resolve()));
  try {
    return await outcomeOf(child, request, signal);
  } finally {
    child.kill('SIGKILL');
    await gone;
    alive.delete(child);
  }
}

function outcomeOf(child: ChildProcess, request: ReadRequest, signal?: AbortSignal): Promise<RawWorkbook> {
  const { limits, fileName } = request;
  const seconds = wallSecondsOf(request);
  const stops: (() => void)[] = [];
  const outcome = new Promise<RawWorkbook>((resolve, reject) => {
    const assembly = new WorkbookAssembly(request);
    let errors = '';
    child
      .stderr!.setEncoding('utf8')
      .on('data', (text: string) => (errors = (errors + text).slice(-keptErrorCharacters)));
    child.on('message', (message: ReaderMessage) => {
      try {
        if (message.type === 'done') resolve(assembly.finished(message));
        else if (message.type === 'refused') reject(refusal(message));
        else assembly.add(message);
      } catch (cause) {
        reject(cause instanceof Error ? cause : new Error(String(cause)));
      }
    });
    child.once('error', reject);
    child.once('close', (code, killedBy) => reject(deathOf(request, errors, code, killedBy)));
    const clock = setTimeout(() => reject(tookTooLong(fileName, seconds)), seconds * 1000);
    const abort = (): void => reject(signal!.reason as Error);
    signal?.addEventListener('abort', abort, { once: true });
    const memory = setInterval(() => {
      void residentBytes(child.pid).then(
        (bytes) => bytes > limits.residentBytes && reject(tooMuchMemory(fileName, limits.residentBytes)),
      );
    }, memoryLooksMs);
    stops.push(
      () => clearTimeout(clock),
      () => clearInterval(memory),
      () => signal?.removeEventListener('abort', abort),
    );
    child.send(request, (error) => error && reject(error));
  });
  return outcome.finally(() => stops.forEach((stop) => stop()));
}

/** Resident memory as Linux tells it; elsewhere 0, and the child's own watchdog is the one that looks. */
async function residentBytes(pid: number | undefined): Promise<number> {
  const status = await readFile(`/proc/${pid}/status`, 'utf8').catch(() => '');
  return Number(/^VmRSS:\s*(\d+) kB/m.exec(status)?.[1] ?? 0) * 1024;
}

function refusal({ code, detail, limit }: { code: string; detail: string; limit?: number }): Error {
  return isRefusalCode(code)
    ? new UploadRefused(code, detail, limit)
    : new Error(`The upload reader refused with an unknown code: ${code}`);
}

/** A reader that dies is a finding about the file, unless it could not even be loaded. */
function deathOf(request: ReadRequest, errors: string, code: number | null, killedBy: string | null): Error {
  const { fileName, limits } = request;
  if (/too-much-memory|heap out of memory|allocation failed/i.test(errors))
    return tooMuchMemory(fileName, limits.residentBytes);
  if (errors.includes('too-much-cpu')) return tookTooLong(fileName, limits.cpuSeconds, ' of processor time');
  if (errors.includes('took-too-long')) return tookTooLong(fileName, wallSecondsOf(request));
  if (/Cannot find module|SyntaxError/.test(errors))
    return new Error(`The upload reader cannot start:\n${errors}`);
  const reason =
    /^\w*Error: (.*)$/m.exec(errors)?.[1] ?? `the reading process ended with ${killedBy ?? `code ${code}`}`;
  return damaged(fileName, `it cannot be read (${reason})`);
}

const tookTooLong = (fileName: string, seconds: number, kind = ''): UploadRefused =>
  new UploadRefused(
    'took-too-long',
    `"${fileName}" was not read within ${seconds} s${kind}. Keep only the sheets that are needed, or save them as .csv.`,
    seconds,
  );

const tooMuchMemory = (fileName: string, bytes: number): UploadRefused =>
  new UploadRefused(
    'too-much-memory',
    `"${fileName}" takes more than ${sizeInWords(bytes)} of memory to read. Keep only the sheets that are needed, or save them as .csv.`,
    bytes,
  );
