import { type ChildProcess, fork } from 'node:child_process';
import { once } from 'node:events';
import * as path from 'node:path';
import { Injectable, type OnApplicationShutdown } from '@nestjs/common';
import type { EstimateInputs } from '@siltlight/common/estimate/estimate-inputs';
import type { EstimateResult } from '@siltlight/common/estimate/estimate-result';
import { DomainError } from '@siltlight/common/physical/domain-error';
import type { ComputingAnswer } from './estimate.child';

/** The process runs plain JavaScript: the built file, from the sources' place as well as from the build's. */
const CHILD = path.join(__dirname, '../../dist/estimates/estimate.child.js');

/**
 * Computes in a process apart. A thread would be lighter, but ending one while its code is being optimised aborts the
 * whole of Node.js 20 (seen here: "Assertion failed: (data.first) != nullptr"), and with it the server.
 * One idle process is kept: a new one works out the region weights anew.
 */
@Injectable()
export class ComputingProcesses implements OnApplicationShutdown {
  private idle: ChildProcess | null = null;

  /** An abort ends the process and with it all that it held. */
  async compute(inputs: EstimateInputs, signal: AbortSignal): Promise<EstimateResult> {
    signal.throwIfAborted();
    const child = this.take();
    try {
      const answer = await answerOf(child, inputs, signal);
      await this.giveBack(child);
      if ('result' in answer) return answer.result;
      const { code, details, message } = answer.refused;
      throw new DomainError(code, details, message);
    } catch (error) {
      if (!(error instanceof DomainError)) await end(child);
      throw error;
    }
  }

  async onApplicationShutdown(): Promise<void> {
    const { idle } = this;
    this.idle = null;
    if (idle) await end(idle);
  }

  private take(): ChildProcess {
    const known = this.idle;
    this.idle = null;
    if (known?.connected) {
      known.ref();
      known.channel?.ref();
      return known;
    }
    // Nothing of the server's environment is needed, and no flag of a test runner or debugger.
    return fork(CHILD, { env: {}, execArgv: [], serialization: 'advanced' });
  }

  private async giveBack(child: ChildProcess): Promise<void> {
    if (this.idle) return end(child);
    // An idle process does not keep the server alive.
    child.unref();
    child.channel?.unref();
    this.idle = child;
  }
}

async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = once(child, 'exit');
  child.kill('SIGKILL');
  await gone;
}

function answerOf(
  child: ChildProcess,
  inputs: EstimateInputs,
  signal: AbortSignal,
): Promise<ComputingAnswer> {
  const over = new AbortController();
  const answer = new Promise<ComputingAnswer>((resolve, reject) => {
    const listen = (event: string, then: (...values: unknown[]) => void) => {
      child.once(event, then);
      over.signal.addEventListener('abort', () => child.off(event, then));
    };
    listen('message', (found) => resolve(found as ComputingAnswer));
    listen('error', (cause) => reject(new Error('The computing process failed.', { cause })));
    listen('exit', (code, by) =>
      reject(new Error(`The computing process ended with ${String(code ?? by)}.`)),
    );
    signal.addEventListener('abort', () => reject(signal.reason as Error), { signal: over.signal });
  });
  child.send(inputs);
  return answer.finally(() => over.abort());
}
