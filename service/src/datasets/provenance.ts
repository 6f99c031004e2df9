import type { Version } from '../versions/version';
import type { DatasetContent } from './dataset-content';

/** W3C PROV (PROV-JSON) of a dataset version: file → mapped and vetted table → version, with who did what. */
export function provenanceOf(
  version: Version<DatasetContent>,
  approver: { id: string; name: string } | null,
) {
  const { content, checksum, number, object, publishedAt } = version;
  const file = `silt:file-${content.file.sha256}`;
  const release = `silt:dataset-${object.slug}-v${number}`;
  const vetting = `silt:vetting-${content.submission.number}`;
  const contributor = `silt:person-${content.contributor.id}`;
  return {
    prefix: { silt: 'urn:siltlight:', prov: 'http://www.w3.org/ns/prov#' },
    entity: {
      [file]: {
        'prov:label': content.file.fileName,
        'silt:sha256': content.file.sha256,
        'silt:bytes': content.file.bytes,
      },
      [release]: {
        'prov:label': `${content.title}, version ${number}`,
        'silt:sha256': checksum,
        'silt:invented': content.invented,
      },
    },
    activity: {
      [vetting]: {
        'prov:label': `Mapping and vetting of ${content.submission.number}`,
        'prov:endTime': publishedAt,
      },
    },
    agent: {
      [contributor]: { 'prov:type': 'prov:Person', 'prov:label': content.contributor.name },
      ...(approver
        ? { [`silt:person-${approver.id}`]: { 'prov:type': 'prov:Person', 'prov:label': approver.name } }
        : {}),
    },
    used: { '_:u1': { 'prov:activity': vetting, 'prov:entity': file } },
    wasGeneratedBy: {
      '_:g1': { 'prov:entity': release, 'prov:activity': vetting, 'prov:time': publishedAt },
    },
    wasDerivedFrom: { '_:d1': { 'prov:generatedEntity': release, 'prov:usedEntity': file } },
    wasAttributedTo: { '_:a1': { 'prov:entity': release, 'prov:agent': contributor } },
    ...(approver
      ? {
          wasAssociatedWith: {
            '_:w1': { 'prov:activity': vetting, 'prov:agent': `silt:person-${approver.id}` },
          },
        }
      : {}),
  };
}
