import { describe, expect, it } from 'vitest';
import { pulseFigures, ringAfter } from './measure';
import { readOscillogram, type Oscillogram } from './read-oscillogram';
import { channelScale, scaledEnvelope, scaledPulse, scaledRing, timeScale } from './scaled';
import { envelopesOf, surveyOf } from './survey';

const read = (text: string): Oscillogram => {
  const found = readOscillogram(new TextEncoder().encode(text));
  if (!found.ok) throw new Error(found.refusal.words);
  return found.value;
};

/** A ring of 10 MHz that loses a third per period, in volts over microseconds. */
const TIMES_us = Array.from({ length: 400 }, (_, i) => i * 0.005);
const RING = TIMES_us.map((t) =>
  t < 0.1 ? 0 : Math.exp(-4 * (t - 0.1)) * Math.sin(2 * Math.PI * 10 * (t - 0.1)),
);

describe('survey of a file', () => {
  it('names columns by their place in the table, wherever time stands', () => {
    const survey = surveyOf(read('CH1 (V);Time (ms);CH2 (mV)\n1,5;0,0;7\n2,5;0,1;8\n3,5;0,2;9\n'), 2);
    expect(survey.time).toMatchObject({ type: 'column', column: 1, unit_s: 1e-3, to_s: 2e-4 });
    expect(survey.channels.map(({ name, unit, column }) => [name, unit, column])).toEqual([
      ['CH1', 'V', 0],
      ['CH2', 'mV', 2],
    ]);
    expect(survey.whole[1]?.high).toEqual(Float64Array.of(7, 9));
  });

  it('keeps a spike of one point in the slice that it lies in, however far in it is looked', () => {
    const rows = Array.from({ length: 20_000 }, (_, i) => `${i};${i === 12_345 ? -77 : i % 3}`);
    const file = read(`Time (ns);CH1 (V)\n${rows.join('\n')}\n`);
    const lowest = (values: Float64Array | undefined) => Math.min(...(values ?? []));
    expect(lowest(surveyOf(file, 300).whole[0]?.low)).toBe(-77);
    expect(
      lowest(envelopesOf(file, { from_s: 12_340e-9, to_s: 12_350e-9 }, 300)[0]?.low.filter((v) => v <= 2)),
    ).toBe(-77);
    expect(lowest(envelopesOf(file, { from_s: 0, to_s: 12_000e-9 }, 300)[0]?.low)).toBe(0);
  });
});

describe('scaling by what somebody said of a channel', () => {
  const channel = {
    column: 1,
    name: 'CH1',
    shows: 'gap-voltage',
    unit_V_or_A: 1e-3,
    probe_ratio: 1000,
  } as const;

  it('multiplies unit, probe and sign', () => {
    expect(channelScale({ ...channel, inverted: false })).toBe(1);
    expect(channelScale({ ...channel, inverted: true, unit_V_or_A: 1 })).toBe(-1000);
  });

  it('takes the time that somebody gave where the file gives none', () => {
    const time = { type: 'none', column: null, words: '', from_s: 0, to_s: 9 } as const;
    expect(timeScale({ ...time, unit_s: null }, 2e-9)).toBe(2e-9);
    expect(timeScale({ ...time, unit_s: 1e-6 }, 1e-6)).toBe(1);
    expect(timeScale({ ...time, unit_s: 1e-6 }, 1e-9)).toBeCloseTo(1e-3, 15);
  });

  it('turns the extremes over with the sign', () => {
    const one = { from_s: 0, to_s: 2, low: Float64Array.of(-1, -2), high: Float64Array.of(3, 4) };
    expect(scaledEnvelope(one, -10, 0.5)).toEqual({
      from_s: 0,
      to_s: 1,
      low: Float64Array.of(-30, -40),
      high: Float64Array.of(10, 20),
    });
  });

  it('measures after scaling what it measures of scaled points', () => {
    const seconds = Float64Array.from(TIMES_us, (t) => t * 1e-6);
    const raw = Float64Array.from(RING);
    const scaled = raw.map((value) => value * -2000);
    const stretched = seconds.map((t) => t * 1e-3);
    const pulse = pulseFigures({ seconds, values: raw });
    const other = pulseFigures({ seconds: stretched, values: scaled });
    const mine = scaledPulse(pulse, -2000, 1e-3);
    expect(mine.peak).toBeCloseTo(other.peak, 6);
    expect((mine.rise_s ?? 0) / (other.rise_s ?? 1)).toBeCloseTo(1, 9);
    expect((mine.start_s ?? 0) / (other.start_s ?? 1)).toBeCloseTo(1, 9);
    const ring = ringAfter({ seconds, values: raw }, pulse.peak_s);
    const otherRing = ringAfter({ seconds: stretched, values: scaled }, other.peak_s);
    if (ring === null || otherRing === null) throw new Error('it rings');
    expect(ring.frequency_Hz.value / 10e6).toBeCloseTo(1, 2);
    const turned = scaledRing(ring, 1e-3).frequency_Hz;
    expect(turned.value / otherRing.frequency_Hz.value).toBeCloseTo(1, 6);
    expect(turned.band.low).toBeLessThan(turned.value);
  });
});
