// @vitest-environment happy-dom
import { act, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { HoldStage } from './hold-stage';
import { ThumbDome } from './thumb-dome';
import { useNoiseGuard } from './use-noise-guard';

function App({
  onNoise,
  onLog,
  onTouch,
}: {
  readonly onNoise: (count: number) => void;
  readonly onLog: () => void;
  readonly onTouch: () => void;
}) {
  useNoiseGuard({ onNoise, mm_px: 5 });
  return (
    <HoldStage>
      <ThumbDome label="Hold to log" hold="half-second" onComplete={onLog} />
      <button type="button" onClick={onTouch}>
        Touch
      </button>
    </HoldStage>
  );
}

let now = 0;
beforeEach(() => {
  vi.useFakeTimers();
  now = 0;
});
afterEach(() => vi.useRealTimers());

const pass = async (ms: number): Promise<void> => {
  now += ms;
  await act(() => vi.advanceTimersByTimeAsync(ms).then(() => undefined));
};
const pointer = (type: string, element: Element, init: PointerEventInit): void => {
  const event = new PointerEvent(type, {
    bubbles: true,
    cancelable: true,
    pointerType: 'touch',
    button: 0,
    ...init,
  });
  Object.defineProperty(event, 'timeStamp', { value: performance.now() });
  act(() => void element.dispatchEvent(event));
};

function setUp() {
  const told = { onNoise: vi.fn(), onLog: vi.fn(), onTouch: vi.fn() };
  render(<App {...told} />);
  return {
    ...told,
    dome: screen.getByRole('button', { name: 'Hold to log' }),
    touch: screen.getByRole('button', { name: 'Touch' }),
  };
}

describe('noise guard on a window', () => {
  it('takes a hold back when a burst forms around it, and counts it once the burst is over', async () => {
    const { onNoise, onLog, dome } = setUp();
    pointer('pointerdown', dome, { pointerId: 1, clientX: 50, clientY: 50 });
    await pass(20);
    for (const id of [2, 3]) {
      pointer('pointerdown', document.body, { pointerId: id, clientX: 700, clientY: 400 });
      await pass(10);
      pointer('pointerup', document.body, { pointerId: id, clientX: 700, clientY: 400 });
    }
    expect(onNoise).toHaveBeenCalled();
    await pass(470);
    expect(onLog).not.toHaveBeenCalled();
    await pass(300);
    expect(onLog).toHaveBeenCalledOnce();
  });

  it('lets no ignored contact end in a click, and a steady one again', async () => {
    const { onTouch, touch } = setUp();
    pointer('pointerdown', touch, { pointerId: 1 });
    await pass(10);
    pointer('pointerup', touch, { pointerId: 1 });
    fireEvent(touch, new MouseEvent('click', { bubbles: true, detail: 1 }));
    expect(onTouch).not.toHaveBeenCalled();
    await pass(500);
    pointer('pointerdown', touch, { pointerId: 2 });
    await pass(90);
    pointer('pointerup', touch, { pointerId: 2 });
    await pass(100);
    fireEvent(touch, new MouseEvent('click', { bubbles: true, detail: 1 }));
    expect(onTouch).toHaveBeenCalledOnce();
  });

  it('leaves mouse and keyboard alone', async () => {
    const { onNoise, onTouch, touch } = setUp();
    for (const id of [1, 2, 3, 4]) pointer('pointerdown', touch, { pointerId: id, pointerType: 'mouse' });
    fireEvent.click(touch, { detail: 0 });
    await pass(10);
    expect(onNoise).not.toHaveBeenCalled();
    expect(onTouch).toHaveBeenCalledOnce();
  });
});
