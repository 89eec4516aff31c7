// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { FieldRow } from './field-row';
import { QuantityField } from './quantity-field';

describe('the chosen field', () => {
  const setUp = (refusal?: string) => {
    const told = { onStep: vi.fn(), onOpen: vi.fn() };
    render(
      <QuantityField
        label="Pressure"
        source="measured"
        stepWords="by 0.05"
        value="1.00"
        unit="bar(g)"
        lessLabel="less"
        moreLabel="more"
        {...told}
        {...(refusal === undefined ? {} : { refusal })}
      />,
    );
    return told;
  };

  it('steps by its two electrodes and by the arrow keys', () => {
    const { onStep } = setUp();
    fireEvent.click(screen.getByRole('button', { name: 'less' }));
    fireEvent.click(screen.getByRole('button', { name: 'more' }));
    fireEvent.keyDown(screen.getByRole('group', { name: 'Pressure' }), { key: 'ArrowUp' });
    fireEvent.keyDown(screen.getByRole('group', { name: 'Pressure' }), { key: 'ArrowDown' });
    expect(onStep.mock.calls.flat()).toEqual([-1, 1, 1, -1]);
  });

  it('opens by a touch on the value and keeps figure and unit together', () => {
    const { onOpen } = setUp();
    const value = screen.getByRole('button', { name: '1.00 bar(g)' });
    fireEvent.click(value);
    expect(onOpen).toHaveBeenCalledOnce();
  });

  it('says a refusal beside the field and ties it to the value', () => {
    setUp('Above the vessel.');
    const value = screen.getByRole('button', { name: '1.00 bar(g)' });
    expect(value.getAttribute('aria-invalid')).toBe('true');
    expect(document.getElementById(value.getAttribute('aria-describedby') ?? '')?.textContent).toBe(
      'Above the vessel.',
    );
  });
});

describe('a field at rest', () => {
  it('is a button only where it can be changed', () => {
    const press = vi.fn();
    const { rerender } = render(
      <FieldRow label="Gap" source="measured" value="3.0" unit="mm" onPress={press} />,
    );
    fireEvent.click(screen.getByRole('button', { name: /Gap.*measured.*3\.0 mm/ }));
    expect(press).toHaveBeenCalledOnce();
    rerender(<FieldRow label="Gap" value="3.0" unit="mm" />);
    expect(screen.queryByRole('button')).toBeNull();
  });

  it('shows a zero, and a dash with the unit for nothing', () => {
    const { container, rerender } = render(<FieldRow label="Flow" value={0} unit="L/min" />);
    expect(container.textContent).toContain('0\u2009L/min');
    rerender(<FieldRow label="Flow" value={null} unit="L/min" />);
    expect(container.textContent).toContain('\u2013 L/min');
  });
});
