/** One value of a row with its whole way from the file: the cell, its raw text, the canonical value and the rule between. */
export interface TracedValue {
  /** "F7" on the row's sheet; null for a form answer */
  cell: string | null;
  raw: string;
  /** the text after a mend, when there is one */
  mended?: string;
  value: number | string | null;
  /** canonical unit of `value`, '' for text and dimensionless */
  unit: string;
  /** how raw became value, e.g. "mg m-2 yr-1 × 0.001 = g m-2 yr-1" */
  rule: string;
  /** why there is no value though the cell is not empty */
  problem?: { code: string; message: string };
  /** "<0.02": the value is a detection limit, kept as such */
  belowDetection?: boolean;
}

/**
 * One sample of a dataset in canonical units, as vetting and storing see it.
 * null = missing or unreadable (then `cells[field].problem` says why).
 */
export interface SampleRow {
  sheet: string;
  /** row number as a spreadsheet counts */
  row: number;
  /** dust, nssCa, Fe …: a proxy is never called dust */
  quantity: string;
  site: string | null;
  latitudeDeg: number | null;
  longitudeDeg: number | null;
  archive: string | null;
  /** ka before 1950 CE; negative = later */
  ageKaBp: number | null;
  ageYoungKaBp: number | null;
  ageOldKaBp: number | null;
  ageSigmaKa: number | null;
  depthM: number | null;
  depthTopM: number | null;
  depthBaseM: number | null;
  fluxGM2Yr: number | null;
  /** one standard error */
  fluxSigmaGM2Yr: number | null;
  sizeCutoff: string | null;
  densityGCm3: number | null;
  /** sedimentation rate [cm kyr⁻¹] */
  sedimentationRateCmKyr: number | null;
  /** dust mass fraction 0 to 1 */
  dustFraction: number | null;
  /** concentration in ice [ng g⁻¹] */
  concentrationNgG: number | null;
  /** snow accumulation [kg m⁻² yr⁻¹] */
  accumulationKgM2Yr: number | null;
  elevationM: number | null;
  waterDepthM: number | null;
  remark: string | null;
  /** true: left out by a person, with the reason; stays visible, never enters a version */
  leftOut?: string;
  /** every mapped field of this row, also those with no property above */
  cells: Record<string, TracedValue>;
}
