import { bergerOrbit } from '@siltlight/common/orbit/elements';
import { SOLAR_CONSTANT_WM2 } from '@siltlight/common/physical/constants';
import { CONVENTIONAL_SLICES, type ConventionalSlice } from '@siltlight/common/tables/conventional-slices';
import { PMIP_SLICES } from '@siltlight/common/tables/pmip-slices';
import type { SliceContent } from '@siltlight/common/wire/slices';
import type { ShippedObject } from '../versions/shipped-objects';

export const SLICE = 'slice';

/** The conventional slices with their sources. One solar constant for all, so that differences are orbital alone. */
export function shippedSlices(): ShippedObject[] {
  return CONVENTIONAL_SLICES.map((row) => ({
    kind: SLICE,
    slug: row.slug,
    title: row.name,
    content: contentOf(row),
  }));
}

function contentOf(row: ConventionalSlice): SliceContent {
  return {
    slug: row.slug,
    name: row.name,
    label: row.shortLabel,
    kind: row.kind,
    windowYoungKa: row.windowYoungKaBp,
    windowOldKa: row.windowOldKaBp,
    orbitalAgeKa: row.orbitalAgeKaBp,
    ...orbitOf(row),
    solarConstantWm2: SOLAR_CONSTANT_WM2,
    gases: gasesOf(row),
    referenceSlug: row.referenceSlug,
    stage: row.stage,
    noteOnUse: row.note,
    source: row.source,
  };
}

function orbitOf(row: ConventionalSlice): Pick<SliceContent, 'orbit' | 'orbitSource'> {
  const protocol = PMIP_SLICES.find(({ name }) => name === row.pmipSlice);
  if (protocol) return { orbit: { ...protocol.orbit }, orbitSource: protocol.source };
  return {
    orbit: bergerOrbit(row.orbitalAgeKaBp).orbit,
    orbitSource: 'Berger (1978), J. Atmos. Sci. 35, 2362–2367, computed',
  };
}

function gasesOf({ co2Ppm, ch4Ppb, n2oPpb, source }: ConventionalSlice): SliceContent['gases'] {
  return co2Ppm === null || ch4Ppb === null || n2oPpb === null ? null : { co2Ppm, ch4Ppb, n2oPpb, source };
}
