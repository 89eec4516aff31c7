import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA } from '../../../tests/support/pure-book';
import { openAuthorEntries } from './open-author';

describe('entries without an author', () => {
  it('are those that were written before a PIN and that nobody has claimed', () => {
    const { book, rig } = new PureBench();
    const down = book.write('rig.stood-down', rig, { why: 'Smoke' }, { by: null }).entry;
    const incident = { what: 'Smoke', near: '', made_safe: '', stand_down: null };
    const reported = book.write('incident.reported', rig, incident, { by: null }).entry;
    const own = () => book.written.map(({ entry }) => entry).toReversed();
    expect(openAuthorEntries(own())).toEqual([reported, down]);
    book.write('entry.claimed', rig, { claims: down.id }, { by: ADA });
    expect(openAuthorEntries(own())).toEqual([reported]);
  });

  it('are never those that the tablet writes by itself', () => {
    const { book, rig } = new PureBench();
    const noise = book.write('noise.counted', rig, { touches_ignored: 3, over_s: 60 }, { by: null }).entry;
    expect(openAuthorEntries([noise])).toEqual([]);
  });
});
