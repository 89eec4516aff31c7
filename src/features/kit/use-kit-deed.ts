import type { HoldOutcome } from '../../components/hold';
import { useFigureForm } from '../../components/use-figure-form';
import { useAppend } from '../../data/use-append';
import { useLab } from '../../data/use-book';
import { useDraft } from '../../data/use-draft';
import { useNow } from '../../data/use-now';
import { useResume } from '../../data/use-resume';
import { useSession } from '../../data/use-session';
import type { KitDoc } from '../../domain/book/documents/kit';
import { deedOf, deedSpecs, EMPTY_DEED, readDeed, type DeedDraft } from './kit-deed';

/** What is being done with one piece: a draft kept at every key. */
export function useKitDeed(kit: KitDoc) {
  const append = useAppend();
  const resume = useResume();
  const session = useSession();
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const { best_ms } = useNow(60_000);
  const { value: draft, set, clear, save } = useDraft<DeedDraft>(`kit/${kit.id}`, EMPTY_DEED);
  const self = session.state === 'open' ? session.person.id : null;
  const read = readDeed(kit, draft, { now_ms: best_ms, zone, self });
  const figures = useFigureForm({
    specs: deedSpecs(kit, draft),
    texts: draft.texts,
    setTexts: (change) => set((now) => ({ ...now, texts: change(now.texts) })),
    resumed: resume.place.field,
    onChoose: (key) => resume.field(key, null),
  });
  const log = async (): Promise<HoldOutcome> => {
    if (read.type === 'refused') return { type: 'failed', words: read.words };
    const outcome = await append({ ...read.entry, subject: kit.id });
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    clear();
    return { type: 'settled' };
  };
  return {
    draft,
    deed: deedOf(kit, draft),
    save,
    figures,
    now_ms: best_ms,
    zone,
    change: (part: Partial<DeedDraft>) => set((now) => ({ ...now, ...part })),
    hindrance: read.type === 'refused' ? read.words : null,
    retires:
      read.type === 'ready' && read.entry.kind === 'kit.inspected' && read.entry.body.outcome === 'retired',
    log,
  };
}

export type KitDeed = ReturnType<typeof useKitDeed>;
