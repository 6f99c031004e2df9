import { z } from 'zod';

/** Text a person types: trimmed, no control characters, never empty unless said. */
export const shortText = z.string().trim().min(1).max(300);
export const reasonText = z.string().trim().min(3, 'Give a reason of at least three characters.').max(4000);
export const isoTime = z.string();
export const finite = z.number().finite();

/** An amount with its 5–95 % interval; bounds are null where nothing was varied. */
export const interval = z.object({ value: finite, low: finite.nullable(), high: finite.nullable() });
export type Interval = z.infer<typeof interval>;

export const caution = z.object({ code: z.string(), message: z.string() });

/** A person as others see them. */
export const personMark = z.object({ id: z.string(), name: z.string(), initials: z.string() });
export type PersonMark = z.infer<typeof personMark>;

/** Limits and cursor of every list. */
export const pageQuery = z.object({
  limit: z.coerce.number().int().min(1).max(200).default(50),
  cursor: z.string().max(200).optional(),
});
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable(), total: z.number().int() });
export interface Page<T> {
  items: T[];
  nextCursor: string | null;
  total: number;
}

export const problemError = z.object({
  pointer: z.string(),
  field: z.string().optional(),
  value: z.unknown().optional(),
  allowed: z.unknown().optional(),
  unit: z.string().optional(),
  message: z.string(),
});

/** application/problem+json of every refusal. */
export const problemDocument = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  instance: z.string().optional(),
  code: z.string(),
  errors: z.array(problemError).optional(),
});
export type ProblemDocument = z.infer<typeof problemDocument>;

export const versionState = z.enum(['draft', 'published', 'superseded', 'withdrawn']);
export type VersionState = z.infer<typeof versionState>;
