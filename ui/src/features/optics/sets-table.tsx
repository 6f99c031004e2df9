import type { ListedOpticalSet } from '@siltlight/common/wire/optics';
import { Link } from 'react-router-dom';
import { EmptyState } from '../../shared/feedback/empty-state';
import { formatNumber } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import { StateTag } from '../../shared/page/state-tag';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { basisWords, speciesWords } from './optics-words';

type Quantity = 'massExtinctionM2PerG' | 'singleScatteringAlbedo' | 'asymmetry';

const span = (id: Quantity, header: string, decimals: number): DataColumn<ListedOpticalSet> => ({
  id,
  header,
  ...(id === 'massExtinctionM2PerG' && {
    unit: 'm2 g-1',
    heading: (
      <>
        {header}, <Unit of="m2 g-1" />
      </>
    ),
  }),
  value: (set) => set[id].central,
  align: 'right',
  cell: (set) => (
    <span className="sl-unit">
      <b>{formatNumber(set[id].central, { decimals })}</b>{' '}
      <span className="sl-muted">
        {formatNumber(set[id].low, { decimals })} to {formatNumber(set[id].high, { decimals })}
      </span>
    </span>
  ),
});

const columns: DataColumn<ListedOpticalSet>[] = [
  {
    id: 'title',
    header: 'Optical set',
    value: (set) => set.title,
    cell: (set) => (
      <>
        <Link to={`/optics/${set.slug}`} className="optics-name">
          {set.title}
        </Link>{' '}
        {set.state === 'draft' && <StateTag state="draft" />}
      </>
    ),
  },
  { id: 'species', header: 'Species', value: (set) => speciesWords[set.species] },
  span('singleScatteringAlbedo', 'Albedo', 3),
  span('asymmetry', 'Asymmetry', 2),
  span('massExtinctionM2PerG', 'Extinction', 2),
  { id: 'basis', header: 'Basis', value: (set) => basisWords[set.basisKind], wideOnly: true },
  { id: 'evidence', header: 'Evidence', value: (set) => set.evidence, wideOnly: true },
  { id: 'source', header: 'Source', value: (set) => set.source, wideOnly: true },
];

/** Optical sets with their intervals; those of one's own that are not published yet come first. */
export function SetsTable({ sets }: { sets: readonly ListedOpticalSet[] }) {
  return (
    <DataTable
      roomy
      filterable
      caption="Optical sets"
      sub="middle value with its interval, in mid-visible light"
      address="optics-"
      columns={columns}
      rows={sets}
      rowKey={(set) => set.versionId}
      empty={<EmptyState title="No optical set is published yet.">Sets come with the service.</EmptyState>}
    />
  );
}
