import { useEffect, useRef } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { WordsField } from '../../components/words-field';
import { paths } from '../../config/paths';
import { bytesWords } from '../../data/photos/photo-size';
import { useAbout, useLab } from '../../data/use-book';
import type { About } from '../../domain/book/bodies/note-bodies';
import { aboutPath, aboutWords, isAboutType } from './about-words';
import { NoteItem } from './note-item';
import { PhotoItem } from './photo-item';
import { useNotesScreen, type NotesScreen } from './use-notes-screen';
import './notes.css';

/** Notes and photos about one thing. */
export function AboutNotesRoute() {
  const { type = '', id = '' } = useParams();
  if (!isAboutType(type)) return <NotHere />;
  return <AboutNotes key={id} about={{ type, id }} />;
}

function NotHere() {
  return (
    <Screen>
      <div className="notes">
        <SaysBlock lead="This is not in the tablet’s Book.">
          The Book may still be filling. All notes stand under <Link to={paths.notes()}>Notes</Link>.
        </SaysBlock>
      </div>
    </Screen>
  );
}

function AboutNotes({ about }: { readonly about: About }) {
  const doc = useAbout(about);
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const screen = useNotesScreen(about);
  const input = useRef<HTMLInputElement>(null);
  const navigate = useNavigate();
  if (doc === undefined) return <NotHere />;
  const choose = (): void => {
    input.current?.click();
  };
  const back = <ThumbDome key="back" label="Back" onComplete={() => void navigate(aboutPath(doc))} />;
  return (
    <Screen thumbs={<Thumbs screen={screen} choose={choose} back={back} />}>
      <input
        ref={input}
        className="heard-only"
        type="file"
        accept="image/*"
        capture="environment"
        aria-label="Photo"
        tabIndex={-1}
        onChange={(event) => {
          const [file] = event.target.files ?? [];
          event.target.value = '';
          if (file !== undefined) void screen.takePhoto(file);
        }}
      />
      <div className="notes">
        <h1>Notes: {aboutWords(doc, zone)}</h1>
        <Writing screen={screen} />
        <Past screen={screen} zone={zone} />
      </div>
    </Screen>
  );
}

interface ThumbsProps {
  readonly screen: NotesScreen;
  readonly choose: () => void;
  readonly back: React.ReactNode;
}

function Thumbs({ screen, choose, back }: ThumbsProps) {
  const { photo, draft, may } = screen;
  if (!may) return <ThumbZone label="Actions" main={back} />;
  if (photo?.type === 'shrunk') {
    return (
      <ThumbZone
        label="Actions"
        main={
          <ThumbDome
            size="big"
            label={'Hold to\nkeep photo'}
            hold="half-second"
            holdLabel="Hold: keep photo"
            onComplete={screen.keepPhoto}
          />
        }
        others={[<ThumbDome key="drop" label="Leave photo" onComplete={screen.dropPhoto} />]}
      />
    );
  }
  const empty = draft.words.trim() === '';
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome
          size="big"
          label={draft.amends === null ? 'Hold to\nlog note' : 'Hold to\nlog change'}
          hold="half-second"
          holdLabel="Hold: log note"
          disabled={empty}
          {...(empty ? { reason: 'Write something first.' } : {})}
          onComplete={screen.log}
        />
      }
      others={[<ThumbDome key="photo" label="Take photo" onComplete={choose} />, back]}
    />
  );
}

function Writing({ screen }: { readonly screen: NotesScreen }) {
  const { draft, photo, change, may, save } = screen;
  if (!may) return <SaysBlock muted>Who only reads writes about incidents alone.</SaysBlock>;
  if (photo?.type === 'shrunk') {
    return (
      <>
        <PhotoPreview canvas={photo.canvas} />
        <WordsField
          label="Words under the photo"
          value={draft.caption}
          onChange={(caption) => change({ caption })}
        />
        <SaysBlock muted>
          {bytesWords(photo.bytes.byteLength)}, not kept yet. Its place was left out. The picture stays on
          this tablet; the others see its words.
        </SaysBlock>
      </>
    );
  }
  return (
    <>
      {photo?.type === 'unreadable' ? (
        <p className="field-refusal" role="alert">
          {photo.words}
        </p>
      ) : null}
      <WordsField
        label={draft.amends === null ? 'New note' : 'Amended note'}
        rows={4}
        value={draft.words}
        onChange={(words) => change({ words })}
        {...(save === 'not-saved' ? { refusal: 'The draft could not be kept on this tablet.' } : {})}
      />
      {draft.amends === null ? null : (
        <button type="button" className="note-button" onClick={screen.newNote}>
          Leave it as it was
        </button>
      )}
    </>
  );
}

/** The very canvas that was drawn: no second copy of a large picture. */
function PhotoPreview({ canvas }: { readonly canvas: HTMLCanvasElement }) {
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => {
    canvas.setAttribute('role', 'img');
    canvas.setAttribute('aria-label', 'The photo, not kept yet');
    place.current?.replaceChildren(canvas);
  }, [canvas]);
  return <div ref={place} className="photo-preview" />;
}

function Past({ screen, zone }: { readonly screen: NotesScreen; readonly zone: string }) {
  const { notes, photos, state } = screen.attached;
  if (state === 'ready' && notes.length + photos.length === 0)
    return <p className="muted">Nothing noted yet.</p>;
  return (
    <>
      <ul className="note-list" aria-label="Notes">
        {notes.map((note) => (
          <NoteItem key={note.id} note={note} zone={zone} screen={screen} />
        ))}
      </ul>
      <ul className="photo-list" aria-label="Photos">
        {photos.map((photo) => (
          <PhotoItem key={photo.id} photo={photo} zone={zone} screen={screen} />
        ))}
      </ul>
    </>
  );
}
