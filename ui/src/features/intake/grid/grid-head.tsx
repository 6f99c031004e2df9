import type { VirtualItem } from '@tanstack/react-virtual';
import { Unit } from '../../../shared/number/unit';
import type { GridColumn } from './columns';
import { HEAD_PX, ROW_HEAD_PX } from './grid-model';

type Props = { columns: readonly GridColumn[]; items: VirtualItem[]; widthPx: number };

/** Letter, field, heading and the way from its unit to the canonical one. */
export function GridHead({ columns, items, widthPx }: Props) {
  return (
    <div role="rowgroup" className="grid-head" style={{ width: widthPx, height: HEAD_PX }}>
      <div role="row" aria-rowindex={1}>
        <div role="columnheader" aria-colindex={1} className="grid-corner" style={{ width: ROW_HEAD_PX }}>
          <span className="sl-hidden">Row</span>
        </div>
        {items.map(({ index, start, size }) => (
          <ColumnHead key={index} column={columns[index]!} at={index} left={start} width={size} />
        ))}
      </div>
    </div>
  );
}

function ColumnHead({
  column,
  at,
  left,
  width,
}: {
  column: GridColumn;
  at: number;
  left: number;
  width: number;
}) {
  const { letter, heading, title } = column;
  return (
    <div
      role="columnheader"
      aria-colindex={at + 2}
      className={column.numeric ? 'grid-column right' : 'grid-column'}
      style={{ left, width }}
      title={heading || undefined}
    >
      <span className="grid-letter">{letter}</span>
      <b className={title === null ? 'unmapped' : undefined}>{title ?? 'not imported'}</b>
      <small>
        {heading && `“${heading}” `}
        <UnitWay column={column} />
      </small>
    </div>
  );
}

function UnitWay({ column: { title, unit, canonicalUnit } }: { column: GridColumn }) {
  if (title === null || (!unit && !canonicalUnit)) return null;
  if (!unit || unit === canonicalUnit) return <Unit of={canonicalUnit} />;
  return (
    <>
      <Unit of={unit} /> to <Unit of={canonicalUnit || '1'} />
    </>
  );
}
