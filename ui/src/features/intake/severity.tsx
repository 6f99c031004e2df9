import { ErrorCircle16Filled, Info16Regular, Warning16Filled } from '@fluentui/react-icons';
import type { FindingView } from '@siltlight/common/wire/submissions';

export type Severity = FindingView['severity'];
export const severities: readonly Severity[] = ['error', 'warning', 'note'];
export const severityRank: Record<Severity, number> = { error: 0, warning: 1, note: 2 };

const icons = { error: ErrorCircle16Filled, warning: Warning16Filled, note: Info16Regular };

export function SeverityIcon({ severity }: { severity: Severity }) {
  const Icon = icons[severity];
  return <Icon className={`severity ${severity}`} role="img" aria-label={severity} aria-hidden={undefined} />;
}
