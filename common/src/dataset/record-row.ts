import type { TracedValue } from './sample-row';

/** What every row of a record has beside its values: where it stands, and each value's way from the file. */
export interface RecordBase {
  sheet: string;
  /** row number as a spreadsheet counts */
  row: number;
  cells: Record<string, TracedValue>;
}

/** A cell of a grid. */
export interface GriddedFieldRow extends RecordBase {
  kind: 'gridded-field';
  latitudeDeg: number | null;
  longitudeDeg: number | null;
  /** 1 to 12; null: the mean of the year */
  month: number | null;
  /** what the value is of, as its heading or the sheet says */
  quantity: string;
  unit: string | null;
  gridValue: number | null;
  gridSigma: number | null;
}

export interface BackdropTableRow extends RecordBase {
  kind: 'backdrop-table';
  region: string | null;
  latitudeDeg: number | null;
  latitudeSouthDeg: number | null;
  latitudeNorthDeg: number | null;
  month: number | null;
  surfaceAlbedo: number | null;
  cloudFraction: number | null;
  temperatureK: number | null;
}

export interface RefractiveIndexRow extends RecordBase {
  kind: 'refractive-index';
  material: string | null;
  wavelengthNm: number | null;
  realPart: number | null;
  /** |k| of m = n − ik, never negative */
  imaginaryPart: number | null;
  humidityClass: string | null;
}

export interface OpticalSetRow extends RecordBase {
  kind: 'optical-set';
  aerosolSpecies: string | null;
  wavelengthNm: number | null;
  massExtinctionM2G: number | null;
  singleScatteringAlbedo: number | null;
  asymmetry: number | null;
  angstromExponent: number | null;
  effectiveRadiusUm: number | null;
}

export interface GasRecordRow extends RecordBase {
  kind: 'gas-record';
  site: string | null;
  /** age of the air [ka before 1950 CE] */
  ageKaBp: number | null;
  ageSigmaKa: number | null;
  depthM: number | null;
  co2Ppm: number | null;
  co2SigmaPpm: number | null;
  ch4Ppb: number | null;
  ch4SigmaPpb: number | null;
  n2oPpb: number | null;
  n2oSigmaPpb: number | null;
}

export interface AgeSeriesRow extends RecordBase {
  kind: 'age-series';
  /** heading of the column the value comes from; "event" where a row only dates one */
  quantity: string;
  unit: string | null;
  event: string | null;
  ageKaBp: number | null;
  ageSigmaKa: number | null;
  depthM: number | null;
  seriesValue: number | null;
  seriesSigma: number | null;
}

export type RecordRow =
  GriddedFieldRow | BackdropTableRow | RefractiveIndexRow | OpticalSetRow | GasRecordRow | AgeSeriesRow;
