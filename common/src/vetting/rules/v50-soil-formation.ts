import { limitsOf } from '../limits';
import { placeOf } from '../place';
import type { Rule } from '../rule';
import { ageOf, archiveOf, countedRows } from '../samples';
import { shown } from '../wording';

const LIMITS = { holoceneOldKa: 11.7, lastInterglacialYoungKa: 115, lastInterglacialOldKa: 130 };
const SOIL = /pal(a)?eosol|\bsoil\b|boden/i;

/** Loess of a warm time, or remarked as soil: its flux is a lower bound. */
export const soilFormation: Rule = {
  id: 'V50',
  slug: 'soil-formation',
  title: 'Loess flux from a soil is a minimum',
  severity: 'warning',
  stage: 'submission',
  needs: ['archive', 'ageKaBp', 'remark'],
  source: 'common practice; bounds of the Holocene and the last interglacial from memory',
  why: 'Soil formation dissolves, washes out and stops deposition, so what is left says at least how much fell.',
  limits: LIMITS,

  *check(context) {
    const limits = limitsOf(context, 'V50', LIMITS, 'loess');
    for (const row of countedRows(context)) {
      if (archiveOf(context, row) !== 'loess') continue;
      const age = ageOf(row);
      const warm =
        age !== null &&
        ((age >= 0 && age <= limits.holoceneOldKa) ||
          (age >= limits.lastInterglacialYoungKa && age <= limits.lastInterglacialOldKa));
      const remarked = SOIL.test(row.remark ?? '');
      if (!warm && !remarked) continue;
      yield {
        ...placeOf(context, row, 'fluxGM2Yr'),
        message: remarked
          ? `Row ${row.row} is remarked "${row.remark!.trim().slice(0, 80)}": a loess flux from a soil is a minimum.`
          : `Row ${row.row} (${shown(age!)} ka BP) is loess of an interglacial, mostly a soil: its flux is a minimum.`,
        remedy: 'Leave the row out with a reason, or waive it if the flux stands for primary loess.',
        remedyKind: 'waive',
      };
    }
  },
};
