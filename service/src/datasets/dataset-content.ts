import type { SampleRow } from '@siltlight/common/dataset/sample-row';
import type { SubmissionMetadata } from '@siltlight/common/vetting/context';
import type { SampleCells } from './models/sample-row';

export const DATASET = 'dataset';

export interface DatasetSample {
  site: string;
  latitudeDeg: number;
  longitudeDeg: number;
  quantity: string;
  ageKaBp: number;
  ageYoungKaBp: number | null;
  ageOldKaBp: number | null;
  ageSigmaKa: number | null;
  depthM: number | null;
  fluxGM2Yr: number;
  fluxSigmaGM2Yr: number | null;
  sizeCutoff: string | null;
  sheet: string;
  row: number;
  cells: SampleCells;
}

/** Content of a dataset version: what is hashed. */
export interface DatasetContent {
  kind: 'dust-flux' | 'point-optical-depth';
  title: string;
  invented: boolean;
  metadata: SubmissionMetadata;
  grade: string | null;
  file: { fileName: string; sha256: string; bytes: number };
  submission: { id: string; number: string };
  contributor: { id: string; name: string };
  samples: DatasetSample[];
}

/**
 * The sample that a vetted row gives, or null for a row that has no place in a version: left out by a person, or
 * without site, position, age or flux.
 */
export function sampleOf(row: SampleRow, metadata: SubmissionMetadata): DatasetSample | null {
  const { site, latitudeDeg, longitudeDeg, ageKaBp, fluxGM2Yr } = row;
  if (row.leftOut !== undefined || site === null || latitudeDeg === null || longitudeDeg === null)
    return null;
  if (ageKaBp === null || fluxGM2Yr === null) return null;
  const { quantity, ageYoungKaBp, ageOldKaBp, ageSigmaKa, depthM, fluxSigmaGM2Yr, sheet } = row;
  return {
    site,
    latitudeDeg,
    longitudeDeg,
    quantity,
    ageKaBp,
    ageYoungKaBp,
    ageOldKaBp,
    ageSigmaKa,
    depthM,
    fluxGM2Yr,
    fluxSigmaGM2Yr,
    // The form answers for the whole file where the sheet has no such column.
    sizeCutoff: row.sizeCutoff ?? metadata.sizeCutoff ?? null,
    sheet,
    row: row.row,
    cells: cellsOf(row),
  };
}

function cellsOf(row: SampleRow): SampleCells {
  return Object.fromEntries(
    Object.entries(row.cells).map(([field, { cell, raw, mended, rule }]) => [
      field,
      { cell, raw, rule: mended === undefined ? rule : `mended to "${mended}"; ${rule}` },
    ]),
  );
}
