import { useNavigate } from 'react-router-dom';
import type { HoldOutcome } from '../../components/hold';
import { useFigureForm } from '../../components/use-figure-form';
import { paths } from '../../config/paths';
import { useAppend } from '../../data/use-append';
import { useKit, useLab } from '../../data/use-book';
import { useDraft } from '../../data/use-draft';
import { useNow } from '../../data/use-now';
import { useResume } from '../../data/use-resume';
import { EMPTY_KIT, kitSpecs, readKit, type KitDraft } from './kit-form';

/** A piece being entered: a draft kept at every key. */
export function useKitAdd() {
  const append = useAppend();
  const navigate = useNavigate();
  const resume = useResume();
  const kit = useKit();
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const { best_ms } = useNow(60_000);
  const { value: draft, set, clear, save } = useDraft<KitDraft>('kit/add', EMPTY_KIT);
  const read = readKit(draft, { now_ms: best_ms, zone, taken: kit.map((one) => one.number) });
  const figures = useFigureForm({
    specs: kitSpecs(draft.type, draft.due),
    texts: draft.texts,
    setTexts: (change) => set((now) => ({ ...now, texts: change(now.texts) })),
    resumed: resume.place.field,
    onChoose: (key) => resume.field(key, null),
  });
  const log = async (): Promise<HoldOutcome> => {
    if (read.type === 'refused') return { type: 'failed', words: read.words };
    const outcome = await append({ kind: 'kit.added', body: read.body });
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    clear();
    void navigate(paths.kitPiece(outcome.entry.id));
    return { type: 'settled' };
  };
  return {
    draft,
    save,
    figures,
    change: (part: Partial<KitDraft>) => set((now) => ({ ...now, ...part })),
    hindrance: read.type === 'refused' ? read.words : null,
    log,
    leave: () => void navigate(paths.kit()),
  };
}

export type KitAdd = ReturnType<typeof useKitAdd>;
