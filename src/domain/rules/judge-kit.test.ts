import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA, idOf, INGE, MILO, MORNING_MS, TARIQ } from '../../../tests/support/pure-book';
import type { BodyOf } from '../book/kinds';

const stick: BodyOf<'kit.added'> = {
  number: 'K2',
  name: 'Stick',
  item: { type: 'shorting-stick', resistor_kohm: 10, rated_kV: 40 },
  due_ms: null,
  note: '',
};
const passed = { outcome: 'passed', due_ms: null, count: null, pressure_bar_g: null, words: '' } as const;
const issue = (type: 'person' | 'rig', id: string) => ({ to: { type, id }, count: null, words: '' }) as const;
const back = { condition: 'as-issued', count: null, words: '' } as const;

describe('objections to entries about kit', () => {
  it('knows no kit that is not in the Book, nor holders that are not', () => {
    const { book } = new PureBench();
    expect(book.write('kit.inspected', idOf(1), passed).reason?.code).toBe('unknown-kit');
    expect(book.write('kit.added', idOf(1), stick).reason?.code).toBe('subject');
    const kit = book.write('kit.added', null, stick).entry.id;
    expect(book.write('kit.issued', kit, issue('rig', idOf(1))).reason?.code).toBe('unknown-rig');
    expect(book.write('kit.issued', kit, issue('person', idOf(1))).reason?.code).toBe('unknown-person');
    book.write('person.removed', TARIQ, { why: 'Left' }, { by: INGE });
    expect(book.write('kit.issued', kit, issue('person', TARIQ)).reason?.code).toBe('not-a-member');
    expect(book.write('kit.returned', kit, back).reason?.code).toBe('not-issued');
    expect(book.doc('kit', kit).holder).toBeNull();
  });

  it('wants a next inspection that lies ahead, and nothing more of what was taken out', () => {
    const { book } = new PureBench();
    const kit = book.write('kit.added', null, stick).entry.id;
    expect(book.write('kit.inspected', kit, { ...passed, due_ms: MORNING_MS }).reason?.code).toBe('due-over');
    expect(book.write('kit.inspected', kit, { ...passed, due_ms: MORNING_MS + 1 }).verdict).toBe('applied');
    book.write('kit.inspected', kit, { ...passed, outcome: 'retired' });
    expect(book.write('kit.issued', kit, issue('person', ADA)).reason?.code).toBe('kit-retired');
  });
});

describe('objections to entries about parts and alignment', () => {
  it('wants a part that is on this rig', () => {
    const { book, rig } = new PureBench();
    const retired = book.write('part.retired', rig, { part: idOf(1), why: '?' });
    expect(retired).toMatchObject({ verdict: 'irregular', reason: { code: 'unknown-part' } });
  });

  it('wants a revision and, for turns, a measurement that the Book has', () => {
    const { book, rig } = new PureBench();
    const turned = (rig_revision: string, based_on: string | null) =>
      book.write('alignment.adjusted', rig, {
        rig_revision,
        based_on,
        target_mm: 4,
        turns: [{ screw: 'A', eighths_clockwise: 3 }],
        predicted: null,
        note: '',
      }).reason?.code ?? 'applied';
    expect(turned(idOf(1), null)).toBe('unknown-revision');
    expect(turned(rig, rig)).toBe('unknown-measurement');
    expect(turned(rig, null)).toBe('applied');
  });
});

describe('objections to notes, photos and traces', () => {
  const photo = {
    sha256: 'ab'.repeat(32),
    bytes: 1200,
    name: 'a.jpg',
    media_type: 'image/jpeg',
    caption: '',
    width_px: null,
    height_px: null,
  };

  it('wants something that they are about', () => {
    const { book } = new PureBench();
    const about = { type: 'part', id: idOf(1) } as const;
    expect(book.write('note.written', null, { about, words: '?' }).reason?.code).toBe('unknown-subject');
    expect(book.write('note.amended', idOf(1), { based_on: idOf(1), words: '?' }).reason?.code).toBe(
      'unknown-note',
    );
  });

  it('lets anybody show an incident, before a PIN too, and nothing else', () => {
    const { book, rig } = new PureBench();
    const body = { what: 'Arc', near: '', made_safe: '', stand_down: null };
    const id = book.write('incident.reported', rig, body, { by: null }).entry.id;
    const show = (about: BodyOf<'photo.attached'>['about'], by: string | null) =>
      book.write('photo.attached', null, { ...photo, about }, { by }).reason?.code ?? 'applied';
    expect(show({ type: 'incident', id }, null)).toBe('applied');
    expect(show({ type: 'incident', id }, TARIQ)).toBe('applied');
    expect(show({ type: 'rig', id: rig }, null)).toBe('author-open');
    expect(show({ type: 'rig', id: rig }, TARIQ)).toBe('role');
    expect(show({ type: 'rig', id: rig }, MILO)).toBe('applied');
  });
});

describe('objections to guests', () => {
  const guest = { person: null, name: '', knows_isolator: true, eyewear: null, words: '' };

  it('wants another person, and one who is there to go', () => {
    const { book, rig } = new PureBench();
    expect(book.write('guest.in', rig, { ...guest, person: idOf(1) }).reason?.code).toBe('unknown-person');
    expect(book.write('guest.in', rig, { ...guest, person: ADA }).reason?.code).toBe('own-company');
    expect(book.write('guest.in', rig, { ...guest, person: MILO }).verdict).toBe('applied');
    expect(book.write('guest.out', rig, { guest: idOf(1) }).reason?.code).toBe('unknown-guest');
  });
});
