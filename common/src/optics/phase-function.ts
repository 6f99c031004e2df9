import { DomainError, requireWithin, type Caution } from '../physical/domain-error';
import { gaussLegendre } from './gauss-legendre';
import { AmplitudeSums, addIntensities } from './mie-amplitudes';
import { MieCoefficients } from './mie-coefficients';
import { mieInto, Q_SCA } from './mie';
import { requireModes, WAVELENGTH_RANGE_UM, type OpticalMode } from './mode-optics';
import { sizeGrid } from './mode-scattering';

/** Size points of a phase function: fewer than for extinction, whose absorption needs the rest. */
const SIZE_POINTS = 1600;
const MIN_ANGLES = 180;
const MAX_ANGLES = 1600;

/** Size-averaged phase function on Gauss angles, ½∫P dμ = 1. */
export interface PhaseFunction {
  /** cosines of the scattering angle, from −1 (straight back) upwards */
  readonly cosAngles: Float64Array;
  /** Gauss weights over the cosine, which add up to 2 */
  readonly weights: Float64Array;
  readonly values: Float64Array;
  readonly cautions: Caution[];
}

/**
 * Phase function of an external mixture of lognormal modes, from the Mie amplitudes.
 *
 * @param angles Gauss angles; when left out, enough for the largest spheres, 180 to 1600
 * @param sizePoints midpoints in ln r per mode
 * @throws DomainError as `modeOptics`
 *
 * Limits: spheres. Dust scatters less straight back and more sideways than spheres do.
 * Source: checks/optics/FORMULAS.md §1, §4. Checked against: checks/optics/upscatter_mie.csv.
 */
export function phaseFunction(
  modes: readonly OpticalMode[],
  wavelengthUm: number,
  options: { angles?: number; sizePoints?: number } = {},
): PhaseFunction {
  const sizePoints = options.sizePoints ?? SIZE_POINTS;
  requireWithin('angles', options.angles ?? MIN_ANGLES, '', 4, MAX_ANGLES);
  requireWithin('sizePoints', sizePoints, '', 10, 20_000);
  requireModes(modes);
  requireWithin('wavelengthUm', wavelengthUm, 'µm', ...WAVELENGTH_RANGE_UM);
  const largest = Math.max(...modes.map((mode) => sizeGrid(mode, wavelengthUm, 10).sizeParameters[9]!));
  // P has polynomials of up to 2x in it, which Gauss points of that half number integrate exactly.
  const enough = Math.min(MAX_ANGLES, Math.max(MIN_ANGLES, Math.ceil(1.3 * largest) + 40));
  const half = Math.ceil((options.angles ?? enough) / 2);
  const { nodes, weights } = gaussLegendre(2 * half);
  const cosines = nodes.slice(half);
  const { forward, backward } = phaseAt(modes, wavelengthUm, cosines, sizePoints);
  const values = new Float64Array(2 * half);
  for (let i = 0; i < half; i += 1) {
    values[half + i] = forward[i]!;
    values[half - 1 - i] = backward[i]!;
  }
  const norm = weights.reduce((sum, weight, i) => sum + (weight * values[i]!) / 2, 0);
  return { cosAngles: nodes, weights, values, cautions: peakCautions(norm) };
}

/**
 * The phase function at chosen angles, for a chart: P at the scattering angles of cosine μ (`forward`) and −μ
 * (`backward`).
 *
 * @param cosines μ, 0 to 1
 */
export function phaseAt(
  modes: readonly OpticalMode[],
  wavelengthUm: number,
  cosines: Float64Array,
  sizePoints = SIZE_POINTS,
): { forward: Float64Array; backward: Float64Array } {
  const forward = new Float64Array(cosines.length);
  const backward = new Float64Array(cosines.length);
  const coefficients = new MieCoefficients();
  const sums = new AmplitudeSums();
  const sphere = new Float64Array(5);
  let scattered = 0;
  for (const mode of modes) {
    const { sizeParameters, areaWeightsUm2 } = sizeGrid(mode, wavelengthUm, sizePoints);
    const { real, imaginary } = mode.refractiveIndex;
    for (let i = 0; i < sizePoints; i += 1) {
      const x = sizeParameters[i]!;
      const weight = mode.numberFraction * areaWeightsUm2[i]!;
      if (weight === 0) continue;
      mieInto(sphere, x, real, imaginary, coefficients);
      if (sphere[Q_SCA] === 0) continue; // the index of the medium: nothing was computed
      scattered += weight * sphere[Q_SCA]!;
      addIntensities(forward, backward, cosines, (2 * weight) / (x * x), coefficients, sums);
    }
  }
  if (scattered === 0) {
    throw new DomainError('nothing-scatters', {
      field: 'modes[0].refractiveIndex',
      value: modes[0]!.refractiveIndex.real,
      allowed: 'different from that of the medium: nothing scatters here',
    });
  }
  for (let i = 0; i < cosines.length; i += 1) {
    forward[i]! /= scattered;
    backward[i]! /= scattered;
  }
  return { forward, backward };
}

/** X_n = ½∫ P P_n dμ for n = 0 … order; X₀ = 1, X₁ = g. */
export function legendreMoments(phase: PhaseFunction, order: number): Float64Array {
  requireWithin('order', order, '', 0, 2 * MAX_ANGLES);
  const moments = new Float64Array(order + 1);
  phase.cosAngles.forEach((mu, i) => {
    const part = (phase.weights[i]! * phase.values[i]!) / 2;
    let before = 0;
    let now = 1;
    for (let n = 0; n <= order; n += 1) {
      moments[n]! += part * now;
      [before, now] = [now, ((2 * n + 1) * mu * now - n * before) / (n + 1)];
    }
  });
  return moments;
}

/** Share of singly scattered light that turns back by more than 90°: the upscatter of an overhead sun. */
export function backscatterFraction(phase: PhaseFunction): number {
  return phase.values.reduce(
    (sum, value, i) => sum + (phase.cosAngles[i]! < 0 ? (phase.weights[i]! * value) / 2 : 0),
    0,
  );
}

/**
 * Hemispheric mean upscatter fraction of the phase function itself, β̄ = 1/(2π) ∫ θ P sin θ dθ.
 *
 * Source: Wiscombe & Grams (1976), J. Atmos. Sci. 33, 2440–2451 (from memory); checks/optics/FORMULAS.md §4.
 * Checked against: checks/optics/upscatter_mie.csv.
 */
export function upscatterMeanOf(phase: PhaseFunction): number {
  let sum = 0;
  phase.values.forEach((value, i) => {
    sum += phase.weights[i]! * Math.acos(phase.cosAngles[i]!) * value;
  });
  return sum / (2 * Math.PI);
}

/**
 * Upscatter fraction of the phase function at one sun angle. Of the light scattered by θ a share arccos(μ₀ cot θ/sin θ₀)/π
 * of the azimuths goes up (held to 0 … 1).
 *
 * @param cosSolarZenith μ₀ = cos θ₀, 0 to 1
 */
export function upscatterOf(phase: PhaseFunction, cosSolarZenith: number): number {
  const mu = requireWithin('cosSolarZenith', cosSolarZenith, '', 0, 1);
  const sinZenith = Math.sqrt(1 - mu * mu);
  let sum = 0;
  phase.values.forEach((value, i) => {
    const cosAngle = phase.cosAngles[i]!;
    const across = sinZenith * Math.sqrt(1 - cosAngle * cosAngle);
    const edge = across > 0 ? (mu * cosAngle) / across : Math.sign(cosAngle) * Infinity;
    const up = Math.acos(Math.min(1, Math.max(-1, edge))) / Math.PI;
    sum += (phase.weights[i]! * value * up) / 2;
  });
  return sum;
}

function peakCautions(norm: number): Caution[] {
  if (Math.abs(norm - 1) < 2e-3) return [];
  return [
    {
      code: 'forward-peak-unresolved',
      message: `The angles resolve ${(100 * norm).toFixed(1)} % of the scattered light; the rest lies in a forward peak narrower than they are. The upscatter fraction is hardly moved by it.`,
    },
  ];
}
