import { PARAMETERS } from '@siltlight/common/tables/parameters';
import type { ShippedObject } from '../versions/shipped-objects';

interface Span {
  low: number;
  central: number;
  high: number;
}

/** Content of an optical set: what is hashed. */
export interface OpticalSetContent {
  singleScatteringAlbedo: Span;
  asymmetry: Span;
  massExtinctionM2PerG: Span;
  wavelengthUm: number;
  sizeCutoff: string;
  source: string;
  evidence: string;
  note: string;
}

export const OPTICAL_SET = 'optical-set';

/** Bulk values from the parameter table, each with its source; nothing is computed here. */
export function shippedOpticalSets(): ShippedObject[] {
  return [
    shipped('dust-broadband', 'Mineral dust, broadband for one-layer formulas', 'omega0-bb-dust-global'),
    shipped('dust-19-soils', 'Mineral dust, mean of 19 soils at 550 nm', 'omega0-dust-19-soils-laboratory'),
    shipped('dust-north-african', 'North African dust at 550 nm', 'omega0-north-african-dust'),
  ];
}

function shipped(slug: string, title: string, albedoId: string): ShippedObject {
  const albedo = parameter(albedoId);
  const asymmetry = parameter('g-dust');
  const extinction = parameter('mee-dust-pm20-mix-present');
  const content: OpticalSetContent = {
    singleScatteringAlbedo: span(albedo),
    asymmetry: span(asymmetry),
    massExtinctionM2PerG: span(extinction),
    wavelengthUm: 0.55,
    sizeCutoff: '< 20 µm diameter',
    source: [...new Set([albedo.source, asymmetry.source, extinction.source])].join('; '),
    evidence: `single-scattering albedo: ${albedo.evidence}; asymmetry: ${asymmetry.evidence}; extinction: ${extinction.evidence}`,
    note: [albedo.note, extinction.note].filter((note) => note !== '').join(' '),
  };
  return { kind: OPTICAL_SET, slug, title, content };
}

const span = ({ low, central, high }: Span): Span => ({ low, central, high });

function parameter(id: string) {
  const found = PARAMETERS.find((row) => row.id === id);
  if (!found) throw new Error(`The parameter table has no row ${id}`);
  return found;
}
