import { z } from 'zod';
import { isoTime, personMark, reasonText, shortText } from './shared';

export const submissionState = z.enum([
  'draft',
  'submitted',
  'in-review',
  'returned',
  'approved',
  'declined',
  'withdrawn',
]);
export type SubmissionState = z.infer<typeof submissionState>;

export const datasetKindId = z.enum(['dust-flux', 'point-optical-depth']);
export type DatasetKindId = z.infer<typeof datasetKindId>;

export const tableProposal = z.object({
  sheet: z.string().max(200),
  headerRows: z.array(z.number().int().min(1).max(1_000_000)).max(10),
  unitsRow: z.number().int().min(1).max(1_000_000).nullable(),
  firstRow: z.number().int().min(1).max(1_000_001),
  lastRow: z.number().int().min(1).max(1_000_001),
  used: z.boolean(),
  reason: z.string().max(1000),
});

export const columnProposal = z.object({
  sheet: z.string().max(200),
  column: z.string().regex(/^[A-Z]{1,3}$/, 'a column letter such as F'),
  heading: z.string().max(2000),
  field: z.string().max(60).nullable(),
  unit: z.string().max(80).nullable(),
  confidence: z.number().min(0).max(1),
  reason: z.string().max(1000),
  /** of a flux: dust, or the tracer */
  quantity: z.string().max(60).optional(),
  /** index in `tables`, only where tables of one sheet have different columns */
  table: z.number().int().min(0).max(199).optional(),
});

export const tableConstant = z.object({
  sheet: z.string().max(200),
  field: z.string().max(60),
  text: z.string().max(300),
  unit: z.string().max(80).nullable(),
  cell: z.string().max(12).nullable(),
  reason: z.string().max(1000),
  table: z.number().int().min(0).max(199).optional(),
});

export const mappingSchema = z.strictObject({
  tables: z.array(tableProposal).max(200),
  columns: z.array(columnProposal).max(2000),
  constants: z.array(tableConstant).max(500),
});

export const submissionMetadata = z
  .object({
    title: shortText.optional(),
    creators: z
      .array(
        z.object({
          name: shortText,
          orcid: z.string().max(40).optional(),
          affiliation: z.string().max(300).optional(),
        }),
      )
      .max(50)
      .optional(),
    licence: z.string().max(60).optional(),
    publicationDoi: z.string().max(200).optional(),
    publicationCitation: z.string().max(2000).optional(),
    archive: z.enum(['ice', 'marine', 'loess', 'lake', 'peat', 'other']).optional(),
    method: z.string().max(500).optional(),
    sizeCutoff: z.string().max(60).optional(),
    dustDefinition: z.string().max(100).optional(),
    ageDatum: z.string().max(60).optional(),
    ageModel: z.string().max(500).optional(),
    uncertaintyMeaning: z.string().max(100).optional(),
    densityBasis: z.string().max(100).optional(),
    note: z.string().max(4000).optional(),
  })
  .strict();

export const finding = z.object({
  key: z.string(),
  code: z.string(),
  slug: z.string(),
  title: z.string(),
  severity: z.enum(['error', 'warning', 'note']),
  sheet: z.string().nullable(),
  row: z.number().int().nullable(),
  column: z.string().nullable(),
  field: z.string().optional(),
  message: z.string(),
  remedy: z.string(),
  remedyKind: z.enum(['mend', 'answer', 'leave-out', 'waive', 'none']),
  proposal: z.string().optional(),
  /** set when a steward waived it (warnings only) */
  waived: z.object({ by: personMark, reason: z.string(), at: isoTime }).optional(),
});
export type FindingView = z.infer<typeof finding>;

export const findingCounts = z.object({
  rows: z.number().int(),
  /** rows that would enter a version: with a flux, not left out */
  usableRows: z.number().int(),
  leftOut: z.number().int(),
  errors: z.number().int(),
  warnings: z.number().int(),
  openWarnings: z.number().int(),
  notes: z.number().int(),
});

export const submissionSummary = z.object({
  id: z.string(),
  /** "S-0142" */
  number: z.string(),
  title: z.string(),
  kind: datasetKindId,
  state: submissionState,
  contributor: personMark,
  reviewer: personMark.nullable(),
  fileName: z.string(),
  counts: findingCounts,
  /** people see invented data marked as such */
  invented: z.boolean(),
  createdAt: isoTime,
  submittedAt: isoTime.nullable(),
  decidedAt: isoTime.nullable(),
});
export type SubmissionSummary = z.infer<typeof submissionSummary>;

export const pinnedQuery = z.object({
  id: z.string(),
  sheet: z.string(),
  row: z.number().int(),
  column: z.string(),
  by: personMark,
  text: z.string(),
  at: isoTime,
  replies: z.array(z.object({ by: personMark, text: z.string(), at: isoTime })),
});

export const correctionView = z.object({
  id: z.string(),
  sheet: z.string(),
  row: z.number().int(),
  column: z.string(),
  rawText: z.string(),
  text: z.string(),
  by: personMark,
  at: isoTime,
});

export const submissionDetail = submissionSummary.extend({
  /** send back as If-Match with every change; a stale one is answered 412 */
  revision: z.number().int(),
  fileSha256: z.string(),
  fileBytes: z.number().int(),
  /** an earlier submission that held the same bytes */
  sameFileAs: z.object({ id: z.string(), number: z.string() }).nullable(),
  workbook: z.object({
    format: z.string(),
    encoding: z.string().nullable(),
    delimiter: z.string().nullable(),
    sheets: z.array(
      z.object({ name: z.string(), rowCount: z.number().int(), columnCount: z.number().int() }),
    ),
    readNotes: z.array(z.object({ code: z.string(), message: z.string() })),
  }),
  mapping: mappingSchema,
  metadata: submissionMetadata,
  /** metadata keys still wanted before submitting */
  missingMetadata: z.array(z.string()),
  queries: z.array(pinnedQuery),
  corrections: z.array(correctionView),
  leftOut: z.array(z.object({ sheet: z.string(), row: z.number().int(), reason: z.string() })),
  decisions: z.array(
    z.object({
      decision: z.enum(['approve', 'return', 'decline']),
      by: personMark,
      reason: z.string().nullable(),
      at: isoTime,
    }),
  ),
  dataset: z.object({ slug: z.string(), title: z.string(), versionNumber: z.number().int() }).nullable(),
  rights: z.object({
    mayEdit: z.boolean(),
    maySubmit: z.boolean(),
    mayClaim: z.boolean(),
    mayDecide: z.boolean(),
    /** in words, when a button is shut: "yours: another steward decides" */
    whyNot: z.string().nullable(),
  }),
});
export type SubmissionDetail = z.infer<typeof submissionDetail>;

/** One row of the findings grid: the raw cells and, under each mapped one, its canonical value. */
export const gridRow = z.object({
  row: z.number().int(),
  /** part of the data of a used table (else a heading, a note, a total …) */
  data: z.boolean(),
  leftOut: z.string().nullable(),
  /** by column letter; absent = empty cell */
  cells: z.record(
    z.string(),
    z.object({
      text: z.string(),
      mended: z.string().optional(),
      value: z.union([z.string(), z.number()]).nullable().optional(),
      unit: z.string().optional(),
      rule: z.string().optional(),
      problem: z.string().optional(),
      formula: z.string().optional(),
    }),
  ),
});
export const gridWindow = z.object({
  sheet: z.string(),
  columns: z.array(z.string()),
  rowCount: z.number().int(),
  fromRow: z.number().int(),
  rows: z.array(gridRow),
});
export type GridWindow = z.infer<typeof gridWindow>;

export const gridQuery = z.object({
  sheet: z.string().max(200),
  fromRow: z.coerce.number().int().min(1).default(1),
  limit: z.coerce.number().int().min(1).max(500).default(200),
});

export const correctionsRequest = z.strictObject({
  corrections: z
    .array(
      z.object({
        sheet: z.string().max(200),
        row: z.number().int().min(1).max(1_000_001),
        column: z.string().regex(/^[A-Z]{1,3}$/),
        text: z.string().max(32_767),
      }),
    )
    .min(1)
    .max(5000),
});

export const rowPlaces = z
  .array(z.object({ sheet: z.string().max(200), row: z.number().int().min(1).max(1_000_001) }))
  .min(1)
  .max(5000);
export const leaveOutRequest = z.strictObject({ rows: rowPlaces, reason: reasonText });
export const takeBackRequest = z.strictObject({ rows: rowPlaces });
export const waiverRequest = z.strictObject({
  findingKeys: z.array(z.string().max(500)).min(1).max(2000),
  reason: reasonText,
});
export const queryRequest = z.strictObject({
  sheet: z.string().max(200),
  row: z.number().int().min(1),
  column: z.string().regex(/^[A-Z]{1,3}$/),
  text: z.string().trim().min(3).max(4000),
});
export const replyRequest = z.strictObject({ text: z.string().trim().min(1).max(4000) });
export const decisionRequest = z
  .strictObject({
    decision: z.enum(['approve', 'return', 'decline']),
    /** wanted for return and decline */
    reason: z.string().trim().max(4000).optional(),
    grade: z.enum(['measured', 'recomputed', 'digitised']).optional(),
    /** slug of the dataset that this becomes a new version of; absent = a new dataset */
    datasetSlug: z.string().max(120).optional(),
  })
  .refine((d) => d.decision === 'approve' || (d.reason ?? '').length >= 3, {
    path: ['reason'],
    message: 'Say why: the contributor reads this.',
  });
export const withdrawRequest = z.strictObject({ reason: reasonText });
export const submissionsQuery = z.object({
  state: submissionState.optional(),
  mine: z.enum(['true', 'false']).optional(),
  /** the stewards' queue: submitted and in review, oldest first */
  queue: z.enum(['true', 'false']).optional(),
});

/** Rule page entry. */
export const ruleEntry = z.object({
  id: z.string(),
  slug: z.string(),
  title: z.string(),
  severity: z.string(),
  stage: z.string(),
  source: z.string(),
  why: z.string(),
  limits: z.record(z.string(), z.number()),
  notRun: z.string().nullable(),
});
