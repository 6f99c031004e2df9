import { multiplyInto, solveInPlace } from './dense-matrix';
import type { LayerSolver, SolvedLayer } from './layer-scheme';
import type { ScatteringAngles } from './scattering-angles';
import { thinStart, type LayerOperators } from './thin-start';

/** The start layer is this thin against the smallest cosine met: its error falls with the square. */
const START = 0.1;

/**
 * Reflectance and transmittance of a homogeneous layer by doubling: two equal layers make one of twice the depth, all
 * orders of scattering between them summed in closed form, from a layer thin enough to be solved in one step.
 *
 *   D = (I − R R)⁻¹ T,  U = R D,  R₂ = R + T U,  T₂ = T D
 *   d = (I − R R)⁻¹ (s↓ + e R s↑),  u = e s↑ + R d,  s₂↑ = s↑ + T u,  s₂↓ = e s↓ + T d,  e = exp(−τ/μ₀)
 *
 * The beams are carried beside the streams, so any sun angle is served without interpolation.
 *
 * Limits: plane-parallel, one layer, no polarisation. Source: van de Hulst (1963; 1980, Multiple Light Scattering);
 * Grant & Hunt (1969), Proc. R. Soc. A 313, 183–197 (from memory).
 * Checked against: checks/optics/rt_exact_layer.csv, rt_exact_diffuse.csv, rt_published.csv.
 */
export function doublingSolver(angles: ScatteringAngles): LayerSolver {
  const { order: n, cosSolarZeniths, forwardPeak } = angles;
  const suns = cosSolarZeniths.length;
  const smallest = Math.min(angles.nodes[0]!, ...cosSolarZeniths);
  const solved: SolvedLayer = {
    reflectances: new Float64Array(suns),
    transmittances: new Float64Array(suns),
    diffuse: { reflectance: 0, transmittance: 0 },
  };
  const step = doublingStep(n, suns);
  return (opticalDepth, singleScatteringAlbedo) => {
    const scaledDepth = (1 - singleScatteringAlbedo * forwardPeak) * opticalDepth;
    const scaledAlbedo =
      (singleScatteringAlbedo * (1 - forwardPeak)) / (1 - singleScatteringAlbedo * forwardPeak);
    const doublings = Math.max(0, Math.ceil(Math.log2(scaledDepth / (START * smallest))));
    let depth = scaledDepth / 2 ** doublings;
    const layer = thinStart(angles, scaledAlbedo, depth);
    for (let i = 0; i < doublings; i += 1) {
      step(
        layer,
        cosSolarZeniths.map((mu) => Math.exp(-depth / mu)),
      );
      depth *= 2;
    }
    return gatherFluxes(solved, angles, layer, scaledDepth);
  };
}

/** One doubling in place, with its own working room. */
function doublingStep(n: number, suns: number): (layer: LayerOperators, beam: Float64Array) => void {
  const width = n + suns;
  const block = () => new Float64Array(n * width);
  const [down, up, crossed] = [block(), block(), block()];
  const twice = new Float64Array(n * n);
  const bounced = new Float64Array(n * suns);
  return ({ reflection, transmission, sourceUp, sourceDown }, beam) => {
    multiplyInto(twice, reflection, reflection, n, n);
    for (let i = 0; i < twice.length; i += 1) twice[i] = -twice[i]!;
    for (let i = 0; i < n; i += 1) twice[i * n + i]! += 1;
    multiplyInto(bounced, reflection, sourceUp, n, suns);
    for (let i = 0; i < n; i += 1) {
      for (let j = 0; j < n; j += 1) down[i * width + j] = transmission[i * n + j]!;
      for (let j = 0; j < suns; j += 1) {
        down[i * width + n + j] = sourceDown[i * suns + j]! + beam[j]! * bounced[i * suns + j]!;
      }
    }
    solveInPlace(twice, down, n, width);
    multiplyInto(up, reflection, down, n, width);
    for (let i = 0; i < n; i += 1) {
      for (let j = 0; j < suns; j += 1) up[i * width + n + j]! += beam[j]! * sourceUp[i * suns + j]!;
    }
    multiplyInto(crossed, transmission, up, n, width);
    for (let i = 0; i < n; i += 1) {
      for (let j = 0; j < n; j += 1) reflection[i * n + j]! += crossed[i * width + j]!;
      for (let j = 0; j < suns; j += 1) sourceUp[i * suns + j]! += crossed[i * width + n + j]!;
    }
    multiplyInto(crossed, transmission, down, n, width);
    for (let i = 0; i < n; i += 1) {
      for (let j = 0; j < n; j += 1) transmission[i * n + j] = crossed[i * width + j]!;
      for (let j = 0; j < suns; j += 1) {
        sourceDown[i * suns + j] = beam[j]! * sourceDown[i * suns + j]! + crossed[i * width + n + j]!;
      }
    }
  };
}

/** Fluxes from intensities; isotropic light of unit flux has intensity 2 in every direction of the 2π-weighted kind. */
function gatherFluxes(
  solved: SolvedLayer,
  { order: n, nodes, weights, cosSolarZeniths }: ScatteringAngles,
  layer: LayerOperators,
  depth: number,
): SolvedLayer {
  const { reflectances, transmittances, diffuse } = solved;
  const suns = cosSolarZeniths.length;
  reflectances.fill(0);
  cosSolarZeniths.forEach((mu, j) => (transmittances[j] = Math.exp(-depth / mu)));
  diffuse.reflectance = 0;
  diffuse.transmittance = 0;
  for (let i = 0; i < n; i += 1) {
    const flux = weights[i]! * nodes[i]!;
    for (let j = 0; j < suns; j += 1) {
      reflectances[j]! += flux * layer.sourceUp[i * suns + j]!;
      transmittances[j]! += flux * layer.sourceDown[i * suns + j]!;
    }
    for (let j = 0; j < n; j += 1) {
      diffuse.reflectance += 2 * flux * layer.reflection[i * n + j]!;
      diffuse.transmittance += 2 * flux * layer.transmission[i * n + j]!;
    }
  }
  return solved;
}
