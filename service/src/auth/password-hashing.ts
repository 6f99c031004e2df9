import { hash, verify } from '@node-rs/argon2';

/** argon2id (the library's default algorithm) at 19 MiB, two passes, one lane: OWASP Password Storage Cheat Sheet. */
const COST = { memoryCost: 19456, timeCost: 2, parallelism: 1 };

/** Hashing runs on the same few threads as the database driver: two at once leave it room. */
const AT_ONCE = 2;
let running = 0;
const waiting: (() => void)[] = [];

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (running >= AT_ONCE) await new Promise<void>((go) => waiting.push(go));
  else running += 1;
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running -= 1;
  }
}

export const hashPassword = (password: string): Promise<string> => inTurn(() => hash(password, COST));

let stranger: Promise<string> | undefined;

/**
 * Without a stored hash (unknown, invited or disabled person) the same work is done against a hash that
 * nothing matches, so that the answer takes as long.
 */
export async function passwordMatches(stored: string | null, password: string): Promise<boolean> {
  stranger ??= hash('nobody signs in with this', COST);
  const compared = stored ?? (await stranger);
  const matches = await inTurn(() => verify(compared, password));
  return stored !== null && matches;
}
