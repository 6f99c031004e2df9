/** One cell as the file holds it, before anything is understood. */
export interface RawCell {
  /** the text a person would see, never altered */
  text: string;
  /** the stored number, when the cell holds one (text files: never) */
  number?: number;
  kind: 'text' | 'number' | 'date' | 'boolean' | 'error';
  /** the formula behind a stored value, recorded and never evaluated */
  formula?: string;
}

/** A sheet: sparse rows of cells; `rows[0]` is row 1 of the spreadsheet; null is an empty cell. */
export interface RawSheet {
  name: string;
  rows: (RawCell | null)[][];
  columnCount: number;
  hidden?: boolean;
  /** merged ranges as "A1:C1" */
  merged?: string[];
  /** cell comments, shown only */
  comments?: { cell: string; text: string }[];
}

export type UploadFormat = 'xlsx' | 'xlsm' | 'xlsb' | 'xls' | 'ods' | 'csv' | 'tsv' | 'txt';

/** What the upload reader answers: plain data, the same for preview and for storing. */
export interface RawWorkbook {
  fileName: string;
  format: UploadFormat;
  sheets: RawSheet[];
  /** text files only: how the bytes were decoded and cut */
  encoding?: string;
  delimiter?: string;
  /** what the reading itself had to decide or leave out */
  readNotes: { code: string; message: string }[];
}

/** "A", "B" … "AA" of a zero-based column index. */
export function columnLetter(index: number): string {
  let letters = '';
  for (let n = index + 1; n > 0; n = Math.floor((n - 1) / 26)) {
    letters = String.fromCharCode(65 + ((n - 1) % 26)) + letters;
  }
  return letters;
}

/** "B7" of a zero-based column and a one-based row. */
export const cellAddress = (column: number, row: number): string => `${columnLetter(column)}${row}`;
