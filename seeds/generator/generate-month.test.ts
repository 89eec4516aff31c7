import { describe, expect, it } from 'vitest';
import type { DocOf, DocKind, Document } from '../../src/domain/book/documents/document';
import { docKey } from '../../src/domain/book/documents/document';
import { mapStore, runEffect } from '../../src/domain/book/documents/effect';
import { standingReview } from '../../src/domain/book/documents/firing';
import { standingReading } from '../../src/domain/book/documents/reading';
import { latestRevision, revisionById, unliftedStandDowns } from '../../src/domain/book/documents/rig';
import { isIntact } from '../../src/domain/book/entry';
import { foldEntry } from '../../src/domain/book/fold';
import { uuidFromBytes } from '../../src/domain/book/ids';
import { PUSH_MAX_BYTES, PUSH_MAX_ENTRIES } from '../../src/domain/handover/wire';
import { declaredView } from '../../src/domain/rules/declared-view';
import { checkLapse } from '../../src/domain/rules/check-validity';
import { missingToFire, standingPermit } from '../../src/domain/rules/readiness';
import { readingPlausibility } from '../../src/domain/rules/reading-plausibility';
import { BENCH_TABLET, DEMO_LAB } from '../lab';
import { must } from '../must';
import { ADA, MILO } from '../people';
import { HERON } from '../rigs/heron';
import { KETTLE } from '../rigs/kettle';
import { WREN } from '../rigs/wren';
import { requireExpected } from './bench';
import { DEMO_SEED, foundingTime, generateMonth, type DemoMonth } from './generate-month';
import { pretendFounding } from './pretend-founding';
import { selfBreakOf } from './self-break-law';

const DAY_MS = 86_400_000;
const epoch = uuidFromBytes(new Uint8Array(16));
const NOW_MS = Date.UTC(2026, 4, 20, 8, 30);
const founding = pretendFounding(epoch, foundingTime(NOW_MS));
const generate = (now_ms: number, seed = DEMO_SEED) =>
  generateMonth({ now_ms, epoch, founding: pretendFounding(epoch, foundingTime(now_ms)), seed });
const month = generate(NOW_MS);

const entriesOf = ({ batches }: DemoMonth) => batches.flatMap(({ entries }) => entries);
const outcomesOf = ({ batches }: DemoMonth) => batches.flatMap(({ outcomes }) => outcomes);
const docs = <K extends DocKind>(kind: K): DocOf<K>[] =>
  month.book.documents().filter((one): one is DocOf<K> => one.kind === kind);
const rig = (id: string) => month.book.doc('rig', id)!;
const firingsOf = (id: string) => docs('firing').filter(({ parent }) => parent === id);
const freshTablet = {
  device: uuidFromBytes(new Uint8Array(16).fill(7)),
  stamp: {
    wall_ms: NOW_MS,
    page_life: uuidFromBytes(new Uint8Array(16).fill(8)),
    monotonic_ms: 0,
    time_uncertain: false,
  },
};

// Each of these writes whole months.
describe('a month of the demo lab', { timeout: 60_000 }, () => {
  it('comes out the same from the same seed, byte for byte, and otherwise from another', () => {
    const again = generate(NOW_MS);
    const other = generate(NOW_MS, 7);
    const shas = (one: DemoMonth) => entriesOf(one).map(({ entry_sha }) => entry_sha);
    expect(shas(again)).toEqual(shas(month));
    expect(again.book.head()).toEqual(month.book.head());
    expect(shas(other)).not.toEqual(shas(month));
  });

  // Generating throws where the judge sees an entry otherwise than the plan says.
  it.each([
    ['on a Monday', Date.UTC(2026, 4, 18, 9)],
    ['on a Sunday', Date.UTC(2026, 4, 17, 9)],
    ['just after midnight in the lab', Date.UTC(2026, 6, 1, 23, 5)],
    ['after clocks went forward', Date.UTC(2026, 3, 3, 12)],
    ['after clocks went back', Date.UTC(2026, 10, 3, 12)],
    ['at the turn of the year', Date.UTC(2027, 0, 2, 0, 30)],
  ])('is met as planned %s', (_when, now_ms) => {
    const one = generate(now_ms);
    expect(outcomesOf(one)).toHaveLength(entriesOf(month).length);
    const last = one.batches.at(-1)!;
    expect(last.received_ms).toBeLessThan(now_ms);
    expect(now_ms - last.received_ms).toBeLessThan(32 * 3_600_000);
  });

  it('is applied but for the two that are refused or irregular on purpose', () => {
    const odd = outcomesOf(month).filter(({ verdict }) => verdict !== 'applied');
    expect(odd.map(({ id }) => id).sort((a, b) => a.localeCompare(b))).toEqual(
      [...month.onPurpose.keys()].sort((a, b) => a.localeCompare(b)),
    );
    expect([...month.onPurpose.values()].map(({ name }) => name)).toEqual([
      'Kettle: a permit for a revision that was no longer the latest',
      'Heron: a reading above the permit’s pressure',
    ]);
  });

  it('stops loudly at an entry that was met otherwise', () => {
    const outcome = {
      id: 'x',
      revision: 1,
      verdict: 'irregular',
      reason: { cause: 'rule', code: 'no-check', words: 'None.', knew: null },
    } as const;
    expect(() => requireExpected('firing.opened', outcome, undefined)).toThrow(
      /firing\.opened x .*irregular, no-check/,
    );
    const purpose = { name: 'n', verdict: 'irregular', code: 'other' } as const;
    expect(() => requireExpected('firing.opened', outcome, purpose)).toThrow();
    expect(() => requireExpected('firing.opened', outcome, { ...purpose, code: 'no-check' })).not.toThrow();
  });

  it('is made of whole entries, numbered without a gap on each tablet, in batches that a server takes', () => {
    const seqs = new Map<string, number>();
    let revision = founding.length;
    for (const { tablet, session, entries, outcomes } of month.batches) {
      expect(entries.length).toBeLessThanOrEqual(PUSH_MAX_ENTRIES);
      expect(JSON.stringify({ entries }).length).toBeLessThanOrEqual(PUSH_MAX_BYTES);
      for (const [at, entry] of entries.entries()) {
        expect(isIntact(entry)).toBe(true);
        expect(entry.author).toBe(session);
        expect(entry.seq).toBe((seqs.get(tablet.id) ?? 0) + 1);
        seqs.set(tablet.id, entry.seq);
        revision += 1;
        expect(outcomes[at]?.revision).toBe(revision);
        expect(entry.base.revision).toBeLessThan(revision);
      }
    }
  });

  it('gives the same documents when its entries are folded again with their verdicts', () => {
    const documents = new Map<string, Document>();
    for (const { entry, verdict, reason, revision } of founding)
      runEffect(foldEntry(entry, { verdict, reason, revision }), mapStore(documents));
    for (const { entries, outcomes } of month.batches) {
      for (const [at, entry] of entries.entries())
        runEffect(foldEntry(entry, outcomes[at]!), mapStore(documents));
    }
    expect(documents).toEqual(new Map(month.book.documents().map((one) => [docKey(one), one])));
  });
});

describe('its firings', () => {
  it.each([
    ['Kettle', KETTLE],
    ['Heron', HERON],
    ['Wren', WREN],
  ])('%s: six to twelve, with eight to 25 readings each', (_name, { id }) => {
    const firings = firingsOf(id);
    expect(firings.length).toBeGreaterThanOrEqual(6);
    expect(firings.length).toBeLessThanOrEqual(12);
    for (const { readings, closed } of firings) {
      expect(closed).not.toBeNull();
      expect(readings).toBeGreaterThanOrEqual(8);
      expect(readings).toBeLessThanOrEqual(25);
    }
  });

  it('gives Kettle a curve of its own, 1.005 of the law with 0.3 kV of scatter', () => {
    const off = docs('reading')
      .filter(
        (one) =>
          one.rig === KETTLE.id && one.original.how === 'self-break' && one.original.looked !== 'early-break',
      )
      .map(({ original }) => ({
        voltage_kV: original.voltage_kV,
        law_kV: selfBreakOf(KETTLE.spec, original).law_kV,
      }));
    const ratio = sum(off.map((one) => one.voltage_kV * one.law_kV)) / sum(off.map((one) => one.law_kV ** 2));
    const scatter_kV = Math.sqrt(
      sum(off.map((one) => (one.voltage_kV - ratio * one.law_kV) ** 2)) / (off.length - 1),
    );
    expect(off.length).toBeGreaterThan(100);
    // Three standard errors of a mean of so many readings with 0.3 kV on 19 kV, and of a scatter of 0.3 kV.
    expect(Math.abs(ratio - 1.005)).toBeLessThan((3 * 0.3) / 19 / Math.sqrt(off.length));
    expect(Math.abs(scatter_kV - 0.3)).toBeLessThan((3 * 0.3) / Math.sqrt(2 * off.length));
  });

  it('fires Kettle at 1.0 bar(g) again and again, where the two-sided rule says that it may not', () => {
    const there = docs('reading').filter(
      ({ rig: of, original }) =>
        of === KETTLE.id && original.how === 'self-break' && Math.abs(original.pressure_bar_g - 1) < 0.03,
    );
    expect(there.length).toBeGreaterThan(10);
  });

  it('has one reading that does not fit, an early break in the firing that waits for review', () => {
    const odd = docs('reading').filter(({ parent, original }) => {
      const firing = month.book.doc('firing', parent)!;
      const { spec } = revisionById(rig(firing.parent), firing.rig_revision)!;
      return !must(readingPlausibility(spec, original, [])).fits;
    });
    expect(odd.map(({ original }) => original.looked)).toEqual(['early-break']);
    const firing = month.book.doc('firing', odd[0]!.parent)!;
    expect(firing.parent).toBe(KETTLE.id);
    expect(standingReview(firing)).toBeNull();
  });

  it('leaves two firings waiting, and has the others reviewed by somebody else than who fired', () => {
    const waiting = docs('firing').filter((one) => standingReview(one) === null);
    expect(waiting.map(({ parent }) => parent)).toEqual([HERON.id, KETTLE.id]);
    for (const firing of docs('firing')) expect(standingReview(firing)?.by).not.toBe(firing.opened.by);
  });

  it('has one recorded as unready, for want of a permit, with nothing of it left for the calibration', () => {
    const unready = docs('firing').filter((one) => one.unready !== null);
    expect(unready.map(({ parent }) => parent)).toEqual([WREN.id]);
    expect(unready[0]?.unready?.missing.map(({ code }) => code)).toEqual(['no-permit']);
    expect(standingReview(unready[0]!)?.left_out).toHaveLength(unready[0]!.readings);
  });

  it('has one corrected reading', () => {
    const corrected = docs('reading').filter((one) => {
      const now = standingReading(one);
      return now.type === 'stands' && now.corrected;
    });
    expect(corrected).toHaveLength(1);
  });

  it('walks every step of every check', () => {
    for (const check of docs('check')) {
      const keys = month.book.doc('sheet', check.sheet)!.spec.steps.map(({ key }) => key);
      expect(Object.keys(check.steps)).toEqual(keys);
      expect(check.ended).toMatchObject({ how: 'closed', irregular: null });
    }
  });
});

describe('where the month leaves the lab', () => {
  it('has Kettle declared shorted by Milo yesterday, and every rig not known on a fresh tablet', () => {
    expect(rig(KETTLE.id).declared).toMatchObject({ state: 'shorted', by: MILO.id, device: BENCH_TABLET.id });
    expect(NOW_MS - rig(KETTLE.id).declared!.stamp.wall_ms).toBeLessThan(DAY_MS);
    for (const one of docs('rig')) {
      const view = declaredView(one, null, { device: freshTablet.device, now: freshTablet.stamp });
      expect(view.state).toBe('not-known');
    }
  });

  it('has permits on the latest revision of Heron and Kettle for eighteen days, and none on Wren', () => {
    for (const { id } of [HERON, KETTLE]) {
      const permit = standingPermit(rig(id), NOW_MS)!;
      expect(permit).toMatchObject({ by: MILO.id, rig_revision: latestRevision(rig(id)).entry });
      expect(Math.floor((permit.until_ms - NOW_MS) / DAY_MS)).toBe(18);
    }
    expect(standingPermit(rig(WREN.id), NOW_MS)).toBeNull();
    expect(rig(HERON.id).permits_asked.filter(({ answered }) => !answered)).toHaveLength(1);
    expect(latestRevision(rig(KETTLE.id)).number).toBe('7A');
  });

  it('has no hands in, nothing open, no stand-down, and no check that stands', () => {
    for (const one of docs('rig')) {
      expect([one.hands, one.open_checks, one.open_firings, unliftedStandDowns(one)]).toEqual([
        [],
        [],
        [],
        [],
      ]);
      expect(checkLapse(one, BENCH_TABLET.id, freshTablet.stamp)?.code).toBe('check-made-safe');
    }
  });

  it('keeps only the check, with its second person, between Ada or Milo and firing Kettle on a fresh tablet', () => {
    for (const { id } of [ADA, MILO]) {
      const missing = missingToFire({
        ...freshTablet,
        rig: rig(KETTLE.id),
        person: month.book.doc('person', id),
        lab: month.book.doc('lab', DEMO_LAB.id),
        now_ms: NOW_MS,
        filling: false,
      });
      expect(missing.map(({ code }) => code)).toEqual(['check-made-safe', 'working-alone']);
    }
  });

  it('has its one incident answered and closed, its stand-down lifted by name', () => {
    const [incident, ...others] = docs('incident');
    expect(others).toEqual([]);
    expect(incident?.answers).toHaveLength(1);
    expect(incident?.closed).not.toBeNull();
    expect(rig(HERON.id).stand_downs).toMatchObject([{ entry: incident?.id, lifted: { by: MILO.id } }]);
  });
});

function sum(values: readonly number[]): number {
  return values.reduce((total, value) => total + value, 0);
}
