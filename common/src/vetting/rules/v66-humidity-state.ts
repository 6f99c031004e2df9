import { opticalDepths } from '../optical-depth';
import { filePlace, textOf } from '../place';
import type { Rule } from '../rule';
import { statements } from '../wording';

/** Optical depths of species that take up water say whether they are of the ambient or the dry aerosol. */
export const humidityState: Rule = {
  id: 'V66',
  slug: 'humidity-state',
  title: 'Ambient or dry not stated',
  severity: 'warning',
  stage: 'submission',
  needs: ['aod', 'aerosolSpecies', 'method'],
  source: 'CF Conventions standard names: ambient and dry aerosol have different names',
  why: 'Salt and sulfate swell with humidity: the ambient depth is up to several times the dry one.',

  *check(context) {
    const swelling = opticalDepths(context).find(({ row }) =>
      /sul[fp]|salt|salz|organic|nitrat/i.test(textOf(row, 'aerosolSpecies') ?? ''),
    );
    if (!swelling || /ambient|\bdry\b|trocken|humid/i.test(statements(context))) return;
    yield {
      ...filePlace('method'),
      message: `Optical depths of "${textOf(swelling.row, 'aerosolSpecies')}" (first in row ${swelling.row.row}) are not said to be ambient or dry.`,
      remedy: 'Say "ambient" or "dry" in the method.',
      remedyKind: 'answer',
    };
  },
};
