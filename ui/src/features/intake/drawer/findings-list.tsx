import { useEffect, useState } from 'react';
import { EmptyState } from '../../../shared/feedback/empty-state';
import { ErrorState } from '../../../shared/feedback/error-state';
import { LoadingRows } from '../../../shared/feedback/loading';
import { counted } from '../../../shared/number/format';
import { severities, SeverityIcon, type Severity } from '../severity';
import type { Bench } from '../use-bench';
import { FindingGroupView } from './finding-group';
import { countBySeverity } from './group-findings';

const words: Record<Severity, string> = { error: 'error', warning: 'warning', note: 'note' };

/** Findings grouped by rule, with filters by severity. */
export function FindingsList({ bench }: { bench: Bench }) {
  const { findings, items, groups, picked } = bench;
  const [open, setOpen] = useState<ReadonlySet<string>>(new Set());
  const holder = groups.find((group) => group.items.some(({ key }) => key === picked))?.key;
  useEffect(() => {
    if (holder) setOpen((before) => new Set([...before, holder]));
  }, [holder, picked]);
  if (findings.error && !findings.data)
    return <ErrorState error={findings.error} retry={() => void findings.refetch()} />;
  if (!findings.data) return <LoadingRows label="Loading the findings" />;
  const toggle = (key: string) =>
    setOpen((before) => {
      const next = new Set(before);
      if (!next.delete(key)) next.add(key);
      return next;
    });
  const left = findings.data.total - items.length;
  return (
    <>
      <SeverityFilter bench={bench} />
      {groups.length === 0 ? (
        <Nothing found={items.length} />
      ) : (
        <ul className="finding-groups">
          {groups.map((group) => (
            <FindingGroupView
              key={group.key}
              group={group}
              bench={bench}
              open={open.has(group.key)}
              onToggle={() => toggle(group.key)}
            />
          ))}
        </ul>
      )}
      <p className="drawer-foot">
        {left > 0 && `${counted(left, 'further finding')} wait until these are settled. `}An error cannot be
        waived: mend it, answer in the form, or leave its row out.
      </p>
    </>
  );
}

function SeverityFilter({ bench: { items, shown, show } }: { bench: Bench }) {
  const counts = countBySeverity(items);
  const flip = (severity: Severity) => {
    const next = severities.filter((one) => (one === severity ? !shown.includes(one) : shown.includes(one)));
    show(next.join('.') || 'none');
  };
  return (
    <div className="severity-chips" role="group" aria-label="Show findings">
      {severities.map((severity) => (
        <button
          key={severity}
          type="button"
          className="severity-chip"
          aria-pressed={shown.includes(severity)}
          onClick={() => flip(severity)}
        >
          <SeverityIcon severity={severity} />
          {counted(counts[severity], words[severity])}
        </button>
      ))}
    </div>
  );
}

const Nothing = ({ found }: { found: number }) =>
  found === 0 ? (
    <EmptyState title="No rule found anything.">The table is as clean as the rules can tell.</EmptyState>
  ) : (
    <EmptyState title="All findings are filtered away.">Press a severity above to see them.</EmptyState>
  );
