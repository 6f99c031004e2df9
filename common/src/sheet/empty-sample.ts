import type { SampleRow } from '../dataset/sample-row';

/** A sample of which nothing is known yet. */
export function emptySample(sheet: string, row: number, quantity: string): SampleRow {
  return {
    sheet,
    row,
    quantity,
    site: null,
    latitudeDeg: null,
    longitudeDeg: null,
    archive: null,
    ageKaBp: null,
    ageYoungKaBp: null,
    ageOldKaBp: null,
    ageSigmaKa: null,
    depthM: null,
    depthTopM: null,
    depthBaseM: null,
    fluxGM2Yr: null,
    fluxSigmaGM2Yr: null,
    sizeCutoff: null,
    densityGCm3: null,
    sedimentationRateCmKyr: null,
    dustFraction: null,
    concentrationNgG: null,
    accumulationKgM2Yr: null,
    elevationM: null,
    waterDepthM: null,
    remark: null,
    cells: {},
  };
}
