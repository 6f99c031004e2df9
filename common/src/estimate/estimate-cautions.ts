import { criticalSurfaceAlbedo } from '../forcing/critical-albedo';
import { upscatterMean } from '../optics/upscatter';
import type { Caution } from '../physical/domain-error';
import { BACKDROP_SPLIT_CAUTION } from './backdrop-tiles';
import type { EstimateInputs } from './estimate-inputs';
import type { RegionConditions } from './region-conditions';

/** A region with what triggers cautions. */
export interface CautionedRegion extends RegionConditions {
  code: string;
  hatched: boolean;
  siteCount: number;
}

/**
 * Cautions that this run itself triggers, each once, naming the regions it is about.
 *
 * Thresholds of the thin layer were measured against an exact solver (checks/optics/FORMULAS.md §7); of the other
 * triggers each message says what it rests on.
 */
export function estimateCautions(inputs: EstimateInputs, regions: readonly CautionedRegion[]): Caution[] {
  return [
    ...evidenceCautions(regions),
    ...inputs.field.base.cautions,
    ...(inputs.method === 'efficiency' ? efficiencyCautions() : formulaCautions(inputs, regions)),
    ...methodCautions(inputs),
    ...longwaveCautions(inputs),
    BACKDROP_SPLIT_CAUTION,
    coverageCaution(inputs),
  ];
}

function evidenceCautions(regions: readonly CautionedRegion[]): Caution[] {
  const hatched = regions.filter((region) => region.hatched);
  const area = (some: readonly CautionedRegion[]) => some.reduce((sum, region) => sum + region.areaShare, 0);
  const share = area(hatched) / area(regions);
  const cautions: Caution[] = [];
  if (hatched.length > 0) {
    const empty = hatched.filter((region) => region.siteCount === 0).length;
    cautions.push({
      code: 'few-sites',
      message: `${hatched.length} of ${regions.length} regions rest on fewer than three sites, ${empty} of them on none.`,
    });
  }
  if (share > 0.3) {
    cautions.push({
      code: 'hatched-area',
      message: `${Math.round(100 * share)} % of the area is hatched: its ratio is filled by rule, not measured there.`,
    });
  }
  return cautions;
}

function formulaCautions(inputs: EstimateInputs, regions: readonly CautionedRegion[]): Caution[] {
  const { singleScatteringAlbedo, asymmetry } = inputs.optics;
  const critical = criticalSurfaceAlbedo(singleScatteringAlbedo, upscatterMean(asymmetry));
  const depth = (region: CautionedRegion) => Math.max(region.opticalDepthSlice, region.opticalDepthReference);
  const dark = (region: CautionedRegion) => region.surfaceAlbedo < 0.3;
  const list = [
    about(
      'thin-layer-far-beyond-range',
      regions,
      (r) => depth(r) > 0.3,
      'the thin layer is useless above an optical depth of 0.3 (overstates by half and more over dark ground)',
    ),
    about(
      'thin-layer-beyond-range',
      regions,
      (r) => depth(r) > 0.1 && depth(r) <= 0.3,
      'above an optical depth of 0.1 the thin layer overstates cooling over dark ground by 23 to 70 %',
    ),
    about(
      'thin-layer-note',
      regions,
      (r) => depth(r) > 0.03 && depth(r) <= 0.1 && dark(r),
      'at optical depths of 0.03 to 0.1 over dark ground the thin layer overstates cooling by 10 to 33 %',
    ),
    about(
      'near-sign-change',
      regions,
      (r) => Math.abs(r.surfaceAlbedo - critical) < 0.1,
      `the sign turns at a surface albedo of ${critical.toFixed(2)} with these optics (0.25 to 0.35 in observations and models), within 0.1 of the ground here`,
    ),
    about(
      'bright-ground',
      regions,
      (r) => r.surfaceAlbedo > 0.6,
      'over snow and ice the effect is a small difference of large terms and hangs on the single-scattering albedo',
    ),
    about(
      'cloudy-region',
      regions,
      (r) => r.cloudFraction > 0.75,
      'dust above cloud counts as nothing here; absorbing dust above bright cloud warms',
    ),
  ].flatMap((caution) => (caution ? [caution] : []));
  if (singleScatteringAlbedo < 0.85) {
    list.push({
      code: 'strong-absorption',
      message:
        'The formula was made for weakly absorbing particles; the single-scattering albedo is below 0.85.',
    });
  }
  list.push({
    code: 'uncalibrated-formula',
    message:
      'One-layer formula without calibration: with mid-visible optics over clear sea it gives −59 W m⁻² per unit optical ' +
      'depth where satellites see −33 ± 5 (Christopher & Jones 2008). Use broadband optics.',
  });
  return list;
}

function about(
  code: string,
  regions: readonly CautionedRegion[],
  applies: (region: CautionedRegion) => boolean,
  text: string,
): Caution | null {
  const codes = regions.filter(applies).map((region) => region.code);
  return codes.length === 0 ? null : { code, message: `${codes.join(', ')}: ${text}.` };
}

/** Cautions of one region alone, to show beside its number. */
export function regionCautions(inputs: EstimateInputs, region: CautionedRegion): Caution[] {
  const cautions: Caution[] = [];
  if (region.hatched) {
    cautions.push({
      code: region.siteCount === 0 ? 'no-site-in-region' : 'few-sites',
      message:
        region.siteCount === 0
          ? 'No site: the global ratio is taken.'
          : 'Fewer than three sites: the ratio is drawn towards the global mean.',
    });
  }
  if (inputs.method === 'thin-layer' && region.meanAbsoluteLatitudeDeg > 50) {
    cautions.push({
      code: 'half-day-high-latitude',
      message:
        'The half-day form hides sun angle and season; at this latitude it can be wrong in sign. Use the daily form.',
    });
  }
  if (inputs.method !== 'efficiency') {
    cautions.push(
      ...formulaCautions(inputs, [region]).filter((caution) => caution.message.startsWith(`${region.code}:`)),
    );
  }
  return cautions;
}

function methodCautions({ method }: EstimateInputs): Caution[] {
  if (method === 'thin-layer') {
    return [
      {
        code: 'half-day-per-region',
        message:
          'The half-day form is a global mean. Used for a region it is off by a factor of 0.5 to 2 even for thin dust, and ' +
          'in sign over bright ground at high latitude. Regions are to be read from the daily form.',
      },
    ];
  }
  if (method === 'simple-albedo') {
    return [
      {
        code: 'layer-surface-pair',
        message:
          'The albedo change is that of the thin layer and its surface, 2τ[ωβ(1−R)² − 2(1−ω)R], a mean over sun angles, ' +
          'applied to the insolation of each place and month.',
      },
    ];
  }
  return [];
}

function efficiencyCautions(): Caution[] {
  return [
    {
      code: 'efficiency-out-of-place',
      message:
        'An efficiency belongs to its place, season, sky, surface, size mix and optical-depth product (−50 or −37 W m⁻² in ' +
        'one region by the optical-depth source alone: Song et al. 2018). Here one number serves the globe.',
    },
  ];
}

function longwaveCautions({ longwave, method, shortwaveEfficiency }: EstimateInputs): Caution[] {
  if (longwave === null) {
    return [
      {
        code: 'longwave-off',
        message:
          'Longwave is left out, so the result is biased to cooling: over the tropical Atlantic it offsets about 30 % of ' +
          'the shortwave (Song et al. 2018).',
      },
    ];
  }
  const cautions = [
    {
      code: 'longwave-by-efficiency',
      message:
        'Longwave by efficiency hangs on layer height, surface temperature, water vapour and coarse share; glacial air was ' +
        'drier and colder, and present values may not carry over.',
    },
  ];
  const clearShortwave = method !== 'efficiency' || shortwaveEfficiency?.sky === 'clear';
  if (longwave.sky === 'all' && clearShortwave) {
    cautions.push({
      code: 'no-clear-sky-longwave',
      message:
        'The longwave efficiency belongs to all sky, so clear sky has a shortwave number only: skies are never mixed.',
    });
  }
  return cautions;
}

function coverageCaution({ ensemble }: EstimateInputs): Caution {
  const names: string[] = ensemble.parameters.map((parameter) => parameter.name);
  if (ensemble.varyRatios) names.push('ratio of each region');
  return {
    code: 'interval-covers-varied-inputs',
    message:
      names.length === 0
        ? 'No input was varied: there is no interval.'
        : `The interval covers only the inputs that were varied (${names.join(', ')}), not the choice of method or missing processes.`,
  };
}
