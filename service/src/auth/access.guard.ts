import { type CanActivate, type ExecutionContext, Injectable } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { Settings } from '../config/settings';
import { problem, Problem } from '../http/problem';
import { requestIdOf } from '../http/request-log';
import { personOf } from '../users/people.service';
import { AccessTokensService } from './access-tokens.service';
import { requireOwnOrigin, requireProofAgainstForgery } from './forgery';
import {
  type Credential,
  neededScope,
  type Person,
  type Policy,
  POLICY,
  type SignedInRequest,
} from './policy';
import { type ResumedSession, SessionGuard } from './session.strategy';
import { SessionsService } from './sessions.service';

/**
 * Stands before every route. What states no policy is refused. First who calls (401), then whether they may (403);
 * the input is looked at only after that.
 */
@Injectable()
export class AccessGuard implements CanActivate {
  constructor(
    private readonly reflector: Reflector,
    private readonly settings: Settings,
    private readonly sessionGuard: SessionGuard,
    private readonly sessions: SessionsService,
    private readonly tokens: AccessTokensService,
  ) {}

  async canActivate(context: ExecutionContext): Promise<boolean> {
    const request = context.switchToHttp().getRequest<SignedInRequest>();
    const policy = this.reflector.getAllAndOverride<Policy | undefined>(POLICY, [
      context.getHandler(),
      context.getClass(),
    ]);
    try {
      if (policy?.who === 'public') {
        requireOwnOrigin(request, this.settings.publicUrl);
        return true;
      }
      const { person, credential } = await this.authenticate(context, request);
      Object.assign(request, { person, credential });
      requireAllowed(request, policy, person, credential);
      requireOwnOrigin(request, this.settings.publicUrl);
      if (credential.kind === 'session') {
        requireProofAgainstForgery(request, credential.sessionId, this.settings.secret);
      }
      return true;
    } catch (error) {
      if (error instanceof Problem) this.logRefusal(request, error);
      throw error;
    }
  }

  private async authenticate(context: ExecutionContext, request: SignedInRequest) {
    const { authorization } = request.headers;
    const found =
      authorization === undefined
        ? await this.bySession(context, request)
        : await this.byToken(authorization);
    if (!found) throw notSignedIn(authorization !== undefined);
    return found;
  }

  private async bySession(context: ExecutionContext, request: SignedInRequest) {
    await this.sessionGuard.canActivate(context);
    const resumed = request.user as ResumedSession | undefined;
    if (!resumed) return null;
    await this.sessions.seen(resumed.session);
    const { id, createdAt } = resumed.session;
    const credential: Credential = { kind: 'session', sessionId: id, signedInAtMs: Date.parse(createdAt) };
    return { person: personOf(resumed.row), credential };
  }

  private async byToken(authorization: string) {
    const token = /^Bearer ([A-Za-z0-9_.~+/=-]{1,200})$/i.exec(authorization)?.[1];
    const resumed = token === undefined ? null : await this.tokens.resume(token);
    if (!resumed) return null;
    const credential: Credential = {
      kind: 'access-token',
      tokenId: resumed.token.id,
      scopes: resumed.token.scopes,
    };
    return { person: personOf(resumed.row), credential };
  }

  private logRefusal(request: SignedInRequest, refusal: Problem): void {
    this.settings.log({
      event: 'refused',
      level: 'warn',
      requestId: requestIdOf(request),
      personId: request.person?.id ?? null,
      tokenId: request.credential?.kind === 'access-token' ? request.credential.tokenId : null,
      method: request.method,
      path: request.path,
      status: refusal.getStatus(),
      reason: refusal.code,
    });
  }
}

function requireAllowed(
  request: SignedInRequest,
  policy: Policy | undefined,
  person: Person,
  credential: Credential,
): void {
  if (!policy || policy.who === 'public') {
    throw problem(403, 'no-policy', 'Not allowed', 'This address states no policy, so nobody may use it.');
  }
  if (policy.who === 'roles' && !policy.roles.some((role) => person.roles.includes(role))) {
    const roles = policy.roles.join(' or ');
    throw problem(
      403,
      'role-needed',
      'Your roles do not allow this',
      `This needs the role ${roles}. An administrator gives roles.`,
    );
  }
  if (credential.kind === 'session') return;
  if (policy.who === 'signed-in' && policy.sessionOnly) {
    throw problem(
      403,
      'session-needed',
      'Not with an access token',
      'Sign in with your password to do this.',
    );
  }
  const scope = neededScope(request.method, request.path, policy);
  if (!credential.scopes.includes(scope)) {
    throw problem(
      403,
      'scope-needed',
      'The access token does not reach this far',
      `This needs a token with the scope ${scope}.`,
    );
  }
}

function notSignedIn(withToken: boolean): Problem {
  const detail = withToken
    ? 'The access token is unknown, revoked or expired. Make a new one under your account.'
    : 'There is no session, or it has ended. Sign in again; nothing was changed.';
  return new Problem(401, 'not-signed-in', 'Sign in first', {
    detail,
    headers: { 'WWW-Authenticate': 'Bearer realm="siltlight"' },
  });
}
