import { render } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { useFootKey } from './use-foot-key';

function Pedal(props: {
  readonly enabled: boolean;
  readonly log: () => void;
  readonly standDown: () => void;
}) {
  useFootKey({ enabled: props.enabled, onLog: props.log, onStandDown: props.standDown });
  return null;
}

function press(type: 'keydown' | 'keyup', at_ms: number, key = 'PageDown'): void {
  const event = new KeyboardEvent(type, { key, bubbles: true, cancelable: true });
  Object.defineProperty(event, 'timeStamp', { value: at_ms });
  window.dispatchEvent(event);
}

describe('useFootKey', () => {
  beforeEach(() => {
    vi.useFakeTimers();
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  it('logs on a short press of either key and leaves every other key alone', () => {
    const log = vi.fn();
    render(<Pedal enabled log={log} standDown={vi.fn()} />);
    press('keydown', 0);
    press('keyup', 400);
    press('keydown', 1000, 'F13');
    press('keyup', 1400, 'F13');
    press('keydown', 2000, 'Enter');
    press('keyup', 2400, 'Enter');
    expect(log).toHaveBeenCalledTimes(2);
  });

  it('stands the rig down without waiting for the release', () => {
    const log = vi.fn();
    const standDown = vi.fn();
    render(<Pedal enabled log={log} standDown={standDown} />);
    press('keydown', 0);
    vi.advanceTimersByTime(1000);
    expect(standDown).toHaveBeenCalledTimes(1);
    press('keyup', 1600);
    expect(log).not.toHaveBeenCalled();
  });

  it('hears nothing while it is off', () => {
    const log = vi.fn();
    render(<Pedal enabled={false} log={log} standDown={vi.fn()} />);
    press('keydown', 0);
    press('keyup', 400);
    expect(log).not.toHaveBeenCalled();
  });
});
