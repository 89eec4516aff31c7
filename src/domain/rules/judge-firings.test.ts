import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA, idOf, INGE, MILO, MORNING_MS, TABLET_B } from '../../../tests/support/pure-book';
import { testReading, testSpec } from '../../../tests/support/test-lab';

const unready = { missing: [{ code: 'no-check', words: 'No check' }], why: 'One shot' };

describe('opening a firing', () => {
  it('is regular with everything in place, and irregular with the first thing that is missing', () => {
    expect(new PureBench().ready().open().verdict).toBe('applied');
    const codes = [
      new PureBench().grant().walk().open(),
      new PureBench().authorise().walk().open(),
      new PureBench().authorise().grant().open(),
    ].map((one) => [one.verdict, one.reason?.code]);
    expect(codes).toEqual([
      ['irregular', 'not-authorised'],
      ['irregular', 'no-permit'],
      ['irregular', 'no-check'],
    ]);
  });

  it('may be recorded as unready, with its own words', () => {
    const opened = new PureBench().open({ check: null, permit: null, unready });
    expect(opened.verdict).toBe('applied');
  });

  it('names the rig, revision, check and permit that stand', () => {
    const bench = new PureBench().ready();
    const code = (more: Parameters<PureBench['open']>[0]) => bench.open(more).reason?.code ?? 'applied';
    expect(code({ rig: idOf(1) })).toBe('unknown-rig');
    expect(code({ rig_revision: idOf(1) })).toBe('unknown-revision');
    expect(code({ check: idOf(1) })).toBe('other-check');
    expect(code({ permit: idOf(1) })).toBe('other-permit');
    expect(code({ check: null, permit: null })).toBe('other-check');
    expect(code({})).toBe('applied');
  });

  it('looks at permit and authorisation as they were when it was written, not when it arrived', () => {
    const bench = new PureBench()
      .authorise(MORNING_MS + 3_600_000)
      .grant(MORNING_MS + 3_600_000)
      .walk();
    expect(bench.open({}, { at_min: 20, arrives_min: 3 * 24 * 60 }).verdict).toBe('applied');
    const late = new PureBench()
      .authorise()
      .grant(MORNING_MS + 60_000)
      .walk();
    expect(late.open({}, { at_min: 2 }).reason?.code).toBe('permit-lapsed');
    // A clock ahead of the server's, or one that says it is uncertain, is not believed.
    const odd = new PureBench()
      .authorise()
      .grant(MORNING_MS + 60_000)
      .walk();
    expect(
      odd.open({}, { at_min: 5, stamp: { wall_ms: MORNING_MS, time_uncertain: true, monotonic_ms: 0 } })
        .reason?.code,
    ).toBe('permit-lapsed');
  });
});

describe('while a firing is open', () => {
  function firing() {
    const bench = new PureBench().ready();
    bench.must(bench.open());
    return bench;
  }

  it('marks readings after a stand-down, hands in, a withdrawn permit or a voided check', () => {
    const down = firing();
    down.book.write('rig.stood-down', down.rig, { why: 'Ozone' }, { by: MILO });
    expect(down.read().reason).toMatchObject({ code: 'stood-down', words: 'The rig was stood down.' });

    const hands = firing();
    hands.book.write('hands.in', hands.rig, { where: '' }, { by: MILO });
    expect(hands.read().reason?.code).toBe('hands-in');

    const permit = firing();
    permit.book.write('permit.withdrawn', permit.rig, { permit: permit.permit, why: 'Valve' }, { by: MILO });
    expect(permit.read().reason?.code).toBe('permit-withdrawn');

    const gas = firing();
    gas.book.write('gas.changed', gas.rig, { words: 'New cylinder' });
    expect(gas.read().reason?.code).toBe('check-gas-changed');
    expect(gas.book.write('firing.shots-counted', gas.firing, { shots: 5, rate_Hz: null }).reason?.code).toBe(
      'check-gas-changed',
    );
  });

  it('marks readings beyond the permit’s envelope, or the rig’s where there is no permit', () => {
    const bench = firing();
    for (const beyond of [{ voltage_kV: 21.1 }, { pressure_bar_g: 1.15 }, { rate_Hz: 3.1 }]) {
      expect([beyond, bench.read(beyond).reason?.code]).toEqual([beyond, 'beyond-envelope']);
    }
    expect(bench.read({ voltage_kV: 21, pressure_bar_g: 1.1, rate_Hz: 3 }).verdict).toBe('applied');
    expect(bench.read({ rate_Hz: null }).verdict).toBe('applied');
    const bare = new PureBench();
    bare.open({ check: null, permit: null, unready });
    expect(bare.read({ voltage_kV: 22 }).verdict).toBe('applied');
    expect(bare.read({ voltage_kV: 22.1 }).reason?.words).toBe('The voltage is beyond the limit of 22 kV.');
  });

  it('takes readings of a firing that is unknown or closed as irregular, never as held back', () => {
    const bench = firing();
    bench.must(bench.book.write('firing.closed', bench.firing, { summary: '' }));
    expect(bench.read()).toMatchObject({ verdict: 'irregular', reason: { code: 'firing-closed' } });
    const nowhere = bench.book.write('firing.reading', idOf(1), testReading);
    expect(nowhere).toMatchObject({ verdict: 'irregular', reason: { code: 'unknown-firing' } });
  });
});

describe('reviewing a firing', () => {
  const review = { words: '', left_out: [], seen_revision: 1, seen_hash: '' };

  it('waits until it is closed, and is nobody’s own while another reviewer exists', () => {
    const bench = new PureBench().ready();
    const { book } = bench;
    bench.open();
    expect(book.write('firing.reviewed', bench.firing, review, { by: MILO }).reason?.code).toBe(
      'firing-open',
    );
    book.write('firing.closed', bench.firing, { summary: '' });
    expect(book.write('firing.reviewed', bench.firing, review).reason?.code).toBe('role');
    expect(book.write('firing.reviewed', bench.firing, review, { by: MILO }).verdict).toBe('applied');

    const own = bench.open({ check: null, permit: null, unready }, { by: MILO, device: TABLET_B }).entry.id;
    book.write('firing.closed', own, { summary: '' }, { by: MILO });
    expect(book.write('firing.reviewed', own, review, { by: MILO }).reason?.code).toBe('own-firing');
    expect(book.write('firing.sent-back', own, { words: '?' }, { by: MILO }).reason?.code).toBe('own-firing');
    book.write('person.role-set', MILO, { role: 'lead' }, { by: INGE });
    book.write('person.role-set', INGE, { role: 'reader' }, { by: MILO });
    expect(book.write('firing.reviewed', own, review, { by: MILO }).verdict).toBe('applied');
  });
});

describe('corrections and strikes', () => {
  it('name readings of this firing or steps of an open check, and nothing that permits or forbids', () => {
    const bench = new PureBench().ready();
    const { book } = bench;
    bench.open();
    const reading = bench.read().entry.id;
    const correct = (corrects: string, kind: string, body: object) =>
      book.write('entry.corrected', bench.firing, { corrects, kind, body: { ...body }, why: '' }).reason
        ?.code ?? 'applied';
    expect(correct(reading, 'firing.reading', { ...testReading, voltage_kV: -1 })).toBe(
      'correction-unreadable',
    );
    expect(correct(idOf(1), 'firing.reading', testReading)).toBe('unknown-reading');
    expect(correct(bench.permit, 'permit.granted', testSpec)).toBe('cannot-correct');
    expect(correct(reading, 'no.kind', {})).toBe('cannot-correct');
    expect(correct(reading, 'firing.reading', testReading)).toBe('applied');
    const strike = (strikes: string) =>
      book.write('entry.struck', bench.firing, { strikes, why: '?' }).reason?.code ?? 'applied';
    expect([strike(bench.permit), strike(reading)]).toEqual(['cannot-strike', 'applied']);
    const step = { step: 'hands-out', result: { type: 'confirm' }, note: 'late' };
    const ended = book.write('entry.corrected', bench.check, {
      corrects: stepEntry(bench),
      kind: 'check.step-done',
      body: step,
      why: '',
    });
    expect(ended.reason?.code).toBe('check-ended');
    expect(
      book.write('entry.corrected', bench.check, {
        corrects: idOf(1),
        kind: 'check.step-done',
        body: step,
        why: '',
      }).reason?.code,
    ).toBe('unknown-step');
  });
});

function stepEntry({ book, check }: PureBench): string {
  return book.doc('check', check).steps['hands-out']?.entry ?? ADA;
}
