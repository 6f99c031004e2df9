import type { DatasetKind } from '../dataset/field';
import { isRecordKind } from '../dataset/record-kinds';
import { missingCodeOf } from '../units/missing-code';
import { chooseFields } from './choose-fields';
import { columnHeadings } from './column-headings';
import { withColumnNotes } from './column-notes';
import { datumInProse, withProseDatum, withUnitOfAge } from './datum-in-prose';
import { findTables, type FoundTable } from './find-tables';
import { columnLetter, type RawSheet, type RawWorkbook } from './grid';
import { rejoined } from './heading-words';
import { assembleMapping, type Draft } from './assemble-mapping';
import type { Mapping, TableProposal } from './mapping';
import { claimGridMatrix, claimMonthMatrix, gridMatrix } from './matrix';
import { positionInNotes, type RowSpan } from './positions';
import type { Claim } from './claim';
import { recogniseColumns } from './recognise-columns';
import { isFilled, isNumberLike } from './row-kind';
import { type PassOverNote, passOverNotes, reasonToSetAside } from './set-aside';
import { claimsOfBlock, siteBlocks, withoutTitles } from './site-blocks';
import { tableConstants } from './table-constants';
import { findTurned, turnedTable } from './turned';

/** A sheet with more is a report, not data. */
const MOST_TABLES = 60;
/** Rows looked at to tell a column of numbers from one of texts. */
const ROWS_SAMPLED = 200;

/**
 * Proposes how to read a workbook as a dataset kind: where its tables lie, which are used and why not, what each
 * column holds with which unit, and what holds for a whole table. Everything is a proposal with its reason; a person
 * may change any of it and hand the mapping to `normaliseWorkbook`.
 *
 * Pure, deterministic, one pass over the cells and a second over the first rows of each table.
 */
export function proposeWorkbook(workbook: RawWorkbook, kind: DatasetKind): Mapping {
  const found = new Map(workbook.sheets.map((sheet) => [sheet, findTables(sheet)]));
  const notesPosition = positionInNotes(workbook, (sheet) => (found.get(sheet) ?? []).length === 0);
  const notes = passOverNotes(workbook);
  const notesSheets = workbook.sheets.filter((sheet) => (found.get(sheet) ?? []).length === 0);
  const drafts = workbook.sheets.flatMap((sheet) =>
    draftsOf(sheet, found.get(sheet) ?? [], { workbook, kind, notes, notesSheets }),
  );
  for (const draft of drafts) {
    if (draft.table.used) draft.constants = tableConstants(draft, workbook, kind, notesPosition);
  }
  return assembleMapping(drafts);
}

interface FileAtHand {
  workbook: RawWorkbook;
  kind: DatasetKind;
  notes: PassOverNote[];
  /** sheets without a table: what they say holds for the others */
  notesSheets: RawSheet[];
}

function draftsOf(sheet: RawSheet, tables: FoundTable[], file: FileAtHand): Draft[] {
  const turned = findTurned(sheet, file.kind);
  const upright = turned
    ? tables.filter(({ firstRow, lastRow }) => lastRow < turned.firstRow || firstRow > turned.lastRow)
    : tables;
  if (!turned && tables.length === 0)
    return [{ table: notesOnly(sheet), claims: [], constants: [], span: null, general: null }];
  const drafts: Draft[] = turned ? [turnedDraft(sheet, turned, file)] : [];
  for (const found of upright.slice(0, MOST_TABLES)) {
    const headed = drafts.at(-1);
    const span = {
      from: headed === undefined ? 1 : headed.table.lastRow + 1,
      before: found.headerRows[0] ?? found.firstRow,
    };
    const general = drafts[0]?.span ?? null;
    const continues =
      found.headerRows.length === 0 && headed !== undefined && headed.table.headerRows.length > 0;
    if (continues) drafts.push({ ...headed, table: continued(sheet, found, headed.table) });
    else
      drafts.push(
        ...draftsOfTable(sheet, found, span, file).map((draft) => ({
          span,
          general,
          constants: [],
          ...draft,
        })),
      );
  }
  const beyond = upright[MOST_TABLES];
  if (beyond)
    drafts.push({ table: notRead(sheet, beyond), claims: [], constants: [], span: null, general: null });
  return drafts;
}

const notRead = (sheet: RawSheet, from: FoundTable): TableProposal => ({
  ...from,
  sheet: sheet.name,
  lastRow: sheet.rows.length,
  used: false,
  reason: `The sheet has more than ${MOST_TABLES} tables; from row ${from.firstRow} on it is not read. Put the tables below one heading, or on several sheets.`,
});

const continued = (sheet: RawSheet, found: FoundTable, above: TableProposal): TableProposal => ({
  ...found,
  sheet: sheet.name,
  used: above.used,
  reason: `It has no header rows; the columns of the table above (rows ${above.firstRow}–${above.lastRow}) are taken.`,
});

function notesOnly(sheet: RawSheet): TableProposal {
  const rows = Math.max(1, sheet.rows.length);
  const reason = sheet.rows.some((row) => row.some(isFilled))
    ? 'Notes: no table of numbers.'
    : 'The sheet is empty.';
  return {
    sheet: sheet.name,
    headerRows: [],
    unitsRow: null,
    firstRow: 1,
    lastRow: rows,
    used: false,
    reason,
  };
}

type TableDraft = Pick<Draft, 'table' | 'claims' | 'block'>;

/** One draft of a table; of sites that stand side by side one each, with the same rows. */
function draftsOfTable(sheet: RawSheet, found: FoundTable, span: RowSpan, file: FileAtHand): TableDraft[] {
  const below = withoutTitles(sheet, found) ?? found;
  const wide = { ...span, before: below.headerRows[0] ?? below.firstRow };
  const claims = claimsOf(sheet, below, wide, file);
  const blocks = siteBlocks(claims, sheet, wide, file.kind);
  if (!blocks) return [draftOf(sheet, found, span, file)];
  return blocks.map((block) => {
    const own = claimsOfBlock(claims, block);
    const draft = settled(sheet, below, own, file);
    const columns = `${columnLetter(block.first)}–${columnLetter(block.last)}`;
    const reason = `${draft.table.reason} One of ${blocks.length} tables side by side: columns ${columns}.`;
    return { ...draft, table: { ...draft.table, reason }, block };
  });
}

function draftOf(sheet: RawSheet, found: FoundTable, span: RowSpan, file: FileAtHand): TableDraft {
  const matrix = gridMatrix(sheet, found, file.kind);
  if (!matrix) return settled(sheet, found, claimsOf(sheet, found, span, file), file);
  const claims = claimGridMatrix(columnHeadings(sheet, matrix), sheet, matrix);
  const reason = `Matrix: ${reasonUsed(matrix, [], file.kind)}`;
  return { table: { ...matrix, sheet: sheet.name, used: true, reason }, claims };
}

/** What the columns of a table are, each by itself: units from the lines above and the datum of the text included. */
function claimsOf(
  sheet: RawSheet,
  found: FoundTable,
  span: RowSpan,
  { kind, notesSheets }: FileAtHand,
): Claim[] {
  const headings = withColumnNotes(
    rejoined(columnHeadings(sheet, found), sheet, found, kind),
    sheet,
    span,
    kind,
  );
  const claims = recogniseColumns(headings, kind, (index) => numberShare(sheet, found, index));
  const dated = withProseDatum(claims, datumInProse(sheet, span, notesSheets));
  return claimMonthMatrix(withUnitOfAge(dated), kind, sheet, found);
}

function settled(
  sheet: RawSheet,
  found: FoundTable,
  own: Claim[],
  { workbook, kind, notes }: FileAtHand,
): TableDraft {
  const claims = chooseFields(own, kind, sheet, found.headerRows[0] ?? found.firstRow);
  const setAside = reasonToSetAside(sheet, workbook, found.firstRow, notes);
  const unusable = setAside ?? reasonNotUsable(claims, found, kind);
  const reason = unusable ?? reasonUsed(found, claims, kind);
  return { table: { ...found, sheet: sheet.name, used: unusable === null, reason }, claims };
}

function turnedDraft(sheet: RawSheet, table: TableProposal, file: FileAtHand): Draft {
  const span = { from: 1, before: table.firstRow };
  const view = turnedTable(sheet, table, file.kind);
  if (!view) return { table: notesOnly(sheet), claims: [], constants: [], span: null, general: null };
  const claims = claimsOf(view.sheet, view.table, { from: 1, before: 1 }, file);
  const draft = settled(view.sheet, view.table, claims, file);
  const { used, reason } = draft.table;
  const said = used ? table.reason : `${table.reason} ${reason}`;
  return {
    claims: draft.claims,
    table: { ...table, used, reason: said },
    constants: [],
    span,
    general: null,
  };
}

function numberShare(sheet: RawSheet, { firstRow, lastRow }: FoundTable, index: number): number | undefined {
  let [filled, numbers] = [0, 0];
  for (let r = firstRow - 1; r < Math.min(lastRow, firstRow - 1 + ROWS_SAMPLED); r += 1) {
    const cell = sheet.rows[r]?.[index];
    if (!isFilled(cell) || missingCodeOf(cell.text) !== null) continue;
    filled += 1;
    if (isNumberLike(cell)) numbers += 1;
  }
  return filled === 0 ? undefined : numbers / filled;
}

function reasonNotUsable(claims: Claim[], found: FoundTable, kind: DatasetKind): string | null {
  if (found.headerRows.length === 0) return 'It has no header rows, so what its columns hold cannot be told.';
  const fields = new Set(
    claims
      .filter((claim) => claim.field === kind.valueField || claim.heading.unit !== null)
      .map((claim) => claim.field),
  );
  if (fields.has(kind.valueField)) return null;
  const claimed = isRecordKind(kind) ? new Set(claims.map((claim) => claim.field)) : fields;
  if (kind.usableWith?.some((wanted) => wanted.every((field) => claimed.has(field)))) return null;
  const title =
    kind.fields.find((field) => field.field === kind.valueField)?.title.toLowerCase() ?? kind.valueField;
  const tracers = claims
    .filter((claim) => claim.reason.startsWith('A concentration of'))
    .map((claim) => claim.heading.text);
  const instead = tracers.length > 0 ? `; it holds concentrations (${firstFew(tracers)})` : '';
  return `No column is recognised as ${title}${instead}. Assign one to use the table.`;
}

/** Reasons are read by people and stored: long lists and texts are cut. */
const firstFew = (texts: string[]): string =>
  texts
    .slice(0, 5)
    .map((text) => text.slice(0, 60))
    .join(', ') + (texts.length > 5 ? ' …' : '');

function reasonUsed(found: FoundTable, claims: Claim[], kind: DatasetKind): string {
  const value = claims.filter((claim) => claim.field === kind.valueField);
  const units = found.unitsRow === null ? '' : `, units in row ${found.unitsRow}`;
  const what =
    value.length > 0
      ? `${firstFew(value.map((claim) => `"${claim.heading.text}" in column ${columnLetter(claim.heading.index)}`))}`
      : 'what a flux can be computed from';
  return `Rows ${found.firstRow}–${found.lastRow} under the header row${found.headerRows.length > 1 ? 's' : ''} ${found.headerRows.join(', ')}${units}, with ${what}.`;
}
