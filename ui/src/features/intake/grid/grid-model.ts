import type { GridWindow } from '@siltlight/common/wire/submissions';
import type { ReactNode } from 'react';
import type { RowKind } from '../places';
import type { GridColumn } from './columns';
import type { CellMark } from './marks';

export type GridRow = GridWindow['rows'][number];
export type CellMend = { row: number; column: string; text: string };

/** All that the grid draws and what it asks for; it holds no state of the submission itself. */
export type GridModel = {
  label: string;
  columns: readonly GridColumn[];
  rowCount: number;
  /** undefined while the row is on its way */
  rowAt: (row: number) => GridRow | undefined;
  kindOf: (row: number) => RowKind;
  leftOutAt: (row: number) => string | null;
  markAt: (column: string, row: number) => CellMark | undefined;
  /** undefined: not mended */
  mendAt: (column: string, row: number) => string | undefined;
  queryAt: (column: string, row: number) => boolean;
  /** text that is on its way to the service, or was refused and is kept */
  unsentAt: (column: string, row: number) => string | undefined;
  mayEdit: boolean;
  onMend: (cells: CellMend[]) => void;
  onUndo: (correctionId: string) => void;
  onOpenQuery: (column: string, row: number) => void;
  onRowMenu: (rows: number[], target: HTMLElement) => void;
  onSeen: (firstRow: number, lastRow: number) => void;
  onPasted: (taken: number, outside: number) => void;
  /** pinned under its cell */
  popover: { row: number; column: string; content: ReactNode } | null;
};

export const ROW_PX = 36;
export const HEAD_PX = 56;
export const ROW_HEAD_PX = 46;

export const cellId = (column: string, row: number) => `cell-${column}${row}`;

/** What a person sees as the text of a cell: the mend where there is one. */
export const textOf = (row: GridRow | undefined, column: string) => {
  const cell = row?.cells[column];
  return cell?.mended ?? cell?.text ?? '';
};
