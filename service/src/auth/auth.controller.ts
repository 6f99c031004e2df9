import { Body, Controller, Get, HttpCode, Post, Req, Res } from '@nestjs/common';
import { ApiNoContentResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { SessionAnswer, SignInOptions } from '@siltlight/common/wire/auth';
import type { Request, Response } from 'express';
import { Settings } from '../config/settings';
import { demoAccounts } from '../users/demo-accounts';
import { callerOf } from './caller';
import { SessionAnswerDto, SignInDto, SignInOptionsDto } from './dto';
import { CalledWith, type Credential, Person, Public, SignedIn, SignedInOnly } from './policy';
import { sessionCookie } from './session-cookie';
import { ABSOLUTE_MS } from './session-limits';
import { SessionsService } from './sessions.service';
import { SignInService } from './sign-in.service';

@ApiTags('auth')
@Controller('auth')
export class AuthController {
  constructor(
    private readonly signIns: SignInService,
    private readonly sessions: SessionsService,
    private readonly settings: Settings,
  ) {}

  @Get('options')
  @Public()
  @ApiOperation({ summary: 'What the sign-in page shows before anybody is signed in' })
  @ApiOkResponse({ type: SignInOptionsDto })
  options(): SignInOptions {
    const { demo } = this.settings;
    return {
      demo,
      demoAccounts: demo ? demoAccounts.map(({ email, name, roles }) => ({ email, name, roles })) : [],
    };
  }

  @Post('sign-in')
  @HttpCode(200)
  @Public()
  @ApiOperation({ summary: 'Sign in with e-mail and password; sets the session cookie' })
  @ApiOkResponse({ type: SessionAnswerDto })
  async signIn(
    @Body() wanted: SignInDto,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionAnswer> {
    const { token, answer } = await this.signIns.signIn(wanted, callerOf(request));
    const { name, options } = sessionCookie(this.settings.publicUrl);
    response.cookie(name, token, { ...options, maxAge: ABSOLUTE_MS }).set('Cache-Control', 'no-store');
    return answer;
  }

  @Post('sign-out')
  @HttpCode(204)
  @SignedInOnly({ sessionOnly: true })
  @ApiOperation({ summary: 'End this session on the server and in the browser' })
  @ApiNoContentResponse()
  async signOut(
    @SignedIn() person: Person,
    @CalledWith() credential: Credential,
    @Res({ passthrough: true }) response: Response,
  ): Promise<void> {
    if (credential.kind === 'session') await this.sessions.end(person, credential.sessionId, 'sign-out');
    const { name, options } = sessionCookie(this.settings.publicUrl);
    response.clearCookie(name, options);
  }

  @Get('session')
  @SignedInOnly({ sessionOnly: true })
  @ApiOperation({ summary: 'Who is signed in, and the token that changing calls must carry' })
  @ApiOkResponse({ type: SessionAnswerDto })
  session(
    @SignedIn() person: Person,
    @CalledWith() credential: Credential,
    @Res({ passthrough: true }) response: Response,
  ): Promise<SessionAnswer> {
    response.set('Cache-Control', 'no-store');
    return this.signIns.current(person, credential.kind === 'session' ? credential.sessionId : '');
  }
}
