import { describe, expect, it } from 'vitest';
import { ENVELOPE, PureBench } from '../../../tests/support/pure-bench';
import { ADA, idOf, INGE, MILO, MORNING_MS, PureBook, TABLET_B } from '../../../tests/support/pure-book';
import { testSpec } from '../../../tests/support/test-lab';

const lower = { ...testSpec, envelope: { ...testSpec.envelope, max_kV: 20 } };
const later = MORNING_MS + 1e9;

describe('objections to entries about a rig', () => {
  it('knows no rig that is not in the Book', () => {
    const book = new PureBook();
    const written = [
      book.write('hands.in', idOf(1), { where: '' }),
      book.write('rig.stood-down', idOf(1), { why: '?' }),
      book.write('incident.reported', idOf(1), { what: '?', near: '', made_safe: '', stand_down: null }),
    ];
    expect(written.map((one) => [one.verdict, one.reason?.code])).toEqual(
      written.map(() => ['irregular', 'unknown-rig']),
    );
    const other = book.write('rig.created', idOf(2), { name: 'Wren', number: '1A', spec: testSpec });
    expect(other.reason?.code).toBe('subject');
  });

  it('wants a revision based on one that it knows', () => {
    const { book, rig } = new PureBench();
    const revised = book.write('rig.revised', rig, {
      number: '2A',
      based_on: idOf(1),
      spec: lower,
      why: '?',
    });
    expect(revised.reason?.code).toBe('unknown-revision');
  });
});

describe('taking a hands-in tag out', () => {
  const tagged = () => {
    const bench = new PureBench();
    return { bench, tag: bench.book.write('hands.in', bench.rig, { where: 'C2' }).entry.id };
  };
  const tags = (bench: PureBench) => bench.book.doc('rig', bench.rig).hands.length;

  it('asks no words of whoever hung it', () => {
    const { bench, tag } = tagged();
    expect(bench.book.write('hands.out', bench.rig, { tag }).verdict).toBe('applied');
    expect(tags(bench)).toBe(0);
  });

  it('asks words of everybody else, and leaves the tag on without them', () => {
    const { bench, tag } = tagged();
    for (const words of [undefined, '  ']) {
      const body = words === undefined ? { tag } : { tag, words };
      const out = bench.book.write('hands.out', bench.rig, body, { by: MILO });
      expect([out.verdict, out.reason?.code]).toEqual(['irregular', 'another-tag']);
      expect(tags(bench)).toBe(1);
    }
    const said = { tag, words: 'Ada went home; I looked, no hands are in' };
    expect(bench.book.write('hands.out', bench.rig, said, { by: MILO, version: 2 }).verdict).toBe('applied');
    expect(tags(bench)).toBe(0);
  });

  it('keeps several tags apart', () => {
    const { bench, tag } = tagged();
    bench.book.write('hands.in', bench.rig, { where: 'Channel' }, { by: MILO });
    bench.book.write('hands.out', bench.rig, { tag });
    expect(bench.book.doc('rig', bench.rig).hands.map((one) => [one.by, one.where])).toEqual([
      [MILO, 'Channel'],
    ]);
  });
});

describe('granting a permit', () => {
  const grant = (
    bench: PureBench,
    more: Partial<{ rig_revision: string; envelope: typeof ENVELOPE; until_ms: number }> = {},
    by = MILO,
  ) =>
    bench.book.write(
      'permit.granted',
      bench.rig,
      { rig_revision: bench.rig, envelope: ENVELOPE, until_ms: later, words: '', ...more },
      { by },
    ).reason?.code ?? 'applied';

  it('is for the latest revision alone, and for none while two part', () => {
    const bench = new PureBench();
    const { book, rig } = bench;
    expect(grant(bench, { rig_revision: idOf(1) })).toBe('unknown-revision');
    const second = book.write('rig.revised', rig, { number: '2A', based_on: rig, spec: lower, why: 'One' })
      .entry.id;
    expect(grant(bench)).toBe('superseded-revision');
    book.write('rig.revised', rig, { number: '2B', based_on: rig, spec: lower, why: 'Other' });
    expect(grant(bench, { rig_revision: second })).toBe('parting');
    expect(book.write('permit.asked', rig, { rig_revision: second, words: 'Tuesday' })).toMatchObject({
      verdict: 'irregular',
      reason: { code: 'parting' },
    });
  });

  it('keeps within the rig’s own limits, each of them', () => {
    const bench = new PureBench();
    for (const beyond of [{ max_kV: 22.1 }, { max_bar_g: 1.3 }, { max_rate_Hz: 6 }]) {
      expect([beyond, grant(bench, { envelope: { ...ENVELOPE, ...beyond } })]).toEqual([
        beyond,
        'envelope-beyond-rig',
      ]);
    }
    expect(grant(bench, { envelope: testSpec.envelope })).toBe('applied');
  });

  it('has not lapsed before it begins', () => {
    expect(grant(new PureBench(), { until_ms: MORNING_MS - 1 })).toBe('permit-over');
  });

  it('is nobody’s own while another reviewer exists: neither revision nor request', () => {
    const bench = new PureBench();
    const { book, rig } = bench;
    book.write('permit.asked', rig, { rig_revision: rig, words: 'For me' }, { by: MILO });
    expect(grant(bench)).toBe('own-permit');
    expect(grant(bench, {}, INGE)).toBe('applied');
    const second = book.write(
      'rig.revised',
      rig,
      { number: '2B', based_on: rig, spec: lower, why: 'Mine' },
      { by: MILO },
    ).entry.id;
    expect(grant(bench, { rig_revision: second, envelope: { ...ENVELOPE, max_kV: 19 } })).toBe('own-permit');
  });

  it('may be one’s own where nobody else could grant it', () => {
    const book = new PureBook({ [INGE]: 'lead', [ADA]: 'operator' });
    const rig = book.write('rig.created', null, { name: 'Wren', number: '1A', spec: testSpec }, { by: INGE })
      .entry.id;
    const granted = book.write(
      'permit.granted',
      rig,
      { rig_revision: rig, envelope: ENVELOPE, until_ms: later, words: '' },
      { by: INGE },
    );
    expect(granted.verdict).toBe('applied');
  });

  it('is withdrawn only where it stands', () => {
    const bench = new PureBench().grant();
    const withdraw = (permit: string) =>
      bench.book.write('permit.withdrawn', bench.rig, { permit, why: 'Valve' }, { by: MILO });
    expect(withdraw(idOf(1))).toMatchObject({ verdict: 'irregular', reason: { code: 'unknown-permit' } });
    expect(withdraw(bench.permit).verdict).toBe('applied');
  });
});

describe('standing down and coming back', () => {
  it('is taken back by its author alone, within two minutes of the same page life', () => {
    const { book, rig } = new PureBench();
    const down = () => book.write('rig.stood-down', rig, { why: 'Sleeve on the key' }).entry.id;
    const retract = (stand_down: string, options = {}) =>
      book.write('rig.stand-down-retracted', rig, { stand_down, incident: null }, options).reason?.code ??
      'applied';
    expect(retract(idOf(1))).toBe('unknown-stand-down');
    expect(retract(down(), { by: MILO })).toBe('not-the-author');
    expect(retract(down(), { at_min: 2.01 })).toBe('too-late');
    expect(retract(down(), { stamp: { page_life: idOf(9) } })).toBe('too-late');
    // A clock that was set back makes no stand-down younger.
    expect(retract(down(), { stamp: { wall_ms: 0, monotonic_ms: 121_000 } })).toBe('too-late');
    const last = down();
    expect(retract(last, { at_min: 2 })).toBe('applied');
    expect(retract(last, { at_min: 2 })).toBe('already-lifted');
  });

  it('is returned by a reviewer who names what stands, and nothing else', () => {
    const { book, rig } = new PureBench();
    const down = book.write('rig.stood-down', rig, { why: 'Ozone' }).entry.id;
    const back = (lifts: string[], by = MILO) =>
      book.write('rig.returned', rig, { lifts, words: 'Mended' }, { by }).reason?.code ?? 'applied';
    expect(back([down], ADA)).toBe('role');
    expect(back([down, idOf(1)])).toBe('nothing-to-lift');
    expect(back([down])).toBe('applied');
    expect(back([down])).toBe('nothing-to-lift');
  });

  it('answers and closes an incident once', () => {
    const { book, rig } = new PureBench();
    const incident = book.write('incident.reported', rig, {
      what: 'Arc',
      near: '',
      made_safe: '',
      stand_down: null,
    }).entry.id;
    const close = () =>
      book.write('incident.closed', incident, { words: 'Mended' }, { by: MILO }).reason?.code ?? 'applied';
    expect(book.write('incident.answered', idOf(1), { words: '?' }, { by: MILO }).reason?.code).toBe(
      'unknown-incident',
    );
    expect([close(), close()]).toEqual(['applied', 'incident-closed']);
  });
});

describe('settling a parting', () => {
  it('names every revision and keeps one of them', () => {
    const { book, rig } = new PureBench();
    const settle = (settles: string[], keeps: string) =>
      book.write('parting.settled', rig, { settles, keeps, words: 'So' }, { by: MILO }).reason?.code ??
      'applied';
    expect(settle([rig, idOf(1)], rig)).toBe('no-parting');
    const one = book.write('rig.revised', rig, { number: '2A', based_on: rig, spec: lower, why: 'One' }).entry
      .id;
    const other = book.write(
      'rig.revised',
      rig,
      { number: '2B', based_on: rig, spec: lower, why: 'Other' },
      { by: MILO, device: TABLET_B },
    ).entry.id;
    expect(settle([one, rig], one)).toBe('parting-not-named');
    expect(settle([one, other], rig)).toBe('parting-not-named');
    expect(settle([one, other], other)).toBe('applied');
  });
});
