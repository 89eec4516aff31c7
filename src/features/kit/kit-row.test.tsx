import { render, screen } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import type { KitDoc } from '../../domain/book/documents/kit';
import { DAY_MS, kitDoc, NOW_MS, spareDoc } from './kit.fixture';
import { KitRow } from './kit-row';

const row = (kit: KitDoc) => {
  const { container } = render(
    <MemoryRouter>
      <KitRow kit={kit} holder="Ada Brook" now_ms={NOW_MS} zone="Europe/London" />
    </MemoryRouter>,
  );
  return { text: screen.getByRole('link').textContent ?? '', mark: container.querySelector('.due-mark') };
};

describe('a row of the register', () => {
  it('says who has it, its densities and that it is overdue, by words and shape', () => {
    const { text, mark } = row(kitDoc({ due_ms: NOW_MS - 12 * DAY_MS }));
    for (const words of ['E1', 'UV pair', 'OD 6 at 190 to 375', 'Ada Brook', 'inspection overdue, 12\u00a0d'])
      expect(text).toContain(words);
    expect(mark?.classList.contains('overdue')).toBe(true);
  });

  it('hatches what did not pass', () => {
    expect(row(kitDoc({ state: 'failed' })).mark?.querySelector('path')).not.toBeNull();
  });

  it('orders a spare below its minimum, and names no holder', () => {
    const { text, mark } = row(spareDoc('S1', 1, 2));
    expect(text).toContain('1 there, at least 2');
    expect(text).toContain('order');
    expect(text).not.toContain('Ada Brook');
    expect(mark).toBeNull();
  });
});
