import type { EstimateDetail, EstimateResult } from '@siltlight/common/wire/estimates';
import { IntervalLadder } from '../../shared/chart/interval-ladder';
import { Figure } from '../../shared/figure/figure';
import { formatForcing } from '../../shared/number/format';
import type { DataColumn } from '../../shared/table/column';

type Mark = EstimateDetail['context']['published'][number];
type Props = { result: EstimateResult; published: Mark[] };

const columns: DataColumn<Mark>[] = [
  { id: 'source', header: 'Source', value: (row) => row.source },
  {
    id: 'value',
    header: 'Value',
    unit: 'W m-2',
    value: (row) => row.valueWm2,
    cell: (row) => formatForcing(row.valueWm2),
    align: 'right',
  },
  { id: 'low', header: 'Low', unit: 'W m-2', value: (row) => row.lowWm2, align: 'right' },
  { id: 'high', header: 'High', unit: 'W m-2', value: (row) => row.highWm2, align: 'right' },
  { id: 'kind', header: 'Kind', value: (row) => row.otherKind ?? 'the same kind' },
  { id: 'evidence', header: 'Evidence', value: (row) => row.evidence },
];

const isFromMemory = (mark: Mark) => mark.evidence !== 'seen';

/** Published values of the same kind as marks; others are greyed and say why. */
export function PublishedFigure({ result, published }: Props) {
  const rungs = [
    { label: 'This estimate', ...result.global.forcing.netWm2, first: true },
    ...published.map((mark) => ({
      label: `${short(mark.source)}${isFromMemory(mark) ? ' *' : ''}`,
      value: mark.valueWm2,
      low: mark.lowWm2,
      high: mark.highWm2,
      other: mark.otherKind !== null,
    })),
  ];
  const others = published.filter((mark) => mark.otherKind !== null);
  return (
    <Figure
      title="Where published values lie"
      sub="same kind filled"
      table={{ columns, rows: published, rowKey: (row) => row.id }}
    >
      {published.length === 0 ? (
        <p className="sl-13 sl-muted">No published global value for this slice is on the list.</p>
      ) : (
        <>
          <IntervalLadder
            rungs={unlike(rungs)}
            unitInWords="watts per square metre"
            labelPx={132}
            rowPx={22}
            showValues={false}
          />
          <ul className="published-notes">
            {published.some(isFromMemory) && <li>* from memory, to be checked in the paper.</li>}
            {others.map((mark) => (
              <li key={mark.id}>
                {short(mark.source)}, {formatForcing(mark.valueWm2)}, greyed: {mark.otherKind}.
              </li>
            ))}
          </ul>
        </>
      )}
    </Figure>
  );
}

const short = (source: string) => source.replace(/ \((?:.*)\)$/, '').slice(0, 24);

/** Labels of a ladder are its keys: a second value of one source gets a number. */
function unlike<T extends { label: string }>(rungs: T[]): T[] {
  const seen = new Map<string, number>();
  return rungs.map((rung) => {
    const count = (seen.get(rung.label) ?? 0) + 1;
    seen.set(rung.label, count);
    return count === 1 ? rung : { ...rung, label: `${rung.label} (${count})` };
  });
}
