import { MONTHS } from './light-moments';
import { FLUX, FLUXES, memberCoefficients, memberFluxesInto } from './member-fluxes';
import { centralValues } from './member-values';
import type { PreparedEstimate } from './prepared-estimate';

export interface MonthlyForcing {
  /** 1 to 12: fixed arcs of 30° of solar longitude, named after the month they come nearest to today */
  month: number;
  /** length in the slice over that of the year */
  shareOfYear: number;
  shortwaveWm2: number;
  longwaveWm2: number;
  netWm2: number;
  /** net of each region, in the order of the geometry without "none" */
  regionNetWm2: number[];
}

/**
 * Forcing (slice minus reference, all sky) of each month by the central inputs, as the global mean and per region.
 * Months of slice and reference are the same arcs of solar longitude, each of its own true length. Null for methods
 * that know no months. Weighted by length they give back the annual mean of the direct effects, not exactly that of
 * their difference, because the lengths differ between the two orbits.
 */
export function monthlyForcing(prepared: PreparedEstimate): MonthlyForcing[] | null {
  const { inputs, geometry, ratios, slice, reference } = prepared;
  if (inputs.method === 'thin-layer' || inputs.method === 'efficiency') return null;
  const central = memberCoefficients(prepared, centralValues(inputs));
  const fluxes = new Float64Array(FLUXES);
  return Array.from({ length: MONTHS }, (_, month) => {
    const sums = { slice: slice.monthly[month]!, reference: reference.monthly[month]! };
    const regionNetWm2: number[] = [];
    let shortwaveWm2 = 0;
    let longwaveWm2 = 0;
    ratios.forEach(({ lnRatio }, region) => {
      memberFluxesInto(fluxes, 0, prepared, central, sums, region, Math.exp(lnRatio));
      const shortwave = difference(fluxes, 'shortwave');
      const longwave = difference(fluxes, 'longwave');
      shortwaveWm2 += shortwave;
      longwaveWm2 += longwave;
      if (region < geometry.codes.length)
        regionNetWm2.push((shortwave + longwave) / geometry.regionArea[region]!);
    });
    return {
      month: month + 1,
      shareOfYear: slice.shareOfYear[month]!,
      shortwaveWm2,
      longwaveWm2,
      netWm2: shortwaveWm2 + longwaveWm2,
      regionNetWm2,
    };
  });
}

function difference(fluxes: Float64Array, part: 'shortwave' | 'longwave'): number {
  const { slice, reference } = FLUX['all sky'][part];
  return fluxes[slice]! - fluxes[reference]!;
}
