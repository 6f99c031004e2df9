import { bergerOrbit, type Orbit } from '@siltlight/common/orbit/elements';

export type OrbitPoint = { ageKa: number; eccentricity: number; obliquityDeg: number; precession: number };

export const ORBIT_SPAN_KA = 150;
const STEP_KA = 0.5;
const RADIANS = Math.PI / 180;

/** Climatic precession e sin ϖ: above zero while perihelion falls in northern winter, as now. */
export const precessionOf = ({ eccentricity, perihelionLongitudeDeg }: Orbit) =>
  eccentricity * Math.sin(perihelionLongitudeDeg * RADIANS);

/** The three elements through time (Berger 1978), from 1950 CE to 150 ka before it. */
export function orbitSeries(toKa = ORBIT_SPAN_KA): OrbitPoint[] {
  return Array.from({ length: Math.round(toKa / STEP_KA) + 1 }, (_, at) => {
    const { orbit } = bergerOrbit(at * STEP_KA);
    const { eccentricity, obliquityDeg } = orbit;
    return { ageKa: at * STEP_KA, eccentricity, obliquityDeg, precession: precessionOf(orbit) };
  });
}
