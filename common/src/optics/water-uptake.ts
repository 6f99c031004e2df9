import type { Caution } from '../physical/domain-error';
import { diameterGrowthFactor } from './humidity-growth';
import { radiusMoment } from './lognormal-mode';
import { mixedIndex, type MixingRule } from './mixed-index';
import { modeOptics, type ModeOptics, type OpticalMode } from './mode-optics';
import type { Precision } from './mode-scattering';
import { refractiveIndexAt, refractiveIndexTable } from './refractive-index';

/** Density of water at 25 °C [g cm⁻³] (common practice, no source). */
export const WATER_DENSITY_G_CM3 = 0.997;

/** Water is mixed into the index as a solution: by volume mean unless another rule is asked for. */
const RULE: MixingRule = 'volume-average';

/** A dry mode with its hygroscopicity κ. */
export interface HygroscopicMode extends OpticalMode {
  readonly kappa: number;
}

/**
 * A mode grown by water uptake: radii times the growth factor (κ-Köhler without curvature, one for all sizes), density
 * and index mixed by volume with water.
 *
 * @param relativeHumidity 0 to 0.99
 * @param wavelengthUm of the water index, 0.2 to 200 µm
 *
 * Limits: as `diameterGrowthFactor`; no deliquescence or crystallisation.
 * Source: Petters & Kreidenweis (2007), Atmos. Chem. Phys. 7, 1961–1971; water: Hale & Querry (1973).
 */
export function humidMode(
  mode: HygroscopicMode,
  relativeHumidity: number,
  wavelengthUm: number,
  rule: MixingRule = RULE,
): { mode: OpticalMode; cautions: Caution[] } {
  const growth = diameterGrowthFactor(mode.kappa, relativeHumidity);
  const dryShare = growth ** -3;
  const water = refractiveIndexAt(refractiveIndexTable('water'), wavelengthUm);
  const grown: OpticalMode = {
    medianRadiusUm: mode.medianRadiusUm * growth,
    geometricStdDev: mode.geometricStdDev,
    minRadiusUm: mode.minRadiusUm * growth,
    maxRadiusUm: mode.maxRadiusUm * growth,
    numberFraction: mode.numberFraction,
    densityGCm3: dryShare * mode.densityGCm3 + (1 - dryShare) * WATER_DENSITY_G_CM3,
    refractiveIndex: mixedIndex(rule, [
      { volumeFraction: 1 - dryShare, refractiveIndex: water.refractiveIndex },
      { volumeFraction: dryShare, refractiveIndex: mode.refractiveIndex },
    ]),
  };
  return { mode: grown, cautions: water.cautions };
}

export interface HumidOptics extends ModeOptics {
  /** per gram of DRY particles [m² g⁻¹], what models and estimates use */
  readonly extinctionPerDryMassM2PerG: number;
  readonly cautions: Caution[];
}

/** Optics of a mixture at a relative humidity; `massExtinctionM2PerG` is per gram of wet particles. */
export function humidOptics(
  modes: readonly HygroscopicMode[],
  relativeHumidity: number,
  wavelengthUm: number,
  precision: Precision = 'full',
): HumidOptics {
  const grown = modes.map((mode) => humidMode(mode, relativeHumidity, wavelengthUm));
  const wet = modeOptics(
    grown.map((entry) => entry.mode),
    wavelengthUm,
    precision,
  );
  const dryMass = modes.reduce(
    (sum, mode) => sum + mode.numberFraction * mode.densityGCm3 * (4 / 3) * Math.PI * radiusMoment(mode, 3),
    0,
  );
  return {
    ...wet,
    extinctionPerDryMassM2PerG: wet.extinctionUm2 / dryMass,
    cautions: grown[0]!.cautions,
  };
}

/** f(RH): extinction at each humidity over that of the dry mixture, for a growth curve. */
export function humidityCurve(
  modes: readonly HygroscopicMode[],
  relativeHumidities: readonly number[],
  wavelengthUm: number,
  precision: Precision = 'full',
): number[] {
  const dry = humidOptics(modes, 0, wavelengthUm, precision).extinctionUm2;
  return relativeHumidities.map(
    (humidity) => humidOptics(modes, humidity, wavelengthUm, precision).extinctionUm2 / dry,
  );
}
