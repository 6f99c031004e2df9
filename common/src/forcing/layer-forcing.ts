import { albedoChange } from './lambertian-surface';
import type { LayerSolver, SolvedLayer } from './layer-scheme';
import type { SunAngles } from './sun-angles';

/**
 * Shortwave effect of a layer over a Lambertian surface, before cloud and air above are counted [W m⁻²]:
 *
 *   ΔF = −Σ_i F_i ΔA(μ_i), F_i the flux on the horizontal at sun angle i; over the hemisphere −F̄ ΔĀ
 */
export function layerForcing(sun: SunAngles, solved: SolvedLayer, surfaceAlbedo: number): number {
  const { reflectances, transmittances, diffuse } = solved;
  let sum = 0;
  for (let i = 0; i < sun.cosines.length; i += 1) {
    sum += sun.fluxesWm2[i]! * albedoChange(reflectances[i]!, transmittances[i]!, diffuse, surfaceAlbedo);
  }
  if (sun.hemisphericWm2 > 0) {
    sum +=
      sun.hemisphericWm2 * albedoChange(diffuse.reflectance, diffuse.transmittance, diffuse, surfaceAlbedo);
  }
  return -sum;
}

export interface LayerCells {
  opticalDepth: Float64Array;
  surfaceAlbedo: Float64Array;
  cloudFraction: Float64Array;
}

/**
 * Shortwave forcing of the cells of one row and month, into an array of the caller's [W m⁻²]: the same numbers as the
 * methods of one cell.
 *
 * @param solve made by the scheme's `prepare` for the row's asymmetry and `sun.cosines`
 * @param transmittance one-way, of the air above, 0 to 1; it counts twice
 */
export function layerForcingInto(
  out: Float64Array,
  sun: SunAngles,
  solve: LayerSolver,
  optics: { singleScatteringAlbedo: number; transmittance: number },
  cells: LayerCells,
): Float64Array {
  const through = optics.transmittance ** 2;
  for (let i = 0; i < out.length; i += 1) {
    const opticalDepth = cells.opticalDepth[i]!;
    out[i] =
      opticalDepth === 0
        ? 0
        : through *
          (1 - cells.cloudFraction[i]!) *
          layerForcing(sun, solve(opticalDepth, optics.singleScatteringAlbedo), cells.surfaceAlbedo[i]!);
  }
  return out;
}
