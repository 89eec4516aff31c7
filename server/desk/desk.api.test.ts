import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Problem } from '../../src/domain/handover/problem';
import {
  crewAnswerSchema,
  entriesAnswerSchema,
  firingAnswerSchema,
  firingListSchema,
  heldBackAnswerSchema,
  rigReportSchema,
  waitingAnswerSchema,
  type WaitingItem,
} from '../../src/domain/report/desk-shapes';
import { derivedRows } from '../../src/domain/report/derived-rows';
import { rigDerived } from '../../src/domain/rules/rig-derived';
import { openTestFiring, type TestBench } from '../../tests/support/test-bench';
import { createTestLab, testSettings, testSpec, type TestLab } from '../../tests/support/test-lab';
import { startTestServer, type TestServer } from '../../tests/support/test-server';
import { ask, type TestTablet } from '../../tests/support/test-tablet';

describe('the Desk and Crew', () => {
  let server: TestServer;
  let lab: TestLab;
  let bench: TestBench;
  let reviewer: TestTablet;
  beforeAll(async () => {
    server = await startTestServer();
    lab = await createTestLab(server);
    bench = await openTestFiring(lab);
    reviewer = bench.reviewer;
  });
  afterAll(() => server.stop());

  const get = (path: string, token = reviewer.token) => ask<unknown>(server.url, path, { token });
  const waiting = async (): Promise<readonly WaitingItem[]> =>
    waitingAnswerSchema.parse((await get('/api/desk/waiting')).body).waiting;
  const waitingOf = async (id: string) => (await waiting()).filter((one) => one.id === id);

  it('gives a rig on paper with the digits that the tablet computes, and where it stands in the Book', async () => {
    const answer = await get(`/api/desk/rigs/${bench.rig}/report`);
    expect(answer.status).toBe(200);
    const report = rigReportSchema.parse(answer.body);
    const here = rigDerived(testSpec, testSettings);
    expect(report.rows.map(({ key, value }) => [key, value])).toEqual(
      derivedRows(here).map(({ key, value }) => [key, value]),
    );
    expect(report).toMatchObject({ name: 'Kettle', book: { epoch: lab.epoch } });
    expect(Number(report.gap.low)).toBeLessThan(Number(report.gap.law));
    expect((await get(`/api/desk/rigs/${randomUUID()}/report`)).status).toBe(404);
  });

  it('shows a firing from its closing to its review, with where it stands in the Book', async () => {
    const { operator, firing, read } = bench;
    await read();
    expect(await waitingOf(firing)).toEqual([]);
    const closed = await operator.write('firing.closed', firing, { summary: 'Even throughout' });
    expect(await waitingOf(firing)).toMatchObject([
      {
        type: 'firing',
        rig: bench.rig,
        rig_name: 'Kettle',
        number: `${operator.letter}-1`,
        count: 1,
        irregular: 0,
        by: operator.person,
        revision: closed.result.revision,
      },
    ]);
    const found = firingAnswerSchema.parse((await get(`/api/desk/firings/${firing}`)).body);
    expect(found).toMatchObject({
      firing: { id: firing, readings: 1 },
      rig: { id: bench.rig },
      check: { id: bench.check },
      sheet: { kind: 'sheet' },
      readings: [{ no: 1, parent: firing }],
      book: { epoch: lab.epoch, revision: closed.result.revision },
      people: { [operator.person]: 'Ada' },
    });
    expect(found.entries.map((one) => [one.kind, one.letter, one.verdict])).toEqual(
      ['firing.opened', 'firing.reading', 'firing.closed'].map((kind) => [kind, operator.letter, 'applied']),
    );
    expect(found.entries.at(-1)?.chain_hash).toBe(found.book.hash);
    const reviewed = await reviewer.write('firing.reviewed', firing, {
      words: 'Seen',
      left_out: [],
      seen_revision: found.book.revision,
      seen_hash: found.book.hash,
    });
    expect(reviewed.result.outcome).toBe('applied');
    expect(await waitingOf(firing)).toEqual([]);
    const list = firingListSchema.parse(
      (await get(`/api/desk/firings?state=reviewed&rig=${bench.rig}`)).body,
    );
    expect(list.firings).toMatchObject([
      { firing: { id: firing }, rig_name: 'Kettle', revision: reviewed.result.revision },
    ]);
    expect(list.people[reviewer.person]).toBe('Milo');
  });

  it('shows firings recorded as unready and irregular ones, while they are still open', async () => {
    const { operator, rig } = bench;
    const unready = await operator.write('firing.opened', null, {
      number: `${operator.letter}-2`,
      rig,
      rig_revision: rig,
      check: null,
      permit: null,
      unready: { missing: [{ code: 'no-check', words: 'No check' }], why: 'One shot for the timing' },
    });
    expect(await waitingOf(unready.entry.id)).toMatchObject([
      { type: 'unready', words: 'One shot for the timing' },
    ]);
    const irregular = await operator.write('firing.opened', null, {
      number: `${operator.letter}-3`,
      rig,
      rig_revision: rig,
      check: null,
      permit: null,
      unready: null,
    });
    expect(irregular.result.outcome).toBe('irregular');
    expect(await waitingOf(irregular.entry.id)).toMatchObject([{ type: 'irregular' }]);
  });

  it('shows permits asked, incidents, partings, held-back entries and irregular ones outside a firing', async () => {
    const { operator, rig } = bench;
    const asked = await operator.write('permit.asked', rig, { rig_revision: rig, words: 'For Tuesday' });
    expect(await waitingOf(asked.entry.id)).toMatchObject([
      { type: 'permit-asked', rig, number: '1A', words: 'For Tuesday' },
    ]);
    const incident = await operator.write('incident.reported', rig, {
      what: 'Puncture at C1',
      near: '',
      made_safe: '',
      stand_down: null,
    });
    expect(await waitingOf(incident.entry.id)).toMatchObject([{ type: 'incident', words: 'Puncture at C1' }]);
    const held = await operator.write('rig.returned', rig, { lifts: [incident.entry.id], words: 'Mended' });
    expect(held.result.outcome).toBe('held-back');
    expect(await waitingOf(held.entry.id)).toMatchObject([
      { type: 'held-back', rig, kind: 'rig.returned', by: operator.person },
    ]);
    const list = heldBackAnswerSchema.parse((await get('/api/desk/held-back')).body);
    expect(list.held.map((one) => one.id)).toContain(held.entry.id);
    const spec = { ...testSpec, envelope: { ...testSpec.envelope, max_kV: 20 } };
    await operator.write('rig.revised', rig, { number: '2A', based_on: rig, spec, why: 'One' });
    await operator.write('rig.revised', rig, { number: '2B', based_on: rig, spec, why: 'Other' });
    expect(await waitingOf(rig)).toMatchObject([{ type: 'parting', number: '2B', count: 2 }]);
    const irregular = await operator.write('hands.out', rig, { tag: randomUUID() });
    expect(await waitingOf(irregular.entry.id)).toMatchObject([
      { type: 'irregular', rig, kind: 'hands.out' },
    ]);
    operator.seq += 1;
    const stub = {
      stub: true,
      lab: lab.id,
      id: randomUUID(),
      device: operator.device,
      seq: operator.seq,
      entry_sha: 'c'.repeat(64),
      why: 'too long',
    };
    await operator.push([stub]);
    expect(await waitingOf(stub.id)).toMatchObject([{ type: 'held-back', rig: null, words: 'too long' }]);
    expect((await waiting()).map((one) => one.revision)).toEqual(
      (await waiting()).map((one) => one.revision).toSorted((one, other) => other - one),
    );
  });

  it('reads entries, one and many, with verdict, revision and hash', async () => {
    const all = entriesAnswerSchema.parse((await get('/api/desk/entries?limit=500')).body);
    const pulled = await reviewer.pullAll();
    const whole = pulled.filter(({ entry }) => !('stub' in entry));
    expect(all.entries.map((one) => [one.revision, one.chain_hash]).toReversed()).toEqual(
      whole.map((one) => [one.revision, one.chain_hash]),
    );
    const since = entriesAnswerSchema.parse((await get('/api/desk/entries?since=3&limit=2')).body);
    expect(since.entries).toEqual(all.entries.slice(0, 2));
    const [first] = all.entries;
    expect((await get(`/api/desk/entries/${first?.id ?? ''}`)).body).toEqual(first);
  });

  it('says the same of what is not there and of what is another lab’s', async () => {
    const other = await createTestLab(server);
    const stranger = await other.tablet(other.lead);
    const entry = (await reviewer.pullAll())[0]?.entry.id ?? '';
    for (const [path, missing] of [
      [`/api/desk/firings/${bench.firing}`, `/api/desk/firings/${randomUUID()}`],
      [`/api/desk/entries/${entry}`, `/api/desk/entries/${randomUUID()}`],
    ] as const) {
      const theirs = await ask<Problem>(server.url, path, { token: stranger.token });
      const none = await ask<Problem>(server.url, missing, { token: stranger.token });
      expect([theirs.status, theirs.body.detail]).toEqual([404, none.body.detail]);
    }
    expect(
      (await ask<{ firings: unknown[] }>(server.url, '/api/desk/firings', { token: stranger.token })).body
        .firings,
    ).toEqual([]);
    const lead = await lab.tablet(lab.lead);
    const revoke = `/api/crew/tablets/${stranger.device}/revoke`;
    expect((await ask(server.url, revoke, { token: lead.token, body: {} })).status).toBe(404);
    expect((await stranger.hello()).status).toBe(200);
  });

  it('may be read in every role, and refuses nonsense in words', async () => {
    for (const role of ['reader', 'operator', 'lead'] as const) {
      const tablet = await lab.tablet(await lab.join(role, 'Tariq'));
      expect((await get('/api/desk/waiting', tablet.token)).status).toBe(200);
    }
    for (const path of [
      '/api/desk/firings?limit=0',
      '/api/desk/firings?state=lost',
      '/api/desk/firings/7',
      '/api/desk/entries?since=x',
    ]) {
      const answer = await get(path);
      expect([path, answer.status]).toEqual([path, 400]);
    }
    expect((await ask(server.url, '/api/desk/waiting')).status).toBe(401);
  });

  describe('Crew', () => {
    it('names people and tablets, and what waits on each as last heard', async () => {
      await bench.operator.hello({ pending: { count: 3, oldest_wall_ms: 5 } });
      const crew = crewAnswerSchema.parse((await get('/api/crew')).body);
      expect(crew.people).toEqual(
        expect.arrayContaining([{ id: bench.operator.person, name: 'Ada', role: 'operator' }]),
      );
      const tablet = crew.tablets.find((one) => one.id === bench.operator.device);
      expect(tablet).toMatchObject({
        letter: bench.operator.letter,
        last_seq: bench.operator.seq,
        pending: { count: 3, oldest_wall_ms: 5 },
        revoked_ms: null,
      });
      expect(crew.tablets.map((one) => one.letter)).not.toContain('0');
    });

    it('lets a lead alone revoke a tablet, which then does nothing and loses nothing', async () => {
      const gone = await lab.tablet(await lab.join('operator', 'Gone'));
      const { entry } = await gone.write('rig.created', null, { name: 'Wren', number: '1A', spec: testSpec });
      const path = `/api/crew/tablets/${gone.device}/revoke`;
      const refused = await ask<Problem>(server.url, path, { token: reviewer.token, body: {} });
      expect([refused.status, refused.body.type]).toEqual([403, 'urn:holdoff:problem:not-allowed']);
      expect((await gone.hello()).status).toBe(200);
      const lead = await lab.tablet(lab.lead);
      const answer = crewAnswerSchema.parse(
        (await ask(server.url, path, { token: lead.token, body: {} })).body,
      );
      expect(answer.tablets.find((one) => one.id === gone.device)?.revoked_ms).toBeGreaterThan(0);
      for (const { status } of [
        await gone.hello(),
        await gone.refresh(),
        await get('/api/desk/waiting', gone.token),
        await get('/api/handover/snapshot', gone.token),
      ]) {
        expect(status).toBeGreaterThanOrEqual(401);
      }
      expect((await get(`/api/desk/entries/${entry.id}`)).status).toBe(200);
      const again = await ask(server.url, path, { token: lead.token, body: {} });
      expect(again.status).toBe(200);
      const noted = await server.context
        .database('audit')
        .select('audit.person')
        .where({ what: 'tablet-revoked', device: gone.device });
      expect(noted).toEqual([{ person: lab.lead.id }]);
    });
  });
});
