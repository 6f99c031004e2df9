import {
  Body,
  Controller,
  Delete,
  Get,
  Headers,
  HttpCode,
  Param,
  Patch,
  Post,
  Req,
  Res,
} from '@nestjs/common';
import { ApiNoContentResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { SessionView } from '@siltlight/common/wire/auth';
import type { PersonView } from '@siltlight/common/wire/people';
import type { Request, Response } from 'express';
import { ChangeMeDto, PersonViewDto } from '../users/dto';
import { expectedVersion, versionTag } from '../http/expected-version';
import { callerOf } from './caller';
import { ChangePasswordDto, SessionListDto } from './dto';
import { MeService } from './me.service';
import { PasswordChangeService } from './password-change.service';
import { CalledWith, type Credential, Person, SignedIn, SignedInOnly } from './policy';
import { SessionsService } from './sessions.service';

/** What everybody may do with their own account. */
@ApiTags('me')
@Controller('me')
export class MeController {
  constructor(
    private readonly me: MeService,
    private readonly passwords: PasswordChangeService,
    private readonly sessions: SessionsService,
  ) {}

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'The own account' })
  @ApiOkResponse({ type: PersonViewDto })
  async view(
    @SignedIn() person: Person,
    @Res({ passthrough: true }) response: Response,
  ): Promise<PersonView> {
    return tagged(response, await this.me.view(person));
  }

  @Patch()
  @SignedInOnly()
  @ApiOperation({ summary: 'Change the own name or ORCID iD; If-Match or version is needed' })
  @ApiOkResponse({ type: PersonViewDto })
  async change(
    @SignedIn() person: Person,
    @Body() wanted: ChangeMeDto,
    @Headers('if-match') ifMatch: string | undefined,
    @Res({ passthrough: true }) response: Response,
  ): Promise<PersonView> {
    return tagged(response, await this.me.change(person, wanted, expectedVersion(ifMatch, wanted.version)));
  }

  @Post('password')
  @HttpCode(204)
  @SignedInOnly({ sessionOnly: true })
  @ApiOperation({ summary: 'Change the own password; ends the other sessions' })
  @ApiNoContentResponse()
  async changePassword(
    @SignedIn() person: Person,
    @CalledWith() credential: Credential,
    @Body() wanted: ChangePasswordDto,
    @Req() request: Request,
  ): Promise<void> {
    await this.passwords.change(person, wanted, callerOf(request).address, sessionOf(credential));
  }

  @Get('sessions')
  @SignedInOnly()
  @ApiOperation({ summary: 'The own sessions that are alive, newest first' })
  @ApiOkResponse({ type: SessionListDto })
  async listSessions(
    @SignedIn() person: Person,
    @CalledWith() credential: Credential,
  ): Promise<{ items: SessionView[] }> {
    return { items: await this.sessions.list(person.id, sessionOf(credential)) };
  }

  @Delete('sessions/:id')
  @HttpCode(204)
  @SignedInOnly({ sessionOnly: true })
  @ApiOperation({ summary: 'End one of the own sessions' })
  @ApiNoContentResponse()
  async endSession(@SignedIn() person: Person, @Param('id') id: string): Promise<void> {
    await this.sessions.end(person, id, 'end-session');
  }
}

const sessionOf = (credential: Credential): string =>
  credential.kind === 'session' ? credential.sessionId : '';

function tagged(response: Response, view: PersonView): PersonView {
  response.set({ ETag: versionTag(view.version), 'Cache-Control': 'private, no-store' });
  return view;
}
