import { type Caution, requireWithin } from '../physical/domain-error';

export interface SiteFlux {
  /** unique among the sites of a field, e.g. dataset and site name */
  key: string;
  site: string;
  latitudeDeg: number;
  longitudeDeg: number;
  /** mean flux in the window of the slice [g m⁻² yr⁻¹]; null: no sample there */
  sliceFluxGM2Yr: number | null;
  sliceSigmaGM2Yr?: number | null;
  referenceFluxGM2Yr: number | null;
  referenceSigmaGM2Yr?: number | null;
}

export interface SiteRatio {
  key: string;
  site: string;
  regionCode: string | null;
  ratio: number;
  lnRatio: number;
  lnRatioSe: number;
  cautions: Caution[];
}

export interface UnusedSite {
  key: string;
  site: string;
  regionCode: string | null;
  reason: 'no-slice-flux' | 'no-reference-flux';
}

/** Relative standard error of a mean flux that came without one (product choice; common practice, no source). */
export const ASSUMED_RELATIVE_ERROR = 0.3;

/** No flux is known better than its density and age model allow (product choice; common practice, no source). */
const LEAST_RELATIVE_ERROR = 0.05;

/**
 * ln(F_slice/F_reference) of one site with its standard error, σ² = Σ ln(1 + r²) over the two relative errors r.
 *
 * @throws DomainError for a flux that is not positive (a zero needs a stated detection limit first)
 */
export function ratioOf(site: SiteFlux, regionCode: string | null): SiteRatio | UnusedSite {
  const { key, site: name } = site;
  if (site.referenceFluxGM2Yr === null) return { key, site: name, regionCode, reason: 'no-reference-flux' };
  if (site.sliceFluxGM2Yr === null) return { key, site: name, regionCode, reason: 'no-slice-flux' };
  requireWithin(`${name}: sliceFluxGM2Yr`, site.sliceFluxGM2Yr, 'g m⁻² yr⁻¹', 1e-12, 1e9);
  requireWithin(`${name}: referenceFluxGM2Yr`, site.referenceFluxGM2Yr, 'g m⁻² yr⁻¹', 1e-12, 1e9);
  const lnRatio = Math.log(site.sliceFluxGM2Yr / site.referenceFluxGM2Yr);
  const variance =
    logVariance(site.sliceFluxGM2Yr, site.sliceSigmaGM2Yr) +
    logVariance(site.referenceFluxGM2Yr, site.referenceSigmaGM2Yr);
  const ratio = Math.exp(lnRatio);
  return {
    key,
    site: name,
    regionCode,
    ratio,
    lnRatio,
    lnRatioSe: Math.sqrt(variance),
    cautions: unusual(name, ratio),
  };
}

function logVariance(flux: number, sigma: number | null | undefined): number {
  const relative =
    typeof sigma === 'number' ? Math.max(LEAST_RELATIVE_ERROR, sigma / flux) : ASSUMED_RELATIVE_ERROR;
  return Math.log1p(relative * relative);
}

/** Vetting rule V38: the largest polar ratios are about 25. */
function unusual(name: string, ratio: number): Caution[] {
  if (ratio >= 0.1 && ratio <= 50) return [];
  const message = `${name}: slice over reference is ${Number(ratio.toPrecision(3))}, outside 0.1 to 50. Check units and windows.`;
  return [{ code: 'ratio-outside-usual', message }];
}
