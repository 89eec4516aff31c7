import { describe, expect, it } from 'vitest';
import { elapsedMs, type StampPoint } from './stamp';

const point = (more: Partial<StampPoint> = {}): StampPoint => ({
  wall_ms: 1_000_000,
  page_life: 'one',
  monotonic_ms: 500,
  time_uncertain: false,
  ...more,
});

describe('time from one entry to the next', () => {
  it('is the larger of wall and monotonic time, so a clock set back makes nothing younger', () => {
    expect(elapsedMs(point(), point({ wall_ms: 1_000_300, monotonic_ms: 900 }))).toBe(400);
    expect(elapsedMs(point(), point({ wall_ms: 1_000_900, monotonic_ms: 900 }))).toBe(900);
    expect(elapsedMs(point(), point({ wall_ms: 0, monotonic_ms: 900 }))).toBe(400);
    expect(elapsedMs(point(), point({ wall_ms: 0, monotonic_ms: 100 }))).toBe(0);
  });

  it('across page lives is wall time, where both clocks may be believed', () => {
    expect(elapsedMs(point(), point({ page_life: 'two', wall_ms: 1_000_300, monotonic_ms: 1 }))).toBe(300);
    expect(elapsedMs(point(), point({ page_life: 'two', wall_ms: 999_999 }))).toBeNull();
    expect(elapsedMs(point({ time_uncertain: true }), point({ page_life: 'two' }))).toBeNull();
    expect(elapsedMs(point(), point({ page_life: 'two', time_uncertain: true }))).toBeNull();
  });
});
