import type { RecordRow } from '../dataset/record-row';
import type { SampleRow } from '../dataset/sample-row';
import { emptySample } from '../sheet/empty-sample';

/**
 * Rows of a record as rules see rows: place, age and all cells under the fields of their kind. Rules that look at samples
 * alone do not run on them (`Rule.kinds`).
 */
export function recordsAsSamples(records: readonly RecordRow[]): SampleRow[] {
  return records.map((record) => {
    const sample = emptySample(
      record.sheet,
      record.row,
      'quantity' in record ? record.quantity : record.kind,
    );
    const values = sample as unknown as Record<string, unknown>;
    for (const [field, traced] of Object.entries(record.cells))
      if (field in sample && field !== 'cells') values[field] = traced.value;
    return { ...sample, cells: record.cells };
  });
}
