import { Button } from '@fluentui/react-components';
import { ArrowDownload20Regular } from '@fluentui/react-icons';
import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { Link, useParams, useSearchParams, type LoaderFunctionArgs } from 'react-router-dom';
import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';
import { AgeFluxFigure } from '../features/holdings/age-flux-figure';
import { Citation } from '../features/holdings/citation';
import { datasetQuery, pathOfVersion, versionFile } from '../features/holdings/queries';
import { SamplesTable } from '../features/holdings/samples-table';
import { SitesFigure } from '../features/holdings/sites-figure';
import { Trail } from '../features/holdings/trail';
import { VersionsList } from '../features/holdings/versions-list';
import { WithdrawVersion } from '../features/holdings/withdraw-version';
import { Cautions } from '../shared/feedback/cautions';
import { counted } from '../shared/number/format';
import { formatDate } from '../shared/number/time';
import { Page } from '../shared/page/page';
import { StateTag } from '../shared/page/state-tag';
import '../features/holdings/holdings.css';

const numberOf = (text: string | undefined) => (text === undefined ? null : Number(text));

export const loader =
  (client: QueryClient) =>
  ({ params }: LoaderFunctionArgs) =>
    client.ensureQueryData(datasetQuery(params.slug!, numberOf(params.number)));

export default function HoldingsDataset() {
  const { slug, number } = useParams();
  const { data: detail } = useSuspenseQuery(datasetQuery(slug!, numberOf(number)));
  const [params, setParams] = useSearchParams();
  const asked = params.get('site') ?? '';
  const site = detail.sites.some((one) => one.site === asked) ? asked : '';
  const pick = (next: string) =>
    setParams(
      (before) => {
        const after = new URLSearchParams(before);
        if (next) after.set('site', next);
        else after.delete('site');
        return after;
      },
      { preventScrollReset: true },
    );
  const { version } = detail;
  const when = version.publishedAt ? ` of ${formatDate(version.publishedAt)}` : '';
  return (
    <Page
      title={detail.title}
      crumbs={[
        { label: 'Holdings', to: '/holdings' },
        number === undefined ? { label: detail.title } : { label: detail.title, to: `/holdings/${slug}` },
        ...(number === undefined ? [] : [{ label: `Version ${version.number}` }]),
      ]}
      state={<StateTag state={version.state} />}
      sub={`version ${version.number}${when} · ${counted(detail.sites.length, 'site')}, ${counted(detail.sampleCount, 'sample')}`}
      actions={
        <>
          {detail.rights.mayWithdraw && version.state !== 'withdrawn' && <WithdrawVersion detail={detail} />}
          <Button
            as="a"
            appearance="primary"
            icon={<ArrowDownload20Regular />}
            href={versionFile(slug!, version.number, 'content')}
            download={`${slug}-${version.number}.json`}
          >
            Download
          </Button>
        </>
      }
    >
      <Standing detail={detail} />
      <Trail detail={detail} />
      <div className="dataset-top">
        <SitesFigure sites={detail.sites} selected={site} onSelect={pick} />
        <AgeFluxFigure slug={slug!} number={version.number} site={site} />
        <VersionsList detail={detail} />
      </div>
      <div className="dataset-low">
        <SamplesTable slug={slug!} number={version.number} sites={detail.sites} site={site} onSite={pick} />
        <Citation detail={detail} />
      </div>
    </Page>
  );
}

/** A version that is not in force says so before all else, with the way to the one that is. */
function Standing({ detail: { slug, version, versions } }: { detail: DatasetVersionDetail }) {
  if (version.state === 'published') return null;
  const inForce = versions.find(({ state }) => state === 'published');
  const message =
    version.state === 'withdrawn'
      ? `Withdrawn: ${version.withdrawnReason ?? 'no reason was given'}`
      : 'A newer version is in force.';
  return (
    <div className="version-notice">
      <Cautions
        of={[{ code: version.state, message, strong: version.state === 'withdrawn' }]}
        label="Standing"
      />
      {inForce && (
        <p className="sl-13">
          In force: <Link to={pathOfVersion(slug, inForce.number)}>version {inForce.number}</Link>
        </p>
      )}
    </div>
  );
}
