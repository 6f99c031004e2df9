import type { SampleView } from '@siltlight/common/wire/datasets';
import { useQuery } from '@tanstack/react-query';
import { LineChart, type LineSeries } from '../../shared/chart/line-chart';
import { ErrorState } from '../../shared/feedback/error-state';
import { LoadingFigure } from '../../shared/feedback/loading';
import { Figure } from '../../shared/figure/figure';
import { Unit } from '../../shared/number/unit';
import type { DataColumn } from '../../shared/table/column';
import { plotQuery } from './queries';

const MOST_SERIES = 5;
const OTHERS = 'other';

const columns: DataColumn<SampleView>[] = [
  { id: 'site', header: 'Site', value: (sample) => sample.site },
  { id: 'size', header: 'Size', value: (sample) => sample.sizeCutoff },
  { id: 'age', header: 'Age', unit: 'ka BP', align: 'right', value: (sample) => sample.ageKaBp },
  {
    id: 'flux',
    header: 'Dust flux',
    unit: 'g m-2 yr-1',
    align: 'right',
    value: (sample) => sample.fluxGM2Yr,
  },
];

/** One series for each site, or for each size cut-off where one site is picked; the smallest ones are drawn together. */
export function seriesOf(samples: readonly SampleView[], site: string): LineSeries[] {
  const groups = new Map<string, SampleView[]>();
  for (const sample of samples) {
    const name = site === '' ? sample.site : (sample.sizeCutoff ?? sample.quantity);
    groups.set(name, [...(groups.get(name) ?? []), sample]);
  }
  const bySize = [...groups].sort((a, b) => b[1].length - a[1].length);
  const rest = bySize.slice(MOST_SERIES).flatMap(([, members]) => members);
  const shown = rest.length > 0 ? [...bySize.slice(0, MOST_SERIES), [OTHERS, rest] as const] : bySize;
  return shown.map(([name, members]) => ({
    name,
    marks: true,
    points: members
      .filter(({ fluxGM2Yr }) => fluxGM2Yr > 0)
      .map(({ ageKaBp, fluxGM2Yr }) => ({ x: ageKaBp, y: fluxGM2Yr }))
      .sort((a, b) => a.x - b.x),
  }));
}

type Props = { slug: string; number: number; site: string };

/** Samples of the version over age; the flux on a logarithmic axis. */
export function AgeFluxFigure({ slug, number, site }: Props) {
  const { data, error, refetch } = useQuery(plotQuery(slug, number, site));
  const samples = data?.items ?? [];
  const series = seriesOf(samples, site).filter(({ points }) => points.length > 0);
  const without = samples.filter(({ fluxGM2Yr }) => fluxGM2Yr <= 0).length;
  return (
    <Figure
      title="Dust flux against age"
      sub={
        <>
          log axis, <Unit of="g m-2 yr-1" />
          {site && `; ${site}`}
        </>
      }
      summary={`Dust flux of ${samples.length} samples over their age in ka before 1950.`}
      table={{ columns, rows: samples, rowKey: (sample) => sample.id }}
      note={noteOf(data?.total ?? 0, samples.length, without)}
    >
      {error && <ErrorState error={error} retry={() => void refetch()} />}
      {!error && !data && <LoadingFigure height={286} label="Loading the samples" />}
      {data && (
        <LineChart
          logY
          series={series}
          label={`Dust flux against age, ${samples.length} samples`}
          heightPx={286}
          xTitle="age, ka before 1950"
        />
      )}
    </Figure>
  );
}

function noteOf(total: number, drawn: number, without: number): string | undefined {
  const parts = [
    total > drawn && `The first ${drawn} of ${total} samples; pick a site to see all of it.`,
    without > 0 && `${without} at or below zero have no place on a logarithmic axis.`,
  ].filter(Boolean);
  return parts.length > 0 ? parts.join(' ') : undefined;
}
