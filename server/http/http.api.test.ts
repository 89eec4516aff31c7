import { mkdtemp, mkdir, rm, writeFile } from 'node:fs/promises';
import { request } from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { problemSchema, type Problem } from '../../src/domain/handover/problem';
import { startTestServer, type TestServer } from '../../tests/support/test-server';
import { ask } from '../../tests/support/test-tablet';

describe('the server over HTTP', () => {
  let server: TestServer;
  let client: string;
  beforeAll(async () => {
    client = await mkdtemp(path.join(tmpdir(), 'holdoff-client-'));
    await mkdir(path.join(client, 'assets'));
    await writeFile(path.join(client, 'index.html'), '<!doctype html><title>Holdoff</title>');
    await writeFile(path.join(client, 'sw.js'), '/* worker */');
    await writeFile(path.join(client, 'assets', 'main-abc123.js'), '/* main */');
    server = await startTestServer({ clientFolder: client });
  });
  afterAll(async () => {
    await server.stop();
    await rm(client, { recursive: true, force: true });
  });

  const nonce = (headers: Record<string, string>, body: unknown = {}) =>
    ask<Problem>(server.url, '/api/accounts/nonce', { body, headers });
  const codeOf = ({ status, body }: { status: number; body: Problem }) => [
    status,
    body.type.split(':').at(-1),
  ];

  it('says that it runs and that its database answers', async () => {
    expect((await ask(server.url, '/api/health')).body).toEqual({ state: 'ok' });
    expect((await ask(server.url, '/api/ready')).body).toEqual({ state: 'ok' });
  });

  it('answers what it does not have with a problem that names the request', async () => {
    const answer = await ask<Problem>(server.url, '/api/nothing/here');
    expect(codeOf(answer)).toEqual([404, 'no-such-route']);
    expect(problemSchema.parse(answer.body).request_id).toBe(answer.headers.get('holdoff-request'));
    expect(answer.headers.get('content-type')).toContain('application/problem+json');
    expect(codeOf(await ask(server.url, '/api/handover/push'))).toEqual([405, 'wrong-method']);
    expect(
      codeOf(await ask(server.url, '/api/crew/tablets/%E0%A4%A/revoke', { body: {} }))[0],
    ).toBeGreaterThanOrEqual(400);
  });

  it('answers only under its own name', async () => {
    const status = await new Promise<number | undefined>((resolve, reject) => {
      request(`${server.url}/api/health`, { headers: { host: 'evil.example' } }, (answer) => {
        answer.resume();
        resolve(answer.statusCode);
      })
        .on('error', reject)
        .end();
    });
    expect(status).toBe(421);
  });

  it('takes a change only from its own pages, as JSON, with the header of the protocol', async () => {
    expect((await nonce({})).status).toBe(200);
    expect((await nonce({ 'sec-fetch-site': 'same-origin', origin: 'null' })).status).toBe(200);
    expect(codeOf(await nonce({ origin: 'https://evil.example' }))).toEqual([403, 'foreign-origin']);
    expect(codeOf(await nonce({ 'sec-fetch-site': 'cross-site' }))).toEqual([403, 'foreign-origin']);
    expect(codeOf(await nonce({ 'sec-fetch-site': 'same-site' }))).toEqual([403, 'foreign-origin']);
    expect(codeOf(await nonce({ 'content-type': 'text/plain' }))).toEqual([415, 'not-json']);
    const bare = await fetch(`${server.url}/api/accounts/nonce`, {
      method: 'POST',
      headers: { origin: server.url, 'content-type': 'application/json' },
      body: '{}',
    });
    expect(bare.status).toBe(403);
    expect(codeOf(await nonce({}, '{"a":'))).toEqual([400, 'unreadable']);
    expect(codeOf(await nonce({}, { a: 'x'.repeat(40_000) }))).toEqual([413, 'too-large']);
  });

  it('describes every route that it has', async () => {
    const { body } = await ask<{ openapi: string; paths: Record<string, Record<string, unknown>> }>(
      server.url,
      '/api/openapi.json',
    );
    expect(body.openapi).toBe('3.1.0');
    const described = Object.entries(body.paths).flatMap(([at, methods]) =>
      Object.keys(methods).map((method) => `${method.toUpperCase()} ${at}`),
    );
    const declared = server.context.routes.map(
      ({ spec }) => `${spec.method} ${spec.path.replace(':id', '{id}')}`,
    );
    expect(described).toEqual(expect.arrayContaining(declared));
    expect(body.paths['/api/handover/push']?.['post']).toMatchObject({
      'x-permission': 'tablet',
      requestBody: { content: { 'application/json': { schema: { type: 'object', required: ['entries'] } } } },
    });
    expect(body.paths['/api/desk/firings/{id}']?.['get']).toMatchObject({
      parameters: [{ name: 'id', in: 'path', required: true }],
    });
  });

  it('serves the client: the page for any address of it, hashed files for ever, the worker never from a cache', async () => {
    const get = (at: string) => fetch(`${server.url}${at}`);
    const page = await get('/bench/some/rig');
    expect(await page.text()).toContain('Holdoff');
    expect(page.headers.get('cache-control')).toBe('no-cache');
    expect(page.headers.get('content-security-policy')).toContain("script-src 'self'");
    expect(page.headers.get('content-security-policy')).not.toContain("script-src 'self' 'unsafe-inline'");
    const asset = await get('/assets/main-abc123.js');
    expect(asset.headers.get('cache-control')).toContain('immutable');
    expect((await get('/sw.js')).headers.get('cache-control')).toBe('no-cache');
    for (const missing of ['/assets/main-old.js', '/assets/', '/nothing.js']) {
      expect([missing, (await get(missing)).status]).toEqual([missing, 404]);
    }
    expect((await get('/../package.json')).status).toBe(404);
  });

  it('writes one line per request, with its id and the route as declared', async () => {
    const answer = await ask(server.url, '/api/desk/firings/0b0e7f6e-1111-4111-8111-000000000000?x=secret');
    const line = server.logged().find((one) => one['requestId'] === answer.headers.get('holdoff-request'));
    expect(line).toMatchObject({ route: 'GET /api/desk/firings/:id', status: 401, method: 'GET' });
    expect(JSON.stringify(server.logged())).not.toContain('secret');
  });
});
