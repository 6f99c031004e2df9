import { isAxiosError } from 'axios';

/** One fault at one place of what was sent; `pointer` is a JSON pointer into the body. */
export type FieldFault = {
  pointer?: string;
  field?: string;
  message: string;
  value?: unknown;
  unit?: string;
};

type ProblemBody = {
  status?: number;
  code?: string;
  title?: string;
  detail?: string;
  instance?: string;
  reference?: string;
  field?: string;
  errors?: FieldFault[];
};

/** A refusal of the service (problem+json), or the lack of an answer, in one shape. */
export class ApiProblem extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    readonly title: string,
    readonly detail: string,
    readonly errors: FieldFault[] = [],
    readonly reference?: string,
  ) {
    super(detail || title);
    this.name = 'ApiProblem';
  }

  /** The message for a field of the form, found by its name or by a pointer such as `/email`. */
  at(field: string): string | undefined {
    const wanted = field.startsWith('/') ? field : `/${field.replaceAll('.', '/')}`;
    return this.errors.find((fault) => fault.field === field || fault.pointer === wanted)?.message;
  }

  /** Faults that name none of the fields the form shows: they stand above the form. */
  besides(fields: readonly string[]): FieldFault[] {
    const shown = new Set(fields.flatMap((field) => [field, `/${field.replaceAll('.', '/')}`]));
    return this.errors.filter((fault) => !shown.has(fault.field ?? '') && !shown.has(fault.pointer ?? ''));
  }
}

export function toApiProblem(error: unknown): ApiProblem {
  if (error instanceof ApiProblem) return error;
  if (!isAxiosError(error)) {
    return new ApiProblem(
      0,
      'client-fault',
      'The page met a fault',
      error instanceof Error ? error.message : String(error),
    );
  }
  if (!error.response) {
    return new ApiProblem(0, 'no-answer', 'The service gave no answer', noAnswer(error.code));
  }
  const body = bodyOf(error.response.data);
  const errors = body.errors ?? (body.field ? [{ field: body.field, message: body.detail ?? '' }] : []);
  return new ApiProblem(
    error.response.status,
    body.code ?? `http-${error.response.status}`,
    body.title ?? `The service answered ${error.response.status}`,
    body.detail ?? 'No details were given. Try again; if it stays, tell whoever keeps the service.',
    errors,
    body.reference,
  );
}

function noAnswer(code: string | undefined): string {
  if (code === 'ECONNABORTED' || code === 'ETIMEDOUT') {
    return 'It took too long. What you entered is still here; try again.';
  }
  return 'The connection failed. What you entered is still here; check the network and try again.';
}

function bodyOf(data: unknown): ProblemBody {
  return typeof data === 'object' && data !== null && !(data instanceof Blob) ? data : {};
}
