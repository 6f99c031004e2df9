import { bySheet, columnPlace } from '../place';
import type { Rule } from '../rule';

/** Concentrations without an accumulation rate give no flux. */
export const concentrationAlone: Rule = {
  id: 'V08',
  slug: 'concentration-alone',
  title: 'Concentration without accumulation rate',
  severity: 'error',
  stage: 'file',
  needs: ['concentrationNgG'],
  source:
    'field practice; at Dome C concentration rose from 15 to 800 µg/kg while the flux rose about 25 times',
  why: 'A low accumulation rate inflates the concentration; only concentration times accumulation is a deposition flux.',

  *check(context) {
    for (const [sheet, rows] of bySheet(context.rows)) {
      const concentrations = rows.filter((row) => row.concentrationNgG !== null);
      const helped = rows.some((row) => row.fluxGM2Yr !== null || row.accumulationKgM2Yr !== null);
      if (concentrations.length === 0 || helped) continue;
      yield {
        ...columnPlace(context, sheet, 'concentrationNgG'),
        message: `Sheet "${sheet}" gives ${concentrations.length} concentrations but neither a flux nor an accumulation rate.`,
        remedy:
          'Map a column with the accumulation rate (kg m-2 yr-1) or with the flux, or add one and upload again.',
        remedyKind: 'answer',
      };
    }
  },
};
