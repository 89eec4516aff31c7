// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { SlideConfirm } from './slide-confirm';

describe('slide', () => {
  const setUp = () => {
    const told = { onComplete: vi.fn(), onCancel: vi.fn() };
    render(<SlideConfirm label="Slide to retire" to="Retire" cancelLabel="Keep" {...told} />);
    const grip = screen.getByRole('slider', { name: 'Slide to retire' });
    Object.assign(grip, { setPointerCapture: () => undefined });
    grip.getBoundingClientRect = () => new DOMRect(0, 0, 100, 78);
    if (grip.parentElement) grip.parentElement.getBoundingClientRect = () => new DOMRect(0, 0, 600, 78);
    return { ...told, grip };
  };

  it('completes where the faces meet and not before', () => {
    const { grip, onComplete } = setUp();
    fireEvent.pointerDown(grip, { pointerId: 1, clientX: 50 });
    fireEvent.pointerMove(grip, { pointerId: 1, clientX: 400 });
    expect(onComplete).not.toHaveBeenCalled();
    fireEvent.pointerMove(grip, { pointerId: 1, clientX: 440 });
    fireEvent.pointerMove(grip, { pointerId: 1, clientX: 450 });
    expect(onComplete).toHaveBeenCalledOnce();
  });

  it('goes back when let go, and ignores a second pointer', () => {
    const { grip, onComplete } = setUp();
    fireEvent.pointerDown(grip, { pointerId: 1, clientX: 50 });
    fireEvent.pointerMove(grip, { pointerId: 2, clientX: 450 });
    fireEvent.pointerMove(grip, { pointerId: 1, clientX: 300 });
    fireEvent.pointerUp(grip, { pointerId: 1 });
    expect(grip.getAttribute('aria-valuenow')).toBe('0');
    expect(onComplete).not.toHaveBeenCalled();
  });

  it('takes ten arrow keys, and Escape keeps', () => {
    const { grip, onComplete, onCancel } = setUp();
    for (let i = 0; i < 9; i += 1) fireEvent.keyDown(grip, { key: 'ArrowRight' });
    expect(onComplete).not.toHaveBeenCalled();
    fireEvent.keyDown(grip, { key: 'ArrowRight' });
    expect(onComplete).toHaveBeenCalledOnce();
    fireEvent.keyDown(grip, { key: 'Escape' });
    expect(onCancel).toHaveBeenCalledOnce();
  });
});
