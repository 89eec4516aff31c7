import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA, idOf, INGE, LAB, MILO, MORNING_MS, PureBook, TARIQ } from '../../../tests/support/pure-book';
import { testReading, testSettings, testSpec } from '../../../tests/support/test-lab';
import { runEffect, mapStore } from '../book/documents/effect';
import { KINDS } from '../book/kinds';
import { entryClass } from './judge';
import { KIND_RULES, mayAppend } from './roles';
import { readEntry } from '../book/read-body';

const limits = { max_kV: 14, max_bar_g: 1, max_rate_Hz: 1 };

describe('observations and acts', () => {
  it('knows the acts of protocol 1.2 and takes all else as observations', () => {
    const acts = KINDS.filter((kind) => KIND_RULES[kind].class === 'act').toSorted();
    expect(acts).toEqual(
      [
        'permit.granted',
        'rig.returned',
        'sheet.published',
        'sheet.retired',
        'person.authorised',
        'firing.reviewed',
        'firing.sent-back',
        'incident.answered',
        'incident.closed',
        'parting.settled',
        'entry.adopted',
        'lab.set',
        'person.joined',
        'person.role-set',
        'person.removed',
      ].toSorted(),
    );
  });

  it('lets a reader append nothing but what anybody may: stand down, report and show, claim, keep a lookup', () => {
    const may = KINDS.filter((kind) => mayAppend('reader', kind)).toSorted();
    expect(may).toEqual([
      'entry.claimed',
      'incident.reported',
      'lookup.kept',
      'noise.counted',
      'note.written',
      'photo.attached',
      'rig.stand-down-retracted',
      'rig.stood-down',
    ]);
    for (const kind of KINDS)
      expect([kind, mayAppend('lead', kind), mayAppend(null, kind)]).toEqual([kind, true, false]);
  });

  it('takes a revision that loosens as an act, any other as an observation', () => {
    const { book, rig } = new PureBench();
    const looser = { ...testSpec, envelope: { ...testSpec.envelope, max_kV: 23 } };
    const tighter = { ...testSpec, envelope: { ...testSpec.envelope, max_kV: 20 } };
    const classOf = (spec: typeof testSpec) => {
      const outcome = readEntry(
        book.seal('rig.revised', rig, { number: '2A', based_on: rig, spec, why: '?' }),
      );
      return outcome.type === 'readable'
        ? runEffect(entryClass(outcome.entry), mapStore(book.documents))
        : null;
    };
    expect([classOf(looser), classOf(tighter), classOf(testSpec)]).toEqual([
      'act',
      'observation',
      'observation',
    ]);
    const revised = { number: '2A', based_on: rig, spec: looser, why: 'More' };
    expect(book.write('rig.revised', rig, revised, { session: null })).toMatchObject({
      verdict: 'held-back',
      reason: { cause: 'confirm' },
    });
    expect(book.write('rig.revised', rig, revised).verdict).toBe('applied');
  });
});

describe('authors and their sessions', () => {
  it('applies an act only under its author’s own session', () => {
    const { book, rig } = new PureBench();
    const body = { rig_revision: rig, envelope: limits, until_ms: MORNING_MS + 1e9, words: '' };
    for (const session of [null, ADA, INGE]) {
      expect(book.write('permit.granted', rig, body, { by: MILO, session })).toMatchObject({
        verdict: 'held-back',
        reason: { cause: 'confirm', code: 'confirm' },
      });
    }
    expect(book.write('permit.granted', rig, body, { by: MILO }).verdict).toBe('applied');
  });

  it('takes an observation under any session', () => {
    const bench = new PureBench().ready();
    bench.open({}, { session: null });
    expect(bench.read({}, { session: null }).verdict).toBe('applied');
    expect(bench.read({}, { session: MILO }).verdict).toBe('applied');
  });

  it('marks an observation by somebody whose role does not include it, who is gone, or who never came', () => {
    const { book, rig } = new PureBench();
    const hands = (by: string) => book.write('hands.in', rig, { where: '' }, { by }).reason;
    expect(hands(TARIQ)).toMatchObject({
      cause: 'rule',
      code: 'role',
      words: 'The role reader does not include this.',
    });
    expect(hands(idOf(0xdead))).toMatchObject({ code: 'not-a-member' });
    book.write('person.removed', ADA, { why: 'Left' }, { by: INGE });
    expect(hands(ADA)).toMatchObject({
      code: 'role',
      words: 'The author was removed from this lab.',
      knew: true,
    });
  });

  it('lets the author stay open where a PIN must not stand in the way, and nowhere else', () => {
    const { book, rig } = new PureBench();
    expect(book.write('rig.stood-down', rig, { why: 'Arc' }, { by: null }).verdict).toBe('applied');
    expect(book.write('hands.in', rig, { where: '' }, { by: null }).reason?.code).toBe('author-open');
    const open = KINDS.filter((kind) => KIND_RULES[kind].openAuthor === true);
    expect(open.filter((kind) => KIND_RULES[kind].class === 'act')).toEqual([]);
  });
});

describe('knew, or could not know', () => {
  it('compares the revision of the objection with the mirror that the entry stood on', () => {
    const bench = new PureBench().ready();
    bench.open();
    const down = bench.book.write('rig.stood-down', bench.rig, { why: 'Ozone' }, { by: MILO });
    expect(bench.read({}, { base_revision: down.revision - 1 }).reason?.knew).toBe(false);
    expect(bench.read({}, { base_revision: down.revision }).reason?.knew).toBe(true);
  });

  it('says neither where the objection stands in no revision', () => {
    const { book, rig } = new PureBench();
    expect(book.write('hands.out', rig, { tag: idOf(1) }).reason?.knew).toBeNull();
  });
});

describe('what cannot be read', () => {
  it('holds back a newer kind or version, and a body that does not fit', () => {
    const book = new PureBook();
    const newer = book.sealRaw({ kind: 'laser.dreamt', subject: null, body: {} });
    expect(book.take(newer).reason).toMatchObject({ cause: 'version' });
    const wrong = book.sealRaw({ kind: 'hands.in', subject: null, body: {} });
    expect(book.take(wrong).reason).toMatchObject({ cause: 'unreadable' });
  });
});

describe('what follows a held-back entry', () => {
  function heldPermit() {
    const { book, rig } = new PureBench();
    const body = { rig_revision: rig, envelope: limits, until_ms: MORNING_MS + 1e9, words: '' };
    const held = book.write('permit.granted', rig, body, { by: MILO, session: null }).entry.id;
    return { book, rig, held };
  }

  it('is held back with it: a correction or strike by another, and an act that names it', () => {
    const { book, rig, held } = heldPermit();
    const follows = { verdict: 'held-back', reason: { cause: 'follows', follows: held } };
    expect(book.write('entry.struck', rig, { strikes: held, why: 'Wrong' })).toMatchObject(follows);
    const corrected = { corrects: held, kind: 'firing.reading', body: testReading, why: '' };
    expect(book.write('entry.corrected', rig, corrected, { by: MILO })).toMatchObject(follows);
    expect(book.write('rig.returned', rig, { lifts: [held], words: 'Mended' }, { by: MILO })).toMatchObject(
      follows,
    );
  });

  it('does not follow once the entry was adopted', () => {
    const { book, rig, held } = heldPermit();
    book.write('entry.adopted', rig, { adopts: [held] }, { by: MILO });
    expect(
      book.write('rig.returned', rig, { lifts: [held], words: 'Mended' }, { by: MILO }).reason?.cause,
    ).toBe('rule');
  });

  it('may be an observation, which no held-back entry ever holds back', () => {
    const { book, rig, held } = heldPermit();
    expect(book.write('permit.withdrawn', rig, { permit: held, why: 'Slip' }, { by: MILO }).verdict).toBe(
      'irregular',
    );
  });
});

describe('people and the lab', () => {
  it('keeps at least one lead', () => {
    const book = new PureBook();
    expect(book.write('person.role-set', INGE, { role: 'reader' }, { by: INGE }).reason?.code).toBe(
      'last-lead',
    );
    expect(book.write('person.removed', INGE, { why: 'Gone' }, { by: INGE }).reason?.code).toBe('last-lead');
    book.write('person.role-set', MILO, { role: 'lead' }, { by: INGE });
    expect(book.write('person.removed', INGE, { why: 'Gone' }, { by: INGE }).verdict).toBe('applied');
  });

  it('refuses unknown people, rigs and authorisations, and those that are over before they begin', () => {
    const { book, rig } = new PureBench();
    const fire = { rig, task: 'fire', until_ms: MORNING_MS + 1e6, words: '' } as const;
    const code = (subject: string, body: Parameters<typeof book.write<'person.authorised'>>[2]) =>
      book.write('person.authorised', subject, body, { by: MILO }).reason?.code;
    expect(code(idOf(1), fire)).toBe('unknown-person');
    expect(code(ADA, { ...fire, rig: idOf(1) })).toBe('unknown-rig');
    expect(code(ADA, { ...fire, until_ms: MORNING_MS })).toBe('authorisation-over');
    expect(code(ADA, fire)).toBeUndefined();
    const ended = book.write(
      'person.authorisation-ended',
      ADA,
      { authorisation: idOf(1), why: '?' },
      { by: MILO },
    );
    expect(ended).toMatchObject({ verdict: 'irregular', reason: { code: 'unknown-authorisation' } });
    expect(book.write('lab.set', idOf(1), testSettings, { by: INGE }).reason?.code).toBe('subject');
    expect(book.write('lab.set', LAB, testSettings, { by: MILO }).reason?.code).toBe('role');
  });
});

describe('adopting', () => {
  it('is for the author of what only waits for them, and for a lead', () => {
    const { book, rig } = new PureBench();
    const body = { rig_revision: rig, envelope: limits, until_ms: MORNING_MS + 1e9, words: '' };
    const held = book.write('permit.granted', rig, body, { by: MILO, session: null }).entry.id;
    const adopt = (by: string) => book.write('entry.adopted', rig, { adopts: [held] }, { by });
    expect(adopt(ADA).reason?.code).toBe('may-not-adopt');
    expect(adopt(INGE).verdict).toBe('applied');
    expect(adopt(MILO).reason?.code).toBe('already-decided');
    expect(book.write('entry.adopted', rig, { adopts: [idOf(1)] }, { by: INGE }).reason?.code).toBe(
      'unknown-held',
    );
  });

  it('asks the rules as they stand now', () => {
    const { book, rig } = new PureBench();
    const body = { rig_revision: rig, envelope: limits, until_ms: MORNING_MS + 1e9, words: '' };
    const held = book.write('permit.granted', rig, body, { by: MILO, session: null }).entry.id;
    const spec = { ...testSpec, envelope: { ...testSpec.envelope, max_kV: 20 } };
    book.write('rig.revised', rig, { number: '2A', based_on: rig, spec, why: 'Leaner' });
    const adopted = book.write('entry.adopted', rig, { adopts: [held] }, { by: MILO });
    expect(adopted.reason).toMatchObject({ code: 'superseded-revision' });
  });

  it('cannot adopt what nobody can read', () => {
    const book = new PureBook();
    const held = book.take(book.sealRaw({ kind: 'laser.dreamt', subject: null, body: {} })).entry.id;
    expect(book.write('entry.adopted', held, { adopts: [held] }, { by: INGE }).reason?.code).toBe(
      'unreadable',
    );
  });
});
