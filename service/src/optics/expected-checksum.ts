import { changedMeanwhile } from '../http/expected-version';
import { problem } from '../http/problem';

/**
 * The checksum of the draft that an edit was made from, out of If-Match.
 *
 * @throws Problem 428 when it is missing, 412 when it is no checksum
 */
export function expectedChecksum(ifMatch: string | undefined): string {
  if (ifMatch === undefined) {
    const detail =
      'Send the checksum of the draft that you changed, in If-Match: it keeps other changes safe.';
    throw problem(428, 'version-needed', 'Say which draft you changed', detail);
  }
  const checksum = /^"([0-9a-f]{64})"$/.exec(ifMatch.trim())?.[1];
  if (checksum === undefined) throw changedMeanwhile();
  return checksum;
}
