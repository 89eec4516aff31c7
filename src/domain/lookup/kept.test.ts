import { describe, expect, it } from 'vitest';
import type { LookupDoc } from '../book/documents/lookup';
import { GAP_LOOKUP } from './gap-lookup';
import { keptBody, readKept, recompute, type KeptBody } from './kept';
import { pinnedLookups } from './pinned';
import { kettleLikeSpec, labSettings } from './rig.fixture';

const { values, known } = GAP_LOOKUP.start({ spec: kettleLikeSpec, settings: labSettings });
const body = (pin?: 'pin' | 'unpin'): KeptBody => {
  const answer = GAP_LOOKUP.answer(values);
  if (!answer.ok) throw new Error(answer.refusal.words);
  return keptBody({
    lookup: GAP_LOOKUP,
    values,
    known,
    answer: answer.value,
    rig_revision: 'a-revision',
    ...(pin === undefined ? {} : { pin }),
  });
};
const throughJson = (kept: KeptBody) => JSON.parse(JSON.stringify(kept)) as KeptBody;
const doc = (kept: KeptBody, id: string) => ({ kind: 'lookup', id, parent: 'rig', kept }) as LookupDoc;

describe('a kept lookup', () => {
  it('comes back from the Book as it was kept', () => {
    const kept = readKept(throughJson(body('pin')));
    expect(kept).toMatchObject({ lookup: 'gap', values, known, rig_revision: 'a-revision', pinned: true });
    expect(kept?.figures.find(({ key }) => key === 'law')).toMatchObject({ unit: 'kV', weight: 'main' });
  });

  it('is computed again from its inputs to the same figures', () => {
    const again = recompute(throughJson(body()), GAP_LOOKUP);
    if (!again.ok) throw new Error(again.refusal.words);
    const before = readKept(body())?.figures.map(({ value }) => value);
    expect(again.value.figures.map(({ value }) => value)).toEqual(before);
  });

  it.each([
    { lookup: 'gap', inputs: { gap_mm: 3, known: {} }, answers: { law_kV: 18.8 }, pinned: false },
    { lookup: 'gap', inputs: { values: [] }, answers: {}, pinned: true },
    { lookup: 'gap', inputs: { values: { gap_mm: { deep: true } } }, answers: { figures: 7 }, pinned: true },
  ])('is refused in words, or read as far as it goes, in another shape: %j', (strange) => {
    const kept = readKept(strange);
    if (kept === null) {
      expect(recompute(strange, GAP_LOOKUP)).toMatchObject({ ok: false, refusal: { type: 'unreadable' } });
    } else {
      expect(kept.figures).toEqual([]);
    }
  });
});

describe('pins', () => {
  it('shows of each lookup the newest that was pinned', () => {
    const docs = [doc(body(), '4'), doc(body('pin'), '3'), doc(body('pin'), '2')];
    expect(pinnedLookups(docs).map(({ id }) => id)).toEqual(['3']);
  });

  it('takes a pin away for good until it is pinned anew', () => {
    expect(pinnedLookups([doc(body('unpin'), '2'), doc(body('pin'), '1')])).toEqual([]);
    const again = [doc(body('pin'), '3'), doc(body('unpin'), '2'), doc(body('pin'), '1')];
    expect(pinnedLookups(again).map(({ id }) => id)).toEqual(['3']);
  });
});
