import type { SampleRow } from '@siltlight/common/dataset/sample-row';
import { METADATA_FORM, type MetadataField } from '@siltlight/common/dataset/metadata-form';
import type { SubmissionMetadata } from '@siltlight/common/vetting/context';

/** Questions of the form that are wanted and that neither the form nor every row of the sheet answers. */
export function missingMetadata(metadata: SubmissionMetadata, rows: readonly SampleRow[]): string[] {
  return METADATA_FORM.filter((question) => question.required && !answered(question, metadata, rows)).map(
    ({ field }) => field,
  );
}

function answered(
  question: MetadataField,
  metadata: SubmissionMetadata,
  rows: readonly SampleRow[],
): boolean {
  const answer = metadata[question.field];
  if (Array.isArray(answer) ? answer.length > 0 : answer !== undefined && answer !== '') return true;
  const column = question.answeredBySheet;
  return (
    column !== undefined &&
    rows.length > 0 &&
    rows.every(({ cells }) => (cells[column]?.value ?? null) !== null)
  );
}
