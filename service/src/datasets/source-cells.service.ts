import { Injectable } from '@nestjs/common';
import { columnLetter } from '@siltlight/common/sheet/grid';
import type { sourceCells } from '@siltlight/common/wire/slices';
import type { z } from 'zod';
import { notFound } from '../http/problem';
import { ParsedWorkbooks } from '../workers/parsed-workbooks.service';
import type { DatasetVersion } from './datasets.service';

const ROWS_ABOVE = 12;
const ROWS_BELOW = 20;

/** The spreadsheet behind a version, as the file holds it: the last link of the trace. */
@Injectable()
export class SourceCells {
  constructor(private readonly workbooks: ParsedWorkbooks) {}

  async around(
    version: DatasetVersion,
    sheetName: string,
    row: number,
  ): Promise<z.infer<typeof sourceCells>> {
    const { file } = version.content;
    const workbook = await this.workbooks.load(file);
    const sheet = workbook.sheets.find(({ name }) => name === sheetName);
    if (!sheet) throw notFound('Sheet', sheetName);
    const first = Math.max(1, row - ROWS_ABOVE);
    const last = Math.min(sheet.rows.length, row + ROWS_BELOW);
    const numbers = Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => first + index);
    return {
      datasetSlug: version.object.slug,
      versionNumber: version.number,
      fileName: file.fileName,
      sha256: file.sha256,
      sheet: sheet.name,
      columns: Array.from({ length: sheet.columnCount }, (_, index) => columnLetter(index)),
      rows: numbers.map((number) => ({ row: number, cells: textsOf(sheet.rows[number - 1] ?? []) })),
    };
  }
}

function textsOf(cells: readonly ({ text: string } | null)[]): Record<string, string> {
  return Object.fromEntries(cells.flatMap((cell, index) => (cell ? [[columnLetter(index), cell.text]] : [])));
}
