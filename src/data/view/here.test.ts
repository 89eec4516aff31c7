import { describe, expect, it } from 'vitest';
import { virtualTime } from '../fakes/virtual-time';
import { createHere } from './here';

const BUILD_MS = Date.UTC(2026, 7, 1);
const DAY_MS = 24 * 60 * 60_000;

function here(highest_wall_ms = 0) {
  const time = virtualTime();
  const clock = time.clock();
  return { time, clock, here: createHere({ clock, page_life: 'p', build_ms: BUILD_MS, highest_wall_ms }) };
}

describe('stamps', () => {
  it('carry wall, zone, page life and monotonic time', async () => {
    const { time, clock, here: now } = here();
    await time.pass(1500);
    expect(now.stamp()).toEqual({
      wall_ms: clock.wallMs(),
      offset_min: 120,
      zone: 'Europe/Berlin',
      page_life: 'p',
      monotonic_ms: 1500,
      time_uncertain: false,
    });
  });

  it('are uncertain before the build, and say why', () => {
    const { time, here: now } = here();
    time.setWall(0);
    expect(now.stamp().time_uncertain).toBe(true);
    expect(now.clockTrouble()).toContain('earlier than this app was made');
  });

  it('are uncertain once the clock was set back, in this page life or in an earlier one', () => {
    const { time, clock, here: now } = here();
    const wall_ms = clock.wallMs();
    now.stamp();
    time.setWall(wall_ms - 30_000);
    expect(now.stamp().time_uncertain).toBe(false);
    time.setWall(wall_ms - 90_000);
    expect(now.stamp().time_uncertain).toBe(true);
    expect(here(wall_ms + DAY_MS).here.stamp().time_uncertain).toBe(true);
  });

  it('are certain again once the server’s time shows that only the old clock had jumped ahead', () => {
    const { clock, here: now } = here(Date.UTC(2099, 0, 1));
    expect(now.stamp().time_uncertain).toBe(true);
    now.learnServerTime(clock.wallMs());
    expect(now.stamp().time_uncertain).toBe(false);
  });

  it('are uncertain when the wall clock is more than a day from the server’s', () => {
    const { time, clock, here: now } = here();
    now.learnServerTime(clock.wallMs());
    time.setWall(clock.wallMs() + 2 * DAY_MS);
    expect(now.stamp().time_uncertain).toBe(true);
  });
});

describe('the best known time', () => {
  it('is the server’s plus the monotonic time since, whatever the wall clock says', async () => {
    const { time, here: now } = here();
    now.learnServerTime(5_000_000_000_000);
    await time.pass(250);
    time.setWall(0);
    expect(now.bestMs()).toBe(5_000_000_000_250);
  });
});
