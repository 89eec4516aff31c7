import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Problem } from '../../src/domain/handover/problem';
import { createTestLab, TEST_PASSWORD, type TestLab, type TestPerson } from '../../tests/support/test-lab';
import { startTestServer, type TestServer } from '../../tests/support/test-server';
import { ask, TestTablet, type ApiAnswer } from '../../tests/support/test-tablet';
import { signInAnswerSchema } from './account-shapes';

const minute = 60_000;

describe('accounts', () => {
  let server: TestServer;
  let lab: TestLab;
  let ada: TestPerson;
  let clock_ms = Date.now();
  beforeAll(async () => {
    server = await startTestServer({ now: () => clock_ms });
    lab = await createTestLab(server);
    ada = await lab.join('operator', 'Ada');
  });
  afterAll(() => server.stop());

  const codeOf = (answer: ApiAnswer<unknown>) => [
    answer.status,
    (answer.body as Problem).type.split(':').at(-1),
  ];
  const audited = async (what: string) =>
    server.context.database('audit').select('audit.device', 'audit.person').where({ what });

  describe('POST /api/accounts/sign-in', () => {
    it('signs a person in, enrols the tablet by its key and gives it the next letter', async () => {
      const tablet = new TestTablet(server.url);
      const answer = await tablet.signIn(` ${ada.email.toUpperCase()} `, TEST_PASSWORD);
      expect(answer.status).toBe(200);
      expect(signInAnswerSchema.parse(answer.body)).toMatchObject({
        person: { id: ada.id, name: 'Ada' },
        labs: [{ id: lab.id, name: 'Test bench', role: 'operator' }],
        lab: { id: lab.id, epoch: lab.epoch },
        device: { name: 'Test tablet' },
      });
      const next = await lab.tablet(ada);
      expect(next.device).not.toBe(tablet.device);
      expect(next.letter).not.toBe(tablet.letter);
      expect(next.letter).toMatch(/^[A-Z]+$/);
    });

    it('keeps a known key its tablet and letter, and gives the second person a grant on it', async () => {
      const tablet = await lab.tablet(ada);
      const before = [tablet.device, tablet.letter];
      const milo = await lab.join('reviewer', 'Milo');
      await tablet.signIn(milo.email, TEST_PASSWORD);
      expect([tablet.device, tablet.letter]).toEqual(before);
      const grants = await server.context
        .database('grants')
        .select('grants.person')
        .where({ device: tablet.device });
      expect(grants.map((one: { person: string }) => one.person).toSorted()).toEqual(
        [ada.id, milo.id].toSorted(),
      );
    });

    it('enrols a tablet once when it signs in twice at the same time', async () => {
      const tablet = new TestTablet(server.url);
      const answers = await Promise.all([1, 2, 3].map(() => tablet.signIn(ada.email, TEST_PASSWORD)));
      expect(new Set(answers.map((one) => one.body.device.id)).size).toBe(1);
    });

    it('sets the session’s cookie for this site and HTTP alone, under a name that carries the port', async () => {
      const tablet = new TestTablet(server.url);
      const answer = await tablet.signIn(ada.email, TEST_PASSWORD);
      const [cookie = ''] = answer.headers.getSetCookie();
      const port = new URL(server.url).port;
      expect(cookie.startsWith(`holdoff-${port}-${lab.id.slice(0, 8)}-${ada.id.slice(0, 8)}=`)).toBe(true);
      expect(cookie).toContain('; HttpOnly; SameSite=Strict');
      const rows = await server.context.database('refresh_tokens').select('refresh_tokens.token_sha');
      const value = cookie.split(/[=;]/)[1] ?? 'none';
      expect(JSON.stringify(rows)).not.toContain(value);
    });

    it('says the same of a wrong password, an unknown address and a lab that is not theirs', async () => {
      const tablet = new TestTablet(server.url);
      const other = await createTestLab(server);
      const answers = [
        await tablet.signIn(ada.email, 'wrong'),
        await tablet.signIn('nobody@bench.example', TEST_PASSWORD),
        await tablet.signIn(ada.email, TEST_PASSWORD, { lab: other.id }),
      ];
      const problems = answers.map((one) => one.body as unknown as Problem);
      expect(answers.map(codeOf)).toEqual(Array.from({ length: 3 }, () => [401, 'sign-in-refused']));
      expect(new Set(problems.map((one) => one.detail)).size).toBe(1);
    });

    it('refuses a key that is no point of the curve, and one that is none at all', async () => {
      const tablet = new TestTablet(server.url);
      const wrong = { ...tablet.publicKey, x: 'A'.repeat(43) };
      const answer = await tablet.signIn(ada.email, TEST_PASSWORD, { public_key: wrong });
      expect(codeOf(answer)).toEqual([400, 'unreadable']);
      const none = await tablet.signIn(ada.email, TEST_PASSWORD, { public_key: { kty: 'RSA' } });
      expect(Object.keys((none.body as unknown as Problem).fields ?? {})).toContain('body.public_key.kty');
    });

    it('asks to slow down after ten tries, with the right password as well, and forgets after a quarter of an hour', async () => {
      const person = await lab.join('operator', 'Slow');
      const tablet = new TestTablet(server.url);
      for (let at = 0; at < 10; at++) expect((await tablet.signIn(person.email, 'wrong')).status).toBe(401);
      const refused = await tablet.signIn(person.email, TEST_PASSWORD);
      expect(codeOf(refused)).toEqual([429, 'slow-down']);
      expect(Number(refused.headers.get('retry-after'))).toBeGreaterThan(0);
      // A second server on the same database counts on where this one was.
      const second = await startTestServer({ database: server.config.database, now: () => clock_ms });
      expect((await new TestTablet(second.url).signIn(person.email, TEST_PASSWORD)).status).toBe(429);
      await second.stop();
      clock_ms += 16 * minute;
      expect((await tablet.signIn(person.email, TEST_PASSWORD)).status).toBe(200);
    });

    it('lets a revoked key in no more', async () => {
      const tablet = await lab.tablet(ada);
      await server.context.database('devices').where({ id: tablet.device }).update({ revoked_ms: 1 });
      expect(codeOf(await tablet.signIn(ada.email, TEST_PASSWORD))).toEqual([403, 'revoked']);
    });
  });

  describe('POST /api/accounts/refresh', () => {
    it('gives the next access token for cookie and signature, again and again with the same cookie', async () => {
      const tablet = await lab.tablet(ada);
      const first = await tablet.refresh();
      expect([first.status, first.body.role]).toEqual([200, 'operator']);
      expect(first.headers.getSetCookie()).toEqual([]);
      expect((await tablet.refresh()).status).toBe(200);
      tablet.token = first.body.access_token;
      expect((await tablet.hello()).status).toBe(200);
    });

    it('refuses a stolen cookie under another key, reports it, and leaves the owner signed in', async () => {
      const owner = await lab.tablet(ada);
      const thief = new TestTablet(server.url);
      Object.assign(thief, { lab: owner.lab, person: owner.person, device: owner.device });
      for (const [name, value] of owner.cookies) thief.cookies.set(name, value);
      const before = (await audited('refresh-under-another-key')).length;
      expect(codeOf(await thief.refresh())).toEqual([401, 'refresh-refused']);
      expect(await audited('refresh-under-another-key')).toHaveLength(before + 1);
      const enrolled = await lab.tablet(await lab.join('operator', 'Eve'));
      for (const [name, value] of owner.cookies) enrolled.cookies.set(name, value);
      enrolled.person = owner.person;
      expect(codeOf(await enrolled.refresh())).toEqual([401, 'refresh-refused']);
      expect((await owner.refresh()).status).toBe(200);
    });

    it('refuses an old or made-up nonce, no cookie, and a session of more than 180 days', async () => {
      const tablet = await lab.tablet(ada);
      const { lab: labId, person, device } = tablet;
      const ask1 = (nonce: string, cookie = tablet.cookieHeader()) =>
        ask(server.url, '/api/accounts/refresh', {
          body: {
            lab: labId,
            person,
            device,
            nonce,
            signature: tablet.signWords(`holdoff refresh\n${labId}\n${device}\n${person}\n${nonce}`),
          },
          cookie,
        });
      const old = await tablet.nonce();
      clock_ms += 61_000;
      expect(codeOf(await ask1(old))).toEqual([401, 'refresh-refused']);
      expect(codeOf(await ask1('A'.repeat(75)))).toEqual([401, 'refresh-refused']);
      expect(codeOf(await ask1(await tablet.nonce(), ''))).toEqual([401, 'refresh-refused']);
      clock_ms += 181 * 24 * 60 * minute;
      expect(codeOf(await tablet.refresh())).toEqual([401, 'refresh-refused']);
    });

    it('refuses whoever was removed from the lab, and whoever’s tablet was revoked', async () => {
      const lead = await lab.tablet(lab.lead);
      const person = await lab.join('operator', 'Removed');
      const tablet = await lab.tablet(person);
      const { result } = await lead.write('person.removed', person.id, { why: 'Left' });
      expect(result.outcome).toBe('applied');
      expect(codeOf(await tablet.refresh())).toEqual([403, 'not-allowed']);
      expect(codeOf(await ask(server.url, '/api/accounts/me', { token: tablet.token }))).toEqual([
        403,
        'not-allowed',
      ]);
      const other = await lab.tablet(ada);
      await server.context.database('devices').where({ id: other.device }).update({ revoked_ms: 1 });
      expect(codeOf(await other.refresh())).toEqual([403, 'revoked']);
    });
  });

  describe('tokens', () => {
    it('gives the tablet a token of its own that hands over but is no person', async () => {
      const tablet = await lab.tablet(ada);
      const token = await tablet.deviceToken();
      const pull = await ask(server.url, `/api/handover/pull?since=0&hash=${'0'.repeat(64)}`, { token });
      expect(pull.status).toBe(200);
      for (const path of ['/api/accounts/me', '/api/desk/waiting', '/api/crew']) {
        expect([path, ...codeOf(await ask(server.url, path, { token }))]).toEqual([path, 403, 'not-allowed']);
      }
      const thief = new TestTablet(server.url);
      Object.assign(thief, { lab: tablet.lab, device: tablet.device });
      expect(await thief.deviceToken()).toBeUndefined();
    });

    it('knows an access token for ten minutes, and no token of another algorithm, use or maker', async () => {
      const tablet = await lab.tablet(ada);
      clock_ms += 9 * minute;
      expect((await tablet.hello()).status).toBe(200);
      clock_ms += 2 * minute;
      expect(codeOf(await tablet.hello())).toEqual([401, 'not-signed-in']);
      const [, payload = ''] = tablet.token.split('.');
      const none = Buffer.from('{"alg":"none","typ":"at+jwt"}').toString('base64url');
      for (const token of [`${none}.${payload}.`, 'x', `${payload}.${payload}.${payload}`]) {
        expect(codeOf(await ask(server.url, '/api/accounts/me', { token }))).toEqual([401, 'not-signed-in']);
      }
    });

    it('reads the role at each request, not from the token', async () => {
      const lead = await lab.tablet(lab.lead);
      const person = await lab.join('operator', 'Rising');
      const tablet = await lab.tablet(person);
      const me = () => ask<{ role: string }>(server.url, '/api/accounts/me', { token: tablet.token });
      expect((await me()).body.role).toBe('operator');
      await lead.write('person.role-set', person.id, { role: 'reviewer' });
      expect((await me()).body).toMatchObject({
        role: 'reviewer',
        person: { name: 'Rising' },
        lab: { id: lab.id },
      });
    });

    it('ends a session on signing out, and keeps the grant', async () => {
      const tablet = await lab.tablet(ada);
      const answer = await ask(server.url, '/api/accounts/sign-out', {
        token: tablet.token,
        body: {},
        cookie: tablet.cookieHeader(),
      });
      expect(answer.status).toBe(204);
      expect(answer.headers.getSetCookie()[0]).toContain('Max-Age=0');
      expect(codeOf(await tablet.refresh())).toEqual([401, 'refresh-refused']);
      const grants = await server.context
        .database('grants')
        .select('grants.person')
        .where({ device: tablet.device });
      expect(grants).toHaveLength(1);
    });
  });

  it('writes no token, cookie or password into the log', async () => {
    const tablet = await lab.tablet(ada);
    await tablet.refresh();
    const log = JSON.stringify(server.logged());
    for (const secret of [TEST_PASSWORD, tablet.token, ...tablet.cookies.values()])
      expect(log).not.toContain(secret);
    expect(log).toContain('POST /api/accounts/refresh');
  });
});
