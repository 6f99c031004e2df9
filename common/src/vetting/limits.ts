import type { Archive } from './archive';

/** What stewards changed of one rule: for all archives, and for one archive over that. Absent: the rule's default. */
export interface RuleLimits {
  all?: Record<string, number>;
  byArchive?: Partial<Record<Archive, Record<string, number>>>;
}

/** Changed limits by rule id. Reason and version of a change are kept with it, outside of vetting. */
export type StewardLimits = Record<string, RuleLimits>;

/**
 * The limits of a rule: its defaults, over them the stewards' for all archives, over them those for one archive.
 *
 * @param archive of the row or site in question; absent or null: the limits for all archives
 */
export function limitsOf<T extends Record<string, number>>(
  context: { limits: StewardLimits },
  id: string,
  defaults: T,
  archive: Archive | null = null,
): T {
  const changed = context.limits[id];
  if (changed === undefined) return defaults;
  const own = archive === null ? undefined : changed.byArchive?.[archive];
  return { ...defaults, ...(changed.all as Partial<T>), ...(own as Partial<T> | undefined) };
}
