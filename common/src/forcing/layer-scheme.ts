/** Share of the horizontal flux falling in on top that a layer over a black surface sends back and lets through. */
export interface LayerFluxes {
  reflectance: number;
  /** direct and diffuse together */
  transmittance: number;
}

/** A layer solved at several sun angles and for isotropic light, over a black surface. */
export interface SolvedLayer {
  /** one value per sun angle, in the order asked */
  readonly reflectances: Float64Array;
  readonly transmittances: Float64Array;
  /** isotropic incidence, which is also the mean over the sunlit hemisphere */
  readonly diffuse: LayerFluxes;
}

/**
 * Solves one layer of optical depth τ and single-scattering albedo ω. The answer is overwritten by the next call of the
 * same solver: read it before calling again.
 */
export type LayerSolver = (opticalDepth: number, singleScatteringAlbedo: number) => SolvedLayer;

/** A way to solve a homogeneous plane-parallel layer with the Henyey–Greenstein phase function. */
export interface LayerScheme {
  readonly title: string;
  readonly source: string;
  /**
   * All that depends on asymmetry and sun angles alone is made once here, for the many cells of a row.
   *
   * @param asymmetry g, −0.98 to 0.98
   * @param cosSolarZeniths μ₀, each above 0, to 1
   */
  readonly prepare: (asymmetry: number, cosSolarZeniths: Float64Array) => LayerSolver;
}

/** Smallest μ₀ served: the sun 0.006° above the horizon, below which no plane-parallel layer means anything. */
export const MIN_COS_ZENITH = 1e-4;
