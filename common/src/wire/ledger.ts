import { z } from 'zod';
import { isoTime, pageOf, pageQuery, personMark } from './shared';

/** Who did what to which object; newest first. */
export const ledgerQuery = pageQuery.extend({
  objectKind: z.string().max(60).optional(),
  objectId: z.string().max(100).optional(),
  personId: z.string().max(100).optional(),
  verb: z.string().max(60).optional(),
});
export type LedgerQuery = z.infer<typeof ledgerQuery>;

export const ledgerEntry = z.object({
  position: z.number().int(),
  at: isoTime,
  /** null: the service itself */
  actor: personMark.nullable(),
  verb: z.string(),
  objectKind: z.string(),
  objectId: z.string(),
  objectTitle: z.string().nullable(),
  summary: z.string(),
  before: z.unknown(),
  after: z.unknown(),
  /** SHA-256 over the row and the hash of the row before */
  hash: z.string(),
});
export type LedgerEntryView = z.infer<typeof ledgerEntry>;

export const ledgerPage = pageOf(ledgerEntry);

/** The chain of hashes, walked from its beginning. */
export const ledgerCheck = z.object({
  intact: z.boolean(),
  rows: z.number().int(),
  head: z.string(),
  firstBroken: z.object({ position: z.number().int(), problem: z.string() }).nullable(),
});
export type LedgerCheck = z.infer<typeof ledgerCheck>;
