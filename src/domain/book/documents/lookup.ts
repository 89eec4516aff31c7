import type { BodyOf } from '../kinds';
import type { EntryOf } from '../read-body';
import { putDoc, type Effect } from './effect';
import { traceOf, type Standing, type Trace } from './trace';

export interface LookupDoc {
  readonly kind: 'lookup';
  readonly id: string;
  readonly parent: string;
  readonly kept: BodyOf<'lookup.kept'>;
  readonly trace: Trace;
}

export function* foldLookup(entry: EntryOf<'lookup.kept'>, standing: Standing): Effect {
  yield* putDoc({
    kind: 'lookup',
    id: entry.meta.id,
    parent: entry.meta.subject,
    kept: entry.body,
    trace: traceOf(entry.meta, standing),
  });
}
