import { describe, expect, it } from 'vitest';
import { backoffMs, nextStep, type RoundFacts } from './handover-plan';

const facts: RoundFacts = {
  greeted: true,
  reset: false,
  refilling: false,
  filling: false,
  waiting: 0,
  forked: false,
  cursor: 5,
  head: 5,
};

describe('the next step of a round', () => {
  it.each([
    ['says hello first, whatever waits', { greeted: false, waiting: 3, reset: true }, 'hello'],
    ['settles a reset before it sends', { reset: true, waiting: 3 }, 'reset'],
    ['brings the new Book in before it sends again', { refilling: true, waiting: 3 }, 'fill'],
    ['sends before it fills', { waiting: 1, filling: true }, 'push'],
    ['sends before it pulls', { waiting: 1, head: 9 }, 'push'],
    ['sends nothing from a forked tablet, and still pulls', { waiting: 1, forked: true, head: 9 }, 'pull'],
    ['fills before it pulls', { filling: true, head: 9 }, 'fill'],
    ['pulls up to the head', { head: 6 }, 'pull'],
    ['is done at the head with nothing waiting', {}, 'done'],
  ] as const)('%s', (_name, change, step) => {
    expect(nextStep({ ...facts, ...change })).toBe(step);
  });
});

describe('the wait before the next try', () => {
  it('doubles from 1 s to 60 s, and chance takes at most half of it', () => {
    expect([1, 2, 3, 4, 5, 6, 7, 20].map((failures) => backoffMs(failures, 0) / 1000)).toEqual([
      1, 2, 4, 8, 16, 32, 60, 60,
    ]);
    for (const failures of [1, 3, 7]) {
      const full = backoffMs(failures, 0);
      expect(backoffMs(failures, 0.999)).toBeGreaterThanOrEqual(Math.max(1000, full / 2));
      expect(backoffMs(failures, 0.5)).toBeLessThanOrEqual(full);
    }
  });
});
