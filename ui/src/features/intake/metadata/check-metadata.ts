import { METADATA_FORM, type MetadataField, type MetadataKey } from '@siltlight/common/dataset/metadata-form';
import { isValidOrcid } from '@siltlight/common/vetting/rules/v78-orcid';
import { submissionMetadata } from '@siltlight/common/wire/submissions';
import type { Metadata } from '../changes';

export type Creator = NonNullable<Metadata['creators']>[number];
export type MetadataFaults = Partial<Record<MetadataKey | `creators.${number}.${'name' | 'orcid'}`, string>>;

/** What is typed becomes what is sent: trimmed, empty answers left out. */
export function tidyMetadata(metadata: Metadata): Metadata {
  const tidy: Record<string, unknown> = {};
  for (const [key, value] of Object.entries(metadata)) {
    if (typeof value === 'string') {
      if (value.trim()) tidy[key] = value.trim();
    } else if (Array.isArray(value)) {
      const creators = value.map(tidyCreator).filter((one) => one.name || one.orcid || one.affiliation);
      if (creators.length > 0) tidy[key] = creators;
    }
  }
  return tidy;
}

function tidyCreator({ name, orcid, affiliation }: Creator): Creator {
  return {
    name: name.trim(),
    ...(orcid?.trim() ? { orcid: orcid.trim().replace(/^https?:\/\/orcid\.org\//, '') } : {}),
    ...(affiliation?.trim() ? { affiliation: affiliation.trim() } : {}),
  };
}

/** Faults at their fields, while typing. They are said at once; only those of the last kind keep the form from being saved. */
export function metadataFaults(metadata: Metadata): MetadataFaults {
  const tidy = tidyMetadata(metadata);
  const faults: MetadataFaults = {};
  for (const { field, pattern } of METADATA_FORM) {
    const value = tidy[field];
    if (pattern && typeof value === 'string' && !new RegExp(pattern.regex).test(value))
      faults[field] = pattern.message;
  }
  (metadata.creators ?? []).map(tidyCreator).forEach(({ name, orcid, affiliation }, at) => {
    if (!name && (orcid || affiliation)) faults[`creators.${at}.name`] = 'Give the name.';
    if (orcid && !isValidOrcid(orcid))
      faults[`creators.${at}.orcid`] =
        'This is no ORCID iD: its check digit does not fit. It has the form 0000-0002-1825-0097.';
  });
  return faults;
}

/** Whether the service would take it: patterns may wait for submitting, the shape may not. */
export const isStorable = (metadata: Metadata) =>
  submissionMetadata.safeParse(tidyMetadata(metadata)).success;

export type Completeness = { wanted: MetadataField[]; answered: number; of: number };

/** How much of what is wanted is answered; the sheet itself may answer some questions. */
export function completeness(missing: readonly string[], metadata: Metadata): Completeness {
  const tidy = tidyMetadata(metadata);
  const required = METADATA_FORM.filter((question) => question.required);
  const wanted = required.filter(({ field }) => missing.includes(field) && tidy[field] === undefined);
  return { wanted, answered: required.length - wanted.length, of: required.length };
}
