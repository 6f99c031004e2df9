import { Module } from '@nestjs/common';
import { SequelizeModule } from '@nestjs/sequelize';
import { LedgerModule } from '../ledger/ledger.module';
import { PeopleModule } from '../users/people.module';
import { MailFake } from './mail-fake';
import { MailTransport } from './mail-transport';
import { MailboxController } from './mailbox.controller';
import { MailboxRow } from './models/mailbox-row';
import { OutboxRow } from './models/outbox-row';
import { OutboxController } from './outbox.controller';
import { OutboxSender } from './outbox-sender';
import { OutboxService } from './outbox.service';

@Module({
  imports: [SequelizeModule.forFeature([OutboxRow, MailboxRow]), PeopleModule, LedgerModule],
  controllers: [MailboxController, OutboxController],
  providers: [MailFake, MailTransport, OutboxSender, OutboxService],
  exports: [OutboxService, OutboxSender],
})
export class NotificationsModule {}
