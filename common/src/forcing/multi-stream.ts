import { addingDoubling, MAX_RESOLVED_ASYMMETRY } from './adding-doubling-scheme';
import { layerMethod } from './layer-method';

/**
 * The reference method: all orders of scattering in a Henyey–Greenstein layer over a Lambertian surface, computed
 * directly. It tells how far the others are off.
 *
 * Error of the albedo change: at most 0.2 % of the sum of magnitudes of the two thin-layer terms for τ ≥ 0.003, 1e-6
 * absolute below. Limits: one homogeneous layer, no gas within it, the Henyey–Greenstein phase function, which is not
 * that of dust (see `upscatterMean`).
 */
export const multiStream = layerMethod(
  {
    id: 'multi-stream',
    title: 'Multi-stream',
    formula:
      '\\Delta F = -T^2 (1-A_c)\\left\\langle F\\left[R + \\frac{R_s T_\\ell \\bar T_\\ell}{1-R_s\\bar R} - R_s\\right]\\right\\rangle,\\quad R, T_\\ell, \\bar R, \\bar T_\\ell\\ \\text{from all orders of scattering}',
    source: addingDoubling.source,
  },
  addingDoubling,
  ({ asymmetry }) =>
    Math.abs(asymmetry) <= MAX_RESOLVED_ASYMMETRY
      ? []
      : [
          {
            code: 'multi-stream-forward-peak',
            message: `Asymmetry ${asymmetry} is beyond ${MAX_RESOLVED_ASYMMETRY.toFixed(3)}: the forward peak is too narrow for the streams used, and the stated error of 0.2 % does not hold.`,
          },
        ],
);
