import type { Writable } from 'node:stream';
import type * as z from 'zod/mini';
import type { Role } from '../../src/domain/book/bodies/people-bodies';
import type { Logger } from '../logger';
import type { Caller, PersonCaller } from './caller';

/** Who may use a route. There is no default: a route that does not say so does not compile. */
export type Permission =
  | { readonly who: 'anyone' }
  | { readonly who: 'tablet' }
  | { readonly who: 'person'; readonly roles: readonly Role[] };

export const ANYONE = { who: 'anyone' } as const;
export const TABLET = { who: 'tablet' } as const;
export const EVERY_ROLE = {
  who: 'person',
  roles: ['operator', 'reviewer', 'lead', 'reader'],
} as const satisfies Permission;
export const LEAD_ONLY = { who: 'person', roles: ['lead'] } as const satisfies Permission;

type CallerOf<P extends Permission> = P extends { who: 'anyone' }
  ? null
  : P extends { who: 'tablet' }
    ? Caller
    : PersonCaller;

/** What a handler may know of the connection. */
export interface HttpFacts {
  readonly requestId: string;
  /** The configured address under which the caller reached us. */
  readonly origin: string;
  readonly ip: string;
  readonly cookies: ReadonlyMap<string, string>;
  /** Aborted when the caller hangs up. */
  readonly signal: AbortSignal;
  readonly log: Logger;
}

export interface HandlerRequest<C, Params, Query, Body> {
  readonly caller: C;
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly http: HttpFacts;
}

export interface SetCookie {
  readonly name: string;
  /** Null takes the cookie away. */
  readonly value: string | null;
  readonly maxAge_s: number;
  readonly secure: boolean;
}

export interface Answer<T> {
  readonly body: T;
  readonly cookies?: readonly SetCookie[];
}

/** Body that is written piece by piece; the type is declared beside it. */
export type StreamBody = (to: Writable) => Promise<void>;

export type Answers<T> =
  | { readonly 200: z.ZodMiniType<T> }
  | { readonly 204: null }
  | { readonly 200: { readonly stream: 'application/jsonl' } };

export interface RouteSpec<P extends Permission, Params, Query, Body, T> {
  readonly method: 'GET' | 'POST';
  /** As Express writes it: `/api/desk/firings/:id`. */
  readonly path: string;
  readonly summary: string;
  readonly permission: P;
  readonly params?: z.ZodMiniType<Params>;
  readonly query?: z.ZodMiniType<Query>;
  readonly body?: z.ZodMiniType<Body>;
  /** Largest body, bytes, unpacked. */
  readonly maxBytes?: number;
  /** Looks at the parsed JSON before the schema does, to answer with a problem of its own. */
  readonly beforeReading?: (json: unknown) => void;
  readonly answers: Answers<T>;
  readonly handler: (request: HandlerRequest<CallerOf<P>, Params, Query, Body>) => Promise<Answer<T>>;
}

/** A route whose inner types nobody outside needs to know. */
export interface Route {
  readonly spec: Omit<
    RouteSpec<Permission, unknown, unknown, unknown, unknown>,
    'handler' | 'answers' | 'params' | 'query' | 'body'
  > & {
    readonly params?: z.ZodMiniType;
    readonly query?: z.ZodMiniType;
    readonly body?: z.ZodMiniType;
    readonly answers: Answers<unknown>;
  };
  readonly handle: (
    request: HandlerRequest<Caller | null, unknown, unknown, unknown>,
  ) => Promise<Answer<unknown>>;
}

export function declareRoute<
  P extends Permission,
  Params = undefined,
  Query = undefined,
  Body = undefined,
  T = null,
>(spec: RouteSpec<P, Params, Query, Body, T>): Route {
  const { handler, ...rest } = spec;
  return {
    spec: rest,
    // The wrapper has read each part by the very schema that gave it its type.
    handle: (request) => handler(request as HandlerRequest<CallerOf<P>, Params, Query, Body>),
  };
}
