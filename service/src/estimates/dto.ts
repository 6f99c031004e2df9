import { estimateRequest, estimatesQuery } from '@siltlight/common/wire/estimates';
import { pageQuery } from '@siltlight/common/wire/shared';
import { withdrawRequest } from '@siltlight/common/wire/submissions';
import { createZodDto } from 'nestjs-zod';

export class EstimateRequestDto extends createZodDto(estimateRequest) {}
export class EstimatesQueryDto extends createZodDto(estimatesQuery.extend(pageQuery.shape)) {}
export class WithdrawEstimateDto extends createZodDto(withdrawRequest) {}
