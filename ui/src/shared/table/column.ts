import type { ReactNode } from 'react';

export type CellValue = string | number | null | undefined;

/** One column of a table: what is sorted and exported is `value`, what is shown is `cell` (or the value). */
export type DataColumn<Row> = {
  id: string;
  header: string;
  /** Written into the heading of exported files; on screen give it in `heading` or beside the caption. */
  unit?: string;
  heading?: ReactNode;
  value: (row: Row) => CellValue;
  cell?: (row: Row) => ReactNode;
  align?: 'right';
  widthPx?: number;
  sortable?: boolean;
  /** Left out on a narrow screen. */
  wideOnly?: boolean;
  /** Left out of copies and files (buttons, drawings). */
  screenOnly?: boolean;
};
