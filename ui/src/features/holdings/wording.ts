import { ARCHIVES, METADATA_FORM, type MetadataKey } from '@siltlight/common/dataset/metadata-form';
import { datasetKind } from '@siltlight/common/dataset/kinds';
import type { DatasetVersionDetail } from '@siltlight/common/wire/datasets';

export const archiveTitle = (archive: string | null | undefined) =>
  ARCHIVES.find(({ value }) => value === archive)?.label ?? archive ?? null;

export const kindTitle = (kind: string) => datasetKind(kind).title;

const gradeTitles: Record<string, string> = {
  measured: 'measured',
  recomputed: 'recomputed',
  digitised: 'digitised',
};
const described: readonly MetadataKey[] = [
  'licence',
  'archive',
  'method',
  'sizeCutoff',
  'dustDefinition',
  'ageDatum',
  'ageModel',
  'uncertaintyMeaning',
  'densityBasis',
  'publicationDoi',
  'publicationCitation',
  'note',
];

/** What the form says of a version, in the form's own words; questions left open are left away. */
export function descriptionOf({ metadata, grade }: Pick<DatasetVersionDetail, 'metadata' | 'grade'>) {
  const lines: { key: string; label: string; text: string }[] = described.flatMap((key) => {
    const question = METADATA_FORM.find(({ field }) => field === key);
    const value = metadata[key];
    if (!question || typeof value !== 'string' || value === '') return [];
    const text =
      question.input === 'choice'
        ? (question.choices?.find((one) => one.value === value)?.label ?? value)
        : value;
    return [{ key, label: question.label, text }];
  });
  return grade ? [...lines, { key: 'grade', label: 'Grade', text: gradeTitles[grade] ?? grade }] : lines;
}
