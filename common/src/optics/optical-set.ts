import type { Caution } from '../physical/domain-error';
import { PARAMETERS, type Parameter } from '../tables/parameters';
import type { LognormalMode } from './lognormal-mode';
import type { Precision } from './mode-scattering';
import { refractiveIndexAt, refractiveIndexTable } from './refractive-index';
import { humidOptics, type HygroscopicMode } from './water-uptake';

export type Species =
  'dust' | 'sulfate' | 'sea-salt' | 'black-carbon' | 'organic-carbon' | 'volcanic-ash' | 'volcanic-sulfate';

interface SetHead {
  readonly id: string;
  readonly title: string;
  readonly species: Species;
  readonly source: string;
  /** what of it was read in the source and what is from memory or assumed */
  readonly evidence: string;
  readonly note: string;
}

/** A mode by number share, as the published distribution states it. */
export interface SetMode extends LognormalMode {
  readonly numberFraction: number;
}

/** Particles whose optics are computed. */
export interface ParticleSet extends SetHead {
  readonly kind: 'particles';
  readonly modes: readonly SetMode[];
  /** id of a refractive-index table, the same for all modes */
  readonly material: string;
  readonly densityGCm3: number;
  readonly kappa: number;
  readonly relativeHumidity: number;
  /** rows of the parameter table that the computed values at 0.55 µm are held against */
  readonly heldAgainst: {
    readonly massExtinction: string;
    readonly singleScatteringAlbedo: string;
    readonly asymmetry: string;
    /** mass of the set over the mass that the extinction row counts, 1 when left out */
    readonly massRatio?: number;
  };
  /** values that fall outside their row, with the reason */
  readonly outside: readonly { readonly quantity: HeldQuantity; readonly reason: string }[];
}

export type HeldQuantity = 'massExtinctionM2PerG' | 'singleScatteringAlbedo' | 'asymmetry';

export type Bounds = Pick<Parameter, 'low' | 'central' | 'high'>;

/** Bulk values at 0.55 µm, where no open index table is at hand. */
export interface BulkSet extends SetHead {
  readonly kind: 'bulk';
  readonly massExtinctionM2PerG: Bounds;
  readonly singleScatteringAlbedo: Bounds;
  readonly asymmetry: Bounds;
}

export type OpticalSet = ParticleSet | BulkSet;

export interface SetOptics {
  /** per gram of dry particles [m² g⁻¹] */
  readonly massExtinctionM2PerG: number;
  readonly singleScatteringAlbedo: number;
  readonly asymmetry: number;
  /** null for bulk values */
  readonly effectiveRadiusUm: number | null;
  readonly cautions: Caution[];
}

/**
 * Optics of a set at a wavelength: computed for particles, as they stand for bulk values, which know 0.55 µm alone.
 *
 * @throws DomainError as `modeOptics`
 */
export function opticsOfSet(set: OpticalSet, wavelengthUm: number, precision: Precision = 'full'): SetOptics {
  if (set.kind === 'bulk') return bulkOptics(set, wavelengthUm);
  const { refractiveIndex, cautions } = refractiveIndexAt(refractiveIndexTable(set.material), wavelengthUm);
  const optics = humidOptics(
    hygroscopicModes(set, refractiveIndex),
    set.relativeHumidity,
    wavelengthUm,
    precision,
  );
  return {
    massExtinctionM2PerG: optics.extinctionPerDryMassM2PerG,
    singleScatteringAlbedo: optics.singleScatteringAlbedo,
    asymmetry: optics.asymmetry,
    effectiveRadiusUm: optics.effectiveRadiusUm,
    cautions: [...cautions, ...(set.kappa > 0 ? optics.cautions : []), ...shapeCautions(set)],
  };
}

/** Row of the parameter table. @throws Error when the table has none: a fault of the program, not of the input */
export function parameterRow(id: string): Parameter {
  const row = PARAMETERS.find((entry) => entry.id === id);
  if (!row) throw new Error(`The parameter table has no row ${id}`);
  return row;
}

function hygroscopicModes(
  set: ParticleSet,
  refractiveIndex: HygroscopicMode['refractiveIndex'],
): HygroscopicMode[] {
  return set.modes.map((mode) => ({
    ...mode,
    densityGCm3: set.densityGCm3,
    kappa: set.kappa,
    refractiveIndex,
  }));
}

function bulkOptics(set: BulkSet, wavelengthUm: number): SetOptics {
  return {
    massExtinctionM2PerG: set.massExtinctionM2PerG.central,
    singleScatteringAlbedo: set.singleScatteringAlbedo.central,
    asymmetry: set.asymmetry.central,
    effectiveRadiusUm: null,
    cautions:
      wavelengthUm === 0.55
        ? []
        : [
            {
              code: 'bulk-at-550-nm',
              message: `${set.title} has bulk values for 0.55 µm only; they are used at ${wavelengthUm} µm.`,
            },
          ],
  };
}

function shapeCautions(set: ParticleSet): Caution[] {
  if (set.species !== 'dust') return [];
  return [
    {
      code: 'spheres',
      message:
        'Computed for spheres of one refractive index. Dust is not spherical: extinction per mass is low and the asymmetry is off; k at 0.52 µm spans 0.0006 to 0.0048 among soils (Di Biagio et al. 2019).',
    },
  ];
}
