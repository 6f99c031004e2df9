import { METADATA_FORM } from '@siltlight/common/dataset/metadata-form';
import type { FindingView } from '@siltlight/common/wire/submissions';
import { leaveOut, waive, type NewCorrection, type RowPlace } from './changes';
import type { FindingGroup } from './drawer/group-findings';
import { placeWords } from './places';
import type { Bench } from './use-bench';
import { counted } from '../../shared/number/format';

export type FindingAct = { label: string; act: () => void };

const atOnce = 2000;

const cellOf = (finding: FindingView) =>
  finding.sheet !== null && finding.row !== null && finding.column !== null
    ? { sheet: finding.sheet, row: finding.row, column: finding.column }
    : null;

export function rowsOfFindings(findings: readonly FindingView[]): RowPlace[] {
  const rows = new Map<string, RowPlace>();
  for (const { sheet, row } of findings)
    if (sheet !== null && row !== null) rows.set(`${sheet}!${row}`, { sheet, row });
  return [...rows.values()];
}

/** Mends that the rules themselves propose. */
export const proposedMends = (findings: readonly FindingView[]): NewCorrection[] =>
  findings.flatMap((finding) => {
    const cell = cellOf(finding);
    return cell && finding.proposal !== undefined ? [{ ...cell, text: finding.proposal }] : [];
  });

/** What the person may do about one finding, the rule's own remedy first. */
export function actsOf(finding: FindingView, bench: Bench): FindingAct[] {
  const { detail, openPanel, pickFinding } = bench;
  const { mayEdit, mayDecide } = detail.rights;
  const acts: FindingAct[] = [];
  if (finding.waived) return acts;
  if (mayEdit && finding.remedyKind === 'mend' && cellOf(finding)) {
    const { proposal } = finding;
    if (proposal !== undefined)
      acts.push({ label: `Propose “${proposal}”`, act: () => pickFinding(finding, proposal) });
    acts.push({ label: 'Mend the cell', act: () => pickFinding(finding) });
  }
  if (mayEdit && finding.remedyKind === 'answer') {
    const asked = METADATA_FORM.find(({ field }) => field === finding.field);
    acts.push(
      asked
        ? { label: 'Answer in the form', act: () => openPanel('metadata', asked.field) }
        : { label: 'Open the mapping', act: () => openPanel('mapping', finding.field ?? null) },
    );
  }
  if (mayEdit && finding.severity !== 'note' && finding.sheet !== null && finding.row !== null)
    acts.push({ label: 'Leave the row out', act: () => askToLeaveOut(bench, rowsOfFindings([finding])) });
  if (mayDecide && finding.severity === 'warning')
    acts.push({ label: 'Waive with a reason', act: () => askToWaive(bench, [finding]) });
  return acts;
}

/** The same for all findings of a rule at once. */
export function actsOfGroup(group: FindingGroup, bench: Bench): FindingAct[] {
  const { mayEdit, mayDecide } = bench.detail.rights;
  const { open, severity } = group;
  if (open.length < 2) return [];
  const acts: FindingAct[] = [];
  const proposed = proposedMends(open);
  const rows = rowsOfFindings(open);
  if (mayEdit && proposed.length > 1)
    acts.push({ label: `Take all ${proposed.length} proposals`, act: () => void bench.mends.send(proposed) });
  if (mayEdit && severity !== 'note' && rows.length > 1)
    acts.push({ label: `Leave all ${rows.length} rows out`, act: () => askToLeaveOut(bench, rows) });
  if (mayDecide && severity === 'warning')
    acts.push({ label: `Waive all ${open.length}`, act: () => askToWaive(bench, open) });
  return acts;
}

export function askToLeaveOut({ askReason, changing }: Bench, rows: RowPlace[]): void {
  askReason({
    title: rows.length === 1 ? `Leave row ${rows[0]!.row} out?` : `Leave ${counted(rows.length, 'row')} out?`,
    act: rows.length === 1 ? 'Leave the row out' : 'Leave the rows out',
    note: 'Left-out rows stay visible, settle their findings and never enter a version. They can be taken back.',
    send: (reason) => inParts(rows, (part) => changing.change(leaveOut(part, reason))),
  });
}

export function askToWaive({ askReason, changing, detail }: Bench, findings: readonly FindingView[]): void {
  const [first] = findings;
  if (!first) return;
  const where = placeWords(first, detail.workbook.sheets.length);
  askReason({
    title:
      findings.length === 1
        ? `Waive “${first.title}” on ${where}?`
        : `Waive ${findings.length} × “${first.title}”?`,
    act: 'Waive',
    note: 'The reason is kept with your name and stands in the record of the dataset version.',
    send: (reason) =>
      inParts(findings, (part) =>
        changing.change(
          waive(
            part.map(({ key }) => key),
            reason,
          ),
        ),
      ),
  });
}

/** The service takes a few thousand places at a time. */
async function inParts<T>(all: readonly T[], send: (part: T[]) => Promise<boolean>): Promise<boolean> {
  for (let from = 0; from < all.length; from += atOnce) {
    if (!(await send(all.slice(from, from + atOnce)))) return false;
  }
  return true;
}
