import { newOpticalSet, opticalSetDraft, opticalSetsQuery } from '@siltlight/common/wire/optics';
import { createZodDto } from 'nestjs-zod';

export class NewOpticalSetDto extends createZodDto(newOpticalSet) {}
export class OpticalSetDraftDto extends createZodDto(opticalSetDraft) {}
export class OpticalSetsQueryDto extends createZodDto(opticalSetsQuery) {}
