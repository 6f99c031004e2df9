import * as wire from '@siltlight/common/wire/people';
import { pageQuery } from '@siltlight/common/wire/shared';
import { createZodDto } from 'nestjs-zod';

export class ChangeMeDto extends createZodDto(wire.changeMe) {}
export class ChangePersonDto extends createZodDto(wire.changePerson) {}
export class InviteRequestDto extends createZodDto(wire.inviteRequest) {}
export class PeopleQueryDto extends createZodDto(pageQuery) {}

export class PersonViewDto extends createZodDto(wire.personView) {}
export class PeoplePageDto extends createZodDto(wire.peoplePage) {}
export class InvitationViewDto extends createZodDto(wire.invitationView) {}
