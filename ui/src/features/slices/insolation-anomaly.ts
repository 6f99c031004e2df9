import { fixedAngularMonths } from '@siltlight/common/orbit/calendar';
import { dailyInsolation } from '@siltlight/common/orbit/daily-insolation';
import type { SliceContent } from '@siltlight/common/wire/slices';

type Light = Pick<SliceContent, 'orbit' | 'solarConstantWm2'>;

export const ANOMALY_STEP_DEG = 5;
export const MONTHS = ['J', 'F', 'M', 'A', 'M', 'J', 'J', 'A', 'S', 'O', 'N', 'D'];
export const MONTH_NAMES =
  'January February March April May June July August September October November December'.split(' ');

export type AnomalyCell = { month: number; latitudeDeg: number; anomalyWm2: number };

/**
 * Daily mean insolation at the middle of each fixed-angular month (30° of solar longitude), slice minus reference.
 * Months of equal arc compare equal places on the orbit; calendar months would show the calendar as well.
 */
export function insolationAnomaly(slice: Light, reference: Light): AnomalyCell[] {
  const cells: AnomalyCell[] = [];
  const latitudes = Array.from(
    { length: 180 / ANOMALY_STEP_DEG },
    (_, at) => -90 + ANOMALY_STEP_DEG * (at + 0.5),
  );
  fixedAngularMonths(reference.orbit).forEach(({ midLongitudeDeg }, month) => {
    const longitude = midLongitudeDeg % 360;
    for (const latitudeDeg of latitudes) {
      const of = ({ orbit, solarConstantWm2 }: Light) =>
        dailyInsolation(latitudeDeg, longitude, orbit, solarConstantWm2).dailyMeanWm2;
      cells.push({ month, latitudeDeg, anomalyWm2: of(slice) - of(reference) });
    }
  });
  return cells;
}
