import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { SessionAnswer, SignInRequest } from '@siltlight/common/wire/auth';
import { Settings } from '../config/settings';
import { WriteQueue } from '../database/write-queue';
import { problem } from '../http/problem';
import { LedgerService } from '../ledger/ledger.service';
import type { PersonRow } from '../users/models/person-row';
import { PeopleService, viewOf } from '../users/people.service';
import { passwordMatches } from './password-hashing';
import type { Person } from './policy';
import { type Caller, SessionsService } from './sessions.service';
import { SignInThrottle } from './sign-in-throttle';
import { csrfTokenOf } from './signing-keys';

@Injectable()
export class SignInService implements OnModuleInit {
  constructor(
    private readonly people: PeopleService,
    private readonly sessions: SessionsService,
    private readonly throttle: SignInThrottle,
    private readonly writes: WriteQueue,
    private readonly ledger: LedgerService,
    private readonly settings: Settings,
  ) {}

  /** So that the first stranger after a start waits no longer than the next. */
  async onModuleInit(): Promise<void> {
    await passwordMatches(null, '');
  }

  /** Unknown, invited and disabled people and wrong passwords get the same answer after the same work. */
  async signIn(
    { email, password }: SignInRequest,
    caller: Caller,
  ): Promise<{ token: string; answer: SessionAnswer }> {
    const row = await this.people.byEmail(email);
    // A stranger who keeps failing slows down other strangers, not the person at the usual place.
    const usual = await this.sessions.knownAddress(row?.id ?? '', caller.address);
    const account = usual ? `${row?.id} at ${caller.address}` : email.toLowerCase();
    const stored = row && row.disabledAt === null ? row.passwordHash : null;
    const good = await this.throttle.attempt(account, caller.address, () =>
      passwordMatches(stored, password),
    );
    if (!row || !good) {
      this.settings.log({
        event: 'sign-in-failed',
        level: 'warn',
        personId: row?.id ?? null,
        address: caller.address,
      });
      throw problem(
        401,
        'wrong-credentials',
        'E-mail or password is wrong',
        'Check both and try again, or ask for a new password by mail.',
      );
    }
    return this.begin(row, caller);
  }

  async current(person: Person, sessionId: string): Promise<SessionAnswer> {
    const row = await this.people.byId(person.id);
    return this.answer(row!, sessionId);
  }

  private async begin(row: PersonRow, caller: Caller) {
    const session = await this.writes.run(async (transaction) => {
      const started = await this.sessions.start(row, caller, transaction);
      await this.ledger.record(
        {
          actorId: row.id,
          verb: 'sign-in',
          objectKind: 'session',
          objectId: started.id,
          summary: 'Signed in',
        },
        transaction,
      );
      return started;
    });
    this.settings.log({ event: 'signed-in', level: 'info', personId: row.id, address: caller.address });
    return { token: session.token, answer: this.answer(row, session.id) };
  }

  private answer(row: PersonRow, sessionId: string): SessionAnswer {
    const { secret, demo } = this.settings;
    return { person: viewOf(row), csrfToken: csrfTokenOf(sessionId, secret), demo };
  }
}
