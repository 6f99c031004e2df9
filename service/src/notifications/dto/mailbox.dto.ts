import { mailboxPage, mailboxQuery, mailView } from '@siltlight/common/wire/mailbox';
import { createZodDto } from 'nestjs-zod/dto';

export class MailboxQueryDto extends createZodDto(mailboxQuery) {}
export class MailboxPageDto extends createZodDto(mailboxPage) {}
export class MailDto extends createZodDto(mailView) {}
