import type { FindingView } from '@siltlight/common/wire/submissions';
import { keyOf } from '../places';
import { severityRank, type Severity } from '../severity';

export type CellMark = { worst: Severity; messages: string[] };

/** Open findings by cell; a waived one no longer marks its cell. */
export function cellMarks(findings: readonly FindingView[]): Map<string, CellMark> {
  const marks = new Map<string, CellMark>();
  for (const { sheet, row, column, severity, message, waived } of findings) {
    if (sheet === null || row === null || column === null || waived) continue;
    const key = keyOf(sheet, column, row);
    const mark = marks.get(key);
    if (!mark) marks.set(key, { worst: severity, messages: [message] });
    else {
      mark.messages.push(message);
      if (severityRank[severity] < severityRank[mark.worst]) mark.worst = severity;
    }
  }
  return marks;
}
