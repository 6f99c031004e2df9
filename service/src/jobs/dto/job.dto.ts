import { jobSummary } from '@siltlight/common/wire/jobs';
import { pageOf, pageQuery } from '@siltlight/common/wire/shared';
import { createZodDto } from 'nestjs-zod/dto';

export class JobDto extends createZodDto(jobSummary) {}
export class JobPageDto extends createZodDto(pageOf(jobSummary)) {}
export class JobsQueryDto extends createZodDto(pageQuery) {}
