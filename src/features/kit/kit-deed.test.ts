import { describe, expect, it } from 'vitest';
import { deedOf, deedsOf, EMPTY_DEED, readDeed, type DeedDraft } from './kit-deed';
import { kitDoc, NOW_MS, spareDoc } from './kit.fixture';

const context = { now_ms: NOW_MS, zone: 'Etc/UTC', self: 'ada' };
const draft = (parts: Partial<DeedDraft>): DeedDraft => ({ ...EMPTY_DEED, ...parts });
const ada = { type: 'person', id: 'ada' } as const;
const held = kitDoc({ holder: ada });

describe('what may be done with a piece', () => {
  it('offers a return only of what is out, and takes it up by itself', () => {
    expect(deedsOf(kitDoc()).map(({ value }) => value)).toEqual(['issue', 'inspect']);
    expect(deedOf(kitDoc(), draft({ deed: 'return' }))).toBe('issue');
    expect(deedOf(held, EMPTY_DEED)).toBe('return');
    expect(deedsOf(spareDoc('S1', 0, 1)).map(({ label }) => label)).toEqual(['Take', 'Return', 'Count']);
  });

  it('issues to somebody, not twice', () => {
    expect(readDeed(kitDoc(), EMPTY_DEED, context)).toMatchObject({ words: 'Say who gets it.' });
    const given = draft({ deed: 'issue', to: ada });
    expect(readDeed(kitDoc(), given, context)).toMatchObject({
      entry: { kind: 'kit.issued', body: { to: ada, count: null } },
    });
    expect(readDeed(held, given, context)).toMatchObject({ type: 'refused' });
  });

  it('takes spares by the piece, for whoever is open', () => {
    const spare = spareDoc('S1', 3, 1);
    expect(readDeed(spare, draft({ texts: { pieces: '2' } }), context)).toMatchObject({
      entry: { kind: 'kit.issued', body: { to: ada, count: 2 } },
    });
    expect(readDeed(spare, draft({ texts: { pieces: '1.5' } }), context)).toMatchObject({ type: 'refused' });
    expect(readDeed(spare, draft({ deed: 'inspect', texts: { count: '7' } }), context)).toMatchObject({
      entry: { kind: 'kit.inspected', body: { outcome: 'passed', count: 7, due_ms: null } },
    });
  });

  it('inspects: passing sets the next date, not passing asks for words', () => {
    const inspect = (parts: Partial<DeedDraft>) =>
      readDeed(kitDoc(), draft({ deed: 'inspect', ...parts }), context);
    expect(inspect({})).toMatchObject({ words: 'Say whether it passed.' });
    expect(inspect({ outcome: 'failed' })).toMatchObject({ words: 'Say why, in words.' });
    expect(inspect({ outcome: 'failed', words: 'Scratched' })).toMatchObject({
      entry: { body: { outcome: 'failed', due_ms: null, words: 'Scratched' } },
    });
    const passed = inspect({ outcome: 'passed', texts: { due_months: '6' } });
    expect(passed).toMatchObject({ entry: { body: { outcome: 'passed', count: null } } });
    if (passed.type !== 'ready' || passed.entry.kind !== 'kit.inspected') throw new Error('not ready');
    expect(passed.entry.body.due_ms).toBeGreaterThan(NOW_MS);
  });

  it('asks how a piece came back, and what is damaged', () => {
    expect(readDeed(held, EMPTY_DEED, context)).toMatchObject({ type: 'refused' });
    expect(readDeed(held, draft({ condition: 'damaged' }), context)).toMatchObject({
      words: 'Say what is damaged.',
    });
    expect(readDeed(held, draft({ condition: 'as-issued' }), context)).toMatchObject({
      entry: { kind: 'kit.returned', body: { condition: 'as-issued', count: null } },
    });
  });
});
