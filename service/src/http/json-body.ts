import { type CallHandler, type ExecutionContext, Injectable, type NestInterceptor } from '@nestjs/common';
import { type NextFunction, raw, type Request, type Response } from 'express';
import type { Observable } from 'rxjs';
import { Problem, problem } from './problem';
import { parseStrictly } from './strict-json';

const MAX_BODY_BYTES = 2 * 1024 * 1024;
const failures = new WeakMap<Request, Error>();
const readRaw = raw({ type: () => true, limit: MAX_BODY_BYTES, inflate: false });

/**
 * Reads JSON bodies; uploads are left to the routes that take them. What is wrong with a body is only kept here
 * and told by the interceptor below, so that a stranger learns that he is not signed in before anything else.
 */
export function jsonBody(request: Request, _response: Response, next: NextFunction): void {
  const hasBody =
    request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length'] ?? 0) > 0;
  if (!hasBody || request.is('multipart/form-data')) return next();
  if (!request.is(['application/json', 'application/*+json'])) {
    failures.set(request, unsupported(request));
    return next();
  }
  readRaw(request, _response, (failed?: unknown) => {
    if (failed) failures.set(request, explained(failed as Error & { type?: string }));
    else parseInto(request);
    next();
  });
}

/** Runs after the guards and before the validation. */
@Injectable()
export class BodyInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    const failure = failures.get(context.switchToHttp().getRequest<Request>());
    if (failure) throw failure;
    return next.handle();
  }
}

function parseInto(request: Request): void {
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(request.body as Buffer);
    request.body = parseStrictly(text);
  } catch (error) {
    request.body = undefined;
    failures.set(request, error instanceof Problem ? error : notUtf8());
  }
}

function notUtf8(): Problem {
  return problem(400, 'malformed-json', 'The body is not usable JSON', 'The bytes are not UTF-8.');
}

function unsupported(request: Request): Problem {
  return new Problem(415, 'unsupported-media-type', 'This kind of body is not read here', {
    detail: `Content-Type is ${JSON.stringify(request.get('content-type') ?? 'missing')}; send application/json.`,
    headers: { Accept: 'application/json' },
  });
}

function explained(error: Error & { type?: string }): Error {
  if (error.type === 'entity.too.large') {
    return new Problem(413, 'too-large', 'The body is too large', {
      detail: `A JSON body may have ${MAX_BODY_BYTES} bytes at most.`,
      headers: { Connection: 'close' },
      members: { limit: MAX_BODY_BYTES },
    });
  }
  if (error.type === 'encoding.unsupported') {
    return problem(
      415,
      'unsupported-media-type',
      'Compressed bodies are not read here',
      'Send the body uncompressed.',
    );
  }
  return error;
}
