import type { EstimateResult } from '@siltlight/common/wire/estimates';
import { formatNumber } from '../../shared/number/format';
import { Prose } from '../../shared/number/prose';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';

type Varied = EstimateResult['varied'][number];

const names: Record<string, string> = {
  singleScatteringAlbedo: 'Single-scattering albedo',
  asymmetry: 'Asymmetry parameter',
  transmittance: 'Transmittance above the dust',
  surfaceAlbedoFactor: 'Surface albedo, factor',
  cloudFractionFactor: 'Cloud fraction, factor',
  opticalDepthFactor: 'Base optical depth, factor',
  shortwaveEfficiencyWm2: 'Shortwave efficiency',
  longwaveEfficiencyWm2: 'Longwave efficiency',
};

/** An input's name in words; one not known here is taken apart at its capitals. */
export const inputName = (name: string) =>
  names[name] ?? name.replace(/([a-z])([A-Z])/g, '$1 $2').replace(/^./, (letter) => letter.toUpperCase());

const number = (id: 'low' | 'central' | 'high', header: string): DataColumn<Varied> => ({
  id,
  header,
  value: (row) => row[id],
  cell: (row) => formatNumber(row[id], { figures: 3 }),
  align: 'right',
});

const columns: DataColumn<Varied>[] = [
  {
    id: 'name',
    header: 'Input',
    value: (row) => inputName(row.name) + (row.unit === '1' ? '' : `, ${row.unit}`),
    cell: (row) => (
      <span className="sl-unit">
        {inputName(row.name)}
        {row.unit !== '1' && (
          <>
            , <Prose text={row.unit} />
          </>
        )}
      </span>
    ),
  },
  {
    id: 'shape',
    header: 'Shape',
    value: (row) => row.distribution,
    cell: (row) => <span className="sl-unit">{row.distribution}</span>,
    wideOnly: true,
  },
  number('low', 'Low'),
  number('central', 'Middle'),
  number('high', 'High'),
  { id: 'source', header: 'Source', value: (row) => row.source, wideOnly: true },
];

/** What was varied to make the interval. */
export const VariedTable = ({ varied }: { varied: Varied[] }) => (
  <DataTable
    caption="What was varied"
    sub="the interval covers these and nothing else"
    columns={columns}
    rows={varied}
    rowKey={(row) => row.name}
    empty={<p className="sl-13 sl-muted">Nothing was varied: the numbers carry no interval.</p>}
  />
);
