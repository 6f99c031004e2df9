import { filePlace, sheetPlace } from '../place';
import type { Rule } from '../rule';
import { counted } from '../wording';

/** What the reading step had to decide, and a file in which it found nothing to import. */
export const fileLayout: Rule = {
  id: 'V01',
  slug: 'file-layout',
  title: 'File can be read and holds a table',
  severity: 'error',
  stage: 'file',
  needs: [],
  source: 'after the practice of W3C CSV on the Web (2015) and Frictionless Table Schema',
  why: 'Several header rows, merged cells and more than one table are usual and harmless once resolved; what was resolved must be visible, or a column is silently lost.',
  kinds: 'all',

  *check({ workbook, mapping, rows }) {
    if (!mapping.tables.some((table) => table.used)) {
      yield {
        ...filePlace(),
        message: `No table to import was found on ${counted(workbook.sheets.length, 'sheet')} of ${workbook.fileName}.`,
        remedy: 'Set the header rows and the data rows of a table in the mapping, or upload another file.',
        remedyKind: 'mend',
      };
    } else if (rows.length === 0) {
      yield {
        ...filePlace(),
        message: `The tables used of ${workbook.fileName} hold no row to import.`,
        remedy:
          'Check the first and last row of the table in the mapping, or take back rows that were left out.',
        remedyKind: 'mend',
      };
    }
    for (const table of mapping.tables) {
      if (table.used && table.headerRows.length > 1) {
        yield {
          ...sheetPlace(table.sheet),
          severity: 'note',
          subject: 'header-rows',
          message: `The headings stand in rows ${table.headerRows.join(', ')} and were joined column by column.`,
          remedy: 'Nothing to do if the headings read well; otherwise set the header rows in the mapping.',
          remedyKind: 'none',
        };
      }
    }
    for (const sheet of workbook.sheets) {
      if (sheet.merged?.length) {
        yield {
          ...sheetPlace(sheet.name),
          severity: 'note',
          subject: 'merged',
          message: `There are merged cells (${counted(sheet.merged.length, 'range')}, first ${sheet.merged[0]}); each is read as its first cell.`,
          remedy: 'Nothing to do for headings; if values are merged, write each into its own cell.',
          remedyKind: 'none',
        };
      }
    }
    for (const { code, message } of workbook.readNotes) {
      yield {
        ...filePlace(),
        severity: 'note',
        subject: code,
        message: `On reading the file: ${message.replace(/\.$/, '')}.`,
        remedy: 'Nothing to do if this is as meant; otherwise save the file anew and upload it again.',
        remedyKind: 'none',
      };
    }
  },
};
