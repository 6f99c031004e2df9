import { gaussLegendre } from '../optics/gauss-legendre';
import type { LayerFluxes, LayerSolver, SolvedLayer } from './layer-scheme';

/** 2∫Rμ₀dμ₀ by 32 points is off by less than 1e-4 relative; 16 leave up to 6e-4 (checks/optics/convergence.csv). */
const POINTS = 32;

/** Nodes of the hemispheric mean on (0, 1) with weights 2 w μ₀, which add up to 1. */
function hemisphere(): { cosines: Float64Array; weights: Float64Array } {
  const { nodes, weights } = gaussLegendre(POINTS);
  const cosines = nodes.map((x) => (1 + x) / 2);
  return { cosines, weights: weights.map((w, i) => w * cosines[i]!) };
}

/**
 * A solver for formulas that know one sun angle at a time: isotropic light is taken as the flux-weighted mean of the
 * same formula over all angles.
 *
 * @param layerAt made once per angle; answers the fluxes of a layer at that angle
 */
export function solverByAngles(
  cosSolarZeniths: Float64Array,
  layerAt: (cosSolarZenith: number) => (opticalDepth: number, singleScatteringAlbedo: number) => LayerFluxes,
): LayerSolver {
  const { cosines, weights } = hemisphere();
  const beams = Array.from(cosSolarZeniths, layerAt);
  const sky = Array.from(cosines, layerAt);
  const solved: SolvedLayer = {
    reflectances: new Float64Array(beams.length),
    transmittances: new Float64Array(beams.length),
    diffuse: { reflectance: 0, transmittance: 0 },
  };
  return (opticalDepth, singleScatteringAlbedo) => {
    beams.forEach((beam, i) => {
      const { reflectance, transmittance } = beam(opticalDepth, singleScatteringAlbedo);
      solved.reflectances[i] = reflectance;
      solved.transmittances[i] = transmittance;
    });
    let reflectance = 0;
    let transmittance = 0;
    sky.forEach((direction, i) => {
      const fluxes = direction(opticalDepth, singleScatteringAlbedo);
      reflectance += weights[i]! * fluxes.reflectance;
      transmittance += weights[i]! * fluxes.transmittance;
    });
    solved.diffuse.reflectance = reflectance;
    solved.diffuse.transmittance = transmittance;
    return solved;
  };
}
