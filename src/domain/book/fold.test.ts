import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import {
  ADA,
  idOf,
  INGE,
  LAB,
  MILO,
  MORNING_MS,
  PureBook,
  TABLET_A,
  TABLET_B,
  TARIQ,
} from '../../../tests/support/pure-book';
import { testReading, testSettings, testSpec } from '../../../tests/support/test-lab';
import { headRevisions, latestRevision, rulingEnvelope, unliftedStandDowns } from './documents/rig';
import { standingReading } from './documents/reading';
import { standingReview } from './documents/firing';
import { mapStore, runEffect } from './documents/effect';
import { foldEntry } from './fold';

describe('folding people and the lab', () => {
  it('keeps name, role and when it was set, and one list of roles', () => {
    const book = new PureBook();
    book.write('person.role-set', ADA, { role: 'reviewer' }, { by: INGE });
    book.write('person.removed', TARIQ, { why: 'Left' }, { by: INGE });
    expect(book.doc('person', ADA)).toMatchObject({ role: 'reviewer', role_set: { by: INGE, at: 5 } });
    expect(book.doc('person', TARIQ).role).toBeNull();
    expect(book.doc('crew', LAB).roles).toEqual({ [INGE]: 'lead', [MILO]: 'reviewer', [ADA]: 'reviewer' });
  });

  it('keeps authorisations over a second joining, and ends the one that is named', () => {
    const bench = new PureBench().authorise();
    const { book, authorisation } = bench;
    book.write('person.joined', ADA, { name: 'Ada Brook', role: 'operator' }, { by: INGE });
    expect(book.doc('person', ADA)).toMatchObject({
      name: 'Ada Brook',
      authorisations: [{ entry: authorisation, ended: null }],
    });
    const ended = book.write(
      'person.authorisation-ended',
      ADA,
      { authorisation, why: 'Refresher due' },
      { by: MILO },
    );
    expect(book.doc('person', ADA).authorisations).toMatchObject([{ ended: { entry: ended.entry.id } }]);
  });

  it('keeps the lab as it was last set', () => {
    const book = new PureBook();
    book.write('lab.set', LAB, testSettings, { by: INGE });
    book.write('lab.set', LAB, { ...testSettings, ambient_bar_abs: 0.95 }, { by: INGE });
    expect(book.doc('lab', LAB).settings.ambient_bar_abs).toBe(0.95);
  });
});

describe('folding a rig', () => {
  const lower = { ...testSpec, envelope: { max_kV: 20, max_bar_g: 1, max_rate_Hz: 4 } };

  it('moves its head with each revision and voids the check', () => {
    const { book, rig } = new PureBench().ready();
    const revised = book.write('rig.revised', rig, {
      number: '2A',
      based_on: rig,
      spec: lower,
      why: 'Leaner',
    });
    const doc = book.doc('rig', rig);
    expect(doc.heads).toEqual([revised.entry.id]);
    expect(latestRevision(doc).number).toBe('2A');
    expect(doc.ready_check?.voided).toMatchObject({ code: 'revised', at: revised.revision });
  });

  it('holds two revisions of one base as a parting, the stricter limit of each pair ruling, until one settles it', () => {
    const { book, rig } = new PureBench();
    const one = book.write('rig.revised', rig, { number: '2A', based_on: rig, spec: lower, why: 'One' });
    const spec = { ...testSpec, envelope: { max_kV: 21, max_bar_g: 0.9, max_rate_Hz: 4.5 } };
    const other = book.write(
      'rig.revised',
      rig,
      { number: '2B', based_on: rig, spec, why: 'Other' },
      { device: TABLET_B, by: MILO },
    );
    expect(headRevisions(book.doc('rig', rig)).map((head) => head.number)).toEqual(['2A', '2B']);
    expect(rulingEnvelope(book.doc('rig', rig))).toEqual({ max_kV: 20, max_bar_g: 0.9, max_rate_Hz: 4 });
    const settles = [one.entry.id, other.entry.id];
    book.write(
      'parting.settled',
      rig,
      { settles, keeps: one.entry.id, words: 'A measured it' },
      { by: MILO },
    );
    expect(book.doc('rig', rig).heads).toEqual([one.entry.id]);
  });

  it('lifts only the stand-downs that are named', () => {
    const { book, rig } = new PureBench();
    const known = book.write('rig.stood-down', rig, { why: 'Ozone' });
    const unknown = book.write('rig.stood-down', rig, { why: 'Crack' }, { by: MILO, device: TABLET_B });
    book.write('rig.returned', rig, { lifts: [known.entry.id], words: 'Aired' }, { by: MILO });
    expect(unliftedStandDowns(book.doc('rig', rig)).map((one) => one.entry)).toEqual([unknown.entry.id]);
  });

  it('stands down by an incident, under the incident’s own id', () => {
    const { book, rig } = new PureBench().ready();
    const incident = book.write('incident.reported', rig, {
      what: 'Puncture',
      near: '',
      made_safe: '',
      stand_down: null,
    });
    expect(unliftedStandDowns(book.doc('rig', rig))).toMatchObject([
      { entry: incident.entry.id, why: 'Puncture' },
    ]);
    expect(book.doc('rig', rig).ready_check?.voided?.code).toBe('stood-down');
    book.write('incident.answered', incident.entry.id, { words: 'Film cut' }, { by: MILO });
    book.write('incident.closed', incident.entry.id, { words: 'New film' }, { by: MILO });
    expect(book.doc('incident', incident.entry.id)).toMatchObject({
      answers: [{ words: 'Film cut' }],
      closed: { words: 'New film' },
    });
  });

  it('counts hands in and out by their tags', () => {
    const { book, rig } = new PureBench().ready();
    const tag = book.write('hands.in', rig, { where: 'Channel' }).entry.id;
    expect(book.doc('rig', rig)).toMatchObject({
      hands: [{ entry: tag, where: 'Channel' }],
      ready_check: { voided: { code: 'hands-in' } },
    });
    book.write('hands.out', rig, { tag });
    expect(book.doc('rig', rig).hands).toEqual([]);
  });

  it('says what was declared, by whom, and who holds it', () => {
    const { book, rig } = new PureBench().ready();
    expect(book.doc('rig', rig)).toMatchObject({
      declared: { state: 'short-off', by: ADA },
      holder: TABLET_A,
    });
    const shorted = book.write('rig.declared', rig, { state: 'shorted' }, { by: MILO, device: TABLET_B });
    expect(book.doc('rig', rig)).toMatchObject({
      declared: { state: 'shorted' },
      holder: TABLET_B,
      last_short: { entry: shorted.entry.id },
      ready_check: { voided: { code: 'made-safe' } },
    });
  });

  it('lets an irregular "shorted" declare nothing', () => {
    const { book, rig } = new PureBench().ready();
    const declared = book.write('rig.declared', rig, { state: 'shorted' }, { by: TARIQ });
    expect(declared.verdict).toBe('irregular');
    expect(book.doc('rig', rig).declared?.state).toBe('short-off');
  });

  it('keeps permits with what answers and what withdraws them', () => {
    const bench = new PureBench();
    const { book, rig } = bench;
    book.write('permit.asked', rig, { rig_revision: rig, words: 'Tuesday' });
    expect(book.doc('rig', rig).permits_asked).toMatchObject([{ answered: false }]);
    bench.grant();
    expect(book.doc('rig', rig).permits_asked).toMatchObject([{ answered: true }]);
    const withdrawn = book.write(
      'permit.withdrawn',
      rig,
      { permit: bench.permit, why: 'Valve' },
      { by: MILO },
    );
    expect(book.doc('rig', rig).permits).toMatchObject([
      { entry: bench.permit, withdrawn: { entry: withdrawn.entry.id } },
    ]);
  });
});

describe('folding checks', () => {
  it('leaves a closed check closed when somebody abandons it afterwards', () => {
    const { book, check, rig } = new PureBench().ready();
    const late = book.write('check.abandoned', check, { why: 'Slip' });
    expect(late.verdict).toBe('irregular');
    expect(book.doc('check', check).ended?.how).toBe('closed');
    expect(book.doc('rig', rig).open_checks).toEqual([]);
  });

  it('declares only the danger when a check is closed with a step missing', () => {
    const { book, rig, sheet } = new PureBench().authorise().grant();
    const check = book.write('check.opened', null, { rig, rig_revision: rig, sheet }).entry.id;
    expect(book.doc('rig', rig).open_checks).toEqual([check]);
    expect(book.write('check.closed', check, {}).verdict).toBe('irregular');
    expect(book.doc('rig', rig)).toMatchObject({
      declared: { state: 'short-off' },
      ready_check: null,
      open_checks: [],
    });
  });
});

describe('folding a firing', () => {
  it('counts readings and shots, keeps the check active, and closes once', () => {
    const bench = new PureBench().ready();
    const { book } = bench;
    bench.must(bench.open());
    bench.must(bench.read({}, { at_min: 20 }));
    bench.must(book.write('firing.shots-counted', bench.firing, { shots: 90, rate_Hz: 1 }, { at_min: 25 }));
    expect(book.doc('rig', bench.rig)).toMatchObject({
      ready_check: { active: { monotonic_ms: 25 * 60_000 } },
      open_firings: [bench.firing],
      last_firing: bench.firing,
    });
    bench.must(book.write('firing.closed', bench.firing, { summary: 'Even' }, { at_min: 30 }));
    expect(book.write('firing.closed', bench.firing, { summary: 'Again' }, { at_min: 31 }).verdict).toBe(
      'irregular',
    );
    expect(book.doc('firing', bench.firing)).toMatchObject({
      readings: 1,
      shots: 100,
      irregular_readings: 0,
      closed: { summary: 'Even' },
    });
    expect(book.doc('rig', bench.rig).open_firings).toEqual([]);
  });

  it('lets the last review stand', () => {
    const bench = new PureBench().ready();
    const { book } = bench;
    bench.open();
    book.write('firing.closed', bench.firing, { summary: '' });
    book.write('firing.sent-back', bench.firing, { words: 'Which gas?' }, { by: MILO });
    book.write(
      'firing.reviewed',
      bench.firing,
      { words: '', left_out: [], seen_revision: 1, seen_hash: '' },
      { by: MILO },
    );
    expect(standingReview(book.doc('firing', bench.firing))?.verdict).toBe('reviewed');
    expect(book.doc('firing', bench.firing).reviews).toHaveLength(2);
  });

  it('follows corrections to their end, parts where two replace the same, and counts no shot of a struck reading', () => {
    const bench = new PureBench().ready();
    const { book } = bench;
    bench.open();
    const reading = bench.read().entry.id;
    const correct = (corrects: string, shots: number) =>
      bench.must(
        book.write('entry.corrected', bench.firing, {
          corrects,
          kind: 'firing.reading',
          body: { ...testReading, shots },
          why: '',
        }),
      );
    const first = correct(reading, 20);
    correct(first, 30);
    expect(standingReading(book.doc('reading', reading))).toMatchObject({
      type: 'stands',
      corrected: true,
      values: { shots: 30 },
    });
    expect(book.doc('firing', bench.firing).shots).toBe(30);
    correct(first, 25);
    expect(standingReading(book.doc('reading', reading))).toMatchObject({
      type: 'parted',
      versions: [{}, {}],
    });
    // Wear leans to the larger count.
    expect(book.doc('firing', bench.firing).shots).toBe(30);
    bench.must(book.write('entry.struck', bench.firing, { strikes: reading, why: 'Twice' }));
    expect(standingReading(book.doc('reading', reading)).type).toBe('struck');
    expect(book.doc('firing', bench.firing).shots).toBe(0);
    expect(book.doc('reading', reading).original.shots).toBe(10);
  });
});

describe('folding what was held back', () => {
  it('keeps text and reason, without any other effect', () => {
    const { book, rig } = new PureBench();
    const held = book.write('rig.returned', rig, { lifts: [idOf(1)], words: 'Mended' });
    expect(held.verdict).toBe('held-back');
    expect(book.doc('held', held.entry.id)).toMatchObject({
      parent: rig,
      entry: held.entry,
      reason: held.reason,
      adopted: null,
      dismissed: null,
    });
  });

  it('gives an adopted entry its effect at the revision of the adoption, under its own author', () => {
    const { book, rig } = new PureBench();
    const body = { rig_revision: rig, envelope: testSpec.envelope, until_ms: MORNING_MS + 1e9, words: '' };
    const held = book.write('permit.granted', rig, body, { by: MILO, session: null });
    expect(book.doc('rig', rig).permits).toEqual([]);
    const adopted = book.write('entry.adopted', rig, { adopts: [held.entry.id] }, { by: MILO });
    expect(adopted.verdict).toBe('applied');
    expect(book.doc('rig', rig).permits).toMatchObject([
      { entry: held.entry.id, by: MILO, at: adopted.revision },
    ]);
    expect(book.doc('held', held.entry.id)).toMatchObject({ adopted: { entry: adopted.entry.id } });
  });

  it('is dismissed by its author’s strike', () => {
    const { book, rig } = new PureBench();
    const held = book.write('rig.returned', rig, { lifts: [idOf(1)], words: 'Mended' });
    const struck = book.write('entry.struck', rig, { strikes: held.entry.id, why: 'Slip' });
    expect(struck.verdict).toBe('applied');
    expect(book.doc('held', held.entry.id).dismissed).toMatchObject({ entry: struck.entry.id });
  });

  it('makes the rig not ready where this app cannot read what was applied', () => {
    const bench = new PureBench().ready();
    const { book, rig } = bench;
    bench.open();
    const newer = book.sealRaw({ kind: 'firing.tuned', subject: bench.firing, body: {} });
    runEffect(foldEntry(newer, { verdict: 'applied', reason: null, revision: 99 }), mapStore(book.documents));
    expect(book.doc('rig', rig).needs_newer_app).toBe(true);
  });

  it('claims an entry whose author was left open', () => {
    const { book, rig } = new PureBench();
    const open = book.write('rig.stood-down', rig, { why: 'Arc outside' }, { by: null });
    expect(open.verdict).toBe('applied');
    book.write('entry.claimed', rig, { claims: open.entry.id });
    expect(book.doc('claim', open.entry.id)).toMatchObject({ claimed: { by: ADA } });
  });

  it('throws on a held-back entry without a reason, which nobody ever wrote', () => {
    const book = new PureBook();
    const entry = book.seal('hands.in', idOf(1), { where: '' });
    expect(() =>
      runEffect(foldEntry(entry, { verdict: 'held-back', reason: null, revision: 1 }), mapStore(new Map())),
    ).toThrow();
  });
});
