import { Injectable } from '@nestjs/common';
import { AuthGuard, PassportStrategy } from '@nestjs/passport';
import type { Request } from 'express';
import { Strategy } from 'passport-jwt';
import { Settings } from '../config/settings';
import type { SessionRow } from './models/session-row';
import type { PersonRow } from '../users/models/person-row';
import { cookieValue, sessionCookie } from './session-cookie';
import { isSessionClaims, TOKEN_ALGORITHM, TOKEN_AUDIENCE, TOKEN_ISSUER } from './session-token';
import { SessionsService } from './sessions.service';
import { keyFor } from './signing-keys';

const NAME = 'session-cookie';

export interface ResumedSession {
  session: SessionRow;
  row: PersonRow;
}

/** One algorithm, one key, one source: nothing in a token says how it wants to be checked. */
@Injectable()
export class SessionStrategy extends PassportStrategy(Strategy, NAME) {
  constructor(
    settings: Settings,
    private readonly sessions: SessionsService,
  ) {
    const { name } = sessionCookie(settings.publicUrl);
    super({
      jwtFromRequest: (request: Request) => cookieValue(request, name),
      secretOrKey: keyFor('session', settings.secret),
      algorithms: [TOKEN_ALGORITHM],
      issuer: TOKEN_ISSUER,
      audience: TOKEN_AUDIENCE,
      ignoreExpiration: false,
    });
  }

  async validate(payload: unknown): Promise<ResumedSession | false> {
    if (!isSessionClaims(payload)) return false;
    return (await this.sessions.resume(payload)) ?? false;
  }
}

/** Runs the strategy; a call without a good session goes on without a person, for the access guard to judge. */
@Injectable()
export class SessionGuard extends AuthGuard(NAME) {
  override handleRequest<T>(error: unknown, resumed: T | false): T {
    if (error) throw error instanceof Error ? error : new Error('The session could not be read.');
    return (resumed || undefined) as T;
  }
}
