import {
  type OpticsValues,
  speciesOptics,
  speciesRange,
  type ParticleDefinition,
} from '@siltlight/common/optics/species-optics';
import { DomainError } from '@siltlight/common/physical/domain-error';
import { isMidVisible, type OpticalSetDraft, type SpeciesName } from '@siltlight/common/wire/optics';

export const OPTICAL_SET = 'optical-set';

/** Wavelength that optical depths are stated at [µm]. */
export const REFERENCE_UM = 0.55;

export interface Span {
  low: number;
  central: number;
  high: number;
}

export type Spans = Record<keyof OpticsValues, Span>;

/** Content of an optical set: what is hashed. */
export interface OpticalSetContent extends Spans {
  wavelengthUm: number;
  species: SpeciesName;
  basis: OpticalSetDraft['basis'] | { kind: 'bulk' };
  sizeCutoff: string;
  source: string;
  evidence: string;
  note: string;
}

/**
 * A draft with the values that estimates use: computed here from the particles, never taken from the caller, or those
 * measured nearest 0.55 µm.
 *
 * @throws DomainError naming the field of the draft
 */
export function contentOf(draft: OpticalSetDraft): OpticalSetContent {
  const { species, basis, sizeCutoff, source, evidence, note } = draft;
  const told = { species, basis, sizeCutoff, source, evidence, note };
  if (basis.kind === 'particles') {
    return { ...told, ...computedSpans(basis.definition), wavelengthUm: REFERENCE_UM };
  }
  const nearest = basis.rows
    .filter((row) => isMidVisible(row.wavelengthUm))
    .sort((a, b) => Math.abs(a.wavelengthUm - REFERENCE_UM) - Math.abs(b.wavelengthUm - REFERENCE_UM))[0]!;
  return { ...told, ...nearest };
}

/** Rounded, so that another processor's last digits make no other checksum. */
export const rounded = (value: number): number => Number(value.toPrecision(4));

export const roundedSpan = ({ low, central, high }: Span): Span => ({
  low: rounded(low),
  central: rounded(central),
  high: rounded(high),
});

function computedSpans(definition: ParticleDefinition): Spans {
  try {
    const spans = speciesRange(definition, REFERENCE_UM, speciesOptics(definition, REFERENCE_UM));
    return {
      massExtinctionM2PerG: roundedSpan(spans.massExtinctionM2PerG),
      singleScatteringAlbedo: roundedSpan(spans.singleScatteringAlbedo),
      asymmetry: roundedSpan(spans.asymmetry),
    };
  } catch (error) {
    throw error instanceof DomainError ? inDraft(error) : error;
  }
}

/** The computation knows `modes[1].maxRadiusUm`; the caller sent it inside `basis.definition`. */
function inDraft(error: DomainError): DomainError {
  const { code, value, unit, allowed, remedy } = error;
  const field = `basis.definition.${error.field.replace(/\[(\d+)\]/g, '.$1')}`;
  return new DomainError(code, { field, value, unit, allowed, ...(remedy ? { remedy } : {}) });
}
