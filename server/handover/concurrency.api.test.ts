import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import { createTestLab, testSpec, type TestLab } from '../../tests/support/test-lab';
import { startTestServer, type TestServer } from '../../tests/support/test-server';

const rigBody = { name: 'Kettle', number: '1A', spec: testSpec };

describe('many at once', () => {
  let server: TestServer;
  let lab: TestLab;
  beforeAll(async () => {
    server = await startTestServer();
    lab = await createTestLab(server);
  });
  afterAll(() => server.stop());

  it('applies forty concurrent tries of one entry once', async () => {
    const tablet = await lab.tablet(await lab.join('operator'));
    const entry = tablet.seal('rig.created', null, rigBody);
    const answers = await Promise.all(Array.from({ length: 40 }, () => tablet.push([entry])));
    expect(new Set(answers.map((one) => one.status))).toEqual(new Set([200]));
    const revisions = new Set(answers.map((one) => one.body.results[0]?.revision));
    expect(revisions.size).toBe(1);
    const stored = await server.context
      .database('entries')
      .count({ n: '*' })
      .where({ id: entry.id })
      .first<{ n: unknown }>();
    expect(Number(stored.n)).toBe(1);
  });

  it('gives eight tablets that push at once revisions without a gap, and a reader beside them skips none', async () => {
    const person = await lab.join('operator', 'Many');
    const tablets = await Promise.all(Array.from({ length: 8 }, () => lab.tablet(person)));
    const pushes = 6;
    const state = { pushing: true };
    const reader = await lab.tablet(person);
    const seen: number[] = [];
    const reading = (async () => {
      let cursor = { since: 0, hash: GENESIS_HASH };
      for (;;) {
        const wasPushing = state.pushing;
        const { body } = await reader.pull({ ...cursor, limit: 50 });
        seen.push(...body.entries.map((one) => one.revision));
        const last = body.entries.at(-1);
        if (last !== undefined) cursor = { since: last.revision, hash: last.chain_hash };
        else if (!wasPushing) return;
      }
    })();
    await Promise.all(
      tablets.map(async (tablet) => {
        for (let at = 0; at < pushes; at++) {
          const batch = [1, 2, 3].map(() => tablet.seal('rig.created', null, rigBody));
          const { body } = await tablet.push(batch);
          expect(body.results.map((one) => one.outcome)).toEqual(['applied', 'applied', 'applied']);
        }
      }),
    );
    state.pushing = false;
    await reading;
    expect(seen).toEqual(seen.map((_, at) => at + 1));
    const all = await reader.pullAll();
    expect(all).toHaveLength(seen.length);
    for (const tablet of tablets) {
      const own = all.filter((one) => one.entry.device === tablet.device).map((one) => one.entry.seq);
      expect(own).toEqual(Array.from({ length: pushes * 3 }, (_, at) => at + 1));
    }
  });
});
