import express, { type Request, type RequestHandler, type Response, type Router } from 'express';
import type { Config } from '../config';
import type { Logger } from '../logger';
import type { Authenticate, Caller } from './caller';
import { readCookies, writeCookie } from './cookies';
import { guardOrigin, originOf } from './guards';
import { NoSuchRoute, NotAllowed, NotSignedIn, WrongMethod } from './problems';
import { readPart } from './read-request';
import { noteRoute, requestIdOf } from './request-log';
import type { Answer, HttpFacts, Permission, Route, StreamBody } from './route';

const usualMaxBytes = 32 * 1024;

export interface RouteHost {
  readonly http: Config['http'];
  readonly authenticate: Authenticate;
  readonly log: Logger;
}

/** The one wrapper around every handler: origin, token, role, body, answer. Errors go on to the translator. */
export function mountRoutes(router: Router, routes: readonly Route[], host: RouteHost): void {
  for (const route of routes) {
    const { method, path } = route.spec;
    const add = method === 'GET' ? router.get.bind(router) : router.post.bind(router);
    add(path, (request, response) => serve(route, { request, response }, host));
  }
  for (const path of new Set(routes.map((route) => route.spec.path))) {
    router.all(path, (request) => {
      throw new WrongMethod(`${request.method} is not taken here.`);
    });
  }
  router.use('/api', (request) => {
    throw new NoSuchRoute(`There is no ${request.method} ${request.baseUrl}${request.path}.`);
  });
}

interface Exchange {
  readonly request: Request;
  readonly response: Response;
}

async function serve(route: Route, { request, response }: Exchange, host: RouteHost): Promise<void> {
  const { spec } = route;
  const name = `${spec.method} ${spec.path}`;
  noteRoute(response, name, null);
  if (spec.method !== 'GET') guardOrigin(request, host.http);
  const caller = await callerOf(spec.permission, request, host.authenticate);
  noteRoute(response, name, caller);
  const json =
    spec.body === undefined ? undefined : await readJson(spec.maxBytes ?? usualMaxBytes, request, response);
  spec.beforeReading?.(json);
  const answer = await route.handle({
    caller,
    params: readPart(spec.params, request.params, 'path'),
    query: readPart(spec.query, request.query, 'query'),
    body: readPart(spec.body, json, 'body'),
    http: factsOf({ request, response }, host),
  });
  await send(route, answer, response);
}

async function callerOf(
  permission: Permission,
  request: Request,
  authenticate: Authenticate,
): Promise<Caller | null> {
  if (permission.who === 'anyone') return null;
  const token = /^Bearer ([\w\-.~+/=]+)$/.exec(request.headers.authorization ?? '')?.[1];
  if (token === undefined)
    throw new NotSignedIn('The header Authorization has to carry "Bearer <access token>".');
  const caller = await authenticate(token);
  if (permission.who === 'tablet') return caller;
  if (caller.person === null)
    throw new NotAllowed('This needs a person to be signed in, not only the tablet.');
  if (caller.role === null) throw new NotAllowed('You are no longer a member of this lab.');
  if (!permission.roles.includes(caller.role)) {
    throw new NotAllowed(`This is for: ${permission.roles.join(', ')}. Your role is ${caller.role}.`);
  }
  return caller;
}

function readJson(limit: number, request: Request, response: Response): Promise<unknown> {
  const read: RequestHandler = express.json({ limit, type: 'application/json' });
  return new Promise((resolve, reject) => {
    read(request, response, (error?: unknown) => {
      if (error === undefined) resolve(request.body);
      else reject(error instanceof Error ? error : new Error('the body could not be read'));
    });
  });
}

function factsOf({ request, response }: Exchange, { http, log }: RouteHost): HttpFacts {
  const hungUp = new AbortController();
  response.once('close', () => hungUp.abort());
  const requestId = requestIdOf(response);
  return {
    requestId,
    origin: originOf(request, http),
    ip: request.ip ?? '',
    cookies: readCookies(request.headers.cookie),
    signal: hungUp.signal,
    log: log.child({ requestId }),
  };
}

async function send(route: Route, answer: Answer<unknown>, response: Response): Promise<void> {
  response.setHeader('cache-control', 'no-store');
  for (const cookie of answer.cookies ?? []) response.append('set-cookie', writeCookie(cookie));
  const { answers } = route.spec;
  if (204 in answers) {
    response.status(204).end();
    return;
  }
  const shape = answers[200];
  if ('stream' in shape) {
    response.setHeader('content-type', shape.stream);
    response.setHeader('content-encoding', 'gzip');
    await (answer.body as StreamBody)(response);
    return;
  }
  response.status(200).json(answer.body);
}
