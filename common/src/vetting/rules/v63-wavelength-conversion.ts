import { limitsOf } from '../limits';
import { opticalDepths } from '../optical-depth';
import { bySheet, numberOf, sheetPlace } from '../place';
import type { Rule } from '../rule';
import { counted } from '../wording';

const LIMITS = { defaultFromNm: 440, defaultToNm: 675 };

/**
 * Depths at other wavelengths can be brought to 550 nm only with an Ångström exponent α of their own,
 * save between 440 and 675 nm, where a default changes little:
 *
 *   AOD(550) = AOD(λ) · (λ / 550)^α
 */
export const wavelengthConversion: Rule = {
  id: 'V63',
  slug: 'wavelength-conversion',
  title: 'No Ångström exponent to reach 550 nm',
  severity: 'warning',
  stage: 'file',
  needs: ['aod', 'wavelengthNm', 'angstromExponent'],
  source: 'Ångström 1929, Geografiska Annaler 11, 156-166; range of the default: common practice, no source',
  why: 'From 870 nm the depth at 550 nm differs twofold between dust and smoke.',
  limits: LIMITS,

  *check(context) {
    const { defaultFromNm, defaultToNm } = limitsOf(context, 'V63', LIMITS);
    const rows = opticalDepths(context).map(({ row }) => row);
    for (const [sheet, ofSheet] of bySheet(rows)) {
      const lost = ofSheet.filter((row) => {
        const nm = numberOf(row, 'wavelengthNm');
        return (
          nm !== null &&
          (nm < defaultFromNm || nm > defaultToNm) &&
          numberOf(row, 'angstromExponent') === null
        );
      });
      if (lost.length === 0) continue;
      yield {
        ...sheetPlace(sheet, 'angstromExponent'),
        message: `On sheet "${sheet}", ${counted(lost.length, 'optical depth')} outside ${defaultFromNm} to ${defaultToNm} nm without Ångström exponent, the first in row ${lost[0]!.row}.`,
        remedy: 'Map the column of the Ångström exponent, or leave these rows out with a reason.',
        remedyKind: 'leave-out',
      };
    }
  },
};
