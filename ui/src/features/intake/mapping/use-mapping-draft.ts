import { datasetKind } from '@siltlight/common/dataset/kinds';
import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import { useMemo, useState } from 'react';
import { setMapping, type Mapping } from '../changes';
import type { Changing } from '../use-change';
import { faultsOf, missingFields } from './mapping-edits';

type Counts = SubmissionDetail['counts'];

/** The mapping while it is corrected: kept while the panel is closed, sent as a whole. */
export function useMappingDraft(detail: SubmissionDetail, { change }: Changing) {
  const [draft, setDraft] = useState<Mapping | null>(null);
  const [before, setBefore] = useState<Counts | null>(null);
  const mapping = draft ?? detail.mapping;
  const kind = datasetKind(detail.kind);
  const faults = useMemo(
    () => faultsOf(mapping, kind, detail.workbook.sheets),
    [mapping, kind, detail.workbook.sheets],
  );
  const missing = useMemo(() => missingFields(mapping, kind), [mapping, kind]);
  return {
    mapping,
    kind,
    faults,
    missing,
    dirty: draft !== null,
    /** counts before the last applied correction */
    before,
    edit: (next: Mapping) => setDraft(next),
    discard: () => setDraft(null),
    apply: async () => {
      const counts = detail.counts;
      if (!(await change(setMapping(mapping)))) return;
      setDraft((now) => (now === draft ? null : now)); // what was typed meanwhile stays
      setBefore(counts);
    },
  };
}

export type MappingDraft = ReturnType<typeof useMappingDraft>;
