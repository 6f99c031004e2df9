import { PARAMETERS } from '@siltlight/common/tables/parameters';
import type { ShippedObject } from '../versions/shipped-objects';
import { OPTICAL_SET, type OpticalSetContent, type Span } from './optical-set-content';
import { readyMadeSets } from './ready-made-objects';

/** Bulk values from the parameter table, each with its source, and the ready-made sets. */
export function shippedOpticalSets(): ShippedObject[] {
  return [
    shipped('dust-broadband', 'Mineral dust, broadband for one-layer formulas', 'omega0-bb-dust-global'),
    shipped('dust-19-soils', 'Mineral dust, mean of 19 soils at 550 nm', 'omega0-dust-19-soils-laboratory'),
    shipped('dust-north-african', 'North African dust at 550 nm', 'omega0-north-african-dust'),
    ...readyMadeSets(),
  ];
}

function shipped(slug: string, title: string, albedoId: string): ShippedObject {
  const albedo = parameter(albedoId);
  const asymmetry = parameter('g-dust');
  const extinction = parameter('mee-dust-pm20-mix-present');
  const content: OpticalSetContent = {
    species: 'dust',
    basis: { kind: 'bulk' },
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
