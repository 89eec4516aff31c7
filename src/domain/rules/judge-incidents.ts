import { getDoc, type Effect } from '../book/documents/effect';
import type { EntryOf } from '../book/read-body';
import { objection, type Objection } from './objection';

export function* incidentObjection(
  entry: EntryOf<'incident.reported' | 'incident.answered' | 'incident.closed'>,
): Effect<Objection | null> {
  if (entry.kind === 'incident.reported') {
    const rig = yield* getDoc('rig', entry.meta.subject);
    return rig === undefined ? objection('unknown-rig', 'This rig is not in the Book.') : null;
  }
  const incident = yield* getDoc('incident', entry.meta.subject);
  if (incident === undefined) return objection('unknown-incident', 'This incident is not in the Book.');
  return incident.closed === null
    ? null
    : objection('incident-closed', 'The incident was closed before.', incident.closed.at);
}
