import { HttpException } from '@nestjs/common';

/** One thing that is wrong with a request, tied to the place where it is wrong. */
export interface ProblemError {
  /** JSON pointer into the body, or `?name` for a query parameter; empty for the whole */
  pointer: string;
  field?: string;
  value?: unknown;
  allowed?: unknown;
  unit?: string;
  message: string;
}

export interface ProblemExtras {
  detail?: string | undefined;
  errors?: ProblemError[] | undefined;
  /** e.g. Retry-After, Allow */
  headers?: Record<string, string> | undefined;
  /** further members of the answer, e.g. the limit that was exceeded */
  members?: Record<string, unknown> | undefined;
}

/** An answer that is not a success: `code` is stable for programs, `title` and `detail` are for people. */
export class Problem extends HttpException {
  constructor(
    status: number,
    readonly code: string,
    readonly title: string,
    readonly extras: ProblemExtras = {},
  ) {
    super(title, status);
  }
}

export function problem(
  status: number,
  code: string,
  title: string,
  detail?: string,
  errors?: ProblemError[],
): Problem {
  return new Problem(status, code, title, { detail, errors });
}

/** Also the answer to what exists but is not the asker's to see: it must not tell that it exists. */
export function notFound(what: string, id: string): Problem {
  return problem(
    404,
    'not-found',
    `${what} not found`,
    `There is no ${what.toLowerCase()} ${id} that you may see.`,
  );
}
