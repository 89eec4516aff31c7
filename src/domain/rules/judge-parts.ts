import { getDoc, type Effect } from '../book/documents/effect';
import { revisionById } from '../book/documents/rig';
import type { EntryOf } from '../book/read-body';
import { objection, type Objection } from './objection';

type WorkEntry = EntryOf<
  'part.fitted' | 'part.retired' | 'alignment.measured' | 'alignment.adjusted' | 'alignment.arc-seen'
>;

/** Parts and alignment: work on a rig that its Book knows. */
export function* partObjection(entry: WorkEntry): Effect<Objection | null> {
  const rig = yield* getDoc('rig', entry.meta.subject);
  if (rig === undefined) return objection('unknown-rig', 'This rig is not in the Book.');
  switch (entry.kind) {
    case 'part.fitted':
      return entry.body.replaces === null ? null : yield* fittedObjection(entry.body.replaces, rig.id);
    case 'part.retired':
      return yield* fittedObjection(entry.body.part, rig.id);
    case 'alignment.measured':
    case 'alignment.adjusted':
    case 'alignment.arc-seen':
      if (revisionById(rig, entry.body.rig_revision) === undefined)
        return objection('unknown-revision', 'This revision is not in the Book.');
      return entry.kind === 'alignment.adjusted'
        ? yield* measurementObjection(entry.body.based_on, rig.id)
        : null;
  }
}

function* fittedObjection(id: string, rig: string): Effect<Objection | null> {
  const part = yield* getDoc('part', id);
  if (part?.parent !== rig) return objection('unknown-part', 'This part is not on the rig.');
  return part.retired === null
    ? null
    : objection('part-retired', 'This part was retired before.', part.retired.at);
}

function* measurementObjection(id: string | null, rig: string): Effect<Objection | null> {
  if (id === null) return null;
  const measured = yield* getDoc('alignment', id);
  return measured?.parent === rig && measured.original.kind === 'alignment.measured'
    ? null
    : objection('unknown-measurement', 'The measurement that it is based on is not in the Book.');
}
