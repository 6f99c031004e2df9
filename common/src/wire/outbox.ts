import { z } from 'zod';
import { isoTime, pageOf, pageQuery } from './shared';

export const outboxState = z.enum(['waiting', 'sent', 'failed']);

/** Mail as it waits, was sent, or was given up; newest first. */
export const outboxQuery = pageQuery.extend({ state: outboxState.optional() });
export type OutboxQuery = z.infer<typeof outboxQuery>;

export const outboxMail = z.object({
  id: z.string(),
  mailKind: z.string(),
  to: z.string(),
  subject: z.string(),
  state: outboxState,
  attempts: z.number().int(),
  /** what the mail server said last */
  lastError: z.string().nullable(),
  createdAt: isoTime,
  nextAttemptAt: isoTime.nullable(),
  sentAt: isoTime.nullable(),
});
export type OutboxMail = z.infer<typeof outboxMail>;

export const outboxPage = pageOf(outboxMail);
