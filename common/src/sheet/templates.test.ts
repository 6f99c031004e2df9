import { expect, test } from 'vitest';
import { DATASET_KINDS } from '../dataset/kinds';
import { isRecordKind, RECORD_KINDS } from '../dataset/record-kinds';
import type { TracedValue } from '../dataset/sample-row';
import { DomainError } from '../physical/domain-error';
import { textWorkbook } from './fixtures.test-support';
import { normaliseRecords } from './normalise-records';
import { normaliseWorkbook } from './normalise';
import { proposeWorkbook } from './propose';
import { templateFor } from './templates';

const KINDS = [...DATASET_KINDS, ...RECORD_KINDS];

test.each(KINDS.map((kind) => [kind.id, kind] as const))(
  'the template for %s is read back with every column recognised',
  (_id, kind) => {
    const { rows } = templateFor(kind);
    const workbook = textWorkbook(rows.map((row) => row.join(',')).join('\n'));
    const mapping = proposeWorkbook(workbook, kind);
    expect(mapping.tables[0]).toMatchObject({
      used: true,
      headerRows: [1, 2],
      unitsRow: 2,
      firstRow: 3,
      lastRow: 4,
    });
    expect(mapping.columns.filter((column) => column.field === null)).toEqual([]);
    const samples: { cells: Record<string, TracedValue> }[] = isRecordKind(kind)
      ? normaliseRecords(workbook, kind, mapping).rows
      : normaliseWorkbook(workbook, kind, mapping).rows;
    expect(samples.length).toBe(2);
    expect(samples[0]!.cells[kind.valueField]?.value).toBeGreaterThan(0);
    expect(samples.flatMap((sample) => Object.values(sample.cells).filter((cell) => cell.problem))).toEqual(
      [],
    );
  },
);

test('every field of a kind can stand in a template and is recognised by its own heading', () => {
  for (const kind of KINDS) {
    const wanted = kind.fields.map((field) => field.field);
    const { rows, notes } = templateFor(kind, wanted);
    expect(notes.length).toBe(wanted.length);
    const filled = wanted.map((field) =>
      kind.fields.find((one) => one.field === field)?.quantity === 'text' ? 'text' : '1',
    );
    const workbook = textWorkbook([rows[0], rows[1], filled, filled].map((row) => row!.join(',')).join('\n'));
    expect(proposeWorkbook(workbook, kind).columns.map((column) => column.field)).toEqual(wanted);
  }
});

test('a field that the kind does not have is refused by name', () => {
  expect(() => templateFor(DATASET_KINDS[0]!, ['pollen'])).toThrow(DomainError);
});
