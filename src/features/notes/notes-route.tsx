import { Link } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { paths } from '../../config/paths';
import { useFirings, useLab, useNotes, useRigs } from '../../data/use-book';
import type { RigDoc } from '../../domain/book/documents/rig';
import { NoteItem } from './note-item';
import './notes.css';

const NEWEST = 3;
const NEWEST_FIRINGS = 5;

/** Where notes are kept: by rig, the newest few, and a way to those of its firings. */
export function NotesRoute() {
  const rigs = useRigs();
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  return (
    <Screen>
      <div className="notes">
        <h1>Notes</h1>
        {rigs.length === 0 ? <SaysBlock muted>No rig is in this tablet’s Book yet.</SaysBlock> : null}
        {rigs.map((rig) => (
          <RigNotes key={rig.id} rig={rig} zone={zone} />
        ))}
      </div>
    </Screen>
  );
}

function RigNotes({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  const { notes, photos, state } = useNotes(rig.id);
  const firings = useFirings(rig.id).slice(0, NEWEST_FIRINGS);
  const standing = notes.filter((note) => note.struck === null);
  return (
    <section aria-label={rig.name}>
      <h2>
        <Link className="note-link" to={paths.notesOf('rig', rig.id)}>
          {rig.name}: {countWords(standing.length, photos.length, state)}
        </Link>
      </h2>
      <ul className="note-list">
        {standing.slice(0, NEWEST).map((note) => (
          <NoteItem key={note.id} note={note} zone={zone} screen={null} />
        ))}
      </ul>
      {firings.length === 0 ? null : (
        <p className="note-firings">
          {firings.map((firing) => (
            <Link key={firing.id} className="note-link" to={paths.notesOf('firing', firing.id)}>
              Firing {firing.number}
            </Link>
          ))}
        </p>
      )}
    </section>
  );
}

function countWords(notes: number, photos: number, state: 'loading' | 'ready'): string {
  if (state === 'loading') return 'notes';
  const some = notes === 1 ? 'one note' : notes === 0 ? 'no notes' : `${String(notes)} notes`;
  return photos === 0 ? some : `${some}, ${photos === 1 ? 'one photo' : `${String(photos)} photos`}`;
}
