import { measuredRow, type MeasuredRow } from '@siltlight/common/wire/optics';
import { readNumberText } from '../../shared/form/number-text';
import type { Faults } from './species-form';

/** Columns of measured values, in the order of the form. */
export const measuredColumns = [
  { name: 'wavelengthUm', label: 'Wavelength, µm' },
  { name: 'massExtinctionM2PerG.low', label: 'Extinction, low' },
  { name: 'massExtinctionM2PerG.central', label: 'Extinction, m²/g' },
  { name: 'massExtinctionM2PerG.high', label: 'Extinction, high' },
  { name: 'singleScatteringAlbedo.low', label: 'Albedo, low' },
  { name: 'singleScatteringAlbedo.central', label: 'Albedo' },
  { name: 'singleScatteringAlbedo.high', label: 'Albedo, high' },
  { name: 'asymmetry.low', label: 'Asymmetry, low' },
  { name: 'asymmetry.central', label: 'Asymmetry' },
  { name: 'asymmetry.high', label: 'Asymmetry, high' },
] as const;

export type MeasuredForm = { key: number; values: string[] }[];

const valuesOf = (row: MeasuredRow) =>
  [
    row.wavelengthUm,
    ...[row.massExtinctionM2PerG, row.singleScatteringAlbedo, row.asymmetry].flatMap(
      ({ low, central, high }) => [low, central, high],
    ),
  ].map(String);

export const measuredFormOf = (rows: readonly MeasuredRow[]): MeasuredForm =>
  rows.map((row, key) => ({ key, values: valuesOf(row) }));

export const emptyRow = (key: number) => ({ key, values: measuredColumns.map(() => '') });

/** Rows where every field can be read; else each fault by row and column: `0.asymmetry.low`. */
export function readMeasured(form: MeasuredForm): { rows: MeasuredRow[] } | { faults: Faults } {
  const faults: Record<string, string> = {};
  const rows = form.map(({ values }, at) => {
    const numbers = values.map((text, column) => {
      const read = readNumberText(text);
      if ('value' in read) return read.value;
      faults[`${at}.${measuredColumns[column]!.name}`] = read.fault;
      return Number.NaN;
    });
    const span = (from: number) => ({
      low: numbers[from]!,
      central: numbers[from + 1]!,
      high: numbers[from + 2]!,
    });
    const row = {
      wavelengthUm: numbers[0]!,
      massExtinctionM2PerG: span(1),
      singleScatteringAlbedo: span(4),
      asymmetry: span(7),
    };
    for (const { path, message } of measuredRow.safeParse(row).error?.issues ?? []) {
      const field =
        path.length === 1 && path[0] !== 'wavelengthUm' ? `${String(path[0])}.central` : path.join('.');
      faults[`${at}.${field}`] ??= message;
    }
    return row;
  });
  return Object.keys(faults).length > 0 ? { faults } : { rows };
}
