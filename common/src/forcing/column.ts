import { readNumber, refuseUnused } from '../physical/check-fields';
import { DAYS_PER_YEAR } from '../physical/constants';
import type { Caution } from '../physical/domain-error';

export interface ColumnRequest {
  depositionGM2Yr: number;
  lifetimeDays: number;
  massExtinctionM2PerG: number;
}

export interface ColumnAnswer {
  burdenGM2: number;
  opticalDepth: number;
  cautions: Caution[];
  method: { name: string; source: string };
}

const DEPOSITION = { field: 'depositionGM2Yr', unit: 'g m⁻² yr⁻¹', min: 0, max: 10_000 } as const;
const LIFETIME = { field: 'lifetimeDays', unit: 'd', min: 0, max: 1000 } as const;
const EXTINCTION = { field: 'massExtinctionM2PerG', unit: 'm² g⁻¹', min: 0, max: 100 } as const;

/**
 * Burden of a column in steady state, B = F t / 365.25 [g m⁻²].
 *
 * Limits: what falls here also floats here; it fails near sources and for remote ice. Deposition, lifetime and
 * extinction must belong to one size cutoff.
 */
export function burdenOfDeposition(depositionGM2Yr: number, lifetimeDays: number): number {
  return (depositionGM2Yr * lifetimeDays) / DAYS_PER_YEAR;
}

/** Deposition → burden → optical depth τ = MEE·B. @throws DomainError naming the field at fault */
export function calculateColumn(request: ColumnRequest): ColumnAnswer {
  refuseUnused(request, [DEPOSITION.field, LIFETIME.field, EXTINCTION.field]);
  const burdenGM2 = burdenOfDeposition(readNumber(request, DEPOSITION), readNumber(request, LIFETIME));
  const opticalDepth = readNumber(request, EXTINCTION) * burdenGM2;
  return {
    burdenGM2,
    opticalDepth,
    cautions: opticalDepth > 3 ? [THICK] : [],
    method: { name: 'Steady-state column', source: 'Mass balance; year of 365.25 days' },
  };
}

const THICK: Caution = {
  code: 'optical-depth-implausible',
  message:
    'An optical depth above 3 does not last as a mean of months: check the units of the deposition, and that a source region is not treated as a remote one.',
};
