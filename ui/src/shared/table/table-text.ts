import type { CellValue, DataColumn } from './column';

/**
 * A table as text for the clipboard (tabs) or a file (commas): plain ASCII minus, point as decimal sign,
 * full precision, units in the headings.
 */
export function tableText<Row>(
  columns: readonly DataColumn<Row>[],
  rows: readonly Row[],
  separator: '\t' | ',',
): string {
  const written = columns.filter((column) => !column.screenOnly);
  const heads = written.map((column) =>
    quote(column.unit ? `${column.header} [${column.unit}]` : column.header, separator),
  );
  const lines = rows.map((row) =>
    written.map((column) => cellText(column.value(row), separator)).join(separator),
  );
  return [heads.join(separator), ...lines].join('\r\n') + '\r\n';
}

function cellText(value: CellValue, separator: string): string {
  if (value === null || value === undefined) return '';
  if (typeof value === 'number') return String(value);
  return quote(disarm(value), separator);
}

// A text that starts like a formula would be run by a spreadsheet: the apostrophe keeps it a text.
const disarm = (text: string) => (/^[=+@\t\r-]/.test(text) && !isNumberText(text) ? `'${text}` : text);
const isNumberText = (text: string) => /^[+-]?\d+(\.\d+)?(e[+-]?\d+)?$/i.test(text);

function quote(text: string, separator: string): string {
  if (separator === '\t') return text.replace(/[\t\r\n]+/g, ' ');
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
