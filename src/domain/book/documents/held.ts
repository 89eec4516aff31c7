import type { Reason, SealedEntry } from '../entry';
import { getDoc, putDoc, type Effect } from './effect';
import type { Trace } from './trace';

/** An entry that the server did not apply, kept with its text and the reason. */
export interface HeldDoc {
  readonly kind: 'held';
  readonly id: string;
  /** Subject of the held entry. */
  readonly parent: string;
  readonly entry: SealedEntry;
  readonly reason: Reason;
  readonly at: number | null;
  readonly adopted: Trace | null;
  readonly dismissed: Trace | null;
}

export function* holdBack(entry: SealedEntry, reason: Reason, at: number | null): Effect {
  yield* putDoc({
    kind: 'held',
    id: entry.id,
    parent: entry.subject,
    entry,
    reason,
    at,
    adopted: null,
    dismissed: null,
  });
}

export function* markHeld(
  id: string,
  mark: { readonly adopted?: Trace; readonly dismissed?: Trace },
): Effect {
  const held = yield* getDoc('held', id);
  if (held !== undefined) yield* putDoc({ ...held, ...mark });
}
