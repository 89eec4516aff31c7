// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { Choice } from './choice';

type Look = 'even' | 'arc' | 'dark' | 'odd';

function Held({ start = null }: { readonly start?: Look | null }) {
  const [value, setValue] = useState<Look | null>(start);
  return (
    <Choice<Look>
      label="Looked"
      value={value}
      onChange={setValue}
      options={[
        { value: 'even', label: 'even' },
        { value: 'arc', label: 'arc' },
        { value: 'dark', label: 'dark', disabled: true },
        { value: 'odd', label: 'odd' },
      ]}
    />
  );
}

const chosen = (): string[] =>
  screen
    .getAllByRole('radio')
    .flatMap((radio) => (radio.getAttribute('aria-checked') === 'true' ? [radio.textContent] : []));

describe('choice', () => {
  it('starts without one and takes what is touched', () => {
    render(<Held />);
    expect(chosen()).toEqual([]);
    fireEvent.click(screen.getByRole('radio', { name: 'arc' }));
    expect(chosen()).toEqual(['arc']);
  });

  it('moves by arrows past what cannot be chosen, round the ends, with the focus', () => {
    render(<Held start="arc" />);
    const group = screen.getByRole('radiogroup', { name: 'Looked' });
    fireEvent.keyDown(group, { key: 'ArrowRight' });
    expect(chosen()).toEqual(['odd']);
    expect(document.activeElement?.textContent).toBe('odd');
    fireEvent.keyDown(group, { key: 'ArrowRight' });
    expect(chosen()).toEqual(['even']);
    fireEvent.keyDown(group, { key: 'ArrowLeft' });
    expect(chosen()).toEqual(['odd']);
  });

  it('is one stop of the Tab key', () => {
    render(<Held start="odd" />);
    const stops = screen.getAllByRole('radio').filter((radio) => radio.tabIndex === 0);
    expect(stops.map((stop) => stop.textContent)).toEqual(['odd']);
  });
});
