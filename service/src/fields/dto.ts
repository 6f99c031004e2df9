import { fieldRequest } from '@siltlight/common/wire/slices';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';

export class FieldRequestDto extends createZodDto(fieldRequest) {}
export class FieldsQueryDto extends createZodDto(z.object({ slice: z.string().max(80).optional() })) {}
export class TraceQueryDto extends createZodDto(
  z.object({ site: z.string().min(1).max(300), dataset: z.string().min(1).max(120) }),
) {}
