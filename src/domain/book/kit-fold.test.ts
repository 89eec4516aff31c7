import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA, MILO, MORNING_MS, TARIQ } from '../../../tests/support/pure-book';
import type { BodyOf } from './kinds';
import { headVersions } from './documents/note';
import { standingValues } from './documents/versions';

const DAY_MS = 86_400_000;
const eyewear: BodyOf<'kit.added'> = {
  number: 'E3',
  name: 'UV and amber',
  item: {
    type: 'eyewear',
    densities: [{ from_nm: 190, to_nm: 375, density: 6 }],
    visible_transmission_pct: 40,
  },
  due_ms: MORNING_MS + 30 * DAY_MS,
  note: '',
};
const spare: BodyOf<'kit.added'> = {
  number: 'S1',
  name: 'Doorknob 1.0 nF 30 kV',
  item: { type: 'spare', count: 3, minimum: 2, catalogue: null },
  due_ms: null,
  note: '',
};
const passed = { outcome: 'passed', due_ms: null, count: null, pressure_bar_g: null, words: '' } as const;
const to = (type: 'person' | 'rig', id: string) => ({ to: { type, id }, count: null, words: '' }) as const;
const back = { condition: 'as-issued', count: null, words: '' } as const;

describe('folding kit', () => {
  it('goes from hand to hand, and whoever has it carries what readiness asks for', () => {
    const { book, rig } = new PureBench();
    const kit = book.write('kit.added', null, eyewear).entry.id;
    book.write('kit.issued', kit, to('person', ADA));
    expect(book.doc('person', ADA).kit).toEqual([
      { kit, type: 'eyewear', number: 'E3', name: 'UV and amber', due_ms: eyewear.due_ms, failed: false },
    ]);
    const moved = book.write('kit.issued', kit, to('rig', rig));
    expect(book.doc('person', ADA).kit).toEqual([]);
    expect(book.doc('rig', rig).kit).toMatchObject([{ kit }]);
    expect(book.doc('kit', kit)).toMatchObject({
      holder: { type: 'rig', id: rig },
      held: { entry: moved.entry.id },
    });
    book.write('kit.returned', kit, back);
    expect(book.doc('rig', rig).kit).toEqual([]);
    expect(book.doc('kit', kit)).toMatchObject({ holder: null, held: null, state: 'fit' });
    expect(book.doc('kit', kit).history.map((one) => one.kind)).toEqual([
      'kit.issued',
      'kit.issued',
      'kit.returned',
    ]);
  });

  it('tells its holder of a new date and of a failed inspection', () => {
    const { book } = new PureBench();
    const kit = book.write('kit.added', null, eyewear).entry.id;
    book.write('kit.issued', kit, to('person', ADA));
    const due_ms = MORNING_MS + 365 * DAY_MS;
    book.write('kit.inspected', kit, { ...passed, due_ms });
    expect(book.doc('person', ADA).kit).toMatchObject([{ due_ms, failed: false }]);
    book.write('kit.inspected', kit, { ...passed, outcome: 'failed', words: 'Scratched' });
    expect(book.doc('person', ADA).kit).toMatchObject([{ due_ms, failed: true }]);
    book.write('kit.inspected', kit, { ...passed, outcome: 'retired', words: 'Scrapped' });
    expect(book.doc('person', ADA).kit).toEqual([]);
    expect(book.doc('kit', kit)).toMatchObject({ state: 'retired', holder: null });
  });

  it('does not pass by the word of somebody who may not say so, but fails by anybody’s', () => {
    const { book } = new PureBench();
    const kit = book.write('kit.added', null, eyewear).entry.id;
    book.write('kit.returned', kit, { ...back, condition: 'damaged' });
    expect(book.doc('kit', kit).state).toBe('failed');
    expect(book.write('kit.inspected', kit, passed, { by: TARIQ }).verdict).toBe('irregular');
    expect(book.doc('kit', kit).state).toBe('failed');
    book.write('kit.inspected', kit, passed);
    expect(book.doc('kit', kit).state).toBe('fit');
    book.write('kit.inspected', kit, { ...passed, outcome: 'failed' }, { by: TARIQ });
    expect(book.doc('kit', kit).state).toBe('failed');
    expect(book.doc('kit', kit).history.filter((one) => one.irregular !== null)).toHaveLength(3);
  });

  it('counts spares, never below none, and a stocktaking sets the count', () => {
    const { book } = new PureBench();
    const kit = book.write('kit.added', null, spare).entry.id;
    const count = () => book.doc('kit', kit).item;
    book.write('kit.issued', kit, { ...to('person', ADA), count: 2 });
    expect(count()).toMatchObject({ count: 1 });
    book.write('kit.issued', kit, { ...to('person', ADA), count: 5 });
    expect(count()).toMatchObject({ count: 0 });
    book.write('kit.returned', kit, { ...back, count: 1 });
    book.write('kit.inspected', kit, { ...passed, count: 12 });
    expect(count()).toMatchObject({ count: 12, minimum: 2 });
    expect(book.doc('person', ADA).kit).toEqual([]);
  });

  it('keeps what a cylinder’s gauge last read', () => {
    const { book } = new PureBench();
    const item = { type: 'cylinder', gas: 'N2', water_L: 10, pressure_bar_g: 200 } as const;
    const kit = book.write('kit.added', null, { ...spare, item }).entry.id;
    book.write('kit.inspected', kit, { ...passed, pressure_bar_g: 84 });
    expect(book.doc('kit', kit).item).toMatchObject({ pressure_bar_g: 84 });
  });
});

const fitted: BodyOf<'part.fitted'> = {
  what: 'Doorknob 1.0 nF 30 kV',
  place: 'first',
  where: 'third from the gap',
  serial: '',
  catalogue: null,
  fitted_on: '2026-02-27',
  shots_before: 0,
  replaces: null,
  note: '',
};

describe('folding parts', () => {
  it('voids the check, and a new part retires the one whose place it takes', () => {
    const { book, rig } = new PureBench().ready();
    const old = book.write('part.fitted', rig, fitted).entry.id;
    expect(book.doc('rig', rig).ready_check?.voided?.code).toBe('part-changed');
    const next = book.write('part.fitted', rig, { ...fitted, replaces: old }).entry.id;
    expect(book.doc('part', old).retired).toMatchObject({ entry: next, why: 'Replaced' });
    book.write('part.retired', rig, { part: next, why: 'Cracked' });
    expect(book.doc('part', next).retired).toMatchObject({ why: 'Cracked' });
    const again = book.write('part.retired', rig, { part: next, why: 'Twice' });
    expect(again.reason?.code).toBe('part-retired');
    expect(book.doc('part', next).retired).toMatchObject({ why: 'Cracked' });
  });
});

describe('folding alignment', () => {
  const measured = (rig: string, gap_a_mm: number): BodyOf<'alignment.measured'> => ({
    rig_revision: rig,
    gap_a_mm,
    gap_b_mm: 4.1,
    place_a_mm: 10,
    place_b_mm: 270,
    feeler_error_mm: 0.02,
    note: '',
  });

  it('keeps each line with its corrections; hands on the channel void the check, seeing arcs does not', () => {
    const { book, rig } = new PureBench().ready();
    const seen = { rig_revision: rig, where: 'a-end', shots: 20, firing: null, note: '' } as const;
    book.write('alignment.arc-seen', rig, seen);
    expect(book.doc('rig', rig).ready_check?.voided).toBeNull();
    const line = book.write('alignment.measured', rig, measured(rig, 3.9)).entry.id;
    expect(book.doc('rig', rig).ready_check?.voided?.code).toBe('aligned');
    const correction = book.write('entry.corrected', rig, {
      corrects: line,
      kind: 'alignment.measured',
      body: measured(rig, 3.8),
      why: 'Read the wrong leaf',
    });
    const now = standingValues(book.doc('alignment', line));
    expect(now).toMatchObject({ type: 'stands', corrected: true, values: { body: { gap_a_mm: 3.8 } } });
    const correct = (corrects: string, gap_a_mm: number) =>
      book.write('entry.corrected', rig, {
        corrects,
        kind: 'alignment.measured',
        body: measured(rig, gap_a_mm),
        why: '',
      });
    expect(correct(correction.entry.id, 3.7).verdict).toBe('applied');
    expect(standingValues(book.doc('alignment', line))).toMatchObject({
      values: { body: { gap_a_mm: 3.7 } },
    });
    correct(line, 3.6);
    expect(standingValues(book.doc('alignment', line)).type).toBe('parted');
    book.write('entry.struck', rig, { strikes: line, why: 'Another rig' });
    expect(standingValues(book.doc('alignment', line)).type).toBe('struck');
    const asTurned = book.write('entry.corrected', rig, {
      corrects: line,
      kind: 'alignment.arc-seen',
      body: seen,
      why: '',
    });
    expect(asTurned.reason?.code).toBe('unknown-entry');
  });
});

describe('folding guests', () => {
  const guest = { person: null, name: 'Visitor', knows_isolator: true, eyewear: null, words: '' };

  it('keeps who is there until they are checked out', () => {
    const { book, rig } = new PureBench();
    const id = book.write('guest.in', rig, guest).entry.id;
    book.write('guest.in', rig, { ...guest, person: ADA });
    expect(book.doc('rig', rig).guests).toMatchObject([
      { entry: id, irregular: null },
      { person: ADA, irregular: 'own-company' },
    ]);
    book.write('guest.out', rig, { guest: id });
    expect(book.doc('rig', rig).guests).toMatchObject([{ person: ADA }]);
  });
});

describe('folding notes, photos and traces', () => {
  const about = (id: string) => ({ type: 'rig' as const, id });

  it('amends a note by the version that it is based on, parts, and settles', () => {
    const { book, rig } = new PureBench();
    const note = book.write('note.written', null, { about: about(rig), words: 'Hums' }).entry.id;
    const one = book.write('note.amended', note, { based_on: note, words: 'Hums at 2 Hz' }).entry.id;
    expect(headVersions(book.doc('note', note)).map(({ words }) => words)).toEqual(['Hums at 2 Hz']);
    const two = book.write('note.amended', note, { based_on: note, words: 'Hums, fan' }, { by: MILO }).entry
      .id;
    expect(headVersions(book.doc('note', note))).toHaveLength(2);
    const settle = (keeps: string) =>
      book.write('parting.settled', note, { settles: [one, two], keeps, words: 'Fan' }, { by: MILO });
    expect(settle(note).reason?.code).toBe('parting-not-named');
    expect(settle(two).verdict).toBe('applied');
    expect(headVersions(book.doc('note', note)).map(({ words }) => words)).toEqual(['Hums, fan']);
    book.write('entry.struck', note, { strikes: note, why: 'Wrong rig' });
    expect(book.doc('note', note).struck).toMatchObject({ why: 'Wrong rig' });
  });

  it('keeps photos and traces under what they are about, and corrects them under their own id', () => {
    const bench = new PureBench().ready();
    const { book, rig } = bench;
    const firing = bench.open().entry.id;
    const reading = bench.read().entry.id;
    const file = { sha256: 'ab'.repeat(32), bytes: 1200, name: 'a.jpg', media_type: 'image/jpeg' };
    const photo = { ...file, about: about(rig), caption: '', width_px: 1600, height_px: 1200 };
    const id = book.write('photo.attached', null, photo).entry.id;
    book.write('entry.corrected', id, {
      corrects: id,
      kind: 'photo.attached',
      body: { ...photo, caption: 'C1, the edge' },
      why: '',
    });
    expect(standingValues(book.doc('photo', id))).toMatchObject({ values: { caption: 'C1, the edge' } });
    expect(book.doc('photo', id).parent).toBe(rig);
    const trace = {
      ...file,
      about: { type: 'firing' as const, id: firing },
      reading,
      points: 1_000_000,
      reading_as: null,
      figures: [],
      note: '',
    };
    expect(book.write('trace.attached', null, trace).verdict).toBe('applied');
    expect(book.write('trace.attached', null, { ...trace, reading: rig }).reason?.code).toBe(
      'unknown-reading',
    );
  });
});
