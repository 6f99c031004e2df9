import { upscatterAt, upscatterMean } from '../src/optics/upscatter';
import { quantile } from '../src/statistics/quantile';
import { addingDoubling } from '../src/forcing/adding-doubling-scheme';
import { albedoChange } from '../src/forcing/lambertian-surface';
import type { LayerScheme } from '../src/forcing/layer-scheme';

export interface TableError {
  light: 'one sun angle' | 'isotropic';
  opticalDepthFrom: number;
  opticalDepthTo: number;
  points: number;
  /** |ΔA by the table − ΔA direct| over the sum of magnitudes of the thin-layer terms */
  medianPercent: number;
  p99Percent: number;
  maxPercent: number;
  /** largest error of the sunlight sent back, as a share of normal-incidence sunlight: of μ₀ΔA, isotropic of ΔA */
  maxError: number;
}

const DEPTHS = [1e-4, 3e-3, 3e-2, 0.3, 2, 6];
const SURFACES = [0, 0.15, 0.4, 0.85];
/** Cosines of the sun's zenith angle from grazing to overhead, between the points of the table. */
const SUNS = Float64Array.of(0.0015, 0.006, 0.02, 0.045, 0.11, 0.23, 0.37, 0.52, 0.68, 0.83, 0.97);

/**
 * Distance of a tabulated scheme from direct computation, at points of the additive recurrence with the plastic
 * constants (an even spread without a random number).
 *
 * @param count layers per span of optical depth
 */
export function measureTable(tabulated: LayerScheme, count: number): TableError[] {
  return DEPTHS.slice(1).flatMap((to, span) => measureSpan(tabulated, DEPTHS[span]!, to, count));
}

function measureSpan(tabulated: LayerScheme, from: number, to: number, count: number): TableError[] {
  const errors = { 'one sun angle': [] as number[][], isotropic: [] as number[][] };
  for (let n = 1; n <= count; n += 1) {
    const [x, y, z] = [0.8191725134, 0.6710436067, 0.5497004779].map((step) => (step * n) % 1) as [
      number,
      number,
      number,
    ];
    const tau = from * (to / from) ** x;
    const omega = 0.6 + 0.4 * y;
    const g = 0.4 + 0.5 * z;
    const exact = addingDoubling.prepare(g, SUNS)(tau, omega);
    const table = tabulated.prepare(g, SUNS)(tau, omega);
    const mean = upscatterMean(g);
    for (const surface of SURFACES) {
      const distance = (light: number | null) => {
        const [a, b] = [exact, table].map(({ reflectances, transmittances, diffuse }) =>
          light === null
            ? albedoChange(diffuse.reflectance, diffuse.transmittance, diffuse, surface)
            : albedoChange(reflectances[light]!, transmittances[light]!, diffuse, surface),
        ) as [number, number];
        return Math.abs(a - b);
      };
      const terms = 2 * tau * (omega * mean * (1 - surface) ** 2 + 2 * surface * (1 - omega));
      errors.isotropic.push([distance(null) / terms, distance(null)]);
      SUNS.forEach((mu, i) => {
        const scattered = omega * (1 - surface) * (upscatterAt(g, mu) / mu + 2 * mean * surface);
        const absorbed = (1 - omega) * surface * (1 / mu + 2);
        errors['one sun angle'].push([distance(i) / (tau * (scattered + absorbed)), mu * distance(i)]);
      });
    }
  }
  return (['one sun angle', 'isotropic'] as const).map((light) => {
    const percents = errors[light].map(([relative]) => 100 * relative!);
    return {
      light,
      opticalDepthFrom: from,
      opticalDepthTo: to,
      points: percents.length,
      medianPercent: quantile(percents, 0.5),
      p99Percent: quantile(percents, 0.99),
      maxPercent: Math.max(...percents),
      maxError: Math.max(...errors[light].map(([, absolute]) => absolute!)),
    };
  });
}
