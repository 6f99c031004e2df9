import { samplesQuery } from '@siltlight/common/wire/datasets';
import { withdrawRequest } from '@siltlight/common/wire/submissions';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';

export class SamplesQueryDto extends createZodDto(samplesQuery) {}
export class WithdrawDto extends createZodDto(withdrawRequest) {}

/** The cells around one row of the file. */
export class CellsQueryDto extends createZodDto(
  z.object({
    sheet: z.string().min(1).max(200),
    row: z.coerce.number().int().min(1).max(1_000_001).default(1),
  }),
) {}
