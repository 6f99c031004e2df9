import { fieldOf, type DatasetKind, type FieldDeclaration } from '@siltlight/common/dataset/field';
import { parseAgeUnit } from '@siltlight/common/units/age';
import { convertTo, UNIT_KINDS, type UnitKind } from '@siltlight/common/units/convert';
import type { Mapping } from '../changes';

export type Table = Mapping['tables'][number];
export type Column = Mapping['columns'][number];
export type Constant = Mapping['constants'][number];
type Sheets = readonly { name: string; rowCount: number; columnCount: number }[];

const BY_HAND = 'set by hand';

function replaced<T>(list: readonly T[], at: number, item: T): T[] {
  return list.map((one, index) => (index === at ? item : one));
}

export const setTable = (mapping: Mapping, at: number, change: Partial<Table>): Mapping => ({
  ...mapping,
  tables: replaced(mapping.tables, at, {
    ...mapping.tables[at]!,
    ...change,
    reason: change.reason ?? BY_HAND,
  }),
});

/** A column set by a person is certain; a field without unit of its own drops the unit it had. */
export const setColumn = (mapping: Mapping, at: number, change: Partial<Column>): Mapping => ({
  ...mapping,
  columns: replaced(mapping.columns, at, {
    ...mapping.columns[at]!,
    ...change,
    confidence: 1,
    reason: BY_HAND,
  }),
});

export const addConstant = (mapping: Mapping, sheet: string, field: string): Mapping => ({
  ...mapping,
  constants: [
    ...mapping.constants,
    { sheet, field, text: '', unit: null, cell: null, reason: 'typed in the form' },
  ],
});

export const setConstant = (mapping: Mapping, at: number, change: Partial<Constant>): Mapping => ({
  ...mapping,
  constants: replaced(mapping.constants, at, {
    ...mapping.constants[at]!,
    ...change,
    cell: null,
    reason: 'typed in the form',
  }),
});

export const removeConstant = (mapping: Mapping, at: number): Mapping => ({
  ...mapping,
  constants: mapping.constants.filter((_, index) => index !== at),
});

/** Rows typed as "8, 9" or "8-10". */
export function readRows(text: string): number[] | null {
  const rows: number[] = [];
  for (const part of text.split(/[,;\s]+/).filter(Boolean)) {
    const span = /^(\d+)(?:[-–](\d+))?$/.exec(part);
    if (!span) return null;
    const [from, to] = [Number(span[1]), Number(span[2] ?? span[1])];
    if (from < 1 || to < from || to - from > 20) return null;
    for (let row = from; row <= to; row += 1) rows.push(row);
  }
  return [...new Set(rows)].sort((a, b) => a - b);
}

export type Fault = { place: string; message: string };

/** What must be put right before a mapping can be applied. */
export function faultsOf(mapping: Mapping, kind: DatasetKind, sheets: Sheets): Fault[] {
  return [
    ...mapping.tables.flatMap((table, at) => (table.used ? tableFaults(table, at, sheets) : [])),
    ...mapping.columns.flatMap((column, at) => columnFaults(mapping, column, at, kind)),
    ...mapping.constants.flatMap((constant, at) => constantFaults(constant, at, kind)),
  ];
}

function tableFaults(
  { sheet, headerRows, unitsRow, firstRow, lastRow }: Table,
  at: number,
  sheets: Sheets,
): Fault[] {
  const rowCount = sheets.find(({ name }) => name === sheet)?.rowCount ?? 0;
  const fault = (part: string, message: string) => [{ place: `table-${at}-${part}`, message }];
  if (firstRow > lastRow) return fault('lastRow', `The last row lies above the first, ${firstRow}.`);
  if (lastRow > rowCount) return fault('lastRow', `“${sheet}” ends at row ${rowCount}.`);
  if (headerRows.some((row) => row >= firstRow && row <= lastRow))
    return fault('headerRows', `Header rows lie outside the data, rows ${firstRow} to ${lastRow}.`);
  if (unitsRow !== null && unitsRow >= firstRow && unitsRow <= lastRow)
    return fault('unitsRow', `The units row lies outside the data, rows ${firstRow} to ${lastRow}.`);
  return [];
}

function columnFaults(mapping: Mapping, column: Column, at: number, kind: DatasetKind): Fault[] {
  const field = column.field === null ? undefined : fieldOf(kind, column.field);
  if (!field || !isUsed(mapping, column.sheet)) return [];
  // Several tracers may stand side by side, each with its error: only those two fields can be taken twice.
  const mayRepeat = field.field === kind.valueField || field.field === kind.sigmaField;
  const other = mapping.columns.find(
    (one, index) =>
      index < at && one.sheet === column.sheet && one.field === column.field && sameTable(one, column),
  );
  if (other && !mayRepeat)
    return [
      {
        place: `column-${at}-field`,
        message: `${field.title} is taken from column ${other.column} already.`,
      },
    ];
  const message = unitFault(field, column.unit, column.heading);
  return message ? [{ place: `column-${at}-unit`, message }] : [];
}

const sameTable = (a: object, b: object) =>
  (a as { table?: number }).table === (b as { table?: number }).table;

function constantFaults({ field: name, text, unit }: Constant, at: number, kind: DatasetKind): Fault[] {
  const field = fieldOf(kind, name);
  if (!field) return [{ place: `constant-${at}-field`, message: 'Choose what the value is.' }];
  if (text.trim() === '')
    return [{ place: `constant-${at}-text`, message: `Give the ${field.title.toLowerCase()}.` }];
  const message = unitFault(field, unit, '');
  return message ? [{ place: `constant-${at}-unit`, message }] : [];
}

/** Why a unit does not fit a field, or undefined; an absent unit is for the rules to judge. */
export function unitFault(
  { quantity }: FieldDeclaration,
  unit: string | null,
  heading: string,
): string | undefined {
  if (!unit) return undefined;
  if (quantity === 'age') {
    const read = parseAgeUnit(unit, heading);
    return 'message' in read ? read.message : undefined;
  }
  if (!(quantity in UNIT_KINDS)) return undefined;
  const conversion = convertTo(quantity as UnitKind, unit);
  return 'message' in conversion ? conversion.message : undefined;
}

/** How the values of a column come to the canonical unit, in words. */
export function unitWay({ quantity }: FieldDeclaration, unit: string | null): string | undefined {
  if (!unit || !(quantity in UNIT_KINDS)) return undefined;
  const conversion = convertTo(quantity as UnitKind, unit);
  return 'factor' in conversion ? conversion.explanation : undefined;
}

const isUsed = (mapping: Mapping, sheet: string) =>
  mapping.tables.some((table) => table.used && table.sheet === sheet);

/** Fields without which no row of a used sheet can enter a version, and which neither column nor constant gives. */
export function missingFields(mapping: Mapping, kind: DatasetKind): { sheet: string; titles: string[] }[] {
  const sheets = [...new Set(mapping.tables.filter(({ used }) => used).map(({ sheet }) => sheet))];
  return sheets.flatMap((sheet) => {
    const given = new Set([
      ...mapping.columns.filter((one) => one.sheet === sheet).map(({ field }) => field),
      ...mapping.constants.filter((one) => one.sheet === sheet).map(({ field }) => field),
    ]);
    const titles = kind.fields
      .filter(({ field, required }) => required && !given.has(field))
      .map(({ title }) => title);
    return titles.length > 0 ? [{ sheet, titles }] : [];
  });
}
