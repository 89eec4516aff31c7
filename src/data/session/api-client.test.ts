import { describe, expect, it } from 'vitest';
import * as z from 'zod/mini';
import { settle, virtualTime } from '../fakes/virtual-time';
import type { Http, HttpRequest } from '../ports/ports';
import { createApiClient } from './api-client';

const schema = z.object({ value: z.int() });
const ask = { method: 'GET', path: '/api/x', schema } as const;

function client(http: Http) {
  const time = virtualTime();
  return { time, api: createApiClient(http, time.timers) };
}

function answers(body: string, init: ResponseInit = {}): Http {
  return () => Promise.resolve(new Response(body, init));
}

const problem = {
  type: 'urn:holdoff:problem:slow-down',
  title: 'Too many attempts',
  status: 429,
  detail: 'Try again in 20 s.',
  request_id: 'r1',
};

describe('answers of the server', () => {
  it('are read by their schema', async () => {
    expect(await client(answers('{"value":3}')).api.request(ask)).toEqual({
      type: 'ok',
      value: { value: 3 },
    });
  });

  it('are problems of our own type, with the wait that they ask for', async () => {
    const { api } = client(
      answers(JSON.stringify(problem), { status: 429, headers: { 'retry-after': '20' } }),
    );
    expect(await api.request(ask)).toEqual({
      type: 'problem',
      code: 'slow-down',
      problem,
      retry_after_s: 20,
    });
  });

  it.each([
    ['a captive portal’s page', answers('<html>terms</html>', { status: 200 }), 200],
    ['JSON of another shape', answers('{"value":"3"}'), 200],
    ['a proxy’s 502', answers('Bad gateway', { status: 502 }), 502],
    [
      'somebody else’s problem',
      answers('{"type":"about:blank","title":"no","status":413}', { status: 413 }),
      413,
    ],
  ])('are no network when they are %s', async (_name, http, foreign_status) => {
    expect(await client(http).api.request(ask)).toMatchObject({ type: 'no-network', foreign_status });
  });

  it('are given up after 15 s', async () => {
    const never: Http = (_path, { signal }) =>
      new Promise((_resolve, reject) => {
        signal.addEventListener('abort', () => {
          reject(new DOMException('aborted', 'AbortError'));
        });
      });
    const { time, api } = client(never);
    let outcome: unknown = null;
    void api.request(ask).then((value) => (outcome = value));
    await time.pass(14_999);
    expect(outcome).toBeNull();
    await time.pass(1);
    expect(outcome).toMatchObject({
      type: 'no-network',
      words: expect.stringContaining('no answer in time'),
    });
  });

  it('come line by line, whole lines only, however the pieces fall', async () => {
    const text = '{"a":"µΩ"}\n{"b":2}\n{"end":true}\n';
    const bytes = new TextEncoder().encode(text);
    const http: Http = () =>
      Promise.resolve(
        new Response(
          new ReadableStream({
            start: (controller) => {
              for (let at = 0; at < bytes.length; at += 3) controller.enqueue(bytes.slice(at, at + 3));
              controller.close();
            },
          }),
        ),
      );
    const lines: string[] = [];
    const { api } = client(http);
    expect(
      await api.lines({ method: 'GET', path: '/api/x' }, (line) => {
        lines.push(line);
        return Promise.resolve();
      }),
    ).toEqual({ type: 'ok', value: true });
    expect(lines).toEqual(['{"a":"µΩ"}', '{"b":2}', '{"end":true}']);
  });
});

describe('requests', () => {
  it('carry what the server asks of every change, and the token', async () => {
    const seen: HttpRequest[] = [];
    const { api } = client((_path, request) => {
      seen.push(request);
      return Promise.resolve(new Response('{"value":1}'));
    });
    await api.request({ ...ask, method: 'POST', body: { a: 1 }, token: 't' });
    await settle();
    expect(seen[0]?.headers).toMatchObject({
      'holdoff-protocol': '1',
      'content-type': 'application/json',
      authorization: 'Bearer t',
    });
    expect(seen[0]?.body).toBe('{"a":1}');
  });
});
