import type { Stamp } from '../../domain/book/stamp';

/** A burst that is being counted by rate times time. Its times are those of the page life that started it. */
export interface Burst {
  readonly page_life: string;
  readonly started_ms: number;
  /** The last moment at which it was known to be running. */
  readonly seen_ms: number;
  readonly rate_Hz: number;
}

export type BurstView =
  | { readonly type: 'none' }
  | { readonly type: 'running' | 'interrupted'; readonly shots: number; readonly rate_Hz: number };

type Clock = Pick<Stamp, 'page_life' | 'monotonic_ms'>;

export function startBurst(rate_Hz: number, now: Clock): Burst {
  return { page_life: now.page_life, started_ms: now.monotonic_ms, seen_ms: now.monotonic_ms, rate_Hz };
}

/** Written down now and then, so that a kill loses no more than the time since. */
export function stillRunning(burst: Burst, now: Clock): Burst {
  return burst.page_life === now.page_life && now.monotonic_ms > burst.seen_ms
    ? { ...burst, seen_ms: now.monotonic_ms }
    : burst;
}

/**
 * Shots so far. Wear leans to the larger count, so a shot that was begun counts. After a kill nobody knows when the rig
 * stopped: what was seen is counted, and the screen says that it was interrupted.
 */
export function burstView(burst: Burst | null, now: Clock): BurstView {
  if (burst === null) return { type: 'none' };
  const running = burst.page_life === now.page_life;
  const until_ms = running ? Math.max(now.monotonic_ms, burst.seen_ms) : burst.seen_ms;
  const shots = Math.min(10_000_000, Math.ceil((burst.rate_Hz * (until_ms - burst.started_ms)) / 1000));
  return { type: running ? 'running' : 'interrupted', shots, rate_Hz: burst.rate_Hz };
}

/** In the place of the burst's own line while one is counted; null otherwise. */
export function burstLine(view: BurstView): string | null {
  if (view.type === 'none') return null;
  const at = `${view.shots} ${view.shots === 1 ? 'shot' : 'shots'} at ${view.rate_Hz}\u2009Hz`;
  return view.type === 'running'
    ? `burst runs: ${at}`
    : `burst was running when the app went away: ${at} up to then. Count it, and add what came after by hand.`;
}
