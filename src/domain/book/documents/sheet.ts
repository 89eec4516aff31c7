import type { EntryOf } from '../read-body';
import type { SheetSpec } from '../sheet-spec';
import { getDoc, putDoc, type Effect } from './effect';
import { traceOf, type Standing, type Trace } from './trace';

export interface SheetDoc {
  readonly kind: 'sheet';
  readonly id: string;
  readonly parent: null;
  readonly spec: SheetSpec;
  readonly published: Trace;
  /** A retired or replaced sheet opens no new check; checks opened on it go on. */
  readonly retired: Trace | null;
}

export function* foldSheet(entry: EntryOf<'sheet.published' | 'sheet.retired'>, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  if (entry.kind === 'sheet.published') {
    const { spec, replaces } = entry.body;
    yield* putDoc({
      kind: 'sheet',
      id: entry.meta.subject,
      parent: null,
      spec,
      published: trace,
      retired: null,
    });
    if (replaces !== null) yield* retire(replaces, trace);
    return;
  }
  yield* retire(entry.meta.subject, trace);
}

function* retire(id: string, trace: Trace): Effect {
  const sheet = yield* getDoc('sheet', id);
  if (sheet !== undefined) yield* putDoc({ ...sheet, retired: trace });
}
