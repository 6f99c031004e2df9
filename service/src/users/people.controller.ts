import { Body, Controller, Get, Headers, Param, Patch, Post, Query, Res } from '@nestjs/common';
import { ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { InvitationView, PersonView } from '@siltlight/common/wire/people';
import type { Page } from '@siltlight/common/wire/shared';
import type { Response } from 'express';
import { Person, Roles, SignedIn } from '../auth/policy';
import { AdministrationService } from './administration.service';
import {
  ChangePersonDto,
  InvitationViewDto,
  InviteRequestDto,
  PeoplePageDto,
  PeopleQueryDto,
  PersonViewDto,
} from './dto';
import { expectedVersion, versionTag } from '../http/expected-version';
import { InvitationsService } from './invitations.service';

@ApiTags('people')
@Controller()
@Roles('administrator')
export class PeopleController {
  constructor(
    private readonly administration: AdministrationService,
    private readonly invitations: InvitationsService,
  ) {}

  @Get('people')
  @ApiOperation({ summary: 'Everybody with an account or an invitation' })
  @ApiOkResponse({ type: PeoplePageDto })
  list(@Query() query: PeopleQueryDto): Promise<Page<PersonView>> {
    return this.administration.list(query);
  }

  @Get('people/:id')
  @ApiOperation({ summary: 'One person; the ETag is what If-Match of a change asks for' })
  @ApiOkResponse({ type: PersonViewDto })
  async view(@Param('id') id: string, @Res({ passthrough: true }) response: Response): Promise<PersonView> {
    const view = await this.administration.view(id);
    response.set({ ETag: versionTag(view.version), 'Cache-Control': 'private, no-store' });
    return view;
  }

  @Patch('people/:id')
  @ApiOperation({ summary: 'Give and take roles, disable and enable; If-Match or version is needed' })
  @ApiOkResponse({ type: PersonViewDto })
  change(
    @SignedIn() person: Person,
    @Param('id') id: string,
    @Body() wanted: ChangePersonDto,
    @Headers('if-match') ifMatch: string | undefined,
  ): Promise<PersonView> {
    return this.administration.change(person, id, wanted, expectedVersion(ifMatch, wanted.version));
  }

  @Post('invitations')
  @ApiOperation({ summary: 'Invite somebody by mail; inviting again sends a new link' })
  @ApiCreatedResponse({ type: InvitationViewDto })
  invite(@SignedIn() person: Person, @Body() wanted: InviteRequestDto): Promise<InvitationView> {
    return this.invitations.invite(person, wanted);
  }
}
