import { type DatasetKind, fieldOf } from '../dataset/field';
import { fluxQuantityOf } from '../dataset/flux-quantity';
import type { SampleRow, TracedValue } from '../dataset/sample-row';
import { decideNumberFormat } from '../units/number-format';
import { type ColumnGroup, columnGroups } from './column-groups';
import { deriveFlux } from './derive-flux';
import { emptySample } from './empty-sample';
import type { RawSheet, RawWorkbook } from './grid';
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

export interface NormalisedWorkbook {
  rows: SampleRow[];
  /** how often each code was taken as missing or below detection; "(empty)" counts empty value cells */
  missingCodes: Record<string, number>;
  /** what was decided for whole columns: number format, assumed datum, halved 2σ, unit that does not convert … */
  columnNotes: ColumnNote[];
}

/**
 * Reads every mapped cell of every used table into canonical units, with its whole way from the file.
 *
 * A sheet row gives one sample for each column mapped to the value field (two tracers: two samples, with their
 * own quantity); to each of them belongs the nearest column on its left of any field mapped more than once, and the
 * nearest uncertainty on its right. Totals, blank rows and rows without a number are passed over. Rows without a
 * value come out with null. Corrections lie over the raw text, which stays. Linear in the number of cells; never throws
 * on what a file holds.
 */
export function normaliseWorkbook(
  workbook: RawWorkbook,
  kind: DatasetKind,
  mapping: Mapping,
  corrections: Correction[] = [],
  options: NormaliseOptions = {},
): NormalisedWorkbook {
  const result: NormalisedWorkbook = { rows: [], missingCodes: {}, columnNotes: [] };
  const mends = new Map(
    corrections.map(({ sheet, row, column, text }) => [`${sheet}\u0000${column}${row}`, text]),
  );
  for (const [index, table] of mapping.tables.entries()) {
    const sheet = workbook.sheets.find((one) => one.name === table.sheet);
    if (!table.used || !sheet) continue;
    const columns = mappedColumns(sheet, table, index, kind, mapping, options, result.columnNotes);
    const constants = readConstants(
      mapping.constants.filter((one) => belongs(one, table, index)),
      kind,
      options,
    );
    readTable({ sheet, table, columns, constants, kind, mends, result });
  }
  return result;
}

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
  columns: MappedColumn[];
  constants: Constants;
  kind: DatasetKind;
  mends: Map<string, string>;
  result: NormalisedWorkbook;
}

function readTable(reading: TableReading): void {
  const { sheet, table, columns, kind, result } = reading;
  const groups = columnGroups(columns, kind);
  for (let row = table.firstRow; row <= Math.min(table.lastRow, sheet.rows.length); row += 1) {
    const shape = shapeOf(sheet.rows[row - 1]).kind;
    if (shape === 'blank' || shape === 'totals' || table.headerRows.includes(row)) continue;
    const cells = new Map(columns.map((column) => [column, readMapped(reading, column, row)]));
    if (shape === 'text' && ![...cells].some(([column, cell]) => isData(column, cell))) continue;
    for (const [column, cell] of cells) countMissing(column, cell, kind, result.missingCodes);
    for (const group of groups) result.rows.push(sampleOf(reading, row, group, cells));
  }
}

function readMapped({ sheet, mends }: TableReading, column: MappedColumn, row: number): CellReading {
  const mended = mends.size === 0 ? undefined : mends.get(`${sheet.name}\u0000${column.letter}${row}`);
  return readCell(
    sheet.rows[row - 1]?.[column.index] ?? null,
    `${column.letter}${row}`,
    mended,
    column.reader,
  );
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

function sampleOf(
  { sheet, constants, kind }: TableReading,
  row: number,
  group: ColumnGroup,
  cells: Map<MappedColumn, CellReading>,
): SampleRow {
  const sample = emptySample(sheet.name, row, group.quantity);
  const values = sample as unknown as Record<string, unknown>;
  const put = (field: string, reading: CellReading): void => {
    sample.cells[field] = reading.traced;
    if (field in sample && field !== 'cells') values[field] = reading.value;
  };
  for (const [field, reading] of constants) put(field, reading);
  for (const column of group.columns) {
    const reading = cells.get(column);
    const field = column.reader.field.field;
    if (!reading || (reading.value === null && reading.traced.rule === 'empty' && constants.has(field)))
      continue;
    put(field, reading);
    if (field === kind.valueField && reading.plusMinus !== undefined)
      putSpread(sample, values, kind.sigmaField, reading);
  }
  if (sample.quantity === null || sample.quantity === '') sample.quantity = group.quantity;
  const named = sample.cells.quantity?.value;
  if (typeof named === 'string') sample.quantity = fluxQuantityOf(named) ?? named;
  if (kind.id === 'dust-flux' && !group.columns.some((one) => one.reader.field.field === kind.valueField))
    deriveFlux(sample);
  return sample;
}

/** "0.50 ± 0.04": the second number is the uncertainty, unless a column of its own gives one. */
function putSpread(
  sample: SampleRow,
  values: Record<string, unknown>,
  field: string,
  reading: CellReading,
): void {
  const { traced, plusMinus = null } = reading;
  const spread: TracedValue = {
    ...traced,
    value: plusMinus,
    rule: `behind ± in the same cell; ${traced.rule}`,
  };
  sample.cells[field] = spread;
  if (field in sample) values[field] = plusMinus;
}
