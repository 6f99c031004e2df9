import { useEffect, useRef } from 'react';
import { counted } from '../../shared/number/format';
import type { SourceCells } from './queries';

type Props = { source: SourceCells; row: number; column: string };

/** Cells of the file round one row, as they were sent; the cell behind the number is marked and announced. */
export function SourceGrid({ source, row, column }: Props) {
  const marked = useRef<HTMLTableCellElement>(null);
  useEffect(() => {
    marked.current?.scrollIntoView({ block: 'center', inline: 'center' });
    marked.current?.focus({ preventScroll: true });
  }, [source, row, column]);
  const text = source.rows.find((one) => one.row === row)?.cells[column] ?? '';
  const [first, last] = [source.rows[0]?.row ?? row, source.rows.at(-1)?.row ?? row];
  return (
    <>
      <p className="source-said" role="status">
        Cell <b>{column + row}</b> of sheet “{source.sheet}” reads <b>{text || 'nothing'}</b>.{' '}
        <span className="sl-muted">
          Rows {first} to {last}, {counted(source.columns.length, 'column')}.
        </span>
      </p>
      <div className="source-scroll" tabIndex={0} role="region" aria-label={`Cells of ${source.sheet}`}>
        <table className="source-grid" aria-label={`Rows ${first} to ${last} of ${source.sheet}`}>
          <thead>
            <tr>
              <th scope="col">
                <span className="sl-hidden">Row</span>
              </th>
              {source.columns.map((letter) => (
                <th key={letter} scope="col" className={letter === column ? 'marked' : undefined}>
                  {letter}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {source.rows.map((one) => (
              <tr key={one.row} className={one.row === row ? 'marked' : undefined}>
                <th scope="row">{one.row}</th>
                {source.columns.map((letter) => {
                  const isMarked = one.row === row && letter === column;
                  return (
                    <td
                      key={letter}
                      ref={isMarked ? marked : undefined}
                      tabIndex={isMarked ? -1 : undefined}
                      className={isMarked ? 'marked' : undefined}
                      aria-current={isMarked || undefined}
                    >
                      {one.cells[letter] ?? ''}
                    </td>
                  );
                })}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  );
}
