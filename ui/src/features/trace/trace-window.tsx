import type { SiteTrace } from '@siltlight/common/wire/slices';
import { Link } from 'react-router-dom';
import { Figure } from '../../shared/figure/figure';
import { Digits } from '../../shared/number/digits';
import { counted, formatAgeSpan, formatNumber, formatPercent } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import type { DataColumn } from '../../shared/table/column';
import { DataTable } from '../../shared/table/data-table';
import { cellAddress, cellPath } from './cell-link';

type Window = SiteTrace['windows'][number];
type Sample = Window['samples'][number];

function columnsFor(trace: SiteTrace, totalWeight: number): DataColumn<Sample>[] {
  const linked = (row: Sample, cell: string | null, raw: string) => (
    <Link to={cellPath(trace, { sheet: row.sheet, row: row.row, cell })}>
      {cellAddress({ sheet: row.sheet, row: row.row, cell })}
      <span className="sl-hidden"> holding {raw}</span>
    </Link>
  );
  return [
    {
      id: 'flux-cell',
      header: 'Flux cell',
      value: (row) => cellAddress({ sheet: row.sheet, row: row.row, cell: row.fluxCell }),
      cell: (row) => linked(row, row.fluxCell, row.fluxRaw),
    },
    {
      id: 'flux-raw',
      header: 'As written',
      value: (row) => row.fluxRaw,
      cell: (row) => <code className="trace-raw">{row.fluxRaw}</code>,
      align: 'right',
    },
    { id: 'rule', header: 'Rule', value: (row) => row.fluxRule, wideOnly: true },
    {
      id: 'flux',
      header: 'Flux',
      unit: 'g m-2 yr-1',
      heading: (
        <>
          Flux, <Unit of="g m-2 yr-1" />
        </>
      ),
      value: (row) => row.fluxGM2Yr,
      cell: (row) => <Digits value={row.fluxGM2Yr} figures={4} />,
      align: 'right',
    },
    {
      id: 'age-cell',
      header: 'Age cell',
      value: (row) => cellAddress({ sheet: row.sheet, row: row.row, cell: row.ageCell }),
      cell: (row) => linked(row, row.ageCell, row.ageRaw),
      wideOnly: true,
    },
    {
      id: 'age-raw',
      header: 'As written',
      value: (row) => row.ageRaw,
      cell: (row) => <code className="trace-raw">{row.ageRaw}</code>,
      align: 'right',
      wideOnly: true,
    },
    { id: 'age', header: 'Age, ka', value: (row) => row.ageKaBp, align: 'right' },
    {
      id: 'weight',
      header: 'Weight',
      value: (row) => row.weight,
      cell: (row) =>
        totalWeight > 0 ? formatPercent(row.weight / totalWeight, 1) : formatNumber(row.weight),
      align: 'right',
    },
  ];
}

/** The samples of one site inside one window, from the cell to its share in the mean. */
export function TraceWindow({ trace, window }: { trace: SiteTrace; window: Window }) {
  const total = window.samples.reduce((sum, sample) => sum + sample.weight, 0);
  return (
    <Figure
      plain
      title={window.sliceName}
      sub={`${formatAgeSpan(window.youngKa, window.oldKa)}, ${counted(window.samples.length, 'sample')}`}
      controls={
        window.meanFluxGM2Yr !== null && (
          <span className="sl-13">
            mean <Digits value={window.meanFluxGM2Yr} figures={4} /> <Unit of="g m-2 yr-1" />
          </span>
        )
      }
    >
      <DataTable
        bare
        caption={`Samples of ${trace.site} in ${window.sliceName}`}
        columns={columnsFor(trace, total)}
        rows={window.samples}
        rowKey={(row) => row.sampleId}
        startSort="age"
        heightPx={420}
        empty={
          <p className="sl-13 sl-muted">
            No sample of this site lies inside the window: no flux follows from it.
          </p>
        }
        foot="A sample weighs by the time it stands for inside the window."
      />
    </Figure>
  );
}
