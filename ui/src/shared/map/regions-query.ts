import { queryOptions } from '@tanstack/react-query';
import { api } from '../api/client';
import type { MapRegion } from './map-data';
import { regionTitle } from './region-name';

/** Outlines of the AR6 reference regions (Iturbide et al. 2020, CC BY 4.0). They never change within a release. */
export const regionsQuery = queryOptions({
  queryKey: ['regions', 'ar6'],
  queryFn: async () => {
    const { regions } = await api.get<{ regions: MapRegion[] }>('/regions/ar6');
    return regions.map((region) => ({ ...region, name: regionTitle(region.name) }));
  },
  staleTime: Infinity,
});
