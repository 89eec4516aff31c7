// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { Keypad, type KeypadProps } from './keypad';

const words = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Leave',
  minus: 'minus',
  point: 'point',
  unit: 'Unit',
};

function setUp(props: Partial<KeypadProps> = {}) {
  const told = { onEnter: vi.fn(), onText: vi.fn(), onCancel: vi.fn(), onUnit: vi.fn() };
  render(
    <Keypad
      label="Pressure"
      initial="1.00"
      units={[
        { key: 'g', label: 'bar(g)' },
        { key: 'abs', label: 'bar(abs)' },
      ]}
      unit="g"
      words={words}
      {...told}
      {...props}
    />,
  );
  const pad = screen.getByRole('group', { name: 'Pressure' });
  return { ...told, pad, shown: () => document.querySelector('output')?.textContent };
}

const press = (...names: string[]): void => {
  for (const name of names) fireEvent.click(screen.getByRole('button', { name }));
};

describe('keypad', () => {
  it('replaces what stood there by the first figure and tells every key', () => {
    const { onText, shown } = setUp();
    expect(shown()).toBe('1.00\u2009bar(g)');
    press('2', 'point', '5');
    expect(shown()).toBe('2.5\u2009bar(g)');
    expect(onText.mock.calls.flat()).toEqual(['2', '2.', '2.5']);
  });

  it('edits what stood there by erase', () => {
    const { shown } = setUp();
    press('Erase');
    expect(shown()).toBe('1.0\u2009bar(g)');
  });

  it('enters text and unit', () => {
    const { onEnter } = setUp();
    press('3', 'Enter bar(g)');
    expect(onEnter).toHaveBeenCalledExactlyOnceWith('3', 'g');
  });

  it('is worked by a hardware keyboard alone', () => {
    const { pad, onEnter, onCancel } = setUp({ allowMinus: true });
    expect(document.activeElement).toBe(pad);
    for (const key of ['7', ',', '4', '9', 'Backspace', '-']) fireEvent.keyDown(pad, { key });
    fireEvent.keyDown(pad, { key: 'Enter' });
    expect(onEnter).toHaveBeenCalledExactlyOnceWith('-7.4', 'g');
    fireEvent.keyDown(pad, { key: 'Escape' });
    expect(onCancel).toHaveBeenCalledOnce();
  });

  it('does not enter twice when Enter falls on a focused key', () => {
    const { onEnter } = setUp();
    fireEvent.keyDown(screen.getByRole('button', { name: '5' }), { key: 'Enter' });
    expect(onEnter).not.toHaveBeenCalled();
  });

  it('has a minus only where one makes sense', () => {
    const { pad, shown } = setUp();
    expect(screen.queryByRole('button', { name: 'minus' })).toBeNull();
    fireEvent.keyDown(pad, { key: '-' });
    expect(shown()).toBe('1.00\u2009bar(g)');
  });

  it('switches the unit as a choice', () => {
    const { onUnit } = setUp();
    fireEvent.click(screen.getByRole('radio', { name: 'bar(abs)' }));
    expect(onUnit).toHaveBeenCalledExactlyOnceWith('abs');
  });

  it('shows a comma and a true minus to who writes them', () => {
    const { shown } = setUp({ decimal: ',', initial: '-1.5' });
    expect(shown()).toBe('\u22121,5\u2009bar(g)');
  });

  it('says a refusal beside the figure', () => {
    setUp({ refusal: 'Above 2.0.' });
    expect(screen.getByRole('alert').textContent).toBe('Above 2.0.');
  });

  it('gives the focus back', () => {
    const { unmount } = render(<button type="button">before</button>);
    screen.getByRole('button', { name: 'before' }).focus();
    const pad = render(
      <Keypad
        label="P"
        initial=""
        units={[{ key: 'a', label: 'A' }]}
        unit="a"
        words={words}
        onEnter={() => undefined}
        onCancel={() => undefined}
      />,
    );
    pad.unmount();
    expect(document.activeElement?.textContent).toBe('before');
    unmount();
  });
});
