import {
  correctionsRequest,
  datasetKindId,
  gridQuery,
  leaveOutRequest,
  mappingSchema,
  submissionMetadata,
  submissionsQuery,
  takeBackRequest,
  withdrawRequest,
} from '@siltlight/common/wire/submissions';
import { pageQuery, shortText } from '@siltlight/common/wire/shared';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';

export class UploadDto extends createZodDto(
  z.strictObject({ kind: datasetKindId.default('dust-flux'), title: shortText.optional() }),
) {}
export class SubmissionsQueryDto extends createZodDto(submissionsQuery.extend(pageQuery.shape)) {}
export class GridQueryDto extends createZodDto(gridQuery) {}
export class MappingDto extends createZodDto(mappingSchema) {}
export class MetadataDto extends createZodDto(submissionMetadata) {}
export class CorrectionsDto extends createZodDto(correctionsRequest) {}
export class LeaveOutDto extends createZodDto(leaveOutRequest) {}
export class TakeBackDto extends createZodDto(takeBackRequest) {}
export class WithdrawDto extends createZodDto(withdrawRequest) {}

export class FindingsQueryDto extends createZodDto(
  z.object({
    severity: z.enum(['error', 'warning', 'note']).optional(),
    code: z.string().max(8).optional(),
    offset: z.coerce.number().int().min(0).default(0),
    limit: z.coerce.number().int().min(1).max(1000).default(200),
  }),
) {}

export class TemplateQueryDto extends createZodDto(z.object({ kind: datasetKindId.default('dust-flux') })) {}
