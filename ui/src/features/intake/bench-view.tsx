import type { SubmissionDetail } from '@siltlight/common/wire/submissions';
import type { KeyboardEvent } from 'react';
import { LeaveGuard } from '../../shared/form/leave-guard';
import { BenchGrid } from './bench-grid';
import { ChangeProblem } from './change-problem';
import { DecisionBar } from './decision/decision-bar';
import { Drawer } from './drawer/drawer';
import { FactsLine } from './facts-line';
import { HistoryPanel } from './history-panel';
import { MappingPanel } from './mapping/mapping-panel';
import { useMappingDraft } from './mapping/use-mapping-draft';
import { MetadataPanel } from './metadata/metadata-panel';
import { useMetadataDraft } from './metadata/use-metadata-draft';
import { ReasonDialog } from './reason-dialog';
import { SheetTabs } from './sheet-tabs';
import { useBench } from './use-bench';

const isTyping = (target: EventTarget) =>
  target instanceof HTMLElement && target.matches('input, textarea, select, [contenteditable="true"]');

/** The bench: the sheet as it was sent, with what the rules found beside it and the next step at its foot. */
export function BenchView({ detail }: { detail: SubmissionDetail }) {
  const bench = useBench(detail);
  const mapping = useMappingDraft(detail, bench.changing);
  const metadata = useMetadataDraft(detail, bench.changing);
  const { panel, openPanel, place, changing, reason, askReason, mends } = bench;
  const close = () => openPanel(null);
  const keys = (event: KeyboardEvent) => {
    if ((event.key !== ']' && event.key !== '[') || isTyping(event.target)) return;
    event.preventDefault();
    event.stopPropagation();
    bench.step(event.key === ']' ? 1 : -1);
  };
  const tables = panel === 'mapping' ? mapping.mapping.tables : detail.mapping.tables;
  return (
    <div className="intake-bench" onKeyDown={keys}>
      <FactsLine detail={detail} sheet={place.sheet} />
      <div className={panel ? `bench with-${panel}` : 'bench'}>
        <div className="bench-main">
          <SheetTabs
            detail={detail}
            sheet={place.sheet}
            onSheet={(sheet) => {
              const table = detail.mapping.tables.find((one) => one.used && one.sheet === sheet);
              bench.pick({ sheet, row: table?.firstRow ?? 1, column: 'A' });
            }}
          />
          <BenchGrid bench={bench} tables={tables} />
        </div>
        {panel === 'mapping' && <MappingPanel bench={bench} draft={mapping} onClose={close} />}
        {panel === 'metadata' && <MetadataPanel bench={bench} draft={metadata} onClose={close} />}
        {panel === 'history' && <HistoryPanel id={detail.id} onClose={close} />}
        {panel === null && <Drawer bench={bench} />}
      </div>
      {reason === null && <ChangeProblem bench={bench} />}
      <DecisionBar bench={bench} />
      {reason && (
        <ReasonDialog
          wanted={reason}
          busy={changing.busy}
          problem={changing.problem}
          onClose={() => askReason(null)}
        />
      )}
      <LeaveGuard
        when={mapping.dirty || metadata.dirty || mends.unsent.size > 0}
        what="Corrections of the mapping, answers in the form or mends are not saved yet."
      />
    </div>
  );
}
