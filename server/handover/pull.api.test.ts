import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { docKey, type Document } from '../../src/domain/book/documents/document';
import { mapStore, runEffect } from '../../src/domain/book/documents/effect';
import { chainHash, isIntact } from '../../src/domain/book/entry';
import { foldEntry } from '../../src/domain/book/fold';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import type { Problem } from '../../src/domain/handover/problem';
import { helloAnswerSchema, pullAnswerSchema, snapshotHeaderSchema } from '../../src/domain/handover/wire';
import {
  createTestLab,
  TEST_PASSWORD,
  testReading,
  testSpec,
  type TestLab,
} from '../../tests/support/test-lab';
import { openTestFiring } from '../../tests/support/test-bench';
import { startTestServer, type TestServer } from '../../tests/support/test-server';
import { ask, TestTablet } from '../../tests/support/test-tablet';

const rigBody = { name: 'Kettle', number: '1A', spec: testSpec };

describe('what a tablet asks of the Book', () => {
  let server: TestServer;
  let lab: TestLab;
  let tablet: TestTablet;
  beforeAll(async () => {
    server = await startTestServer();
    lab = await createTestLab(server);
    tablet = await lab.tablet(await lab.join('operator'));
  });
  afterAll(() => server.stop());

  const lastOf = async () => {
    const { head, head_hash } = (await tablet.hello()).body;
    return { since: head, hash: head_hash };
  };

  describe('GET /api/handover/pull', () => {
    it('gives every revision once, in pages, each entry intact and linked to the one before', async () => {
      const bench = await openTestFiring(lab);
      for (let no = 0; no < 5; no++) await bench.read();
      const all = await bench.operator.pullAll(3);
      expect(all.map((one) => one.revision)).toEqual(all.map((_, at) => at + 1));
      let previous = GENESIS_HASH;
      for (const { entry, revision, verdict, reason, chain_hash } of all) {
        if (!('stub' in entry)) expect(isIntact(entry)).toBe(true);
        expect(chain_hash).toBe(
          chainHash(previous, { revision, entry_sha: entry.entry_sha, verdict, reason }),
        );
        previous = chain_hash;
      }
      expect(await lastOf()).toEqual({ since: all.length, hash: previous });
    });

    it('names the head and says that there is more', async () => {
      const answer = await tablet.pull({ since: 0, hash: GENESIS_HASH, limit: 2 });
      expect(pullAnswerSchema.parse(answer.body)).toMatchObject({
        since: 0,
        to: 2,
        more: true,
        epoch: lab.epoch,
      });
      const { since, hash } = await lastOf();
      expect((await tablet.pull({ since, hash })).body).toMatchObject({
        to: since,
        head: since,
        more: false,
        entries: [],
      });
    });

    it('answers reset for a hash or revision that is not in this Book', async () => {
      for (const query of [
        { since: 1, hash: GENESIS_HASH },
        { since: 1_000_000, hash: 'a'.repeat(64) },
        { since: 0, hash: 'a'.repeat(64) },
      ]) {
        const answer = await tablet.pull(query);
        expect([answer.status, (answer.body as unknown as Problem).type]).toEqual([
          409,
          'urn:holdoff:problem:reset',
        ]);
      }
    });

    it('says what is wrong with the question', async () => {
      const answer = await ask<Problem>(server.url, '/api/handover/pull?since=-1&hash=zz&wait=99', {
        token: tablet.token,
      });
      expect(answer.status).toBe(400);
      expect(Object.keys(answer.body.fields ?? {}).toSorted()).toEqual([
        'query.hash',
        'query.since',
        'query.wait',
      ]);
    });

    it('holds the question open until something comes', async () => {
      const { since, hash } = await lastOf();
      const open = tablet.pull({ since, hash, wait: 20 });
      const other = await lab.tablet(await lab.join('operator', 'Other'));
      await other.write('rig.created', null, rigBody);
      expect((await open).body.entries.length).toBeGreaterThan(0);
    });

    it('hears also of what another process appends', async () => {
      const { since, hash } = await lastOf();
      const second = await startTestServer({ database: server.config.database });
      try {
        const elsewhere = tablet.pull({ since, hash, wait: 20 });
        const { handover } = second.context;
        const entry = tablet.seal('rig.created', null, rigBody);
        await handover.service.push({
          lab: lab.id,
          device: tablet.device,
          session: tablet.person,
          entries: [entry],
        });
        expect((await elsewhere).body.entries.map((one) => one.entry.id)).toEqual([entry.id]);
      } finally {
        await second.stop();
      }
    });

    it('is let go with nothing when the server stops, and the server waits for the answer to be out', async () => {
      const { since, hash } = await lastOf();
      const second = await startTestServer({ database: server.config.database });
      const elsewhere = new TestTablet(second.url);
      await elsewhere.signIn(lab.lead.email, TEST_PASSWORD);
      const open = elsewhere.pull({ since: (await tablet.hello()).body.head, hash, wait: 25 });
      await new Promise((resolve) => setTimeout(resolve, 300));
      await second.stop();
      expect((await open).body).toMatchObject({ since, entries: [] });
    });

    it('ends a held-open question of a tablet that is revoked meanwhile, without an answer', async () => {
      const gone = await lab.tablet(await lab.join('operator', 'Gone'));
      const lead = await lab.tablet(lab.lead);
      const { since, hash } = await lastOf();
      const open = gone.pull({ since, hash, wait: 20 });
      const revoked = await ask(server.url, `/api/crew/tablets/${gone.device}/revoke`, {
        token: lead.token,
        body: {},
      });
      expect(revoked.status).toBe(200);
      const answer = await open;
      expect([answer.status, (answer.body as unknown as Problem).type]).toEqual([
        403,
        'urn:holdoff:problem:revoked',
      ]);
    });
  });

  describe('GET /api/handover/snapshot', () => {
    it('gives the documents that a replay of all entries from empty gives', async () => {
      const bench = await openTestFiring(lab);
      const { entry } = await bench.read();
      await bench.operator.write('entry.corrected', bench.firing, {
        corrects: entry.id,
        kind: 'firing.reading',
        body: { ...testReading, shots: 11 },
        why: '',
      });
      await bench.operator.write('incident.reported', bench.rig, {
        what: 'Puncture',
        near: '',
        made_safe: '',
        stand_down: null,
      });
      await bench.read({ voltage_kV: 21.5 });
      await bench.operator.write('firing.reviewed', bench.firing, {
        words: '',
        left_out: [],
        seen_revision: 1,
        seen_hash: '',
      });
      const { header, documents, trailer } = await bench.operator.snapshot();
      expect(snapshotHeaderSchema.parse(header)).toMatchObject({ epoch: lab.epoch });
      expect(trailer).toEqual({ end: true, documents: documents.length });
      const replayed = new Map<string, Document>();
      const entries = await bench.operator.pullAll();
      for (const { entry: one, revision, verdict, reason } of entries) {
        if (!('stub' in one)) runEffect(foldEntry(one, { verdict, reason, revision }), mapStore(replayed));
      }
      expect(header['revision']).toBe(entries.length);
      expect(new Map(documents.map((doc) => [docKey(doc), doc]))).toEqual(replayed);
    });
  });

  describe('POST /api/handover/known', () => {
    it('tells which ids are in this lab’s Book, with their verdicts', async () => {
      const { entry, result } = await tablet.write('rig.created', null, rigBody);
      const answer = await ask<{ known: unknown[] }>(server.url, '/api/handover/known', {
        token: tablet.token,
        body: { ids: [entry.id, randomUUID()] },
      });
      expect(answer.body.known).toEqual([
        { id: entry.id, revision: result.revision, outcome: 'applied', reason: null },
      ]);
      const otherLab = await createTestLab(server);
      const stranger = await otherLab.tablet(otherLab.lead);
      const theirs = await ask<{ known: unknown[] }>(server.url, '/api/handover/known', {
        token: stranger.token,
        body: { ids: [entry.id] },
      });
      expect(theirs.body.known).toEqual([]);
    });
  });

  describe('POST /api/handover/hello', () => {
    it('greets a tablet whose mirror is of this Book and remembers what waits on it', async () => {
      await tablet.write('rig.created', null, rigBody);
      const { since, hash } = await lastOf();
      const answer = await tablet.hello({
        cursor: { epoch: lab.epoch, revision: since, hash },
        acked_seq: tablet.seq,
        pending: { count: 12, oldest_wall_ms: 1_764_000_000_000 },
      });
      expect(helloAnswerSchema.parse(answer.body)).toMatchObject({
        state: 'ok',
        epoch: lab.epoch,
        head: since,
        head_hash: hash,
        last_seq: tablet.seq,
        backup_revision: 0,
      });
      const row = await server.context
        .database('devices')
        .select('devices.pending_count')
        .where({ id: tablet.device })
        .first<unknown>();
      expect(row).toEqual({ pending_count: 12 });
    });

    it('sends back to zero: other epoch, cursor beyond the head, other hash, acknowledged beyond what is here', async () => {
      const { since, hash } = await lastOf();
      const cursor = { epoch: lab.epoch, revision: since, hash };
      for (const more of [
        { cursor: { ...cursor, epoch: randomUUID() } },
        { cursor: { ...cursor, revision: since + 1 } },
        { cursor: { ...cursor, hash: 'a'.repeat(64) } },
        { cursor, acked_seq: tablet.seq + 1 },
      ]) {
        expect([more, (await tablet.hello(more)).body.state]).toEqual([more, 'reset']);
      }
      const empty = { epoch: null, revision: 0, hash: GENESIS_HASH };
      expect((await tablet.hello({ cursor: empty })).body.state).toBe('ok');
    });

    it('tells an older app to come up, and lets it go on', async () => {
      expect((await tablet.hello({ protocol: 1 })).body.state).toBe('ok');
      const answer = await tablet.hello({
        cursor: { epoch: lab.epoch, revision: 0, hash: GENESIS_HASH },
        protocol: 0,
      });
      expect(answer.status).toBe(400);
    });
  });
});
