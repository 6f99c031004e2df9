import type { SiteFlux } from '@siltlight/common/fields/site-ratio';
import { sliceMean } from '@siltlight/common/slices/slice-mean';
import type { Caution } from '@siltlight/common/physical/domain-error';
import type { SampleView } from '@siltlight/common/wire/datasets';
import type { SliceContent } from '@siltlight/common/wire/slices';
import type { WindowMean } from './field-content';

export type StoredSample = SampleView & { versionId: string; regionCode: string | null };

export interface SiteWindows {
  key: string;
  site: string;
  versionId: string;
  latitudeDeg: number;
  longitudeDeg: number;
  slice: WindowMean | null;
  reference: WindowMean | null;
  /** why the record cannot give a ratio at all, whatever its windows hold */
  notComparable: string | null;
  cautions: Caution[];
}

/** Size fraction that most records have: a field rests on one, because fractions are never averaged together. */
export function commonestSizeCutoff(samples: readonly StoredSample[]): string | null {
  const counts = new Map<string | null, Set<string>>();
  for (const { sizeCutoff, versionId, site } of samples) {
    const records = counts.get(sizeCutoff) ?? new Set();
    counts.set(sizeCutoff, records.add(`${versionId} ${site}`));
  }
  const ranked = [...counts].sort(
    (a, b) => b[1].size - a[1].size || String(a[0]).localeCompare(String(b[0])),
  );
  return ranked[0]?.[0] ?? null;
}

/** Mean fluxes of each record in the two windows. A record is one site of one dataset version. */
export function siteWindows(
  samples: readonly StoredSample[],
  slice: SliceContent,
  reference: SliceContent,
  sizeCutoff: string | null,
): SiteWindows[] {
  const records = new Map<string, StoredSample[]>();
  for (const sample of samples) {
    const key = `${sample.versionId} ${sample.site}`;
    const record = records.get(key);
    if (record) record.push(sample);
    else records.set(key, [sample]);
  }
  return [...records].map(([key, all]) => {
    const first = all[0]!;
    const { site, versionId, latitudeDeg, longitudeDeg } = first;
    const place = { key, site, versionId, latitudeDeg, longitudeDeg };
    const fit = all.filter((sample) => sample.quantity === 'dust' && sample.sizeCutoff === sizeCutoff);
    if (fit.length === 0)
      return { ...place, slice: null, reference: null, notComparable: whyNot(first), cautions: [] };
    const [inSlice, inReference] = [windowMean(fit, slice), windowMean(fit, reference)];
    return {
      ...place,
      slice: inSlice.mean,
      reference: inReference.mean,
      notComparable: null,
      cautions: [...inSlice.cautions, ...inReference.cautions].map(({ code, message }) => ({
        code,
        message: `${site}: ${message}`,
      })),
    };
  });
}

function windowMean(
  samples: StoredSample[],
  window: SliceContent,
): { mean: WindowMean | null; cautions: Caution[] } {
  const result = sliceMean(samples, { youngKaBp: window.windowYoungKa, oldKaBp: window.windowOldKa });
  if ('reason' in result) return { mean: null, cautions: [] };
  const { meanFluxGM2Yr, standardErrorGM2Yr, coverage, samples: used, cautions } = result;
  return { mean: { meanFluxGM2Yr, sigmaGM2Yr: standardErrorGM2Yr, coverage, samples: used }, cautions };
}

function whyNot({ quantity, sizeCutoff }: StoredSample): string {
  if (quantity !== 'dust') return `a proxy (${quantity}), not dust`;
  return `another size fraction (${sizeCutoff ?? 'not stated'})`;
}

export function siteFluxOf(record: SiteWindows): SiteFlux {
  const { key, site, latitudeDeg, longitudeDeg, slice, reference } = record;
  return {
    key,
    site,
    latitudeDeg,
    longitudeDeg,
    sliceFluxGM2Yr: slice?.meanFluxGM2Yr ?? null,
    sliceSigmaGM2Yr: slice?.sigmaGM2Yr ?? null,
    referenceFluxGM2Yr: reference?.meanFluxGM2Yr ?? null,
    referenceSigmaGM2Yr: reference?.sigmaGM2Yr ?? null,
  };
}
