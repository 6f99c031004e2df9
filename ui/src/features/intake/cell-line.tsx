import { Button } from '@fluentui/react-components';
import { Comment16Regular, MoreHorizontal16Regular } from '@fluentui/react-icons';
import { formatNumber } from '../../shared/number/format';
import { Unit } from '../../shared/number/unit';
import type { GridRow } from './grid/grid-model';
import type { CellMark } from './grid/marks';
import { addressOf, rowKindWords, type RowKind } from './places';
import { SeverityIcon } from './severity';
import type { Bench } from './use-bench';

type Props = {
  bench: Bench;
  row: GridRow | undefined;
  kind: RowKind;
  mark: CellMark | undefined;
  onRowMenu: (rows: number[], target: HTMLElement) => void;
};

/** Beneath the grid: the picked cell in full, and how its raw text became its value. */
export function CellLine({ bench, row, kind, mark, onRowMenu }: Props) {
  const { place, detail, openQuery } = bench;
  const cell = row?.cells[place.column];
  const hasQuery = detail.queries.some(
    (query) => query.sheet === place.sheet && query.row === place.row && query.column === place.column,
  );
  return (
    <div className="cell-line">
      <b>{addressOf(place)}</b>
      <span className="cell-line-text">
        {kind === 'data' ? (
          <Chain cell={cell} />
        ) : (
          <>
            {cell?.text} <span className="sl-muted">is {rowKindWords[kind]}</span>
          </>
        )}
        {mark && (
          <span className={`cell-line-mark ${mark.worst}`}>
            <SeverityIcon severity={mark.worst} />
            {mark.messages[0]}
            {mark.messages.length > 1 && ` (and ${mark.messages.length - 1} more)`}
          </span>
        )}
      </span>
      {(detail.rights.mayDecide || hasQuery) && (
        <Button size="small" appearance="subtle" icon={<Comment16Regular />} onClick={() => openQuery(place)}>
          Query
        </Button>
      )}
      <Button
        size="small"
        appearance="subtle"
        icon={<MoreHorizontal16Regular />}
        aria-label={`Row ${place.row}: choices`}
        onClick={(event) => onRowMenu([place.row], event.currentTarget)}
      >
        Row
      </Button>
    </div>
  );
}

function Chain({ cell }: { cell: GridRow['cells'][string] | undefined }) {
  if (!cell) return <span className="sl-muted">empty</span>;
  const { text, mended, value, unit, rule, problem, formula } = cell;
  return (
    <>
      {mended === undefined ? (
        <span>“{text}”</span>
      ) : (
        <span>
          <del>{text || 'empty'}</del> <ins>{mended || 'empty'}</ins>
        </span>
      )}
      {formula && <span className="sl-muted"> ={formula}</span>}
      {value !== null && value !== undefined && (
        <b>
          {' is '}
          {typeof value === 'number' ? formatNumber(value, { decimals: decimalsOf(value) }) : value}
          {unit && (
            <>
              {'\u00a0'}
              <Unit of={unit} />
            </>
          )}
        </b>
      )}
      {rule && <span className="sl-muted"> {rule}</span>}
      {problem && <span className="cell-line-problem"> {problem}</span>}
    </>
  );
}

/** All decimals that a double's shortest text has, at most ten. */
const decimalsOf = (value: number) =>
  Math.min(10, Number(value.toPrecision(10)).toString().split('.')[1]?.replace(/e.*$/, '').length ?? 0);
