import { createHmac, hkdfSync } from 'node:crypto';

/** One key for each purpose, drawn from the configured secret, so that none can stand in for another. */
export function keyFor(purpose: 'session' | 'csrf', secret: string): Buffer {
  return Buffer.from(hkdfSync('sha256', secret, 'siltlight', purpose, 32));
}

/** The token that a form on a foreign page cannot know: bound to the session, kept nowhere. */
export const csrfTokenOf = (sessionId: string, secret: string): string =>
  createHmac('sha256', keyFor('csrf', secret)).update(sessionId).digest('base64url');
