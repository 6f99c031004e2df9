import {
  columnProposal,
  datasetKindId,
  tableConstant,
  tableProposal,
} from '@siltlight/common/wire/submissions';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';

const mapping = z.object({
  tables: z.array(tableProposal).max(200),
  columns: z.array(columnProposal).max(2000),
  constants: z.array(tableConstant).max(500).optional(),
});

/** A form field holds text: the mapping comes as JSON in it. */
const mappingText = z
  .string()
  .transform((text, context): unknown => {
    try {
      return JSON.parse(text);
    } catch {
      context.addIssue({
        code: 'custom',
        message: 'mapping is not JSON: send {tables, columns} in the form of the answer.',
      });
      return z.NEVER;
    }
  })
  .pipe(mapping);

export class CheckFileDto extends createZodDto(
  z.object({
    kind: datasetKindId.default('dust-flux'),
    mapping: mappingText.optional(),
    offset: z.coerce.number().int().min(0).default(0),
    limit: z.coerce.number().int().min(1).max(10_000).default(10_000),
  }),
) {}
