import { describe, expect, it } from 'vitest';
import { currentRise_s } from './current-rise';

const at = (current: (t: number) => number, points = 401) => {
  const time_s = Array.from({ length: points }, (_, i) => (i * 1e-7) / (points - 1));
  return { time_s, channel_A: time_s.map(current) };
};

describe('currentRise_s', () => {
  it('takes 10 to 90 % of a straight rise', () => {
    expect(currentRise_s(at((t) => Math.min(1, t / 2e-8)))).toBeCloseTo(1.6e-8, 12);
  });

  it('takes that of a quarter sine from both arcs', () => {
    const ring = currentRise_s(at((t) => 500 * Math.sin(2 * Math.PI * 1e7 * t)));
    expect((ring ?? 0) / ((Math.asin(0.9) - Math.asin(0.1)) / (2 * Math.PI * 1e7))).toBeCloseTo(1, 2);
  });

  it('stays with the first pulse where a later one is higher', () => {
    const swing = (t: number) => Math.sin(2 * Math.PI * 2e7 * t) * (t < 2.5e-8 ? 0.8 : 1);
    const alone = currentRise_s(at((t) => 0.8 * Math.sin(2 * Math.PI * 2e7 * t)));
    expect(currentRise_s(at(swing))).toBeCloseTo(alone ?? 0, 12);
  });

  it('has none for a channel that stays dark', () => {
    expect(currentRise_s(at(() => 0))).toBeNull();
    expect(currentRise_s({ time_s: [], channel_A: [] })).toBeNull();
  });
});
