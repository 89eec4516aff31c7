import type { EntryOf } from '../read-body';
import { putDoc, type Effect } from './effect';
import { traceOf, type Standing, type Trace } from './trace';

/** Who said afterwards that an entry with an open author was theirs (protocol 4.2). The id is that of the claimed entry. */
export interface ClaimDoc {
  readonly kind: 'claim';
  readonly id: string;
  readonly parent: string;
  readonly claimed: Trace;
}

export function* foldClaim(entry: EntryOf<'entry.claimed'>, standing: Standing): Effect {
  yield* putDoc({
    kind: 'claim',
    id: entry.body.claims,
    parent: entry.meta.subject,
    claimed: traceOf(entry.meta, standing),
  });
}
