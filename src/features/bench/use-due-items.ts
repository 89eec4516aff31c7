import { useMemo } from 'react';
import { useBookState, useKit, useLab, usePerson } from '../../data/use-book';
import { useOpenAuthor } from '../../data/use-claims';
import { useNow } from '../../data/use-now';
import { useSession } from '../../data/use-session';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { dueItems, type DueItem } from '../../domain/rules/due';
import { useWearFacts } from './use-wear-facts';

const EVERY_MS = 10_000;

/** Everything that is due at this rig for whoever is open. */
export function useDueItems(rig: RigDoc, view: DeclaredView): readonly DueItem[] {
  const session = useSession();
  const person = usePerson(session.state === 'open' ? session.person.id : null);
  const settings = useLab()?.settings;
  const kit = useKit();
  const open_author = useOpenAuthor().length;
  const { device } = useBookState();
  const { stamp, best_ms } = useNow(EVERY_MS);
  const { worn, drift } = useWearFacts(rig);
  return useMemo(
    () =>
      settings === undefined
        ? []
        : dueItems({
            rig,
            view,
            settings,
            person,
            kit,
            worn,
            drift,
            open_author,
            device,
            stamp,
            now_ms: best_ms,
          }),
    [rig, view, settings, person, kit, worn, drift, open_author, device, stamp, best_ms],
  );
}
