import { AsyncLocalStorage } from 'node:async_hooks';
import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Transaction } from 'sequelize';
import { Sequelize } from 'sequelize-typescript';
import { Problem } from '../http/problem';

const MAX_WAITING = 500;
const RETRY_AFTER_SECONDS = 2;

/**
 * The only way to write. One transaction at a time in this process: SQLite has one writer anyway, and a driver
 * thread that waits for the lock keeps the holder from getting a thread to commit on.
 * Work inside holds no network, parser or long sum: it delays every other writer.
 */
@Injectable()
export class WriteQueue {
  private tail: Promise<unknown> = Promise.resolve();
  private waiting = 0;
  private readonly inside = new AsyncLocalStorage<{ open: boolean }>();
  longestMs = 0;

  constructor(@InjectConnection() private readonly database: Sequelize) {}

  run<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
    if (this.inside.getStore()?.open) {
      // Waiting for oneself would never end.
      return Promise.reject(new Error('WriteQueue.run was called inside a write: pass the transaction on.'));
    }
    if (this.waiting >= MAX_WAITING) return Promise.reject(tooBusy());
    this.waiting += 1;
    const result = this.tail.then(() => this.perform(work));
    this.tail = result.catch(() => undefined);
    return result;
  }

  /** Resolves when every write asked for so far has ended; used when the service stops. */
  async drained(): Promise<void> {
    await this.tail;
  }

  private async perform<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
    const startedAt = performance.now();
    try {
      return await this.database.transaction((transaction) => this.marked(() => work(transaction)));
    } finally {
      this.waiting -= 1;
      this.longestMs = Math.max(this.longestMs, performance.now() - startedAt);
    }
  }

  /** The mark ends with the work: what a commit sets going, such as sending mail, may write again. */
  private async marked<T>(work: () => Promise<T>): Promise<T> {
    const mark = { open: true };
    try {
      return await this.inside.run(mark, work);
    } finally {
      mark.open = false;
    }
  }
}

function tooBusy(): Problem {
  return new Problem(503, 'too-busy', 'The service is busy', {
    detail: `More than ${MAX_WAITING} changes are waiting. Nothing was changed; try again in ${RETRY_AFTER_SECONDS} seconds.`,
    headers: { 'Retry-After': String(RETRY_AFTER_SECONDS) },
  });
}
