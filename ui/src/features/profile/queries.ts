import type {
  AccessTokenCreated,
  AccessTokenRequest,
  AccessTokenView,
  ChangePassword,
  SessionView,
} from '@siltlight/common/wire/auth';
import type { ChangeMe, PersonView } from '@siltlight/common/wire/people';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';
import { listOf, type Listed } from '../../shared/jobs/queries';

export const meQuery = queryOptions({ queryKey: ['me'], queryFn: () => api.get<PersonView>('/me') });
export const sessionsQuery = queryOptions({
  queryKey: ['me', 'sessions'],
  queryFn: () => listOf(api.get<Listed<SessionView>>('/me/sessions')),
});
export const tokensQuery = queryOptions({
  queryKey: ['me', 'access-tokens'],
  queryFn: () => listOf(api.get<Listed<AccessTokenView>>('/me/access-tokens')),
});

export const changeMe = (change: ChangeMe) => api.patch<PersonView>('/me', change);
export const changePassword = (change: ChangePassword) => api.post<void>('/me/password', change);
export const endOtherSession = (id: string) => api.delete<void>(`/me/sessions/${id}`);
export const makeToken = (wanted: AccessTokenRequest) =>
  api.post<AccessTokenCreated>('/me/access-tokens', wanted);
export const revokeToken = (id: string) => api.delete<void>(`/me/access-tokens/${id}`);
