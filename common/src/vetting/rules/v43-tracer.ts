import { columnPlace, filePlace, groupBy } from '../place';
import type { Rule } from '../rule';
import { countedRows } from '../samples';
import { counted, statements } from '../wording';

/** A crustal share or factor: "Al 8.0 %", "14 µg/g", "Ca x 5", "factor 5". */
const FACTOR = /factor|crust|\d\s*(%|ppm|µg|ug|mg)|[x×]\s*\d/i;

/** Fluxes of a tracer stay what they are until a person states how dust was made of them. */
export const tracer: Rule = {
  id: 'V43',
  slug: 'tracer',
  title: 'Tracer without the factor to dust',
  severity: 'warning',
  stage: 'submission',
  needs: ['quantity', 'dustDefinition', 'method'],
  source: 'common practice; crustal shares such as Al 8.0 % or 232Th 10.7 to 14 µg/g from memory',
  why: 'The share of the tracer in dust differs by region and by author; without it the dust flux cannot be compared.',

  *check(context) {
    const proxies = groupBy(
      countedRows(context).filter((row) => row.quantity !== 'dust' && context.kind !== 'point-optical-depth'),
      (row) => `${row.sheet}\u0000${row.quantity}`,
    );
    for (const rows of proxies.values()) {
      const { sheet, quantity } = rows[0]!;
      yield {
        ...columnPlace(context, sheet, 'fluxGM2Yr'),
        subject: quantity,
        message: `Sheet "${sheet}" gives ${counted(rows.length, 'flux value')} of ${quantity}, kept as ${quantity} and never used as dust.`,
        remedy:
          'Waive it if that is meant; for dust, map a dust column or upload fluxes multiplied by a stated factor.',
        remedyKind: 'waive',
      };
    }
    if (!/tracer/i.test(context.metadata.dustDefinition ?? '') || FACTOR.test(statements(context))) return;
    yield {
      ...filePlace('method'),
      message: 'Dust was computed from a tracer, but neither its crustal share nor a factor is named.',
      remedy:
        'Name the element or isotope and the crustal value or factor in the method, e.g. "Al, 8.0 % in dust".',
      remedyKind: 'answer',
    };
  },
};
