import * as z from 'zod/mini';
import type { Clock } from '../ports/ports';
import type { DeviceRecord } from '../store/book-keys';
import type { ApiClient, ApiOutcome, ApiRequest } from './api-client';
import { signNonce } from './device-key';

export type TokenOutcome =
  | { readonly type: 'token'; readonly token: string }
  | { readonly type: 'sign-in-needed'; readonly words: string }
  | { readonly type: 'revoked'; readonly words: string }
  | { readonly type: 'no-network'; readonly words: string };

export type LabOutcome<T> = ApiOutcome<T> | Exclude<TokenOutcome, { type: 'token' } | { type: 'no-network' }>;

/** Whose token: the tablet's own, or that of a person (protocol 4.2). */
export type Bearer = 'device' | { readonly person: string };

/** Tokens live ten minutes; counted by our own monotonic clock, a wrong wall clock cannot stretch that. */
const KEEP_MS = 8 * 60_000;

const nonceSchema = z.object({ nonce: z.string() });
const tokenSchema = z.object({ access_token: z.string() });

export interface TokenPorts {
  readonly api: ApiClient;
  readonly clock: Clock;
  readonly subtle: SubtleCrypto;
  readonly lab: string;
  readonly device: () => Promise<DeviceRecord | undefined>;
  readonly onPersonRefused: (person: string) => void;
  readonly onPersonAccepted: (person: string) => void;
}

export type Tokens = ReturnType<typeof createTokens>;

/** Access tokens in memory only, renewed by signing the server's nonce with the tablet's key (protocol 4.1). */
export function createTokens(ports: TokenPorts) {
  const held = new Map<string, { readonly token: string; readonly got_ms: number }>();
  const nameOf = (bearer: Bearer) => (bearer === 'device' ? 'device' : bearer.person);

  const get = async (bearer: Bearer): Promise<TokenOutcome> => {
    const kept = held.get(nameOf(bearer));
    if (kept !== undefined && ports.clock.monotonicMs() - kept.got_ms < KEEP_MS)
      return { type: 'token', token: kept.token };
    const outcome = await renew(ports, bearer);
    if (outcome.type === 'token') put(bearer, outcome.token);
    if (bearer !== 'device') {
      if (outcome.type === 'token') ports.onPersonAccepted(bearer.person);
      if (outcome.type === 'sign-in-needed') ports.onPersonRefused(bearer.person);
    }
    return outcome;
  };
  const put = (bearer: Bearer, token: string) => {
    held.set(nameOf(bearer), { token, got_ms: ports.clock.monotonicMs() });
  };
  const drop = (bearer: Bearer) => {
    held.delete(nameOf(bearer));
  };
  /** Asks with a token; one that the server no longer takes is renewed once. */
  const ask = async <T>(
    bearer: Bearer,
    work: (token: string) => Promise<ApiOutcome<T>>,
  ): Promise<LabOutcome<T>> => {
    for (let attempt = 0; ; attempt += 1) {
      const token = await get(bearer);
      if (token.type === 'no-network') return { ...token, foreign_status: null };
      if (token.type !== 'token') return token;
      const outcome = await work(token.token);
      if (outcome.type !== 'problem') return outcome;
      if (outcome.code === 'revoked') return { type: 'revoked', words: outcome.problem.detail };
      if (outcome.code !== 'not-signed-in' || attempt > 0) return outcome;
      drop(bearer);
    }
  };

  return {
    get,
    put,
    drop,
    dropAll: () => {
      held.clear();
    },
    holds: (bearer: Bearer) => held.has(nameOf(bearer)),
    request: <T>(bearer: Bearer, request: ApiRequest<T>) =>
      ask(bearer, (token) => ports.api.request({ ...request, token })),
    lines: (
      bearer: Bearer,
      request: Omit<ApiRequest<true>, 'schema'>,
      read: (line: string) => Promise<void>,
    ) => ask(bearer, (token) => ports.api.lines({ ...request, token }, read)),
  };
}

async function renew(ports: TokenPorts, bearer: Bearer): Promise<TokenOutcome> {
  const device = await ports.device();
  if (device === undefined || device.keys === null)
    return { type: 'sign-in-needed', words: 'This tablet has lost its key: sign in to send.' };
  const asked = await ports.api.request({
    method: 'POST',
    path: '/api/accounts/nonce',
    schema: nonceSchema,
  });
  if (asked.type !== 'ok') return refusal(asked);
  const { nonce } = asked.value;
  const person = bearer === 'device' ? null : bearer.person;
  const purpose = person === null ? 'device' : 'refresh';
  const { lab } = ports;
  const signature = await signNonce(ports.subtle, device.keys, {
    purpose,
    lab,
    device: device.id,
    person,
    nonce,
  });
  const place = { lab, device: device.id, nonce, signature };
  const outcome = await ports.api.request({
    method: 'POST',
    path: person === null ? '/api/accounts/device-token' : '/api/accounts/refresh',
    body: person === null ? place : { ...place, person },
    schema: tokenSchema,
  });
  return outcome.type === 'ok' ? { type: 'token', token: outcome.value.access_token } : refusal(outcome);
}

/** A server in trouble is no refusal: nobody is signed out because a database was down. */
function refusal(outcome: Exclude<ApiOutcome<unknown>, { type: 'ok' }>): TokenOutcome {
  if (outcome.type === 'no-network') return { type: 'no-network', words: outcome.words };
  const { code, problem } = outcome;
  if (code === 'revoked') return { type: 'revoked', words: problem.detail };
  if (problem.status >= 500 || problem.status === 429) return { type: 'no-network', words: problem.detail };
  return { type: 'sign-in-needed', words: problem.detail };
}
