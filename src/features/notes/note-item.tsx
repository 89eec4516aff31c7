import { useState } from 'react';
import { useEntryState } from '../../data/use-book';
import { useNames } from '../../data/use-names';
import type { NoteDoc, NoteVersion } from '../../domain/book/documents/note';
import { momentWords } from '../../domain/report/time-words';
import { noteView } from './note-view';
import { StrikeDialog } from './strike-dialog';
import type { NotesScreen } from './use-notes-screen';

interface Props {
  readonly note: NoteDoc;
  readonly zone: string;
  /** Null where it is only read. */
  readonly screen: NotesScreen | null;
}

/** A note with all its versions: what was said before stays readable, and so does what was struck. */
export function NoteItem({ note, zone, screen }: Props) {
  const { standing, earlier, parted } = noteView(note);
  const [all, setAll] = useState(false);
  const [striking, setStriking] = useState(false);
  const { struck } = note;
  const may = screen !== null && screen.mayAmend && struck === null;
  return (
    <li className={`note${struck === null ? '' : ' struck'}`}>
      {parted ? (
        <p>
          <b>Amended apart.</b> Both versions stand until a reviewer settles them.
        </p>
      ) : null}
      {standing.map((version) => (
        <div key={version.entry} className="note-version">
          <Version version={version} zone={zone} amended={version.based_on !== null} />
          {may ? (
            <button type="button" className="note-button" onClick={() => screen.amend(note.id, version)}>
              Amend
            </button>
          ) : null}
        </div>
      ))}
      {struck === null ? null : <Struck note={note} zone={zone} />}
      <div className="note-acts">
        {earlier.length === 0 ? null : (
          <button type="button" className="note-button" aria-expanded={all} onClick={() => setAll(!all)}>
            {earlier.length === 1 ? 'The version before' : `The ${earlier.length} versions before`}
          </button>
        )}
        {may ? (
          <button type="button" className="note-button" onClick={() => setStriking(true)}>
            Strike
          </button>
        ) : null}
      </div>
      {all ? (
        <div className="note-earlier">
          {earlier.map((version) => (
            <Version key={version.entry} version={version} zone={zone} amended={version.based_on !== null} />
          ))}
        </div>
      ) : null}
      {striking && screen !== null ? (
        <StrikeDialog
          title="Strike this note"
          onStrike={(why) => screen.strike(note.id, why)}
          onClose={() => setStriking(false)}
        />
      ) : null}
    </li>
  );
}

interface VersionProps {
  readonly version: NoteVersion;
  readonly zone: string;
  readonly amended: boolean;
}

function Version({ version, zone, amended }: VersionProps) {
  const nameOf = useNames();
  const state = useEntryState(version.entry);
  return (
    <div>
      <p className="note-words">{version.words}</p>
      <p className="muted">
        {amended ? 'amended by ' : ''}
        {nameOf(version.by)}, {momentWords(version.stamp.wall_ms, zone)}
        {state === undefined ? '' : `; ${state.place}`}
      </p>
    </div>
  );
}

function Struck({ note, zone }: Pick<Props, 'note' | 'zone'>) {
  const nameOf = useNames();
  const { struck } = note;
  return struck === null ? null : (
    <p>
      <b>Struck</b> by {nameOf(struck.by)}, {momentWords(struck.stamp.wall_ms, zone)}: {struck.why}
    </p>
  );
}
