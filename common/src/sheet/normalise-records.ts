import { type DatasetKind, fieldOf } from '../dataset/field';
import type { RecordRow } from '../dataset/record-row';
import { isRecordKind } from '../dataset/record-kinds';
import type { TracedValue } from '../dataset/sample-row';
import { DomainError } from '../physical/domain-error';
import { isCoordinateProblem, parseCoordinate } from '../units/coordinate';
import { monthOf } from '../units/month';
import type { RawWorkbook } from './grid';
import type { NormaliseOptions } from './mapped-columns';
import type { Correction, Mapping } from './mapping';
import { type CellReading, spreadOf } from './read-column';
import { readTables, type RowReading, type TablesRead } from './read-tables';

/** Fields of rows that hold no cell of their own: told by the value's column, not by a field of the kind. */
const LABELS: Record<string, string[]> = {
  'gridded-field': ['quantity', 'unit'],
  'age-series': ['quantity', 'unit'],
};

/**
 * Reads a workbook of a kind whose rows are no samples (grids, backdrop tables, refractive indices, optical sets,
 * gas records, records by age) into rows of its own type, each value with its whole way from the file.
 * Of a matrix each cell gives a row, whose column axis comes from the heading. Rules of reading are those of samples.
 *
 * @throws DomainError `no-record-kind` for a kind of samples
 */
export function normaliseRecords(
  workbook: RawWorkbook,
  kind: DatasetKind,
  mapping: Mapping,
  corrections: Correction[] = [],
  options: NormaliseOptions = {},
): TablesRead<RecordRow> {
  if (!isRecordKind(kind))
    throw new DomainError('no-record-kind', { field: 'kind', value: kind.id, allowed: 'a kind of records' });
  const read = readTables(workbook, kind, mapping, corrections, options, (one) => recordOf(kind, one));
  return { ...read, rows: read.rows.filter((row) => isWorthKeeping(row, kind)) };
}

function recordOf(kind: DatasetKind, { sheet, row, group, fields }: RowReading): RecordRow {
  const readings = new Map(fields);
  addAxisOfHeading(kind, group.columns[0]?.proposal.heading ?? '', readings, row);
  for (const [field, sigma] of Object.entries({ ...kind.sigmas, [kind.valueField]: kind.sigmaField })) {
    const value = readings.get(field);
    const own = readings.get(sigma);
    if (value?.plusMinus !== undefined && (own === undefined || own.traced.rule === 'empty'))
      readings.set(sigma, spreadOf(value));
  }
  const record: Record<string, unknown> = { kind: kind.id, sheet, row };
  for (const { field } of kind.fields) record[field] = readings.get(field)?.value ?? null;
  const cells: Record<string, TracedValue> = {};
  for (const [field, { traced }] of readings) cells[field] = traced;
  for (const label of LABELS[kind.id] ?? [])
    record[label] = label === 'quantity' ? group.quantity : (group.columns[0]?.proposal.unit ?? null);
  if (kind.id === 'refractive-index') keepMagnitude(record, cells);
  if (record.month === 'annual') record.month = null;
  return { ...record, cells } as unknown as RecordRow;
}

/** k is written −k where the other sign convention is followed; its magnitude is what is meant (from memory). */
function keepMagnitude(record: Record<string, unknown>, cells: Record<string, TracedValue>): void {
  const k = record.imaginaryPart;
  const traced = cells.imaginaryPart;
  if (typeof k !== 'number' || k >= 0 || !traced) return;
  record.imaginaryPart = -k;
  cells.imaginaryPart = { ...traced, value: -k, rule: `${traced.rule}; |k|, whichever sign convention` };
}

/** In a matrix the heading of a column is a longitude, a latitude or a month. */
function addAxisOfHeading(
  kind: DatasetKind,
  heading: string,
  readings: Map<string, CellReading>,
  row: number,
): void {
  const axis = AXES[kind.id]?.find(
    (field) => !readings.has(field) && valueOfHeading(field, heading) !== null,
  );
  const field = axis === undefined ? undefined : fieldOf(kind, axis);
  if (!field) return;
  const value = valueOfHeading(field.field, heading)!;
  const traced = {
    cell: null,
    raw: heading,
    value,
    unit: field.canonicalUnit,
    rule: `heading of the column, row ${row}`,
  };
  readings.set(field.field, { value, traced });
}

const AXES: Record<string, string[]> = {
  'gridded-field': ['longitudeDeg', 'latitudeDeg', 'month'],
  'backdrop-table': ['month'],
};

function valueOfHeading(field: string, heading: string): number | 'annual' | null {
  if (field === 'month') return monthOf(heading);
  const read = parseCoordinate(heading, field === 'longitudeDeg' ? 'longitude' : 'latitude');
  return heading.trim() === '' || isCoordinateProblem(read) ? null : read.degrees;
}

/** A row in which neither the value nor one of its stand-ins was read or refused says nothing. */
function isWorthKeeping(row: RecordRow, kind: DatasetKind): boolean {
  const standIns = [kind.valueField, ...(kind.usableWith ?? []).map((set) => set[0] ?? '')];
  return standIns.some((field) => {
    const traced = row.cells[field];
    return traced !== undefined && (traced.value !== null || traced.problem !== undefined);
  });
}
