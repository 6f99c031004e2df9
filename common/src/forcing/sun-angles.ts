import { readNumber, refuseUnused } from '../physical/check-fields';
import type { Caution } from '../physical/domain-error';
import { gaussLegendre } from '../optics/gauss-legendre';
import { upscatterAt, upscatterMean } from '../optics/upscatter';
import { readOrbitOrAge } from '../orbit/calculate-insolation';
import { sunCourse } from '../orbit/daily-insolation';
import type { Orbit } from '../orbit/orbit';
import { INPUTS } from './inputs';
import { MIN_COS_ZENITH } from './layer-scheme';

/** Points over the lit hours of a day. */
const DAY_POINTS = 16;

/** Sunlight at the top, mean over the time meant: at some sun angles, or evenly over the sunlit hemisphere. */
export interface SunAngles {
  readonly cosines: Float64Array;
  /** flux on the horizontal that belongs to each angle [W m⁻²]; they add up to the mean */
  readonly fluxesWm2: Float64Array;
  /** flux of the mean over the sunlit hemisphere [W m⁻²] */
  readonly hemisphericWm2: number;
}

/** One sun angle with its flux; a day at a latitude; or, with neither, the sunlit hemisphere. */
export interface SunInput {
  cosSolarZenith?: number;
  /** flux on the horizontal, beside `cosSolarZenith` */
  insolationWm2?: number;
  latitudeDeg?: number;
  /** this or `orbit`, beside `latitudeDeg` */
  ageKaBp?: number;
  orbit?: Orbit;
  solarLongitudeDeg?: number;
  /** 1361 when absent; not beside `insolationWm2` */
  solarConstantWm2?: number;
  /** 0.5 when absent, the global and annual mean; with the sunlit hemisphere alone */
  daylightFraction?: number;
}

const ONE_ANGLE = ['cosSolarZenith', 'insolationWm2'];
const DAY = ['latitudeDeg', 'ageKaBp', 'orbit', 'solarLongitudeDeg', 'solarConstantWm2'];
const HEMISPHERE = ['solarConstantWm2', 'daylightFraction'];

/** Every name by which a request may tell of the sun. */
export const SUN_FIELDS: readonly string[] = [...new Set([...ONE_ANGLE, ...DAY, ...HEMISPHERE])];

/**
 * The sun as a request tells it.
 *
 * @throws DomainError for a field that is missing, out of range, or belongs to another way of telling
 */
export function readSunAngles(given: SunInput): { sun: SunAngles; cautions: Caution[] } {
  const told = Object.fromEntries(Object.entries(given).filter(([name]) => SUN_FIELDS.includes(name)));
  const has = (...names: (keyof SunInput)[]) => names.some((name) => given[name] !== undefined);
  if (has('cosSolarZenith', 'insolationWm2')) {
    refuseUnused(told, ONE_ANGLE);
    const cosines = Float64Array.of(readNumber(given, INPUTS.cosSolarZenith));
    const fluxesWm2 = Float64Array.of(readNumber(given, INPUTS.insolationWm2));
    return { sun: { cosines, fluxesWm2, hemisphericWm2: 0 }, cautions: [] };
  }
  const solarConstantWm2 = readNumber(given, INPUTS.solarConstantWm2);
  if (has('latitudeDeg', 'ageKaBp', 'orbit', 'solarLongitudeDeg')) {
    refuseUnused(told, DAY);
    const { orbit, cautions } = readOrbitOrAge(given);
    const latitudeDeg = readNumber(given, INPUTS.latitudeDeg);
    const solarLongitudeDeg = readNumber(given, INPUTS.solarLongitudeDeg);
    return { sun: sunOfDay(latitudeDeg, solarLongitudeDeg, orbit, solarConstantWm2), cautions };
  }
  refuseUnused(told, HEMISPHERE);
  const half = (readNumber(given, INPUTS.daylightFraction) * solarConstantWm2) / 2;
  return {
    sun: { cosines: new Float64Array(), fluxesWm2: new Float64Array(), hemisphericWm2: half },
    cautions: [],
  };
}

/**
 * The lit hours of a day by 16 Gauss points in hour angle; nothing in polar night.
 *
 * @param solarConstantWm2 S₀ at the semi-major axis [W m⁻²]
 */
export function sunOfDay(
  latitudeDeg: number,
  solarLongitudeDeg: number,
  orbit: Orbit,
  solarConstantWm2: number,
): SunAngles {
  const { a, b, h0, sunDistanceAu } = sunCourse(latitudeDeg, solarLongitudeDeg, orbit);
  const { nodes, weights } = gaussLegendre(h0 === 0 ? 1 : DAY_POINTS);
  const normalWm2 = ((solarConstantWm2 / (sunDistanceAu * sunDistanceAu)) * h0) / Math.PI;
  const heights = nodes.map((x) => Math.max(0, a + b * Math.cos((h0 * (1 + x)) / 2)));
  const fluxesWm2 = weights.map((w, i) => normalWm2 * (w / 2) * heights[i]!);
  // A sun that only grazes the horizon is seen at the lowest angle served; its flux is next to nothing.
  const cosines = heights.map((mu) => Math.max(MIN_COS_ZENITH, mu));
  return { cosines, fluxesWm2, hemisphericWm2: 0 };
}

/** Means over the sun angles, each as long as it lasts: ⟨β⟩ and ⟨μ₀⟩; β̄ and ½ over the hemisphere. */
export function firstOrderMeans(sun: SunAngles, asymmetry: number): { upscatter: number; meanMu: number } {
  if (sun.cosines.length === 0) return { upscatter: upscatterMean(asymmetry), meanMu: 0.5 };
  let time = 0;
  let upscatter = 0;
  let flux = 0;
  sun.cosines.forEach((mu, i) => {
    const share = sun.fluxesWm2[i]! / mu;
    time += share;
    upscatter += share * upscatterAt(asymmetry, mu);
    flux += sun.fluxesWm2[i]!;
  });
  return time > 0
    ? { upscatter: upscatter / time, meanMu: flux / time }
    : { upscatter: upscatterAt(asymmetry, sun.cosines[0]!), meanMu: sun.cosines[0]! };
}
