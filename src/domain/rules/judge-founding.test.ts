import { describe, expect, it } from 'vitest';
import { mapStore, runEffect } from '../book/documents/effect';
import type { Document } from '../book/documents/document';
import { bodyText, sealEntry } from '../book/entry';
import { foldEntry } from '../book/fold';
import { GENESIS_HASH, uuidFromBytes } from '../book/ids';
import type { Role } from '../book/bodies/people-bodies';
import { judgeEntry } from './judge';

const id = (of: number) => uuidFromBytes(new Uint8Array(16).fill(of));
const [lab, device, inge, milo] = [id(1), id(2), id(3), id(4)];

function joined(who: { readonly person: string; readonly author: string; readonly role: Role }) {
  return sealEntry(
    {
      lab,
      id: id(9),
      device,
      seq: 1,
      kind: 'person.joined',
      version: 1,
      subject: who.person,
      author: who.author,
      witness: null,
      base: { epoch: id(5), revision: 0, hash: GENESIS_HASH },
      stamp: {
        wall_ms: 0,
        offset_min: 0,
        zone: 'UTC',
        page_life: id(6),
        monotonic_ms: 0,
        time_uncertain: false,
      },
    },
    bodyText({ name: 'Inge Sorrel', role: who.role }, '00'.repeat(16)),
  );
}

describe('founding a lab', () => {
  const judge = (
    entry: ReturnType<typeof joined>,
    documents = new Map<string, Document>(),
    session = entry.author,
  ) => runEffect(judgeEntry(entry, { session, hasGrant: () => false, now_ms: 0 }), mapStore(documents));

  it('lets the first person join by themself as lead', () => {
    expect(judge(joined({ person: inge, author: inge, role: 'lead' })).verdict).toBe('applied');
  });

  it('needs their own session', () => {
    const judged = judge(joined({ person: inge, author: inge, role: 'lead' }), new Map(), null);
    expect(judged.reason?.cause).toBe('confirm');
  });

  it('takes no other role, and nobody brought in by somebody who is not there', () => {
    const refused = [
      joined({ person: inge, author: inge, role: 'reviewer' }),
      joined({ person: inge, author: milo, role: 'lead' }),
    ];
    for (const entry of refused)
      expect(judge(entry)).toMatchObject({ verdict: 'held-back', reason: { code: 'not-a-member' } });
  });

  it('happens once', () => {
    const documents = new Map<string, Document>();
    const first = joined({ person: inge, author: inge, role: 'lead' });
    runEffect(foldEntry(first, { verdict: 'applied', reason: null, revision: 1 }), mapStore(documents));
    const second = joined({ person: milo, author: milo, role: 'lead' });
    expect(judge(second, documents)).toMatchObject({
      verdict: 'held-back',
      reason: { code: 'not-a-member' },
    });
  });
});
