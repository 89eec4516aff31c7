import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openTestFiring } from '../../tests/support/test-bench';
import { createTestLab, testReading, type TestLab } from '../../tests/support/test-lab';
import { startTestServer, type TestServer } from '../../tests/support/test-server';
import { refoldLab, refoldOutdatedLabs } from './refold';

describe('refolding a lab', () => {
  let server: TestServer;
  let lab: TestLab;
  beforeAll(async () => {
    server = await startTestServer();
    lab = await createTestLab(server);
  });
  afterAll(() => server.stop());

  it('makes the same documents, readings and memberships again, and touches no entry', async () => {
    const bench = await openTestFiring(lab);
    const { entry } = await bench.read();
    const body = { ...testReading, voltage_kV: 18.1 };
    await bench.operator.write('entry.corrected', bench.firing, {
      corrects: entry.id,
      kind: 'firing.reading',
      body,
      why: '',
    });
    const { database } = server.context;
    const tables = async () => ({
      documents: await database('documents')
        .select(
          'documents.id',
          'documents.kind',
          'documents.parent',
          'documents.list_state',
          'documents.made_revision',
          'documents.revision',
          'documents.doc',
        )
        .where({ lab: lab.id })
        .orderBy(['id', 'kind']),
      readings: await database('readings')
        .select(
          'readings.id',
          'readings.voltage_kV',
          'readings.corrected',
          'readings.made_revision',
          'readings.revision',
        )
        .where({ lab: lab.id })
        .orderBy('id'),
      memberships: await database('memberships')
        .select('memberships.person', 'memberships.role')
        .where({ lab: lab.id })
        .orderBy('person'),
    });
    const before = await tables();
    const entries = await bench.operator.pullAll();
    await database('documents').where({ lab: lab.id, kind: 'firing' }).update({ doc: '{}' });
    expect(await refoldLab(database, lab.id)).toBe(before.documents.length);
    expect(await tables()).toEqual(before);
    expect(await bench.operator.pullAll()).toEqual(entries);
  });

  it('is due for labs of an earlier fold alone', async () => {
    const { database } = server.context;
    expect(await refoldOutdatedLabs(database)).toEqual([]);
    await database('labs').where({ id: lab.id }).update({ fold_version: 0 });
    expect(await refoldOutdatedLabs(database)).toEqual([lab.id]);
    expect(await refoldOutdatedLabs(database)).toEqual([]);
  });
});
