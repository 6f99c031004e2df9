import { type DatasetKind, fieldOf } from '../dataset/field';
import { decideNumberFormat } from '../units/number-format';
import { type ColumnGroup, columnGroups } from './column-groups';
import { cellAddress, type RawSheet, type RawWorkbook } from './grid';
import {
  belongs,
  type ColumnNote,
  type MappedColumn,
  mappedColumns,
  type NormaliseOptions,
} from './mapped-columns';
import type { Correction, Mapping, TableConstant, TableProposal } from './mapping';
import { type CellReading, columnReader, readCell } from './read-column';
import { shapeOf } from './row-kind';
import { turnedTable } from './turned';

/** The cells of one row that belong together: one value with all that goes with it. */
export interface RowReading {
  sheet: string;
  row: number;
  group: ColumnGroup;
  /** readings by field; values that hold for the whole table among them */
  fields: Map<string, CellReading>;
}

export interface TablesRead<T> {
  rows: T[];
  /** how often each code was taken as missing or below detection; "(empty)" counts empty value cells */
  missingCodes: Record<string, number>;
  /** what was decided for whole columns: number format, assumed datum, halved 2σ, unit that does not convert … */
  columnNotes: ColumnNote[];
}

/**
 * Reads every mapped cell of every used table, row by row, and makes of each row and value column what `build` does.
 * Totals, blank rows and rows without a number are passed over. Corrections lie over the raw text, which stays.
 * Linear in the number of cells; never throws on what a file holds.
 */
export function readTables<T>(
  workbook: RawWorkbook,
  kind: DatasetKind,
  mapping: Mapping,
  corrections: Correction[],
  options: NormaliseOptions,
  build: (reading: RowReading) => T,
): TablesRead<T> {
  const result: TablesRead<T> = { rows: [], missingCodes: {}, columnNotes: [] };
  const mends = new Map(
    corrections.map(({ sheet, row, column, text }) => [`${sheet}\u0000${column}${row}`, text]),
  );
  for (const [index, table] of mapping.tables.entries()) {
    const sheet = workbook.sheets.find((one) => one.name === table.sheet);
    if (!table.used || !sheet) continue;
    const turned = turnedTable(sheet, table, kind);
    const view = turned ?? { sheet, table };
    const columns = mappedColumns(view.sheet, view.table, index, kind, mapping, options, result.columnNotes);
    const constants = readConstants(
      mapping.constants.filter((one) => belongs(one, table, index)),
      kind,
      options,
    );
    const isBeside = mapping.tables.some((other) => other !== table && overlaps(other, table));
    readTable(
      { ...view, isTurned: turned !== null, isBeside, columns, constants, kind, mends },
      result,
      build,
    );
  }
  return result;
}

const overlaps = (a: TableProposal, b: TableProposal): boolean =>
  a.used && a.sheet === b.sheet && a.firstRow <= b.lastRow && b.firstRow <= a.lastRow;

type Constants = Map<string, CellReading>;

function readConstants(constants: TableConstant[], kind: DatasetKind, options: NormaliseOptions): Constants {
  const read: Constants = new Map();
  for (const { field: name, text, unit, cell } of constants) {
    const field = fieldOf(kind, name);
    if (!field) continue;
    const reader = columnReader(
      { field, heading: '', unit: unit ?? (field.canonicalUnit || null), divisor: 1, ...options },
      decideNumberFormat([text]),
      [text],
    );
    read.set(name, readCell({ text, kind: 'text' }, cell, undefined, reader));
  }
  return read;
}

interface TableReading {
  sheet: RawSheet;
  table: TableProposal;
  /** its samples stand in columns: the sheet is a turned view, and addresses are turned back */
  isTurned: boolean;
  /** another table stands in the same rows, which may be longer */
  isBeside: boolean;
  columns: MappedColumn[];
  constants: Constants;
  kind: DatasetKind;
  mends: Map<string, string>;
}

function readTable<T>(reading: TableReading, result: TablesRead<T>, build: (one: RowReading) => T): void {
  const { sheet, table, columns, constants, kind } = reading;
  const groups = columnGroups(columns, kind);
  for (let row = table.firstRow; row <= Math.min(table.lastRow, sheet.rows.length); row += 1) {
    const shape = shapeOf(sheet.rows[row - 1]).kind;
    if (shape === 'blank' || shape === 'totals' || table.headerRows.includes(row)) continue;
    const cells = new Map(columns.map((column) => [column, readMapped(reading, column, row)]));
    if (shape === 'text' && ![...cells].some(([column, cell]) => isData(column, cell))) continue;
    if (reading.isBeside && [...cells.values()].every(({ traced }) => traced.rule === 'empty')) continue;
    for (const [column, cell] of cells) countMissing(column, cell, kind, result.missingCodes);
    for (const group of groups)
      result.rows.push(build({ sheet: sheet.name, row, group, fields: fieldsOf(group, constants, cells) }));
  }
}

function readMapped(
  { sheet, isTurned, mends }: TableReading,
  column: MappedColumn,
  row: number,
): CellReading {
  const address = isTurned ? cellAddress(row - 1, column.index + 1) : `${column.letter}${row}`;
  const mended = mends.size === 0 ? undefined : mends.get(`${sheet.name}\u0000${address}`);
  return readCell(sheet.rows[row - 1]?.[column.index] ?? null, address, mended, column.reader);
}

/** In a row of texts only: a value that was read, or a missing code in the place of one. */
const isData = (column: MappedColumn, cell: CellReading): boolean =>
  column.reader.field.quantity !== 'text' &&
  (cell.value !== null || cell.missing !== undefined || cell.traced.mended !== undefined);

function countMissing(
  column: MappedColumn,
  cell: CellReading,
  kind: DatasetKind,
  codes: Record<string, number>,
): void {
  const isEmptyValue = column.reader.field.field === kind.valueField && cell.traced.rule === 'empty';
  const code = isEmptyValue ? '(empty)' : cell.missing;
  if (code !== undefined) codes[code] = (codes[code] ?? 0) + 1;
}

/** Readings of one group; an empty cell leaves a value that holds for the whole table as it is. */
function fieldsOf(
  group: ColumnGroup,
  constants: Constants,
  cells: Map<MappedColumn, CellReading>,
): Map<string, CellReading> {
  const fields = new Map(constants);
  for (const column of group.columns) {
    const reading = cells.get(column);
    const field = column.reader.field.field;
    if (!reading || (reading.value === null && reading.traced.rule === 'empty' && constants.has(field)))
      continue;
    fields.set(field, reading);
  }
  return fields;
}
