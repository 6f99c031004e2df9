import * as wire from '@siltlight/common/wire/auth';
import { createZodDto } from 'nestjs-zod';

export class SignInDto extends createZodDto(wire.signInRequest) {}
export class AcceptInvitationDto extends createZodDto(wire.acceptInvitation) {}
export class PasswordResetRequestDto extends createZodDto(wire.passwordResetRequest) {}
export class PasswordResetConfirmDto extends createZodDto(wire.passwordResetConfirm) {}
export class FirstAdministratorDto extends createZodDto(wire.firstAdministrator) {}
export class ChangePasswordDto extends createZodDto(wire.changePassword) {}
export class AccessTokenRequestDto extends createZodDto(wire.accessTokenRequest) {}

export class SessionAnswerDto extends createZodDto(wire.sessionAnswer) {}
export class SignInOptionsDto extends createZodDto(wire.signInOptions) {}
export class LinkUsedDto extends createZodDto(wire.linkUsed) {}
export class PasswordResetAskedDto extends createZodDto(wire.passwordResetAsked) {}
export class SessionListDto extends createZodDto(wire.sessionList) {}
export class AccessTokenListDto extends createZodDto(wire.accessTokenList) {}
export class AccessTokenCreatedDto extends createZodDto(wire.accessTokenCreated) {}
