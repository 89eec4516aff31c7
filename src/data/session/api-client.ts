import type * as z from 'zod/mini';
import { PROBLEM_PREFIX, problemSchema, type Problem } from '../../domain/handover/problem';
import type { Http, Timers } from '../ports/ports';

export const DEFAULT_TIMEOUT_MS = 15_000;

export interface ApiRequest<T> {
  readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  readonly path: string;
  readonly body?: unknown;
  readonly token?: string;
  /** Shape of a good answer; null where there is no body. */
  readonly schema: z.ZodMiniType<T> | null;
  readonly timeout_ms?: number;
  readonly signal?: AbortSignal;
}

export type ApiOutcome<T> =
  | { readonly type: 'ok'; readonly value: T }
  | {
      readonly type: 'problem';
      readonly code: string;
      readonly problem: Problem;
      readonly retry_after_s: number | null;
    }
  /** Nobody of ours answered: no connection, no answer in time, or a captive portal's page (protocol 3.7). */
  | { readonly type: 'no-network'; readonly words: string; readonly foreign_status: number | null };

export interface ApiClient {
  readonly request: <T>(request: ApiRequest<T>) => Promise<ApiOutcome<T>>;
  /** The answer's lines as they arrive; `ok` carries true once the last has been read. */
  readonly lines: (
    request: Omit<ApiRequest<true>, 'schema'>,
    read: (line: string) => Promise<void>,
  ) => Promise<ApiOutcome<true>>;
}

export function createApiClient(http: Http, timers: Timers): ApiClient {
  return {
    request: (request) =>
      exchange(timers, request, async (signal) => {
        const response = await http(request.path, toHttp(request, signal));
        return response.ok ? await readGood(response, request.schema) : await readBad(response);
      }),
    lines: (request, read) =>
      exchange(timers, request, async (signal) => {
        const response = await http(request.path, toHttp(request, signal));
        if (!response.ok) return await readBad(response);
        await eachLine(response, read);
        return { type: 'ok', value: true };
      }),
  };
}

async function exchange<T>(
  timers: Timers,
  { timeout_ms = DEFAULT_TIMEOUT_MS, signal }: Pick<ApiRequest<T>, 'timeout_ms' | 'signal'>,
  work: (signal: AbortSignal) => Promise<ApiOutcome<T>>,
): Promise<ApiOutcome<T>> {
  const stop = new AbortController();
  const passOn = () => {
    stop.abort();
  };
  const callOff = timers.after(timeout_ms, passOn);
  signal?.addEventListener('abort', passOn);
  if (signal?.aborted === true) passOn();
  try {
    return await work(stop.signal);
  } catch (error) {
    return noNetwork(`The server cannot be reached (${wordsOf(error)}).`);
  } finally {
    callOff();
    signal?.removeEventListener('abort', passOn);
  }
}

function toHttp({ method, body, token }: Omit<ApiRequest<unknown>, 'schema'>, signal: AbortSignal) {
  const headers: Record<string, string> = { accept: 'application/json', 'holdoff-protocol': '1' };
  if (method !== 'GET') headers['content-type'] = 'application/json';
  if (token !== undefined) headers['authorization'] = `Bearer ${token}`;
  return { method, headers, body: method === 'GET' ? null : JSON.stringify(body ?? {}), signal };
}

async function readGood<T>(response: Response, schema: z.ZodMiniType<T> | null): Promise<ApiOutcome<T>> {
  // Without a schema nothing is read, and `null` is all that the caller can see.
  if (schema === null) return { type: 'ok', value: null as T };
  const parsed = schema.safeParse(asJson(await response.text()));
  return parsed.success ? { type: 'ok', value: parsed.data } : foreign(response.status);
}

async function readBad<T>(response: Response): Promise<ApiOutcome<T>> {
  const parsed = problemSchema.safeParse(asJson(await response.text()));
  if (!parsed.success) return foreign(response.status);
  const retry = Number(response.headers.get('retry-after') ?? Number.NaN);
  return {
    type: 'problem',
    code: parsed.data.type.slice(PROBLEM_PREFIX.length),
    problem: parsed.data,
    retry_after_s: Number.isFinite(retry) ? retry : null,
  };
}

async function eachLine(response: Response, read: (line: string) => Promise<void>): Promise<void> {
  const reader = response.body?.getReader();
  const decoder = new TextDecoder();
  let rest = '';
  for (;;) {
    const chunk = await reader?.read();
    if (chunk === undefined || chunk.done) break;
    const parts = (rest + decoder.decode(chunk.value, { stream: true })).split('\n');
    rest = parts.pop() ?? '';
    for (const line of parts) if (line !== '') await read(line);
  }
  if (rest !== '') await read(rest);
}

function asJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

function foreign<T>(status: number): ApiOutcome<T> {
  return {
    type: 'no-network',
    words: 'Something else than the Holdoff server answers on this network.',
    foreign_status: status,
  };
}

function noNetwork<T>(words: string): ApiOutcome<T> {
  return { type: 'no-network', words, foreign_status: null };
}

function wordsOf(error: unknown): string {
  if (!(error instanceof Error)) return 'no connection';
  return error.name === 'AbortError' ? 'no answer in time' : error.message;
}
