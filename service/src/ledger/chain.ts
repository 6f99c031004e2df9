import { canonicalJson, sha256 } from '../versions/canonical';
import type { LedgerRow } from './models/ledger-row';

/** What the first row points back to. */
export const CHAIN_START = '0'.repeat(64);

export type LedgerEntry = Pick<
  LedgerRow,
  | 'position'
  | 'at'
  | 'actorId'
  | 'verb'
  | 'objectKind'
  | 'objectId'
  | 'objectTitle'
  | 'summary'
  | 'before'
  | 'after'
  | 'previousHash'
>;

/** SHA-256 over the canonical form of everything in the row but the hash itself, the row before's hash included. */
export function hashOf(entry: LedgerEntry): string {
  const {
    position,
    at,
    actorId,
    verb,
    objectKind,
    objectId,
    objectTitle,
    summary,
    before,
    after,
    previousHash,
  } = entry;
  return sha256(
    canonicalJson({
      position,
      at,
      actorId,
      verb,
      objectKind,
      objectId,
      objectTitle,
      summary,
      before,
      after,
      previousHash,
    }),
  );
}
