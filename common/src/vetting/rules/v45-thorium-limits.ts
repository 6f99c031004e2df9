import { limitsOf } from '../limits';
import { isNormalised, marineRows } from '../marine';
import { bySheet, sheetPlace } from '../place';
import type { Rule } from '../rule';
import { ageOf } from '../samples';
import { counted } from '../wording';

const LIMITS = { waterDepthMinM: 1000, ageMaxKa: 300 };

/** 230Th normalisation needs deep water, and fails once the 230Th has decayed. */
export const thoriumLimits: Rule = {
  id: 'V45',
  slug: 'thorium-limits',
  title: '230Th normalisation beyond its limits',
  severity: 'warning',
  stage: 'submission',
  needs: ['waterDepthM', 'ageKaBp', 'method'],
  source: 'scavenging and decay limits, from memory',
  why: 'In shallow water little 230Th is made and margins scavenge more than their share; after 300 kyr nearly all has decayed.',
  limits: LIMITS,

  *check(context) {
    if (!isNormalised(context)) return;
    const { waterDepthMinM, ageMaxKa } = limitsOf(context, 'V45', LIMITS, 'marine');
    for (const [sheet, rows] of bySheet(marineRows(context))) {
      const shallow = rows.filter((row) => row.waterDepthM !== null && row.waterDepthM < waterDepthMinM);
      const old = rows.filter((row) => (ageOf(row) ?? 0) > ageMaxKa);
      const faults = [
        ...(shallow.length
          ? [{ rows: shallow, field: 'waterDepthM', what: `from less than ${waterDepthMinM} m of water` }]
          : []),
        ...(old.length ? [{ rows: old, field: 'ageKaBp', what: `older than ${ageMaxKa} ka` }] : []),
      ];
      for (const { rows: found, field, what } of faults) {
        yield {
          ...sheetPlace(sheet, field),
          message: `On sheet "${sheet}", ${counted(found.length, '230Th-normalised sample')} ${what}, the first in row ${found[0]!.row}.`,
          remedy: 'Leave the rows out with a reason, or waive it and say why the method holds.',
          remedyKind: 'waive',
        };
      }
    }
  },
};
