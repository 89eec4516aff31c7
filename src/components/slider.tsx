import { useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { ElectrodeBody } from './electrode-body';
import { slideShare, slideValue, type SlideRange } from './slide-range';

export interface SliderProps {
  readonly label: string;
  readonly range: SlideRange;
  /** Null while nothing is entered: the grip then waits at the low end. */
  readonly value: number | null;
  /** The value with its unit, for whoever hears the screen. */
  readonly valueText: string;
  /** The ends in words, under the track. */
  readonly ends: readonly [string, string];
  readonly onSlide: (value: number) => void;
}

/** Closer than this to where it came down a finger has not moved yet. px */
const STILL_PX = 3;
const PAGE = 0.1;

interface Grip {
  readonly pointer: number;
  readonly x: number;
  readonly share: number;
  readonly before: number | null;
  readonly moved: boolean;
  readonly width: number;
}

/**
 * A value moved along a track by as much as the finger moves, wherever on the track it came down: a contact that only touches
 * changes nothing, and one that turns out to be noise takes its change back.
 */
export function Slider({ label, range, value, valueText, ends, onSlide }: SliderProps) {
  const track = useRef<HTMLDivElement>(null);
  const grip = useRef<Grip | null>(null);
  const share = value === null ? 0 : slideShare(range, value);

  const down = (event: PointerEvent<HTMLDivElement>): void => {
    if (event.button !== 0 || grip.current !== null) return;
    const box = track.current?.getBoundingClientRect();
    const inside = box === undefined ? 0 : (event.clientX - box.left) / Math.max(1, box.width);
    const start = event.pointerType === 'mouse' ? clamp(inside) : share;
    const width = Math.max(1, box?.width ?? 1);
    const { pointerId: pointer, clientX: x } = event;
    grip.current = { pointer, x, share: start, before: value, moved: false, width };
    // A contact that the guard brings back has no live pointer to capture.
    if (event.isTrusted) event.currentTarget.setPointerCapture(event.pointerId);
    if (event.pointerType === 'mouse') onSlide(slideValue(range, start));
  };
  const move = (event: PointerEvent): void => {
    const held = grip.current;
    if (held === null || held.pointer !== event.pointerId) return;
    const travel = event.clientX - held.x;
    if (!held.moved && Math.abs(travel) < STILL_PX) return;
    grip.current = { ...held, moved: true };
    onSlide(slideValue(range, clamp(held.share + travel / held.width)));
  };
  const up = (event: PointerEvent): void => {
    if (grip.current?.pointer === event.pointerId) grip.current = null;
  };
  const cancel = (event: PointerEvent): void => {
    const held = grip.current;
    if (held?.pointer !== event.pointerId) return;
    grip.current = null;
    if (held.moved && held.before !== null) onSlide(held.before);
  };
  const keys = (event: KeyboardEvent): void => {
    const next = shareAfterKey(event.key, share, range);
    if (next === undefined) return;
    event.preventDefault();
    onSlide(next);
  };

  return (
    <div
      className="slider"
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={range.from}
      aria-valuemax={range.to}
      aria-valuenow={value ?? range.from}
      aria-valuetext={valueText}
      onPointerDown={down}
      onPointerMove={move}
      onPointerUp={up}
      onPointerCancel={cancel}
      onKeyDown={keys}
    >
      <div ref={track} className="slider-track" style={{ '--slid': clamp(share) }}>
        <span className="slider-grip">
          <ElectrodeBody facing="up" tone="brass" edge={0.14} sagitta={0.06} />
        </span>
      </div>
      <span className="slider-ends muted" aria-hidden="true">
        <span>{ends[0]}</span>
        <span>{ends[1]}</span>
      </span>
    </div>
  );
}

function shareAfterKey(key: string, share: number, range: SlideRange): number | undefined {
  if (key === 'Home') return range.from;
  if (key === 'End') return range.to;
  if (key === 'PageUp') return slideValue(range, clamp(share + PAGE));
  if (key === 'PageDown') return slideValue(range, clamp(share - PAGE));
  const step = STEPS[key];
  return step === undefined ? undefined : slideValue(range, clamp(share + step / 100));
}

const STEPS: Readonly<Record<string, -1 | 1>> = { ArrowUp: 1, ArrowRight: 1, ArrowDown: -1, ArrowLeft: -1 };

function clamp(share: number): number {
  return Math.min(1, Math.max(0, share));
}
