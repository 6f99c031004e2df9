import { describe, expect, test } from 'vitest';
import { DomainError } from '../physical/domain-error';
import { convertTo, UNIT_KINDS } from '../units/convert';
import { isUnitProblem } from '../units/unit';
import { fluxQuantityOf, isDustProxy } from './flux-quantity';
import { DATASET_KINDS, datasetKind } from './kinds';
import { METADATA_FORM } from './metadata-form';
import { readableKind, RECORD_KINDS } from './record-kinds';

const KINDS = [...DATASET_KINDS, ...RECORD_KINDS];

describe('declarations of dataset kinds', () => {
  test('every field converts its own canonical unit, and required fields can be found by a heading', () => {
    for (const field of KINDS.flatMap((kind) => kind.fields)) {
      expect(field.headings.length, field.field).toBeGreaterThan(0);
      if (!(field.quantity in UNIT_KINDS)) continue;
      const conversion = convertTo(field.quantity as keyof typeof UNIT_KINDS, field.canonicalUnit);
      expect(isUnitProblem(conversion) ? conversion.message : conversion.factor, field.field).toBe(1);
    }
  });

  test('within a kind no field and no heading is declared twice', () => {
    for (const kind of KINDS) {
      const fields = kind.fields.map((field) => field.field);
      expect(new Set(fields).size).toBe(fields.length);
      const headings = kind.fields.flatMap((field) => field.headings);
      expect(
        headings.filter((heading, i) => headings.indexOf(heading) !== i),
        kind.id,
      ).toEqual([]);
    }
  });

  test('headings are declared as they are compared: lower case, without accents and punctuation', () => {
    for (const heading of KINDS.flatMap((kind) => kind.fields.flatMap((field) => field.headings))) {
      expect(heading).toMatch(/^[\p{Ll}\d]+( [\p{Ll}\d]+)*$/u);
    }
  });

  test('value and sigma fields are declared, and an unknown kind is refused by name', () => {
    for (const kind of KINDS) {
      for (const name of [kind.valueField, kind.sigmaField])
        expect(kind.fields.some((field) => field.field === name)).toBe(true);
    }
    expect(() => datasetKind('pollen')).toThrow(DomainError);
    expect(datasetKind('dust-flux').valueField).toBe('fluxGM2Yr');
    expect(() => datasetKind('gas-record')).toThrow(DomainError);
    expect(readableKind('gas-record').valueField).toBe('co2Ppm');
    expect(() => readableKind('pollen')).toThrow(DomainError);
  });

  test('patterns of the metadata form accept what they name and refuse what they do not', () => {
    const pattern = (field: string) =>
      new RegExp(METADATA_FORM.find((one) => one.field === field)?.pattern?.regex ?? '^$');
    expect(pattern('publicationDoi').test('10.1038/nature06763')).toBe(true);
    expect(pattern('publicationDoi').test('doi:10.1038')).toBe(false);
    expect(pattern('licence').test('CC-BY-4.0')).toBe(true);
    expect(pattern('licence').test('free for all')).toBe(false);
  });
});

describe('what a flux is of', () => {
  test.each([
    ['Dust flux', 'dust'],
    ['Staubfluss', 'dust'],
    ['nssCaflux', 'nssCa'],
    ['Ca flux', 'Ca'],
    ['Ca2+', 'Ca'],
    ['Fe flux', 'Fe'],
    ['ssNaflux', 'ssNa'],
    ['232Th flux', '232Th'],
    ['nssSO4flux', 'nssSO4'],
    ['Total MAR', 'bulk sediment'],
    ['Flux', null],
    ['Calibrated age', null],
  ])('a column headed %s is of %s', (heading, quantity) => expect(fluxQuantityOf(heading)).toBe(quantity));

  test('sea salt and sulfate are no proxies of dust', () => {
    expect(['nssCa', 'Fe', 'ssNa', 'nssSO4'].map(isDustProxy)).toEqual([true, true, false, false]);
  });
});
