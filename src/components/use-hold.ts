import { useEffect, useRef, useState, type KeyboardEvent, type MouseEvent, type PointerEvent } from 'react';
import { HOLD_TRAVEL_PX, type HoldKind, type HoldWork, type HoldView } from './hold';
import { createHoldEngine, type HoldEngine } from './hold-engine';
import { useHoldStage } from './hold-stage';

export interface HoldOptions {
  readonly kind: HoldKind;
  /** Stands in the strip while it is held. */
  readonly label: string;
  readonly onComplete: HoldWork;
  readonly failedWords?: string;
  readonly disabled?: boolean;
  /** Told at every frame, for a fill other than the strip's. */
  readonly onView?: (view: HoldView) => void;
}

export interface Hold {
  readonly phase: HoldView['phase'];
  readonly holdProps: {
    readonly onPointerDown: (event: PointerEvent) => void;
    readonly onKeyDown: (event: KeyboardEvent) => void;
    readonly onKeyUp: (event: KeyboardEvent) => void;
    readonly onBlur: () => void;
    readonly onClick: () => void;
    readonly onContextMenu: (event: MouseEvent) => void;
  };
}

/** A second finger that stays this long means that the press is no longer a single one. Shorter contacts are taken for noise. ms */
const SECOND_POINTER_MS = 150;

/**
 * Press and hold by one pointer or one key. A touch is an ordinary click; a longer hold needs the press to stay within
 * `HOLD_TRAVEL_PX` for its whole time.
 */
export function useHold(options: HoldOptions): Hold {
  const stage = useHoldStage();
  const latest = useRef(options);
  const [phase, setPhase] = useState<HoldView['phase']>('idle');
  const engine = useRef<HoldEngine | null>(null);
  const stopWatching = useRef<() => void>(() => undefined);

  useEffect(() => {
    latest.current = options;
  });

  useEffect(() => {
    const made = createHoldEngine((view) => {
      setPhase(view.phase);
      if (latest.current.kind !== 'touch' || view.phase === 'failed' || view.phase === 'idle') {
        stage?.publish(view);
      }
      latest.current.onView?.(view);
    });
    engine.current = made;
    return () => {
      stopWatching.current();
      made.dispose();
    };
  }, [stage]);

  const begin = (): void => {
    const { kind, label, onComplete, failedWords = 'Not done. Hold again.', disabled } = latest.current;
    if (disabled === true) return;
    engine.current?.begin({ kind, label, failedWords, onComplete: () => onComplete() });
  };
  const release = (): void => {
    stopWatching.current();
    engine.current?.release();
  };

  const held = options.kind !== 'touch';
  return {
    phase,
    holdProps: {
      onPointerDown: (event) => {
        if (!held || event.button !== 0 || engine.current?.busy() === true) return;
        stopWatching.current = watchPointer(event.nativeEvent, release);
        begin();
      },
      onKeyDown: (event) => {
        if (!held || !isPressKey(event.key)) return;
        event.preventDefault();
        if (!event.repeat) begin();
      },
      onKeyUp: (event) => {
        if (!held || !isPressKey(event.key)) return;
        event.preventDefault();
        release();
      },
      onBlur: release,
      onClick: () => {
        if (!held) begin();
      },
      // A long press asks for a menu on most tablets, in the middle of a hold.
      onContextMenu: (event) => event.preventDefault(),
    },
  };
}

function isPressKey(key: string): boolean {
  return key === 'Enter' || key === ' ';
}

/** Follows the pressing pointer wherever it goes; returns how to stop. */
function watchPointer(down: globalThis.PointerEvent, release: () => void): () => void {
  const others = new Map<number, ReturnType<typeof setTimeout>>();
  const controller = new AbortController();
  const on = (type: string, handle: (event: globalThis.PointerEvent) => void): void => {
    window.addEventListener(type, (event) => handle(event as globalThis.PointerEvent), {
      signal: controller.signal,
    });
  };
  const stop = (): void => {
    controller.abort();
    for (const timer of others.values()) clearTimeout(timer);
  };
  const end = (event: globalThis.PointerEvent): void => {
    if (event.pointerId === down.pointerId) release();
    else clearTimeout(others.get(event.pointerId));
  };
  on('pointermove', (event) => {
    if (event.pointerId !== down.pointerId) return;
    const travel_px = Math.hypot(event.clientX - down.clientX, event.clientY - down.clientY);
    if (travel_px > HOLD_TRAVEL_PX) release();
  });
  on('pointerup', end);
  on('pointercancel', end);
  on('pointerdown', (event) => {
    if (event.pointerId !== down.pointerId)
      others.set(event.pointerId, setTimeout(release, SECOND_POINTER_MS));
  });
  on('blur', release);
  return stop;
}
