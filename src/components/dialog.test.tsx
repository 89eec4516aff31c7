// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { Dialog } from './dialog';

describe('dialog', () => {
  const setUp = (critical = false) => {
    const close = vi.fn();
    const before = document.createElement('button');
    document.body.append(before);
    before.focus();
    const view = render(
      <Dialog
        title="A question"
        closeLabel="Later"
        onClose={close}
        critical={critical}
        actions={<button type="button">Now</button>}
      >
        <p>words</p>
      </Dialog>,
    );
    return { close, before, view, dialog: screen.getByRole('dialog', { name: 'A question' }) };
  };

  it('keeps Tab inside', () => {
    const { dialog } = setUp();
    const later = screen.getByRole('button', { name: 'Later' });
    const now = screen.getByRole('button', { name: 'Now' });
    now.focus();
    fireEvent.keyDown(dialog, { key: 'Tab' });
    expect(document.activeElement).toBe(later);
    fireEvent.keyDown(dialog, { key: 'Tab', shiftKey: true });
    expect(document.activeElement).toBe(now);
  });

  it('gives the focus back to where it was', () => {
    const { before, view } = setUp();
    screen.getByRole('button', { name: 'Now' }).focus();
    view.unmount();
    expect(document.activeElement).toBe(before);
    before.remove();
  });

  it('closes by its button and on Escape, and a critical one not on Escape', () => {
    const first = setUp();
    fireEvent.click(screen.getByRole('button', { name: 'Later' }));
    fireEvent(first.dialog, new Event('cancel', { cancelable: true }));
    expect(first.close).toHaveBeenCalledTimes(2);
    first.view.unmount();
    const second = setUp(true);
    fireEvent(second.dialog, new Event('cancel', { cancelable: true }));
    expect(second.close).not.toHaveBeenCalled();
  });
});
