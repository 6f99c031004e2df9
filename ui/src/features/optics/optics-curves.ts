import {
  bandOptics,
  planckWeights,
  shortwaveWeights,
  SUN_TEMPERATURE_K,
} from '@siltlight/common/optics/broadband';
import { sizeDensities } from '@siltlight/common/optics/lognormal-mode';
import { PRECISIONS, type Precision } from '@siltlight/common/optics/mode-scattering';
import type { SetOptics } from '@siltlight/common/optics/optical-set';
import { phaseAt } from '@siltlight/common/optics/phase-function';
import {
  scatteringModes,
  speciesOptics,
  speciesRange,
  type ParticleDefinition,
} from '@siltlight/common/optics/species-optics';
import { humidityCurve } from '@siltlight/common/optics/water-uptake';

export const REFERENCE_UM = 0.55;
const SPECTRUM_UM = [0.3, 15] as const;
const SPECTRUM_POINTS = 30;
const GROUND_K = 288;

type Range = { low: number; central: number; high: number };
export type Quantity = 'massExtinctionM2PerG' | 'singleScatteringAlbedo' | 'asymmetry';
export type SpectrumPoint = { wavelengthUm: number } & Record<Quantity, Range>;
export type PhasePoint = { angleDeg: number; value: number };
export type HumidityPoint = { relativeHumidity: number; ratio: number };
export type Band = { name: string; temperatureK: number } & Record<Quantity, number>;

export type Curves = {
  precision: Precision;
  at550: SetOptics;
  spectrum: SpectrumPoint[];
  phase: PhasePoint[];
  bands: Band[];
  /** Empty for what takes up no water. */
  humidity: HumidityPoint[];
};

/** 30 wavelengths evenly in ln λ, the one nearest 0.55 µm moved onto it. */
export function spectrumWavelengths(): number[] {
  const [low, high] = SPECTRUM_UM;
  const even = Array.from({ length: SPECTRUM_POINTS }, (_, at) =>
    Number((low * (high / low) ** (at / (SPECTRUM_POINTS - 1))).toPrecision(4)),
  );
  const off = even.map((wavelength) => Math.abs(Math.log(wavelength / REFERENCE_UM)));
  even[off.indexOf(Math.min(...off))] = REFERENCE_UM;
  return even;
}

const bandEdges: readonly [number, number, number][] = [
  [0.3, 0.44, SUN_TEMPERATURE_K],
  [0.44, 0.55, SUN_TEMPERATURE_K],
  [0.55, 0.7, SUN_TEMPERATURE_K],
  [0.7, 1, SUN_TEMPERATURE_K],
  [1, 2.5, SUN_TEMPERATURE_K],
  [2.5, 4, SUN_TEMPERATURE_K],
  [4, 8, GROUND_K],
  [8, 13, GROUND_K],
];

/**
 * Everything a page of optics draws, a wavelength at a time, so that whoever drives it can stop between two.
 * The range of each value is computed with the fast setting in both precisions.
 */
export function* curveSteps(definition: ParticleDefinition, precision: Precision): Generator<void, Curves> {
  const at550 = speciesOptics(definition, REFERENCE_UM, precision);
  yield;
  const spectrum: SpectrumPoint[] = [];
  for (const wavelengthUm of spectrumWavelengths()) {
    const central = speciesOptics(definition, wavelengthUm, precision);
    spectrum.push({ wavelengthUm, ...speciesRange(definition, wavelengthUm, central) });
    yield;
  }
  const phase = phaseCurve(definition, precision);
  yield;
  const humidity: HumidityPoint[] = [];
  for (const relativeHumidity of definition.kappa > 0 ? curveHumidities : []) {
    humidity.push({ relativeHumidity, ratio: humidityRatio(definition, relativeHumidity, precision) });
    yield;
  }
  const bands: Band[] = [];
  for (const [low, high, temperatureK] of bandEdges) {
    const weights = planckWeights(temperatureK, [low, high], 4);
    const name = `${low}–${high}`;
    bands.push({
      name,
      temperatureK,
      ...bandOptics((um) => speciesOptics(definition, um, precision), weights),
    });
    yield;
  }
  const all = bandOptics((um) => speciesOptics(definition, um, precision), shortwaveWeights(12));
  bands.push({ name: 'shortwave', temperatureK: SUN_TEMPERATURE_K, ...all });
  return { precision, at550, spectrum, phase, bands, humidity };
}

/** Closer where f(RH) is steep. */
const curveHumidities = [
  0, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.75, 0.8, 0.825, 0.85, 0.875, 0.9, 0.91, 0.92, 0.93, 0.94, 0.95,
] as const;

/** f(RH) at 0.55 µm; the dry mixture holds the coarse addition, and a factor for shape cancels. */
function humidityRatio(
  definition: ParticleDefinition,
  relativeHumidity: number,
  precision: Precision,
): number {
  const dry = scatteringModes({ ...definition, relativeHumidity: 0 }, REFERENCE_UM);
  const modes = dry.map((mode) => ({ ...mode, kappa: definition.kappa }));
  return humidityCurve(modes, [relativeHumidity], REFERENCE_UM, precision)[0]!;
}

/** Phase function at 0.55 µm, degree by degree, ½∫P dμ = 1. */
function phaseCurve(definition: ParticleDefinition, precision: Precision): PhasePoint[] {
  const angles = Array.from({ length: 91 }, (_, angle) => angle);
  const cosines = Float64Array.from(angles, (angle) => Math.cos((angle * Math.PI) / 180));
  const points = precision === 'fast' ? PRECISIONS.fast.points : 1600;
  const { forward, backward } = phaseAt(
    scatteringModes(definition, REFERENCE_UM),
    REFERENCE_UM,
    cosines,
    points,
  );
  const ahead = angles.map((angleDeg) => ({ angleDeg, value: forward[angleDeg]! }));
  const back = angles.slice(0, -1).map((angle) => ({ angleDeg: 180 - angle, value: backward[angle]! }));
  return [...ahead, ...back.reverse()];
}

export type SizeMeasure = 'number' | 'surface' | 'volume';
export type SizePoint = { radiusUm: number; all: number; modes: number[] };

const SIZE_POINTS = 241;

/** Share of all particles, of their surface or of their volume per unit of ln r, the whole being 1; dry, as typed. */
export function sizeCurve({ modes }: ParticleDefinition, measure: SizeMeasure): SizePoint[] {
  const low = Math.min(...modes.map((mode) => mode.minRadiusUm));
  const high = Math.max(...modes.map((mode) => mode.maxRadiusUm));
  const step = Math.log(high / low) / (SIZE_POINTS - 1);
  const points = Array.from({ length: SIZE_POINTS }, (_, at) => {
    // Rounding must not carry the last point beyond the limit, where the density is 0.
    const radiusUm = at === SIZE_POINTS - 1 ? high : low * Math.exp(at * step);
    const densities = modes.map((mode) => mode.numberFraction * sizeDensities(mode, radiusUm)[measure]);
    return { radiusUm, all: densities.reduce((sum, one) => sum + one, 0), modes: densities };
  });
  const whole = points.reduce((sum, point) => sum + point.all * step, 0);
  if (whole === 0) return points;
  return points.map(({ radiusUm, all, modes: parts }) => ({
    radiusUm,
    all: all / whole,
    modes: parts.map((part) => part / whole),
  }));
}
