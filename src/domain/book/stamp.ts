import * as z from 'zod/mini';
import { uuid } from './ids';

/** When an entry was written, as its tablet knew it (protocol 1.8). Clocks decide nothing; they only inform. */
export const stampSchema = z.object({
  /** Unix time of the tablet's wall clock, ms. */
  wall_ms: z.int(),
  /** Minutes east of UTC. */
  offset_min: z.int().check(z.gte(-900), z.lte(900)),
  /** IANA zone name. */
  zone: z.string().check(z.minLength(1), z.maxLength(64)),
  /** Random id of the running page; monotonic times compare only within one. */
  page_life: uuid,
  /** Milliseconds since the page life began, never set back. */
  monotonic_ms: z.number().check(z.gte(0)),
  /** The wall clock was implausible (before the build, or before the highest time seen). */
  time_uncertain: z.boolean(),
});
export type Stamp = z.infer<typeof stampSchema>;

export type StampPoint = Pick<Stamp, 'wall_ms' | 'page_life' | 'monotonic_ms' | 'time_uncertain'>;

/**
 * Time from `from` to `to` on one tablet, ms: the larger of wall and monotonic time, so that a clock set back never
 * makes something younger. Null when nothing can be said: another page life with an uncertain or backward wall clock.
 */
export function elapsedMs(from: StampPoint, to: StampPoint): number | null {
  const wall = to.wall_ms - from.wall_ms;
  if (from.page_life === to.page_life) return Math.max(wall, to.monotonic_ms - from.monotonic_ms, 0);
  if (from.time_uncertain || to.time_uncertain || wall < 0) return null;
  return wall;
}
