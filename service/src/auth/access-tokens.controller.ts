import { Body, Controller, Delete, Get, HttpCode, Param, Post, Req, Res } from '@nestjs/common';
import {
  ApiCreatedResponse,
  ApiNoContentResponse,
  ApiOkResponse,
  ApiOperation,
  ApiTags,
} from '@nestjs/swagger';
import type { AccessTokenCreated, AccessTokenView } from '@siltlight/common/wire/auth';
import type { Request, Response } from 'express';
import { problem } from '../http/problem';
import { AccessTokensService } from './access-tokens.service';
import { callerOf } from './caller';
import { AccessTokenCreatedDto, AccessTokenListDto, AccessTokenRequestDto } from './dto';
import { PasswordChangeService } from './password-change.service';
import { CalledWith, type Credential, Person, SignedIn, SignedInOnly } from './policy';
import { FRESH_MS } from './session-limits';

@ApiTags('me')
@Controller('me/access-tokens')
export class AccessTokensController {
  constructor(
    private readonly tokens: AccessTokensService,
    private readonly passwords: PasswordChangeService,
  ) {}

  @Post()
  @SignedInOnly({ sessionOnly: true })
  @ApiOperation({ summary: 'Make an access token for scripts; it is shown this once' })
  @ApiCreatedResponse({ type: AccessTokenCreatedDto })
  async create(
    @SignedIn() person: Person,
    @CalledWith() credential: Credential,
    @Body() wanted: AccessTokenRequestDto,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<AccessTokenCreated> {
    const fresh = credential.kind === 'session' && Date.now() - credential.signedInAtMs < FRESH_MS;
    if (wanted.password !== undefined) {
      await this.passwords.requirePresentPassword(
        person,
        wanted.password,
        callerOf(request).address,
        'password',
      );
    } else if (!fresh) throw passwordNeeded();
    response.set('Cache-Control', 'no-store');
    return this.tokens.create(person, wanted);
  }

  @Get()
  @SignedInOnly()
  @ApiOperation({ summary: 'The own access tokens that are alive, newest first' })
  @ApiOkResponse({ type: AccessTokenListDto })
  async list(@SignedIn() person: Person): Promise<{ items: AccessTokenView[] }> {
    return { items: await this.tokens.list(person) };
  }

  @Delete(':id')
  @HttpCode(204)
  @SignedInOnly({ sessionOnly: true })
  @ApiOperation({ summary: 'Revoke one of the own access tokens' })
  @ApiNoContentResponse()
  async revoke(@SignedIn() person: Person, @Param('id') id: string): Promise<void> {
    await this.tokens.revoke(person, id);
  }
}

function passwordNeeded() {
  const message = 'You signed in a while ago: give your password once more.';
  return problem(422, 'password-needed', 'Give your password', message, [
    { pointer: '/password', field: 'password', message },
  ]);
}
