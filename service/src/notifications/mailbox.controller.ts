import { Controller, Get, Param, Query } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { MailSummary, MailView } from '@siltlight/common/wire/mailbox';
import type { Page } from '@siltlight/common/wire/shared';
import { Op, type WhereOptions } from 'sequelize';
import { Person, SignedIn, SignedInOnly } from '../auth/policy';
import { Settings } from '../config/settings';
import { pageOf } from '../http/paging';
import { notFound, problem } from '../http/problem';
import { MailboxPageDto, MailboxQueryDto, MailDto } from './dto/mailbox.dto';
import { MailboxRow } from './models/mailbox-row';

@ApiTags('mailbox')
@Controller('mailbox')
@SignedInOnly()
export class MailboxController {
  constructor(
    @InjectModel(MailboxRow) private readonly rows: typeof MailboxRow,
    private readonly settings: Settings,
  ) {}

  @Get()
  @ApiOperation({ summary: 'Demo only: mail to oneself, newest first; administrators see all' })
  @ApiOkResponse({ type: MailboxPageDto })
  list(@SignedIn() person: Person, @Query() query: MailboxQueryDto): Promise<Page<MailSummary>> {
    const where = this.visibleTo(person);
    return pageOf(query, {
      fetch: (limit, after) =>
        this.rows.findAll({
          where: { ...where, ...(after ? { id: { [Op.lt]: after } } : {}) },
          attributes: { exclude: ['text', 'raw'] },
          order: [['id', 'DESC']],
          limit,
        }),
      count: () => this.rows.count({ where }),
      keyOf: (row) => row.id,
      toItem: summaryOf,
    });
  }

  @Get(':id')
  @ApiOperation({ summary: 'Demo only: one mail with its text' })
  @ApiOkResponse({ type: MailDto })
  async get(@SignedIn() person: Person, @Param('id') id: string): Promise<MailView> {
    const row = await this.rows.findOne({ where: { ...this.visibleTo(person), id } });
    if (!row) throw notFound('Mail', id);
    return { ...summaryOf(row), text: row.text };
  }

  private visibleTo(person: Person): { toAddress?: string } & WhereOptions {
    if (!this.settings.demo) {
      throw problem(
        404,
        'no-mailbox',
        'There is no mailbox here',
        'Only the demo keeps mail; look into your own mailbox.',
      );
    }
    return person.roles.includes('administrator') ? {} : { toAddress: person.email.toLowerCase() };
  }
}

function summaryOf({ id, messageId, fromAddress, toAddress, subject, receivedAt }: MailboxRow): MailSummary {
  return { id, messageId, from: fromAddress, to: toAddress, subject, receivedAt };
}
