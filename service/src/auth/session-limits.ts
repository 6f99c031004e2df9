const MINUTE_MS = 60_000;

/** Ours, after NIST SP 800-63B AAL2: half an hour without a call, or half a day in all, ends a session. */
export const IDLE_MS = 30 * MINUTE_MS;
export const ABSOLUTE_MS = 12 * 60 * MINUTE_MS;

/** `last seen` is written at most once in this time, so that reading does not queue up writes. */
export const SEEN_EVERY_MS = MINUTE_MS;

/** Within this time after signing in, the password is not asked again for a new access token. */
export const FRESH_MS = 30 * MINUTE_MS;

export const isoAt = (ms: number): string => new Date(ms).toISOString();
