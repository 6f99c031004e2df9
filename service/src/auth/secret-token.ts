import { createHash, randomBytes, timingSafeEqual } from 'node:crypto';

/** 256 random bits in URL-safe letters. */
export const newSecret = (prefix = ''): string => prefix + randomBytes(32).toString('base64url');

/** What is stored of a secret. Plain SHA-256 suffices: the secret is random, so there is nothing to guess. */
export const hashOfSecret = (secret: string): string => createHash('sha256').update(secret).digest('hex');

export function sameText(a: string, b: string): boolean {
  const left = createHash('sha256').update(a).digest();
  const right = createHash('sha256').update(b).digest();
  return timingSafeEqual(left, right);
}
