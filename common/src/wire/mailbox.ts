import { z } from 'zod';
import { isoTime, pageOf, pageQuery } from './shared';

/** Mail that the demo's own mail server on loopback has received; there is no mailbox outside the demo. */
export const mailboxQuery = pageQuery;

export const mailSummary = z.object({
  id: z.string(),
  /** steady: a mail that was sent twice carries the same one */
  messageId: z.string(),
  from: z.string(),
  to: z.string(),
  subject: z.string(),
  receivedAt: isoTime,
});
export type MailSummary = z.infer<typeof mailSummary>;

export const mailView = mailSummary.extend({ text: z.string() });
export type MailView = z.infer<typeof mailView>;

export const mailboxPage = pageOf(mailSummary);
