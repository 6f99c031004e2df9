import type { MailSummary, MailView } from '@siltlight/common/wire/mailbox';
import type { Page } from '@siltlight/common/wire/shared';
import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

export const mailboxQuery = infiniteQueryOptions({
  queryKey: ['mailbox'],
  queryFn: ({ pageParam }) =>
    api.get<Page<MailSummary>>('/mailbox', { params: { limit: 50, cursor: pageParam ?? undefined } }),
  initialPageParam: null as string | null,
  getNextPageParam: (page) => page.nextCursor,
  refetchInterval: 10_000,
});

export const mailQuery = (id: string) =>
  queryOptions({
    queryKey: ['mail', id],
    queryFn: () => api.get<MailView>(`/mailbox/${encodeURIComponent(id)}`),
    staleTime: Infinity,
  });
