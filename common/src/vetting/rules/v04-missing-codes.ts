import { isMissingCode, presentText } from '../cell-problems';
import { columnPlace } from '../place';
import type { Rule } from '../rule';
import { counted, firstFew } from '../wording';

/** Codes such as −999, NaN or "bdl" were taken as missing or as below detection: said once a column. */
export const missingCodes: Rule = {
  id: 'V04',
  slug: 'missing-codes',
  title: 'Codes taken as missing or below detection',
  severity: 'warning',
  stage: 'file',
  needs: [],
  source: 'common practice, no source',
  why: 'A code read as a number ruins every mean, and a code read as missing hides values below detection; the contributor must be able to see which was chosen.',
  kinds: 'all',

  *check(context) {
    const columns = new Map<string, { sheet: string; field: string; codes: Map<string, number> }>();
    for (const row of context.rows) {
      for (const [field, traced] of Object.entries(row.cells)) {
        if (!traced.belowDetection && !isMissingCode(traced)) continue;
        const key = `${row.sheet}\u0000${field}`;
        const column = columns.get(key) ?? { sheet: row.sheet, field, codes: new Map<string, number>() };
        const code = traced.belowDetection
          ? 'below detection'
          : `"${presentText(traced).trim().slice(0, 20)}"`;
        column.codes.set(code, (column.codes.get(code) ?? 0) + 1);
        columns.set(key, column);
      }
    }
    for (const { sheet, field, codes } of columns.values()) {
      const total = [...codes.values()].reduce((sum, count) => sum + count, 0);
      const list = firstFew([...codes].map(([code, count]) => `${code} ${count} ×`));
      yield {
        ...columnPlace(context, sheet, field),
        subject: [...codes.keys()].sort().join(' ').slice(0, 100),
        message: `In ${field}, ${counted(total, 'cell')} with a code instead of a value: ${list}; codes in quotation marks were taken as missing.`,
        remedy: 'Waive it if that is right; otherwise type the values or limits over the codes.',
        remedyKind: 'waive',
      };
    }
  },
};
