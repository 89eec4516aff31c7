import type { Document } from '../../domain/book/documents/document';
import { runEffectAsync, type AsyncDocSource, type Effect } from '../../domain/book/documents/effect';
import { foldEntry, foldReadable } from '../../domain/book/fold';
import { readEntry } from '../../domain/book/read-body';
import { entryClass, judgeReadable } from '../../domain/rules/judge';
import type { Judged } from '../../domain/rules/judge-context';
import type { EntryRow } from '../store/book-database';

export interface OverlayContext {
  readonly source: AsyncDocSource;
  readonly hasGrant: (person: string) => boolean;
}

/**
 * Folds one own entry over `changed`. A verdict of the server is folded as it stands. What still waits is judged here: a
 * pending act has no effect until it is applied, a pending observation counts at once, tightenings with it (protocol 1.4).
 * Answers what the judge said here; null for what waits for the server's word.
 */
export async function foldOwn(
  row: EntryRow,
  changed: Map<string, Document>,
  { source, hasGrant }: OverlayContext,
): Promise<Judged | null> {
  const run = <T>(effect: Effect<T>) => runEffectAsync(effect, source, changed);
  const { entry, state, reason, revision } = row;
  if (state !== 'waiting') {
    await run(foldEntry(entry, { verdict: state, reason, revision }));
    return { verdict: state, reason };
  }
  const outcome = readEntry(entry);
  if (outcome.type !== 'readable') {
    await run(foldEntry(entry, { verdict: 'applied', reason: null, revision: null }));
    return null;
  }
  if ((await run(entryClass(outcome.entry))) === 'act') return null;
  // Judged as of when it was written: a permit that lapsed since then had not lapsed.
  const judged = await run(
    judgeReadable(outcome.entry, { session: entry.author, hasGrant, now_ms: entry.stamp.wall_ms }),
  );
  if (judged.verdict === 'held-back') return judged;
  const irregular = judged.verdict === 'irregular' ? (judged.reason?.code ?? 'irregular') : null;
  await run(foldReadable(outcome.entry, { at: null, irregular }));
  return judged;
}
