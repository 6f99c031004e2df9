import { filePlace } from '../place';
import type { Rule } from '../rule';
import { countedRows } from '../samples';
import { asked } from '../wording';

/** What was counted as dust: insoluble, eolian, lithogenic, non-carbonate, from a tracer, or the total mass. */
export const dustDefinition: Rule = {
  id: 'V41',
  slug: 'dust-definition',
  title: 'What counts as dust is not stated',
  severity: 'error',
  stage: 'submission',
  needs: ['dustDefinition'],
  source: 'common practice, no source',
  why: 'Total mass accumulation holds shells, opal and river mud: taken for dust it may be ten times too much.',

  *check(context) {
    const hasDust = countedRows(context).some((row) => row.quantity === 'dust');
    if (context.kind === 'point-optical-depth' || !hasDust || context.metadata.dustDefinition?.trim()) return;
    yield {
      ...filePlace('dustDefinition'),
      ...asked(
        context,
        'What counts as dust',
        'choose insoluble, eolian, lithogenic, non-carbonate, from a tracer or total.',
      ),
    };
  },
};
