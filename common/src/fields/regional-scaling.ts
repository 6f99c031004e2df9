import { type Caution, DomainError, requireWithin } from '../physical/domain-error';
import { ar6Regions, regionAt } from '../sphere/region-set';
import { normalQuantile } from '../statistics/normal-quantile';
import { randomEffects, type RandomEffects } from '../statistics/random-effects';
import { ratioOf, type SiteFlux, type SiteRatio, type UnusedSite } from './site-ratio';

export interface RegionRatio {
  code: string;
  name: string;
  siteCount: number;
  /** slice over reference */
  ratio: number;
  lnRatio: number;
  lnRatioSe: number;
  /** 5 to 95 % */
  low: number;
  high: number;
  /** "sites": its own sites alone; "shrunk": drawn towards the global mean; "global": the global mean */
  status: 'sites' | 'shrunk' | 'global';
  /** fewer than three sites */
  hatched: boolean;
  /** how far the error of the global mean goes into this region, 0 to 1 */
  sharedLoad: number;
  /** the rest of the error, of this region alone */
  ownSe: number;
  sites: SiteRatio[];
  cautions: Caution[];
}

export interface RegionalScaling {
  /** every region of the set, in table order */
  regions: RegionRatio[];
  /** what regions without sites, and places in no region, take */
  global: Pick<RegionRatio, 'ratio' | 'lnRatio' | 'lnRatioSe' | 'low' | 'high' | 'sharedLoad' | 'ownSe'>;
  /** standard error of the global mean of ln R alone, which `sharedLoad` multiplies */
  sharedSe: number;
  unused: UnusedSite[];
  diagnostics: {
    tauSquared: number;
    q: number;
    iSquared: number;
    usedSites: number;
    regionsWithSites: number;
  };
  cautions: Caution[];
}

/** Below three sites a between-site variance cannot be estimated: ln 2 is taken as its root (product choice). */
const FALLBACK_BETWEEN_SD = Math.LN2;

/**
 * Ratio slice over reference of each region from its sites' ln(F_slice/F_reference).
 *
 * - global: precision-weighted mean over all sites with the between-site variance τ² of DerSimonian & Laird;
 * - three sites and more: the same within the region, with its own τ²;
 * - one or two: mean m with variance v (own errors and the global τ²), drawn towards the global mean μ by
 *   B = τ²/(τ² + v): ln R = B m + (1 − B) μ, variance B v + (1 − B)² se²(μ);
 * - none: μ with variance se²(μ) + τ², hatched.
 *
 * @param sites fluxes of both windows; a site without one of them is listed in `unused` and never enters
 * @throws DomainError when no site has both fluxes, a flux is not positive, or two sites have one key
 *
 * Limits: τ² over all sites stands for the variance between regions too; sites are taken as independent; intervals
 * are normal in ln R. Permuting the sites, or one factor on all fluxes, changes nothing.
 */
export function regionalScaling(sites: readonly SiteFlux[]): RegionalScaling {
  requireUniqueKeys(sites);
  const { used, unused } = sortOut(sites);
  if (used.length === 0) {
    throw new DomainError('no-usable-sites', {
      field: 'sites',
      value: `${sites.length} sites, none with a flux in both windows`,
      allowed: 'at least one site with a slice flux and a reference flux',
      remedy: 'Add a dataset whose sites have samples in both windows, or widen a window.',
    });
  }
  const overall = globalEffect(used);
  const regions = ar6Regions().map(({ code, name }) =>
    regionRatio(
      code,
      name,
      used.filter((site) => site.regionCode === code),
      overall,
    ),
  );
  return {
    regions,
    global: withoutSites(overall),
    sharedSe: overall.standardError,
    unused,
    diagnostics: {
      tauSquared: overall.betweenVariance,
      q: overall.q,
      iSquared: overall.iSquared,
      usedSites: used.length,
      regionsWithSites: regions.filter((region) => region.siteCount > 0).length,
    },
    cautions: overallCautions(used, unused),
  };
}

function sortOut(sites: readonly SiteFlux[]): { used: SiteRatio[]; unused: UnusedSite[] } {
  const used: SiteRatio[] = [];
  const unused: UnusedSite[] = [];
  // by key, so that sums do not depend on the order of rows
  for (const site of [...sites].sort((a, b) => (a.key < b.key ? -1 : 1))) {
    const result = ratioOf(site, regionAt(site.longitudeDeg, site.latitudeDeg));
    if ('reason' in result) unused.push(result);
    else used.push(result);
  }
  return { used, unused };
}

function globalEffect(used: SiteRatio[]): RandomEffects {
  const studies = used.map((site) => ({ estimate: site.lnRatio, variance: site.lnRatioSe ** 2 }));
  const estimated = randomEffects(studies);
  if (used.length >= 3) return estimated;
  return randomEffects(studies, Math.max(estimated.betweenVariance, FALLBACK_BETWEEN_SD ** 2));
}

function withoutSites(overall: RandomEffects): RegionalScaling['global'] {
  const ownSe = Math.sqrt(overall.betweenVariance);
  const lnRatioSe = Math.hypot(overall.standardError, ownSe);
  return { ...onScale(overall.mean, lnRatioSe), lnRatio: overall.mean, lnRatioSe, sharedLoad: 1, ownSe };
}

function regionRatio(code: string, name: string, sites: SiteRatio[], overall: RandomEffects): RegionRatio {
  const { lnRatio, sharedLoad, ownSe } = regionEstimate(sites, overall);
  const lnRatioSe = Math.sqrt(ownSe ** 2 + (sharedLoad * overall.standardError) ** 2);
  const status = sites.length === 0 ? 'global' : sites.length < 3 ? 'shrunk' : 'sites';
  const region = { code, name, siteCount: sites.length, status, hatched: sites.length < 3, sites } as const;
  const cautions = [...fewSites(code, sites.length), ...sites.flatMap((site) => site.cautions)];
  return { ...region, ...onScale(lnRatio, lnRatioSe), lnRatio, lnRatioSe, sharedLoad, ownSe, cautions };
}

function regionEstimate(sites: SiteRatio[], overall: RandomEffects) {
  const between = overall.betweenVariance;
  if (sites.length === 0) return { lnRatio: overall.mean, sharedLoad: 1, ownSe: Math.sqrt(between) };
  const studies = sites.map((site) => ({ estimate: site.lnRatio, variance: site.lnRatioSe ** 2 }));
  if (sites.length >= 3) {
    const own = randomEffects(studies);
    return { lnRatio: own.mean, sharedLoad: 0, ownSe: own.standardError };
  }
  const own = randomEffects(studies, between);
  const variance = own.standardError ** 2;
  const trust = between / (between + variance);
  return {
    lnRatio: trust * own.mean + (1 - trust) * overall.mean,
    sharedLoad: 1 - trust,
    ownSe: Math.sqrt(trust * variance),
  };
}

function onScale(lnRatio: number, se: number): { ratio: number; low: number; high: number } {
  const z = normalQuantile(0.95);
  return { ratio: Math.exp(lnRatio), low: Math.exp(lnRatio - z * se), high: Math.exp(lnRatio + z * se) };
}

function fewSites(code: string, count: number): Caution[] {
  if (count >= 3) return [];
  const message =
    count === 0
      ? `${code}: no site. It takes the global ratio.`
      : `${code}: ${count === 1 ? 'one site' : 'two sites'}. The ratio is drawn towards the global mean.`;
  return [{ code: count === 0 ? 'no-site-in-region' : 'few-sites', message }];
}

function overallCautions(used: SiteRatio[], unused: UnusedSite[]): Caution[] {
  const cautions = used.flatMap((site) => site.cautions);
  if (used.length < 3) {
    cautions.push({
      code: 'few-sites-overall',
      message: `Only ${used.length} of the sites have a flux in both windows: the spread between sites is assumed (a factor of two), not measured.`,
    });
  }
  if (unused.length > 0) {
    cautions.push({
      code: 'sites-not-used',
      message: `${unused.length} ${unused.length === 1 ? 'site has' : 'sites have'} no flux in one of the windows and gave no ratio.`,
    });
  }
  return cautions;
}

function requireUniqueKeys(sites: readonly SiteFlux[]): void {
  const seen = new Set<string>();
  for (const site of sites) {
    requireWithin('latitudeDeg', site.latitudeDeg, '°', -90, 90);
    if (seen.has(site.key)) {
      throw new DomainError('site-twice', {
        field: 'sites',
        value: site.key,
        allowed: 'each site once',
        remedy: 'Keep one dataset version per site, or average its records first.',
      });
    }
    seen.add(site.key);
  }
}
