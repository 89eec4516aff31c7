import { describe, expect, it } from 'vitest';
import { FOOT_KEY_UP, stepFootKey, type FootKeyEvent } from './foot-key';

function acts(events: readonly FootKeyEvent[]): string[] {
  const done: string[] = [];
  let state = FOOT_KEY_UP;
  for (const event of events) {
    const step = stepFootKey(state, event);
    state = step.state;
    if (step.act !== null) done.push(step.act);
  }
  return done;
}

describe('the foot key', () => {
  it.each([
    [299, []],
    [300, ['log']],
    [999, ['log']],
    [1000, ['stand-down']],
  ] as const)('released after %i ms gives %j', (held_ms, expected) => {
    expect(
      acts([
        { type: 'down', at_ms: 5000 },
        { type: 'up', at_ms: 5000 + held_ms },
      ]),
    ).toEqual(expected);
  });

  it('stands the rig down while it is still held, once, and logs nothing on release', () => {
    expect(
      acts([
        { type: 'down', at_ms: 0 },
        { type: 'tick', at_ms: 1000 },
        { type: 'down', at_ms: 1030 },
        { type: 'tick', at_ms: 2000 },
        { type: 'up', at_ms: 2500 },
      ]),
    ).toEqual(['stand-down']);
  });

  it('counts from the first press of a key that repeats itself', () => {
    expect(
      acts([
        { type: 'down', at_ms: 0 },
        { type: 'down', at_ms: 250 },
        { type: 'down', at_ms: 280 },
        { type: 'up', at_ms: 400 },
      ]),
    ).toEqual(['log']);
  });

  it('does nothing when the window lost the keyboard in between', () => {
    expect(acts([{ type: 'down', at_ms: 0 }, { type: 'lost' }, { type: 'up', at_ms: 500 }])).toEqual([]);
  });

  it('works again after each press', () => {
    expect(
      acts([
        { type: 'down', at_ms: 0 },
        { type: 'up', at_ms: 400 },
        { type: 'down', at_ms: 2000 },
        { type: 'up', at_ms: 2500 },
      ]),
    ).toEqual(['log', 'log']);
  });
});
