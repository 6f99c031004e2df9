import { requireWithin, type Caution } from '../physical/domain-error';
import { addCoarseDust } from './coarse-addition';
import type { LognormalMode } from './lognormal-mode';
import type { RefractiveIndex } from './mie';
import { mineralMixtureIndex, type MineralPart } from './mineral-mixture';
import type { MixingRule } from './mixed-index';
import { requireModes, type OpticalMode } from './mode-optics';
import type { Precision } from './mode-scattering';
import { withNonSphericity } from './non-sphericity';
import type { ParticleSet, SetOptics } from './optical-set';
import { refractiveIndexAt, refractiveIndexTable } from './refractive-index';
import { humidMode, humidOptics, type HygroscopicMode } from './water-uptake';

/** Where the refractive index of a mode comes from: a table, typed values (the same at all wavelengths), or a mixture. */
export type IndexChoice =
  | { readonly kind: 'material'; readonly material: string }
  | { readonly kind: 'typed'; readonly real: number; readonly imaginary: number }
  | { readonly kind: 'mixture'; readonly rule: MixingRule; readonly parts: MineralPart[] };

export interface SpeciesMode extends LognormalMode {
  readonly name: string;
  readonly numberFraction: number;
  readonly densityGCm3: number;
  readonly index: IndexChoice;
}

/** Particles of a species as a scientist states them; everything that its computed optics rest on. */
export interface ParticleDefinition {
  readonly modes: SpeciesMode[];
  /** hygroscopicity, 0 for what takes up no water */
  readonly kappa: number;
  readonly relativeHumidity: number;
  /** factor on the mass above 5 µm diameter, or null: off */
  readonly coarseFactor: number | null;
  /** factor on extinction for shape, or null: off */
  readonly shapeFactor: number | null;
  /** how far size and absorption may be off; what the interval of the computed values covers */
  readonly spread: SpeciesSpread;
}

export interface SpeciesSpread {
  /** all radii, limits included, times and divided by this, 1 to 3 */
  readonly radiusFactor: number;
  /** k times and divided by this, 1 to 10 */
  readonly absorptionFactor: number;
}

/**
 * Optics of a species at a wavelength, with the options it names: coarse addition, water uptake, shape.
 *
 * @returns as `opticsOfSet`; extinction per gram of dry particles
 * @throws DomainError naming mode and field; `wavelengthUm` 0.1 to 200 µm
 *
 * Limits: spheres; water is mixed in by volume mean whatever the rule of the minerals.
 */
export function speciesOptics(
  definition: ParticleDefinition,
  wavelengthUm: number,
  precision: Precision = 'full',
): SetOptics {
  const dry = dryModes(definition, wavelengthUm);
  const optics = humidOptics(dry.modes, definition.relativeHumidity, wavelengthUm, precision);
  const plain = {
    massExtinctionM2PerG: optics.extinctionPerDryMassM2PerG,
    singleScatteringAlbedo: optics.singleScatteringAlbedo,
    asymmetry: optics.asymmetry,
    effectiveRadiusUm: optics.effectiveRadiusUm,
  };
  const shaped =
    definition.shapeFactor === null
      ? { optics: plain, cautions: [] }
      : withNonSphericity(plain, definition.shapeFactor);
  const wetCautions = definition.kappa > 0 ? optics.cautions : [];
  return { ...shaped.optics, cautions: [...dry.cautions, ...wetCautions, ...shaped.cautions] };
}

/** The modes that scatter: coarse addition and water uptake done, for the phase function. */
export function scatteringModes(definition: ParticleDefinition, wavelengthUm: number): OpticalMode[] {
  return dryModes(definition, wavelengthUm).modes.map(
    (mode) => humidMode(mode, definition.relativeHumidity, wavelengthUm).mode,
  );
}

/**
 * Lowest and highest of each value when all radii or k are moved by their spread factors, one at a time.
 *
 * Computed with the fast setting as ratios to the fast central value, which its error nearly leaves. Limits: one factor at
 * a time, no density, no shape; the factors are the author's statement.
 */
export function speciesRange(definition: ParticleDefinition, wavelengthUm: number, central: OpticsValues) {
  const { radiusFactor, absorptionFactor } = definition.spread;
  requireWithin('spread.radiusFactor', radiusFactor, '', 1, 3);
  requireWithin('spread.absorptionFactor', absorptionFactor, '', 1, 10);
  const fast = speciesOptics(definition, wavelengthUm, 'fast');
  const moved = [
    withRadii(definition, radiusFactor),
    withRadii(definition, 1 / radiusFactor),
    withAbsorption(definition, absorptionFactor, wavelengthUm),
    withAbsorption(definition, 1 / absorptionFactor, wavelengthUm),
  ].map((one) => speciesOptics(one, wavelengthUm, 'fast'));
  const range = (name: keyof OpticsValues, limit: number) => {
    const values = moved.map(
      (one) => central[name] + (one[name] - fast[name]) * scaleOf(name, central, fast),
    );
    return {
      low: Math.max(0, Math.min(central[name], ...values)),
      central: central[name],
      high: Math.min(limit, Math.max(central[name], ...values)),
    };
  };
  return {
    massExtinctionM2PerG: range('massExtinctionM2PerG', Infinity),
    singleScatteringAlbedo: range('singleScatteringAlbedo', 1),
    asymmetry: range('asymmetry', 1),
  };
}

export type OpticsValues = Pick<SetOptics, 'massExtinctionM2PerG' | 'singleScatteringAlbedo' | 'asymmetry'>;

/** A ready-made set as a definition to work on. */
export function definitionOf(set: ParticleSet): ParticleDefinition {
  const { modes, material, densityGCm3, kappa, relativeHumidity } = set;
  return {
    modes: modes.map((mode, i) => ({
      name: modes.length === 1 ? 'All' : `Mode ${i + 1}`,
      ...mode,
      densityGCm3,
      index: { kind: 'material', material },
    })),
    kappa,
    relativeHumidity,
    coarseFactor: null,
    shapeFactor: null,
    spread: USUAL_SPREAD,
  };
}

/** Round assumptions to start from: k of soils spans a factor of 8 (0.0006 to 0.0048 at 0.52 µm, Di Biagio et al. 2019). */
export const USUAL_SPREAD: SpeciesSpread = { radiusFactor: 1.2, absorptionFactor: 2 };

/** Index of a mode at a wavelength. */
export function indexAt(
  choice: IndexChoice,
  wavelengthUm: number,
): { refractiveIndex: RefractiveIndex; cautions: Caution[] } {
  switch (choice.kind) {
    case 'material':
      return refractiveIndexAt(refractiveIndexTable(choice.material), wavelengthUm);
    case 'typed':
      return { refractiveIndex: { real: choice.real, imaginary: choice.imaginary }, cautions: [] };
    case 'mixture':
      return mineralMixtureIndex(choice.parts, wavelengthUm, choice.rule);
  }
}

function dryModes({ modes, kappa, coarseFactor }: ParticleDefinition, wavelengthUm: number) {
  const found = modes.map((mode) => ({ mode, ...indexAt(mode.index, wavelengthUm) }));
  const cautions = found.flatMap((one) => one.cautions);
  if (modes.some(({ index }) => index.kind === 'typed')) cautions.push(TYPED_INDEX);
  let dry: OpticalMode[] = found.map(({ mode, refractiveIndex }) => ({ ...mode, refractiveIndex }));
  requireModes(dry);
  if (coarseFactor !== null) {
    const raised = addCoarseDust(dry, coarseFactor);
    dry = raised.modes;
    cautions.push(...raised.cautions);
  }
  return {
    modes: dry.map((mode): HygroscopicMode => ({ ...mode, kappa })),
    cautions: cautions.filter((one, i) => cautions.findIndex(({ message }) => message === one.message) === i),
  };
}

const TYPED_INDEX: Caution = {
  code: 'index-constant',
  message: 'A typed refractive index is taken to be the same at every wavelength; real ones are not.',
};

function withRadii(definition: ParticleDefinition, factor: number): ParticleDefinition {
  return {
    ...definition,
    modes: definition.modes.map((mode) => ({
      ...mode,
      medianRadiusUm: mode.medianRadiusUm * factor,
      minRadiusUm: mode.minRadiusUm * factor,
      maxRadiusUm: mode.maxRadiusUm * factor,
    })),
  };
}

function withAbsorption(
  definition: ParticleDefinition,
  factor: number,
  wavelengthUm: number,
): ParticleDefinition {
  return {
    ...definition,
    modes: definition.modes.map((mode) => {
      const { real, imaginary } = indexAt(mode.index, wavelengthUm).refractiveIndex;
      return { ...mode, index: { kind: 'typed', real, imaginary: Math.min(10, imaginary * factor) } };
    }),
  };
}

/** Extinction spans decades and moves by ratio; ω and g move by difference. */
const scaleOf = (name: keyof OpticsValues, central: OpticsValues, fast: OpticsValues): number =>
  name === 'massExtinctionM2PerG' ? central[name] / fast[name] : 1;
