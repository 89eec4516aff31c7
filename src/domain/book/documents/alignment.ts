import type { BodyOf } from '../kinds';
import type { EntryOf } from '../read-body';
import { putDoc, type Effect } from './effect';
import { updateRig, voidCheck } from './rig';
import { traceOf, type Standing, type Trace } from './trace';
import type { Corrected } from './versions';

export type AlignmentKind = 'alignment.measured' | 'alignment.adjusted' | 'alignment.arc-seen';

export type AlignmentValues = {
  readonly [K in AlignmentKind]: { readonly kind: K; readonly body: BodyOf<K> };
}[AlignmentKind];

/** One line of a rig's alignment: what was measured, turned or seen. The id is that of its entry. */
export interface AlignmentDoc extends Corrected<AlignmentValues> {
  readonly kind: 'alignment';
  /** The rig. */
  readonly parent: string;
  readonly logged: Trace;
  readonly irregular: string | null;
}

export function* foldAlignment(entry: EntryOf<AlignmentKind>, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  const { id, subject } = entry.meta;
  yield* putDoc({
    kind: 'alignment',
    id,
    parent: subject,
    original: { kind: entry.kind, body: entry.body } as AlignmentValues,
    logged: trace,
    irregular: standing.irregular,
    corrections: [],
    struck: null,
  });
  // Arcs are seen from outside; a feeler and a screwdriver are hands on the channel.
  if (entry.kind === 'alignment.arc-seen') return;
  yield* updateRig(subject, (rig) =>
    voidCheck(rig, trace, { code: 'aligned', words: 'The channel was worked on after the check.' }),
  );
}
