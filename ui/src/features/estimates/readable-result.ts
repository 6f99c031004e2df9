import type { EstimateDetail, EstimateResult } from '@siltlight/common/wire/estimates';
import { regionTitle, withRegionNames } from '../../shared/map/region-name';

/** A result with its regions named as people read them, in rows and in cautions alike. */
export function readableResult(result: EstimateResult): EstimateResult {
  const names = new Map(result.regions.map(({ code, name }) => [code, regionTitle(name)]));
  const told = (cautions: EstimateResult['cautions']) =>
    cautions.map((caution) => ({ ...caution, message: withRegionNames(caution.message, names) }));
  return {
    ...result,
    cautions: told(result.cautions),
    regions: result.regions.map((region) => ({
      ...region,
      name: names.get(region.code)!,
      cautions: told(region.cautions),
    })),
  };
}

export const readableEstimate = (estimate: EstimateDetail): EstimateDetail => ({
  ...estimate,
  result: estimate.result && readableResult(estimate.result),
});
