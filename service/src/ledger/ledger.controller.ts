import { Controller, Get, Query } from '@nestjs/common';
import { ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { LedgerEntryView } from '@siltlight/common/wire/ledger';
import type { Page } from '@siltlight/common/wire/shared';
import { Roles } from '../auth/policy';
import { numberOfCursor, pageOf } from '../http/paging';
import { PeopleService } from '../users/people.service';
import { LedgerCheckDto, LedgerPageDto, LedgerQueryDto } from './dto/ledger.dto';
import { type ChainCheck, LedgerService } from './ledger.service';
import type { LedgerRow } from './models/ledger-row';

@ApiTags('ledger')
@Controller('ledger')
export class LedgerController {
  constructor(
    private readonly ledger: LedgerService,
    private readonly people: PeopleService,
  ) {}

  @Get()
  @Roles('steward', 'administrator')
  @ApiOperation({ summary: 'Who did what to which object, newest first' })
  @ApiOkResponse({ type: LedgerPageDto })
  async list(@Query() query: LedgerQueryDto): Promise<Page<LedgerEntryView>> {
    const page = await pageOf(query, {
      fetch: (count, after) =>
        this.ledger.find(query, count, after === undefined ? undefined : numberOfCursor(after)),
      count: () => this.ledger.count(query),
      keyOf: (row) => String(row.position),
      toItem: (row) => row,
    });
    const actors = new Map<string, LedgerEntryView['actor']>();
    for (const { actorId } of page.items) {
      if (actorId && !actors.has(actorId)) actors.set(actorId, await this.actor(actorId));
    }
    return { ...page, items: page.items.map((row) => viewOf(row, actors.get(row.actorId ?? '') ?? null)) };
  }

  @Get('verify')
  @Roles('steward', 'administrator')
  @ApiOperation({ summary: 'Walks the chain of hashes and names the first broken row' })
  @ApiOkResponse({ type: LedgerCheckDto })
  verify(): Promise<ChainCheck> {
    return this.ledger.verify();
  }

  private async actor(id: string): Promise<LedgerEntryView['actor']> {
    const person = await this.people.byId(id);
    return { id, name: person?.name ?? 'unknown', initials: person?.initials ?? '?' };
  }
}

function viewOf(row: LedgerRow, actor: LedgerEntryView['actor']): LedgerEntryView {
  const { position, at, verb, objectKind, objectId, objectTitle, summary, before, after, hash } = row;
  const read = (text: string | null): unknown => (text === null ? null : JSON.parse(text));
  return {
    position,
    at,
    actor,
    verb,
    objectKind,
    objectId,
    objectTitle,
    summary,
    before: read(before),
    after: read(after),
    hash,
  };
}
