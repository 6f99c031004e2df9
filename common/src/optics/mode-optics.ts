import { DomainError, requireWithin } from '../physical/domain-error';
import { massFractionBelow, radiusMoment, requireMode, type LognormalMode } from './lognormal-mode';
import { requireIndex, type RefractiveIndex } from './mie';
import { pointsFor, scatterMode, type ModeScattering, type Precision } from './mode-scattering';

/** One mode of an external mixture: its own size, density and index. */
export interface OpticalMode extends LognormalMode {
  /** share of this mode's particles in all particles, uncut */
  readonly numberFraction: number;
  readonly densityGCm3: number;
  readonly refractiveIndex: RefractiveIndex;
}

export interface ModeOptics {
  /** per gram of particles [m² g⁻¹] */
  readonly massExtinctionM2PerG: number;
  readonly massAbsorptionM2PerG: number;
  readonly singleScatteringAlbedo: number;
  readonly asymmetry: number;
  readonly effectiveRadiusUm: number;
  /** per particle of the mixture [µm²] */
  readonly extinctionUm2: number;
  readonly scatteringUm2: number;
  /** [pg = µm³ · g cm⁻³] per particle of the mixture */
  readonly massPg: number;
}

export const MAX_MODES = 20;
export const WAVELENGTH_RANGE_UM = [0.1, 200] as const;
export const DENSITY_RANGE_G_CM3 = [0.1, 20] as const;

/**
 * Optics of an external mixture of lognormal modes: extinction, scattering, g-weighted scattering and mass add.
 *
 *   MEE = Σ f C_ext / Σ f ρ (4/3)π∫r³dN,  ω = Σ f C_sca / Σ f C_ext,  g = Σ f g C_sca / Σ f C_sca
 *
 * @param modes 1 to 20; `numberFraction` is a weight, only the ratios count (except in `extinctionUm2` and `massPg`)
 * @param wavelengthUm 0.1 to 200 µm
 * @param precision `full` 1e-4 relative (5e-4 where nothing absorbs), `fast` about 1e-2, for previews
 * @throws DomainError naming mode, field and range
 *
 * Limits: spheres. Dust is not spherical; see `nonSphericity`.
 * Source: checks/optics/FORMULAS.md §2.
 * Checked against: checks/optics/lognormal_modes.csv, mixtures_external.csv, opac_components.csv.
 */
export function modeOptics(
  modes: readonly OpticalMode[],
  wavelengthUm: number,
  precision: Precision = 'full',
): ModeOptics {
  requireModes(modes);
  requireWithin('wavelengthUm', wavelengthUm, 'µm', ...WAVELENGTH_RANGE_UM);
  let scattered = 0;
  let absorbed = 0;
  let forward = 0;
  let mass = 0;
  let area = 0;
  let volume = 0;
  for (const mode of modes) {
    const part = scatteringOf(mode, wavelengthUm, precision);
    const cube = radiusMoment(mode, 3);
    scattered += mode.numberFraction * part.scatteringUm2;
    absorbed += mode.numberFraction * part.absorptionUm2;
    forward += mode.numberFraction * part.forwardUm2;
    area += mode.numberFraction * radiusMoment(mode, 2);
    volume += mode.numberFraction * cube;
    mass += mode.numberFraction * mode.densityGCm3 * (4 / 3) * Math.PI * cube;
  }
  const extinction = scattered + absorbed;
  return {
    massExtinctionM2PerG: extinction / mass,
    massAbsorptionM2PerG: absorbed / mass,
    singleScatteringAlbedo: extinction > 0 ? scattered / extinction : 1,
    asymmetry: scattered > 0 ? forward / scattered : 0,
    effectiveRadiusUm: volume / area,
    extinctionUm2: extinction,
    scatteringUm2: scattered,
    massPg: mass,
  };
}

/** Share of the mixture's mass in particles of a diameter below the one given, 0 to 1. */
export function mixtureMassFractionBelow(modes: readonly OpticalMode[], diameterUm: number): number {
  requireModes(modes);
  let below = 0;
  let all = 0;
  for (const mode of modes) {
    const mass = mode.numberFraction * mode.densityGCm3 * radiusMoment(mode, 3);
    below += mass * massFractionBelow(mode, diameterUm);
    all += mass;
  }
  return below / all;
}

/** @throws DomainError naming the first mode and field that cannot be */
export function requireModes(modes: readonly OpticalMode[]): void {
  if (!Array.isArray(modes) || modes.length < 1 || modes.length > MAX_MODES) {
    throw new DomainError('outside-range', {
      field: 'modes',
      value: Array.isArray(modes) ? modes.length : modes,
      allowed: `a list of 1 to ${MAX_MODES} modes`,
    });
  }
  modes.forEach((mode: OpticalMode, i) => {
    const prefix = `modes[${i}].`;
    requireMode(mode, prefix);
    requireWithin(`${prefix}numberFraction`, mode.numberFraction, '', 0, 1);
    requireWithin(`${prefix}densityGCm3`, mode.densityGCm3, 'g cm⁻³', ...DENSITY_RANGE_G_CM3);
    requireIndex(mode.refractiveIndex, `${prefix}refractiveIndex.`);
  });
  if (modes.every((mode: OpticalMode) => mode.numberFraction === 0)) {
    throw new DomainError('outside-range', {
      field: 'modes[0].numberFraction',
      value: 0,
      allowed: 'above 0 in at least one mode',
    });
  }
}

/** Results by content. The same modes come again and again: every estimate of a run, every tick of a slider. */
const known = new Map<string, ModeScattering>();
const KNOWN_LIMIT = 4000;

function scatteringOf(mode: OpticalMode, wavelengthUm: number, precision: Precision): ModeScattering {
  const { medianRadiusUm, geometricStdDev, minRadiusUm, maxRadiusUm, refractiveIndex } = mode;
  const key = [
    medianRadiusUm,
    geometricStdDev,
    minRadiusUm,
    maxRadiusUm,
    refractiveIndex.real,
    refractiveIndex.imaginary,
    wavelengthUm,
    precision,
  ].join(' ');
  const found = known.get(key);
  if (found) return found;
  const made = scatterMode(mode, refractiveIndex, wavelengthUm, pointsFor(precision, refractiveIndex));
  if (known.size >= KNOWN_LIMIT) known.delete(known.keys().next().value!); // the oldest
  known.set(key, made);
  return made;
}
