import { useEffect, useRef, useState } from 'react';
import type { HoldOutcome } from '../../components/hold';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { useLabClient } from '../../data/client-context';
import { bytesWords } from '../../data/photos/photo-size';
import { shrinkPhoto, type ShrunkPhoto } from '../../data/photos/shrink-photo';
import type { Step } from '../../domain/book/sheet-spec';
import { StepFrame } from './step-frame';
import { StepNote } from './step-note';
import type { CheckWalk } from './use-check-walk';

interface PhotoStepProps {
  readonly walk: CheckWalk;
  readonly step: Extract<Step, { type: 'photo' }>;
}

/** A picture is shrunk, looked at, and only then kept on this tablet and named in the Book. */
export function PhotoStep({ walk, step }: PhotoStepProps) {
  const { photos } = useLabClient();
  const input = useRef<HTMLInputElement>(null);
  const [photo, setPhoto] = useState<ShrunkPhoto | null>(null);
  const choose = (): void => {
    input.current?.click();
  };
  const keep = async (): Promise<HoldOutcome> => {
    if (photo?.type !== 'shrunk') return { type: 'failed', words: 'Take the photo first.' };
    const kept = await photos.put(photo.bytes);
    if (kept.type !== 'kept') return { type: 'failed', words: kept.words };
    return walk.done(step, { type: 'photo', sha256: kept.sha256, bytes: kept.bytes });
  };
  const shrunk = photo?.type === 'shrunk' ? photo : null;
  return (
    <StepFrame
      walk={walk}
      main={
        shrunk === null ? (
          <ThumbDome size="big" label={'Take\nphoto'} onComplete={choose} />
        ) : (
          <ThumbDome
            size="big"
            label={'Hold to\nkeep photo'}
            hold="half-second"
            holdLabel="Hold: keep photo"
            onComplete={keep}
          />
        )
      }
      also={shrunk === null ? undefined : <ThumbDome key="again" label="Take another" onComplete={choose} />}
    >
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
          if (file !== undefined) void shrinkPhoto(file).then(setPhoto);
        }}
      />
      {photo?.type === 'unreadable' ? (
        <p className="field-refusal" role="alert">
          {photo.words}
        </p>
      ) : null}
      {shrunk === null ? (
        <SaysBlock muted>
          It is made smaller, and its place is left out, before it is kept. It stays on this tablet until it
          is handed over.
        </SaysBlock>
      ) : (
        <>
          <PhotoView canvas={shrunk.canvas} />
          <SaysBlock muted>{bytesWords(shrunk.bytes.byteLength)}, not kept yet.</SaysBlock>
        </>
      )}
      <StepNote walk={walk} step={step.key} />
    </StepFrame>
  );
}

/** The very canvas that was drawn: no second copy, and nothing that a page policy would have to allow. */
function PhotoView({ canvas }: { readonly canvas: HTMLCanvasElement }) {
  const place = useRef<HTMLDivElement>(null);
  useEffect(() => {
    canvas.setAttribute('role', 'img');
    canvas.setAttribute('aria-label', 'The photo, not kept yet');
    place.current?.replaceChildren(canvas);
  }, [canvas]);
  return <div ref={place} className="check-photo" />;
}
