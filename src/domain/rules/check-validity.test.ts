import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { idOf, MILO, MORNING_MS, TABLET_A, TABLET_B } from '../../../tests/support/pure-book';
import { testSheet, testSpec } from '../../../tests/support/test-lab';
import type { SheetSpec } from '../book/sheet-spec';
import type { StampPoint } from '../book/stamp';
import { checkLapse, checkTimeLeftMs } from './check-validity';
import { MAKE_SAFE_CHARGE_TRANSFER } from './ready-sheets/make-safe-charge-transfer';

const CLOSED_MIN = 5;

/** A rig whose before-firing check was closed five minutes after the morning. */
function closed() {
  const bench = new PureBench().authorise().grant().walk({ at_min: CLOSED_MIN });
  const { book, rig } = bench;
  const doc = () => book.doc('rig', rig);
  const at = (minutes: number, more: Partial<StampPoint> = {}): StampPoint => {
    const { stamp } = doc().ready_check!.closed;
    const passed_ms = (minutes - CLOSED_MIN) * 60_000;
    return {
      ...stamp,
      wall_ms: stamp.wall_ms + passed_ms,
      monotonic_ms: stamp.monotonic_ms + passed_ms,
      ...more,
    };
  };
  const lapse = (minutes = 10, device = TABLET_A) => checkLapse(doc(), device, at(minutes))?.code ?? 'counts';
  const publish = (spec: SheetSpec) =>
    book.write('sheet.published', null, { spec, replaces: null }, { by: MILO }).entry.id;
  /** Opens a check of the purpose, on a sheet of one step. */
  const openOf = (purpose: SheetSpec['purpose'], at_min = 6) => {
    const sheet = publish({ ...testSheet, purpose });
    return book.write('check.opened', null, { rig, rig_revision: rig, sheet }, { at_min }).entry.id;
  };
  const finish = (check: string, at_min = 8) => {
    const step = { step: 'hands-out', result: { type: 'confirm' as const }, note: '' };
    book.write('check.step-done', check, step, { at_min });
    return book.write('check.closed', check, {}, { at_min });
  };
  return { bench, book, rig, doc, at, lapse, publish, openOf, finish };
}

describe('a before-firing check lapses', () => {
  it('not before anything happened', () => {
    expect(closed().lapse()).toBe('counts');
  });

  it('after 30 min without activity, and with activity after 4 h', () => {
    const { bench, lapse, doc, at } = closed();
    expect(lapse(CLOSED_MIN + 30)).toBe('counts');
    expect(lapse(CLOSED_MIN + 30.1)).toBe('check-idle');
    bench.open({}, { at_min: 20 });
    bench.read({}, { at_min: 20 });
    expect(lapse(49)).toBe('counts');
    for (let minute = 40; minute <= 260; minute += 20) bench.read({}, { at_min: minute });
    expect(lapse(CLOSED_MIN + 240)).toBe('counts');
    expect(lapse(CLOSED_MIN + 240.1)).toBe('check-old');
    expect(checkTimeLeftMs(doc().ready_check!, at(CLOSED_MIN + 239))).toBe(60_000);
  });

  it('for good: a reading after the half hour brings nothing back', () => {
    const { bench, lapse } = closed();
    bench.open({}, { at_min: 20 });
    bench.read({}, { at_min: CLOSED_MIN + 31 });
    expect(lapse(CLOSED_MIN + 32)).toBe('check-idle');
  });

  it('never later because a clock was set back, and when nobody can tell after a restart', () => {
    const { doc, at } = closed();
    const setBack = at(CLOSED_MIN + 31, { wall_ms: MORNING_MS });
    expect(checkLapse(doc(), TABLET_A, setBack)?.code).toBe('check-idle');
    const restarted = at(10, { page_life: idOf(0xfff), monotonic_ms: 0, time_uncertain: true });
    expect(checkLapse(doc(), TABLET_A, restarted)?.code).toBe('check-time-unknown');
  });

  it('at make-safe, walked or declared', () => {
    const walked = closed();
    const sheet = walked.publish({
      ...MAKE_SAFE_CHARGE_TRANSFER,
      steps: [
        {
          type: 'confirm',
          key: 'hands-out',
          title: 'Hard short',
          detail: '',
          waive: 'never',
          guards: 'shorting',
        },
      ],
    });
    const { rig, book } = walked;
    const check = book.write('check.opened', null, { rig, rig_revision: rig, sheet }).entry.id;
    expect(walked.finish(check).verdict).toBe('applied');
    expect(walked.lapse()).toBe('check-made-safe');
    const declared = closed();
    declared.book.write('rig.declared', declared.rig, { state: 'shorted' });
    expect(declared.lapse()).toBe('check-made-safe');
  });

  it('when the holder changes, or on any other tablet', () => {
    const { book, rig, lapse } = closed();
    expect(lapse(10, TABLET_B)).toBe('check-other-tablet');
    const elsewhere = closed();
    elsewhere.bench.open(
      { unready: { why: 'At the other bench', missing: [{ code: 'no-check', words: 'No check.' }] } },
      { device: TABLET_B, by: MILO, at_min: 7 },
    );
    elsewhere.bench.open({}, { at_min: 8 });
    expect(elsewhere.doc().holder).toBe(TABLET_A);
    expect(elsewhere.lapse()).toBe('check-other-tablet');
    book.write('rig.declared', rig, { state: 'short-off' }, { device: TABLET_B, by: MILO });
    expect(lapse()).toBe('check-other-tablet');
  });

  it.each([
    ['hands going in', 'hands.in', { where: 'Channel' }, 'check-hands-in'],
    ['a stand-down', 'rig.stood-down', { why: 'Odd noise' }, 'check-stood-down'],
    ['a declaration', 'rig.declared', { state: 'short-off' }, 'check-declared'],
    [
      'a revision',
      'rig.revised',
      { number: '2A', based_on: null, spec: testSpec, why: 'Same' },
      'check-revised',
    ],
    ['the gas', 'gas.changed', { words: 'New cylinder' }, 'check-gas-changed'],
  ] as const)('at %s', (_what, kind, body, code) => {
    const { book, rig, lapse } = closed();
    const whole = kind === 'rig.revised' ? { ...body, based_on: rig } : body;
    expect(book.write(kind, rig, whole as never, { at_min: 6 }).verdict).not.toBe('held-back');
    expect(lapse()).toBe(code);
  });

  it('at a part that is fitted or retired', () => {
    const { book, rig, lapse, bench } = closed();
    const fitted = book.write('part.fitted', rig, PART, { at_min: 6 }).entry.id;
    expect(lapse()).toBe('check-part-changed');
    bench.walk({ at_min: 12 });
    expect(lapse(13)).toBe('counts');
    book.write('part.retired', rig, { part: fitted, why: 'Worn' }, { at_min: 13 });
    expect(lapse(14)).toBe('check-part-changed');
  });

  it('at a gas change and at weekly care, begun or ended, and not at handling dye', () => {
    const gas = closed();
    const check = gas.openOf('gas-change');
    expect(gas.lapse()).toBe('check-gas-changed');
    gas.bench.walk({ at_min: 7 });
    expect(gas.lapse()).toBe('counts');
    gas.finish(check);
    expect(gas.lapse()).toBe('check-gas-changed');
    expect(gas.doc().gas_changed?.entry).toBeDefined();
    expect(gas.doc().declared?.state).toBe('short-off');

    const care = closed();
    const begun = care.openOf('weekly-care');
    expect(care.lapse()).toBe('check-weekly-care');
    care.bench.walk({ at_min: 7 });
    care.book.write('check.abandoned', begun, { why: 'Called away' }, { at_min: 8 });
    expect(care.lapse()).toBe('check-weekly-care');

    const dye = closed();
    dye.finish(dye.openOf('dye-handling'));
    expect(dye.lapse()).toBe('counts');
    expect(dye.doc().ready_check?.check).toBe(dye.bench.check);
  });
});

const PART = {
  what: 'Doorknob 1.0 nF 30 kV',
  place: 'first',
  where: '',
  serial: '',
  catalogue: null,
  fitted_on: null,
  shots_before: null,
  replaces: null,
  note: '',
} as const;
