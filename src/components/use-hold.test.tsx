// @vitest-environment happy-dom
import { act, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { HoldWork } from './hold';
import { HoldStage } from './hold-stage';
import { StateStrip } from './state-strip';
import { ThumbDome } from './thumb-dome';

beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

function setUp(onComplete: HoldWork, props: Partial<Parameters<typeof ThumbDome>[0]> = {}) {
  render(
    <HoldStage>
      <StateStrip mark="open" ground="half" title="One" state="Open" count="3 waiting" />
      <ThumbDome
        label={'Hold\nto log'}
        hold="half-second"
        holdLabel="Hold: log"
        onComplete={onComplete}
        {...props}
      />
      <button type="button">other</button>
    </HoldStage>,
  );
  return screen.getByRole('button', { name: /Hold/ });
}

const pass = (ms: number): Promise<void> => act(() => vi.advanceTimersByTimeAsync(ms).then(() => undefined));
const down = (element: Element, init: PointerEventInit = {}): void => {
  fireEvent.pointerDown(element, { pointerId: 1, button: 0, clientX: 50, clientY: 50, ...init });
};
const phase = (): string | null => document.querySelector('.hold-fill')?.getAttribute('data-phase') ?? null;

describe('a hold by pointer', () => {
  it('completes after its time and not before', async () => {
    const done = vi.fn();
    const dome = setUp(done);
    down(dome);
    await pass(480);
    expect(done).not.toHaveBeenCalled();
    expect(phase()).toBe('holding');
    await pass(30);
    expect(done).toHaveBeenCalledOnce();
  });

  it('takes a second for the ten pieces', async () => {
    const done = vi.fn();
    const dome = setUp(done, { hold: 'second' });
    down(dome);
    await pass(980);
    expect(done).not.toHaveBeenCalled();
    await pass(40);
    expect(done).toHaveBeenCalledOnce();
  });

  it.each([
    ['let go', () => fireEvent.pointerUp(window, { pointerId: 1 })],
    ['cancelled', () => fireEvent.pointerCancel(window, { pointerId: 1 })],
    ['slid 13 px', () => fireEvent.pointerMove(window, { pointerId: 1, clientX: 63, clientY: 50 })],
    ['out of the window', () => fireEvent.blur(window)],
  ])('parts the faces when %s', async (_what, end) => {
    const done = vi.fn();
    const dome = setUp(done);
    down(dome);
    await pass(300);
    act(() => void end());
    expect(phase()).toBeNull();
    await pass(1000);
    expect(done).not.toHaveBeenCalled();
  });

  it('bears 12 px of a rolling thumb and the moves of other pointers', async () => {
    const done = vi.fn();
    const dome = setUp(done);
    down(dome);
    fireEvent.pointerMove(window, { pointerId: 1, clientX: 62, clientY: 50 });
    fireEvent.pointerMove(window, { pointerId: 2, clientX: 400, clientY: 50 });
    await pass(520);
    expect(done).toHaveBeenCalledOnce();
  });

  it('ends when a second finger stays, and bears a flicker', async () => {
    const done = vi.fn();
    const dome = setUp(done);
    down(dome);
    fireEvent.pointerDown(window, { pointerId: 2 });
    await pass(40);
    fireEvent.pointerUp(window, { pointerId: 2 });
    await pass(480);
    expect(done).toHaveBeenCalledOnce();

    await pass(1000);
    down(dome);
    fireEvent.pointerDown(window, { pointerId: 3 });
    await pass(1000);
    expect(done).toHaveBeenCalledOnce();
  });

  it('does nothing while disabled, nor by a secondary button, nor by a plain click', async () => {
    const done = vi.fn();
    const dome = setUp(done);
    down(dome, { button: 2 });
    fireEvent.click(dome);
    await pass(2000);
    expect(done).not.toHaveBeenCalled();
  });
});

describe('a hold by key', () => {
  it.each(['Enter', ' '])('completes while %j is held, whatever repeats', async (key) => {
    const done = vi.fn();
    const dome = setUp(done);
    fireEvent.keyDown(dome, { key });
    await pass(250);
    fireEvent.keyDown(dome, { key, repeat: true });
    await pass(270);
    expect(done).toHaveBeenCalledOnce();
  });

  it('ends with the key and with the focus', async () => {
    const done = vi.fn();
    const dome = setUp(done);
    fireEvent.keyDown(dome, { key: 'Enter' });
    await pass(300);
    fireEvent.keyUp(dome, { key: 'Enter' });
    await pass(1000);
    fireEvent.keyDown(dome, { key: 'Enter' });
    await pass(300);
    fireEvent.blur(dome);
    await pass(1000);
    expect(done).not.toHaveBeenCalled();
  });
});

describe('what the strip shows', () => {
  it('stops a hair short until the work is done, then touches, then clears', async () => {
    let finish: () => void = () => undefined;
    const dome = setUp(() => new Promise<void>((resolve) => (finish = resolve)));
    down(dome);
    await pass(510);
    expect(phase()).toBe('writing');
    down(dome);
    await pass(5000);
    expect(phase()).toBe('writing');
    act(() => finish());
    await pass(0);
    expect(phase()).toBe('settled');
    await pass(400);
    expect(phase()).toBeNull();
  });

  it('stops the faces apart with the words of a failure', async () => {
    const dome = setUp(() =>
      Promise.resolve({ type: 'failed', words: 'Not logged. Kept as draft. Hold again.' }),
    );
    down(dome);
    await pass(520);
    expect(phase()).toBe('failed');
    expect(screen.getByRole('alert').textContent).toBe('Not logged. Kept as draft. Hold again.');
    down(dome);
    await pass(20);
    expect(phase()).toBe('holding');
  });

  it('says so and reports when the work throws', async () => {
    const reported = vi.fn();
    vi.stubGlobal('reportError', reported);
    const dome = setUp(() => Promise.reject(new Error('disk')), { failedWords: 'Not kept.' });
    down(dome);
    await pass(520);
    expect(screen.getByRole('alert').textContent).toBe('Not kept.');
    expect(reported).toHaveBeenCalledOnce();
    vi.unstubAllGlobals();
  });

  it('tells how much is left', async () => {
    const dome = setUp(() => undefined);
    down(dome);
    await pass(200);
    expect(document.querySelector('.hold-fill-words')?.textContent).toMatch(/^Hold: log, 0\.[34]\u2009s$/);
  });
});

describe('a touch', () => {
  it('acts at once on a click and shows no fill', async () => {
    const done = vi.fn();
    const dome = setUp(done, { hold: 'touch' });
    fireEvent.click(dome);
    expect(done).toHaveBeenCalledOnce();
    await pass(0);
    expect(phase()).toBeNull();
  });

  it('does not act while disabled', () => {
    const done = vi.fn();
    const dome = setUp(done, { hold: 'touch', disabled: true });
    fireEvent.click(dome);
    expect(done).not.toHaveBeenCalled();
    expect(dome.getAttribute('aria-disabled')).toBe('true');
  });
});
