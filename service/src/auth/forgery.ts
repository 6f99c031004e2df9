import type { Request } from 'express';
import { problem } from '../http/problem';
import { sameText } from './secret-token';
import { csrfTokenOf } from './signing-keys';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/** A browser names the page that a changing call comes from; a foreign page has no business here, signed in or not. */
export function requireOwnOrigin(request: Request, publicUrl: string): void {
  const { origin } = request.headers;
  if (SAFE.has(request.method) || origin === undefined) return;
  // The browser's own word, which no page can set: a development proxy in between changes Host, not this.
  if (request.headers['sec-fetch-site'] === 'same-origin') return;
  const own = [new URL(publicUrl).host, request.headers.host];
  if (URL.canParse(origin) && own.includes(new URL(origin).host)) return;
  throw problem(
    403,
    'foreign-origin',
    'Not from another page',
    'Changes are taken only from pages of this service.',
  );
}

/** A changing call with a cookie must carry the header that no foreign form can send. */
export function requireProofAgainstForgery(request: Request, sessionId: string, secret: string): void {
  if (SAFE.has(request.method)) return;
  const given = request.get('x-csrf-token');
  if (given !== undefined && sameText(given, csrfTokenOf(sessionId, secret))) return;
  const detail = 'Send the header X-CSRF-Token with the token from sign-in or from GET /api/v1/auth/session.';
  throw problem(403, 'csrf-token-needed', 'The call lacks its proof of origin', detail);
}
