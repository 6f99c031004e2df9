import { OutboxService } from '../../src/notifications/outbox.service';
import type { TestApp } from './test-app';

type Mail = Parameters<OutboxService['queue']>[0];

/** Looks over the shoulder of the outbox, which goes on as usual. */
export function mailsOf(service: TestApp): Mail[] {
  const mails: Mail[] = [];
  const outbox = service.app.get(OutboxService, { strict: false });
  const queue = outbox.queue.bind(outbox);
  outbox.queue = (mail, transaction) => {
    mails.push(mail);
    return queue(mail, transaction);
  };
  return mails;
}

export const tokenIn = (mail: Mail): string =>
  new URLSearchParams(mail.linkPath?.split('?')[1]).get('token') ?? '';

/** Waits for what the service does after its answer has gone. */
export async function eventually<T>(look: () => T | undefined): Promise<T> {
  for (let tries = 0; tries < 200; tries += 1) {
    const found = look();
    if (found !== undefined) return found;
    await new Promise((later) => setTimeout(later, 25));
  }
  throw new Error('It did not happen within five seconds.');
}
