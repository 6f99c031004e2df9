import type { SampleRow } from '../../dataset/sample-row';
import type { VettingContext } from '../context';
import { columnPlace, placeOf } from '../place';
import type { Rule, RuleHit } from '../rule';
import { cores } from '../samples';
import { shown } from '../wording';

/**
 * In one core the depths run one way, the top of a sample lies above its base, and samples do not overlap.
 * A core listed deepest first is fine; a sheet in no order of depth at all is said once, as a warning.
 */
export const depthOrder: Rule = {
  id: 'V16',
  slug: 'depth-order',
  title: 'Depths out of order or overlapping',
  severity: 'error',
  stage: 'file',
  needs: ['depthM', 'depthTopM', 'depthBaseM'],
  source: 'common practice, no source',
  why: 'A depth out of order is mistyped or belongs to another core; overlapping samples count the same dust twice.',

  *check(context) {
    for (const core of cores(context)) {
      yield* pointDepths(context, core);
      yield* intervals(context, core);
    }
  },
};

function* pointDepths(context: VettingContext, core: SampleRow[]): Iterable<RuleHit> {
  const dated = core.filter((row) => row.depthM !== null);
  const steps = dated
    .slice(1)
    .map((row, i) => ({ row, above: dated[i]!, step: row.depthM! - dated[i]!.depthM! }));
  const down = steps.filter(({ step }) => step >= 0).length;
  const sign = down * 2 >= steps.length ? 1 : -1;
  const wrong = steps.filter(({ step }) => step * sign < 0);
  if (wrong.length === 0) return;
  const first = wrong[0]!;
  if (wrong.length > 1 && wrong.length > 0.1 * steps.length) {
    yield {
      ...columnPlace(context, first.row.sheet, 'depthM'),
      severity: 'warning',
      subject: first.row.site ?? '',
      message: `The rows of ${first.row.site ?? 'a core without name'} are in no order of depth: ${wrong.length} of ${steps.length} steps run the other way, the first at row ${first.row.row}.`,
      remedy: 'Check that the rows are of one core and the depths right, or waive it.',
      remedyKind: 'waive',
    };
    return;
  }
  for (const { row, above } of wrong) {
    yield {
      ...placeOf(context, row, 'depthM'),
      message: `The depth of ${shown(row.depthM!)} m in row ${row.row} breaks the order of its core: ${shown(above.depthM!)} m stands in row ${above.row} before it.`,
      remedy: 'Type the right depth over it, or leave the row out with a reason.',
      remedyKind: 'mend',
    };
  }
}

function* intervals(context: VettingContext, core: SampleRow[]): Iterable<RuleHit> {
  const whole = core.filter((row) => row.depthTopM !== null && row.depthBaseM !== null);
  for (const row of whole) {
    if (row.depthTopM! < row.depthBaseM!) continue;
    yield {
      ...placeOf(context, row, 'depthTopM'),
      message: `The top of the sample (${shown(row.depthTopM!)} m) does not lie above its base (${shown(row.depthBaseM!)} m).`,
      remedy: 'Type the right depths over them, or leave the row out with a reason.',
      remedyKind: 'mend',
    };
  }
  const sorted = whole
    .filter((row) => row.depthTopM! < row.depthBaseM!)
    .sort((a, b) => a.depthTopM! - b.depthTopM!);
  let deepest: SampleRow | undefined;
  for (const row of sorted) {
    // a micrometre of play: 0.3 m typed as 30 cm × 0.01 is not always 0.3
    if (deepest && row.depthTopM! < deepest.depthBaseM! - 1e-6 && row.sizeCutoff === deepest.sizeCutoff) {
      yield {
        ...placeOf(context, row, 'depthTopM'),
        subject: 'overlap',
        message: `The sample of ${shown(row.depthTopM!)} to ${shown(row.depthBaseM!)} m overlaps row ${deepest.row}, which reaches to ${shown(deepest.depthBaseM!)} m.`,
        remedy: 'Type the right depths over them, or leave one of the rows out with a reason.',
        remedyKind: 'mend',
      };
    }
    if (!deepest || row.depthBaseM! > deepest.depthBaseM!) deepest = row;
  }
}
