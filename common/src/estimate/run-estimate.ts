import { criticalSingleScatteringAlbedo } from '../forcing/critical-albedo';
import { upscatterMean } from '../optics/upscatter';
import { EARTH_RADIUS_M } from '../physical/constants';
import { ar6Regions } from '../sphere/region-set';
import { distributionQuantile } from '../statistics/distributions';
import { equallyLikelyOutcomes } from '../statistics/quantile';
import { estimateCautions, regionCautions } from './estimate-cautions';
import type { EstimateInputs } from './estimate-inputs';
import type { EstimateGlobal, EstimateRegion, EstimateResult, VariedDescription } from './estimate-result';
import { directEffectOf, type FluxSamples, forcingOf, allSky, netForcings } from './forcing-triple';
import { centralValues } from './member-values';
import { monthlyForcing } from './monthly-forcing';
import { type PreparedEstimate, prepareEstimate } from './prepared-estimate';
import { type RegionConditions, regionConditions } from './region-conditions';
import { sampleFluxes } from './sample-fluxes';

/**
 * The whole chain from field, optics, light and backdrop to the instantaneous forcing at the top of the atmosphere,
 * positive when it warms, without rapid adjustments.
 *
 * Direct effect: with this air minus without aerosol. Forcing: direct effect of the slice minus that of the reference,
 * over one backdrop, each under its own orbit and sun. The optical depth of the reference is the base field, that of
 * the slice the base field times the region's ratio. The formulas are linear in a few sums over area and months
 * (`regionMoments`), so a member costs a dot product per region.
 *
 * @throws DomainError when an input is impossible or does not fit the method
 *
 * Limits: one species; backdrop and dust have no seasons, only the light has; the interval covers the inputs that were
 * varied and nothing else.
 */
export function runEstimate(inputs: EstimateInputs): EstimateResult {
  const prepared = prepareEstimate(inputs);
  const sampled = sampleFluxes(prepared);
  const conditions = regionConditions(prepared);
  const regions = describeRegions(prepared, sampled.regions, conditions);
  return {
    global: describeGlobal(prepared, sampled.global, conditions),
    outcomes: equallyLikelyOutcomes(netForcings(sampled.global), 50),
    monthly: monthlyForcing(prepared),
    criticalSingleScatteringAlbedo: criticalOverDust(inputs, conditions),
    regions,
    outside: describeOutside(prepared, sampled.regions),
    varied: describeVaried(inputs),
    cautions: estimateCautions(inputs, regions),
    record: { inputs, stepDeg: inputs.stepDeg ?? 2 },
  };
}

/** The same with few members, for a preview while values change. Its central values are those of the full run. */
export function previewEstimate(inputs: EstimateInputs): EstimateResult {
  const members = Math.min(128, inputs.ensemble.members);
  return runEstimate({ ...inputs, ensemble: { ...inputs.ensemble, members } });
}

function describeRegions(
  prepared: PreparedEstimate,
  samples: FluxSamples[],
  conditions: RegionConditions[],
): EstimateRegion[] {
  const { inputs, geometry } = prepared;
  return geometry.codes.map((code, index) => {
    const { siteCount, status, hatched } = inputs.field.regions.find((region) => region.code === code)!;
    const seen = { code, siteCount, status, hatched, ...conditions[index]! };
    return {
      ...seen,
      name: ar6Regions()[index]!.name,
      forcing: allSky(forcingOf(prepared, samples[index]!, 'all sky')),
      directEffect: allSky(directEffectOf(prepared, samples[index]!, 'all sky', 'slice')),
      directEffectReference: allSky(directEffectOf(prepared, samples[index]!, 'all sky', 'reference')),
      cautions: regionCautions(inputs, seen),
    };
  });
}

function describeOutside(prepared: PreparedEstimate, samples: FluxSamples[]): EstimateResult['outside'] {
  const none = samples[prepared.geometry.codes.length]!;
  return { areaShare: none.areaShare, forcing: allSky(forcingOf(prepared, none, 'all sky')) };
}

function describeGlobal(
  prepared: PreparedEstimate,
  samples: FluxSamples,
  conditions: RegionConditions[],
): EstimateGlobal {
  const mean = (depth: (region: RegionConditions) => number) =>
    conditions.reduce((sum, region) => sum + region.areaShare * depth(region), 0);
  const opticalDepthSlice = mean((region) => region.opticalDepthSlice);
  const opticalDepthReference = mean((region) => region.opticalDepthReference);
  const sphereM2 = 4 * Math.PI * EARTH_RADIUS_M ** 2;
  const burdenTg = (depth: number) =>
    ((depth / prepared.inputs.optics.massExtinctionM2PerG) * sphereM2) / 1e12;
  return {
    forcing: allSky(forcingOf(prepared, samples, 'all sky')),
    forcingClearSky: forcingOf(prepared, samples, 'clear sky'),
    directEffect: allSky(directEffectOf(prepared, samples, 'all sky', 'slice')),
    directEffectClearSky: directEffectOf(prepared, samples, 'clear sky', 'slice'),
    directEffectReference: allSky(directEffectOf(prepared, samples, 'all sky', 'reference')),
    opticalDepthSlice,
    opticalDepthReference,
    burdenSliceTg: burdenTg(opticalDepthSlice),
    burdenReferenceTg: burdenTg(opticalDepthReference),
  };
}

/** Over the ground as the reference's dust sees it: albedo weighted by area and optical depth. */
function criticalOverDust(inputs: EstimateInputs, conditions: RegionConditions[]): number | null {
  if (inputs.method === 'efficiency') return null;
  const dust = conditions.map((region) => region.areaShare * region.opticalDepthReference);
  const total = dust.reduce((sum, d) => sum + d, 0);
  const areaOnly = total === 0;
  const weights = areaOnly ? conditions.map((region) => region.areaShare) : dust.map((d) => d / total);
  const albedo = conditions.reduce((sum, region, i) => sum + weights[i]! * region.surfaceAlbedo, 0);
  return criticalSingleScatteringAlbedo(upscatterMean(inputs.optics.asymmetry), albedo);
}

function describeVaried(inputs: EstimateInputs): VariedDescription[] {
  const central = centralValues(inputs);
  return inputs.ensemble.parameters.map(({ name, distribution, unit, source }) => ({
    name,
    unit,
    distribution:
      'min' in distribution || 'max' in distribution ? `${distribution.kind}, cut` : distribution.kind,
    low: distributionQuantile(distribution, 0.05),
    central: central[name],
    high: distributionQuantile(distribution, 0.95),
    source,
  }));
}
