import { type CitedDataset, type ExportSubject, NOTES_ON_USE, standing } from '../export-subject';
import { REGIONAL_COLUMNS } from './regional-table';

/** Frictionless Data Package of the table: names, types, units, missing values, where it came from. */
export function regionalTableDescriptor(
  subject: ExportSubject,
  file: { fileName: string; sha256: string; bytes: number },
) {
  const { content, runNumber, checksum, datasets } = subject;
  return {
    profile: 'tabular-data-package',
    name: `siltlight-run-${runNumber}`,
    title: content.title,
    description: [standing(subject), ...NOTES_ON_USE].join(' '),
    version: content.codeVersion,
    licenses: licensesOf(datasets),
    sources: datasets.map(({ slug, number, citation, checksum: sha256 }) => ({
      title: citation,
      path: `holdings/${slug}/versions/${number}`,
      sha256,
    })),
    'siltlight:estimateChecksum': checksum,
    'siltlight:request': content.request,
    resources: [
      {
        name: 'regional-table',
        path: file.fileName,
        profile: 'tabular-data-resource',
        format: 'csv',
        mediatype: 'text/csv',
        encoding: 'utf-8',
        bytes: file.bytes,
        hash: `sha256:${file.sha256}`,
        schema: {
          fields: REGIONAL_COLUMNS.map(({ name, title, type, unit }) => ({
            name,
            title,
            type,
            ...(unit ? { unit } : {}),
          })),
          missingValues: [''],
          primaryKey: ['slice', 'reference', 'region_code'],
        },
      },
    ],
  };
}

/** What a merged table inherits: every licence of the datasets behind it. */
function licensesOf(datasets: readonly CitedDataset[]): { name: string }[] {
  const names = new Set(datasets.flatMap(({ licence }) => licence ?? []));
  return [...names].sort().map((name) => ({ name }));
}
