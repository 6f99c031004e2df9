import { ZONAL_BACKDROP } from '@siltlight/common/tables/zonal-backdrop';
import type { BackdropView } from '@siltlight/common/wire/estimates';
import type { ShippedObject } from '../versions/shipped-objects';

/** Content of a backdrop: what is hashed. */
export type BackdropContent = Pick<BackdropView, 'source' | 'note' | 'bands'>;

export const BACKDROP = 'backdrop';

/** Annual zonal means: there is no month in the table, so none is invented. */
export function shippedBackdrops(): ShippedObject[] {
  const content: BackdropContent = {
    source:
      'Hersbach et al. (2023) for surface albedo; Seland et al. (2020), Geosci. Model Dev. 13, 6165–6200, for cloud of a pre-industrial run; zonal tables by Gunning et al. (2025), Geosci. Model Dev. 18, 2479',
    note: 'Annual zonal means of 10° bands, present-day ground: the ice sheets and shelves of a glacial slice are not in it.',
    bands: ZONAL_BACKDROP.map((band) => ({
      southDeg: band.latitudeSouthDeg,
      northDeg: band.latitudeNorthDeg,
      surfaceAlbedo: band.surfaceAlbedo,
      cloudFraction: band.cloudFraction,
      cloudFractionLand: band.cloudFractionLand,
      cloudFractionOcean: band.cloudFractionOcean,
    })),
  };
  return [{ kind: BACKDROP, slug: 'zonal-present-day', title: 'Zonal means, present-day ground', content }];
}
