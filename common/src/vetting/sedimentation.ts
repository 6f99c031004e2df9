import type { SampleRow } from '../dataset/sample-row';
import { ageOf, depthOf } from './samples';

/** A sedimentation rate of one core: stated in its row, or between the sample above and this one. */
export interface SedimentationStep {
  row: SampleRow;
  rateCmKyr: number;
  stated: boolean;
}

/**
 * Sedimentation rates [cm kyr⁻¹] down a core. Where any row states its rate, only stated ones are given;
 * else rates are taken between neighbours in depth that differ in depth and in age.
 */
export function sedimentationSteps(core: readonly SampleRow[]): SedimentationStep[] {
  const stated = core.filter((row) => row.sedimentationRateCmKyr !== null);
  if (stated.length > 0) {
    return stated.map((row) => ({ row, rateCmKyr: row.sedimentationRateCmKyr!, stated: true }));
  }
  const dated = core.filter((row) => depthOf(row) !== null && ageOf(row) !== null);
  dated.sort((a, b) => depthOf(a)! - depthOf(b)!);
  return dated.slice(1).flatMap((row, i) => {
    const above = dated[i]!;
    const thicknessCm = (depthOf(row)! - depthOf(above)!) * 100;
    const timeKyr = ageOf(row)! - ageOf(above)!;
    return thicknessCm > 0 && timeKyr > 0 ? [{ row, rateCmKyr: thicknessCm / timeKyr, stated: false }] : [];
  });
}
