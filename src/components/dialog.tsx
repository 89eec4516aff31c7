import { useEffect, useId, useRef, type KeyboardEvent, type ReactNode } from 'react';

export interface DialogProps {
  readonly title: string;
  readonly onClose: () => void;
  readonly closeLabel: string;
  readonly children: ReactNode;
  readonly actions?: ReactNode;
  /** Escape and a press outside do not close it. */
  readonly critical?: boolean;
}

/** Modal: the browser's own dialog keeps what lies behind out of reach; focus goes in, and back to where it was. */
export function Dialog({ title, onClose, closeLabel, children, actions, critical = false }: DialogProps) {
  const ref = useRef<HTMLDialogElement>(null);
  const id = useId();

  useEffect(() => {
    const before = document.activeElement;
    const dialog = ref.current;
    dialog?.showModal();
    return () => {
      dialog?.close();
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, []);

  const keepFocusInside = (event: KeyboardEvent): void => {
    if (event.key !== 'Tab') return;
    const stops = focusStops(ref.current);
    const first = stops[0];
    const last = stops.at(-1);
    if (event.shiftKey && document.activeElement === first) {
      event.preventDefault();
      last?.focus();
    } else if (!event.shiftKey && document.activeElement === last) {
      event.preventDefault();
      first?.focus();
    }
  };

  return (
    <dialog
      ref={ref}
      className="dialog"
      aria-labelledby={id}
      onCancel={(event) => {
        event.preventDefault();
        if (!critical) onClose();
      }}
      onKeyDown={keepFocusInside}
      onClick={(event) => {
        if (event.target === ref.current && !critical) onClose();
      }}
    >
      <div className="dialog-body">
        <h2 id={id}>{title}</h2>
        {children}
        <div className="dialog-actions">
          <button type="button" className="dialog-close" onClick={onClose}>
            {closeLabel}
          </button>
          {actions}
        </div>
      </div>
    </dialog>
  );
}

function focusStops(root: HTMLElement | null): HTMLElement[] {
  const found = root?.querySelectorAll<HTMLElement>(
    'a[href], button:not(:disabled), input, textarea, select, [tabindex="0"]',
  );
  return found === undefined ? [] : [...found].filter((element) => element.tabIndex >= 0);
}
