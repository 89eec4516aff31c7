import { useEffect, useEffectEvent } from 'react';
import { BURST_MS, initialGuard, stepGuard, type GuardEvent, type GuardVerdict } from './noise-guard';

export interface NoiseGuardOptions {
  /** Told how many contacts were ignored; once per event that ignored any. */
  readonly onNoise: (count: number) => void;
  /** Px per millimetre of this screen, so that distances are real ones. */
  readonly mm_px: number;
  readonly enabled?: boolean;
}

/** Watches every contact before anything else sees it. Mouse and keyboard pass: a spark does not fake those. */
export function useNoiseGuard({ onNoise, mm_px, enabled = true }: NoiseGuardOptions): void {
  const tell = useEffectEvent(onNoise);
  useEffect(
    () => (enabled ? installNoiseGuard(window, { mm_px, onNoise: (count) => tell(count) }) : undefined),
    [enabled, mm_px],
  );
}

const KINDS = { pointerdown: 'down', pointermove: 'move', pointerup: 'up', pointercancel: 'cancel' } as const;
/** A contact is looked at again this long after it came down: steady and alone, it counts from then on. */
const LOOK_AGAIN_MS = BURST_MS + 10;
/** A click follows its contact at once, if at all. */
const CLICK_MS = 60;

/** The guard on a window; returns how to take it off. */
export function installNoiseGuard(
  target: Window,
  { mm_px, onNoise }: { readonly mm_px: number; readonly onNoise: (count: number) => void },
): () => void {
  let state = initialGuard;
  let ignoredUntil_ms = 0;
  const downs = new Map<number, PointerEvent>();
  const ownEvents = new WeakSet<Event>();
  const timers = new Set<ReturnType<typeof setTimeout>>();
  const off = new AbortController();

  const send = (type: 'pointerdown' | 'pointercancel', id: number): void => {
    const down = downs.get(id);
    if (down?.target === null || down === undefined) return;
    const { pointerId, pointerType, isPrimary, clientX, clientY, button } = down;
    const event = new PointerEvent(type, {
      pointerId,
      pointerType,
      isPrimary,
      clientX,
      clientY,
      button,
      bubbles: true,
      cancelable: true,
    });
    ownEvents.add(event);
    down.target.dispatchEvent(event);
  };
  const step = (event: GuardEvent): GuardVerdict => {
    const next = stepGuard(state, event);
    state = next.state;
    for (const id of next.verdict.cancelled) send('pointercancel', id);
    for (const id of next.verdict.revived) send('pointerdown', id);
    if (next.verdict.noise > 0) onNoise(next.verdict.noise);
    return next.verdict;
  };
  const lookAgain = (): void => {
    const timer = setTimeout(() => {
      timers.delete(timer);
      step({ type: 'tick', t_ms: performance.now() });
      if (state.contacts.some((each) => each.status === 'suspect')) lookAgain();
    }, LOOK_AGAIN_MS);
    timers.add(timer);
  };

  for (const [name, type] of Object.entries(KINDS)) {
    target.addEventListener(
      name,
      (raw) => {
        if (!(raw instanceof PointerEvent) || ownEvents.has(raw) || raw.pointerType === 'mouse') return;
        if (type === 'down') downs.set(raw.pointerId, raw);
        const verdict = step({
          type,
          id: raw.pointerId,
          t_ms: raw.timeStamp,
          x_mm: raw.clientX / mm_px,
          y_mm: raw.clientY / mm_px,
        });
        if (type === 'up' || type === 'cancel') downs.delete(raw.pointerId);
        if (verdict.pass) return;
        raw.stopImmediatePropagation();
        if (type === 'down') lookAgain();
        if (type === 'up') ignoredUntil_ms = raw.timeStamp + CLICK_MS;
      },
      { capture: true, signal: off.signal },
    );
  }
  target.addEventListener(
    'click',
    (raw) => {
      // A click from the keyboard has no contact behind it and counts no presses.
      if (!(raw instanceof MouseEvent) || raw.detail === 0 || raw.timeStamp > ignoredUntil_ms) return;
      raw.stopImmediatePropagation();
      raw.preventDefault();
    },
    { capture: true, signal: off.signal },
  );
  return () => {
    off.abort();
    for (const timer of timers) clearTimeout(timer);
  };
}
