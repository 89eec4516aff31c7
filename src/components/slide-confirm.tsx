import { useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { ElectrodeBody } from './electrode-body';

export interface SlideConfirmProps {
  /** What sliding does; stands in the gap. */
  readonly label: string;
  /** Stands on the face that has to be reached. */
  readonly to: string;
  readonly onComplete: () => void;
  readonly onCancel: () => void;
  readonly cancelLabel: string;
}

/** Reaching this part of the way counts: the faces meet before the thumb hits the edge of the screen. */
const REACHED = 0.96;
const KEY_STEP = 0.1;

/** After a hold that cannot be undone: one electrode is slid against the other, at another place than the hold. */
export function SlideConfirm({ label, to, onComplete, onCancel, cancelLabel }: SlideConfirmProps) {
  const track = useRef<HTMLDivElement>(null);
  const grip = useRef<{ readonly pointer: number; readonly x: number; readonly room: number } | null>(null);
  const [at, setAt] = useState(0);

  const moveTo = (next: number): void => {
    const bounded = Math.min(1, Math.max(0, next));
    setAt(bounded);
    if (bounded >= REACHED) {
      grip.current = null;
      onComplete();
    }
  };
  const down = (event: PointerEvent<HTMLDivElement>): void => {
    const box = track.current?.getBoundingClientRect();
    const own = event.currentTarget.getBoundingClientRect();
    if (box === undefined || grip.current !== null) return;
    grip.current = {
      pointer: event.pointerId,
      x: event.clientX,
      room: Math.max(1, box.width - 2 * own.width),
    };
    event.currentTarget.setPointerCapture(event.pointerId);
  };
  const move = (event: PointerEvent): void => {
    const held = grip.current;
    if (held === null || held.pointer !== event.pointerId) return;
    moveTo((event.clientX - held.x) / held.room);
  };
  const end = (event: PointerEvent): void => {
    if (grip.current?.pointer !== event.pointerId) return;
    grip.current = null;
    setAt(0);
  };
  const keys = (event: KeyboardEvent): void => {
    const step = event.key === 'ArrowRight' ? KEY_STEP : event.key === 'ArrowLeft' ? -KEY_STEP : null;
    if (event.key === 'Escape') onCancel();
    if (step === null) return;
    event.preventDefault();
    moveTo(at + step);
  };

  return (
    <div className="slide-confirm">
      <div ref={track} className="slide-track">
        <span className="slide-words">{label}</span>
        <div
          className="slide-grip"
          role="slider"
          tabIndex={0}
          aria-label={label}
          aria-valuemin={0}
          aria-valuemax={100}
          aria-valuenow={Math.round(at * 100)}
          style={{ '--slid': at }}
          onPointerDown={down}
          onPointerMove={move}
          onPointerUp={end}
          onPointerCancel={end}
          onKeyDown={keys}
        >
          <ElectrodeBody facing="right" tone="brass" />
        </div>
        <div className="slide-stop">
          <ElectrodeBody facing="left" tone="metal" />
          <span>{to}</span>
        </div>
      </div>
      <button type="button" className="slide-cancel" onClick={onCancel}>
        {cancelLabel}
      </button>
    </div>
  );
}
