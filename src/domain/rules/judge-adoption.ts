import { getDoc, type Effect } from '../book/documents/effect';
import { readEntry, type EntryOf, type ReadableEntry } from '../book/read-body';
import type { Judged, JudgeContext } from './judge-context';
import { objection, type Objection } from './objection';
import { isRole } from './roles';

type Judge = (entry: ReadableEntry, context: JudgeContext) => Effect<Judged>;

/**
 * An author adopts their own entry that only waited for their sign-in; anything else needs a lead. Either way the
 * adopted entry must pass the rules as they stand now (protocol 3.4, 3.5).
 */
export function* adoptionObjection(
  entry: EntryOf<'entry.adopted'>,
  context: JudgeContext,
  judge: Judge,
): Effect<Objection | null> {
  const adopter = entry.meta.author === null ? undefined : yield* getDoc('person', entry.meta.author);
  for (const id of entry.body.adopts) {
    const held = yield* getDoc('held', id);
    if (held === undefined) return objection('unknown-held', 'There is no such held-back entry.');
    if (held.adopted !== null || held.dismissed !== null)
      return objection('already-decided', 'This entry was adopted or dismissed before.');
    const ownConfirm = held.reason.cause === 'confirm' && held.entry.author === entry.meta.author;
    if (!ownConfirm && !isRole(adopter?.role ?? null, 'lead')) {
      return objection('may-not-adopt', 'Only a lead may adopt this entry.');
    }
    const outcome = readEntry(held.entry);
    if (outcome.type !== 'readable') return objection('unreadable', outcome.words);
    const judged = yield* judge(outcome.entry, { ...context, session: held.entry.author });
    if (judged.verdict === 'held-back')
      return objection(
        judged.reason?.code ?? 'held-back',
        judged.reason?.words ?? 'It would be held back again.',
      );
  }
  return null;
}
