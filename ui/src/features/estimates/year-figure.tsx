import type { EstimateResult } from '@siltlight/common/wire/estimates';
import { LineChart } from '../../shared/chart/line-chart';
import { Figure } from '../../shared/figure/figure';
import { formatForcing } from '../../shared/number/format';
import { ForcingUnit } from '../../shared/number/unit';
import type { DataColumn } from '../../shared/table/column';

type Month = NonNullable<EstimateResult['monthly']>[number];

const LETTERS = [...'JFMAMJJASOND'];
const names = 'January February March April May June July August September October November December'.split(
  ' ',
);

const column = (id: string, header: string, value: (row: Month) => number): DataColumn<Month> => ({
  id,
  header,
  unit: 'W m-2',
  value,
  cell: (row) => formatForcing(value(row)),
  align: 'right',
});

const columns: DataColumn<Month>[] = [
  { id: 'month', header: 'Month', value: (row) => row.month, cell: (row) => names[row.month - 1] },
  column('sw', 'SW', (row) => row.shortwaveWm2),
  column('lw', 'LW', (row) => row.longwaveWm2),
  column('net', 'Net', (row) => row.netWm2),
];

/** The global mean by month; methods without months say so instead. */
export function YearFigure({ monthly }: { monthly: EstimateResult['monthly'] }) {
  if (monthly === null) {
    return (
      <Figure plain title="Through the year">
        <p className="sl-13 sl-muted">This method has no months: the daily form of the thin layer has.</p>
      </Figure>
    );
  }
  const line = (name: string, of: (row: Month) => number) => ({
    name,
    points: monthly.map((row) => ({ x: row.month, y: of(row) })),
  });
  const strongest = monthly.reduce((a, b) => (Math.abs(b.netWm2) > Math.abs(a.netWm2) ? b : a));
  const summary = `Net forcing by month, strongest in ${names[strongest.month - 1]} with ${formatForcing(strongest.netWm2)} watts per square metre.`;
  return (
    <Figure
      title="Through the year"
      sub={
        <>
          global, <ForcingUnit />
        </>
      }
      summary={summary}
      table={{ columns, rows: monthly, rowKey: (row) => String(row.month) }}
    >
      <LineChart
        label={summary}
        signedY
        heightPx={176}
        xDomain={[1, 12]}
        xTicks={LETTERS.map((text, at) => ({ at: at + 1, text }))}
        series={[
          line('net', (row) => row.netWm2),
          line('LW', (row) => row.longwaveWm2),
          line('SW', (row) => row.shortwaveWm2),
        ]}
      />
    </Figure>
  );
}
