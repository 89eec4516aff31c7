import type { KitType } from '../book/bodies/kit-bodies';
import type { KitNote } from '../book/documents/kit';

/** Kit that somebody's protection or a proof rests on. A key, a cylinder or a spare past its date stops no firing. */
const PROTECTS: ReadonlySet<KitType> = new Set<KitType>([
  'eyewear',
  'shorting-stick',
  'meter',
  'relief-valve',
  'regulator',
]);

export type KitFault = 'failed' | 'expired';

/** Why a piece of kit must not be relied on at `now_ms`; null while it may be. */
export function kitFault(note: KitNote, now_ms: number): KitFault | null {
  if (!PROTECTS.has(note.type)) return null;
  if (note.failed) return 'failed';
  return note.due_ms !== null && note.due_ms < now_ms ? 'expired' : null;
}
