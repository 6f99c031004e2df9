import type { VettingContext } from '../context';
import { bySheet, columnOf, columnPlace, filePlace, numberOf, placeOf, sheetPlace } from '../place';
import type { Rule } from '../rule';
import { valueOf } from '../samples';
import { sigmaField } from '../uncertainty';
import { counted, shown } from '../wording';

const MEANING = /\b[12]\s?(σ|s\b|sigma|sd\b|se\b)|sigma|standard|s\.?d\.?\b|s\.?e\.?\b|range/i;

/** One standard error beside each value, above zero, with its meaning stated in heading or form. */
export const uncertainty: Rule = {
  id: 'V54',
  slug: 'uncertainty',
  title: 'Uncertainty missing or its meaning not stated',
  severity: 'warning',
  stage: 'submission',
  needs: ['fluxSigmaGM2Yr', 'uncertaintyMeaning'],
  source: 'after Cosentino et al. 2024, who give one sigma for all archives',
  why: 'Without an error a value gets a default one; a two-sigma read as one counts a quarter of its weight.',

  *check(context) {
    const field = sigmaField(context);
    for (const [sheet, rows] of bySheet(context.rows)) {
      const valued = rows.filter((row) => valueOf(context, row) !== null);
      const bare = valued.filter((row) => numberOf(row, field) === null && !row.cells[field]?.problem);
      if (bare.length > 0) {
        const all = bare.length === valued.length;
        yield {
          ...(all && columnOf(context, sheet, field) === null
            ? sheetPlace(sheet, field)
            : columnPlace(context, sheet, field)),
          subject: 'missing',
          message: `On sheet "${sheet}", ${all ? 'no value has' : `${counted(bare.length, 'value')} without`} a standard error${all ? '' : `, the first in row ${bare[0]!.row}`}.`,
          remedy: 'Map the column of the errors if there is one, or waive it: a default error is then taken.',
          remedyKind: 'waive',
        };
      }
      for (const row of valued) {
        const sigma = numberOf(row, field);
        if (sigma === null || sigma > 0) continue;
        yield {
          ...placeOf(context, row, field),
          message: `The standard error in row ${row.row} is ${shown(sigma)}; it must be above 0.`,
          remedy: 'Type the right error over it, or clear the cell if it is not known.',
          remedyKind: 'mend',
        };
      }
    }
    yield* meaning(context, field);
  },
};

function* meaning(context: VettingContext, field: string) {
  if (context.metadata.uncertaintyMeaning?.trim()) return;
  const given = context.rows.some((row) => numberOf(row, field) !== null);
  const headings = context.mapping.columns.filter((column) => column.field === field);
  if (!given || headings.every(({ heading }) => MEANING.test(heading))) return;
  yield {
    ...filePlace('uncertaintyMeaning'),
    message:
      'Errors are given, but it is not stated whether they are one or two sigma, a standard deviation or a range.',
    remedy: 'Answer in the form what the errors mean.',
    remedyKind: 'answer' as const,
  };
}
