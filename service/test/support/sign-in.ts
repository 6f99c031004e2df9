import type { SessionAnswer } from '@siltlight/common/wire/auth';
import type { Test } from 'supertest';
import type { TestApp } from './test-app';

export const DEMO_PASSWORD = 'a password for the tests';
export type DemoName = 'scientist' | 'scientist2' | 'steward' | 'steward2' | 'modeller' | 'admin';

/** Somebody with a session, who sends the CSRF token along as the client does. */
export interface SignedInCaller extends SessionAnswer {
  get: (path: string) => Test;
  post: (path: string, body?: object) => Test;
  put: (path: string, body?: object) => Test;
  patch: (path: string, body?: object) => Test;
  delete: (path: string) => Test;
  /** what the browser would send back */
  cookie: string;
}

export const demoAddress = (name: DemoName): string => `${name}@siltlight.example`;

export async function signedIn(
  service: TestApp,
  email: string,
  password = DEMO_PASSWORD,
): Promise<SignedInCaller> {
  const agent = service.stranger();
  const answer = await agent.post('/api/v1/auth/sign-in').send({ email, password }).expect(200);
  const session = answer.body as SessionAnswer;
  const change = (call: Test, body?: object) => call.set('X-CSRF-Token', session.csrfToken).send(body);
  return {
    ...session,
    get: (path) => agent.get(path),
    post: (path, body) => change(agent.post(path), body),
    put: (path, body) => change(agent.put(path), body),
    patch: (path, body) => change(agent.patch(path), body),
    delete: (path) => change(agent.delete(path)),
    cookie: (answer.get('Set-Cookie') ?? []).map((line) => line.split(';')[0]).join('; '),
  };
}

export const signedInAs = (service: TestApp, name: DemoName) => signedIn(service, demoAddress(name));
