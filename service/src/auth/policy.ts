import { createParamDecorator, ExecutionContext, SetMetadata } from '@nestjs/common';
import type { Role } from '@siltlight/common/wire/people';
import type { Scope } from '@siltlight/common/wire/auth';
import type { Request } from 'express';

/** The person a call is made by. A class, so that decorated parameters can name it. */
export abstract class Person {
  readonly id: string;
  readonly name: string;
  readonly initials: string;
  readonly email: string;
  readonly roles: Role[];
}

/** How a call proved who makes it: the browser's session, or a personal access token. */
export type Credential =
  | { kind: 'session'; sessionId: string; signedInAtMs: number }
  | { kind: 'access-token'; tokenId: string; scopes: Scope[] };

export type SignedInRequest = Request & { person?: Person; credential?: Credential };

export type Policy =
  { who: 'public' } | { who: 'signed-in'; sessionOnly: boolean } | { who: 'roles'; roles: Role[] };

export const POLICY = 'siltlight:policy';

/** Anybody may call, signed in or not. */
export const Public = () => SetMetadata<string, Policy>(POLICY, { who: 'public' });

/** Everybody who is signed in may call. `sessionOnly`: from the browser, not with an access token. */
export const SignedInOnly = (options: { sessionOnly?: boolean } = {}) =>
  SetMetadata<string, Policy>(POLICY, { who: 'signed-in', sessionOnly: options.sessionOnly ?? false });

/** Whoever holds one of these roles may call. */
export const Roles = (...roles: [Role, ...Role[]]) =>
  SetMetadata<string, Policy>(POLICY, { who: 'roles', roles });

export function signedInPerson(request: SignedInRequest): Person {
  if (!request.person) throw new Error('A route that asks for the person must not be public.');
  return request.person;
}

/** The person who calls. Only on routes that are not public. */
export const SignedIn = createParamDecorator((_: unknown, context: ExecutionContext) =>
  signedInPerson(context.switchToHttp().getRequest<SignedInRequest>()),
);

/** The session or token that the call was made with. Only on routes that are not public. */
export const CalledWith = createParamDecorator((_: unknown, context: ExecutionContext) => {
  const { credential } = context.switchToHttp().getRequest<SignedInRequest>();
  if (!credential) throw new Error('A route that asks for the credential must not be public.');
  return credential;
});

const READING = new Set(['GET', 'HEAD']);

/** The scope that an access token needs for a call. Calculators keep nothing, so reading suffices for them. */
export function neededScope(method: string, path: string, policy: Policy): Scope {
  if (policy.who === 'roles' && policy.roles.every((role) => role === 'administrator')) return 'admin';
  if (READING.has(method) || path.startsWith('/api/v1/calculators/')) return 'read';
  return 'write';
}
