import { HOLD_MS, IDLE_HOLD, type HoldKind, type HoldOutcome, type HoldView, type HoldWork } from './hold';

export interface HoldRequest {
  readonly kind: HoldKind;
  readonly label: string;
  readonly onComplete: HoldWork;
  /** Words for a rejection that brings none of its own. */
  readonly failedWords: string;
}

export interface HoldEngine {
  readonly begin: (request: HoldRequest) => void;
  /** Let go before the time is over: the faces part at once. */
  readonly release: () => void;
  readonly busy: () => boolean;
  readonly dispose: () => void;
}

/** How long touching faces, and parted faces with their words, stay over the strip. ms */
const SETTLED_MS = 350;
const FAILED_MS = 6000;
const HAPTIC_MS = 20;

/** One hold from press to durable. Timers and frames live here; pointers and keys belong to `use-hold.ts`. */
export function createHoldEngine(publish: (view: HoldView) => void): HoldEngine {
  let phase: HoldView['phase'] = 'idle';
  let timer: ReturnType<typeof setTimeout> | undefined;
  let frame = 0;
  let disposed = false;

  const show = (view: HoldView): void => {
    phase = view.phase;
    publish(view);
  };
  const stopClock = (): void => {
    clearTimeout(timer);
    cancelAnimationFrame(frame);
  };
  const clearAfter = (ms: number): void => {
    timer = setTimeout(() => show(IDLE_HOLD), ms);
  };

  const complete = async (request: HoldRequest): Promise<void> => {
    stopClock();
    // Not every browser has the motor.
    if ('vibrate' in navigator) navigator.vibrate(HAPTIC_MS);
    const { label } = request;
    show({ phase: 'writing', progress: 1, left_ms: 0, label, words: '' });
    const words = await outcomeWords(request);
    if (words === null) {
      show({ phase: 'settled', progress: 1, left_ms: 0, label, words: '' });
      if (disposed) publish(IDLE_HOLD);
      else clearAfter(SETTLED_MS);
      return;
    }
    show({ phase: 'failed', progress: 0.7, left_ms: 0, label, words });
    clearAfter(FAILED_MS);
  };

  return {
    begin: (request) => {
      if (phase === 'holding' || phase === 'writing') return;
      stopClock();
      const total_ms = HOLD_MS[request.kind];
      if (total_ms === 0) {
        void complete(request);
        return;
      }
      const start_ms = performance.now();
      const draw = (): void => {
        const past_ms = Math.min(total_ms, performance.now() - start_ms);
        const progress = past_ms / total_ms;
        show({ phase: 'holding', progress, left_ms: total_ms - past_ms, label: request.label, words: '' });
        frame = requestAnimationFrame(draw);
      };
      draw();
      timer = setTimeout(() => void complete(request), total_ms);
    },
    release: () => {
      if (phase !== 'holding') return;
      stopClock();
      show(IDLE_HOLD);
    },
    busy: () => phase === 'holding' || phase === 'writing',
    dispose: () => {
      disposed = true;
      if (phase === 'holding') {
        stopClock();
        show(IDLE_HOLD);
      }
    },
  };
}

/** Null when all is well. A rejection is shown like a failure: the person must not read it as done. */
async function outcomeWords(request: HoldRequest): Promise<string | null> {
  try {
    const outcome: unknown = await request.onComplete();
    return isFailure(outcome) ? outcome.words : null;
  } catch (error) {
    reportError(error);
    return request.failedWords;
  }
}

function isFailure(outcome: unknown): outcome is Extract<HoldOutcome, { type: 'failed' }> {
  return typeof outcome === 'object' && outcome !== null && 'type' in outcome && outcome.type === 'failed';
}
