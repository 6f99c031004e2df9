import type { LayerFluxes } from './layer-scheme';

export interface LayerOverSurface {
  /** planetary albedo of layer and surface */
  reflectance: number;
  /** downward flux that reaches the surface, multiple reflections included */
  transmittance: number;
  /** in the layer */
  absorptance: number;
}

/**
 * A layer over a Lambertian surface, in closed form from what the layer does over a black one:
 *
 *   R_tot = R + T R_s T̄/(1 − R_s R̄),  T_tot = T/(1 − R_s R̄),  A = 1 − R_tot − (1−R_s) T_tot
 *
 * @param beam R, T for the light falling in
 * @param diffuse R̄, T̄ for isotropic light from below, the same layer
 * @param surfaceAlbedo R_s, 0 to 1
 *
 * Exact for a layer without top-to-bottom asymmetry. Source: adding method, e.g. van de Hulst (1980), Multiple Light
 * Scattering (from memory); checks/optics/FORMULAS.md §6. Checked against: checks/optics/rt_exact_layer.csv.
 */
export function overSurface(
  beam: LayerFluxes,
  diffuse: LayerFluxes,
  surfaceAlbedo: number,
): LayerOverSurface {
  const transmittance = beam.transmittance / (1 - surfaceAlbedo * diffuse.reflectance);
  const reflectance = beam.reflectance + transmittance * surfaceAlbedo * diffuse.transmittance;
  return { reflectance, transmittance, absorptance: 1 - reflectance - (1 - surfaceAlbedo) * transmittance };
}

/** ΔA = R_tot − R_s, written so that a thin layer keeps its digits. */
export function albedoChange(
  reflectance: number,
  transmittance: number,
  diffuse: LayerFluxes,
  surfaceAlbedo: number,
): number {
  const returned = (transmittance * diffuse.transmittance) / (1 - surfaceAlbedo * diffuse.reflectance);
  return reflectance + surfaceAlbedo * (returned - 1);
}
