import { Button, Input, Switch } from '@fluentui/react-components';
import { useEffect, useState } from 'react';
import { FormField } from '../../../shared/form/form-field';
import type { CellPlace } from '../changes';
import { readRows, setTable, type Table } from './mapping-edits';
import type { MappingDraft } from './use-mapping-draft';

type Props = {
  draft: MappingDraft;
  cursor: CellPlace;
  sheets: readonly { name: string; rowCount: number }[];
  onSheet: (sheet: string) => void;
};

/** Tables of each sheet: used or left alone, and which rows are heading, units and data. */
export function TablesList({ draft, cursor, sheets, onSheet }: Props) {
  return (
    <section aria-label="Tables">
      <h3>Tables</h3>
      <ul className="mapping-tables">
        {draft.mapping.tables.map((table, at) => (
          <li key={at} className={table.used ? 'used' : undefined}>
            <div className="sl-row">
              <Switch
                checked={table.used}
                label={table.used ? 'in use' : 'left alone'}
                aria-label={`Use the table of ${table.sheet}`}
                onChange={(_, data) => draft.edit(setTable(draft.mapping, at, { used: data.checked }))}
              />
              <b>{table.sheet}</b>
              <span className="sl-small sl-muted">
                of {sheets.find(({ name }) => name === table.sheet)?.rowCount ?? 0} rows
              </span>
              <span className="sl-grow" />
              {cursor.sheet !== table.sheet && (
                <Button size="small" appearance="transparent" onClick={() => onSheet(table.sheet)}>
                  Show
                </Button>
              )}
            </div>
            <p className="sl-small sl-muted">{table.reason}</p>
            {table.used && <TableRows draft={draft} table={table} at={at} cursor={cursor} />}
          </li>
        ))}
      </ul>
    </section>
  );
}

type RowsProps = { draft: MappingDraft; table: Table; at: number; cursor: CellPlace };

function TableRows({ draft, table, at, cursor }: RowsProps) {
  const set = (change: Partial<Table>) => draft.edit(setTable(draft.mapping, at, change));
  const here = cursor.sheet === table.sheet ? cursor.row : null;
  const fault = (part: string) => draft.faults.find(({ place }) => place === `table-${at}-${part}`)?.message;
  const one = (rows: number[]) => rows[0] ?? null;
  return (
    <div className="mapping-rows">
      <RowsField
        label="Header rows"
        rows={table.headerRows}
        fault={fault('headerRows')}
        here={here}
        several
        onRows={(headerRows) => set({ headerRows })}
      />
      <RowsField
        label="Units row"
        rows={table.unitsRow === null ? [] : [table.unitsRow]}
        fault={fault('unitsRow')}
        here={here}
        onRows={(rows) => set({ unitsRow: one(rows) })}
      />
      <RowsField
        label="First row"
        rows={[table.firstRow]}
        fault={fault('firstRow')}
        here={here}
        wanted
        onRows={(rows) => set({ firstRow: one(rows) ?? table.firstRow })}
      />
      <RowsField
        label="Last row"
        rows={[table.lastRow]}
        fault={fault('lastRow')}
        here={here}
        wanted
        onRows={(rows) => set({ lastRow: one(rows) ?? table.lastRow })}
      />
    </div>
  );
}

type FieldProps = {
  label: string;
  rows: readonly number[];
  fault?: string;
  /** row picked in the grid, taken over with one press */
  here: number | null;
  several?: boolean;
  wanted?: boolean;
  onRows: (rows: number[]) => void;
};

function RowsField({ label, rows, fault, here, several, wanted, onRows }: FieldProps) {
  const asText = rows.join(', ');
  const [text, setText] = useState(asText);
  useEffect(() => setText(asText), [asText]);
  const read = readRows(text);
  const wrong =
    read === null
      ? 'Write row numbers, such as 8 or 8, 9.'
      : !several && read.length > 1
        ? 'One row is wanted.'
        : wanted && read.length === 0
          ? 'A row is wanted.'
          : undefined;
  const commit = () => {
    if (read && !wrong && read.join(', ') !== asText) onRows(read);
  };
  return (
    <FormField name={label} label={label} fault={wrong ?? fault}>
      <Input
        size="small"
        value={text}
        onChange={(_, data) => setText(data.value)}
        onBlur={commit}
        onKeyDown={(event) => event.key === 'Enter' && commit()}
        contentAfter={
          here !== null && !rows.includes(here) ? (
            <button
              type="button"
              className="row-here"
              title={`Take row ${here}, picked in the grid`}
              aria-label={`${label}: take row ${here}, picked in the grid`}
              onClick={() => onRows(several ? [...rows, here].sort((a, b) => a - b) : [here])}
            >
              {here}
            </button>
          ) : undefined
        }
      />
    </FormField>
  );
}
