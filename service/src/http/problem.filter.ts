import { randomUUID } from 'node:crypto';
import { type ArgumentsHost, Catch, type ExceptionFilter } from '@nestjs/common';
import type { Request, Response } from 'express';
import { Settings } from '../config/settings';
import { allowedMethods } from './allowed-methods';
import { Problem } from './problem';
import { problemFrom } from './problem-from';
import { requestIdOf } from './request-log';

/** The one place where an exception becomes an answer: application/problem+json, nothing internal in it. */
@Catch()
export class ProblemFilter implements ExceptionFilter {
  constructor(private readonly settings: Settings) {}

  catch(error: unknown, host: ArgumentsHost): void {
    const http = host.switchToHttp();
    this.answer(error, http.getRequest<Request>(), http.getResponse<Response>());
  }

  answer(error: unknown, request: Request, response: Response): void {
    const known = problemFrom(error) ?? this.unexpected(error, request);
    const answered = known.code === 'no-such-route' ? (wrongMethod(request) ?? known) : known;
    if (response.headersSent) {
      // Half an answer has gone out: breaking the connection is the only honest sign left.
      response.destroy();
      return;
    }
    for (const name of ['Content-Disposition', 'ETag', 'Cache-Control']) response.removeHeader(name);
    response
      .status(answered.getStatus())
      .set({ 'Cache-Control': 'no-store', ...answered.extras.headers })
      .type('application/problem+json')
      .send(JSON.stringify(problemBody(answered, request)));
  }

  private unexpected(error: unknown, request: Request): Problem {
    const reference = randomUUID();
    this.settings.log({
      event: 'unexpected-error',
      level: 'error',
      reference,
      requestId: requestIdOf(request),
      error: error instanceof Error ? (error.stack ?? error.message) : String(error),
    });
    return new Problem(500, 'unexpected', 'Something went wrong on our side', {
      detail: `It was recorded under the reference ${reference}. Nothing was changed; please try again or report it.`,
      members: { reference },
    });
  }
}

export function problemBody(problem: Problem, request: Request): Record<string, unknown> {
  const { detail, errors, members } = problem.extras;
  return {
    type: 'about:blank',
    title: problem.title,
    status: problem.getStatus(),
    detail: detail ?? `${problem.title}.`,
    instance: request.path,
    code: problem.code,
    requestId: requestIdOf(request),
    ...members,
    ...(errors?.length ? { errors } : {}),
  };
}

function wrongMethod(request: Request): Problem | undefined {
  const allowed = allowedMethods(request);
  if (allowed.length === 0) return undefined;
  return new Problem(405, 'method-not-allowed', 'This address does not know that method', {
    detail: `${request.method} is not possible here; possible are ${allowed.join(', ')}.`,
    headers: { Allow: allowed.join(', ') },
  });
}
