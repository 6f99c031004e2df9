import type { SiteTrace } from '@siltlight/common/wire/slices';

type Place = { sheet: string; row: number; cell: string | null };

/** Column letters of a cell address: F of F7, AB of $AB$12; null where it is none. */
export const columnOf = (cell: string): string | null =>
  /^\$?([A-Z]{1,3})\$?\d+$/i.exec(cell)?.[1]?.toUpperCase() ?? null;

/** An address as people know it from spreadsheets: Sheet1!F7, quoted where the name has blanks. */
export function cellAddress({ sheet, row, cell }: Place): string {
  const name = /^[A-Za-z_][\w.]*$/.test(sheet) ? sheet : `'${sheet.replaceAll("'", "''")}'`;
  return cell ? `${name}!${cell.replaceAll('$', '')}` : `${name}, row ${row}`;
}

/** The page that shows the file's cells round this one. */
export function cellPath(trace: Pick<SiteTrace, 'datasetSlug' | 'versionNumber'>, place: Place): string {
  const query = new URLSearchParams({ sheet: place.sheet, row: String(place.row) });
  const column = place.cell && columnOf(place.cell);
  if (column) query.set('column', column);
  return `/holdings/${encodeURIComponent(trace.datasetSlug)}/versions/${trace.versionNumber}/cells?${query.toString()}`;
}
