import { columnLetter } from './grid';
import type { ColumnProposal, Mapping, TableConstant, TableProposal } from './mapping';
import type { RowSpan } from './positions';
import type { Claim } from './recognise-columns';

/** A table on its way to the proposal. */
export interface Draft {
  table: TableProposal;
  claims: Claim[];
  constants: TableConstant[];
  /** rows above its headers that belong to no earlier table; null where nothing is looked for */
  span: RowSpan | null;
  /** rows above the first table of the sheet, for a later one */
  general: RowSpan | null;
}

/** One list of columns for each sheet; where tables of one sheet differ, each column says to which it belongs. */
export function assembleMapping(drafts: Draft[]): Mapping {
  const mapping: Mapping = { tables: drafts.map((draft) => draft.table), columns: [], constants: [] };
  for (const [index, draft] of drafts.entries()) {
    const siblings = drafts.filter((other) => other.table.sheet === draft.table.sheet);
    const wanted = draft.table.used || !siblings.some((other) => other.table.used);
    const isFirstAlike =
      siblings.find((other) => layout(other) === layout(draft) && other.table.used === draft.table.used) ===
      draft;
    if (!wanted || !isFirstAlike) continue;
    const differs = siblings.some((other) => other.table.used && layout(other) !== layout(draft));
    const mark = differs ? { table: index } : {};
    mapping.columns.push(
      ...draft.claims
        .filter(isWorthListing)
        .map((claim) => ({ ...column(claim, draft.table.sheet), ...mark })),
    );
    mapping.constants.push(...draft.constants.map((constant) => ({ ...constant, ...mark })));
  }
  return mapping;
}

const layout = (draft: Draft): string =>
  JSON.stringify([
    draft.claims.map((claim) => [claim.heading.text, claim.field, claim.heading.unit]),
    draft.constants.map((one) => [one.field, one.text]),
  ]);

const isWorthListing = (claim: Claim): boolean =>
  claim.field !== null || claim.heading.text !== '' || claim.heading.unit !== null;

function column(claim: Claim, sheet: string): ColumnProposal {
  const { heading, field, confidence, reason, quantity } = claim;
  return {
    sheet,
    column: columnLetter(heading.index),
    heading: heading.text,
    field,
    unit: heading.unit,
    confidence: Math.min(1, confidence),
    reason,
    ...(field !== null && quantity !== undefined ? { quantity } : {}),
  };
}
