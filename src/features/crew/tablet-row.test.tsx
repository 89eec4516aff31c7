// @vitest-environment happy-dom
import { act, fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import type { Tablet } from './crew-rows';
import { TabletRow } from './tablet-row';

const tablet: Tablet = {
  id: 'b',
  letter: 'B',
  name: 'Window bench tablet',
  last_seen_ms: 0,
  last_seq: 369,
  pending: { count: 2, oldest_wall_ms: null },
  revoked_ms: null,
};

async function held(button: HTMLElement): Promise<void> {
  vi.useFakeTimers();
  fireEvent.keyDown(button, { key: ' ' });
  await act(() => vi.advanceTimersByTimeAsync(1200));
  fireEvent.keyUp(button, { key: ' ' });
  vi.useRealTimers();
}

async function slid(): Promise<void> {
  const grip = screen.getByRole('slider', { name: 'Slide to revoke tablet B for good' });
  for (let i = 0; i < 10; i += 1) fireEvent.keyDown(grip, { key: 'ArrowRight' });
  await act(() => Promise.resolve());
}

describe('revoking a tablet', () => {
  it('takes a hold and then a slide, and nothing less', async () => {
    const revoke = vi.fn(() => Promise.resolve({ type: 'settled' } as const));
    render(<TabletRow tablet={tablet} now_ms={0} mayRevoke revoke={revoke} />);
    await held(screen.getByRole('button', { name: 'Revoke' }));
    expect(revoke).not.toHaveBeenCalled();
    await slid();
    expect(revoke).toHaveBeenCalledExactlyOnceWith('b');
  });

  it('says why it was not revoked', async () => {
    const revoke = () => Promise.resolve({ type: 'failed', words: 'Not revoked. No network.' } as const);
    render(<TabletRow tablet={tablet} now_ms={0} mayRevoke revoke={revoke} />);
    await held(screen.getByRole('button', { name: 'Revoke' }));
    await slid();
    expect(screen.getByRole('alert').textContent).toBe('Not revoked. No network.');
  });

  it('is offered to a lead alone, and never twice', () => {
    const revoke = () => Promise.resolve({ type: 'settled' } as const);
    const { rerender } = render(<TabletRow tablet={tablet} now_ms={0} mayRevoke={false} revoke={revoke} />);
    expect(screen.queryByRole('button')).toBeNull();
    rerender(<TabletRow tablet={{ ...tablet, revoked_ms: 5 }} now_ms={9} mayRevoke revoke={revoke} />);
    expect(screen.queryByRole('button')).toBeNull();
    expect(screen.getByText(', revoked')).toBeDefined();
  });
});
