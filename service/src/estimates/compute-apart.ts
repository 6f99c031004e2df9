import * as path from 'node:path';
import { Worker } from 'node:worker_threads';
import type { EstimateInputs } from '@siltlight/common/estimate/estimate-inputs';
import type { EstimateResult } from '@siltlight/common/estimate/estimate-result';

/** Threads run plain JavaScript: the built file, from the sources' place as well as from the build's. */
const WORKER = path.join(__dirname, '../../dist/estimates/estimate.worker.js');

/** Computes on a worker thread; an abort ends the thread and with it all that it held. */
export function computeApart(inputs: EstimateInputs, signal: AbortSignal): Promise<EstimateResult> {
  return new Promise((resolve, reject) => {
    signal.throwIfAborted();
    const worker = new Worker(WORKER, { workerData: inputs });
    const stop = () => void worker.terminate();
    signal.addEventListener('abort', stop, { once: true });
    worker.once('message', (result: EstimateResult) => resolve(result));
    worker.once('error', reject);
    worker.once('exit', (code) => {
      signal.removeEventListener('abort', stop);
      reject(
        signal.aborted
          ? (signal.reason as Error)
          : new Error(`The computing thread ended with code ${code}.`),
      );
    });
  });
}
