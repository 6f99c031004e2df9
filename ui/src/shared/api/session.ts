import type { PersonView, Role } from '@siltlight/common/wire/people';
import type { SessionAnswer } from '@siltlight/common/wire/auth';
import { queryOptions, useSuspenseQuery } from '@tanstack/react-query';
import { client, rememberCsrfToken } from './client';
import { queryClient } from './query-client';

/** `person` is null when nobody is signed in; `demo` marks a service that holds invented data. */
export type Session = { person: PersonView | null; demo: boolean };

const signedOut: Session = { person: null, demo: false };

export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: async (): Promise<Session> => {
    // 401 is the plain answer to "who am I?" before sign-in, not a fault.
    const answer = await client.get<SessionAnswer>('/auth/session', {
      validateStatus: (status) => status === 200 || status === 401,
    });
    return answer.status === 200 ? openSession(answer.data) : signedOut;
  },
  staleTime: 60_000,
});

function openSession(answer: SessionAnswer): Session {
  rememberCsrfToken(answer.csrfToken);
  return { person: answer.person, demo: answer.demo };
}

/** Takes the answer of a sign-in as the session, without asking again. */
export function beginSession(answer: SessionAnswer): void {
  queryClient.clear();
  queryClient.setQueryData(sessionQuery.queryKey, openSession(answer));
}

export const useSession = () => useSuspenseQuery(sessionQuery).data;

/** The person of a page behind sign-in; such pages are never drawn without one. */
export function usePerson(): PersonView {
  const { person } = useSession();
  if (!person) throw new Error('This page needs a signed-in person.');
  return person;
}

export const hasRole = (person: PersonView, ...roles: Role[]) =>
  roles.some((role) => person.roles.includes(role));
export const useHasRole = (...roles: Role[]) => hasRole(usePerson(), ...roles);
