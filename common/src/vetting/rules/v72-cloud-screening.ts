import { opticalDepths } from '../optical-depth';
import { filePlace, textOf } from '../place';
import type { Rule } from '../rule';
import { statements } from '../wording';

const STATED = /lev(?:el)?[\s_-]*\d|cloud|screen|quality[\s-]assured|wolken|nuage|nube/i;

/** Retrieved optical depths say their product level or how clouds were screened, in the method or a remark. */
export const cloudScreening: Rule = {
  id: 'V72',
  slug: 'cloud-screening',
  title: 'Product level or cloud screening not stated',
  severity: 'warning',
  stage: 'submission',
  needs: ['aod', 'method'],
  source: 'levels of sun-photometer products: common practice, no source',
  why: 'Thin cirrus looks like coarse dust.',

  *check(context) {
    const rows = opticalDepths(context).map(({ row }) => row);
    const isModelled = /model/i.test(context.metadata.method ?? '');
    if (rows.length === 0 || isModelled || STATED.test(statements(context))) return;
    const silent = rows.find((row) => !STATED.test(textOf(row, 'remark') ?? ''));
    if (!silent) return;
    yield {
      ...filePlace('method'),
      message: `Neither the method nor a remark (first in row ${silent.row}) says the product level or how clouds were screened.`,
      remedy: 'Name the level or the screening in the method, such as "Level 2.0" or "cloud-screened".',
      remedyKind: 'answer',
    };
  },
};
