import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';

/** Any JSON object: the computations of `common` name each field, its range and what is not used. */
export class PlainObjectDto extends createZodDto(z.record(z.string().max(60), z.unknown())) {}
