import {
  columnProposal,
  datasetKindId,
  tableConstant,
  tableProposal,
} from '@siltlight/common/wire/submissions';
import { createZodDto } from 'nestjs-zod';
import { z } from 'zod';
import { Problem } from '../http/problem';
import { parseStrictly } from '../http/strict-json';

const reason = z.string().max(1000).default('As given with the file.');

/** In the form of the answer; what only explains the proposal may be left away, and so may a list that is right. */
const mapping = z.strictObject({
  tables: z
    .array(tableProposal.extend({ unitsRow: tableProposal.shape.unitsRow.default(null), reason }))
    .max(200)
    .optional(),
  columns: z
    .array(
      columnProposal.extend({
        heading: z.string().max(2000).default(''),
        unit: columnProposal.shape.unit.default(null),
        confidence: z.number().min(0).max(1).default(1),
        reason,
      }),
    )
    .max(2000)
    .optional(),
  constants: z.array(tableConstant).max(500).optional(),
});

/** A form field holds text: the mapping comes as JSON in it. */
const mappingText = z
  .string()
  .transform((text, context): unknown => {
    try {
      return parseStrictly(text);
    } catch (error) {
      if (!(error instanceof Problem)) throw error;
      context.addIssue({
        code: 'custom',
        message: `it is not usable JSON; send {tables, columns} in the form of the answer. ${error.extras.detail ?? ''}`,
      });
      return z.NEVER;
    }
  })
  .pipe(mapping);

export class CheckFileDto extends createZodDto(
  z.strictObject({
    kind: datasetKindId.default('dust-flux'),
    mapping: mappingText.optional(),
    offset: z.coerce.number().int().min(0).default(0),
    limit: z.coerce.number().int().min(1).max(10_000).default(10_000),
  }),
) {}
