import { Controller, Get, HttpCode, Param, Post, Query } from '@nestjs/common';
import { ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { OutboxMail } from '@siltlight/common/wire/outbox';
import type { Page } from '@siltlight/common/wire/shared';
import { Person, Roles, SignedIn } from '../auth/policy';
import { pageOf } from '../http/paging';
import { OutboxMailDto, OutboxPageDto, OutboxQueryDto } from './dto/outbox.dto';
import type { OutboxRow } from './models/outbox-row';
import { OutboxService } from './outbox.service';

@ApiTags('outbox')
@Controller('outbox')
@Roles('administrator')
export class OutboxController {
  constructor(private readonly outbox: OutboxService) {}

  @Get()
  @ApiOperation({ summary: 'Mail that waits, was sent, or was given up; newest first' })
  @ApiOkResponse({ type: OutboxPageDto })
  list(@Query() query: OutboxQueryDto): Promise<Page<OutboxMail>> {
    return pageOf(query, {
      fetch: (count, after) => this.outbox.find(query.state, count, after),
      count: () => this.outbox.count(query.state),
      keyOf: (row) => row.id,
      toItem: viewOf,
    });
  }

  @Post(':id/send-again')
  @HttpCode(200)
  @ApiOperation({ summary: 'Tries a mail again that was given up' })
  @ApiOkResponse({ type: OutboxMailDto })
  async sendAgain(@SignedIn() person: Person, @Param('id') id: string): Promise<OutboxMail> {
    return viewOf(await this.outbox.sendAgain(id, person.id));
  }
}

function viewOf(row: OutboxRow): OutboxMail {
  const { id, mailKind, toAddress, subject, state, attempts, lastError, createdAt, nextAttemptAt, sentAt } =
    row;
  return {
    id,
    mailKind,
    to: toAddress,
    subject,
    state,
    attempts,
    lastError: lastError ?? null,
    createdAt,
    nextAttemptAt: state === 'waiting' ? nextAttemptAt : null,
    sentAt: sentAt ?? null,
  };
}
