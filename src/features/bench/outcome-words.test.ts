import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { MILO } from '../../../tests/support/pure-book';
import { testReading } from '../../../tests/support/test-lab';
import { firingStateWords, outcomeWords } from './outcome-words';

describe('what came of a firing', () => {
  it('says how it looked last, and at what', () => {
    expect(outcomeWords(null)).toBe('no reading');
    expect(outcomeWords(testReading)).toBe('even, 18.8\u2009kV, 140\u2009\u00b5J');
    expect(outcomeWords({ ...testReading, looked: 'gap-dark', output_uJ: null })).toBe(
      'gap dark, 18.8\u2009kV',
    );
  });

  it('says who has still to look at it', () => {
    const bench = new PureBench().ready();
    bench.open();
    const state = () => firingStateWords(bench.book.doc('firing', bench.firing));
    expect(state()).toBe('still open');
    bench.book.write('firing.closed', bench.firing, { summary: '' });
    expect(state()).toBe('waits for review');
    const body = { words: '', left_out: [], seen_revision: 1, seen_hash: '0'.repeat(64) };
    bench.book.write('firing.reviewed', bench.firing, body, { by: MILO });
    expect(state()).toBe('reviewed');
  });

  it('never hides that it was recorded as unready', () => {
    const bench = new PureBench();
    bench.open({ unready: { missing: [{ code: 'no-check', words: 'No check.' }], why: 'Lost light' } });
    bench.book.write('firing.closed', bench.firing, { summary: '' });
    expect(firingStateWords(bench.book.doc('firing', bench.firing))).toBe(
      'recorded as unready, waits for review',
    );
  });
});
