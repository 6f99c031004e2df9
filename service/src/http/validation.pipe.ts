import { type ArgumentMetadata, Injectable, type PipeTransform } from '@nestjs/common';
import { isZodDto } from 'nestjs-zod/dto';
import type { z } from 'zod';
import { invalidInput } from './zod-problems';

/** Every parameter typed with a DTO made from a schema of `common/wire` is checked against it. */
@Injectable()
export class ValidationPipe implements PipeTransform {
  transform(value: unknown, metadata: ArgumentMetadata): unknown {
    if (!isZodDto(metadata.metatype)) return value;
    const schema = metadata.metatype.schema as unknown as z.ZodType;
    // A call without a body is judged like one with an empty object: it is told which fields are missing.
    const input = value === undefined && metadata.type === 'body' ? {} : value;
    const read = schema.safeParse(input);
    if (!read.success) throw invalidInput(read.error, input, metadata.type);
    return read.data;
  }
}
