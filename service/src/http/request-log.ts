import { randomUUID } from 'node:crypto';
import type { NextFunction, Request, Response } from 'express';
import type { LogSink } from './json-log';

const WELL_FORMED = /^[A-Za-z0-9_-]{8,64}$/;
const requestIds = new WeakMap<Request, string>();

export function requestIdOf(request: Request): string | undefined {
  return requestIds.get(request);
}

/** Gives each request its id and writes one line when it has ended; no query, body, header or secret in it. */
export function requestLog(log: LogSink) {
  return (request: Request, response: Response, next: NextFunction): void => {
    const given = request.get('x-request-id');
    const requestId = given && WELL_FORMED.test(given) ? given : randomUUID();
    requestIds.set(request, requestId);
    response.set('X-Request-Id', requestId);
    const startedAt = performance.now();
    const path = request.path;
    response.on('close', () => {
      const status = response.writableFinished ? response.statusCode : 499;
      log({
        event: 'request',
        level: status >= 500 ? 'error' : 'info',
        requestId,
        personId: (request as { person?: { id: string } }).person?.id ?? null,
        method: request.method,
        route: (request.route as { path?: string } | undefined)?.path ?? null,
        path,
        status,
        ms: Math.round(performance.now() - startedAt),
      });
    });
    next();
  };
}
