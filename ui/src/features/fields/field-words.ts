import type { FieldDetail, FieldRegion, FieldSite } from '@siltlight/common/wire/slices';
import { counted, formatNumber, formatPercent } from '../../shared/number/format';

const statuses: Record<FieldRegion['status'], string> = {
  sites: 'own sites',
  shrunk: 'drawn to the global ratio',
  global: 'global ratio, no site',
};

export const statusText = (region: Pick<FieldRegion, 'status'>) => statuses[region.status];

type Diagnostics = FieldDetail['diagnostics'];

/** τ² is a variance of ln ratios between regions; as a factor it can be pictured. */
export function spreadInWords({ tauSquared, iSquared, usedSites, regionsWithSites }: Diagnostics): string {
  const basis = `${counted(usedSites, 'site')} in ${counted(regionsWithSites, 'region')}`;
  if (tauSquared === 0) {
    return `${basis} agree within their own errors: no spread beyond them was found (τ² = 0).`;
  }
  const factor = formatNumber(Math.exp(Math.sqrt(tauSquared)), { figures: 2 });
  return `From ${basis}: ratios differ beyond their errors by a factor of about ${factor} (τ² = ${formatNumber(tauSquared, { figures: 2 })}); ${formatPercent(iSquared)} of the spread seen is real difference, not error (I²).`;
}

export const filledInWords = ({ areaByGlobalRatioShare }: Diagnostics) =>
  areaByGlobalRatioShare === 0
    ? 'Every region has a site of its own.'
    : `${formatPercent(areaByGlobalRatioShare)} of the Earth has no site of its own and takes the global ratio.`;

export const usedSites = (sites: readonly FieldSite[]) => sites.filter((site) => site.unusedReason === null);
export const unusedSites = (sites: readonly FieldSite[]) =>
  sites.filter((site) => site.unusedReason !== null);

const fraction = /^another size fraction \((.+)\)$/;

/** Size fractions met in the chosen versions: the one in use, and those that were set aside for it. */
export function fractionsMet(field: Pick<FieldDetail, 'sizeCutoff' | 'sites'>): string[] {
  const aside = field.sites.map((site) => fraction.exec(site.unusedReason ?? '')?.[1]);
  const met = [field.sizeCutoff, ...aside].filter(
    (text): text is string => typeof text === 'string' && text !== 'not stated',
  );
  return [...new Set(met)].sort((a, b) => a.localeCompare(b, 'en', { numeric: true }));
}

/** Where the samples behind a site's two fluxes are shown. */
export const tracePath = (fieldVersionId: string, site: Pick<FieldSite, 'site' | 'datasetSlug'>) =>
  `/fields/${fieldVersionId}/trace?${new URLSearchParams({ site: site.site, dataset: site.datasetSlug }).toString()}`;
