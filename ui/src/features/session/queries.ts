import type {
  AcceptInvitation,
  FirstAdministrator,
  PasswordResetConfirm,
  SessionAnswer,
  SignInOptions,
  SignInRequest,
} from '@siltlight/common/wire/auth';
import { queryOptions } from '@tanstack/react-query';
import { api } from '../../shared/api/client';

export const signInOptionsQuery = queryOptions({
  queryKey: ['sign-in-options'],
  queryFn: () => api.get<SignInOptions>('/auth/options'),
  staleTime: Infinity,
});

export const signIn = (credentials: SignInRequest) => api.post<SessionAnswer>('/auth/sign-in', credentials);
export const signOut = () => api.post<void>('/auth/sign-out');
export const acceptInvitation = (body: AcceptInvitation) =>
  api.post<{ email: string }>('/auth/accept-invitation', body);
export const makeFirstAdministrator = (body: FirstAdministrator) =>
  api.post<{ email: string }>('/auth/first-administrator', body);
export const askForReset = (email: string) => api.post<void>('/auth/password-reset', { email });
export const confirmReset = (body: PasswordResetConfirm) =>
  api.post<{ email: string }>('/auth/password-reset/confirm', body);
