import {
  type Bounds,
  type BulkSet,
  type OpticalSet,
  opticsOfSet,
  parameterRow,
  type ParticleSet,
} from '@siltlight/common/optics/optical-set';
import { READY_MADE_SETS } from '@siltlight/common/optics/ready-made-sets';
import { definitionOf } from '@siltlight/common/optics/species-optics';
import type { ShippedObject } from '../versions/shipped-objects';
import {
  OPTICAL_SET,
  type OpticalSetContent,
  REFERENCE_UM,
  rounded,
  roundedSpan,
  type Span,
  type Spans,
} from './optical-set-content';

/** The ready-made sets as objects: central values computed now, intervals those published for the species. */
export const readyMadeSets = (): ShippedObject[] =>
  READY_MADE_SETS.map((set) => ({
    kind: OPTICAL_SET,
    slug: set.id,
    title: set.title,
    content: set.kind === 'bulk' ? bulkContent(set) : particleContent(set),
  }));

function bulkContent(set: BulkSet): OpticalSetContent {
  return {
    ...told(set),
    basis: { kind: 'bulk' },
    sizeCutoff: 'whole species',
    massExtinctionM2PerG: roundedSpan(set.massExtinctionM2PerG),
    singleScatteringAlbedo: roundedSpan(set.singleScatteringAlbedo),
    asymmetry: roundedSpan(set.asymmetry),
  };
}

function particleContent(set: ParticleSet): OpticalSetContent {
  const definition = definitionOf(set);
  const { heldAgainst, outside } = set;
  const optics = opticsOfSet(set, REFERENCE_UM);
  const spans: Spans = {
    massExtinctionM2PerG: about(
      optics.massExtinctionM2PerG,
      parameterRow(heldAgainst.massExtinction),
      heldAgainst.massRatio,
    ),
    singleScatteringAlbedo: about(
      optics.singleScatteringAlbedo,
      parameterRow(heldAgainst.singleScatteringAlbedo),
    ),
    asymmetry: about(optics.asymmetry, parameterRow(heldAgainst.asymmetry)),
  };
  return {
    ...told(set),
    ...spans,
    basis: { kind: 'particles', definition },
    sizeCutoff: `radius ${Math.min(...set.modes.map((mode) => mode.minRadiusUm))} to ${Math.max(...set.modes.map((mode) => mode.maxRadiusUm))} µm`,
    note: [
      set.note,
      'Central values are computed for spheres; the intervals are those published for the species.',
      ...outside.map(({ reason }) => reason),
    ].join(' '),
  };
}

const told = ({ species, source, evidence, note }: OpticalSet) => ({
  species,
  source,
  evidence,
  note,
  wavelengthUm: REFERENCE_UM,
});

/** A published interval round a computed value, widened where the value lies outside. */
function about(computed: number, row: Bounds, massRatio = 1): Span {
  const central = rounded(computed);
  return {
    low: Math.min(central, rounded(row.low / massRatio)),
    central,
    high: Math.max(central, rounded(row.high / massRatio)),
  };
}
