import type { DatasetContent } from './dataset-content';

/** How a dataset version is cited: people, year, title, version, licence, what it rests on, and its checksum. */
export function citationOf(
  { metadata, title, contributor, invented }: DatasetContent,
  version: { number: number; checksum: string; publishedAt: string | null },
): string {
  const people = (metadata.creators ?? []).map(({ name }) => name).join('; ') || contributor.name;
  const year = (version.publishedAt ?? '').slice(0, 4);
  const parts = [
    `${people} (${year}): ${title}, version ${version.number}. Siltlight Holdings.`,
    metadata.licence ? `${metadata.licence}.` : '',
    metadata.publicationDoi
      ? `Supplement to https://doi.org/${metadata.publicationDoi.replace(/^https?:\/\/doi\.org\//, '')}.`
      : '',
    !metadata.publicationDoi && metadata.publicationCitation
      ? `After ${metadata.publicationCitation.replace(/\.$/, '')}.`
      : '',
    `SHA-256 ${version.checksum}.`,
    invented ? 'Invented data, not for use.' : '',
  ];
  return parts.filter((part) => part !== '').join(' ');
}
