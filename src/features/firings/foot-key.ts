/**
 * A wired foot key, told by how long it was down. Shorter contacts are electrical noise or a bounce; a long one is a
 * person who wants the rig stood down, and it counts while it is still down: who stands on it shall not have to let go.
 */
export const FOOT_LOG_FROM_MS = 300;
export const FOOT_STAND_DOWN_MS = 1000;

/** What the key sends: F13 where the wiring can, Page Down as the cheap presenters and pedals do. */
export const FOOT_KEYS: readonly string[] = ['F13', 'PageDown'];

/** The keys to listen for, by the tablet's setting. */
export function footKeysOf(setting: string): readonly string[] {
  return setting === 'either' ? FOOT_KEYS : [setting];
}

export type FootKeyState =
  | { readonly phase: 'up' }
  | { readonly phase: 'down'; readonly since_ms: number }
  /** It has done what it does; until it is let go nothing more. */
  | { readonly phase: 'spent' };

export type FootKeyEvent =
  | { readonly type: 'down' | 'up' | 'tick'; readonly at_ms: number }
  /** The window lost the keyboard: nobody knows when the key came up. */
  | { readonly type: 'lost' };

export interface FootKeyStep {
  readonly state: FootKeyState;
  readonly act: 'log' | 'stand-down' | null;
}

export const FOOT_KEY_UP: FootKeyState = { phase: 'up' };

export function stepFootKey(state: FootKeyState, event: FootKeyEvent): FootKeyStep {
  if (event.type === 'lost') return { state: FOOT_KEY_UP, act: null };
  if (event.type === 'down') {
    // A held key repeats itself: only the first press counts.
    const next: FootKeyState = state.phase === 'up' ? { phase: 'down', since_ms: event.at_ms } : state;
    return { state: next, act: null };
  }
  if (state.phase !== 'down') return { state: event.type === 'up' ? FOOT_KEY_UP : state, act: null };
  const held_ms = event.at_ms - state.since_ms;
  if (held_ms >= FOOT_STAND_DOWN_MS)
    return { state: event.type === 'up' ? FOOT_KEY_UP : { phase: 'spent' }, act: 'stand-down' };
  if (event.type === 'tick') return { state, act: null };
  return { state: FOOT_KEY_UP, act: held_ms >= FOOT_LOG_FROM_MS ? 'log' : null };
}
