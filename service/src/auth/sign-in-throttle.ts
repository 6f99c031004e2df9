import { Injectable } from '@nestjs/common';
import { Problem } from '../http/problem';

interface Failures {
  count: number;
  lastMs: number;
  freeAtMs: number;
}

const FREE_TRIES = { account: 5, address: 30 };
const LONGEST_WAIT_MS = 60_000;
const FORGET_AFTER_MS = 15 * 60_000;
const MOST_KEYS = 20_000;
const MOST_WAITING = 50;

/**
 * Slows guessing by account and by address: a few free tries, then a wait that doubles up to a minute. A try during
 * the wait is not looked at and not counted, so nobody is locked out for good. Tries at one account go one after the
 * other, so that many at once cannot outrun the count. Kept in memory: a restart forgets, which costs little.
 */
@Injectable()
export class SignInThrottle {
  private readonly failures = new Map<string, Failures>();
  private readonly turns = new Map<string, { tail: Promise<unknown>; waiting: number }>();

  /** @param work answers whether the try was good; a try that throws counts as neither */
  async attempt(account: string, address: string, work: () => Promise<boolean>): Promise<boolean> {
    const keys = { account: `account ${account}`, address: `address ${address}` };
    return this.inTurn(keys.account, async () => {
      this.requireFree(keys.address);
      this.requireFree(keys.account);
      const good = await work();
      if (good) this.failures.delete(keys.account);
      else this.countFailure(keys);
      return good;
    });
  }

  private requireFree(key: string): void {
    const waitMs = (this.failures.get(key)?.freeAtMs ?? 0) - Date.now();
    // Longer than any wait we give: the clock was set back meanwhile, which is not the caller's fault.
    if (waitMs > 0 && waitMs <= LONGEST_WAIT_MS) throw tooManyTries(Math.ceil(waitMs / 1000));
  }

  private countFailure(keys: { account: string; address: string }): void {
    const now = Date.now();
    for (const kind of ['account', 'address'] as const) {
      const before = this.failures.get(keys[kind]);
      const count = before && now - before.lastMs < FORGET_AFTER_MS ? before.count + 1 : 1;
      const beyond = count - FREE_TRIES[kind];
      const waitMs = beyond < 0 ? 0 : Math.min(LONGEST_WAIT_MS, 1000 * 2 ** Math.min(beyond, 10));
      this.failures.delete(keys[kind]);
      this.failures.set(keys[kind], { count, lastMs: now, freeAtMs: waitMs === 0 ? 0 : now + waitMs });
    }
    while (this.failures.size > MOST_KEYS) this.failures.delete(this.failures.keys().next().value!);
  }

  private async inTurn<T>(key: string, work: () => Promise<T>): Promise<T> {
    const turn = this.turns.get(key) ?? { tail: Promise.resolve(), waiting: 0 };
    if (turn.waiting >= MOST_WAITING) throw tooManyTries(1);
    turn.waiting += 1;
    this.turns.set(key, turn);
    const result = turn.tail.then(work);
    turn.tail = result.catch(() => undefined);
    try {
      return await result;
    } finally {
      turn.waiting -= 1;
      if (turn.waiting === 0) this.turns.delete(key);
    }
  }
}

function tooManyTries(seconds: number): Problem {
  return new Problem(429, 'too-many-tries', 'Too many tries', {
    detail: `Wait ${seconds} ${seconds === 1 ? 'second' : 'seconds'}, then try again. The account is not locked.`,
    headers: { 'Retry-After': String(seconds) },
    members: { retryAfterSeconds: seconds },
  });
}
