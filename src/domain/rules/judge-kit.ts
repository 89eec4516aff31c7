import { getDoc, type Effect } from '../book/documents/effect';
import type { KitDoc } from '../book/documents/kit';
import type { EntryOf } from '../book/read-body';
import { momentOf, type JudgeContext } from './judge-context';
import { objection, type Objection } from './objection';

type KitEntry = EntryOf<'kit.added' | 'kit.inspected' | 'kit.issued' | 'kit.returned'>;

export function* kitObjection(entry: KitEntry, context: JudgeContext): Effect<Objection | null> {
  if (entry.kind === 'kit.added') {
    return entry.meta.subject === entry.meta.id
      ? null
      : objection('subject', 'A new piece of kit is its own subject.');
  }
  const kit = yield* getDoc('kit', entry.meta.subject);
  if (kit === undefined) return objection('unknown-kit', 'This piece of kit is not in the Book.');
  if (kit.state === 'retired')
    return objection('kit-retired', 'This piece of kit was taken out of the register.');
  switch (entry.kind) {
    case 'kit.inspected':
      return inspectionObjection(entry, context);
    case 'kit.issued':
      return yield* issueObjection(entry);
    case 'kit.returned':
      return returnObjection(kit);
  }
}

function inspectionObjection(entry: EntryOf<'kit.inspected'>, context: JudgeContext): Objection | null {
  const { outcome, due_ms } = entry.body;
  const over = outcome === 'passed' && due_ms !== null && due_ms <= momentOf(entry.meta.stamp, context);
  return over ? objection('due-over', 'The next inspection would already be due.') : null;
}

function* issueObjection(entry: EntryOf<'kit.issued'>): Effect<Objection | null> {
  const { to } = entry.body;
  if (to.type === 'rig') {
    return (yield* getDoc('rig', to.id)) === undefined
      ? objection('unknown-rig', 'This rig is not in the Book.')
      : null;
  }
  const person = yield* getDoc('person', to.id);
  if (person === undefined) return objection('unknown-person', 'This person is not in the Book.');
  return person.role === null
    ? objection('not-a-member', 'This person was removed from the lab.', person.role_set.at)
    : null;
}

function returnObjection(kit: KitDoc): Objection | null {
  return kit.item.type === 'spare' || kit.holder !== null
    ? null
    : objection('not-issued', 'Nobody has this piece of kit.');
}
