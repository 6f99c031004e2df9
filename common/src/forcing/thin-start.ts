import { solveInPlace } from './dense-matrix';
import type { ScatteringAngles } from './scattering-angles';

/** What a layer does to the streams and makes of the beams, per unit of horizontal flux of each beam. */
export interface LayerOperators {
  /** N × N, intensities up for intensities falling in from above */
  readonly reflection: Float64Array;
  readonly transmission: Float64Array;
  /** N × number of suns, diffuse intensities leaving at the top and at the bottom */
  readonly sourceUp: Float64Array;
  readonly sourceDown: Float64Array;
}

/**
 * A layer so thin that light within it is the mean of what enters and leaves (trapezoidal rule): errors of the third
 * order in depth. Symmetric and antisymmetric illumination decouple, so two systems of order N do.
 *
 *   (I + δ/2 C±) (T ± R) = I − δ/2 C±,  C± = M⁻¹ (I − ω P± W),  P+ the even, P− the odd part
 *
 * @param singleScatteringAlbedo ω and @param depth δ, both after the forward peak was cut
 */
export function thinStart(
  angles: ScatteringAngles,
  singleScatteringAlbedo: number,
  depth: number,
): LayerOperators {
  const { order: n, cosSolarZeniths } = angles;
  const suns = cosSolarZeniths.length;
  const symmetric = respond(angles, angles.even, angles.sunEven, singleScatteringAlbedo, depth);
  const antisymmetric = respond(angles, angles.odd, angles.sunOdd, singleScatteringAlbedo, depth);
  const layer: LayerOperators = {
    reflection: new Float64Array(n * n),
    transmission: new Float64Array(n * n),
    sourceUp: new Float64Array(n * suns),
    sourceDown: new Float64Array(n * suns),
  };
  const width = n + suns;
  for (let i = 0; i < n; i += 1) {
    for (let j = 0; j < width; j += 1) {
      const sum = symmetric[i * width + j]!;
      const difference = antisymmetric[i * width + j]!;
      const down = (sum + difference) / 2;
      const up = (sum - difference) / 2;
      if (j < n) {
        layer.transmission[i * n + j] = down;
        layer.reflection[i * n + j] = up;
      } else {
        layer.sourceDown[i * suns + j - n] = down;
        layer.sourceUp[i * suns + j - n] = up;
      }
    }
  }
  return layer;
}

/** Light leaving for symmetric or antisymmetric light falling in: N columns of streams, then one for each sun. */
function respond(
  { order: n, nodes, weights, cosSolarZeniths }: ScatteringAngles,
  kernel: Float64Array,
  sunKernel: Float64Array,
  omega: number,
  depth: number,
): Float64Array {
  const suns = cosSolarZeniths.length;
  const width = n + suns;
  const system = new Float64Array(n * n);
  const leaving = new Float64Array(n * width);
  for (let i = 0; i < n; i += 1) {
    const half = depth / (2 * nodes[i]!);
    for (let j = 0; j < n; j += 1) {
      const unity = i === j ? 1 : 0;
      const exchange = half * (unity - omega * kernel[i * n + j]! * weights[j]!);
      system[i * n + j] = unity + exchange;
      leaving[i * width + j] = unity - exchange;
    }
    for (let j = 0; j < suns; j += 1) {
      // μ₀(1 − e^(−δ/μ₀)) light of the beam is spent within the layer, per unit flux on the horizontal 1.
      const spent = -Math.expm1(-depth / cosSolarZeniths[j]!);
      leaving[i * width + n + j] = (omega * spent * sunKernel[i * suns + j]!) / nodes[i]!;
    }
  }
  solveInPlace(system, leaving, n, width);
  return leaving;
}
