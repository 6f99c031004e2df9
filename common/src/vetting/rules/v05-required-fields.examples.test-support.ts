import { expect, test } from 'vitest';
import { counts, vet } from '../vet';
import { examplesOf } from './examples.test-support';
import { answers, context, mappingOf, row, rows, unreadable } from './rows.test-support';
import { requiredFields } from './v05-required-fields';

const unnamed = rows({ site: null }, { site: null });
const noReference = { ...answers, publicationDoi: undefined };

examplesOf(requiredFields, {
  quiet: {
    'every row has place, age and flux': context(rows({}, {})),
    'an age is given by its bounds': context([row({ ageKaBp: null, ageYoungKaBp: 19, ageOldKaBp: 23 })]),
    'a cell is there but unreadable, which another rule says': context(
      rows({}, { ageKaBp: null, cells: { ageKaBp: unreadable('top') } }),
    ),
  },
  fires: {
    'no column holds the site': {
      context: { ...context(unnamed), mapping: mappingOf(unnamed) },
      first: {
        severity: 'error',
        sheet: 'Data',
        row: null,
        column: null,
        field: 'site',
        remedyKind: 'answer',
      },
    },
    'a row with a flux has no age': {
      context: context(rows({}, { ageKaBp: null })),
      first: { severity: 'error', row: 3, field: 'ageKaBp', remedyKind: 'mend' },
    },
    'a row has no flux, once for the sheet and once for the row': {
      context: context(rows({}, { fluxGM2Yr: null, ageKaBp: null })),
      hits: 2,
      first: { severity: 'note', sheet: 'Data', row: null, remedyKind: 'none' },
    },
    'the form is offered and gives no reference': {
      context: context(rows({}), { metadata: noReference }),
      first: { severity: 'error', sheet: null, field: 'publicationDoi', remedyKind: 'answer' },
    },
    'a file without a form gives no archive': {
      context: context(rows({}), { metadata: { ...answers, archive: undefined }, formOffered: false }),
      first: { severity: 'warning', field: 'archive', remedyKind: 'answer' },
    },
  },
});

test('a constant of the table stands in for a column', () => {
  const base = context(unnamed);
  const constant = {
    sheet: 'Data',
    field: 'site',
    text: 'Core A',
    unit: null,
    cell: 'A1',
    reason: 'above the table',
  };
  const named = { ...base, rows: rows({}, {}), mapping: { ...base.mapping, constants: [constant] } };
  expect([...requiredFields.check(named)]).toEqual([]);
});

test('rows left out settle their findings and are counted', () => {
  const samples = rows({}, { ageKaBp: null, leftOut: 'core top disturbed' });
  const findings = vet(context(samples), { rules: [requiredFields] });
  expect(findings).toEqual([]);
  expect(counts(context(samples), findings)).toMatchObject({ rows: 2, leftOut: 1, errors: 0 });
});
