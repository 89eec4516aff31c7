import { describe, expect, it } from 'vitest';
import { burstLine, burstView, startBurst, stillRunning } from './burst';

const at = (monotonic_ms: number, page_life = 'one') => ({ page_life, monotonic_ms });

describe('a burst by rate times time', () => {
  const burst = startBurst(2, at(10_000));

  it('counts every shot that was begun', () => {
    expect(burstView(burst, at(10_000))).toMatchObject({ type: 'running', shots: 0 });
    expect(burstView(burst, at(10_100))).toMatchObject({ shots: 1 });
    expect(burstView(burst, at(30_000))).toMatchObject({ shots: 40 });
    expect(burstView(burst, at(30_001))).toMatchObject({ shots: 41 });
  });

  it('counts after a kill what was seen, and says that it was interrupted', () => {
    const kept = stillRunning(burst, at(25_000));
    const view = burstView(kept, at(400, 'two'));
    expect(view).toEqual({ type: 'interrupted', shots: 30, rate_Hz: 2 });
    expect(burstLine(view)).toMatch(
      /^burst was running when the app went away: 30 shots at 2\u2009Hz up to then/,
    );
  });

  it('is not kept alive by another page life, nor by a clock that runs back', () => {
    expect(stillRunning(burst, at(90_000, 'two'))).toBe(burst);
    expect(stillRunning(burst, at(9000))).toBe(burst);
    expect(burstView(stillRunning(burst, at(12_000)), at(11_000))).toMatchObject({ shots: 4 });
  });

  it('has no line while nothing runs', () => {
    expect(burstLine(burstView(null, at(0)))).toBeNull();
  });
});
