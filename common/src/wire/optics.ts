import { z } from 'zod';
import { COARSE_DUST } from '../optics/coarse-addition';
import { MODE_LIMITS } from '../optics/lognormal-mode';
import { MAX_INDEX_PART, MIN_REAL_INDEX } from '../optics/mie';
import { MIXING_RULES } from '../optics/mixed-index';
import { DENSITY_RANGE_G_CM3, WAVELENGTH_RANGE_UM } from '../optics/mode-optics';
import { REFRACTIVE_INDICES } from '../tables/refractive-indices';
import { opticalSetView } from './estimates';
import { personMark, shortText, versionState } from './shared';

export const SPECIES = [
  'dust',
  'sulfate',
  'sea-salt',
  'black-carbon',
  'organic-carbon',
  'volcanic-ash',
  'volcanic-sulfate',
  'other',
] as const;
export const speciesName = z.enum(SPECIES);
export type SpeciesName = z.infer<typeof speciesName>;

const within = (what: string, unit: string, [min, max]: readonly [number, number]) => {
  const message = `${what} must lie within ${min} to ${max}${unit && ` ${unit}`}.`;
  return z.number({ error: message }).min(min, message).max(max, message);
};
const material = z.enum(
  REFRACTIVE_INDICES.map((table) => table.id),
  { error: 'Pick one of the tables of refractive indices.' },
);

export const indexChoice = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('material'), material }).strict(),
  z
    .object({
      kind: z.literal('typed'),
      real: within('The real part n', '', [MIN_REAL_INDEX, MAX_INDEX_PART]),
      imaginary: within('The imaginary part k of n − ik', '', [0, MAX_INDEX_PART]),
    })
    .strict(),
  z
    .object({
      kind: z.literal('mixture'),
      rule: z.enum(MIXING_RULES),
      parts: z
        .array(z.object({ material, volumeFraction: within('The share of the volume', '', [0, 1]) }).strict())
        .min(1)
        .max(8),
    })
    .strict(),
]);

export const MAX_SPECIES_MODES = 6;

export const speciesMode = z
  .object({
    name: z.string().trim().min(1, 'Name the mode.').max(40),
    medianRadiusUm: within('The median radius by number', 'µm', MODE_LIMITS.medianRadiusUm),
    geometricStdDev: within('The geometric standard deviation', '', MODE_LIMITS.geometricStdDev),
    numberFraction: within('The share of the particles', '', [0, 1]),
    minRadiusUm: within('The smallest radius', 'µm', MODE_LIMITS.radiusUm),
    maxRadiusUm: within('The largest radius', 'µm', MODE_LIMITS.radiusUm),
    densityGCm3: within('The density', 'g cm⁻³', DENSITY_RANGE_G_CM3),
    index: indexChoice,
  })
  .strict();

/** Particles whose optics are computed; `ParticleDefinition` of common/optics. */
export const particleDefinition = z
  .object({
    modes: z.array(speciesMode).min(1, 'Add a mode.').max(MAX_SPECIES_MODES),
    kappa: within('The hygroscopicity κ', '', [0, 2]),
    relativeHumidity: within('The relative humidity', '', [0, 0.99]),
    /** on the mass above 5 µm diameter; null: off */
    coarseFactor: within(`${COARSE_DUST.name}: the factor`, '', [1, 10]).nullable(),
    /** on extinction; null: off */
    shapeFactor: within('The factor for shape', '', [1, 2]).nullable(),
    spread: z
      .object({
        radiusFactor: within('The factor on radii', '', [1, 3]),
        absorptionFactor: within('The factor on k', '', [1, 10]),
      })
      .strict(),
  })
  .strict();

const span = (what: string, unit: string, range: readonly [number, number]) =>
  z
    .object({
      low: within(`${what}, low,`, unit, range),
      central: within(`${what}, central,`, unit, range),
      high: within(`${what}, high,`, unit, range),
    })
    .strict()
    .refine(({ low, central, high }) => low <= central && central <= high, {
      message: `${what}: low, central and high must rise.`,
    });

/** Values of a paper at one wavelength. */
export const measuredRow = z
  .object({
    wavelengthUm: within('The wavelength', 'µm', WAVELENGTH_RANGE_UM),
    massExtinctionM2PerG: span('Mass extinction', 'm² g⁻¹', [1e-4, 100]),
    singleScatteringAlbedo: span('Single-scattering albedo', '', [0, 1]),
    asymmetry: span('Asymmetry', '', [-1, 1]),
  })
  .strict();
export type MeasuredRow = z.infer<typeof measuredRow>;

/** Mid-visible window: estimates work at 550 nm, and between these bounds a measurement may stand for it. */
export const MID_VISIBLE_UM = [0.5, 0.6] as const;

export const isMidVisible = (wavelengthUm: number): boolean =>
  wavelengthUm >= MID_VISIBLE_UM[0] && wavelengthUm <= MID_VISIBLE_UM[1];

/** What an optical set rests on: particles that are computed, or values that were measured. */
export const opticalBasis = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('particles'), definition: particleDefinition }).strict(),
  z
    .object({
      kind: z.literal('measured'),
      rows: z
        .array(measuredRow)
        .min(1)
        .max(60)
        .refine((rows) => rows.some(({ wavelengthUm }) => isMidVisible(wavelengthUm)), {
          message: `Give values at a wavelength of ${MID_VISIBLE_UM[0]} to ${MID_VISIBLE_UM[1]} µm: estimates work at 0.55 µm.`,
        })
        .refine((rows) => new Set(rows.map((row) => row.wavelengthUm)).size === rows.length, {
          message: 'A wavelength stands twice.',
        }),
    })
    .strict(),
]);
export type OpticalBasis = z.infer<typeof opticalBasis>;

/** Everything of a set but its title. */
export const opticalSetDraft = z
  .object({
    species: speciesName,
    basis: opticalBasis,
    sizeCutoff: z.string().trim().max(120),
    source: z.string().trim().min(3, 'Name the source, or say that it is an assumption.').max(1000),
    evidence: z.string().trim().min(3, 'Say what was read, what is from memory, what is assumed.').max(600),
    note: z.string().trim().max(2000),
  })
  .strict();
export type OpticalSetDraft = z.infer<typeof opticalSetDraft>;

/** "New" is the address of the empty form. */
const setTitle = shortText.max(160).refine((title) => !/^\W*new\W*$/i.test(title), {
  message: 'Give the set a name of its own.',
});
export const newOpticalSet = opticalSetDraft.extend({ title: setTitle });
export type NewOpticalSet = z.infer<typeof newOpticalSet>;

/** A set in a list. */
export const listedOpticalSet = opticalSetView.extend({
  state: versionState,
  species: speciesName,
  basisKind: z.enum(['particles', 'measured', 'bulk']),
});
export type ListedOpticalSet = z.infer<typeof listedOpticalSet>;

/** One version of a set with all it rests on. */
export const opticalSetDetail = opticalSetView.extend({
  state: versionState,
  species: speciesName,
  basis: z.union([opticalBasis, z.object({ kind: z.literal('bulk') })]),
  createdAt: z.string(),
  createdBy: personMark.nullable(),
  publishedAt: z.string().nullable(),
  /** the reader's own draft of it, where there is one */
  ownDraftVersionId: z.string().nullable(),
  rights: z.object({ mayEdit: z.boolean(), mayPublish: z.boolean(), mayAddVersion: z.boolean() }),
});
export type OpticalSetDetail = z.infer<typeof opticalSetDetail>;

export const opticalSetVersion = z.object({
  versionId: z.string(),
  number: z.number().int(),
  state: versionState,
  checksum: z.string(),
  createdAt: z.string(),
  publishedAt: z.string().nullable(),
});
export type OpticalSetVersion = z.infer<typeof opticalSetVersion>;

export const opticalSetsQuery = z.object({ state: z.enum(['published', 'draft']).default('published') });
