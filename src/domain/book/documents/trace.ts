import type { EntryMeta } from '../read-body';
import type { Stamp } from '../stamp';

/** Who wrote an entry, where and when: kept in documents beside what it changed. */
export interface Trace {
  readonly entry: string;
  readonly by: string | null;
  readonly device: string;
  readonly stamp: Stamp;
  /** Revision of the Book; null while only this tablet has it. */
  readonly at: number | null;
}

/** How the entry was judged, for folds: they read stored verdicts and ask no rules (protocol 1.9). */
export interface Standing {
  readonly at: number | null;
  readonly irregular: string | null;
}

export function traceOf(meta: EntryMeta, standing: Standing): Trace {
  return { entry: meta.id, by: meta.author, device: meta.device, stamp: meta.stamp, at: standing.at };
}

/** Whether one entry came before another: by revision; what has none yet is newer, and by its tablet's clock. */
export function precedes(one: Trace, other: Trace): boolean {
  if (one.at !== null && other.at !== null) return one.at < other.at;
  if (one.at === null && other.at === null) return one.stamp.wall_ms < other.stamp.wall_ms;
  return one.at !== null;
}
