import type { JwtSignOptions } from '@nestjs/jwt';
import { ABSOLUTE_MS } from './session-limits';
import { keyFor } from './signing-keys';

/** A session's token names the session and its person; roles are never in it, they are read at each call. */
export interface SessionClaims {
  sub: string;
  sid: string;
  /** what the token is for: no other kind is taken for a session */
  kind: 'session';
  /** the person's token version at sign-in */
  version: number;
}

export const TOKEN_ALGORITHM = 'HS256';
export const TOKEN_ISSUER = 'siltlight';
export const TOKEN_AUDIENCE = 'siltlight-client';

export const sessionTokenOptions = (secret: string): JwtSignOptions => ({
  secret: keyFor('session', secret),
  algorithm: TOKEN_ALGORITHM,
  issuer: TOKEN_ISSUER,
  audience: TOKEN_AUDIENCE,
  expiresIn: ABSOLUTE_MS / 1000,
  notBefore: 0,
});

/** Whether a verified payload has everything that we put in: the library accepts tokens that never expire. */
export function isSessionClaims(payload: unknown): payload is SessionClaims {
  const { sub, sid, kind, version, exp, nbf } = (payload ?? {}) as Record<string, unknown>;
  const texts = [sub, sid].every((claim) => typeof claim === 'string' && claim !== '');
  const numbers = [version, exp, nbf].every((claim) => typeof claim === 'number');
  return kind === 'session' && texts && numbers;
}
