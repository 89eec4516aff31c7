import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestLab, testSpec, type TestLab } from '../../tests/support/test-lab';
import { startTestServer, type TestServer } from '../../tests/support/test-server';

describe('POST /api/handover/push', () => {
  let server: TestServer;
  let lab: TestLab;
  beforeAll(async () => {
    server = await startTestServer();
    lab = await createTestLab(server);
  });
  afterAll(() => server.stop());

  it('applies an operator’s rig and gives it the next revision', async () => {
    const tablet = await lab.tablet(await lab.join('operator'));
    const before = await tablet.pullAll();
    const { entry, result } = await tablet.write('rig.created', null, {
      name: 'Kettle',
      number: '1A',
      spec: testSpec,
    });
    expect(result).toEqual({
      id: entry.id,
      seq: 1,
      outcome: 'applied',
      revision: before.length + 1,
      reason: null,
    });
    const { documents, header, trailer } = await tablet.snapshot();
    expect(header['revision']).toBe(before.length + 1);
    expect(documents.some((doc) => doc.kind === 'rig' && doc.id === entry.id)).toBe(true);
    expect(trailer).toEqual({ end: true, documents: documents.length });
    expect((await tablet.hello()).body.state).toBe('ok');
  });
});
