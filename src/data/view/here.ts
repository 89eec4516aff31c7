import type { Stamp } from '../../domain/book/stamp';
import type { Clock } from '../ports/ports';

/** A wall clock may drift and be mended by this much before it counts as set back. */
const BACKWARD_TOLERANCE_MS = 60_000;
/** Farther from the server's time than this is no drift. */
const IMPLAUSIBLE_MS = 24 * 60 * 60_000;

export interface HereInput {
  readonly clock: Clock;
  readonly page_life: string;
  readonly build_ms: number;
  readonly highest_wall_ms: number;
}

export interface Here {
  readonly page_life: string;
  readonly stamp: () => Stamp;
  /** Best knowledge of the true time: server time plus monotonic time since, else the wall clock (protocol 1.8). */
  readonly bestMs: () => number;
  readonly learnServerTime: (server_ms: number) => void;
  /** What is wrong with the wall clock, in words; null when nothing is known to be. */
  readonly clockTrouble: () => string | null;
}

export function createHere({ clock, page_life, build_ms, highest_wall_ms }: HereInput): Here {
  let highest = highest_wall_ms;
  let server: { readonly at_ms: number; readonly monotonic_ms: number } | null = null;
  const serverNow = () => (server === null ? null : server.at_ms + clock.monotonicMs() - server.monotonic_ms);
  const trouble = (wall_ms: number): string | null => {
    if (wall_ms < build_ms)
      return 'The clock of this tablet reads earlier than this app was made. Set the date: no server can be reached like this.';
    if (wall_ms < highest - BACKWARD_TOLERANCE_MS) return 'The clock of this tablet was set back.';
    const true_ms = serverNow();
    if (true_ms !== null && Math.abs(wall_ms - true_ms) > IMPLAUSIBLE_MS)
      return 'The clock of this tablet is more than a day away from the server’s.';
    return null;
  };
  return {
    page_life,
    stamp: () => {
      const wall_ms = Math.round(clock.wallMs());
      const time_uncertain = trouble(wall_ms) !== null;
      if (!time_uncertain) highest = Math.max(highest, wall_ms);
      return {
        wall_ms,
        offset_min: clock.offsetMin(wall_ms),
        zone: clock.zone(),
        page_life,
        monotonic_ms: clock.monotonicMs(),
        time_uncertain,
      };
    },
    bestMs: () => serverNow() ?? Math.max(clock.wallMs(), highest),
    learnServerTime: (server_ms) => {
      server = { at_ms: server_ms, monotonic_ms: clock.monotonicMs() };
      // A clock that once jumped ahead would make every right time look set back; the server knows better.
      if (highest > server_ms + IMPLAUSIBLE_MS) highest = server_ms;
    },
    clockTrouble: () => trouble(clock.wallMs()),
  };
}
