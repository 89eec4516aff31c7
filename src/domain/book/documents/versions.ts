import { getDoc, putDoc, type Effect } from './effect';
import type { Trace } from './trace';

/** A correction: the whole new values, and the version that it replaces (protocol 1.7). */
export interface Correction<T> extends Trace {
  readonly replaces: string;
  readonly values: T;
  readonly why: string;
}

export interface Corrected<T> {
  readonly id: string;
  readonly original: T;
  readonly corrections: readonly Correction<T>[];
  readonly struck: (Trace & { readonly why: string }) | null;
}

export type StandingValues<T> =
  | { readonly type: 'stands'; readonly values: T; readonly version: string; readonly corrected: boolean }
  | { readonly type: 'struck' }
  /** Two corrections replace the same: both shown, plots leave it out until settled. */
  | { readonly type: 'parted'; readonly versions: readonly Correction<T>[] };

/** What a corrected document says now: the end of its chain of corrections. */
export function standingValues<T>(doc: Corrected<T>): StandingValues<T> {
  if (doc.struck !== null) return { type: 'struck' };
  let version = doc.id;
  let values = doc.original;
  for (;;) {
    const at = version;
    const next = doc.corrections.filter((one) => one.replaces === at);
    const [only] = next;
    if (only === undefined) return { type: 'stands', values, version, corrected: version !== doc.id };
    if (next.length > 1) return { type: 'parted', versions: next };
    version = only.entry;
    values = only.values;
  }
}

/** From a correction's entry id to the document that it changed, so that a later correction can name it. */
export interface CorrectionDoc {
  readonly kind: 'correction';
  readonly id: string;
  readonly parent: string;
  /** The document corrected: a reading, alignment, photo or trace, which has this id. */
  readonly corrected: string;
}

/** Id of the document that `id` names, whether by its own id or by that of one of its corrections. */
export function* correctedId(id: string): Effect<string> {
  const pointer = yield* getDoc('correction', id);
  return pointer?.corrected ?? id;
}

export function* pointBack(correction: string, parent: string, corrected: string): Effect {
  yield* putDoc({ kind: 'correction', id: correction, parent, corrected });
}
