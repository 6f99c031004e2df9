import type { DatasetKind } from '../dataset/field';
import { fluxQuantityOf } from '../dataset/flux-quantity';
import type { SampleRow } from '../dataset/sample-row';
import { deriveFlux } from './derive-flux';
import { emptySample } from './empty-sample';
import type { RawWorkbook } from './grid';
import type { NormaliseOptions } from './mapped-columns';
import type { Correction, Mapping } from './mapping';
import { type CellReading, spreadOf } from './read-column';
import { readTables, type RowReading, type TablesRead } from './read-tables';

export type NormalisedWorkbook = TablesRead<SampleRow>;

/**
 * Reads every mapped cell of every used table into canonical units, with its whole way from the file.
 *
 * A sheet row gives one sample for each column mapped to the value field (two tracers: two samples, with their
 * own quantity); to each of them belongs the nearest column on its left of any field mapped more than once, and the
 * nearest uncertainty on its right. Totals, blank rows and rows without a number are passed over. Rows without a
 * value come out with null. Corrections lie over the raw text, which stays. Linear in the number of cells; never throws
 * on what a file holds. For kinds whose rows are no samples: `normaliseRecords`.
 */
export function normaliseWorkbook(
  workbook: RawWorkbook,
  kind: DatasetKind,
  mapping: Mapping,
  corrections: Correction[] = [],
  options: NormaliseOptions = {},
): NormalisedWorkbook {
  return readTables(workbook, kind, mapping, corrections, options, (reading) => sampleOf(kind, reading));
}

function sampleOf(kind: DatasetKind, { sheet, row, group, fields }: RowReading): SampleRow {
  const sample = emptySample(sheet, row, group.quantity);
  const values = sample as unknown as Record<string, unknown>;
  const put = (field: string, { value, traced }: Pick<CellReading, 'value' | 'traced'>): void => {
    sample.cells[field] = traced;
    if (field in sample && field !== 'cells') values[field] = value;
  };
  for (const [field, reading] of fields) put(field, reading);
  const spread = fields.get(kind.valueField)?.plusMinus;
  const own = fields.get(kind.sigmaField);
  if (spread !== undefined && (own === undefined || own.traced.rule === 'empty'))
    put(kind.sigmaField, spreadOf(fields.get(kind.valueField)!));
  if (sample.quantity === null || sample.quantity === '') sample.quantity = group.quantity;
  const named = sample.cells.quantity?.value;
  if (typeof named === 'string') sample.quantity = fluxQuantityOf(named) ?? named;
  const hasValueColumn = group.columns.some((one) => one.reader.field.field === kind.valueField);
  if (kind.id === 'dust-flux' && !hasValueColumn) deriveFlux(sample);
  return sample;
}
