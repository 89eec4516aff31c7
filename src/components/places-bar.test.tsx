// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { PlacesBar } from './places-bar';

const places = [
  { key: 'a', label: 'First', href: '/a' },
  { key: 'b', label: 'Second', href: '/b', count: '2' },
];

describe('places', () => {
  it('marks where you are and hands a plain press to the app', () => {
    const go = vi.fn();
    render(<PlacesBar label="Places" places={places} current="a" switchLabel="others" onGo={go} />);
    expect(screen.getByRole('link', { current: 'page' }).textContent).toBe('First');
    expect(fireEvent.click(screen.getByRole('link', { name: /Second/ }))).toBe(false);
    expect(go).toHaveBeenCalledExactlyOnceWith(places[1]);
  });

  it('leaves a press that wants another tab to the browser', () => {
    const go = vi.fn();
    render(<PlacesBar label="Places" places={places} current="a" switchLabel="others" onGo={go} />);
    const second = screen.getByRole('link', { name: /Second/ });
    second.addEventListener('click', (event) => event.preventDefault());
    fireEvent.click(second, { ctrlKey: true });
    expect(go).not.toHaveBeenCalled();
  });

  it('opens the rest on a phone and closes on Escape', () => {
    render(<PlacesBar label="Places" places={places} current="a" switchLabel="others" />);
    const here = screen.getByRole('button', { name: 'First, others' });
    fireEvent.click(here);
    expect(here.getAttribute('aria-expanded')).toBe('true');
    fireEvent.keyDown(document, { key: 'Escape' });
    expect(here.getAttribute('aria-expanded')).toBe('false');
  });
});
