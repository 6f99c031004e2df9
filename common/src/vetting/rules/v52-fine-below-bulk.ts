import type { SampleRow } from '../../dataset/sample-row';
import { groupBy, placeOf } from '../place';
import type { Rule } from '../rule';
import { ageOf, countedRows, depthOf, siteKey } from '../samples';
import { shown } from '../wording';

/** At one place and time the flux below a diameter does not exceed the bulk flux, nor that below a larger one. */
export const fineBelowBulk: Rule = {
  id: 'V52',
  slug: 'fine-below-bulk',
  title: 'Fine flux exceeds the coarser one',
  severity: 'error',
  stage: 'file',
  needs: ['fluxGM2Yr', 'sizeCutoff'],
  source: 'logic: a part is not more than its whole',
  why: 'Columns of bulk and fine flux that were exchanged, or are in different units, show here.',

  *check(context) {
    const sized = countedRows(context).filter(
      (row) => row.fluxGM2Yr !== null && upperDiameterUm(row) !== null,
    );
    const samples = groupBy(
      sized,
      (row) => `${siteKey(row.site ?? '')}\u0000${row.quantity}\u0000${ageOf(row)}\u0000${depthOf(row)}`,
    );
    for (const rows of samples.values()) {
      rows.sort((a, b) => upperDiameterUm(a)! - upperDiameterUm(b)! || a.row - b.row);
      for (const [i, fine] of rows.entries()) {
        const coarse = rows[i + 1];
        if (
          !coarse ||
          upperDiameterUm(coarse) === upperDiameterUm(fine) ||
          fine.fluxGM2Yr! <= coarse.fluxGM2Yr!
        )
          continue;
        yield {
          ...placeOf(context, fine, 'fluxGM2Yr'),
          message: `The flux of "${fine.sizeCutoff}" is ${shown(fine.fluxGM2Yr!)} g m-2 yr-1, more than the ${shown(coarse.fluxGM2Yr!)} of "${coarse.sizeCutoff}" in row ${coarse.row}.`,
          remedy:
            'Check whether the columns or units are exchanged and type the right value, or leave the row out.',
          remedyKind: 'mend',
        };
      }
    }
  },
};

/** Upper diameter of a cut-off [µm]; infinite for bulk, null when it says neither. */
function upperDiameterUm({ sizeCutoff }: SampleRow): number | null {
  if (sizeCutoff === null) return null;
  if (/bulk|total|gesamt/i.test(sizeCutoff)) return Infinity;
  const number = /(\d+(?:[.,]\d+)?)\s*(?:µ|μ|u)?m?\s*$/i.exec(sizeCutoff.trim())?.[1];
  return number === undefined ? null : Number(number.replace(',', '.'));
}
