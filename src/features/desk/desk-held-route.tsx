import { SaysBlock } from '../../components/says-block';
import { useHeldBack, useLab } from '../../data/use-book';
import { DeskScreen } from './desk-screen';
import { HeldEntry } from './held-entry';

/** What the server did not apply: text and reason readable, nothing lost, and what can be done. */
export function DeskHeldRoute() {
  const held = useHeldBack();
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  return (
    <DeskScreen>
      <article className="desk-firing">
        <header>
          <h2>Held back</h2>
          <p className="muted">
            Acts that the rules did not allow when they came in. Readings are never held back.
          </p>
        </header>
        {held.length === 0 ? (
          <SaysBlock lead="Nothing is held back.">An entry that is stands here with its reason.</SaysBlock>
        ) : null}
        {held.map(({ doc }) => (
          <HeldEntry key={doc.id} held={doc} zone={zone} />
        ))}
      </article>
    </DeskScreen>
  );
}
