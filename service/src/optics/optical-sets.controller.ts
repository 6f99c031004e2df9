import {
  Body,
  Controller,
  Get,
  Headers,
  HttpCode,
  Param,
  ParseIntPipe,
  Post,
  Put,
  Query,
} from '@nestjs/common';
import { ApiOperation } from '@nestjs/swagger';
import { type Person, Roles, SignedIn, SignedInOnly } from '../auth/policy';
import { NewOpticalSetDto, OpticalSetDraftDto, OpticalSetsQueryDto } from './dto';
import { expectedChecksum } from './expected-checksum';
import { OpticalSetDrafts } from './optical-set-drafts.service';
import { OpticalSetViews } from './optical-set-views.service';
import { OpticalSetsService } from './optical-sets.service';

@Controller('optical-sets')
export class OpticalSetsController {
  constructor(
    private readonly sets: OpticalSetsService,
    private readonly views: OpticalSetViews,
    private readonly drafts: OpticalSetDrafts,
  ) {}

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'Published optical sets with their intervals and sources, or your own drafts' })
  async list(@Query() { state }: OpticalSetsQueryDto, @SignedIn() reader: Person) {
    return { items: await (state === 'draft' ? this.sets.draftsOf(reader) : this.sets.list()) };
  }

  @Post()
  @Roles('scientist')
  @ApiOperation({ summary: 'Begin a set of your own as a draft: particles to compute, or measured values' })
  create(@Body() draft: NewOpticalSetDto, @SignedIn() by: Person) {
    return this.drafts.create(draft, by);
  }

  @Get(':slug')
  @SignedInOnly()
  @ApiOperation({ summary: 'A set: your own draft of it, else the version in force' })
  current(@Param('slug') slug: string, @SignedIn() reader: Person) {
    return this.views.current(slug, reader);
  }

  @Get(':slug/versions')
  @SignedInOnly()
  @ApiOperation({ summary: 'Versions of a set, oldest first' })
  async versions(@Param('slug') slug: string, @SignedIn() reader: Person) {
    return { items: await this.views.listed(slug, reader) };
  }

  @Get(':slug/versions/:number')
  @SignedInOnly()
  @ApiOperation({ summary: 'One version of a set' })
  version(
    @Param('slug') slug: string,
    @Param('number', ParseIntPipe) number: number,
    @SignedIn() reader: Person,
  ) {
    return this.views.numbered(slug, number, reader);
  }

  @Post(':slug/versions')
  @Roles('scientist')
  @ApiOperation({ summary: 'Begin a further version of your own set, as a draft' })
  addVersion(@Param('slug') slug: string, @Body() draft: OpticalSetDraftDto, @SignedIn() by: Person) {
    return this.drafts.addVersion(slug, draft, by);
  }

  @Put(':versionId')
  @Roles('scientist')
  @ApiOperation({ summary: 'Change your draft; If-Match is the checksum of what you changed' })
  save(
    @Param('versionId') versionId: string,
    @Headers('if-match') ifMatch: string | undefined,
    @Body() draft: OpticalSetDraftDto,
    @SignedIn() by: Person,
  ) {
    return this.drafts.save(versionId, draft, expectedChecksum(ifMatch), by);
  }

  @Post(':versionId/publish')
  @HttpCode(200)
  @Roles('scientist')
  @ApiOperation({ summary: 'Publish your draft; it cannot be changed afterwards' })
  publish(@Param('versionId') versionId: string, @SignedIn() by: Person) {
    return this.drafts.publish(versionId, by);
  }
}
