import { render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { readingDoc } from './firing.fixture';
import { ReadingsTable } from './readings-table';

describe('the table of readings', () => {
  it('keeps a thousand readings out of the document but for those in view, newest first', () => {
    const readings = Array.from({ length: 1000 }, (_, i) => readingDoc(i + 1));
    render(<ReadingsTable readings={readings} onPick={vi.fn()} />);
    const table = screen.getByRole('table');
    expect(table.getAttribute('aria-rowcount')).toBe('1001');
    const buttons = screen.getAllByRole('button');
    expect(buttons.length).toBeLessThan(100);
    expect(buttons[0]?.textContent).toBe('1000');
  });

  it('opens the reading that is touched', () => {
    const onPick = vi.fn();
    render(<ReadingsTable readings={[readingDoc(1), readingDoc(2)]} onPick={onPick} />);
    screen.getByRole('button', { name: 'Reading 1: correct or strike' }).click();
    expect(onPick).toHaveBeenCalledWith(expect.objectContaining({ no: 1 }));
  });
});
