import { datasetKind } from '@siltlight/common/dataset/kinds';
import type { Mapping } from '../changes';
import {
  addConstant,
  faultsOf,
  missingFields,
  readRows,
  removeConstant,
  setColumn,
  setConstant,
  setTable,
} from './mapping-edits';

const kind = datasetKind('dust-flux');
const sheets = [{ name: 'MAR', rowCount: 100, columnCount: 4 }];
const column = (letter: string, field: string | null, unit: string | null = null) => ({
  sheet: 'MAR',
  column: letter,
  heading: letter,
  field,
  unit,
  confidence: 0.6,
  reason: 'by its heading',
});
const mapping: Mapping = {
  tables: [
    {
      sheet: 'MAR',
      headerRows: [9],
      unitsRow: 10,
      firstRow: 11,
      lastRow: 90,
      used: true,
      reason: 'one table',
    },
  ],
  columns: [column('A', 'ageKaBp', 'ka BP'), column('B', 'fluxGM2Yr', 'g cm-2 kyr-1'), column('C', null)],
  constants: [],
};
const faultAt = (changed: Mapping) => faultsOf(changed, kind, sheets).map(({ place }) => place);

test('a sound mapping has no fault', () => {
  expect(faultsOf(mapping, kind, sheets)).toEqual([]);
});

test('rows are read from lists and spans, and nonsense is refused', () => {
  expect(readRows('8, 9')).toEqual([8, 9]);
  expect(readRows('10–8')).toBeNull();
  expect(readRows('8-10, 9')).toEqual([8, 9, 10]);
  expect(readRows('')).toEqual([]);
  expect(readRows('eight')).toBeNull();
});

test('a table beyond the sheet, upside down, or with its header inside the data is named with its field', () => {
  expect(faultAt(setTable(mapping, 0, { lastRow: 101 }))).toEqual(['table-0-lastRow']);
  expect(faultAt(setTable(mapping, 0, { firstRow: 95 }))).toEqual(['table-0-lastRow']);
  expect(faultAt(setTable(mapping, 0, { headerRows: [12] }))).toEqual(['table-0-headerRows']);
  expect(faultAt(setTable(mapping, 0, { unitsRow: 11 }))).toEqual(['table-0-unitsRow']);
});

test('a table left alone is not checked', () => {
  expect(faultAt(setTable(mapping, 0, { lastRow: 101, used: false }))).toEqual([]);
});

test('a column set by hand is certain and leaves the others as they are', () => {
  const next = setColumn(mapping, 2, { field: 'site' });
  expect(next.columns[2]).toMatchObject({ field: 'site', confidence: 1 });
  expect(next.columns[0]).toBe(mapping.columns[0]);
  expect(mapping.columns[2]?.field).toBeNull();
});

test('a unit that cannot become the canonical one is refused with what is wanted', () => {
  const faults = faultsOf(setColumn(mapping, 1, { unit: 'kg m-3' }), kind, sheets);
  expect(faults).toHaveLength(1);
  expect(faults[0]).toMatchObject({ place: 'column-1-unit' });
  expect(faults[0]?.message).toMatch(/mass per area and time/);
});

test('two columns cannot both be the age, but two tracers can both be fluxes', () => {
  expect(faultAt(setColumn(mapping, 2, { field: 'ageKaBp' }))).toEqual(['column-2-field']);
  expect(faultAt(setColumn(mapping, 2, { field: 'fluxGM2Yr' }))).toEqual([]);
});

test('a value for every row wants a field and a text, and can be removed again', () => {
  const added = addConstant(mapping, 'MAR', '');
  expect(faultAt(added)).toEqual(['constant-0-field']);
  const named = setConstant(added, 0, { field: 'site' });
  expect(faultAt(named)).toEqual(['constant-0-text']);
  expect(faultAt(setConstant(named, 0, { text: 'QX-07' }))).toEqual([]);
  expect(removeConstant(added, 0).constants).toEqual([]);
});

test('a used sheet without site and position says which are missing, and a constant settles it', () => {
  const titles = missingFields(mapping, kind)[0]?.titles ?? [];
  const site = kind.fields.find(({ field }) => field === 'site')!;
  expect(titles).toContain(site.title);
  const settled = setConstant(addConstant(mapping, 'MAR', 'site'), 0, { text: 'QX-07' });
  expect(missingFields(settled, kind)[0]?.titles ?? []).not.toContain(site.title);
});
