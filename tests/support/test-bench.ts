import type { TestLab } from './test-lab';
import { testReading, testSheet, testSpec } from './test-lab';
import type { TestTablet } from './test-tablet';

export interface TestBench {
  /** Tablet of an operator who is authorised, with a check walked on it. */
  readonly operator: TestTablet;
  readonly reviewer: TestTablet;
  /** Rig, whose id is that of its first revision as well. */
  readonly rig: string;
  readonly permit: string;
  readonly check: string;
  readonly firing: string;
  readonly read: (more?: Partial<typeof testReading>) => ReturnType<TestTablet['write']>;
}

/** Everything up to an open firing on a rig that was ready, through the API alone. */
export async function openTestFiring(lab: TestLab): Promise<TestBench> {
  const operator = await lab.tablet(await lab.join('operator', 'Ada'));
  const reviewer = await lab.tablet(await lab.join('reviewer', 'Milo'));
  const must = async (write: ReturnType<TestTablet['write']>): Promise<string> => {
    const { entry, result } = await write;
    if (result.outcome !== 'applied') throw new Error(`${entry.kind}: ${JSON.stringify(result)}`);
    return entry.id;
  };
  const until_ms = Date.now() + 86_400_000;
  const rig = await must(
    operator.write('rig.created', null, { name: 'Kettle', number: '1A', spec: testSpec }),
  );
  const sheet = await must(reviewer.write('sheet.published', null, { spec: testSheet, replaces: null }));
  await must(
    reviewer.write('person.authorised', operator.person, { rig, task: 'fire', until_ms, words: '' }),
  );
  const envelope = { max_kV: 21, max_bar_g: 1.1, max_rate_Hz: 3 };
  const permit = await must(
    reviewer.write('permit.granted', rig, { rig_revision: rig, envelope, until_ms, words: '' }),
  );
  const check = await must(operator.write('check.opened', null, { rig, rig_revision: rig, sheet }));
  await must(
    operator.write('check.step-done', check, { step: 'hands-out', result: { type: 'confirm' }, note: '' }),
  );
  await must(operator.write('check.closed', check, {}));
  const number = `${operator.letter}-1`;
  const opened = { number, rig, rig_revision: rig, check, permit, unready: null };
  const firing = await must(operator.write('firing.opened', null, opened));
  const read: TestBench['read'] = (more = {}) =>
    operator.write('firing.reading', firing, { ...testReading, ...more });
  return { operator, reviewer, rig, permit, check, firing, read };
}
