import { RADIANS } from '../physical/constants';
import { requireWithin, type Caution } from '../physical/domain-error';
import {
  BERGER_1978_ECCENTRICITY,
  BERGER_1978_MEAN_OBLIQUITY_DEG,
  BERGER_1978_OBLIQUITY,
  BERGER_1978_PRECESSION,
  BERGER_1978_PRECESSION_PHASE_DEG,
  BERGER_1978_PRECESSION_RATE_ARCSEC_PER_YEAR,
  type Berger1978Term,
} from '../tables/berger1978';
import { PMIP_SLICES } from '../tables/pmip-slices';
import { wrapDegrees, type Orbit } from './orbit';

export type { Orbit } from './orbit';

/** Age beyond which the solution of 1978 is no longer trusted [ka]. */
export const BERGER_1978_RANGE_KA = 1000;
/** Age beyond which the series says nothing and is refused [ka]. */
export const BERGER_1978_LIMIT_KA = 5000;

const DEGREES_PER_ARCSEC = 1 / 3600;

export interface OrbitAtAge {
  orbit: Orbit;
  /** e sin ϖ, +0.0164 in 1950 CE */
  climaticPrecession: number;
  cautions: Caution[];
}

/**
 * Orbital elements by the trigonometric series of Berger (1978), t in years from 1950 CE:
 *
 *   ε = ε* + Σ A cos(f t + δ);  e sin Π = Σ M sin(g t + β),  e cos Π = Σ M cos(g t + β)
 *   ψ = ψ̄ t + ζ + Σ F sin(f′ t + δ′);  ϖ = Π + ψ
 *
 * with all 47, 19 and 78 terms. Π comes from the two-argument arctangent, which needs no repair of quadrants.
 *
 * @param ageKaBp age before 1950 CE [ka], −5000 to 5000; negative is the future
 * @returns elements, with the caution `berger1978-beyond-range` beyond ±1000 ka
 * @throws DomainError outside ±5000 ka
 *
 * Limits: Berger & Loutre (1991) differ by up to 3.5 W m⁻² at 65° N in June within 130 ka, 8.4 within 800 ka,
 * 16.7 within 1 Ma (checks/orbit/FORMULAS.md §6).
 * Source: Berger (1978), J. Atmos. Sci. 35, 2362–2367.
 * Checked against: checks/orbit/berger1978_elements.csv to 1e-9, published_elements.csv.
 */
export function bergerOrbit(ageKaBp: number): OrbitAtAge {
  requireWithin('ageKaBp', ageKaBp, 'ka BP', -BERGER_1978_LIMIT_KA, BERGER_1978_LIMIT_KA);
  const years = -1000 * ageKaBp;
  const obliquityDeg =
    BERGER_1978_MEAN_OBLIQUITY_DEG + sum(BERGER_1978_OBLIQUITY, years, Math.cos) * DEGREES_PER_ARCSEC;
  const x = sum(BERGER_1978_ECCENTRICITY, years, Math.sin);
  const y = sum(BERGER_1978_ECCENTRICITY, years, Math.cos);
  const precessionDeg =
    BERGER_1978_PRECESSION_PHASE_DEG +
    (BERGER_1978_PRECESSION_RATE_ARCSEC_PER_YEAR * years + sum(BERGER_1978_PRECESSION, years, Math.sin)) *
      DEGREES_PER_ARCSEC;
  const eccentricity = Math.hypot(x, y);
  const perihelionLongitudeDeg = wrapDegrees(Math.atan2(x, y) / RADIANS + precessionDeg);
  return {
    orbit: { eccentricity, obliquityDeg, perihelionLongitudeDeg },
    climaticPrecession: eccentricity * Math.sin(perihelionLongitudeDeg * RADIANS),
    cautions: rangeCautions(ageKaBp),
  };
}

/**
 * Orbit printed by a model protocol for a named slice, e.g. "last glacial maximum (PMIP4)"; null without one.
 * Protocol orbits are Berger (1978) rounded: within 5e-6 in e, 4e-4° in obliquity, 5e-3° in perihelion.
 */
export function protocolOrbit(sliceName: string): Orbit | null {
  return PMIP_SLICES.find((slice) => slice.name === sliceName)?.orbit ?? null;
}

function sum(terms: readonly Berger1978Term[], years: number, wave: (angle: number) => number): number {
  let total = 0;
  for (const [amplitude, rateArcsecPerYear, phaseDeg] of terms) {
    total += amplitude * wave((rateArcsecPerYear * years * DEGREES_PER_ARCSEC + phaseDeg) * RADIANS);
  }
  return total;
}

function rangeCautions(ageKaBp: number): Caution[] {
  if (Math.abs(ageKaBp) <= BERGER_1978_RANGE_KA) return [];
  return [
    {
      code: 'berger1978-beyond-range',
      message: `The Berger (1978) series is trusted within 1000 ka of 1950 CE; ${ageKaBp} ka BP lies beyond it, and phase errors grow.`,
    },
  ];
}
