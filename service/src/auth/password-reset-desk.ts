import { Injectable, type OnModuleDestroy } from '@nestjs/common';
import { Settings } from '../config/settings';
import { Problem } from '../http/problem';
import { PasswordChangeService } from './password-change.service';

const HOUR_MS = 3_600_000;
const MOST_PER_ADDRESS = 20;
const MOST_PER_ACCOUNT = 3;
const MOST_KEYS = 10_000;

/**
 * Takes requests for a reset link and deals with them after the answer has gone, so that its time tells nothing.
 * More than a few an hour for one account are dropped in silence (nobody's mailbox is flooded); many from one address
 * are refused.
 */
@Injectable()
export class PasswordResetDesk implements OnModuleDestroy {
  private readonly asked = new Map<string, number[]>();
  private readonly underWay = new Set<Promise<void>>();

  constructor(
    private readonly passwords: PasswordChangeService,
    private readonly settings: Settings,
  ) {}

  ask(email: string, address: string): void {
    if (this.count(`address ${address}`) > MOST_PER_ADDRESS) throw tooManyRequests();
    if (this.count(`account ${email}`) > MOST_PER_ACCOUNT) return;
    const work = this.passwords
      .sendResetLink(email)
      .catch((error: unknown) =>
        this.settings.log({ event: 'reset-link-failed', level: 'error', error: String(error) }),
      )
      .finally(() => this.underWay.delete(work));
    this.underWay.add(work);
  }

  /** Before the service stops, what was asked for is written. */
  async onModuleDestroy(): Promise<void> {
    await Promise.all(this.underWay);
  }

  private count(key: string): number {
    const now = Date.now();
    const recent = [...(this.asked.get(key) ?? []).filter((at) => now - at < HOUR_MS), now].slice(
      -MOST_PER_ADDRESS - 1,
    );
    this.asked.delete(key);
    this.asked.set(key, recent);
    if (this.asked.size > MOST_KEYS) this.asked.delete(this.asked.keys().next().value!);
    return recent.length;
  }
}

function tooManyRequests(): Problem {
  return new Problem(429, 'too-many-requests', 'Too many requests', {
    detail: 'Too many reset links were asked for from this address. Try again in an hour.',
    headers: { 'Retry-After': String(HOUR_MS / 1000) },
  });
}
