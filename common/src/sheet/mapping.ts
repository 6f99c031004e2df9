/** Where a table lies on a sheet. Row numbers as a spreadsheet counts them, from 1. */
export interface TableProposal {
  sheet: string;
  headerRows: number[];
  unitsRow: number | null;
  firstRow: number;
  lastRow: number;
  /** false: the table is left alone, and `reason` says why */
  used: boolean;
  reason: string;
}

/** What one column of a used table holds. `field` is a field name of the dataset kind, or null: not imported. */
export interface ColumnProposal {
  sheet: string;
  /** column letter, "A" */
  column: string;
  heading: string;
  field: string | null;
  /** unit text as understood, in the file's own spelling; null when the field has none */
  unit: string | null;
  /** 0 to 1 */
  confidence: number;
  reason: string;
  /** of a flux: dust, or the tracer; told from the heading where it is absent */
  quantity?: string;
  /** index in `tables`, only where tables of one sheet have different columns; absent: every used table of the sheet */
  table?: number;
}

/** A value that holds for every row of a table though no column has it: a position above the table, a form answer. */
export interface TableConstant {
  sheet: string;
  field: string;
  /** text as found or typed */
  text: string;
  unit: string | null;
  /** cell it was read from, null when typed in the form */
  cell: string | null;
  reason: string;
  /** as in ColumnProposal */
  table?: number;
}

/** The proposal, and in the same form the person's correction of it. */
export interface Mapping {
  tables: TableProposal[];
  columns: ColumnProposal[];
  constants: TableConstant[];
}

/** A mend typed over one cell. The raw text stays; the latest correction of a cell counts. */
export interface Correction {
  sheet: string;
  row: number;
  column: string;
  text: string;
}
