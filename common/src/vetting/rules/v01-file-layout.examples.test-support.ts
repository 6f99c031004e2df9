import { expect } from 'vitest';
import { examplesOf } from './examples.test-support';
import { context, rows } from './rows.test-support';
import { fileLayout } from './v01-file-layout';

const plain = context(rows({}, {}));
const tables = plain.mapping.tables;

examplesOf(fileLayout, {
  quiet: { 'one table with one header row is used': plain },
  fires: {
    'no table is used': {
      context: {
        ...plain,
        mapping: { ...plain.mapping, tables: tables.map((t) => ({ ...t, used: false })) },
      },
      first: { severity: 'error', sheet: null, remedyKind: 'mend' },
    },
    'every row was left out': {
      context: { ...plain, rows: plain.rows.map((row) => ({ ...row, leftOut: 'a trial' })) },
      first: { severity: 'error' },
    },
    'three header rows were joined': {
      context: {
        ...plain,
        mapping: { ...plain.mapping, tables: tables.map((t) => ({ ...t, headerRows: [4, 5, 6] })) },
      },
      first: { severity: 'note', sheet: 'Data' },
    },
    'cells are merged': {
      context: {
        ...plain,
        workbook: {
          ...plain.workbook,
          sheets: plain.workbook.sheets.map((s) => ({ ...s, merged: ['A1:C1'] })),
        },
      },
      first: { severity: 'note', message: expect.stringContaining('A1:C1') },
    },
    'the reader had to decide on an encoding': {
      context: {
        ...plain,
        workbook: { ...plain.workbook, readNotes: [{ code: 'encoding', message: 'decoded as Latin-1' }] },
      },
      first: { severity: 'note', message: 'On reading the file: decoded as Latin-1.' },
    },
  },
});
