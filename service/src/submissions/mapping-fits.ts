import type { Mapping, TableProposal } from '@siltlight/common/sheet/mapping';
import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import { problem, type ProblemError } from '../http/problem';

/** @throws Problem 422 that points at every table, column and constant which the file has no place for */
export function requireFits(mapping: Mapping, workbook: RawWorkbook, at = ''): void {
  const rowCounts = new Map(workbook.sheets.map(({ name, rows }) => [name, rows.length]));
  const onUnknownSheet = (list: 'tables' | 'columns' | 'constants') =>
    mapping[list].flatMap(({ sheet }, index) =>
      rowCounts.has(sheet) ? [] : [unknownSheet(`${at}/${list}/${index}/sheet`, sheet)],
    );
  const errors = [
    ...onUnknownSheet('tables'),
    ...mapping.tables.flatMap((table, index) =>
      rowsOutside(table, rowCounts.get(table.sheet), `${at}/tables/${index}`),
    ),
    ...onUnknownSheet('columns'),
    ...onUnknownSheet('constants'),
  ];
  if (errors.length === 0) return;
  throw problem(
    422,
    'mapping-does-not-fit',
    'The mapping does not fit the file',
    `${errors[0]!.message} Correct it and send it again.`,
    errors,
  );
}

function rowsOutside(table: TableProposal, rowCount: number | undefined, pointer: string): ProblemError[] {
  if (rowCount === undefined || !table.used) return [];
  const { firstRow, lastRow, headerRows, unitsRow, sheet } = table;
  const errors: ProblemError[] = [];
  if (firstRow > lastRow || lastRow > rowCount) {
    errors.push({
      pointer: `${pointer}/lastRow`,
      field: 'lastRow',
      value: lastRow,
      allowed: [firstRow, rowCount],
      message: `Rows ${firstRow} to ${lastRow} do not lie within the ${rowCount} rows of "${sheet}" in order.`,
    });
  }
  const heads = [
    ...headerRows.map((row, index) => ({ row, field: 'headerRows', place: `headerRows/${index}` })),
    ...(unitsRow === null ? [] : [{ row: unitsRow, field: 'unitsRow', place: 'unitsRow' }]),
  ];
  for (const { row, field, place } of heads.filter(({ row }) => row >= firstRow)) {
    errors.push({
      pointer: `${pointer}/${place}`,
      field,
      value: row,
      allowed: [1, firstRow - 1],
      message: `Row ${row} of "${sheet}" cannot be a heading: the data begin in row ${firstRow}.`,
    });
  }
  return errors;
}

const unknownSheet = (pointer: string, sheet: string): ProblemError => ({
  pointer,
  field: 'sheet',
  value: sheet,
  message: `The file has no sheet "${sheet}".`,
});
