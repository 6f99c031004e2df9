import { outboxMail, outboxPage, outboxQuery } from '@siltlight/common/wire/outbox';
import { createZodDto } from 'nestjs-zod/dto';

export class OutboxQueryDto extends createZodDto(outboxQuery) {}
export class OutboxPageDto extends createZodDto(outboxPage) {}
export class OutboxMailDto extends createZodDto(outboxMail) {}
