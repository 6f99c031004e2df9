import { upscatterAt, upscatterMean } from '../optics/upscatter';
import { addingDoubling } from './adding-doubling-scheme';
import { chebyshevPoints } from './chebyshev';
import type { LayerSolver } from './layer-scheme';
import { beamPath, diffusePath, type MultiStreamTable } from './multi-stream-table';

/**
 * Axes of the table kept in reference/forcing: traces to a dust storm, aerosol of any kind. In layers thicker than τ 6
 * so little light is left that the error of what is absorbed would show as light below nothing.
 */
export const TABLE_AXES: MultiStreamTable['axes'] = {
  logOpticalDepth: { from: Math.log(1e-4), to: Math.log(6), points: 22 },
  rootCoAlbedo: { from: 0, to: 0.64, points: 11 },
  asymmetry: { from: 0.4, to: 0.9, points: 8 },
  logCosSolarZenith: { from: Math.log(1e-3), to: 0, points: 20 },
};

/** At ω = 1 nothing is absorbed; the limit of A/(1−ω) is taken here. */
const NEARLY_CONSERVATIVE = 1 - 1e-6;

/** Computes the whole table directly: about a minute. */
export function buildMultiStreamTable(axes = TABLE_AXES): MultiStreamTable {
  const suns = chebyshevPoints(axes.logCosSolarZenith).map((x) => Math.min(1, Math.exp(x)));
  const depths = chebyshevPoints(axes.logOpticalDepth).map(Math.exp);
  const albedos = chebyshevPoints(axes.rootCoAlbedo).map((root) => 1 - root * root);
  const reflectance: number[] = [];
  const absorptance: number[] = [];
  for (const g of chebyshevPoints(axes.asymmetry)) {
    const solve = addingDoubling.prepare(g, suns);
    const solved = Array.from(depths, (depth) =>
      Array.from(albedos, (omega) => ratios(solve, depth, Math.min(omega, NEARLY_CONSERVATIVE), g, suns)),
    );
    for (let light = 0; light <= suns.length; light += 1) {
      for (const row of solved) {
        for (const pair of row) {
          reflectance.push(pair[light]!.reflected);
          absorptance.push(pair[light]!.absorbed);
        }
      }
    }
  }
  return { axes, reflectance, absorptance };
}

function ratios(solve: LayerSolver, depth: number, omega: number, g: number, suns: Float64Array) {
  const { reflectances, transmittances, diffuse } = solve(depth, omega);
  const ratio = (reflected: number, transmitted: number, path: number, upscatter: number) => ({
    reflected: reflected / (omega * upscatter * path),
    absorbed: (1 - reflected - transmitted) / ((1 - omega) * path),
  });
  return [
    ...Array.from(suns, (mu, i) =>
      ratio(reflectances[i]!, transmittances[i]!, beamPath(mu)(depth), upscatterAt(g, mu)),
    ),
    ratio(diffuse.reflectance, diffuse.transmittance, diffusePath(depth), upscatterMean(g)),
  ];
}
