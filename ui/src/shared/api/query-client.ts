import { QueryClient } from '@tanstack/react-query';
import { ApiProblem } from './api-problem';

/** A refusal is final; only a missing answer or a fault of the service is asked for again. */
function worthRepeating(failures: number, error: Error): boolean {
  if (error instanceof ApiProblem && error.status >= 400 && error.status < 500) return false;
  return failures < 2;
}

export const queryClient = new QueryClient({
  defaultOptions: {
    queries: { staleTime: 15_000, retry: worthRepeating, refetchOnWindowFocus: true },
    mutations: { retry: false },
  },
});
