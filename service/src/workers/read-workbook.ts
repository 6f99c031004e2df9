import { readFile } from 'node:fs/promises';
import type { CellObject, ParsingOptions, WorkBook, WorkSheet } from 'xlsx';
import { cellAddress } from '@siltlight/common/sheet/grid';
import {
  cellsPerMessage,
  type Post,
  type ReadNote,
  type ReadRequest,
  type WireCell,
  type WireSheet,
} from './reader-messages';
import { oleStreamNames } from './ole-directory';
import { mismatch } from './sniff';
import { UploadRefused } from './upload-refused';
import { filledRows, type CellTally, type DateFormats } from './workbook-cells';
import { damaged, encrypted, readZipMembers, type ZipMembers } from './zip-directory';
import { checkWorkbookParts, partsFor } from './zip-workbook';

/** What this reader uses of the spreadsheet parser, two functions of which its types leave out. */
export interface SpreadsheetParser {
  read(data: Buffer, options: ParsingOptions): WorkBook;
  /** parses an archive whose members are unpacked already */
  parse_zip(archive: unknown, options: ParsingOptions): WorkBook;
  CFB: {
    utils: {
      cfb_new(): unknown;
      cfb_add(archive: unknown, name: string, content: Buffer, options: { unsafe: boolean }): void;
    };
  };
  SSF: DateFormats;
}

const parserOptions: ParsingOptions = {
  type: 'buffer',
  dense: true,
  cellFormula: true,
  cellNF: true,
  cellHTML: false,
  bookVBA: false,
};

const listed = 10_000;

/** Checks, parses and sends one workbook. The parser is loaded by the first call that gets past the checks. */
export async function readWorkbook(
  request: ReadRequest,
  loadParser: () => SpreadsheetParser,
  post: Post,
): Promise<ReadNote[]> {
  const members = request.container === 'zip' ? await checkedMembers(request) : null;
  const bytes = members ? null : await checkedOle(request);
  const parser = loadParser();
  // Without stubs a formula that has no stored value would be dropped; in .ods they would fill whole blank columns.
  const options = { ...parserOptions, sheetStubs: request.format === 'xlsx' || request.format === 'xlsm' };
  const book = parsed(request.fileName, () =>
    members ? parser.parse_zip(archiveOf(members, parser), options) : parser.read(bytes!, options),
  );
  const notes: ReadNote[] = [];
  const tally: CellTally = { cells: 0, formulas: 0, formulasWithoutValue: 0 };
  for (const [index, name] of book.SheetNames.entries()) {
    await sendSheet(book, index, name, { request, parser, tally, notes, post });
  }
  notes.push(...notesOf(book, tally));
  return notes;
}

async function checkedMembers({ path, fileName, format, limits }: ReadRequest): Promise<ZipMembers> {
  const members = await readZipMembers(path, fileName, limits);
  checkWorkbookParts(members, format, fileName, limits);
  return partsFor(members, format);
}

async function checkedOle({ path, fileName, format }: ReadRequest): Promise<Buffer> {
  const bytes = await readFile(path);
  if (bytes[0] !== 0xd0) return bytes;
  const streams = oleStreamNames(bytes);
  if (streams.includes('EncryptedPackage')) throw encrypted(fileName);
  if (!streams.includes('Workbook') && !streams.includes('Book')) {
    throw new UploadRefused(
      'not-a-spreadsheet',
      `"${fileName}" is an Office document without a workbook in it. Save the table as .xlsx, .xls or .csv and send that.`,
    );
  }
  if (format !== 'xls') throw mismatch(fileName, 'ole');
  return bytes;
}

/** An archive of exactly the bytes that were counted and looked through: the parser never unpacks anything itself. */
function archiveOf(members: ZipMembers, parser: SpreadsheetParser): unknown {
  const archive = parser.CFB.utils.cfb_new();
  for (const [name, content] of members) parser.CFB.utils.cfb_add(archive, name, content, { unsafe: true });
  return archive;
}

function parsed(fileName: string, parse: () => WorkBook): WorkBook {
  try {
    return parse();
  } catch (cause) {
    const reason = cause instanceof Error ? cause.message : String(cause);
    if (/password|encrypt/i.test(reason)) throw encrypted(fileName);
    throw damaged(fileName, `it cannot be read as a workbook (${reason})`);
  }
}

interface Sending {
  request: ReadRequest;
  parser: SpreadsheetParser;
  tally: CellTally;
  notes: ReadNote[];
  post: Post;
}

async function sendSheet(
  book: WorkBook,
  index: number,
  name: string,
  { request, parser, tally, notes, post }: Sending,
): Promise<void> {
  const { fileName, limits } = request;
  const sheet = Object.hasOwn(book.Sheets, name) ? book.Sheets[name] : undefined;
  if (!sheet) throw damaged(fileName, `its sheet "${name}" cannot be read`);
  if (!Array.isArray(sheet)) {
    notes.push({ code: 'no-cells', message: `Sheet "${name}" holds a chart or dialog and no table.` });
    return;
  }
  const date1904 = book.Workbook?.WBProps?.date1904 === true;
  const filled = filledRows(sheet, { fileName, sheetName: name, limits, date1904, dates: parser.SSF, tally });
  await post({ type: 'sheet', sheet: heading(book, index, name, sheet, notes) });
  let rows: WireCell[][] = [];
  let first = 0;
  let cells = 0;
  for (const row of filled) {
    if (rows.length === 0) first = row.index;
    // A gap ends the message: blank rows are made where they are received.
    if (row.index !== first + rows.length || cells >= cellsPerMessage) {
      await post({ type: 'rows', first, rows });
      rows = [];
      cells = 0;
      first = row.index;
    }
    rows.push(row.cells);
    cells += row.cells.length;
  }
  if (rows.length > 0) await post({ type: 'rows', first, rows });
}

function heading(
  book: WorkBook,
  index: number,
  name: string,
  sheet: WorkSheet,
  notes: ReadNote[],
): WireSheet {
  const wire: WireSheet = { name };
  const merges = sheet['!merges'] ?? [];
  const comments = commentsOf(sheet);
  if (book.Workbook?.Sheets?.[index]?.Hidden) {
    wire.hidden = true;
    notes.push({ code: 'hidden-sheet', message: `Sheet "${name}" is hidden in the workbook.` });
  }
  if (merges.length > 0)
    wire.merged = merges
      .slice(0, listed)
      .map(({ s, e }) => `${cellAddress(s.c, s.r + 1)}:${cellAddress(e.c, e.r + 1)}`);
  if (comments.length > 0) wire.comments = comments.slice(0, listed);
  if (merges.length > listed || comments.length > listed) {
    notes.push({
      code: 'list-cut',
      message: `Sheet "${name}" has more than ${listed} merged ranges or comments; the first ${listed} are kept.`,
    });
  }
  return wire;
}

function commentsOf(sheet: WorkSheet): { cell: string; text: string }[] {
  const comments: { cell: string; text: string }[] = [];
  (sheet as unknown as (CellObject | undefined)[][]).forEach((row, index) => {
    if (!Array.isArray(row)) return;
    row.forEach((cell, column) => {
      const text = (cell?.c ?? []).map((comment) => String(comment.t ?? '')).join('\n');
      if (text !== '') comments.push({ cell: cellAddress(column, index + 1), text: text.slice(0, 32_767) });
    });
  });
  return comments;
}

function notesOf(book: WorkBook, tally: CellTally): ReadNote[] {
  const notes: ReadNote[] = [];
  if (tally.formulas > 0) {
    notes.push({
      code: 'formulas',
      message: `${tally.formulas} cells hold formulas: the value stored with each was read and nothing was calculated.`,
    });
  }
  if (tally.formulasWithoutValue > 0) {
    notes.push({
      code: 'formulas-without-value',
      message: `${tally.formulasWithoutValue} formulas have no stored value and were read as empty text. Open the workbook, let it calculate, and save it.`,
    });
  }
  if (book.Workbook?.WBProps?.date1904)
    notes.push({
      code: 'dates-from-1904',
      message: 'Dates count from 1904 in this workbook and were read so.',
    });
  return notes;
}
