import type { z } from 'zod';
import { Problem, type ProblemError } from './problem';

export type InputPlace = 'body' | 'query' | 'param' | 'custom';

/** Names every wrong field of an input: where it lies, what came, what is wrong. */
export function invalidInput(error: z.ZodError, input: unknown, place: InputPlace = 'body'): Problem {
  const errors = error.issues.map((issue) => describeIssue(issue, input, place));
  const first = errors[0]?.message ?? 'The input does not have the required form.';
  const more = errors.length > 1 ? ` ${errors.length - 1} more below.` : '';
  return new Problem(422, 'invalid-input', 'The input is not valid', { detail: `${first}${more}`, errors });
}

/** What is typed into such a field is never sent back. */
const SECRET = /password|token|secret/i;

function describeIssue(issue: z.core.$ZodIssue, input: unknown, place: InputPlace): ProblemError {
  const path = issue.path.map(String);
  const field = path.join('.');
  const value = SECRET.test(field) ? undefined : shown(valueAt(input, path));
  return {
    pointer:
      place === 'query'
        ? `?${field}`
        : path.map((key) => `/${key.replace(/~/g, '~0').replace(/\//g, '~1')}`).join(''),
    field,
    ...(value === undefined ? {} : { value }),
    ...allowedBy(issue),
    message: field ? `${field}: ${issue.message}` : issue.message,
  };
}

function allowedBy(issue: z.core.$ZodIssue): { allowed?: unknown } {
  switch (issue.code) {
    case 'too_small':
      return { allowed: { minimum: Number(issue.minimum) } };
    case 'too_big':
      return { allowed: { maximum: Number(issue.maximum) } };
    case 'invalid_value':
      return { allowed: issue.values };
    default:
      return {};
  }
}

function valueAt(input: unknown, path: string[]): unknown {
  return path.reduce<unknown>(
    (at, key) =>
      typeof at === 'object' && at !== null && Object.hasOwn(at, key)
        ? (at as Record<string, unknown>)[key]
        : undefined,
    input,
  );
}

/** Only small plain values are sent back. */
function shown(value: unknown): unknown {
  if (typeof value === 'number' || typeof value === 'boolean' || value === null) return value;
  return typeof value === 'string' && value.length <= 200 ? value : undefined;
}
