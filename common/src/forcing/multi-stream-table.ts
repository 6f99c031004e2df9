import { upscatterAt, upscatterMean } from '../optics/upscatter';
import { addingDoubling } from './adding-doubling-scheme';
import { chebyshevPoints, chebyshevWeights, type ChebyshevAxis } from './chebyshev';
import type { LayerScheme, LayerSolver, SolvedLayer } from './layer-scheme';

/**
 * Multi-stream layers tabulated over (τ, ω, g, μ₀) and, for isotropic light, (τ, ω, g). Reflectance and absorptance are
 * divided by their thin limits, R by ωβ(μ₀) p and A by (1−ω) p with p = 1 − exp(−τ/μ₀) (isotropic: β̄ and
 * p = 1 − exp(−2τ)), so that what is left is smooth and a thin layer keeps its digits.
 */
export interface MultiStreamTable {
  readonly axes: {
    readonly logOpticalDepth: ChebyshevAxis;
    /** √(1−ω), in which thick layers are smooth up to ω = 1 */
    readonly rootCoAlbedo: ChebyshevAxis;
    readonly asymmetry: ChebyshevAxis;
    readonly logCosSolarZenith: ChebyshevAxis;
  };
  /** by g, then light (each μ₀, isotropic last), then τ, then ω */
  readonly reflectance: readonly number[];
  readonly absorptance: readonly number[];
}

/** Share of the light that a layer which scatters it only once would take. */
export type Path = (opticalDepth: number) => number;
export const beamPath =
  (mu: number): Path =>
  (opticalDepth) =>
    -Math.expm1(-opticalDepth / mu);
export const diffusePath: Path = (opticalDepth) => -Math.expm1(-2 * opticalDepth);

const within = ({ from, to }: ChebyshevAxis, x: number) => x >= from && x <= to;

/**
 * Multi-stream by table, for the many cells of a field; what the table does not hold is computed directly.
 *
 * Error of the albedo change against the direct computation, over the sum of magnitudes of the thin-layer terms: see
 * reference/forcing/multi_stream_errors.csv; at most 0.2 % for τ ≥ 0.003, 1e-6 absolute below.
 */
export function tabulatedMultiStream(table: MultiStreamTable): LayerScheme {
  const { axes } = table;
  return {
    title: `${addingDoubling.title}, by table`,
    source: addingDoubling.source,
    prepare: (asymmetry, cosSolarZeniths) => {
      let direct: LayerSolver | undefined;
      const solveDirectly: LayerSolver = (opticalDepth, singleScatteringAlbedo) => {
        direct ??= addingDoubling.prepare(asymmetry, cosSolarZeniths);
        return direct(opticalDepth, singleScatteringAlbedo);
      };
      const inside =
        within(axes.asymmetry, asymmetry) &&
        cosSolarZeniths.every((mu) => within(axes.logCosSolarZenith, Math.log(mu)));
      if (!inside) return solveDirectly;
      const interpolate = interpolator(table, asymmetry, cosSolarZeniths);
      return (opticalDepth, singleScatteringAlbedo) =>
        within(axes.logOpticalDepth, Math.log(opticalDepth)) &&
        within(axes.rootCoAlbedo, Math.sqrt(1 - singleScatteringAlbedo))
          ? interpolate(opticalDepth, singleScatteringAlbedo)
          : solveDirectly(opticalDepth, singleScatteringAlbedo);
    },
  };
}

/** The table contracted to one g and the angles wanted, which leaves τ and ω for every cell. */
function interpolator(
  table: MultiStreamTable,
  asymmetry: number,
  cosSolarZeniths: Float64Array,
): LayerSolver {
  const { axes } = table;
  const depths = chebyshevPoints(axes.logOpticalDepth);
  const roots = chebyshevPoints(axes.rootCoAlbedo);
  const suns = chebyshevPoints(axes.logCosSolarZenith);
  const byAsymmetry = chebyshevWeights(chebyshevPoints(axes.asymmetry), asymmetry);
  const lightOf = (upscatter: number, path: Path, weights: readonly number[]) => ({
    upscatter,
    path,
    reflected: contract(table.reflectance, byAsymmetry, weights, depths.length * roots.length),
    absorbed: contract(table.absorptance, byAsymmetry, weights, depths.length * roots.length),
  });
  const lights = [
    ...Array.from(cosSolarZeniths, (mu) =>
      lightOf(upscatterAt(asymmetry, mu), beamPath(mu), [...chebyshevWeights(suns, Math.log(mu)), 0]),
    ),
    lightOf(upscatterMean(asymmetry), diffusePath, [...suns.map(() => 0), 1]),
  ];
  const solved: SolvedLayer = {
    reflectances: new Float64Array(cosSolarZeniths.length),
    transmittances: new Float64Array(cosSolarZeniths.length),
    diffuse: { reflectance: 0, transmittance: 0 },
  };
  return (opticalDepth, omega) => {
    const byDepth = chebyshevWeights(depths, Math.log(opticalDepth));
    const byAlbedo = chebyshevWeights(roots, Math.sqrt(1 - omega));
    lights.forEach(({ upscatter, path, reflected, absorbed }, i) => {
      const length = path(opticalDepth);
      const reflectance = omega * upscatter * length * value(reflected, byDepth, byAlbedo);
      const transmittance = 1 - reflectance - (1 - omega) * length * value(absorbed, byDepth, byAlbedo);
      if (i < cosSolarZeniths.length) {
        solved.reflectances[i] = reflectance;
        solved.transmittances[i] = transmittance;
      } else {
        solved.diffuse.reflectance = reflectance;
        solved.diffuse.transmittance = transmittance;
      }
    });
    return solved;
  };
}

function contract(
  values: readonly number[],
  byAsymmetry: Float64Array,
  byLight: readonly number[],
  size: number,
): Float64Array {
  const out = new Float64Array(size);
  byAsymmetry.forEach((weightOfG, g) => {
    byLight.forEach((weightOfLight, light) => {
      const weight = weightOfG * weightOfLight;
      if (weight === 0) return;
      const start = (g * byLight.length + light) * size;
      for (let i = 0; i < size; i += 1) out[i]! += weight * values[start + i]!;
    });
  });
  return out;
}

function value(values: Float64Array, byDepth: Float64Array, byAlbedo: Float64Array): number {
  let sum = 0;
  for (let i = 0, at = 0; i < byDepth.length; i += 1) {
    for (let j = 0; j < byAlbedo.length; j += 1, at += 1) sum += byDepth[i]! * byAlbedo[j]! * values[at]!;
  }
  return sum;
}
