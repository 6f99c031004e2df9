import { columnLetter } from './grid';
import type { ColumnProposal, Mapping, TableConstant, TableProposal } from './mapping';
import type { RowSpan } from './positions';
import type { SiteBlock } from './site-blocks';
import type { Claim } from './claim';

/** A table on its way to the proposal. */
export interface Draft {
  table: TableProposal;
  claims: Claim[];
  constants: TableConstant[];
  /** rows above its headers that belong to no earlier table; null where nothing is looked for */
  span: RowSpan | null;
  /** rows above the first table of the sheet, for a later one */
  general: RowSpan | null;
  /** what stands over its block of columns, where sites stand side by side */
  block?: SiteBlock;
}

/** One list of columns for each sheet; where tables of one sheet differ, each column says to which it belongs. */
export function assembleMapping(drafts: Draft[]): Mapping {
  const mapping: Mapping = { tables: drafts.map((draft) => draft.table), columns: [], constants: [] };
  for (const listed of bySheet(drafts).values()) {
    const layouts = new Set(listed.map(({ draft }) => layout(draft)));
    const differ = layouts.size > 1;
    for (const { draft, index } of differ ? listed : listed.slice(0, 1)) {
      const mark = differ ? { table: index } : {};
      const columns = draft.claims.filter(isWorthListing).map((claim) => column(claim, draft.table.sheet));
      mapping.columns.push(...columns.map((one) => ({ ...one, ...mark })));
      mapping.constants.push(...draft.constants.map((one) => ({ ...one, ...mark })));
    }
  }
  return mapping;
}

/** Tables of each sheet whose columns are listed: the used ones, or the first where none is used. */
function bySheet(drafts: Draft[]): Map<string, { draft: Draft; index: number }[]> {
  const sheets = new Map<string, { draft: Draft; index: number }[]>();
  for (const [index, draft] of drafts.entries()) {
    const listed = sheets.get(draft.table.sheet) ?? [];
    if (draft.table.used && listed[0]?.draft.table.used === false) listed.length = 0;
    if (draft.table.used || listed.length === 0) listed.push({ draft, index });
    sheets.set(draft.table.sheet, listed);
  }
  return sheets;
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
