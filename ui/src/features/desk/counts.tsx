import { ErrorCircle16Filled, Warning16Filled } from '@fluentui/react-icons';

/** A count of findings: icon and number, plain when there are none. */
export function FindingCount({ severity, count }: { severity: 'error' | 'warning'; count: number }) {
  if (count === 0) return <span className="sl-muted">0</span>;
  const Icon = severity === 'error' ? ErrorCircle16Filled : Warning16Filled;
  return (
    <span className={`desk-count ${severity}`}>
      <Icon aria-label={severity === 'error' ? 'errors' : 'warnings'} />
      {count}
    </span>
  );
}
