import { limitsOf } from '../limits';
import { opticalDepths } from '../optical-depth';
import { bySheet, numberOf, placeOf, sheetPlace } from '../place';
import type { Rule } from '../rule';
import { counted, shown } from '../wording';

const LIMITS = { minNm: 300, maxNm: 2500 };

/** The wavelength of each optical depth, in nm. */
export const wavelength: Rule = {
  id: 'V62',
  slug: 'wavelength',
  title: 'Wavelength missing or out of range',
  severity: 'error',
  stage: 'file',
  needs: ['aod', 'wavelengthNm'],
  source: 'range of the instruments, from memory',
  why: 'Optical depth falls with wavelength by up to four times over the visible; without it no depth at 550 nm can be had.',
  limits: LIMITS,

  *check(context) {
    const { minNm, maxNm } = limitsOf(context, 'V62', LIMITS);
    const rows = opticalDepths(context).map(({ row }) => row);
    for (const [sheet, ofSheet] of bySheet(rows)) {
      const without = ofSheet.filter(
        (row) => numberOf(row, 'wavelengthNm') === null && !row.cells.wavelengthNm?.problem,
      );
      if (without.length === 0) continue;
      yield {
        ...sheetPlace(sheet, 'wavelengthNm'),
        message: `On sheet "${sheet}", ${counted(without.length, 'optical depth')} without wavelength, the first in row ${without[0]!.row}.`,
        remedy:
          'Map the column of the wavelength, or give one wavelength for the whole sheet in the mapping.',
        remedyKind: 'answer',
      };
    }
    for (const row of rows) {
      const value = numberOf(row, 'wavelengthNm');
      if (value === null || (value >= minNm && value <= maxNm)) continue;
      yield {
        ...placeOf(context, row, 'wavelengthNm'),
        message: `The wavelength is ${shown(value)} nm; it must lie within ${minNm} to ${maxNm} nm.`,
        remedy: 'Set the unit of the column in the mapping if it is in µm, or type the right value.',
        remedyKind: 'mend',
      };
    }
  },
};
