import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { useCallback, useState } from 'react';
import { setMetadata, type Metadata } from '../changes';
import type { Changing } from '../use-change';
import { isStorable, metadataFaults, tidyMetadata } from './check-metadata';

const same = (a: Metadata, b: Metadata) =>
  JSON.stringify(tidyMetadata(a)) === JSON.stringify(tidyMetadata(b));

/** The form while it is filled in: kept while the panel is closed, saved when a field is left. */
export function useMetadataDraft(detail: SubmissionDetail, { change }: Changing) {
  const [draft, setDraft] = useState<Metadata | null>(null);
  const metadata = draft ?? detail.metadata;
  const dirty = draft !== null && !same(draft, detail.metadata);
  const storable = isStorable(metadata);
  const save = useCallback(async () => {
    if (draft === null || !dirty || !storable) return;
    const sent = draft;
    if (await change(setMetadata(tidyMetadata(sent)))) setDraft((now) => (now === sent ? null : now));
  }, [draft, dirty, storable, change]);
  return {
    metadata,
    faults: metadataFaults(metadata),
    dirty,
    storable,
    edit: (part: Metadata) => setDraft({ ...metadata, ...part }),
    save,
  };
}

export type MetadataDraft = ReturnType<typeof useMetadataDraft>;
