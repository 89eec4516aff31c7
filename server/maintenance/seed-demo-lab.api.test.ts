import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { DEMO_LAB, DEMO_TABLETS } from '../../seeds/lab';
import { DEMO_PEOPLE } from '../../seeds/people';
import { startTestServer, type TestServer } from '../../tests/support/test-server';
import { TestTablet } from '../../tests/support/test-tablet';
import { seedDemoLab } from './seed-demo-lab';

const NOW_MS = Date.UTC(2026, 4, 20, 8, 30);
let server: TestServer;
let revision = 0;

beforeAll(async () => {
  server = await startTestServer();
  // It throws where the server's verdicts, their order or the hash at the end are not those of the generator.
  ({ revision } = await seedDemoLab(server.context, NOW_MS));
});
afterAll(() => server.stop());

const count = async (table: string) => {
  const [row] = await server.context.database(table).count<{ n: string }[]>({ n: '*' });
  return Number(row?.n);
};

describe('the seeded demo lab', () => {
  it('holds every entry once, in revisions without a hole', async () => {
    expect(revision).toBeGreaterThan(1400);
    expect(await count('entries')).toBe(revision);
  });

  it('changes nothing when it is seeded again after having been cut off', async () => {
    const again = await seedDemoLab(server.context, NOW_MS);
    expect(again.revision).toBe(revision);
    expect(await count('entries')).toBe(revision);
    expect(await count('people')).toBe(DEMO_PEOPLE.length);
  });

  it('lets each demo person sign in on a fresh tablet, which takes the next letter', async () => {
    const letters = ['C', 'D', 'E', 'F'];
    for (const [at, { email, password, role, name }] of DEMO_PEOPLE.entries()) {
      const answer = await new TestTablet(server.url).signIn(email, password);
      expect(answer.status).toBe(200);
      expect(answer.body).toMatchObject({
        person: { name },
        labs: [{ id: DEMO_LAB.id, name: DEMO_LAB.name, role }],
        device: { letter: letters[at] },
      });
    }
  });

  it('leaves the two tablets of the month without a key', async () => {
    const rows = await server.context.database('devices').whereIn(
      'id',
      DEMO_TABLETS.map(({ id }) => id),
    );
    expect(
      rows.map((row: { letter: string; public_key: string | null }) => [row.letter, row.public_key]),
    ).toEqual([
      ['A', null],
      ['B', null],
    ]);
  });
});
