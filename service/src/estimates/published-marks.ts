import { type PublishedEstimate, PUBLISHED_ESTIMATES } from '@siltlight/common/tables/published-estimates';
import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import type { SliceContent } from '@siltlight/common/wire/slices';

type Mark = EstimateDetail['context']['published'][number];

/** Published global values for the slice: those of the same kind as marks, the others with the reason they are grey. */
export function publishedMarks(slice: SliceContent, reference: SliceContent): Mark[] {
  return PUBLISHED_ESTIMATES.flatMap((entry) => {
    const isOfSlice = ageInWords(entry.timeSlice) === slice.orbitalAgeKa;
    if (!isOfSlice || entry.value === null || entry.unit !== 'W m-2' || entry.region !== 'global') return [];
    return [markOf(entry, entry.value, reference)];
  });
}

function markOf(entry: PublishedEstimate, value: number, reference: SliceContent): Mark {
  return {
    id: entry.id,
    source: entry.source,
    quantity: entry.quantity,
    valueWm2: value,
    lowWm2: entry.low,
    highWm2: entry.high,
    evidence: entry.evidence,
    otherKind: otherKind(entry, reference),
    note: entry.note,
  };
}

const FORCING = ['instantaneous forcing', 'assessed forcing term'];

/** Only equal kinds are compared: quantity, agent, level, sky, spectrum and reference. */
function otherKind(entry: PublishedEstimate, reference: SliceContent): string | null {
  const differences = [
    FORCING.includes(entry.quantity) ? '' : `${entry.quantity}, not a forcing against a reference`,
    entry.forcingAgent === 'dust' ? '' : `of ${entry.forcingAgent}`,
    entry.level === 'TOA' ? '' : `at the ${entry.level}`,
    entry.sky === 'all-sky' ? '' : `${entry.sky}`,
    entry.spectral === 'net' ? '' : `${entry.spectral} alone`,
    entry.referenceState.toLowerCase() === reference.name.toLowerCase()
      ? ''
      : `against ${entry.referenceState}`,
    entry.processes === 'direct' ? '' : `processes: ${entry.processes}`,
  ].filter((difference) => difference !== '');
  return differences.length === 0 ? null : differences.join('; ');
}

/** "LGM 21 ka" → 21 */
function ageInWords(timeSlice: string): number | null {
  const found = /([\d.]+) ka$/.exec(timeSlice);
  return found ? Number(found[1]) : null;
}
