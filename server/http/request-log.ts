import { randomUUID } from 'node:crypto';
import type { Request, RequestHandler, Response } from 'express';
import type { Logger } from '../logger';
import type { Caller } from './caller';

interface Noted {
  readonly requestId: string;
  route?: string;
  caller?: Caller;
}

const noted = new WeakMap<Response, Noted>();

/**
 * Gives every request an id, also in the header `holdoff-request`, and writes one line when it ends. The line names
 * the route as declared, not the address as asked, and no header: neither ids in a query nor secrets reach the log.
 */
export function logRequests(log: Logger): RequestHandler {
  return (request, response, next) => {
    const note: Noted = { requestId: randomUUID() };
    noted.set(response, note);
    response.setHeader('holdoff-request', note.requestId);
    const began = performance.now();
    response.once('close', () => writeLine(log, { request, response, note, ms: performance.now() - began }));
    next();
  };
}

export function requestIdOf(response: Response): string {
  return noted.get(response)?.requestId ?? 'none';
}

export function noteRoute(response: Response, route: string, caller: Caller | null): void {
  const note = noted.get(response);
  if (note === undefined) return;
  note.route = route;
  if (caller !== null) note.caller = caller;
}

interface Ended {
  readonly request: Request;
  readonly response: Response;
  readonly note: Noted;
  readonly ms: number;
}

function writeLine(log: Logger, { request, response, note, ms }: Ended): void {
  const { requestId, route, caller } = note;
  const line = {
    requestId,
    method: request.method,
    route: route ?? '(none)',
    status: response.statusCode,
    finished: response.writableFinished,
    ms: Math.round(ms * 10) / 10,
    lab: caller?.lab,
    device: caller?.device.id,
    person: caller?.person ?? undefined,
  };
  if (route === undefined) log.debug(line, 'request');
  else log.info(line, 'request');
}
