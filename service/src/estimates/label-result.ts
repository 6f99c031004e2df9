import type { EstimateResult as Computed } from '@siltlight/common/estimate/estimate-result';
import type { EstimateResult } from '@siltlight/common/wire/estimates';

/** A result with its label: no number of it is to be read without. */
export function labelResult(computed: Computed): EstimateResult {
  const { global, outcomes, monthly, criticalSingleScatteringAlbedo, regions, outside, varied, cautions } =
    computed;
  const { inputs } = computed.record;
  return {
    label: {
      level: 'top of atmosphere',
      sky: 'all sky',
      kind: 'instantaneous, no rapid adjustments',
      sliceName: inputs.slice.name,
      referenceName: inputs.reference.name,
      processes: inputs.longwave ? 'dust alone, shortwave and longwave' : 'dust alone, shortwave only',
    },
    global,
    outcomes,
    monthly,
    criticalSingleScatteringAlbedo,
    regions,
    outside,
    varied,
    cautions,
  };
}
