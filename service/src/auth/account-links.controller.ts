import { Body, Controller, HttpCode, Post, Req } from '@nestjs/common';
import {
  ApiAcceptedResponse,
  ApiCreatedResponse,
  ApiOkResponse,
  ApiOperation,
  ApiTags,
} from '@nestjs/swagger';
import type { PersonView } from '@siltlight/common/wire/people';
import type { Request } from 'express';
import { callerOf } from './caller';
import {
  AcceptInvitationDto,
  FirstAdministratorDto,
  LinkUsedDto,
  PasswordResetAskedDto,
  PasswordResetConfirmDto,
  PasswordResetRequestDto,
} from './dto';
import { PersonViewDto } from '../users/dto';
import { FirstAdministratorService } from './first-administrator.service';
import { PasswordChangeService } from './password-change.service';
import { PasswordResetDesk } from './password-reset-desk';
import { Public } from './policy';

/** What a person does with a one-time link, or to get one, before being signed in. */
@ApiTags('auth')
@Controller('auth')
export class AccountLinksController {
  constructor(
    private readonly passwords: PasswordChangeService,
    private readonly desk: PasswordResetDesk,
    private readonly first: FirstAdministratorService,
  ) {}

  @Post('accept-invitation')
  @HttpCode(200)
  @Public()
  @ApiOperation({ summary: 'Choose the first password with the link of an invitation' })
  @ApiOkResponse({ type: LinkUsedDto })
  acceptInvitation(@Body() wanted: AcceptInvitationDto): Promise<{ email: string }> {
    return this.passwords.acceptInvitation(wanted);
  }

  @Post('password-reset')
  @HttpCode(202)
  @Public()
  @ApiOperation({ summary: 'Ask for a link to a new password; the answer is the same for everybody' })
  @ApiAcceptedResponse({ type: PasswordResetAskedDto })
  requestReset(@Body() { email }: PasswordResetRequestDto, @Req() request: Request): { detail: string } {
    this.desk.ask(email, callerOf(request).address);
    return { detail: 'If there is an account with this address, a mail with a link is on its way.' };
  }

  @Post('password-reset/confirm')
  @HttpCode(200)
  @Public()
  @ApiOperation({ summary: 'Choose a new password with the mailed link; ends every session' })
  @ApiOkResponse({ type: LinkUsedDto })
  confirmReset(@Body() wanted: PasswordResetConfirmDto): Promise<{ email: string }> {
    return this.passwords.confirmReset(wanted);
  }

  @Post('first-administrator')
  @Public()
  @ApiOperation({ summary: 'Make the first account with the link that the first start prints' })
  @ApiCreatedResponse({ type: PersonViewDto })
  firstAdministrator(@Body() wanted: FirstAdministratorDto): Promise<PersonView> {
    return this.first.create(wanted);
  }
}
