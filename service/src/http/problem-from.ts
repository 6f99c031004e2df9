import { HttpException, NotFoundException } from '@nestjs/common';
import { DomainError } from '@siltlight/common/physical/domain-error';
import { MulterError } from 'multer';
import { BaseError, ConnectionError, UniqueConstraintError } from 'sequelize';
import { z } from 'zod';
import { Problem, type ProblemError } from './problem';
import { invalidInput } from './zod-problems';

/** Everything that is foreseen; undefined for what is not, which is then answered with a reference. */
export function problemFrom(error: unknown): Problem | undefined {
  if (error instanceof Problem) return error;
  if (error instanceof DomainError) return fromDomainError(error);
  if (error instanceof z.ZodError) return invalidInput(error, undefined);
  if (error instanceof MulterError) return fromMulter(error);
  if (error instanceof HttpException) return fromHttpException(error);
  if (error instanceof BaseError) return fromDatabase(error);
  if (isRefusal(error)) return fromRefusal(error);
  if (isParserError(error)) return fromParser(error);
  return undefined;
}

function fromDomainError(error: DomainError): Problem {
  const { code, field, value, unit, allowed, remedy, message } = error;
  const entry: ProblemError = {
    pointer: `/${field.replace(/\./g, '/')}`,
    field,
    value,
    allowed,
    unit,
    message,
  };
  return new Problem(422, code, `${field} cannot be used`, {
    detail: message,
    errors: [entry],
    members: { field, value, allowed, unit, ...(remedy ? { remedy } : {}) },
  });
}

/** Errors of the readers and stores that know their own status, e.g. a refused upload. */
interface Refusal extends Error {
  status: number;
  code: string;
  title: string;
  detail?: string;
  limit?: unknown;
}

function isRefusal(error: unknown): error is Refusal {
  const refusal = error as Partial<Refusal> | null;
  return (
    error instanceof Error &&
    typeof refusal?.status === 'number' &&
    typeof refusal.code === 'string' &&
    typeof refusal.title === 'string'
  );
}

function fromRefusal({ status, code, title, detail, limit }: Refusal): Problem {
  return new Problem(status, code, title, { detail, members: limit === undefined ? {} : { limit } });
}

function fromMulter(error: MulterError): Problem {
  const unexpected = error.code === 'LIMIT_UNEXPECTED_FILE';
  const code = error.code.toLowerCase().replace(/_/g, '-');
  const where = error.field ? ` (part "${error.field.slice(0, 80)}")` : '';
  return new Problem(
    unexpected ? 422 : 413,
    code,
    unexpected ? 'Unexpected file part' : 'The upload is too large',
    {
      detail: `${error.message}${where}. Send one file in the part "file", within the limits of this address.`,
    },
  );
}

const HTTP_CODES: Record<number, string> = {
  400: 'bad-request',
  401: 'not-signed-in',
  403: 'not-allowed',
  404: 'not-found',
  413: 'too-large',
  415: 'unsupported-media-type',
  429: 'too-many-requests',
};

function fromHttpException(error: HttpException): Problem {
  const status = error.getStatus();
  if (error instanceof NotFoundException && /^Cannot [A-Z]+ \//.test(error.message)) return noSuchRoute();
  if (status >= 500) return new Problem(status, 'unavailable', 'The service cannot do this now', {});
  return new Problem(status, HTTP_CODES[status] ?? 'refused', error.message);
}

export function noSuchRoute(): Problem {
  return new Problem(404, 'no-such-route', 'There is nothing at this address', {
    detail: 'Check the address; the document at /api/openapi.json lists every address of the interface.',
  });
}

function fromDatabase(error: BaseError): Problem | undefined {
  const cause = String((error as { original?: Error }).original?.message ?? error.message);
  if (error instanceof UniqueConstraintError) return fromConstraint(error, cause);
  if (cause.includes('SQLITE_FULL')) {
    return new Problem(507, 'storage-full', 'The storage is full', {
      detail: 'Nothing was changed. Reading goes on; an administrator has to make room.',
    });
  }
  if (cause.includes('SQLITE_BUSY') || error instanceof ConnectionError) {
    return new Problem(503, 'storage-busy', 'The storage is busy', {
      detail: 'Nothing was changed; try again in a few seconds.',
      headers: { 'Retry-After': '5' },
    });
  }
  return undefined;
}

/** Sequelize calls every constraint of SQLite a unique one; only the driver's own words tell them apart. */
function fromConstraint(error: UniqueConstraintError, cause: string): Problem | undefined {
  if (cause.includes('UNIQUE constraint failed')) {
    const fields = Object.keys(error.fields);
    return new Problem(409, 'duplicate', 'This exists already', {
      detail: `Another entry has the same ${fields.join(', ') || 'key'}.`,
      errors: fields.map((field) => ({ pointer: `/${field}`, field, message: 'It is taken already.' })),
    });
  }
  // CHECK, NOT NULL and foreign keys are broken by our own mistakes; the rest are the triggers' own sentences.
  if (/(CHECK|NOT NULL|FOREIGN KEY) constraint failed/.test(cause)) return undefined;
  return new Problem(409, 'not-changeable', 'This cannot be changed any more', {
    detail: `${cause.replace(/^SQLITE_CONSTRAINT: /, '')}.`,
  });
}

/** What Express and its parsers raise: they carry a status and say with `expose` that it may be shown. */
function isParserError(error: unknown): error is Error & { status: number } {
  const candidate = error as { status?: unknown; expose?: unknown } | null;
  return error instanceof Error && typeof candidate?.status === 'number' && candidate.expose === true;
}

function fromParser(error: Error & { status: number }): Problem {
  return new Problem(error.status, HTTP_CODES[error.status] ?? 'bad-request', 'The request cannot be read', {
    detail: error.message,
  });
}
