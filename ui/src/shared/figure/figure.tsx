import { useId, useRef, useState, type ReactNode } from 'react';
import type { DataColumn } from '../table/column';
import { DataTable } from '../table/data-table';
import { FigureTools } from './figure-tools';
import './figure.css';

export type FigureTable<Row extends object> = {
  columns: readonly DataColumn<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
};

type Props<Row extends object> = {
  title: string;
  sub?: ReactNode;
  /** Controls in the head: tabs between SW, LW and net, a choice of projection. */
  controls?: ReactNode;
  /** The figure in words: for those who cannot see it, and as its accessible name. */
  summary?: string;
  /** The data behind the drawing; gives "as table", copy and CSV. */
  table?: FigureTable<Row>;
  /** Set when the figure draws itself for files (a map on canvas); else its SVG is taken as it stands. */
  picture?: (kind: 'png' | 'svg') => Promise<Blob>;
  /** No drawing to save: a plain section with the head of a figure. */
  plain?: boolean;
  note?: ReactNode;
  className?: string;
  children: ReactNode;
};

/** A figure of a page: rule, title with unit, tools at the right, the drawing or its table. */
export function Figure<Row extends object>(props: Props<Row>) {
  const { title, sub, controls, summary, table, plain, note, className, children } = props;
  const [asTable, setAsTable] = useState(false);
  const body = useRef<HTMLDivElement>(null);
  const summaryId = useId();
  return (
    <figure
      className={className ? `figure ${className}` : 'figure'}
      aria-label={title}
      aria-describedby={summary ? summaryId : undefined}
    >
      <header>
        <h3>{title}</h3>
        {sub && <span className="figure-sub">{sub}</span>}
        <span className="sl-grow" />
        {controls}
        {!plain && <FigureTools {...{ title, table, asTable, setAsTable, body }} picture={props.picture} />}
      </header>
      {summary && (
        <p id={summaryId} className="sl-hidden">
          {summary}
        </p>
      )}
      <div ref={body}>
        {asTable && table ? (
          <DataTable
            bare
            caption={title}
            heightPx={380}
            empty={<p className="sl-muted">No data.</p>}
            {...table}
          />
        ) : (
          children
        )}
      </div>
      {note && <figcaption className="figure-note">{note}</figcaption>}
    </figure>
  );
}
