import * as path from 'node:path';
import { Worker } from 'node:worker_threads';
import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import type { EstimateInputs } from '@siltlight/common/estimate/estimate-inputs';
import type { EstimateResult } from '@siltlight/common/estimate/estimate-result';
import { DomainError } from '@siltlight/common/physical/domain-error';
import type { ComputingAnswer } from './estimate.worker';

/** Threads run plain JavaScript: the built file, from the sources' place as well as from the build's. */
const WORKER = path.join(__dirname, '../../dist/estimates/estimate.worker.js');

/** Computes apart from the main thread. One idle thread is kept: a new one works out the region weights anew. */
@Injectable()
export class ComputingThreads implements OnApplicationShutdown {
  private idle: Worker | null = null;

  /** An abort ends the thread and with it all that it held. */
  async compute(inputs: EstimateInputs, signal: AbortSignal): Promise<EstimateResult> {
    signal.throwIfAborted();
    const thread = this.take();
    try {
      const answer = await answerOf(thread, inputs, signal);
      await this.giveBack(thread);
      if ('result' in answer) return answer.result;
      const { code, details, message } = answer.refused;
      throw new DomainError(code, details, message);
    } catch (error) {
      if (!(error instanceof DomainError)) await thread.terminate();
      throw error;
    }
  }

  async onApplicationShutdown(): Promise<void> {
    await this.idle?.terminate();
    this.idle = null;
  }

  private take(): Worker {
    const thread = this.idle ?? new Worker(WORKER);
    this.idle = null;
    thread.ref();
    return thread;
  }

  private async giveBack(thread: Worker): Promise<void> {
    if (this.idle) {
      await thread.terminate();
      return;
    }
    thread.unref(); // an idle thread does not keep the process alive
    this.idle = thread;
  }
}

function answerOf(thread: Worker, inputs: EstimateInputs, signal: AbortSignal): Promise<ComputingAnswer> {
  const over = new AbortController();
  const answer = new Promise<ComputingAnswer>((resolve, reject) => {
    const once = (event: string, then: (value: unknown) => void) => {
      thread.once(event, then);
      over.signal.addEventListener('abort', () => thread.off(event, then));
    };
    once('message', (found) => resolve(found as ComputingAnswer));
    once('error', reject);
    once('exit', (code) => reject(new Error(`The computing thread ended with code ${String(code)}.`)));
    signal.addEventListener('abort', () => reject(signal.reason as Error), { signal: over.signal });
  });
  thread.postMessage(inputs);
  return answer.finally(() => over.abort());
}
