/** The face tells the hold: unbroken is a touch, five pieces half a second, ten a second. */
export type HoldKind = 'touch' | 'half-second' | 'second';

export const HOLD_MS: Readonly<Record<HoldKind, number>> = { touch: 0, 'half-second': 500, second: 1000 };
export const HOLD_PIECES: Readonly<Record<HoldKind, 1 | 5 | 10>> = { touch: 1, 'half-second': 5, second: 10 };

/** A thumb in a glove rolls; further than this it slides, and a slide is no hold. CSS px. */
export const HOLD_TRAVEL_PX = 12;

/** What a completed hold came to. A failure is words for the person: what happened, what was kept, what to do. */
export type HoldOutcome = { readonly type: 'settled' } | { readonly type: 'failed'; readonly words: string };

/** What a completed hold does. Without an outcome of its own it is settled when it returns, or when its promise resolves. */
export type HoldWork = (() => void) | (() => Promise<void>) | (() => HoldOutcome | Promise<HoldOutcome>);

export interface HoldView {
  /** 'writing': the time is over and the faces stand a hair apart until the work behind it is done. */
  readonly phase: 'idle' | 'holding' | 'writing' | 'settled' | 'failed';
  /** Part of the hold that is over, 0 to 1. */
  readonly progress: number;
  readonly left_ms: number;
  readonly label: string;
  readonly words: string;
}

export const IDLE_HOLD: HoldView = { phase: 'idle', progress: 0, left_ms: 0, label: '', words: '' };

/** What is shown while a person asked for little motion: four steps instead of a sliding fill. */
export function steppedProgress(progress: number): number {
  return Math.floor(progress * 4) / 4;
}
