import { describe, expect, it } from 'vitest';
import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { ReadingDoc } from '../../domain/book/documents/reading';
import type { FiringAnswer } from '../../domain/report/desk-shapes';
import type { FiringRow } from '../../domain/report/firing-rows';
import { asEntered, originalWords, sigmaWords, spanWords, standingWords } from './firing-words';

const trace = (wall_ms: number) => ({
  entry: 'e',
  by: 'ada',
  device: 'a',
  stamp: { wall_ms, offset_min: 0, zone: 'UTC', page_life: 'p', monotonic_ms: 0, time_uncertain: false },
  at: 1,
});
const AT = Date.UTC(2026, 11, 11, 14, 42);

const firing: FiringDoc = {
  kind: 'firing',
  id: 'f',
  parent: 'rig',
  number: 'A-119',
  rig_revision: 'rev',
  check: 'check',
  permit: 'permit',
  unready: null,
  opened: trace(AT),
  opened_irregular: null,
  readings: 0,
  irregular_readings: 0,
  shots: 0,
  last_reading: null,
  closed: { ...trace(AT + 38 * 60_000), summary: '' },
  reviews: [],
};

const answer = (change: Partial<FiringDoc>, rest: object = {}): FiringAnswer =>
  ({
    firing: { ...firing, ...change },
    rig: { permits: [{ ...trace(0), entry: 'permit', withdrawn: null }] },
    check: { ended: { how: 'closed', irregular: null } },
    ...rest,
  }) as unknown as FiringAnswer;

const values: ReadingValues = {
  voltage_kV: 18.1,
  how: 'self-break',
  pressure_bar_g: 1,
  gas: 'N2',
  flow_L_min: null,
  rate_Hz: 2,
  shots: 40,
  looked: 'even',
  output_uJ: null,
  ambient_bar_abs: 0.966,
  temperature_C: 21,
  humidity_pct: null,
  note: '',
  carried_over: [],
};

describe('words over a firing', () => {
  it('says when it was, in the zone of the lab', () => {
    expect(spanWords(firing, 'UTC')).toBe('14:42 to 15:20');
    expect(spanWords({ ...firing, closed: null }, 'UTC')).toBe('14:42, still open');
    expect(spanWords({ ...firing, closed: { ...trace(AT + 86_400_000), summary: '' } }, 'UTC')).toBe(
      '14:42 to 12 Dec 14:42',
    );
  });

  it('says whether check and permit were in order, and what was missing', () => {
    expect(standingWords(answer({}))).toBe('check and permit in order');
    expect(standingWords(answer({}, { check: null }))).toContain('check not found');
    expect(standingWords(answer({ permit: 'other' }))).toBe('check in order, permit not found');
    const unready = { missing: [{ code: 'no-permit', words: 'No firing permit.' }], why: 'Proof shot.' };
    expect(standingWords(answer({ unready }))).toBe(
      'recorded as unready: Proof shot. Missing: No firing permit.',
    );
  });

  it('keeps what a corrected reading said before', () => {
    const original = { ...values, voltage_kV: 81.1, looked: 'arc-mid' as const };
    const row = { values, reading: { original } as ReadingDoc } as FiringRow;
    expect(originalWords(row)).toBe('kV 81.1, looked arc, mid');
    expect(originalWords({ ...row, values: original })).toBe('');
  });

  it('shows figures as they were entered, and dashes where there are none', () => {
    expect(asEntered(-0.05)).toBe('\u22120.05');
    expect(asEntered(1, 2)).toBe('1.00');
    expect(asEntered(null)).toBe('\u2013');
    expect(sigmaWords(0.34)).toBe('+0.3');
    expect(sigmaWords(-4.21)).toBe('\u22124.2');
    expect(sigmaWords(null)).toBe('\u2013');
  });
});
