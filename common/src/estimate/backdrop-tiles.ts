import { type Caution, DomainError, requireWithin } from '../physical/domain-error';
import type { BackdropBand } from './estimate-inputs';
import type { RegionGeometry } from './region-geometry';

/** Surface albedo and cloud fraction of the land and the sea of one row. */
export interface BackdropRow {
  albedoLand: number;
  albedoOcean: number;
  cloudLand: number;
  cloudOcean: number;
}

/** Albedo of ice-free sea under a high sun: 0.05–0.06 (parameter list, R_s open ocean). */
const OPEN_SEA_ALBEDO = 0.06;
/** Poleward of this, sea ice and snow make the split meaningless. */
const ICE_FREE_LATITUDE_DEG = 60;
const LEAST_LAND_SHARE = 0.02;
const BRIGHTEST_ICE_FREE_LAND = 0.5;

/**
 * Backdrop of each row, land and sea apart.
 *
 * A band's mean albedo mixes dark sea with bright land, and dust turns from cooling to warming between the two. So
 * between 60° S and 60° N the sea gets 0.06 and the land what then gives back the band's mean. Where that is not
 * possible (little land, or a land albedo outside 0 to 0.5) and poleward of 60°, both keep the band's mean.
 *
 * @throws DomainError when the bands leave a gap, overlap, or hold an impossible number
 */
export function backdropRows(bands: readonly BackdropBand[], geometry: RegionGeometry): BackdropRow[] {
  requireBands(bands);
  const byBand = bands.map((band) => tileBand(band, landShareOf(band, geometry)));
  return Array.from(geometry.latitudesDeg, (latitude) => {
    const at = bands.findIndex((band) => latitude >= band.southDeg && latitude <= band.northDeg);
    return byBand[at]!;
  });
}

export const BACKDROP_SPLIT_CAUTION: Caution = {
  code: 'backdrop-split',
  message:
    'Surface albedo comes as one mean per band of latitude. Between 60° S and 60° N the sea is taken as 0.06 and the ' +
    'land as what gives back the band’s mean; deserts and forests of one band share that value.',
};

function tileBand(band: BackdropBand, landShare: number): BackdropRow {
  const clouds = {
    cloudLand: band.cloudFractionLand ?? band.cloudFraction,
    cloudOcean: band.cloudFractionOcean ?? band.cloudFraction,
  };
  const iceFree = Math.max(Math.abs(band.southDeg), Math.abs(band.northDeg)) <= ICE_FREE_LATITUDE_DEG;
  const land = (band.surfaceAlbedo - (1 - landShare) * OPEN_SEA_ALBEDO) / landShare;
  const splits = iceFree && landShare >= LEAST_LAND_SHARE && land > 0 && land < BRIGHTEST_ICE_FREE_LAND;
  return splits
    ? { albedoLand: land, albedoOcean: OPEN_SEA_ALBEDO, ...clouds }
    : { albedoLand: band.surfaceAlbedo, albedoOcean: band.surfaceAlbedo, ...clouds };
}

function landShareOf(band: BackdropBand, geometry: RegionGeometry): number {
  let land = 0;
  let all = 0;
  geometry.entryRows.forEach((row, i) => {
    const latitude = geometry.latitudesDeg[row]!;
    if (latitude < band.southDeg || latitude > band.northDeg) return;
    land += geometry.land[i]!;
    all += geometry.land[i]! + geometry.ocean[i]!;
  });
  return all > 0 ? land / all : 0;
}

function requireBands(bands: readonly BackdropBand[]): void {
  let reached = -90;
  for (const band of bands) {
    if (band.southDeg !== reached || band.northDeg <= band.southDeg) {
      throw new DomainError('bands-broken', {
        field: 'backdrop',
        value: `a band from ${band.southDeg} to ${band.northDeg}`,
        unit: '°',
        allowed: `a band that goes on northwards from ${reached} °`,
      });
    }
    reached = band.northDeg;
    requireWithin('backdrop.surfaceAlbedo', band.surfaceAlbedo, '', 0, 1);
    for (const cloud of [band.cloudFraction, band.cloudFractionLand, band.cloudFractionOcean]) {
      if (cloud !== null) requireWithin('backdrop.cloudFraction', cloud, '', 0, 1);
    }
  }
  if (reached !== 90) {
    throw new DomainError('bands-broken', {
      field: 'backdrop',
      value: `bands up to ${reached}`,
      unit: '°',
      allowed: 'bands from −90 to 90 °',
    });
  }
}
