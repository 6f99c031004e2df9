import type { RawCell, RawSheet, RawWorkbook } from '@siltlight/common/sheet/grid';
import { cellKinds, type ReaderMessage, type ReadRequest, type WireCell } from './reader-messages';

/** Puts the messages of a reading process together; every cell is made anew here, out of plain values. */
export class WorkbookAssembly {
  private sheets: RawSheet[] = [];

  constructor(private readonly request: ReadRequest) {}

  add(message: Exclude<ReaderMessage, { type: 'done' | 'refused' }>): void {
    if (message.type === 'discard') this.sheets = [];
    else if (message.type === 'sheet') this.sheets.push({ ...message.sheet, rows: [], columnCount: 0 });
    else this.addRows(message.first, message.rows);
  }

  finished({ notes, encoding, delimiter }: Extract<ReaderMessage, { type: 'done' }>): RawWorkbook {
    const { fileName, format } = this.request;
    return { fileName, format, sheets: this.sheets, encoding, delimiter, readNotes: notes };
  }

  private addRows(first: number, rows: WireCell[][]): void {
    const sheet = this.sheets.at(-1);
    if (!sheet) throw new Error('rows came before their sheet');
    while (sheet.rows.length < first) sheet.rows.push([]);
    for (const row of rows) {
      sheet.rows.push(row.map(rawCell));
      if (row.length > sheet.columnCount) sheet.columnCount = row.length;
    }
  }
}

function rawCell(wire: WireCell): RawCell | null {
  if (wire === null) return null;
  if (typeof wire === 'string') return { text: wire, kind: 'text' };
  const [kind, text, number, formula] = wire;
  const cell: RawCell = { text, kind: cellKinds[kind]! };
  if (typeof number === 'number') cell.number = number;
  if (formula !== undefined) cell.formula = formula;
  return cell;
}
