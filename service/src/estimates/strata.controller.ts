import { Controller, Get, Param } from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { type Person, SignedIn, SignedInOnly } from '../auth/policy';
import { Strata } from './strata.service';

@Controller('slices')
export class StrataController {
  constructor(private readonly strata: Strata) {}

  @Get('column')
  @SignedInOnly()
  @ApiOperation({
    summary: 'The strata column: slices youngest first, with the latest published net forcing',
  })
  async column(@SignedIn() reader: Person) {
    return { items: await this.strata.column(reader) };
  }

  @Get(':slug')
  @SignedInOnly()
  @ApiOperation({ summary: 'A slice with its reference, records, fields and estimates' })
  detail(@Param('slug') slug: string, @SignedIn() reader: Person) {
    return this.strata.detail(slug, reader);
  }
}
