// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { AgeScale } from './age-scale';
import { GapMark } from './gap-mark';
import { StateStrip } from './state-strip';

describe('state strip', () => {
  it('says all of it in one name and opens by one touch', () => {
    const press = vi.fn();
    render(
      <StateStrip
        mark="open"
        ground="half"
        hatched
        title="Rig"
        state="Off, stood down"
        detail="2 min"
        person="Ada"
        count="3 waiting"
        onPress={press}
        pressLabel="show"
      />,
    );
    const strip = screen.getByRole('button', { name: 'Rig, Off, stood down, 2 min, Ada, 3 waiting, show' });
    fireEvent.click(strip);
    expect(press).toHaveBeenCalledOnce();
    expect(strip.closest('header')?.className).toBe('state-strip ground-half hatched');
  });

  it('keeps the state apart from the hatch: the mark shows both', () => {
    const { container, rerender } = render(<GapMark state="bridged" hatched />);
    const drawn = container.innerHTML;
    rerender(<GapMark state="bridged" />);
    expect(container.innerHTML).not.toBe(drawn);
    expect(container.querySelectorAll('circle').length).toBeGreaterThan(0);
  });

  it('draws each state as another shape', () => {
    const shapes = (['bridged', 'open', 'dashed', 'jagged'] as const).map((state) => {
      const { container, unmount } = render(<GapMark state={state} />);
      const html = container.innerHTML.replace(/id="[^"]*"|url\([^)]*\)/g, '');
      unmount();
      return html;
    });
    expect(new Set(shapes).size).toBe(4);
  });
});

describe('age scale', () => {
  it('fills a twelfth for each hour and ends at the end', () => {
    const { container, rerender } = render(<AgeScale age_h={3} />);
    const width = (): string | undefined => container.querySelector<HTMLElement>('.age-bar')?.style.width;
    expect(width()).toBe('25%');
    rerender(<AgeScale age_h={30} />);
    expect(width()).toBe('100%');
    rerender(<AgeScale age_h={null} />);
    expect(width()).toBeUndefined();
  });
});
