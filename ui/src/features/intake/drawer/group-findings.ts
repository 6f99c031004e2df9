import type { FindingView } from '@siltlight/common/wire/submissions';
import { severities, severityRank, type Severity } from '../severity';

export type FindingGroup = {
  key: string;
  code: string;
  title: string;
  severity: Severity;
  items: FindingView[];
  open: FindingView[];
};

/** Findings by rule: errors first, then warnings and notes; within one severity as they stand in the file. */
export function groupFindings(findings: readonly FindingView[]): FindingGroup[] {
  const groups = new Map<string, FindingGroup>();
  for (const finding of findings) {
    const { code, severity, title } = finding;
    const key = `${code}-${severity}`;
    const group = groups.get(key) ?? { key, code, title, severity, items: [], open: [] };
    group.items.push(finding);
    if (!finding.waived) group.open.push(finding);
    groups.set(key, group);
  }
  return [...groups.values()].sort((a, b) => severityRank[a.severity] - severityRank[b.severity]);
}

export function countBySeverity(findings: readonly FindingView[]): Record<Severity, number> {
  const counts = { error: 0, warning: 0, note: 0 };
  for (const { severity } of findings) counts[severity] += 1;
  return counts;
}

/** Which severities are shown: from the address, where "none" hides all; notes wait until asked for. */
export function shownSeverities(text: string | null): Severity[] {
  if (text === null) return ['error', 'warning'];
  return severities.filter((severity) => text.split('.').includes(severity));
}

/** The finding after (step 1) or before (step -1) the picked one, round the end. */
export function stepFinding(
  list: readonly FindingView[],
  pickedKey: string | null,
  step: 1 | -1,
): FindingView | null {
  if (list.length === 0) return null;
  const at = list.findIndex(({ key }) => key === pickedKey);
  if (at < 0) return list[step === 1 ? 0 : list.length - 1]!;
  return list[(at + step + list.length) % list.length]!;
}
