import { describe, expect, it } from 'vitest';
import { readOscillogram } from '../../domain/oscillogram/read-oscillogram';
import { surveyOf } from '../../domain/oscillogram/survey';
import { laidOver } from './simulated';
import { traceChart } from './trace-chart';
import { EMPTY_TRACE, probeKey, readingAs } from './trace-draft';
import { keptFigures, measured } from './trace-figures';
import { around, zoomed } from './zoom';

describe('a trace as the chart takes it', () => {
  const low = Float64Array.of(0, Number.NaN, -3, 0);
  const high = Float64Array.of(1, Number.NaN, 8, 1);

  it('keeps the extremes of each slice and goes over the empty ones', () => {
    const chart = traceChart({ from_s: 0, to_s: 400e-9, low, high }, { unit: 'kV' }, null);
    expect(chart.x).toMatchObject({ min: 0, unit: 'ns' });
    expect(chart.band?.points.map(({ x, low: l, high: h }) => [Math.round(x), l, h])).toEqual([
      [0, 0, 1],
      [200, -3, 8],
      [300, 0, 1],
    ]);
    expect(chart.law).toBeUndefined();
    expect(chart.y.max).toBeGreaterThan(8);
  });

  it('writes long spans in a larger unit and cuts the simulated shape at the window', () => {
    const over = [-1e-6, 1e-6, 5e-6, 9e-5].map((x) => ({ x, y: 20 }));
    const chart = traceChart({ from_s: 0, to_s: 1e-5, low, high }, { unit: 'kV' }, over);
    expect(chart.x).toMatchObject({ max: expect.closeTo(10, 9) as number, unit: '\u00b5s' });
    expect(chart.law).toHaveLength(2);
    expect(chart.y.max).toBeGreaterThan(20);
  });
});

describe('the simulated shape', () => {
  const simulated = {
    points: [
      { x: 0, y: 0 },
      { x: 10e-9, y: -20 },
    ],
    peak: { value: 20, band: { low: 18, high: 22 } },
    rise_s: 8e-9,
    start_s: 1e-9,
    label: 'channel',
  };

  it('starts where the trace starts, with its sign, and moves by hand', () => {
    const laid = laidOver(simulated, { start_s: 100e-9, peak: 15 }, 5e-9);
    expect(laid[1]?.y).toBe(20);
    expect((laid[0]?.x ?? 0) * 1e9).toBeCloseTo(104, 6);
    expect(laidOver(simulated, { start_s: null, peak: -15 }, 0)[1]?.y).toBe(-20);
  });
});

describe('figures of a trace', () => {
  /** A ramp from 0 to 16 V between 100 and 110 ns behind a divider of 1,000; the trigger steps at 50 ns. */
  const rows = Array.from({ length: 400 }, (_, i) => {
    const t = i * 0.5;
    return `${t},${Math.min(16, Math.max(0, 1.6 * (t - 100)))},${t >= 50 ? 1 : 0}`;
  });
  const read = readOscillogram(new TextEncoder().encode(`Time (ns),CH1 (V),TRIG (V)\n${rows.join('\n')}\n`));
  if (!read.ok) throw new Error(read.refusal.words);
  const survey = surveyOf(read.value, 50);
  const draft = {
    ...EMPTY_TRACE,
    choices: { '2': { shows: 'trigger' as const } },
    texts: { [probeKey(1)]: '1000' },
  };

  it('measures in kilovolts, and the delay after the trigger', () => {
    const one = measured(survey, readingAs(survey, draft), { index: 0, loop_F: null });
    if (one === null) throw new Error('there is a channel');
    expect([one.unit, one.quiet, one.after]).toEqual(['kV', false, 'after TRIG']);
    expect(one.peak).toBeCloseTo(16, 9);
    expect((one.rise_s ?? 0) * 1e9).toBeCloseTo(8, 6);
    expect((one.delay_s ?? 0) * 1e9).toBeCloseTo(105 - 49.75, 6);
    expect(keptFigures(one, 1)).toMatchObject({
      channel: 1,
      peak_unit: 'kV',
      ring_MHz: null,
      inductance_nH: null,
    });
  });

  it('says after the zero where there is no trigger, and turns over with the sign', () => {
    const plain = { ...draft, choices: { '1': { inverted: true } } };
    const one = measured(survey, readingAs(survey, plain), { index: 0, loop_F: null });
    expect(one?.peak).toBeCloseTo(-16, 9);
    expect(one?.after).toBe('after the instrument\u2019s zero');
    expect((one?.delay_s ?? 0) * 1e9).toBeCloseTo(101, 6);
  });
});

describe('looking further in', () => {
  const whole = { from_s: -1e-6, to_s: 3e-6 };

  it('never leaves the trace', () => {
    expect(around(whole, 2.9e-6, 1e-6)).toEqual({
      from_s: expect.closeTo(2e-6, 12) as number,
      to_s: expect.closeTo(3e-6, 12) as number,
    });
    const all = zoomed(whole, { from_s: 0, to_s: 3e-6 }, 'out');
    expect(all.from_s).toBeCloseTo(-1e-6, 12);
    expect(all.to_s).toBeCloseTo(3e-6, 12);
    let now = whole;
    for (let i = 0; i < 60; i++) now = zoomed(whole, now, 'in');
    expect(now.to_s - now.from_s).toBeGreaterThan(0);
    for (let i = 0; i < 20; i++) now = zoomed(whole, now, i % 2 === 0 ? 'out' : 'earlier');
    expect(now.from_s).toBeGreaterThanOrEqual(whole.from_s);
    expect(now.to_s).toBeLessThanOrEqual(whole.to_s + 1e-12);
  });
});
