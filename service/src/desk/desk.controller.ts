import { Controller, Get, Query } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';
import { type Person, SignedIn, SignedInOnly } from '../auth/policy';
import { DeskService } from './desk.service';
import { SearchService } from './search.service';

class SearchQueryDto extends createZodDto(z.object({ q: z.string().trim().min(1).max(100) })) {}

@Controller()
@SignedInOnly()
export class DeskController {
  constructor(
    private readonly desk: DeskService,
    private readonly search: SearchService,
  ) {}

  @Get('desk')
  @ApiOperation({ summary: 'What waits for the person who calls' })
  view(@SignedIn() person: Person) {
    return this.desk.of(person);
  }

  @Get('search')
  @ApiOperation({ summary: 'Slices, datasets, sites and estimates by a part of their name' })
  async find(@Query() { q }: SearchQueryDto, @SignedIn() reader: Person) {
    return { items: await this.search.find(q, reader) };
  }
}
