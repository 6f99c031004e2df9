export const MAX_ATTEMPTS = 10;
const FIRST_WAIT_MS = 30_000;
const LONGEST_WAIT_MS = 60 * 60 * 1000;
const JITTER = 0.2;

/**
 * Waits double from half a minute to an hour, give or take a fifth so that many mails do not come back at once:
 * about five hours in all until a mail counts as failed.
 */
export function waitBeforeAttempt(attemptsSoFar: number, random: number): number {
  const wait = Math.min(LONGEST_WAIT_MS, FIRST_WAIT_MS * 2 ** (attemptsSoFar - 1));
  return Math.round(wait * (1 + JITTER * (2 * random - 1)));
}

/** A server that answers 5xx has understood and refuses: asking again changes nothing (RFC 5321 §4.2.1, from memory). */
export function isFinal(error: unknown): boolean {
  const responseCode = (error as { responseCode?: unknown } | null)?.responseCode;
  return typeof responseCode === 'number' && responseCode >= 500;
}
