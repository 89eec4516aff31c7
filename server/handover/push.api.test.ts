import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { MAX_BODY_CHARS, sealEntry } from '../../src/domain/book/entry';
import type { Problem } from '../../src/domain/handover/problem';
import { pushAnswerSchema } from '../../src/domain/handover/wire';
import { createTestLab, testReading, testSpec, type TestLab } from '../../tests/support/test-lab';
import { openTestFiring } from '../../tests/support/test-bench';
import { startTestServer, type TestServer } from '../../tests/support/test-server';
import { ask, type TestTablet } from '../../tests/support/test-tablet';

const rigBody = { name: 'Kettle', number: '1A', spec: testSpec };

describe('POST /api/handover/push', () => {
  let server: TestServer;
  let lab: TestLab;
  let operator: TestTablet;
  beforeAll(async () => {
    server = await startTestServer();
    lab = await createTestLab(server);
    operator = await lab.tablet(await lab.join('operator'));
  });
  afterAll(() => server.stop());

  const headOf = async () => (await operator.hello()).body.head;
  const problemOf = async (promise: Promise<{ status: number; body: unknown }>) => {
    const { status, body } = await promise;
    return { status, problem: body as Problem };
  };

  describe('what it takes', () => {
    it('applies an entry, gives it the next revision, and answers as the wire says', async () => {
      const head = await headOf();
      const entry = operator.seal('rig.created', null, rigBody);
      const answer = await operator.push([entry]);
      expect(answer.status).toBe(200);
      expect(pushAnswerSchema.parse(answer.body)).toMatchObject({
        results: [{ id: entry.id, seq: operator.seq, outcome: 'applied', revision: head + 1, reason: null }],
        last_seq: operator.seq,
        head: head + 1,
      });
    });

    it('takes a batch in the order of its numbers, whatever order it comes in', async () => {
      const rig = operator.seal('rig.created', null, rigBody);
      const declared = operator.seal('rig.declared', rig.id, { state: 'shorted' });
      const { body } = await operator.push([declared, rig]);
      expect(body.results.map((one) => [one.id, one.outcome])).toEqual([
        [rig.id, 'applied'],
        [declared.id, 'applied'],
      ]);
    });

    it('answers an entry that comes again with the stored verdict and changes nothing', async () => {
      const { entry, result } = await operator.write('rig.created', null, rigBody);
      const head = await headOf();
      const again = await operator.push([entry]);
      expect(again.body.results).toEqual([result]);
      expect(await headOf()).toBe(head);
    });

    it('answers the same text under another number with the stored verdict, and the queue goes on behind it', async () => {
      const { entry, result } = await operator.write('rig.created', null, rigBody);
      const tablet = await lab.tablet({ id: operator.person, email: (await emailOf(operator.person)) ?? '' });
      const draft = tablet.seal('rig.created', entry.subject, rigBody, { id: entry.id });
      // The same text with the same salt, as a tablet does that begins again under a new letter.
      const moved = await tablet.push([sealEntry(draft, entry.body)]);
      expect(moved.body.results).toMatchObject([{ outcome: 'applied', revision: result.revision }]);
      expect(moved.body.last_seq).toBe(1);
      const next = await tablet.write('rig.declared', entry.id, { state: 'shorted' });
      expect(next.result).toMatchObject({ seq: 2, outcome: 'applied' });
    });

    it('lets the first text stand when an id comes with another one: altered', async () => {
      const { entry } = await operator.write('rig.created', null, rigBody);
      const head = await headOf();
      const other = operator.seal('rig.created', null, { ...rigBody, name: 'Other' }, { id: entry.id });
      const follower = operator.seal('rig.declared', entry.id, { state: 'shorted' });
      const { body } = await operator.push([other, follower]);
      expect(body.results).toMatchObject([
        { id: entry.id, outcome: 'altered', revision: null },
        { id: follower.id, outcome: 'applied', revision: head + 1 },
      ]);
    });

    it('stops at a hole and answers the last number that it has', async () => {
      const last = operator.seq;
      const first = operator.seal('rig.created', null, rigBody, { seq: last + 1 });
      const beyond = operator.seal('rig.created', null, rigBody, { seq: last + 3 });
      const { body } = await operator.push([first, beyond]);
      expect(body.results).toMatchObject([
        { id: first.id, outcome: 'applied' },
        { id: beyond.id, outcome: 'hole', revision: null },
      ]);
      expect(body.last_seq).toBe(last + 1);
      operator.seq = last + 1;
    });

    it('finds a cloned tablet by another id at a used number, takes nothing after it, and keeps a note of it', async () => {
      const clone = await lab.tablet(await lab.join('operator', 'Twin'));
      await clone.write('rig.created', null, rigBody);
      await clone.write('rig.created', null, rigBody);
      const head = await headOf();
      const branch = [2, 3].map((seq) => clone.seal('rig.created', null, rigBody, { seq }));
      const { body } = await clone.push(branch);
      expect(body.results).toMatchObject([{ id: branch[0]?.id, outcome: 'fork-device', revision: null }]);
      expect(await headOf()).toBe(head);
      const noted = await server.context
        .database('audit')
        .select('audit.what')
        .where({ device: clone.device, what: 'tablet-forked' });
      expect(noted).toHaveLength(1);
    });

    it('keeps the place of a stub, held back as unreadable', async () => {
      operator.seq += 1;
      const stub = {
        stub: true,
        lab: lab.id,
        id: randomUUID(),
        device: operator.device,
        seq: operator.seq,
        entry_sha: 'b'.repeat(64),
        why: 'the text was larger than the server takes',
      };
      const { body } = await operator.push([stub]);
      expect(body.results).toMatchObject([
        {
          outcome: 'held-back',
          reason: { cause: 'unreadable', code: 'stub', words: expect.stringContaining('larger') as string },
        },
      ]);
      const pulled = (await operator.pullAll()).at(-1);
      expect(pulled?.entry).toEqual(stub);
      expect((await operator.push([stub])).body.results).toEqual(body.results);
    });
  });

  describe('what it holds back', () => {
    it('stores an unknown kind, held back because this server is older', async () => {
      const entry = operator.sealRaw({ kind: 'laser.dreamt', subject: null, body: { of: 'blue' } });
      const { body } = await operator.push([entry]);
      expect(body.results).toMatchObject([{ outcome: 'held-back', reason: { cause: 'version' } }]);
      const newer = operator.sealRaw({
        kind: 'rig.declared',
        subject: null,
        body: {},
        options: { version: 2 },
      });
      expect((await operator.push([newer])).body.results).toMatchObject([{ reason: { cause: 'version' } }]);
    });

    it('stores a body that does not fit its kind, held back with the field in words', async () => {
      const entry = operator.sealRaw({ kind: 'rig.created', subject: null, body: { ...rigBody, name: '' } });
      const { body } = await operator.push([entry]);
      expect(body.results).toMatchObject([
        {
          outcome: 'held-back',
          reason: { cause: 'unreadable', words: expect.stringContaining('name') as string },
        },
      ]);
    });

    it('holds an act back under the tablet’s own token and applies it once its author signs in and adopts it', async () => {
      const reviewer = await lab.tablet(await lab.join('reviewer', 'Milo'));
      const { entry: rig } = await operator.write('rig.created', null, rigBody);
      const granted = reviewer.seal('permit.granted', rig.id, permitFor(rig.id));
      const held = await reviewer.push([granted], await reviewer.deviceToken());
      expect(held.body.results).toMatchObject([{ outcome: 'held-back', reason: { cause: 'confirm' } }]);
      const adopted = await reviewer.write('entry.adopted', granted.id, { adopts: [granted.id] });
      expect(adopted.result).toMatchObject({ outcome: 'applied' });
      const { documents } = await reviewer.snapshot();
      const found = documents.find((doc) => doc.kind === 'rig' && doc.id === rig.id);
      expect(found).toMatchObject({ permits: [{ entry: granted.id, at: adopted.result.revision }] });
      // The first verdict never changes.
      expect((await reviewer.push([granted])).body.results).toMatchObject([{ outcome: 'held-back' }]);
    });

    it('never applies an act of A under B’s session', async () => {
      const reviewer = await lab.tablet(await lab.join('reviewer', 'Milo'));
      const { entry: rig } = await operator.write('rig.created', null, rigBody);
      const forged = operator.seal('permit.granted', rig.id, permitFor(rig.id), { author: reviewer.person });
      const { body } = await operator.push([forged]);
      expect(body.results).toMatchObject([{ outcome: 'held-back', reason: { cause: 'confirm' } }]);
    });

    it('refuses a permit for a revision that is no longer the latest, in words', async () => {
      const reviewer = await lab.tablet(await lab.join('reviewer', 'Milo'));
      const { entry: rig } = await operator.write('rig.created', null, rigBody);
      const spec = { ...testSpec, envelope: { ...testSpec.envelope, max_kV: 20 } };
      const revised = await operator.write('rig.revised', rig.id, {
        number: '2A',
        based_on: rig.id,
        spec,
        why: 'Leaner',
      });
      const base = {
        epoch: reviewer.epoch,
        revision: (revised.result.revision ?? 0) - 1,
        hash: 'a'.repeat(64),
      };
      const granted = await reviewer.write('permit.granted', rig.id, permitFor(rig.id), { base });
      expect(granted.result).toMatchObject({
        outcome: 'held-back',
        reason: {
          cause: 'rule',
          code: 'superseded-revision',
          words: 'Revision 1A is no longer the latest; revision 2A is.',
          knew: false,
        },
      });
      const follows = await reviewer.write('permit.withdrawn', rig.id, {
        permit: granted.entry.id,
        why: 'Slip',
      });
      expect(follows.result.outcome).toBe('irregular');
    });

    it('keeps an operator’s act as one that their role does not include', async () => {
      const { entry: rig } = await operator.write('rig.created', null, rigBody);
      const { result } = await operator.write('permit.granted', rig.id, permitFor(rig.id));
      expect(result).toMatchObject({ outcome: 'held-back', reason: { cause: 'rule', code: 'role' } });
    });
  });

  describe('what it marks', () => {
    it('takes readings after a stand-down as irregular: could not know, and knew', async () => {
      const bench = await openTestFiring(lab);
      expect((await bench.read()).result.outcome).toBe('applied');
      const down = await bench.reviewer.write('rig.stood-down', bench.rig, { why: 'Smell of ozone' });
      const revision = down.result.revision ?? 0;
      bench.operator.base = { revision: revision - 1, hash: 'a'.repeat(64) };
      expect((await bench.read()).result).toMatchObject({
        outcome: 'irregular',
        reason: { code: 'stood-down', words: 'The rig was stood down.', knew: false },
      });
      bench.operator.base = { revision, hash: 'a'.repeat(64) };
      const knew = await bench.read();
      expect(knew.result).toMatchObject({ outcome: 'irregular', reason: { knew: true } });
      const { documents } = await bench.operator.snapshot();
      expect(documents.find((doc) => doc.kind === 'firing' && doc.id === bench.firing)).toMatchObject({
        readings: 3,
        irregular_readings: 2,
        shots: 30,
      });
    });

    it('follows a chain of corrections, in the documents and in the flat table', async () => {
      const bench = await openTestFiring(lab);
      const { entry } = await bench.read();
      const correct = (corrects: string, voltage_kV: number) =>
        bench.operator.write('entry.corrected', bench.firing, {
          corrects,
          kind: 'firing.reading',
          body: { ...testReading, voltage_kV },
          why: 'Read it wrong',
        });
      const first = await correct(entry.id, 18.1);
      const second = await correct(first.entry.id, 18.2);
      expect(second.result.outcome).toBe('applied');
      const row = await server.context
        .database('readings')
        .select('readings.voltage_kV', 'readings.corrected', 'readings.state')
        .where({ id: entry.id })
        .first<unknown>();
      expect(row).toEqual({ voltage_kV: 18.2, corrected: 1, state: 'stands' });
      const parted = await correct(entry.id, 18.3);
      expect(parted.result.outcome).toBe('applied');
      const after = await server.context
        .database('readings')
        .select('readings.state')
        .where({ id: entry.id })
        .first<unknown>();
      expect(after).toEqual({ state: 'parted' });
    });
  });

  describe('what it refuses', () => {
    it('refuses a whole batch with an entry of another tablet or lab', async () => {
      const head = await headOf();
      const mine = operator.seal('rig.created', null, rigBody, { seq: operator.seq + 1 });
      const foreign = { ...mine, device: randomUUID() };
      const { status, problem } = await problemOf(operator.push([mine, foreign]));
      expect([status, problem.type]).toEqual([403, 'urn:holdoff:problem:not-yours']);
      const otherLab = await problemOf(operator.push([{ ...mine, lab: randomUUID() }]));
      expect(otherLab.problem.type).toBe('urn:holdoff:problem:not-yours');
      expect(await headOf()).toBe(head);
    });

    it('refuses an entry that does not fit its hashes, naming it', async () => {
      const entry = operator.seal('rig.created', null, rigBody, { seq: operator.seq + 1 });
      for (const broken of [
        { ...entry, body: entry.body.replace('Kettle', 'Cattle') },
        { ...entry, kind: 'rig.revised' },
      ]) {
        const { status, problem } = await problemOf(operator.push([broken]));
        expect([status, problem.type]).toEqual([400, 'urn:holdoff:problem:broken-entry']);
        expect(problem.detail).toContain(entry.id);
      }
    });

    it('says which field of which entry cannot be read', async () => {
      const entry = operator.seal('rig.created', null, rigBody, { seq: operator.seq + 1 });
      const { status, problem } = await problemOf(operator.push([entry, { ...entry, seq: 1.5 }]));
      expect([status, problem.type]).toEqual([400, 'urn:holdoff:problem:unreadable']);
      expect(Object.keys(problem.fields ?? {})).toEqual(['body.entries.1.seq']);
      for (const body of ['{', '[]', '7', '{"entries":[]}', '{"entries":null}', '{}']) {
        const answer = await ask<Problem>(server.url, '/api/handover/push', { token: operator.token, body });
        expect([body, answer.status, answer.body.type]).toEqual([
          body,
          400,
          'urn:holdoff:problem:unreadable',
        ]);
      }
    });

    it('refuses 51 entries, and a text that is too long by our own word', async () => {
      const many = Array.from({ length: 51 }, (_, at) =>
        operator.seal(
          'noise.counted',
          operator.device,
          { touches_ignored: 1, over_s: 1 },
          { seq: operator.seq + 1 + at },
        ),
      );
      expect((await operator.push(many)).status).toBe(400);
      const long = operator.sealRaw({
        kind: 'rig.created',
        subject: null,
        body: { name: 'x'.repeat(MAX_BODY_CHARS) },
        options: { seq: operator.seq + 1 },
      });
      const tooLong = await problemOf(operator.push([long]));
      expect([tooLong.status, tooLong.problem.type]).toEqual([413, 'urn:holdoff:problem:too-large']);
      expect(Object.keys(tooLong.problem.fields ?? {})).toEqual(['body.entries.0.body']);
      const huge = await ask<Problem>(server.url, '/api/handover/push', {
        token: operator.token,
        body: `{"entries":["${'x'.repeat(300_000)}"]}`,
      });
      expect([huge.status, huge.body.type]).toEqual([413, 'urn:holdoff:problem:too-large']);
    });

    it('refuses whoever brings no token, a wrong one, or that of a revoked tablet', async () => {
      const entry = operator.seal('rig.created', null, rigBody, { seq: operator.seq + 1 });
      const without = await ask<Problem>(server.url, '/api/handover/push', { body: { entries: [entry] } });
      expect([without.status, without.body.type]).toEqual([401, 'urn:holdoff:problem:not-signed-in']);
      expect((await operator.push([entry], `${operator.token.slice(0, -4)}AAAA`)).status).toBe(401);
      const gone = await lab.tablet(await lab.join('operator', 'Gone'));
      await server.context.database('devices').where({ id: gone.device }).update({ revoked_ms: 1 });
      const { status, problem } = await problemOf(gone.push([gone.seal('rig.created', null, rigBody)]));
      expect([status, problem.type]).toEqual([403, 'urn:holdoff:problem:revoked']);
    });
  });

  async function emailOf(id: string): Promise<string | undefined> {
    const row = await server.context
      .database('people')
      .select('people.email')
      .where({ id })
      .first<{ email: string } | undefined>();
    return row?.email;
  }
});

function permitFor(rig_revision: string) {
  const envelope = { max_kV: 15, max_bar_g: 1, max_rate_Hz: 2 };
  return { rig_revision, envelope, until_ms: Date.now() + 3_600_000, words: '' };
}
