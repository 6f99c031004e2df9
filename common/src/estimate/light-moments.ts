import { DAYS_PER_YEAR } from '../physical/constants';
import { dailyMoments } from '../forcing/daily-moments';
import { gaussLegendre } from '../optics/gauss-legendre';
import { sunCourse } from '../orbit/daily-insolation';
import { type AngularMonth, fixedAngularMonths } from '../orbit/calendar';
import type { Orbit } from '../orbit/orbit';
import type { RegionGeometry } from './region-geometry';

export const MONTHS = 12;

/** Highest Legendre order of β(μ₀) that is kept: the rest is below 1e-6 of β for g ≤ 0.76 and 1e-4 for 0.85. */
export const LIGHT_HIGHEST_ORDER = 41;

/** Light 0: one, everywhere and always. */
export const LIGHT_CONSTANT = 0;
/** Light 1: S₀/ρ² · lit fraction of the day [W m⁻²]. */
export const LIGHT_LIT = 1;
/** Light 2: S₀/ρ² · lit fraction · ⟨μ₀⟩ = daily mean insolation [W m⁻²]. P₁ is μ₀. */
export const LIGHT_INSOLATION = 2;
/** Lights 3 …: the same with ⟨P_n(μ₀)⟩, n = 3, 5, … */
export const LIGHTS = LIGHT_INSOLATION + (LIGHT_HIGHEST_ORDER + 1) / 2;

export function lightOfOrder(order: number): number {
  return LIGHT_INSOLATION + (order - 1) / 2;
}

export interface MonthLight {
  /** true length of the month over that of the year */
  shareOfYear: number;
  /** row × lights */
  byRow: Float64Array;
}

export interface LightMoments {
  /** grid, orbit and sun in one text: equal keys, equal light */
  key: string;
  months: MonthLight[];
}

const known = new Map<string, LightMoments>();
const KEPT = 12;

/**
 * Light of each row of the grid in the twelve months of an orbit (fixed arcs of 30° of solar longitude), as means
 * over the lit hours of Legendre polynomials of μ₀.
 *
 * Within a month three Gauss points of solar longitude, weighted by the time the Earth spends there (∝ ρ²).
 */
export function lightMoments(geometry: RegionGeometry, orbit: Orbit, solarConstantWm2: number): LightMoments {
  const { eccentricity, obliquityDeg, perihelionLongitudeDeg } = orbit;
  const key = [geometry.rows, eccentricity, obliquityDeg, perihelionLongitudeDeg, solarConstantWm2].join(' ');
  const before = known.get(key);
  if (before) return before;
  const months = fixedAngularMonths(orbit).map((month) => ({
    shareOfYear: month.days / DAYS_PER_YEAR,
    byRow: monthLight(geometry, month, orbit, solarConstantWm2),
  }));
  const light = { key, months };
  if (known.size >= KEPT) known.delete(known.keys().next().value!);
  known.set(key, light);
  return light;
}

function monthLight(
  geometry: RegionGeometry,
  month: AngularMonth,
  orbit: Orbit,
  solarConstantWm2: number,
): Float64Array {
  const { nodes, weights } = gaussLegendre(3);
  const longitudes = Array.from(nodes, (node) => month.midLongitudeDeg + 15 * node);
  const time = longitudes.map(
    (longitude, i) => weights[i]! * sunCourse(0, longitude, orbit).sunDistanceAu ** 2,
  );
  const total = time.reduce((sum, t) => sum + t, 0);
  const byRow = new Float64Array(geometry.rows * LIGHTS);
  for (let row = 0; row < geometry.rows; row++) {
    byRow[row * LIGHTS + LIGHT_CONSTANT] = 1;
    longitudes.forEach((longitude, i) => {
      const latitude = geometry.latitudesDeg[row]!;
      const moments = dailyMoments(latitude, longitude, orbit, solarConstantWm2, LIGHT_HIGHEST_ORDER);
      const strength = (moments.incidentWm2 * time[i]!) / total;
      byRow[row * LIGHTS + LIGHT_LIT]! += strength;
      byRow[row * LIGHTS + LIGHT_INSOLATION]! += strength * moments.meanMu;
      for (let n = 3; n <= LIGHT_HIGHEST_ORDER; n += 2) {
        byRow[row * LIGHTS + lightOfOrder(n)]! += strength * moments.legendre[(n - 1) / 2]!;
      }
    });
  }
  return byRow;
}
