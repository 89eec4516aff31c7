import { describe, expect, it } from 'vitest';
import type { HeldDoc } from '../book/documents/held';
import { bodyText, sealEntry, type Reason } from '../book/entry';
import { heldOptions } from './held-options';

const id = (last: number): string => `00000000-0000-4000-8000-00000000000${last}`;
const MILO = id(5);

function held(cause: Reason['cause'], kind = 'rig.stood-down', body: object = { why: 'ozone' }): HeldDoc {
  const entry = sealEntry(
    {
      lab: id(1),
      id: id(2),
      device: id(3),
      seq: 1,
      kind,
      version: 1,
      subject: id(4),
      author: MILO,
      witness: null,
      base: { epoch: id(6), revision: 0, hash: '0'.repeat(64) },
      stamp: {
        wall_ms: 0,
        offset_min: 0,
        zone: 'UTC',
        page_life: id(7),
        monotonic_ms: 0,
        time_uncertain: false,
      },
    },
    bodyText({ ...body }, 'ab'.repeat(16)),
  );
  return {
    kind: 'held',
    id: entry.id,
    parent: entry.subject,
    entry,
    reason: { cause, code: cause, words: '', knew: null },
    at: 3,
    adopted: null,
    dismissed: null,
  };
}

describe('what may be done with a held-back entry', () => {
  it('lets the author confirm what only waited for their session', () => {
    expect(heldOptions(held('confirm'), { id: MILO, role: 'reviewer' }).adopt.may).toBe(true);
    expect(heldOptions(held('confirm'), { id: id(8), role: 'reviewer' }).adopt.may).toBe(false);
  });

  it('leaves anything else to a lead', () => {
    expect(heldOptions(held('rule'), { id: MILO, role: 'reviewer' }).adopt.may).toBe(false);
    expect(heldOptions(held('rule'), { id: id(8), role: 'lead' }).adopt.may).toBe(true);
  });

  it('offers nobody to adopt a text that cannot be read', () => {
    expect(heldOptions(held('version', 'kit.melted', {}), { id: id(8), role: 'lead' }).adopt.may).toBe(false);
  });

  it('lets only the author dismiss it, and nobody while locked', () => {
    expect(heldOptions(held('rule'), { id: MILO, role: 'reviewer' }).dismiss.may).toBe(true);
    expect(heldOptions(held('rule'), { id: id(8), role: 'lead' }).dismiss.may).toBe(false);
    expect(heldOptions(held('rule'), { id: MILO, role: null }).dismiss.may).toBe(false);
    expect(heldOptions(held('confirm'), null)).toMatchObject({
      adopt: { may: false },
      dismiss: { may: false },
    });
  });
});
