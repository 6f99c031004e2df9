import type { RawWorkbook } from '@siltlight/common/sheet/grid';
import { problem } from '../http/problem';

/**
 * Text of a cell as the file holds it.
 *
 * @throws Problem 422 when the file has no such row; `index` is the place's in the request
 */
export function rawText(
  workbook: RawWorkbook,
  { sheet, row, column }: { sheet: string; row: number; column: string },
  index: number,
  list: 'corrections' | 'rows' = 'corrections',
): string {
  const found = workbook.sheets.find(({ name }) => name === sheet);
  if (!found || row > found.rows.length) {
    const message = found
      ? `"${sheet}" has ${found.rows.length} rows, no row ${row}.`
      : `The file has no sheet "${sheet}".`;
    const field = found ? 'row' : 'sheet';
    throw problem(422, 'no-such-cell', 'There is no such cell', message, [
      { pointer: `/${list}/${index}/${field}`, field, value: found ? row : sheet, message },
    ]);
  }
  const at = [...column].reduce((number, letter) => number * 26 + letter.charCodeAt(0) - 64, 0) - 1;
  return found.rows[row - 1]?.[at]?.text ?? '';
}
