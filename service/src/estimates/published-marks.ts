import { type PublishedEstimate, PUBLISHED_ESTIMATES } from '@siltlight/common/tables/published-estimates';
import type { EstimateDetail } from '@siltlight/common/wire/estimates';
import type { SliceContent } from '@siltlight/common/wire/slices';

/** Widths and the like, which have no place on an axis of values. */
const NO_VALUE = ['uncertainty span of forcing'];

type Mark = EstimateDetail['context']['published'][number];

export interface Compared {
  slice: Pick<SliceContent, 'orbitalAgeKa'>;
  reference: Pick<SliceContent, 'name'>;
  /** false: the estimate is of the shortwave alone */
  longwave: boolean;
}

/** Published global values for the slice: those of the same kind as marks, the others with the reason they are grey. */
export function publishedMarks(compared: Compared): Mark[] {
  return PUBLISHED_ESTIMATES.flatMap((entry) => {
    const isOfSlice = ageInWords(entry.timeSlice) === compared.slice.orbitalAgeKa;
    const isPlace = entry.unit === 'W m-2' && entry.region === 'global' && !NO_VALUE.includes(entry.quantity);
    if (!isOfSlice || !isPlace || entry.value === null) return [];
    return [markOf(entry, entry.value, compared)];
  });
}

function markOf(entry: PublishedEstimate, value: number, compared: Compared): Mark {
  return {
    id: entry.id,
    source: entry.source,
    quantity: entry.quantity,
    valueWm2: value,
    lowWm2: entry.low,
    highWm2: entry.high,
    evidence: entry.evidence,
    otherKind: otherKind(entry, compared),
    note: entry.note,
  };
}

const SPECTRA: Record<string, string> = { net: 'with longwave', SW: 'shortwave alone', LW: 'longwave alone' };

const FORCING = ['instantaneous forcing', 'assessed forcing term'];

/** Only equal kinds are compared: quantity, agent, level, sky, spectrum and reference. */
function otherKind(entry: PublishedEstimate, { reference, longwave }: Compared): string | null {
  const differences = [
    FORCING.includes(entry.quantity) ? '' : `${entry.quantity}, not a forcing against a reference`,
    entry.forcingAgent === 'dust' ? '' : `of ${entry.forcingAgent}`,
    entry.level === 'TOA' ? '' : `at the ${entry.level}`,
    entry.sky === 'all-sky' ? '' : `${entry.sky}`,
    entry.spectral === (longwave ? 'net' : 'SW') ? '' : (SPECTRA[entry.spectral] ?? entry.spectral),
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
