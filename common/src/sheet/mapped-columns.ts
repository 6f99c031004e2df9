import { type DatasetKind, fieldOf } from '../dataset/field';
import { formatOf, type NumberEvidence, numberEvidence } from '../units/number-format';
import { columnIndex } from './column-headings';
import type { RawSheet } from './grid';
import { splitHeading, uncertaintyOf } from './heading';
import type { ColumnProposal, Mapping, TableProposal } from './mapping';
import { type ColumnReader, columnReader } from './read-column';

export interface ColumnNote {
  sheet: string;
  column: string | null;
  field: string;
  code: string;
  message: string;
}

export interface NormaliseOptions {
  /** datum of ages whose column names none, as the metadata form answers it */
  ageDatum?: string;
}

/** One mapped column, ready to read. */
export interface MappedColumn {
  index: number;
  letter: string;
  proposal: ColumnProposal;
  reader: ColumnReader;
}

/** A column or constant holds for every used table of its sheet unless it names one. */
export const belongs = (
  part: { sheet: string; table?: number },
  table: TableProposal,
  index: number,
): boolean => part.sheet === table.sheet && (part.table === undefined || part.table === index);

/** The mapped columns of one table with their readers: number format, unit and scale decided once a column. */
export function mappedColumns(
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
  const evidence = new Map([...texts].map(([one, own]) => [one, numberEvidence(own)]));
  const hint = fileHint([...evidence.values()]);
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
    const format = formatOf(evidence.get(proposal) ?? numberEvidence([]), hint);
    const uncertainty = uncertaintyOf(splitHeading(proposal.heading));
    const unit =
      proposal.unit ?? (field.field === kind.sigmaField ? ownerUnit(proposal, wanted, kind) : null);
    const divisor =
      uncertainty && [kind.sigmaField, ...Object.values(kind.sigmas ?? {})].includes(field.field)
        ? uncertainty.sigmas
        : 1;
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
function fileHint(columns: NumberEvidence[]): '.' | ',' | undefined {
  const signs = new Set<'.' | ','>();
  for (const evidence of columns) {
    const format = formatOf(evidence);
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
