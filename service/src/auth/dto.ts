import * as wire from '@siltlight/common/wire/auth';
import { createZodDto } from 'nestjs-zod';

export class SignInDto extends createZodDto(wire.signInRequest) {}
export class AcceptInvitationDto extends createZodDto(wire.acceptInvitation) {}
export class PasswordResetRequestDto extends createZodDto(wire.passwordResetRequest) {}
export class PasswordResetConfirmDto extends createZodDto(wire.passwordResetConfirm) {}
export class FirstAdministratorDto extends createZodDto(wire.firstAdministrator) {}
export class ChangePasswordDto extends createZodDto(wire.changePassword) {}
export class AccessTokenRequestDto extends createZodDto(wire.accessTokenRequest) {}
