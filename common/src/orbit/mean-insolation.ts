import { RADIANS } from '../physical/constants';
import { requireWithin } from '../physical/domain-error';
import { gaussLegendre } from '../optics/gauss-legendre';
import { arcShareOfYear } from './calendar';
import { sunCourse } from './daily-insolation';
import { checkOrbit, type Orbit } from './orbit';

const RULE = gaussLegendre(48);

/**
 * Mean insolation over the time the Sun takes from one true longitude to another [W m⁻²].
 * Time runs as dt ∝ r² dλ, so the mean is ∫Q r² dλ / ∫r² dλ; Q r² does not depend on the distance and the lower
 * integral is Kepler's.
 *
 * @param startDeg, endDeg λ [°], end after start, at most 360 apart
 *
 * Checked against: checks/orbit/monthly_insolation.csv to 1e-9 relative.
 */
export function arcMeanInsolation(
  latitudeDeg: number,
  startDeg: number,
  endDeg: number,
  orbit: Orbit,
  solarConstantWm2: number,
): number {
  requireWithin('solarConstantWm2', solarConstantWm2, 'W m⁻²', 0, 10_000);
  requireWithin('endLongitudeDeg', endDeg, '°', startDeg, startDeg + 360);
  const share = arcShareOfYear(startDeg, endDeg, orbit);
  const year = 2 * Math.PI * Math.sqrt(1 - orbit.eccentricity ** 2);
  return (
    (solarConstantWm2 / Math.PI) * (integratedDaySum(latitudeDeg, startDeg, endDeg, orbit) / (share * year))
  );
}

/**
 * Annual mean insolation at a latitude [W m⁻²]; it does not depend on the perihelion.
 *
 * Checked against: checks/orbit/annual_insolation.csv to 1e-9 relative.
 */
export function annualMeanInsolation(latitudeDeg: number, orbit: Orbit, solarConstantWm2: number): number {
  return arcMeanInsolation(latitudeDeg, 0, 360, orbit, solarConstantWm2);
}

/** Annual and global mean S₀ / (4 √(1 − e²)) [W m⁻²], S₀ at the semi-major axis. */
export function globalAnnualMeanInsolation(orbit: Orbit, solarConstantWm2: number): number {
  requireWithin('solarConstantWm2', solarConstantWm2, 'W m⁻²', 0, 10_000);
  return solarConstantWm2 / (4 * Math.sqrt(1 - checkOrbit(orbit).eccentricity ** 2));
}

/** ∫ (a H₀ + b sin H₀) dλ [rad], split where the day sum is not smooth. */
function integratedDaySum(latitudeDeg: number, startDeg: number, endDeg: number, orbit: Orbit): number {
  const edges = [startDeg, ...seasonLimits(latitudeDeg, startDeg, endDeg, orbit.obliquityDeg), endDeg];
  let total = 0;
  for (let k = 1; k < edges.length; k += 1) {
    const half = (edges[k]! - edges[k - 1]!) / 2;
    const middle = (edges[k]! + edges[k - 1]!) / 2;
    for (let i = 0; i < RULE.nodes.length; i += 1) {
      // λ = middle − half cos θ makes the day sum, which begins as a 3/2 power at a polar limit, smooth in θ.
      const theta = (Math.PI / 2) * (1 + RULE.nodes[i]!);
      const { a, b, h0 } = sunCourse(latitudeDeg, middle - half * Math.cos(theta), orbit);
      const daySum = h0 === 0 ? 0 : a * h0 + b * Math.sin(h0);
      total += RULE.weights[i]! * (Math.PI / 2) * half * RADIANS * Math.sin(theta) * daySum;
    }
  }
  return total;
}

/**
 * Longitudes within the arc where |sin λ| = cos φ / sin ε (polar day or night begins or ends), with the equinoxes and
 * solstices: near the polar circles the day sum bends sharply at a solstice.
 */
function seasonLimits(latitudeDeg: number, startDeg: number, endDeg: number, obliquityDeg: number): number[] {
  const cosLatitude = Math.abs(latitudeDeg) === 90 ? 0 : Math.cos(latitudeDeg * RADIANS);
  const ratio = cosLatitude / Math.sin(obliquityDeg * RADIANS);
  const angle = ratio <= 1 ? Math.asin(ratio) / RADIANS : 0;
  const limits = [0, 90, 180, 270, angle, 180 - angle, 180 + angle, 360 - angle];
  const within = [-720, -360, 0, 360, 720]
    .flatMap((turn) => limits.map((limit) => limit + turn))
    .filter((limit) => limit > startDeg && limit < endDeg);
  return [...new Set(within)].sort((x, y) => x - y);
}
