import type { FindingView, SubmissionDetail } from '@siltlight/common/wire/submissions';
import type { CellPlace, Mapping } from './changes';

export type RowKind = 'data' | 'heading' | 'units' | 'other';

export const addressOf = ({ column, row }: { column: string; row: number }) => `${column}${row}`;
export const keyOf = (sheet: string, column: string, row: number) => `${sheet}!${column}${row}`;

export function readAddress(text: string | null): { column: string; row: number } | null {
  const parts = /^([A-Z]{1,3})([1-9]\d{0,6})$/.exec((text ?? '').toUpperCase());
  return parts && { column: parts[1]!, row: Number(parts[2]) };
}

/** What a row of a sheet is under the mapping in force. */
export function rowKindOf(tables: Mapping['tables'], sheet: string, row: number): RowKind {
  const used = tables.filter((table) => table.used && table.sheet === sheet);
  if (used.some(({ firstRow, lastRow }) => row >= firstRow && row <= lastRow)) return 'data';
  if (used.some(({ headerRows }) => headerRows.includes(row))) return 'heading';
  return used.some(({ unitsRow }) => unitsRow === row) ? 'units' : 'other';
}

export const rowKindWords: Record<RowKind, string> = {
  data: 'data',
  heading: 'a heading',
  units: 'the units',
  other: 'not part of a table in use',
};

/** Where the bench opens: the first data row of the first table in use, at its first mapped column. */
export function firstPlace({ mapping, workbook }: Pick<SubmissionDetail, 'mapping' | 'workbook'>): CellPlace {
  const table = mapping.tables.find(({ used }) => used) ?? mapping.tables[0];
  const sheet = table?.sheet ?? workbook.sheets[0]?.name ?? '';
  const column = mapping.columns.find((one) => one.sheet === sheet && one.field !== null)?.column ?? 'A';
  return { sheet, row: table?.firstRow ?? 1, column };
}

/** The cell that a finding is about; one about a whole column or sheet leads to its first data row. */
export function placeOfFinding(finding: FindingView, mapping: Mapping): CellPlace | null {
  const { sheet, row, column } = finding;
  if (sheet === null) return null;
  const table = mapping.tables.find((one) => one.used && one.sheet === sheet);
  const inField = mapping.columns.find((one) => one.sheet === sheet && one.field === finding.field);
  if (row === null && column === null && !inField) return null;
  return { sheet, row: row ?? table?.firstRow ?? 1, column: column ?? inField?.column ?? 'A' };
}

/** "H519", "column F of MAR", "the file": where a finding stands, in words. */
export function placeWords({ sheet, row, column }: FindingView, sheets: number): string {
  const of = sheets > 1 && sheet !== null ? ` of ${sheet}` : '';
  if (row !== null && column !== null) return `${column}${row}${of}`;
  if (row !== null) return `row ${row}${of}`;
  if (column !== null) return `column ${column}${of}`;
  return sheet === null ? 'the file' : `sheet ${sheet}`;
}
