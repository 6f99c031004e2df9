import type { Caution } from '../physical/domain-error';
import { coakleyChylek } from './coakley-chylek';
import { layerMethod, type LayerState } from './layer-method';
import type { SunAngles } from './sun-angles';

/**
 * The default method: at every sun angle the first solution of Coakley & Chylek with the exact Henyey–Greenstein
 * upscatter of that angle, over a Lambertian surface.
 *
 * Limits: see `coakleyChylekLayer`; Henyey–Greenstein is not the phase function of dust (see `upscatterMean`).
 * Checked against: checks/optics/error_summary.csv and error_mean_case.csv.
 */
export const slantedLayer = layerMethod(
  {
    id: 'slanted-layer',
    title: 'Slanted layer',
    formula:
      '\\Delta F = -T^2 (1-A_c)\\left\\langle F\\left[R + \\frac{R_s T_\\ell \\bar T_\\ell}{1-R_s\\bar R} - R_s\\right]\\right\\rangle,\\quad R = \\frac{\\gamma_2\\sinh k\\tau}{k\\cosh k\\tau + \\gamma_1\\sinh k\\tau},\\; T_\\ell = \\frac{k}{k\\cosh k\\tau + \\gamma_1\\sinh k\\tau},\\; \\gamma_2 = \\frac{\\omega\\beta(\\mu_0)}{\\mu_0}',
    source: coakleyChylek.source,
  },
  coakleyChylek,
  ownCautions,
);

/** Thresholds and errors as measured: checks/optics/error_summary.csv. */
function ownCautions({ opticalDepth }: LayerState, sun: SunAngles): Caution[] {
  if (sun.cosines.length === 1) return oneAngle(opticalDepth);
  if (opticalDepth <= 1) return [];
  return [
    {
      code: 'slanted-layer-thick',
      message: `Optical depth ${opticalDepth} is beyond 1: the slanted layer is off by 2 % at the median and up to 6 % of the sum of its terms at 3.`,
    },
  ];
}

function oneAngle(opticalDepth: number): Caution[] {
  if (opticalDepth <= 0.3) return [];
  return [
    {
      code: 'slanted-layer-one-angle',
      message: `Optical depth ${opticalDepth} at a single sun angle: beyond 0.3 the slanted layer is off by 2 to 4 % at the median and up to 24 % at 1, 40 % at 3 under a high sun; means over sun angles fare better.`,
    },
  ];
}
