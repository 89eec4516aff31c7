import type { Request, Response } from 'express';
import { PROBLEM_PREFIX, type Problem } from '../../src/domain/handover/problem';
import { isDatabaseError, withoutValues } from '../db/database-errors';
import type { Logger } from '../logger';
import { Fault, HttpProblem, NotJson, TooLarge, Unavailable, Unreadable } from './problems';
import { requestIdOf } from './request-log';

export interface Failed {
  readonly request: Request;
  readonly response: Response;
  readonly error: unknown;
}

/** The one place that turns what was thrown into an answer. */
export function answerProblem(log: Logger, { request, response, error }: Failed): void {
  const requestId = requestIdOf(response);
  const problem = toProblem(error);
  if (problem.status >= 500)
    log.error(
      { requestId, error: withoutValues(error), path: request.path },
      'A request failed unexpectedly',
    );
  if (response.headersSent) {
    response.destroy();
    return;
  }
  response
    .status(problem.status)
    .set({ ...problem.headers, 'cache-control': 'no-store' })
    .type('application/problem+json')
    .send(JSON.stringify(asBody(problem, requestId)));
}

export function toProblem(error: unknown): HttpProblem {
  if (error instanceof HttpProblem) return error;
  if (isDatabaseError(error)) {
    return new Unavailable('The database did not answer as it should. Nothing was changed; send it again.');
  }
  return bodyProblem(error) ?? new Fault('Something unexpected happened. Nothing was changed.');
}

/** What the body parser throws. */
function bodyProblem(error: unknown): HttpProblem | undefined {
  if (!(error instanceof Error) || !('type' in error)) return undefined;
  switch (error.type) {
    case 'entity.too.large':
      return new TooLarge('The body is larger than this address takes.');
    case 'entity.parse.failed':
      return new Unreadable('The body is not JSON.');
    case 'charset.unsupported':
    case 'encoding.unsupported':
      return new NotJson('The body has to be JSON in UTF-8, plain or gzip.');
    case 'request.aborted':
    case 'request.size.invalid':
      return new Unreadable('The body did not arrive whole.');
    default:
      return undefined;
  }
}

function asBody(problem: HttpProblem, request_id: string): Problem {
  const { code, title, status, message, fields } = problem;
  const body = { type: `${PROBLEM_PREFIX}${code}`, title, status, detail: message, request_id };
  return fields === undefined ? body : { ...body, fields: { ...fields } };
}
