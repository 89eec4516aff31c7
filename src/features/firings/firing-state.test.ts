import { describe, expect, it } from 'vitest';
import type { FiringReview } from '../../domain/book/documents/firing';
import { FIRING, trace } from './firing.fixture';
import { firingFlags, firingState, firingStateWords } from './firing-state';

const closed = { ...FIRING, closed: { ...trace('c', 40), summary: '' } };
const review = (verdict: FiringReview['verdict']): FiringReview => ({
  ...trace('r', 60),
  verdict,
  words: '',
  left_out: [],
});
const nameOf = () => 'Milo Venn';

describe('the state of a firing', () => {
  it('goes from open over closed to the last review', () => {
    expect(firingState(FIRING)).toBe('open');
    expect(firingState(closed)).toBe('closed');
    const twice = { ...closed, reviews: [review('sent-back'), review('reviewed')] };
    expect(firingStateWords(twice, nameOf)).toBe('reviewed by Milo Venn');
    expect(firingStateWords({ ...closed, reviews: [review('sent-back')] }, nameOf)).toBe(
      'sent back by Milo Venn',
    );
  });

  it('never forgets that it was recorded as unready or holds irregular readings', () => {
    const flagged = { ...closed, unready: { missing: [], why: 'dark' }, irregular_readings: 1 };
    expect(firingFlags(flagged)).toEqual(['recorded as unready', '1 reading irregular']);
    expect(firingFlags(closed)).toEqual([]);
  });
});
