import { cellAddress, type RawSheet, type RawWorkbook } from './grid';
import { isFilled } from './row-kind';

/** Words that tell the reader to pass a sheet over, in the languages the files come in; from memory. */
const PASS_OVER =
  /supersed\p{L}*|ignore|ignorier\p{L}*|ignorar|ignorez|ignorer|obsolete|obsol[eè]te|obsoleto|outdated|deprecated|veraltet|überholt|ersetzt durch|do not use|don't use|not to be used|nicht (?:mehr )?(?:verwenden|benutzen)|ne pas utiliser|no usar|wrong (?:units?|values?|ages?)|falsche (?:einheit\p{L}*|werte)|replaced by|remplac[ée]e? par|reemplazad[ao]/iu;
const NAMED_OLD =
  /(?:^|[\s_(-])(?:old|alt|obsolete|superseded|backup|bak|deprecated|veraltet|ancien|vieux|viejo|antiguo|draft|entwurf)(?:$|[\s_)-])/i;
const LONGEST_NOTE = 2000;
const SHORTEST_NOTE = 6;
const LONGEST_QUOTE = 200;
/** Far more than any file that speaks to its reader has. */
const MOST_NOTES = 500;

/**
 * Why a sheet is to be left alone: a note anywhere in the file says so of it by name, the sheet says so of itself,
 * it is hidden, or its own name calls it old. Null when nothing does.
 */
export function reasonToSetAside(
  sheet: RawSheet,
  workbook: RawWorkbook,
  beforeRow: number,
  notes: PassOverNote[],
): string | null {
  const noted = noteAbout(sheet, workbook, notes);
  const own = ownRemark(sheet, beforeRow);
  const reasons = [noted, own].filter((reason) => reason !== null);
  if (reasons.length > 0) return reasons.join(' ');
  if (NAMED_OLD.test(sheet.name))
    return `The sheet's name "${sheet.name}" calls it old; use it if it is the right one.`;
  return sheet.hidden ? 'The sheet is hidden; use it if it is the right one.' : null;
}

/** A text of the file that tells the reader to pass something over. */
export interface PassOverNote {
  sheet: string;
  cell: string;
  text: string;
}

/** All such texts, gathered once for a workbook. */
export function passOverNotes(workbook: RawWorkbook): PassOverNote[] {
  const notes: PassOverNote[] = [];
  for (const sheet of workbook.sheets) {
    for (const [r, row] of sheet.rows.entries()) {
      for (const [c, cell] of row.entries()) {
        if (
          !isFilled(cell) ||
          cell.kind !== 'text' ||
          cell.text.length < SHORTEST_NOTE ||
          cell.text.length > LONGEST_NOTE
        )
          continue;
        if (PASS_OVER.test(cell.text))
          notes.push({ sheet: sheet.name, cell: cellAddress(c, r + 1), text: cell.text });
        if (notes.length >= MOST_NOTES) return notes;
      }
    }
  }
  return notes;
}

function noteAbout(sheet: RawSheet, workbook: RawWorkbook, notes: PassOverNote[]): string | null {
  for (const note of notes) {
    const about = note.text.split(/[.!?]\s+/).find((sentence) => isAbout(sentence, sheet, workbook));
    if (about !== undefined)
      return `Cell ${note.cell} of sheet "${note.sheet}" says: "${about.trim().slice(0, LONGEST_QUOTE)}".`;
  }
  return null;
}

/** Of the sheets a sentence names, the one nearest to the words of passing over is meant. */
function isAbout(sentence: string, sheet: RawSheet, workbook: RawWorkbook): boolean {
  const words = PASS_OVER.exec(sentence);
  if (!words) return false;
  const named = workbook.sheets
    .map(({ name }) => ({ name, at: nameAt(sentence, name) }))
    .filter(({ at }) => at >= 0)
    .sort((a, b) => Math.abs(a.at - words.index) - Math.abs(b.at - words.index));
  return named[0]?.name === sheet.name;
}

function nameAt(sentence: string, name: string): number {
  const at = sentence.toLowerCase().indexOf(name.toLowerCase());
  const isWhole =
    at >= 0 && !/[\p{L}\p{N}]/u.test((sentence[at - 1] ?? ' ') + (sentence[at + name.length] ?? ' '));
  return isWhole ? at : -1;
}

/** The sheet's own title, headings or units row calls it wrong or superseded. */
function ownRemark(sheet: RawSheet, beforeRow: number): string | null {
  for (const [r, row] of sheet.rows.slice(0, beforeRow - 1).entries()) {
    for (const [c, cell] of row.entries()) {
      if (
        !isFilled(cell) ||
        cell.text.length > 200 ||
        !PASS_OVER.test(cell.text) ||
        /\bif\b|column|spalte/i.test(cell.text)
      )
        continue;
      return `Its own cell ${cellAddress(c, r + 1)} says: "${cell.text.trim()}".`;
    }
  }
  return null;
}
