import { RequestMethod } from '@nestjs/common';
import { MetadataScanner, ModulesContainer, Reflector } from '@nestjs/core';
import { ROLES, type Role } from '@siltlight/common/wire/people';
import { MeController } from '../src/auth/me.controller';
import { neededScope, type Policy, POLICY } from '../src/auth/policy';
import { type DemoName, type SignedInCaller, signedInAs } from './support/sign-in';
import { testApp, type TestApp } from './support/test-app';

interface Route {
  name: string;
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  path: string;
  policy: Policy | undefined;
}

let service: TestApp;
let routes: Route[];
beforeAll(async () => {
  service = await testApp({ seeded: true });
  routes = routesOf(service);
});
afterAll(() => service.close());

const DEMO_OF_ROLE: Record<Role, DemoName> = {
  scientist: 'scientist',
  steward: 'steward',
  modeller: 'modeller',
  administrator: 'admin',
};
const OPEN_TO_ALL = [
  'AccountLinksController.acceptInvitation',
  'AccountLinksController.confirmReset',
  'AccountLinksController.firstAdministrator',
  'AccountLinksController.requestReset',
  'AuthController.options',
  'AuthController.signIn',
  'HealthController.live',
  'HealthController.ready',
];

/** Every route of the running service, read from its controllers. */
function routesOf({ app }: TestApp): Route[] {
  const reflector = new Reflector();
  const scanner = new MetadataScanner();
  const controllers = [...app.get(ModulesContainer).values()].flatMap((module) => [
    ...module.controllers.values(),
  ]);
  return controllers.flatMap(({ metatype }) => {
    const prototype = (metatype as { prototype: Record<string, () => unknown> }).prototype;
    const base = String(Reflect.getMetadata('path', metatype!));
    return scanner.getAllMethodNames(prototype).flatMap((name) => {
      const handler = prototype[name]!;
      const method = Reflect.getMetadata('method', handler) as RequestMethod | undefined;
      if (method === undefined) return [];
      const path = [base, String(Reflect.getMetadata('path', handler))]
        .join('/')
        .replace(/\/+/g, '/')
        .replace(/\/$/, '');
      return {
        name: `${metatype!.name}.${name}`,
        method: RequestMethod[method] as Route['method'],
        path: path.startsWith('api/health') ? `/${path}` : `/api/v1/${path}`.replace('//', '/'),
        policy: reflector.getAllAndOverride<Policy | undefined>(POLICY, [handler, metatype as never]),
      };
    });
  });
}

const call = (
  caller: Pick<SignedInCaller, 'get' | 'post' | 'put' | 'patch' | 'delete'>,
  { method, path }: Route,
) => {
  const address = path.replace(/:\w+/g, 'unknown');
  return caller[method.toLowerCase() as 'get'](address);
};

test('every route states who may call it', () => {
  expect(routes.length).toBeGreaterThan(20);
  expect(routes.filter(({ policy }) => policy === undefined).map(({ name }) => name)).toEqual([]);
});

test('only the listed routes are open to strangers', () => {
  const open = routes.filter(({ policy }) => policy?.who === 'public').map(({ name }) => name);
  expect(open.sort()).toEqual(OPEN_TO_ALL);
});

test('a route that states no policy is closed: 401 for strangers, 403 for everybody else', async () => {
  const handler = Object.getOwnPropertyDescriptor(MeController.prototype, 'view')!.value as object;
  const policy = Reflect.getMetadata(POLICY, handler) as Policy;
  Reflect.deleteMetadata(POLICY, handler);
  try {
    await service.stranger().get('/api/v1/me').expect(401);
    const refused = await (await signedInAs(service, 'admin')).get('/api/v1/me').expect(403);
    expect(refused.body.code).toBe('no-policy');
  } finally {
    Reflect.defineMetadata(POLICY, policy, handler);
  }
});

test('a stranger gets 401 from every route that is not open, whatever the input', async () => {
  for (const route of routes.filter(({ policy }) => policy?.who !== 'public')) {
    const answer = await call(service.stranger(), route);
    expect([route.name, answer.status]).toEqual([route.name, 401]);
    expect(answer.headers['content-type']).toContain('application/problem+json');
  }
});

test.each(ROLES)(
  'a %s gets 403 from every route for other roles, before the input is looked at',
  async (role) => {
    const person = await signedInAs(service, DEMO_OF_ROLE[role]);
    for (const route of routes) {
      if (route.policy?.who !== 'roles' || route.policy.roles.includes(role)) continue;
      const answer = await call(person, route);
      expect([route.name, answer.status, answer.body.code]).toEqual([route.name, 403, 'role-needed']);
    }
  },
);

// What one's own account and administration answer to an empty body, once the caller is let in.
const LET_IN: [Route['method'], string, number, Role[]][] = [
  ['GET', '/api/v1/auth/session', 200, [...ROLES]],
  ['GET', '/api/v1/me', 200, [...ROLES]],
  ['PATCH', '/api/v1/me', 422, [...ROLES]],
  ['POST', '/api/v1/me/password', 422, [...ROLES]],
  ['GET', '/api/v1/me/sessions', 200, [...ROLES]],
  ['DELETE', '/api/v1/me/sessions/:id', 404, [...ROLES]],
  ['POST', '/api/v1/me/access-tokens', 422, [...ROLES]],
  ['GET', '/api/v1/me/access-tokens', 200, [...ROLES]],
  ['DELETE', '/api/v1/me/access-tokens/:id', 404, [...ROLES]],
  ['GET', '/api/v1/people', 200, ['administrator']],
  ['GET', '/api/v1/people/:id', 404, ['administrator']],
  ['PATCH', '/api/v1/people/:id', 422, ['administrator']],
  ['POST', '/api/v1/invitations', 422, ['administrator']],
];

test.each(LET_IN)(
  '%s %s answers %i to those who may, and 403 to the others',
  async (method, path, status, allowed) => {
    const route = routes.find((candidate) => candidate.method === method && candidate.path === path)!;
    for (const role of ROLES) {
      const answer = await call(await signedInAs(service, DEMO_OF_ROLE[role]), route);
      expect([role, answer.status]).toEqual([role, allowed.includes(role) ? status : 403]);
    }
  },
);

test('the scope that a call needs follows from its method, its address and its policy', () => {
  const everybody: Policy = { who: 'signed-in', sessionOnly: false };
  const administration: Policy = { who: 'roles', roles: ['administrator'] };
  const shared: Policy = { who: 'roles', roles: ['steward', 'administrator'] };
  expect(neededScope('GET', '/api/v1/datasets', everybody)).toBe('read');
  expect(neededScope('HEAD', '/api/v1/datasets', shared)).toBe('read');
  expect(neededScope('POST', '/api/v1/calculators/orbit', everybody)).toBe('read');
  expect(neededScope('POST', '/api/v1/calculators-of-mine', everybody)).toBe('write');
  expect(neededScope('DELETE', '/api/v1/datasets/1', shared)).toBe('write');
  expect(neededScope('GET', '/api/v1/people', administration)).toBe('admin');
});
