import { distinctCells, filePlace, placeOf, type Place } from '../place';
import type { RemedyKind, Rule } from '../rule';
import { countedRows } from '../samples';
import { asked } from '../wording';

/** bulk, a diameter, PM10, or the answer "other" of the form (explained in its note). */
const UNDERSTOOD = /bulk|total|gesamt|\ball\b|full|pm\s?\d|\d\s*(µ|μ|u)?m?\b|clay|silt|other/i;

/** The size range that a flux holds, as a diameter: from its column or from the form. */
export const sizeCutoff: Rule = {
  id: 'V51',
  slug: 'size-cutoff',
  title: 'Size cut-off not stated',
  severity: 'error',
  stage: 'submission',
  needs: ['sizeCutoff'],
  source: 'Albani et al. 2015; Cosentino et al. 2024 (both give fluxes by size)',
  why: 'Most of loess is too coarse to travel: bulk and below-10-µm fluxes of one place differ several times and never share a mean.',

  *check(context) {
    if (context.kind === 'point-optical-depth') return;
    const rows = countedRows(context);
    const answer = context.metadata.sizeCutoff?.trim() ?? '';
    if (rows.length > 0 && answer === '' && rows.some((row) => !row.sizeCutoff?.trim())) {
      yield {
        ...filePlace('sizeCutoff'),
        ...asked(context, 'The size cut-off', 'choose bulk, <10 µm, <20 µm or other (diameter).'),
      };
    }
    const stated: { text: string; place: Place; kind: RemedyKind }[] = [];
    if (answer !== '') stated.push({ text: answer, place: filePlace('sizeCutoff'), kind: 'answer' });
    for (const { row } of distinctCells(rows, 'sizeCutoff')) {
      if (!row.sizeCutoff?.trim()) continue;
      stated.push({ text: row.sizeCutoff, place: placeOf(context, row, 'sizeCutoff'), kind: 'mend' });
    }
    for (const { text, place, kind } of stated) {
      if (UNDERSTOOD.test(text) && !/radi(us|al)/i.test(text)) continue;
      yield {
        ...place,
        subject: 'form',
        message: `The size cut-off "${text.slice(0, 60)}" is ${/radi/i.test(text) ? 'a radius; a diameter is wanted' : 'not understood'}.`,
        remedy: 'State bulk or an upper diameter such as "<10 µm"; a radius counts twice.',
        remedyKind: kind,
      };
    }
  },
};
