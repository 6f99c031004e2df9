import type { EstimateContent } from '../estimates/estimate-content';

export interface CitedDataset {
  slug: string;
  number: number;
  checksum: string;
  citation: string;
  /** SPDX identifier */
  licence: string | null;
}

/** What a file is made of. No clock and no identifier of the request: the same estimate gives the same bytes. */
export interface ExportSubject {
  runNumber: number;
  state: string;
  checksum: string;
  slice: { windowYoungKa: number; windowOldKa: number; orbitalAgeKa: number };
  content: EstimateContent;
  datasets: CitedDataset[];
}

/** Said in every file, so that nobody mistakes what it holds. */
export function standing({ state, content }: ExportSubject): string {
  const signed =
    state === 'published' ? 'Signed off by a second person and published.' : `Not published: ${state}.`;
  return content.invented ? `${signed} Rests on invented demo data: not for use.` : signed;
}

export const NOTES_ON_USE = [
  'Positive values mean energy gained by the Earth (downward); check the sign before adding to a model.',
  'Instantaneous, without rapid adjustments; dust alone.',
  'Do not impose together with the same dust in a model’s own radiation: it would count twice.',
  'Direct radiative effect (slice with this air minus without aerosol) and forcing (slice minus reference) are different kinds; do not mix them.',
  'The interval covers the inputs that were varied, not the choice of method or missing processes.',
  'For research; decisions need review by a qualified specialist.',
];
