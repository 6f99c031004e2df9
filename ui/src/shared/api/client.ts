import axios, { type AxiosRequestConfig } from 'axios';
import { toApiProblem } from './api-problem';

let csrfToken: string | undefined;
let onSignedOut: (() => void) | undefined;

/** The session answer carries the token that every changing request must repeat in a header. */
export function rememberCsrfToken(token: string | undefined): void {
  csrfToken = token;
}

/** Called once when the service says that the session has ended (401). */
export function whenSignedOut(handle: () => void): void {
  onSignedOut = handle;
}

export const client = axios.create({ baseURL: '/api/v1', timeout: 30_000, withCredentials: true });

client.interceptors.request.use((request) => {
  if (csrfToken && request.method !== 'get') request.headers.set('X-CSRF-Token', csrfToken);
  return request;
});

client.interceptors.response.use(undefined, (error: unknown) => {
  const problem = toApiProblem(error);
  if (problem.status === 401 && problem.code !== 'wrong-credentials') onSignedOut?.();
  return Promise.reject(problem);
});

type Options = AxiosRequestConfig;

export const api = {
  get: <T>(path: string, options?: Options) => client.get<T>(path, options).then((answer) => answer.data),
  post: <T>(path: string, body?: unknown, options?: Options) =>
    client.post<T>(path, body, options).then((answer) => answer.data),
  put: <T>(path: string, body?: unknown, options?: Options) =>
    client.put<T>(path, body, options).then((answer) => answer.data),
  patch: <T>(path: string, body?: unknown, options?: Options) =>
    client.patch<T>(path, body, options).then((answer) => answer.data),
  delete: <T>(path: string, options?: Options) =>
    client.delete<T>(path, options).then((answer) => answer.data),
  /** Sends files with progress from 0 to 1; no time limit, as lines may be slow. */
  upload: <T>(path: string, form: FormData, report?: (progress01: number) => void, signal?: AbortSignal) =>
    client
      .post<T>(path, form, {
        timeout: 0,
        signal,
        onUploadProgress: (step) => report?.(step.total ? step.loaded / step.total : 0),
      })
      .then((answer) => answer.data),
};
