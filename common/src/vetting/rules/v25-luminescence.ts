import { limitsOf } from '../limits';
import { sheetPlace, bySheet } from '../place';
import type { Rule } from '../rule';
import { ageOf } from '../samples';
import { counted, shown, statements } from '../wording';

const LIMITS = { saturationKa: 30 };
const LUMINESCENCE = /luminescence|lumineszenz|\bOSL\b|\bIRSL\b/i;

/** Quartz signals saturate with dose: ages beyond some 30 to 40 ka may be too young. */
export const luminescence: Rule = {
  id: 'V25',
  slug: 'luminescence',
  title: 'Luminescence ages near saturation',
  severity: 'note',
  stage: 'submission',
  needs: ['ageKaBp', 'ageModel'],
  source: 'common practice, from memory; the limit depends on the dose rate',
  why: 'Near saturation the signal grows no more, so an old loess looks younger and its flux greater.',
  limits: LIMITS,

  *check(context) {
    const text = statements(context);
    if (!LUMINESCENCE.test(text) || !/quar[tz]z?/i.test(text)) return;
    const { saturationKa } = limitsOf(context, 'V25', LIMITS);
    for (const [sheet, rows] of bySheet(context.rows)) {
      const old = rows.map(ageOf).filter((age): age is number => age !== null && age > saturationKa);
      if (old.length === 0) continue;
      yield {
        ...sheetPlace(sheet, 'ageKaBp'),
        message: `On sheet "${sheet}", ${counted(old.length, 'row')} dated by quartz luminescence beyond ${saturationKa} ka (oldest ${shown(maximum(old))} ka) may be near saturation.`,
        remedy: 'Say in the age model how saturation was tested.',
        remedyKind: 'none',
      };
    }
  },
};

const maximum = (values: number[]): number =>
  values.reduce((most, value) => Math.max(most, value), -Infinity);
