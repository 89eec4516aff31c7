import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import { ADA, idOf, INGE, LAB, MILO, MORNING_MS, TABLET_A } from '../../../tests/support/pure-book';
import { testSettings, testSheet } from '../../../tests/support/test-lab';
import type { BodyOf } from '../book/kinds';
import { missingToFire } from './readiness';

const HOUR_MS = 3_600_000;

function codes(bench: PureBench, after_min = 1, person = ADA): readonly string[] {
  const labs = [...bench.book.documents.values()].filter((doc) => doc.kind === 'lab');
  return missingToFire({
    rig: bench.book.doc('rig', bench.rig),
    person: bench.book.doc('person', person),
    lab: labs[0],
    device: TABLET_A,
    stamp: {
      wall_ms: MORNING_MS + after_min * 60_000,
      page_life: idOf(0xcc01),
      monotonic_ms: after_min * 60_000,
      time_uncertain: false,
    },
    now_ms: MORNING_MS + after_min * 60_000,
    filling: false,
  }).map((one) => one.code);
}

describe('kit and readiness', () => {
  const added = (type: 'eyewear' | 'key'): BodyOf<'kit.added'> => ({
    number: '7',
    name: 'Seven',
    item:
      type === 'key'
        ? { type, opens: 'Supply' }
        : { type, densities: [{ from_nm: 190, to_nm: 375, density: 6 }], visible_transmission_pct: null },
    due_ms: MORNING_MS + 10 * 60_000,
    note: '',
  });
  const give = (
    bench: PureBench,
    type: 'person' | 'rig',
    id: string,
    what: 'eyewear' | 'key' = 'eyewear',
  ) => {
    const kit = bench.book.write('kit.added', null, added(what)).entry.id;
    bench.book.write('kit.issued', kit, { to: { type, id }, count: null, words: '' });
    return kit;
  };

  it('counts what the person holds and what stays with the rig, from the moment that it is due', () => {
    const bench = new PureBench().ready();
    give(bench, 'person', ADA);
    give(bench, 'rig', bench.rig);
    give(bench, 'person', MILO);
    expect(codes(bench, 10)).toEqual([]);
    expect(codes(bench, 10.01)).toEqual(['kit-expired', 'kit-expired']);
  });

  it('counts what failed, and nothing that protects nobody', () => {
    const bench = new PureBench().ready();
    give(bench, 'person', ADA, 'key');
    expect(codes(bench, 20)).toEqual([]);
    const kit = give(bench, 'person', ADA);
    const found = { outcome: 'failed', due_ms: null, count: null, pressure_bar_g: null, words: '' } as const;
    bench.book.write('kit.inspected', kit, found);
    expect(codes(bench, 1)).toEqual(['kit-failed']);
    bench.book.write('kit.returned', kit, { condition: 'as-issued', count: null, words: '' });
    expect(codes(bench, 1)).toEqual([]);
  });

  it('counts what the standing check named', () => {
    const bench = new PureBench().authorise().grant();
    const { book, rig, sheet } = bench;
    const kit = book.write('kit.added', null, added('eyewear')).entry.id;
    const check = book.write('check.opened', null, { rig, rig_revision: rig, sheet }).entry.id;
    const step = { step: 'hands-out', result: { type: 'confirm' as const }, note: '', kit: [kit] };
    book.write('check.step-done', check, step);
    book.write('check.closed', check, {});
    expect(book.doc('rig', rig).ready_check?.kit).toMatchObject([{ kit, number: '7' }]);
    expect(codes(bench, 9)).toEqual([]);
    expect(codes(bench, 11)).toEqual(['kit-expired']);
    // Handed to the person, it is counted once.
    book.write('kit.issued', kit, { to: { type: 'person', id: ADA }, count: null, words: '' });
    expect(codes(bench, 11)).toEqual(['kit-expired']);
  });
});

describe('working alone', () => {
  const forbidden = () => {
    const bench = new PureBench();
    const settings = { ...testSettings, working_alone: 'forbidden' as const };
    bench.book.write('lab.set', LAB, settings, { by: INGE });
    return bench.authorise().grant();
  };
  const guest = { person: null, name: 'Visitor', knows_isolator: true, eyewear: null, words: '' };

  it('is missing company where the lab forbids it, and nothing where it does not', () => {
    expect(codes(forbidden().walk())).toEqual(['working-alone']);
    expect(codes(new PureBench().ready())).toEqual([]);
  });

  it('is answered by the second person of the standing check, while the check stands', () => {
    const bench = forbidden();
    const { book, rig } = bench;
    const steps = [
      { type: 'second-person' as const, key: 'second', title: 'Second', detail: '', waive: 'never' as const },
    ];
    const sheet = book.write(
      'sheet.published',
      null,
      { spec: { ...testSheet, steps }, replaces: null },
      { by: MILO },
    ).entry.id;
    const check = book.write('check.opened', null, { rig, rig_revision: rig, sheet }).entry.id;
    const step = { step: 'second', result: { type: 'second-person' as const }, note: '' };
    book.write('check.step-done', check, step, { witness: MILO });
    book.write('check.closed', check, {});
    expect(codes(bench)).toEqual([]);
    // Milo is with Ada, and Ada with Milo.
    expect(codes(bench, 1, MILO)).toEqual(['not-authorised']);
    expect(codes(bench, 31)).toEqual(['check-idle', 'working-alone']);
  });

  it('is answered by somebody checked in who knows the isolator, for twelve hours', () => {
    const bench = forbidden().walk();
    const { book, rig } = bench;
    const shown = book.write('guest.in', rig, { ...guest, knows_isolator: false }).entry.id;
    expect(codes(bench)).toEqual(['working-alone']);
    book.write('guest.out', rig, { guest: shown });
    const there = book.write('guest.in', rig, guest).entry.id;
    expect(codes(bench)).toEqual([]);
    expect(codes(bench, (12 * HOUR_MS) / 60_000)).not.toContain('working-alone');
    expect(codes(bench, (12 * HOUR_MS) / 60_000 + 1)).toContain('working-alone');
    book.write('guest.out', rig, { guest: there });
    expect(codes(bench)).toEqual(['working-alone']);
  });

  it('is not answered by oneself, nor by an irregular entry', () => {
    const bench = forbidden().walk();
    bench.book.write('guest.in', bench.rig, { ...guest, person: ADA });
    expect(codes(bench)).toEqual(['working-alone']);
    bench.book.write('guest.in', bench.rig, { ...guest, person: MILO });
    expect(codes(bench)).toEqual([]);
  });
});
