import { Module } from '@nestjs/common';
import { APP_GUARD } from '@nestjs/core';
import { JwtModule } from '@nestjs/jwt';
import { SequelizeModule } from '@nestjs/sequelize';
import { LedgerModule } from '../ledger/ledger.module';
import { NotificationsModule } from '../notifications/notifications.module';
import { PeopleModule } from '../users/people.module';
import { AccessGuard } from './access.guard';
import { AccessTokensController } from './access-tokens.controller';
import { AccessTokensService } from './access-tokens.service';
import { AccountLinksController } from './account-links.controller';
import { AccountSweep } from './account-sweep';
import { AuthController } from './auth.controller';
import { FirstAdministratorService } from './first-administrator.service';
import { MeController } from './me.controller';
import { MeService } from './me.service';
import { AccessTokenRow } from './models/access-token-row';
import { OneTimeTokenRow } from './models/one-time-token-row';
import { SessionRow } from './models/session-row';
import { OneTimeTokensService } from './one-time-tokens.service';
import { PasswordChangeService } from './password-change.service';
import { PasswordResetDesk } from './password-reset-desk';
import { SessionGuard, SessionStrategy } from './session.strategy';
import { SessionsService } from './sessions.service';
import { SignInService } from './sign-in.service';
import { SignInThrottle } from './sign-in-throttle';

@Module({
  imports: [
    SequelizeModule.forFeature([SessionRow, AccessTokenRow, OneTimeTokenRow]),
    JwtModule.register({}),
    PeopleModule,
    LedgerModule,
    NotificationsModule,
  ],
  controllers: [AuthController, AccountLinksController, MeController, AccessTokensController],
  providers: [
    { provide: APP_GUARD, useClass: AccessGuard },
    AccessTokensService,
    AccountSweep,
    FirstAdministratorService,
    MeService,
    OneTimeTokensService,
    PasswordChangeService,
    PasswordResetDesk,
    SessionGuard,
    SessionStrategy,
    SessionsService,
    SignInService,
    SignInThrottle,
  ],
  exports: [AccessTokensService, FirstAdministratorService, OneTimeTokensService, SessionsService],
})
export class AuthModule {}
