/** A block of cells as spreadsheets put it on the clipboard: tabs between cells, quoted where a cell holds breaks. */
export function parseBlock(text: string): string[][] {
  const rows: string[][] = [[]];
  let cell = '';
  let quoted = false;
  const endCell = () => {
    rows.at(-1)!.push(cell);
    cell = '';
  };
  for (let at = 0; at < text.length; at += 1) {
    const sign = text[at]!;
    if (quoted) {
      if (sign !== '"') cell += sign;
      else if (text[at + 1] === '"') cell += text[(at += 1)]!;
      else quoted = false;
    } else if (sign === '"' && cell === '') quoted = true;
    else if (sign === '\t') endCell();
    else if (sign === '\n') {
      endCell();
      rows.push([]);
    } else if (sign !== '\r') cell += sign;
  }
  endCell();
  const last = rows.at(-1)!;
  if (rows.length > 1 && last.length === 1 && last[0] === '') rows.pop();
  return rows;
}

export type BlockTarget = {
  row: number;
  /** place of the first column in `letters` */
  columnAt: number;
  letters: readonly string[];
  takes: (row: number) => boolean;
  textAt: (row: number, letter: string) => string;
};

/** The cells that a pasted block changes, and how many of its cells fall outside the data. */
export function placeBlock(
  block: readonly string[][],
  { row, columnAt, letters, takes, textAt }: BlockTarget,
) {
  const cells: { row: number; column: string; text: string }[] = [];
  let outside = 0;
  block.forEach((texts, down) =>
    texts.forEach((text, across) => {
      const column = letters[columnAt + across];
      if (column === undefined || !takes(row + down)) outside += 1;
      else if (textAt(row + down, column) !== text) cells.push({ row: row + down, column, text });
    }),
  );
  return { cells, outside };
}

/** Cells as text for the clipboard. */
export const blockText = (rows: readonly (readonly string[])[]) =>
  rows
    .map((cells) =>
      cells.map((cell) => (/[\t\n"]/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell)).join('\t'),
    )
    .join('\n');
