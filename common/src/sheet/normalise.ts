import type { DatasetKind } from '../dataset/field';
import { fieldOf } from '../dataset/field';
import { fluxQuantityOf } from '../dataset/flux-quantity';
import type { SampleRow, TracedValue } from '../dataset/sample-row';
import { decideNumberFormat } from '../units/number-format';
import { columnIndex } from './column-headings';
import { deriveFlux } from './derive-flux';
import type { RawSheet, RawWorkbook } from './grid';
import { splitHeading, uncertaintyOf } from './heading';
import type { ColumnProposal, Correction, Mapping, TableConstant, TableProposal } from './mapping';
import { type CellReading, type ColumnReader, columnReader, readCell } from './read-column';
import { shapeOf } from './row-kind';

export interface ColumnNote {
  sheet: string;
  column: string | null;
  field: string;
  code: string;
  message: string;
}

export interface NormalisedWorkbook {
  rows: SampleRow[];
  /** how often each code was taken as missing or below detection; "(empty)" counts empty value cells */
  missingCodes: Record<string, number>;
  /** what was decided for whole columns: number format, assumed datum, halved 2σ, unit that does not convert … */
  columnNotes: ColumnNote[];
}

export interface NormaliseOptions {
  /** datum of ages whose column names none, as the metadata form answers it */
  ageDatum?: string;
}

/** One mapped column, ready to read. */
interface MappedColumn {
  index: number;
  letter: string;
  proposal: ColumnProposal;
  reader: ColumnReader;
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

const belongs = (part: { sheet: string; table?: number }, table: TableProposal, index: number): boolean =>
  part.sheet === table.sheet && (part.table === undefined || part.table === index);

function mappedColumns(
  sheet: RawSheet,
  table: TableProposal,
  tableIndex: number,
  kind: DatasetKind,
  mapping: Mapping,
  options: NormaliseOptions,
  notes: ColumnNote[],
): MappedColumn[] {
  const wanted = mapping.columns.filter((one) => belongs(one, table, tableIndex) && one.field !== null);
  const texts = new Map(wanted.map((one) => [one, typedTexts(sheet, table, columnIndex(one.column))]));
  const hint = fileHint([...texts.values()]);
  return wanted.flatMap((proposal) => {
    const field = fieldOf(kind, proposal.field ?? '');
    if (!field) {
      notes.push({
        sheet: sheet.name,
        column: proposal.column,
        field: proposal.field ?? '',
        code: 'unknown-field',
        message: `"${proposal.field}" is no field of ${kind.title}; the column is not read.`,
      });
      return [];
    }
    const own = texts.get(proposal) ?? [];
    const format = decideNumberFormat(own, hint);
    const uncertainty = uncertaintyOf(splitHeading(proposal.heading));
    const unit =
      proposal.unit ?? (field.field === kind.sigmaField ? ownerUnit(proposal, wanted, kind) : null);
    const divisor =
      uncertainty && [kind.sigmaField, 'ageSigmaKa'].includes(field.field) ? uncertainty.sigmas : 1;
    const reader = columnReader({ field, heading: proposal.heading, unit, divisor, ...options }, format, own);
    const column = { index: columnIndex(proposal.column), letter: proposal.column, proposal, reader };
    notes.push(...notesOf(column, sheet.name, own.length > 0, uncertainty?.deviation ?? false));
    return [column];
  });
}

/** Texts of a column that are not stored numbers: what number formats are decided from. */
function typedTexts(sheet: RawSheet, table: TableProposal, index: number): string[] {
  const texts: string[] = [];
  for (let r = table.firstRow - 1; r < Math.min(table.lastRow, sheet.rows.length); r += 1) {
    const cell = sheet.rows[r]?.[index];
    if (cell && cell.kind === 'text' && /\d/.test(cell.text)) texts.push(cell.text);
  }
  return texts;
}

/** The decimal sign that telling columns of the table agree on. */
function fileHint(columns: string[][]): '.' | ',' | undefined {
  const signs = new Set<'.' | ','>();
  for (const texts of columns) {
    const format = decideNumberFormat(texts);
    if (!format.undecided && /show a decimal/.test(format.reason)) signs.add(format.decimalSign);
  }
  return signs.size === 1 ? [...signs][0] : undefined;
}

/** Unit of the value column nearest on the left of an uncertainty that has none. */
function ownerUnit(sigma: ColumnProposal, columns: ColumnProposal[], kind: DatasetKind): string | null {
  const values = columns.filter((one) => one.field === kind.valueField);
  const left = values.filter((one) => columnIndex(one.column) < columnIndex(sigma.column)).at(-1);
  return (left ?? values[0])?.unit ?? null;
}

function notesOf(
  { letter, reader }: MappedColumn,
  sheet: string,
  isTyped: boolean,
  deviation: boolean,
): ColumnNote[] {
  const { field, scale, format, divisor } = reader;
  const note = (code: string, message: string): ColumnNote => ({
    sheet,
    column: letter,
    field: field.field,
    code,
    message,
  });
  const notes = scale.notes.map(({ code, message }) => note(code, message));
  if (scale.problem) notes.push(note(scale.problem.code, scale.problem.message));
  if (divisor !== 1) notes.push(note('two-sigma', 'The numbers are two standard errors and are halved.'));
  if (deviation)
    notes.push(
      note(
        'standard-deviation',
        'The heading speaks of a standard deviation; it is taken as given, as one standard error.',
      ),
    );
  if (!isTyped || field.quantity === 'text') return notes;
  if (format.undecided)
    notes.push(
      note('number-format-undecided', `Numbers such as 1,234 can be read in two ways: ${format.reason}.`),
    );
  else if (format.decimalSign === ',' || format.thousands !== '') {
    const thousands = format.thousands === '' ? '' : `, "${format.thousands}" parts thousands`;
    notes.push(note('number-format', `Decimal sign "${format.decimalSign}"${thousands}: ${format.reason}.`));
  }
  return notes;
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

/** The columns of one sample: a value column and, of each other field, the column that belongs to it. */
interface Group {
  quantity: string;
  columns: MappedColumn[];
}

function columnGroups(columns: MappedColumn[], kind: DatasetKind): Group[] {
  const of = (field: string): MappedColumn[] => columns.filter((one) => one.reader.field.field === field);
  const values = of(kind.valueField);
  const fields = [...new Set(columns.map((one) => one.reader.field.field))].filter(
    (field) => field !== kind.valueField,
  );
  if (values.length === 0)
    return [{ quantity: 'dust', columns: fields.flatMap((field) => of(field).slice(0, 1)) }];
  return values.map((value, i) => {
    const next = values[i + 1]?.index ?? Infinity;
    const others = fields.flatMap((field) => {
      const offered = of(field);
      if (field !== kind.sigmaField)
        return offered
          .filter((one) => one.index < value.index)
          .slice(-1)
          .concat(offered)
          .slice(0, 1);
      const right = offered.filter((one) => one.index > value.index && one.index < next);
      return (values.length === 1 ? right.concat(offered) : right).slice(0, 1);
    });
    return { quantity: quantityOf(value.proposal), columns: [value, ...others] };
  });
}

const quantityOf = (proposal: ColumnProposal): string =>
  proposal.quantity ?? fluxQuantityOf(proposal.heading) ?? 'dust';

function sampleOf(
  { sheet, constants, kind }: TableReading,
  row: number,
  group: Group,
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

function emptySample(sheet: string, row: number, quantity: string): SampleRow {
  return {
    sheet,
    row,
    quantity,
    site: null,
    latitudeDeg: null,
    longitudeDeg: null,
    archive: null,
    ageKaBp: null,
    ageYoungKaBp: null,
    ageOldKaBp: null,
    ageSigmaKa: null,
    depthM: null,
    depthTopM: null,
    depthBaseM: null,
    fluxGM2Yr: null,
    fluxSigmaGM2Yr: null,
    sizeCutoff: null,
    densityGCm3: null,
    sedimentationRateCmKyr: null,
    dustFraction: null,
    concentrationNgG: null,
    accumulationKgM2Yr: null,
    elevationM: null,
    waterDepthM: null,
    remark: null,
    cells: {},
  };
}
