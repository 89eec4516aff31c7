import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA, idOf, MILO, MORNING_MS, TABLET_A, TABLET_B, TARIQ } from '../../../tests/support/pure-book';
import { testSpec } from '../../../tests/support/test-lab';
import type { StampPoint } from '../book/stamp';
import { CHECK_IDLE_MS } from '../book/documents/rig';
import { CHECK_AGE_MS, checkLapse, checkTimeLeftMs } from './check-validity';
import { declaredView, DECLARED_FOR_MS } from './declared-view';
import { missingToFire, standingPermit, type ReadinessInput } from './readiness';

const at = (minutes: number, more: Partial<StampPoint> = {}): StampPoint => ({
  wall_ms: MORNING_MS + minutes * 60_000,
  page_life: idOf(0xcc01),
  monotonic_ms: minutes * 60_000,
  time_uncertain: false,
  ...more,
});

function missing(bench: PureBench, more: Partial<ReadinessInput> = {}) {
  return missingToFire({
    rig: bench.book.doc('rig', bench.rig),
    person: bench.book.doc('person', ADA),
    lab: undefined,
    device: TABLET_A,
    stamp: at(1),
    now_ms: MORNING_MS + 60_000,
    filling: false,
    ...more,
  });
}
const codes = (...args: Parameters<typeof missing>) => missing(...args).map((one) => one.code);

describe('readiness to fire', () => {
  it('misses nothing on a rig that is ready', () => {
    expect(missing(new PureBench().ready())).toEqual([]);
  });

  it('says everything that is missing at once, and who can mend it', () => {
    expect(missing(new PureBench()).map((one) => [one.code, one.mend])).toEqual([
      ['not-authorised', 'reviewer'],
      ['no-permit', 'reviewer'],
      ['no-check', 'you'],
    ]);
  });

  it('is not ready while the Book fills, or where an entry needs a newer app', () => {
    const bench = new PureBench().ready();
    expect(codes(bench, { filling: true })).toEqual(['filling']);
    const rig = { ...bench.book.doc('rig', bench.rig), needs_newer_app: true };
    expect(codes(bench, { rig })).toEqual(['newer-app']);
  });

  it('names every stand-down and hands-in tag, since which revision', () => {
    const bench = new PureBench().ready();
    const { book, rig } = bench;
    const one = book.write('rig.stood-down', rig, { why: 'Ozone' });
    book.write('rig.stood-down', rig, { why: 'Crack' });
    book.write('hands.in', rig, { where: '' });
    const found = missing(bench);
    expect(found.map((entry) => entry.code)).toEqual([
      'stood-down',
      'stood-down',
      'hands-in',
      'check-stood-down',
    ]);
    expect(found[0]).toMatchObject({
      words: 'The rig is stood down: Ozone',
      since: one.revision,
      mend: 'reviewer',
    });
  });

  it('asks for the person’s role and authorisation, and says when it ended or expired', () => {
    const bench = new PureBench().ready();
    expect(codes(bench, { person: undefined })).toEqual(['role']);
    expect(codes(bench, { person: bench.book.doc('person', TARIQ) })).toEqual(['role']);
    expect(codes(bench, { person: bench.book.doc('person', MILO) })).toEqual(['not-authorised']);
    expect(codes(bench, { now_ms: MORNING_MS + 2 * 86_400_000 })).toEqual([
      'authorisation-expired',
      'permit-lapsed',
    ]);
    bench.book.write(
      'person.authorisation-ended',
      ADA,
      { authorisation: bench.authorisation, why: '?' },
      { by: MILO },
    );
    expect(codes(bench)).toEqual(['authorisation-ended']);
    bench.authorise();
    expect(codes(bench)).toEqual([]);
  });

  it('asks for a permit of the latest revision that was neither withdrawn nor has lapsed', () => {
    const bench = new PureBench().ready();
    const { book, rig, permit } = bench;
    expect(standingPermit(book.doc('rig', rig), MORNING_MS)?.entry).toBe(permit);
    const withdrawn = book.write('permit.withdrawn', rig, { permit, why: 'Valve' }, { by: MILO });
    expect(missing(bench)).toMatchObject([{ code: 'permit-withdrawn', since: withdrawn.revision }]);
    bench.grant();
    expect(codes(bench)).toEqual([]);
    const spec = { ...testSpec, envelope: { ...testSpec.envelope, max_kV: 20 } };
    const next = book.write('rig.revised', rig, { number: '2A', based_on: rig, spec, why: 'Leaner' });
    expect(missing(bench)).toMatchObject([
      { code: 'no-permit', words: 'The permit was for an earlier revision; revision 2A has none.' },
      { code: 'check-revised' },
    ]);
    book.write('rig.revised', rig, { number: '2B', based_on: rig, spec, why: 'Other' });
    expect(codes(bench)).toContain('parting');
    expect(standingPermit(book.doc('rig', rig), MORNING_MS)).toBeNull();
    expect(next.verdict).toBe('applied');
  });
});

describe('how long a before-firing check counts', () => {
  const ready = () => {
    const bench = new PureBench().ready();
    return { bench, rig: () => bench.book.doc('rig', bench.rig) };
  };
  const code = (bench: ReturnType<typeof ready>, device: string, now: StampPoint) =>
    checkLapse(bench.rig(), device, now)?.code ?? null;

  it('lapses after 30 min of idling and after 4 h whatever happens', () => {
    const one = ready();
    expect(code(one, TABLET_A, at(30))).toBeNull();
    expect(code(one, TABLET_A, at(30.01))).toBe('check-idle');
    one.bench.open();
    for (let minute = 20; minute <= 240; minute += 20) one.bench.read({}, { at_min: minute });
    expect(code(one, TABLET_A, at(240))).toBeNull();
    expect(code(one, TABLET_A, at(240.01))).toBe('check-old');
    expect([CHECK_IDLE_MS, CHECK_AGE_MS]).toEqual([1_800_000, 14_400_000]);
  });

  it('is not made younger by a clock that was set back', () => {
    expect(code(ready(), TABLET_A, at(31, { wall_ms: 0 }))).toBe('check-idle');
    expect(code(ready(), TABLET_A, at(1, { wall_ms: MORNING_MS + 31 * 60_000 }))).toBe('check-idle');
  });

  it('lapses where nobody can say how old it is', () => {
    expect(code(ready(), TABLET_A, at(1, { page_life: idOf(9), wall_ms: 0 }))).toBe('check-time-unknown');
    expect(code(ready(), TABLET_A, at(1, { page_life: idOf(9), time_uncertain: true }))).toBe(
      'check-time-unknown',
    );
  });

  it('counts on its own tablet alone, and not once another holds the rig', () => {
    const one = ready();
    expect(code(one, TABLET_B, at(1))).toBe('check-other-tablet');
    one.bench.book.write(
      'rig.declared',
      one.bench.rig,
      { state: 'short-off' },
      { by: MILO, device: TABLET_B },
    );
    expect(code(one, TABLET_A, at(1))).toBe('check-other-tablet');
  });

  it('is voided by making safe, hands in, a gas change, a revision and a stand-down', () => {
    const voids: [string, (bench: PureBench) => unknown][] = [
      ['check-made-safe', ({ book, rig }) => book.write('rig.declared', rig, { state: 'shorted' })],
      ['check-hands-in', ({ book, rig }) => book.write('hands.in', rig, { where: '' })],
      ['check-gas-changed', ({ book, rig }) => book.write('gas.changed', rig, { words: 'N2' })],
      [
        'check-revised',
        ({ book, rig }) =>
          book.write('rig.revised', rig, { number: '2A', based_on: rig, spec: testSpec, why: '?' }),
      ],
      ['check-stood-down', ({ book, rig }) => book.write('rig.stood-down', rig, { why: '?' })],
    ];
    for (const [expected, act] of voids) {
      const one = ready();
      act(one.bench);
      expect(code(one, TABLET_A, at(1))).toBe(expected);
    }
  });

  it('says how much time is left', () => {
    const check = ready().rig().ready_check;
    if (check === null) throw new Error('no check');
    expect(checkTimeLeftMs(check, at(10))).toBe(20 * 60_000);
    expect(checkTimeLeftMs(check, at(31))).toBeNull();
    expect(checkTimeLeftMs({ ...check, voided: { code: 'x', words: 'x', at: 1 } }, at(1))).toBeNull();
  });
});

describe('what may be believed of a declared state', () => {
  const view = (bench: PureBench, now = at(1), device = TABLET_A) => {
    const rig = bench.book.doc('rig', bench.rig);
    const [open] = rig.open_firings;
    return declaredView(rig, open === undefined ? null : bench.book.doc('firing', open).opened, {
      device,
      now,
    });
  };

  it('says what was declared, with its age', () => {
    const bench = new PureBench().ready();
    expect(view(bench, at(5))).toMatchObject({ state: 'short-off', age_ms: 300_000, why: null });
    bench.open({}, { at_min: 6 });
    expect(view(bench, at(7))).toMatchObject({ state: 'firing', age_ms: 60_000 });
    bench.book.write('firing.closed', bench.firing, { summary: '' }, { at_min: 8 });
    bench.book.write('rig.declared', bench.rig, { state: 'shorted' }, { at_min: 9 });
    expect(view(bench, at(10)).state).toBe('shorted');
  });

  it('is not known on another tablet, in a new page life, after 12 h, or where nothing was declared', () => {
    const bench = new PureBench().ready();
    const why = (now: StampPoint, device = TABLET_A) => {
      const { state, why: reason } = view(bench, now, device);
      return [state, reason];
    };
    expect(why(at(1), TABLET_B)).toEqual(['not-known', 'declared on another tablet']);
    expect(why(at(1, { page_life: idOf(9) }))).toEqual(['not-known', 'tablet restarted']);
    expect(why(at(12 * 60))).toEqual(['short-off', null]);
    expect(why(at(12 * 60 + 0.01))).toEqual(['not-known', 'declared more than 12 h ago']);
    expect(why(at(12 * 60 + 1, { wall_ms: 0 }))[0]).toBe('not-known');
    expect(view(new PureBench())).toMatchObject({
      state: 'not-known',
      trace: null,
      why: 'nothing declared yet',
    });
    expect(DECLARED_FOR_MS).toBe(43_200_000);
  });

  it('says a stand-down beside the state, never instead of it', () => {
    const bench = new PureBench().ready();
    bench.book.write('rig.stood-down', bench.rig, { why: 'Ozone' });
    expect(view(bench)).toMatchObject({ state: 'short-off', stood_down: [{ why: 'Ozone' }] });
  });
});
