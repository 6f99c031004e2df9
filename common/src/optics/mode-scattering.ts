import { DomainError } from '../physical/domain-error';
import { HALF_WIDTH, type LognormalMode } from './lognormal-mode';
import {
  G_Q_SCA,
  MAX_SIZE_PARAMETER,
  mieInto,
  MIN_SIZE_PARAMETER,
  Q_ABS,
  Q_SCA,
  type RefractiveIndex,
} from './mie';

/**
 * Points of the size integral and the largest relative error of extinction, ω, g and MEE with them. Mie ripples, not the
 * lognormal, set the error, so that no higher-order rule gains. Measured against 25600 points for median radii of 0.3 to
 * 2 µm and σ_g of 1.2 to 2.5 at 0.55 µm: 1600 points leave 2e-4 and 3200 leave 4e-5 at k = 0.0015; 6400 leave
 * 4e-5 at k = 0.0003, where absorption alone is good to 1e-3. See also checks/optics/convergence.csv.
 */
export const PRECISIONS = {
  full: { points: 3200, pointsWeaklyAbsorbing: 6400, relativeError: 1e-4, relativeErrorTransparent: 5e-4 },
  fast: { points: 100, pointsWeaklyAbsorbing: 100, relativeError: 1e-2, relativeErrorTransparent: 5e-2 },
} as const;

export type Precision = keyof typeof PRECISIONS;

/** Below this k resonances are so narrow that more points are taken. */
const WEAK_ABSORPTION = 0.001;

export function pointsFor(precision: Precision, index: RefractiveIndex): number {
  const { points, pointsWeaklyAbsorbing } = PRECISIONS[precision];
  return index.imaginary < WEAK_ABSORPTION ? pointsWeaklyAbsorbing : points;
}

/** Cross sections per particle of the uncut mode [µm²]. */
export interface ModeScattering {
  readonly scatteringUm2: number;
  readonly absorptionUm2: number;
  /** g times scattering */
  readonly forwardUm2: number;
}

/**
 * Cross sections of a mode, by midpoints in equal steps of ln r.
 *
 * @param wavelengthUm λ [µm], in the medium round the particles
 * @throws DomainError when the sizes leave 2πr/λ of 1e-6 to 1e5
 *
 * Source: checks/optics/FORMULAS.md §2, §9. Checked against: checks/optics/lognormal_modes.csv.
 */
export function scatterMode(
  mode: LognormalMode,
  index: RefractiveIndex,
  wavelengthUm: number,
  points: number,
): ModeScattering {
  const grid = sizeGrid(mode, wavelengthUm, points);
  const sphere = new Float64Array(5);
  let scattered = 0;
  let absorbed = 0;
  let forward = 0;
  for (let i = 0; i < points; i += 1) {
    const x = grid.sizeParameters[i]!;
    const weight = grid.areaWeightsUm2[i]!;
    mieInto(sphere, x, index.real, index.imaginary);
    scattered += weight * sphere[Q_SCA]!;
    absorbed += weight * sphere[Q_ABS]!;
    forward += weight * sphere[G_Q_SCA]!;
  }
  return { scatteringUm2: scattered, absorptionUm2: absorbed, forwardUm2: forward };
}

export interface SizeGrid {
  /** 2πr/λ of each point */
  readonly sizeParameters: Float64Array;
  /** πr² dN of each point [µm²] */
  readonly areaWeightsUm2: Float64Array;
}

/** Points of the size integral over the part of the mode that scatters. */
export function sizeGrid(mode: LognormalMode, wavelengthUm: number, points: number): SizeGrid {
  const [low, high] = integrationRange(mode, wavelengthUm);
  requireSizes(low, high, wavelengthUm);
  const spread = Math.log(mode.geometricStdDev);
  const step = Math.log(high / low) / points;
  const scale = (Math.PI * step) / (Math.sqrt(2 * Math.PI) * spread);
  const sizeParameters = new Float64Array(points);
  const areaWeightsUm2 = new Float64Array(points);
  for (let i = 0; i < points; i += 1) {
    const radius = low * Math.exp((i + 0.5) * step);
    const z = Math.log(radius / mode.medianRadiusUm) / spread;
    sizeParameters[i] = (2 * Math.PI * radius) / wavelengthUm;
    areaWeightsUm2[i] = scale * radius * radius * Math.exp((-z * z) / 2);
  }
  return { sizeParameters, areaWeightsUm2 };
}

/**
 * From 4.5 ln σ below the surface median to 4.5 ln σ above the volume median, inside the limits. Particles far smaller
 * than the wavelength scatter as r⁶ and scatter forward as r⁸: there the upper end follows the median of r⁸, but no
 * further than where that growth ends, at a size parameter of about 3.
 */
function integrationRange(mode: LognormalMode, wavelengthUm: number): [number, number] {
  const spread = Math.log(mode.geometricStdDev);
  const median = (power: number) => mode.medianRadiusUm * Math.exp(power * spread * spread);
  const growthEnds = (3 * wavelengthUm) / (2 * Math.PI);
  const centre = Math.min(median(8), Math.max(median(3), growthEnds));
  const low = median(2) * Math.exp(-HALF_WIDTH * spread);
  const high = centre * Math.exp(HALF_WIDTH * spread);
  // A mode cut far out in its tail keeps three widths from the cut inwards.
  return [
    Math.max(mode.minRadiusUm, Math.min(low, mode.maxRadiusUm * Math.exp(-3 * spread))),
    Math.min(mode.maxRadiusUm, Math.max(high, mode.minRadiusUm * Math.exp(3 * spread))),
  ];
}

function requireSizes(lowUm: number, highUm: number, wavelengthUm: number): void {
  const lowest = (wavelengthUm * MIN_SIZE_PARAMETER) / (2 * Math.PI);
  const highest = (wavelengthUm * MAX_SIZE_PARAMETER) / (2 * Math.PI);
  if (lowUm >= lowest && highUm <= highest) return;
  const tooLarge = highUm > highest;
  throw new DomainError('outside-range', {
    field: tooLarge ? 'maxRadiusUm' : 'minRadiusUm',
    value: tooLarge ? highUm : lowUm,
    unit: 'µm',
    allowed: [lowest, highest],
    remedy: `At ${wavelengthUm} µm the size parameter 2πr/λ must stay within ${MIN_SIZE_PARAMETER} to ${MAX_SIZE_PARAMETER}.`,
  });
}
