import type { FindingView, SubmissionDetail } from '@siltlight/common/wire/submissions';
import { useQuery } from '@tanstack/react-query';
import { useCallback, useMemo, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { CellPlace } from './changes';
import type { GridCommand } from './grid/grid-command';
import { shownSeverities, stepFinding, groupFindings } from './drawer/group-findings';
import { placeOfFinding } from './places';
import { findingsQuery } from './queries';
import type { ReasonWanted } from './reason-dialog';
import { useChanging } from './use-change';
import { useMends } from './use-mends';
import { usePlace } from './use-place';

export type PanelName = 'mapping' | 'metadata' | 'history';
const noFindings: FindingView[] = [];

const asPanel = (text: string | null): PanelName | null =>
  text === 'mapping' || text === 'metadata' || text === 'history' ? text : null;

/** State of the bench that its parts share: the picked cell and finding, the open panel, what is being asked. */
export function useBench(detail: SubmissionDetail) {
  const [params, setParams] = useSearchParams();
  const [place, pick] = usePlace(detail);
  const [command, setCommand] = useState<GridCommand | null>(null);
  const [picked, setPicked] = useState<string | null>(null);
  const [reason, askReason] = useState<ReasonWanted | null>(null);
  const [queryAt, openQuery] = useState<CellPlace | null>(null);
  const changing = useChanging(detail.id);
  const mends = useMends(changing);
  const findings = useQuery(findingsQuery(detail.id));

  const items = findings.data?.items ?? noFindings;
  const shown = useMemo(() => shownSeverities(params.get('show')), [params]);
  const groups = useMemo(
    () => groupFindings(items.filter(({ severity }) => shown.includes(severity))),
    [items, shown],
  );

  const set = useCallback(
    (name: string, value: string | null, extra: Record<string, string | null> = {}) =>
      setParams(
        (before) => {
          const after = new URLSearchParams(before);
          for (const [key, text] of Object.entries({ ...extra, [name]: value })) {
            if (text === null) after.delete(key);
            else after.set(key, text);
          }
          return after;
        },
        { preventScrollReset: true },
      ),
    [setParams],
  );

  const go = useCallback(
    (to: CellPlace, edit: string | null = null) => {
      pick(to);
      setCommand({ edit });
    },
    [pick],
  );
  const pickFinding = useCallback(
    (finding: FindingView, edit: string | null = null) => {
      setPicked(finding.key);
      const to = placeOfFinding(finding, detail.mapping);
      if (to) go(to, edit);
    },
    [detail.mapping, go],
  );
  const step = (by: 1 | -1) => {
    const order = groups.flatMap((group) => group.open);
    const next = stepFinding(order, picked, by);
    if (next) pickFinding(next);
  };

  return {
    detail,
    changing,
    mends,
    findings,
    items,
    groups,
    shown,
    place,
    pick,
    go,
    command,
    picked,
    pickFinding,
    step,
    reason,
    askReason,
    queryAt,
    openQuery,
    panel: asPanel(params.get('panel')),
    openPanel: (panel: PanelName | null, field: string | null = null) => set('panel', panel, { field }),
    field: params.get('field'),
    show: (severities: string) => set('show', severities),
  };
}

export type Bench = ReturnType<typeof useBench>;
