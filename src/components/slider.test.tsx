// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { Slider } from './slider';

beforeEach(() => {
  vi.spyOn(Element.prototype, 'getBoundingClientRect').mockReturnValue(new DOMRect(100, 0, 200, 10));
});

const setUp = () => {
  const onSlide = vi.fn();
  render(
    <Slider
      label="Slide pressure"
      range={{ from: 0, to: 2, scale: 'linear', decimals: 2 }}
      value={1}
      valueText="1.00 bar(g)"
      ends={['0', '2']}
      onSlide={onSlide}
    />,
  );
  return { onSlide, slider: screen.getByRole('slider', { name: 'Slide pressure' }) };
};
const finger = (clientX: number) => ({ clientX, pointerId: 5, pointerType: 'touch', button: 0 });

describe('a slider', () => {
  it('says its value with the unit', () => {
    const { slider } = setUp();
    expect(slider.getAttribute('aria-valuetext')).toBe('1.00 bar(g)');
  });

  it('changes nothing at a touch that does not move, wherever it comes down', () => {
    const { slider, onSlide } = setUp();
    fireEvent.pointerDown(slider, finger(290));
    fireEvent.pointerMove(slider, finger(291));
    fireEvent.pointerUp(slider, finger(291));
    expect(onSlide).not.toHaveBeenCalled();
  });

  it('moves the value by as much as the finger moves', () => {
    const { slider, onSlide } = setUp();
    fireEvent.pointerDown(slider, finger(290));
    fireEvent.pointerMove(slider, finger(240));
    expect(onSlide).toHaveBeenLastCalledWith(0.5);
    fireEvent.pointerMove(slider, finger(9999));
    expect(onSlide).toHaveBeenLastCalledWith(2);
  });

  it('takes the change back when the contact turns out to be noise', () => {
    const { slider, onSlide } = setUp();
    fireEvent.pointerDown(slider, finger(200));
    fireEvent.pointerMove(slider, finger(260));
    fireEvent.pointerCancel(slider, finger(260));
    expect(onSlide).toHaveBeenLastCalledWith(1);
  });

  it('ignores a second finger', () => {
    const { slider, onSlide } = setUp();
    fireEvent.pointerDown(slider, finger(200));
    fireEvent.pointerMove(slider, { ...finger(280), pointerId: 6 });
    expect(onSlide).not.toHaveBeenCalled();
  });

  it('is moved by keys from end to end', () => {
    const { slider, onSlide } = setUp();
    for (const key of ['ArrowRight', 'ArrowLeft', 'PageUp', 'PageDown', 'Home', 'End', 'a']) {
      fireEvent.keyDown(slider, { key });
    }
    expect(onSlide.mock.calls.flat()).toEqual([1.02, 0.98, 1.2, 0.8, 0, 2]);
  });
});
