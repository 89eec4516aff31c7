import { describe, expect, it } from 'vitest';
import { testReading, testSpec } from '../../../tests/support/test-lab';
import type { ReadingValues } from '../book/bodies/firing-bodies';
import type { FiringDoc } from '../book/documents/firing';
import type { ReadingDoc } from '../book/documents/reading';
import type { RigDoc } from '../book/documents/rig';
import type { Trace } from '../book/documents/trace';
import type { RigSpec } from '../book/rig-spec';
import { rigLaw } from '../calibration/rig-law';
import { calibrationPoints, ownFor, rigCalibration, rigGapOf } from './rig-calibration';
import { plausibilityAgainst } from './reading-plausibility';

const spec: RigSpec = {
  ...testSpec,
  gap: {
    ...testSpec.gap,
    gas: 'N2',
    electrodes: 'domed',
    radius_mm: 12,
    gap_mm: 3,
    gap_error_mm: 0.05,
    irradiated: true,
  },
};
const SCALE = 0.93;

function trace(entry: string, minute: number): Trace {
  const wall_ms = minute * 60_000;
  return {
    entry,
    by: 'ada',
    device: 'tablet',
    stamp: {
      wall_ms,
      offset_min: 0,
      zone: 'UTC',
      page_life: 'l',
      monotonic_ms: wall_ms,
      time_uncertain: false,
    },
    at: minute,
  };
}

function rigOf(...specs: readonly RigSpec[]): RigDoc {
  const revisions = specs.map((one, i) => ({
    ...trace(`rev-${i}`, i),
    number: `${i + 1}A`,
    spec: one,
    based_on: null,
    why: '',
  }));
  return { id: 'rig', heads: [`rev-${specs.length - 1}`], revisions } as unknown as RigDoc;
}

function firing(id: string, minute: number, more: Partial<FiringDoc> = {}): FiringDoc {
  return {
    kind: 'firing',
    id,
    parent: 'rig',
    number: id,
    rig_revision: 'rev-0',
    check: null,
    permit: null,
    unready: null,
    opened: trace(id, minute),
    opened_irregular: null,
    readings: 0,
    irregular_readings: 0,
    shots: 400,
    last_reading: null,
    closed: null,
    reviews: [],
    ...more,
  };
}

/** Breaks where the law times the rig's own scale says, give or take half a percent in turns. */
function reading(in_: string, no: number, more: Partial<ReadingValues> = {}): ReadingDoc {
  const pressure_bar_g = 0.8 + 0.05 * (no % 8);
  const law = rigLaw(rigGapOf(spec))({
    gap_mm: 3,
    pressure_bar_abs: pressure_bar_g + 0.966,
    temperature_C: 21,
  });
  const kV = (law.ok ? law.value : NaN) * SCALE * (no % 2 === 0 ? 1.005 : 0.995);
  const id = `${in_}/${no}`;
  const values: ReadingValues = {
    ...testReading,
    how: 'self-break',
    looked: 'even',
    gas: 'N2',
    shots: 40,
    ambient_bar_abs: 0.966,
    temperature_C: 21,
    pressure_bar_g,
    voltage_kV: kV,
    ...more,
  };
  return {
    kind: 'reading',
    id,
    parent: in_,
    rig: 'rig',
    no,
    original: values,
    logged: trace(id, no),
    irregular: null,
    corrections: [],
    struck: null,
  };
}

const ten = (id: string) => Array.from({ length: 10 }, (_, i) => reading(id, i + 1));

describe('what a calibration stands on', () => {
  it('takes measured self-breaks alone, and says why each other reading stays out', () => {
    const struck = { ...reading('A-1', 4), struck: { ...trace('s', 9), why: 'typed twice' } };
    const readings = new Map<string, readonly ReadingDoc[]>([
      [
        'A-1',
        [
          reading('A-1', 1),
          reading('A-1', 2, { how: 'set' }),
          reading('A-1', 3, { looked: 'gap-dark' }),
          struck,
          { ...reading('A-1', 5), irregular: 'stood-down' },
          reading('A-1', 6, { gas: 'air' }),
          reading('A-1', 7),
        ],
      ],
      ['A-2', ten('A-2')],
      ['A-3', ten('A-3')],
      ['A-4', ten('A-4')],
    ]);
    const reviewed = {
      ...trace('r', 50),
      verdict: 'reviewed',
      words: '',
      left_out: ['A-1/7'],
    } as const;
    const found = calibrationPoints({
      rig: rigOf(spec),
      firings: [
        firing('A-1', 10, { reviews: [reviewed] }),
        firing('A-2', 20, { unready: { missing: [], why: 'dark' } }),
        firing('A-3', 30, { reviews: [{ ...reviewed, verdict: 'sent-back', left_out: [] }] }),
        firing('A-4', 40),
      ],
      readingsOf: (id) => readings.get(id) ?? [],
    });
    expect(found.left_out).toEqual({
      'not-self-break': 2,
      struck: 1,
      irregular: 1,
      unready: 10,
      'left-out': 1,
      'sent-back': 10,
      'other-gap': 1,
    });
    expect(found.points.map(({ name }) => name).slice(0, 2)).toEqual(['A-1 no. 1', 'A-4 no. 1']);
  });

  it('counts shots over the firings, whatever order they come in', () => {
    const { points } = calibrationPoints({
      rig: rigOf(spec),
      firings: [firing('A-2', 20), firing('A-1', 10)],
      readingsOf: ten,
    });
    expect(points[0]?.shot).toBe(40);
    expect(points[10]).toMatchObject({ name: 'A-2 no. 1', shot: 440 });
  });

  it('keeps another gap and leaves other electrodes', () => {
    const wider = { ...spec, gap: { ...spec.gap, gap_mm: 4 } };
    const rounder = { ...spec, gap: { ...spec.gap, radius_mm: 25 } };
    const from = (newest: RigSpec) =>
      calibrationPoints({ rig: rigOf(spec, newest), firings: [firing('A-1', 10)], readingsOf: ten });
    expect(from(wider).points).toHaveLength(10);
    expect(from(rounder).points).toHaveLength(0);
    expect(from(rounder).left_out['other-gap']).toBe(10);
  });
});

describe('the rig’s own curve', () => {
  const calibration = rigCalibration({
    rig: rigOf(spec),
    firings: [firing('A-1', 10), firing('A-2', 20)],
    readingsOf: ten,
  });
  if (!calibration.ok) throw new Error(calibration.refusal.words);
  const { fit } = calibration.value;
  const at = reading('A-9', 4).original;

  it('finds the scale that the readings were made with', () => {
    expect(fit.type).toBe('scale-alone');
    expect(fit.scale.value).toBeCloseTo(SCALE, 3);
    expect(fit.scale.low).toBeLessThan(SCALE);
    expect(fit.scale.high).toBeGreaterThan(SCALE);
  });

  it('decides on a self-break in the law’s place, with reasons measured from itself', () => {
    const own = ownFor(fit, spec, at);
    const before: readonly number[] = [];
    const asEver = plausibilityAgainst(spec, at, { before, own });
    expect(asEver.ok && [asEver.value.against, asEver.value.fits]).toEqual(['own', true]);
    const low = plausibilityAgainst(spec, { ...at, voltage_kV: at.voltage_kV * 0.94 }, { before, own });
    if (!low.ok) throw new Error(low.refusal.words);
    expect(low.value.words).toMatch(/^Does not fit: 6 % low, [\d.]+ σ below its own curve\.$/);
    const causes = low.value.causes.map(({ words }) => words).join('; ');
    expect(causes).toMatch(/gap 0\.\d\d\u2009mm smaller/);
    expect(causes).toMatch(/pressure 0\.\d\d\u2009bar lower/);
    expect(causes).toMatch(/gas \d+\u2009K warmer/);
    expect(causes).toMatch(/electrode damaged/);
  });

  it('never moves the two sides: hold-off stays with the law', () => {
    const own = ownFor(fit, spec, at);
    const law = plausibilityAgainst(spec, at, { before: [], own: undefined });
    const byOwn = plausibilityAgainst(spec, at, { before: [], own });
    if (!law.ok || !byOwn.ok) throw new Error('no answer');
    expect(byOwn.value.low_kV).toBe(law.value.low_kV);
    expect(byOwn.value.high_kV).toBe(law.value.high_kV);
    expect(byOwn.value.expected_kV).toBeLessThan(law.value.expected_kV);
  });

  it('leaves other gases, other electrodes and pressures never read to the law', () => {
    expect(ownFor(fit, spec, { ...at, gas: 'air' })).toBeUndefined();
    expect(ownFor(fit, { ...spec, gap: { ...spec.gap, radius_mm: 25 } }, at)).toBeUndefined();
    const far = plausibilityAgainst(
      spec,
      { ...at, pressure_bar_g: 2.5 },
      {
        before: [],
        own: ownFor(fit, spec, { ...at, pressure_bar_g: 2.5 }),
      },
    );
    expect(far.ok && far.value.against).toBe('law');
  });

  it('refuses with fewer than three self-breaks', () => {
    const few = rigCalibration({
      rig: rigOf(spec),
      firings: [firing('A-1', 10)],
      readingsOf: (id) => ten(id).slice(0, 2),
    });
    expect(few.ok ? null : few.refusal.words).toMatch(/at least 3/);
  });
});
