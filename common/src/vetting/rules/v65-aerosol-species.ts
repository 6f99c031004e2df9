import type { SampleRow } from '../../dataset/sample-row';
import type { VettingContext } from '../context';
import { opticalDepths } from '../optical-depth';
import { bySheet, groupBy, numberOf, placeOf, sheetPlace, textOf } from '../place';
import type { Rule, RuleHit } from '../rule';
import { siteKey } from '../samples';
import { asked, shown, statements } from '../wording';

/** What the optical depth is of; and dust is not more than the total of the same place, time and wavelength. */
export const aerosolSpecies: Rule = {
  id: 'V65',
  slug: 'aerosol-species',
  title: 'Aerosol species not stated, or dust above total',
  severity: 'error',
  stage: 'submission',
  needs: ['aod', 'aerosolSpecies'],
  source: 'dust is about 23 % of the total optical depth (Gkikas et al. 2022)',
  why: 'A total optical depth taken as dust is about four times too much.',

  *check(context) {
    const rows = opticalDepths(context).map(({ row }) => row);
    const inText = /dust|total|coarse|stratospher|species/i.test(statements(context));
    for (const [sheet, ofSheet] of bySheet(rows)) {
      if (inText || ofSheet.every((row) => textOf(row, 'aerosolSpecies') !== null)) continue;
      yield {
        ...sheetPlace(sheet, 'aerosolSpecies'),
        ...asked(
          context,
          `The species of the optical depths on sheet "${sheet}"`,
          'say dust, total, coarse mode or stratospheric in the method, or map its column.',
        ),
      };
    }
    yield* dustAboveTotal(context, rows);
  },
};

function* dustAboveTotal(context: VettingContext, rows: SampleRow[]): Iterable<RuleHit> {
  const moments = groupBy(rows, (row) =>
    [siteKey(row.site ?? ''), textOf(row, 'date') ?? '', numberOf(row, 'wavelengthNm')].join('\u0000'),
  );
  for (const moment of moments.values()) {
    const total = moment.find((row) => /total/i.test(textOf(row, 'aerosolSpecies') ?? ''));
    if (!total) continue;
    const limit = numberOf(total, 'aod')!;
    for (const row of moment) {
      const value = numberOf(row, 'aod')!;
      if (!/dust/i.test(textOf(row, 'aerosolSpecies') ?? '') || value <= limit) continue;
      yield {
        ...placeOf(context, row, 'aod'),
        message: `The dust optical depth is ${shown(value)}, above the total of ${shown(limit)} in row ${total.row}.`,
        remedy: 'Check whether the two are exchanged and type the right values, or leave the row out.',
        remedyKind: 'mend',
      };
    }
  }
}
