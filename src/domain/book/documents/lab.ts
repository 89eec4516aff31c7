import type { EntryOf } from '../read-body';
import type { LabSettings } from '../rig-spec';
import { putDoc, type Effect } from './effect';
import { traceOf, type Standing, type Trace } from './trace';

export interface LabDoc {
  readonly kind: 'lab';
  readonly id: string;
  readonly parent: null;
  readonly settings: LabSettings;
  readonly set: Trace;
}

export function* foldLab(entry: EntryOf<'lab.set'>, standing: Standing): Effect {
  yield* putDoc({
    kind: 'lab',
    id: entry.meta.lab,
    parent: null,
    settings: entry.body,
    set: traceOf(entry.meta, standing),
  });
}
