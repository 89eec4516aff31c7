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
  /** Counts along the sheets that replaced each other: 1 for the first. */
  readonly version: number;
  /** The sheet that it replaced. */
  readonly replaces: string | null;
  /** A retired or replaced sheet opens no new check; checks opened on it go on. */
  readonly retired: Trace | null;
}

export function* foldSheet(entry: EntryOf<'sheet.published' | 'sheet.retired'>, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  if (entry.kind === 'sheet.published') {
    const { spec, replaces } = entry.body;
    const before = replaces === null ? undefined : yield* getDoc('sheet', replaces);
    yield* putDoc({
      kind: 'sheet',
      id: entry.meta.subject,
      parent: null,
      spec,
      published: trace,
      version: (before?.version ?? 0) + 1,
      replaces,
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
