import type {
  ListedOpticalSet,
  NewOpticalSet,
  OpticalSetDetail,
  OpticalSetDraft,
  OpticalSetVersion,
} from '@siltlight/common/wire/optics';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';
import { queryClient } from '../../shared/api/query-client';

export const listedSetsQuery = (state: 'published' | 'draft') =>
  queryOptions({
    queryKey: ['optical-sets', 'listed', state],
    queryFn: async () =>
      (await api.get<{ items: ListedOpticalSet[] }>('/optical-sets', { params: { state } })).items,
  });

const address = (slug: string) => `/optical-sets/${encodeURIComponent(slug)}`;

export const opticalSetQuery = (slug: string) =>
  queryOptions({
    queryKey: ['optical-sets', 'one', slug],
    queryFn: () => api.get<OpticalSetDetail>(address(slug)),
  });

export const setVersionsQuery = (slug: string) =>
  queryOptions({
    queryKey: ['optical-sets', 'versions', slug],
    queryFn: async () => (await api.get<{ items: OpticalSetVersion[] }>(`${address(slug)}/versions`)).items,
  });

export const createSet = (draft: NewOpticalSet) => api.post<OpticalSetDetail>('/optical-sets', draft);
export const addVersion = (slug: string, draft: OpticalSetDraft) =>
  api.post<OpticalSetDetail>(`${address(slug)}/versions`, draft);
export const saveDraft = ({ versionId, checksum }: OpticalSetDetail, draft: OpticalSetDraft) =>
  api.put<OpticalSetDetail>(`/optical-sets/${versionId}`, draft, {
    headers: { 'If-Match': `"${checksum}"` },
  });
export const publishDraft = (versionId: string) =>
  api.post<OpticalSetDetail>(`/optical-sets/${versionId}/publish`);

/** Lists here and in the set-up of estimates follow what was saved. */
export async function rememberSet(set: OpticalSetDetail): Promise<void> {
  queryClient.setQueryData(opticalSetQuery(set.slug).queryKey, set);
  await queryClient.invalidateQueries({ queryKey: ['optical-sets'] });
}
