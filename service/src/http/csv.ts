/**
 * RFC 4180 text of a table. A text cell that a spreadsheet would run as a formula (it starts with = + - @, a tab
 * or a NUL) is escaped with a leading apostrophe; numbers never are, so a negative forcing stays a number.
 */
export type CsvCell = string | number | null;

export function csvTable(rows: readonly (readonly CsvCell[])[]): string {
  return rows.map((row) => row.map(csvCell).join(',')).join('\r\n') + '\r\n';
}

function csvCell(cell: CsvCell): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return numberText(cell);
  const safe = /^[=+\-@\t\0]/.test(cell) ? `'${cell}` : cell;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** Shortest text that reads back to the same double. */
function numberText(value: number): string {
  if (!Number.isFinite(value)) throw new Error(`a table cell is not a finite number: ${value}`);
  return String(value);
}
