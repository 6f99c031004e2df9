import type { PreparedEstimate } from './prepared-estimate';

/** What an estimate saw of a region. */
export interface RegionConditions {
  areaShare: number;
  opticalDepthSlice: number;
  opticalDepthReference: number;
  surfaceAlbedo: number;
  cloudFraction: number;
  /** mean of |latitude| over its area [°] */
  meanAbsoluteLatitudeDeg: number;
}

/** Area means of each region, "none" last, by the central inputs. */
export function regionConditions(prepared: PreparedEstimate): RegionConditions[] {
  const { geometry, backdrop, reference, ratios } = prepared;
  const sums = Array.from({ length: geometry.regionCount }, () => ({ albedo: 0, cloud: 0, latitude: 0 }));
  geometry.entryRows.forEach((row, entry) => {
    const sum = sums[geometry.entryRegions[entry]!]!;
    const { albedoLand, albedoOcean, cloudLand, cloudOcean } = backdrop[row]!;
    const land = geometry.land[entry]!;
    const ocean = geometry.ocean[entry]!;
    sum.albedo += land * albedoLand + ocean * albedoOcean;
    sum.cloud += land * cloudLand + ocean * cloudOcean;
    sum.latitude += (land + ocean) * Math.abs(geometry.latitudesDeg[row]!);
  });
  return sums.map((sum, region) => {
    const areaShare = geometry.regionArea[region]!;
    const opticalDepthReference = reference.clear[region * reference.size]! / areaShare;
    return {
      areaShare,
      opticalDepthReference,
      opticalDepthSlice: opticalDepthReference * Math.exp(ratios[region]!.lnRatio),
      surfaceAlbedo: sum.albedo / areaShare,
      cloudFraction: sum.cloud / areaShare,
      meanAbsoluteLatitudeDeg: sum.latitude / areaShare,
    };
  });
}
