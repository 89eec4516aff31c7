import { useState } from 'react';
import { Dialog } from '../../components/dialog';
import { useBookState } from '../../data/use-book';
import { useNames } from '../../data/use-names';
import type { PhotoDoc } from '../../domain/book/documents/note';
import { standingValues } from '../../domain/book/documents/versions';
import { momentWords } from '../../domain/report/time-words';
import { StrikeDialog } from './strike-dialog';
import type { NotesScreen } from './use-notes-screen';
import { usePhotoUrl } from './use-photo-url';

interface Props {
  readonly photo: PhotoDoc;
  readonly zone: string;
  readonly screen: NotesScreen;
}

/** A photo from this tablet's own bytes: small in the list, whole at a touch. */
export function PhotoItem({ photo, zone, screen }: Props) {
  const shown = usePhotoUrl(photo.original.sha256);
  const { device } = useBookState();
  const nameOf = useNames();
  const [open, setOpen] = useState<'whole' | 'striking' | null>(null);
  const now = standingValues(photo);
  const caption = (now.type === 'stands' ? now.values : photo.original).caption;
  const words = caption === '' ? 'Photo without words' : caption;
  const close = (): void => setOpen(null);
  if (photo.struck !== null) {
    return (
      <li className="note struck">
        <p>
          <b>Photo struck</b> by {nameOf(photo.struck.by)}: {photo.struck.why} ({words})
        </p>
      </li>
    );
  }
  return (
    <li className="photo">
      {shown.state === 'here' ? (
        <button
          type="button"
          className="photo-small"
          aria-label={`Whole photo: ${words}`}
          onClick={() => setOpen('whole')}
        >
          <img src={shown.url} alt={words} />
        </button>
      ) : (
        <p className="muted">
          {shown.state === 'loading'
            ? ''
            : photo.attached.device === device
              ? 'No longer on this tablet.'
              : 'Not here yet: on the tablet that took it.'}
        </p>
      )}
      <p className="note-words">{words}</p>
      <p className="muted">
        {nameOf(photo.attached.by)}, {momentWords(photo.attached.stamp.wall_ms, zone)}
      </p>
      {screen.mayAmend ? (
        <button type="button" className="note-button" onClick={() => setOpen('striking')}>
          Strike photo
        </button>
      ) : null}
      {open === 'whole' && shown.state === 'here' ? (
        <Dialog title={words} onClose={close} closeLabel="Close">
          <img className="photo-whole" src={shown.url} alt={words} />
        </Dialog>
      ) : null}
      {open === 'striking' ? (
        <StrikeDialog
          title="Strike this photo"
          onStrike={(why) => screen.strike(photo.id, why)}
          onClose={close}
        />
      ) : null}
    </li>
  );
}
