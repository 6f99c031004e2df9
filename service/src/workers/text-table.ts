import Papa from 'papaparse';
import { cellAddress } from '@siltlight/common/sheet/grid';
import { countInWords } from './limits';
import {
  cellsPerMessage,
  type Post,
  type ReadNote,
  type ReadRequest,
  type TextEncoding,
  type WireCell,
} from './reader-messages';
import { anyBlank, decideDelimiter, delimiterInWords, sampleLines, twoBlanks } from './text-delimiter';
import { decideEncoding, decodedChunks } from './text-encoding';
import { UploadRefused } from './upload-refused';
import { cellTooLong } from './workbook-cells';
import { damaged } from './zip-directory';
import { tooManyCells } from './zip-workbook';

/** A row that has not ended after this many characters has a quotation mark that is never closed. */
const rowCharacters = 2_000_000;

export interface TextReading {
  encoding: TextEncoding;
  delimiter: string;
  notes: ReadNote[];
}

/** Reads a text table as a stream of rows, telling openly how it was decoded and cut. */
export async function readTextTable(request: ReadRequest, post: Post): Promise<TextReading> {
  const notes: ReadNote[] = [];
  const encoding = await chooseEncoding(request, notes);
  const delimiter = await chooseDelimiter(request, encoding, notes);
  const reading = { request, encoding, delimiter, post };
  if (!(await readRows({ ...reading, quotes: true }))) {
    await post({ type: 'discard' });
    await readRows({ ...reading, quotes: false });
    notes.push({
      code: 'quotes-taken-literally',
      message: 'A quotation mark is never closed, so quotation marks were read as ordinary characters.',
    });
  }
  return { encoding, delimiter, notes };
}

async function chooseEncoding({ path, text }: ReadRequest, notes: ReadNote[]): Promise<TextEncoding> {
  if (text?.encoding) {
    notes.push({ code: 'encoding', message: `Read as ${text.encoding}, as chosen.` });
    return text.encoding;
  }
  const { encoding, because } = await decideEncoding(path);
  notes.push({ code: 'encoding', message: `Read as ${encoding}: ${because}.` });
  return encoding;
}

async function chooseDelimiter(
  { path, format, text }: ReadRequest,
  encoding: TextEncoding,
  notes: ReadNote[],
): Promise<string> {
  if (text?.delimiter) {
    notes.push({
      code: 'delimiter',
      message: `Columns cut at each ${delimiterInWords(text.delimiter)}, as chosen.`,
    });
    return text.delimiter;
  }
  const decided = decideDelimiter(await sampleLines(path, encoding));
  if (decided === null)
    notes.push({
      code: 'one-column',
      message: 'No separator cuts the lines into columns, so the table has one column.',
    });
  else
    notes.push({
      code: 'delimiter',
      message: `Columns cut at each ${delimiterInWords(decided)}: most lines then have equally many.`,
    });
  return decided ?? (format === 'csv' ? ',' : '\t');
}

interface Reading {
  request: ReadRequest;
  encoding: TextEncoding;
  delimiter: string;
  quotes: boolean;
  post: Post;
}

/** False when quoting cannot be right: a quote stays open to the end, or swallows more than a cell may hold. */
async function readRows(reading: Reading): Promise<boolean> {
  const { request, encoding, delimiter, quotes, post } = reading;
  const cut = cutter(delimiter, quotes);
  const rows = new RowSender(request, post);
  await post({
    type: 'sheet',
    sheet: { name: request.fileName.replace(/^.*[\\/]/, '').replace(/\.[^.]*$/, '') },
  });
  let rest = '';
  for await (const chunk of decodedChunks(request.path, encoding)) {
    if (chunk.includes('\0')) throw damaged(request.fileName, 'it has zero bytes within its text');
    const { data, used } = cut(rest + chunk, false);
    rest = (rest + chunk).slice(used);
    if (rest.length > rowCharacters) {
      if (quotes) return false;
      throw cellTooLong(`"${request.fileName}", row ${rows.count + 1}`, rest.length, rowCharacters);
    }
    if ((await rows.take(data, quotes)) === 'overlong') return false;
  }
  const { data, openQuote } = cut(rest, true);
  if (openQuote || (await rows.take(data, quotes)) === 'overlong') return false;
  await rows.flush();
  return true;
}

interface Cut {
  data: string[][];
  /** characters of complete rows */
  used: number;
  openQuote: boolean;
}

function cutter(delimiter: string, quotes: boolean): (text: string, last: boolean) => Cut {
  if (delimiter === anyBlank || delimiter === twoBlanks)
    return blankCutter(delimiter === twoBlanks ? /\s{2,}|\t/ : /\s+/);
  const parser = new Papa.Parser({ delimiter, newline: '\n', quoteChar: quotes ? '"' : '\0' });
  return (text, last) => {
    const { data, meta, errors } = parser.parse(text, 0, !last) as Papa.ParseResult<string[]>;
    return { data, used: meta.cursor, openQuote: errors.some((error) => error.code === 'MissingQuotes') };
  };
}

const blankCutter =
  (blank: RegExp) =>
  (text: string, last: boolean): Cut => {
    const used = last ? text.length : text.lastIndexOf('\n') + 1;
    const lines = text.slice(0, used).split('\n');
    if (!last || text.endsWith('\n')) lines.pop();
    return {
      data: lines.map((line) => line.trim()).map((line) => (line ? line.split(blank) : [])),
      used,
      openQuote: false,
    };
  };

/** Holds the limits and groups rows into messages. */
class RowSender {
  count = 0;
  private cells = 0;
  private blanks = 0;
  private waiting: WireCell[][] = [];
  private waitingCells = 0;

  constructor(
    private readonly request: ReadRequest,
    private readonly post: Post,
  ) {}

  async take(rows: string[][], quotes: boolean): Promise<'taken' | 'overlong'> {
    const { limits, fileName } = this.request;
    for (const fields of rows) {
      const row = trimmed(fields);
      if (row.length === 0) {
        this.blanks += 1;
        continue;
      }
      this.placeBlanks();
      if (this.count >= limits.textRows) throw tooManyRows(fileName, limits.textRows);
      if (row.length > limits.columns)
        throw tooManyColumns(
          `"${fileName}", row ${countInWords(this.count + 1)}`,
          row.length,
          limits.columns,
        );
      const long = row.findIndex((cell) => typeof cell === 'string' && cell.length > limits.cellCharacters);
      if (long >= 0 && quotes) return 'overlong';
      if (long >= 0)
        throw cellTooLong(
          `"${fileName}", cell ${cellAddress(long, this.count + 1)}`,
          (row[long] as string).length,
          limits.cellCharacters,
        );
      this.cells += row.length;
      if (this.cells > limits.textCells) throw tooManyCells(fileName, limits.textCells);
      this.waiting.push(row);
      this.waitingCells += row.length + 1;
      this.count += 1;
      if (this.waitingCells >= cellsPerMessage) await this.flush();
    }
    return 'taken';
  }

  /** Blank rows count only when something follows them. */
  private placeBlanks(): void {
    const room = Math.max(0, Math.min(this.blanks, this.request.limits.textRows - this.count));
    for (let i = 0; i < room; i += 1) this.waiting.push([]);
    this.waitingCells += room;
    this.count += room;
    this.blanks = 0;
  }

  async flush(): Promise<void> {
    if (this.waiting.length > 0)
      await this.post({ type: 'rows', first: this.count - this.waiting.length, rows: this.waiting });
    this.waiting = [];
    this.waitingCells = 0;
  }
}

/** Without the empty fields at its end, which separators alone make. */
function trimmed(fields: string[]): WireCell[] {
  let length = fields.length;
  while (length > 0 && fields[length - 1] === '') length -= 1;
  return fields.slice(0, length).map((field) => (field === '' ? null : field));
}

const tooManyRows = (fileName: string, limit: number): UploadRefused =>
  new UploadRefused(
    'too-many-rows',
    `"${fileName}" has more than ${countInWords(limit)} rows. Send it in parts.`,
    limit,
  );

const tooManyColumns = (where: string, found: number, limit: number): UploadRefused =>
  new UploadRefused(
    'too-many-columns',
    `${where} has ${countInWords(found)} columns; ${countInWords(limit)} are read. Leave out what is not needed, or choose another separator.`,
    limit,
  );
