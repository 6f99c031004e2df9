import { problem } from './problem';

/**
 * The version that an edit was made from: If-Match with the ETag, or `version` in the body.
 *
 * @throws Problem 428 when neither is given, 412 when If-Match cannot be read
 */
export function expectedVersion(ifMatch: string | undefined, inBody: number | undefined): number {
  if (ifMatch === undefined) {
    if (inBody !== undefined) return inBody;
    const detail =
      'Send the version that you changed, in If-Match or as "version": it keeps others’ changes safe.';
    throw problem(428, 'version-needed', 'Say which version you changed', detail);
  }
  const version = /^"(\d{1,15})"$/.exec(ifMatch.trim())?.[1];
  if (version === undefined) throw changedMeanwhile();
  return Number(version);
}

export const changedMeanwhile = () =>
  problem(
    412,
    'changed-meanwhile',
    'Somebody changed this meanwhile',
    'Read it again, then make your change once more.',
  );

export const versionTag = (version: number): string => `"${version}"`;
