import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { AuthModule } from '../auth/auth.module';
import { LedgerModule } from '../ledger/ledger.module';
import { NotificationsModule } from '../notifications/notifications.module';
import { AdministrationService } from './administration.service';
import { DemoPeopleSeed } from './demo-people.seed';
import { InvitationsService } from './invitations.service';
import { PersonRow } from './models/person-row';
import { PeopleController } from './people.controller';
import { PeopleModule } from './people.module';

@Module({
  imports: [
    SequelizeModule.forFeature([PersonRow]),
    PeopleModule,
    AuthModule,
    LedgerModule,
    NotificationsModule,
  ],
  controllers: [PeopleController],
  providers: [AdministrationService, InvitationsService, DemoPeopleSeed],
})
export class UsersModule {}
