import type { Caution } from '../physical/domain-error';
import { criticalSurfaceAlbedo } from './critical-albedo';

export interface ThinLayerState {
  opticalDepth: number;
  singleScatteringAlbedo: number;
  surfaceAlbedo: number;
  /** β̄ */
  upscatterFraction: number;
  /** τ over this is the slant path; null without a sun angle */
  cosSolarZenith: number | null;
}

const DARK = 0.3;
const BRIGHT = 0.6;

/**
 * What a first-order thin layer must say about itself. Thresholds and errors are those measured against an exact
 * solver (checks/optics/FORMULAS.md §7).
 */
export function thinLayerCautions(state: ThinLayerState): Caution[] {
  if (state.opticalDepth === 0) return [];
  return [...depthCautions(state), ...opticsCautions(state), ...surfaceCautions(state)];
}

function depthCautions({ opticalDepth, surfaceAlbedo, cosSolarZenith }: ThinLayerState): Caution[] {
  const slant = cosSolarZenith === null || cosSolarZenith <= 0 ? 0 : opticalDepth / cosSolarZenith;
  const found: Caution[] = [];
  if (opticalDepth > 0.3) {
    found.push({
      code: 'thin-layer-far-beyond-range',
      message: `Optical depth ${opticalDepth} is beyond 0.3: over dark ground the thin layer overstates the cooling by 48 to 71 % at 0.3 and doubles it at 1.`,
    });
  } else if (opticalDepth > 0.1) {
    found.push({
      code: 'thin-layer-beyond-range',
      message: `Optical depth ${opticalDepth} is beyond 0.1: over dark ground the thin layer overstates the cooling by 23 to 71 %.`,
    });
  } else if (opticalDepth > 0.03 && surfaceAlbedo < DARK) {
    found.push({
      code: 'thin-layer-note',
      message: `Optical depth ${opticalDepth} over dark ground: the thin layer overstates the cooling by 15 to 20 % at 0.05 and 23 to 33 % at 0.1.`,
    });
  }
  if (slant > 0.3) {
    found.push({
      code: 'thin-layer-slant-beyond-range',
      message: `The sun is low: optical depth over the cosine of its zenith angle is ${slant.toFixed(2)}, beyond 0.3, where the thin layer is of no use.`,
    });
  }
  return found;
}

function opticsCautions({ singleScatteringAlbedo }: ThinLayerState): Caution[] {
  if (singleScatteringAlbedo >= 0.85) return [];
  return [
    {
      code: 'thin-layer-strongly-absorbing',
      message: `Single-scattering albedo ${singleScatteringAlbedo} is below 0.85: the formula was made for weakly absorbing particles.`,
    },
  ];
}

/** Near the critical ground and over bright ground, by whatever formula. */
export function surfaceCautions({
  singleScatteringAlbedo,
  surfaceAlbedo,
  upscatterFraction,
}: Pick<ThinLayerState, 'singleScatteringAlbedo' | 'surfaceAlbedo' | 'upscatterFraction'>): Caution[] {
  const found: Caution[] = [];
  const critical = criticalSurfaceAlbedo(singleScatteringAlbedo, upscatterFraction);
  if (Math.abs(surfaceAlbedo - critical) < 0.1) {
    found.push({
      code: 'near-sign-change',
      message: `Surface albedo ${surfaceAlbedo} lies within 0.1 of ${critical.toFixed(2)}, where the effect changes sign; a multi-model study finds the change at 0.28.`,
    });
  }
  if (surfaceAlbedo > BRIGHT) {
    found.push({
      code: 'bright-surface',
      message:
        'Over snow and ice the effect is a small difference of large terms and depends on single-scattering albedo more than on amount.',
    });
  }
  return found;
}
