import type { ChangePerson, InvitationView, InviteRequest, PersonView } from '@siltlight/common/wire/people';
import type { Page } from '@siltlight/common/wire/shared';
import { queryOptions } from '@tanstack/react-query';
import { api, client } from '../../shared/api/client';

const PAGE_SIZE = 200;

export const peopleQuery = queryOptions({
  queryKey: ['people'],
  queryFn: async () => {
    const people: PersonView[] = [];
    let cursor: string | null = null;
    do {
      const page: Pick<Page<PersonView>, 'items' | 'nextCursor'> = await api.get('/people', {
        params: { limit: PAGE_SIZE, cursor: cursor ?? undefined },
      });
      people.push(...page.items);
      cursor = page.nextCursor;
    } while (cursor);
    return people;
  },
});

export const changePerson = ({ id, ...change }: ChangePerson & { id: string }) =>
  api.patch<PersonView>(`/people/${id}`, change);
export const invite = (wanted: InviteRequest) => api.post<InvitationView>('/invitations', wanted);

export type HealthCheck = { name: string; ok: boolean; detail: string };

/** 503 is an answer as well: it says which check fails. */
export const healthQuery = queryOptions({
  queryKey: ['health'],
  queryFn: async () => {
    const answer = await client.get<{ checks: HealthCheck[] }>('/api/health/ready', {
      baseURL: '/',
      validateStatus: (status) => status === 200 || status === 503,
    });
    return answer.data.checks;
  },
  refetchInterval: 20_000,
});
