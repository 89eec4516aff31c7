import { useMemo } from 'react';
import { useNavigate } from 'react-router-dom';
import type { HoldOutcome } from '../../../components/hold';
import { paths } from '../../../config/paths';
import { useAppend } from '../../../data/use-append';
import { useRigs } from '../../../data/use-book';
import { useDraft } from '../../../data/use-draft';
import type { SheetDoc } from '../../../domain/book/documents/sheet';
import { sheetDifference } from '../../../domain/report/sheet-words';
import { draftOf, EMPTY_SHEET, readSheet, withStep, type SheetDraft, type StepDraft } from './sheet-draft';

/** A sheet being written: `published` is the one that it replaces, null for a new one. */
export function useSheetEdit(published: SheetDoc | null) {
  const append = useAppend();
  const navigate = useNavigate();
  const rigs = useRigs();
  const initial = useMemo(() => (published === null ? EMPTY_SHEET : draftOf(published.spec)), [published]);
  const kept = useDraft<SheetDraft>(`sheet-edit/${published?.id ?? 'new'}`, initial);
  const draft = kept.value;
  const { spec, problems } = useMemo(() => readSheet(draft), [draft]);
  const rigName = (id: string) => rigs.find((rig) => rig.id === id)?.name ?? 'a rig not in the Book';
  const changes =
    published === null || spec === null ? [] : sheetDifference(published.spec, spec, { rigName });
  const hindrance = hindranceOf();

  return {
    ...{ published, rigs, rigName, draft, spec, problems, changes, hindrance },
    save: kept.save,
    set: kept.set,
    change: (part: Partial<SheetDraft>) => kept.set((now) => ({ ...now, begun: true, ...part })),
    changeStep: (key: string, part: Partial<StepDraft>) => kept.set((now) => withStep(now, key, part)),
    leave: () => void navigate(published === null ? paths.sheets() : paths.sheet(published.id)),
    discard: () => {
      kept.clear();
      void navigate(published === null ? paths.sheets() : paths.sheet(published.id));
    },
    publish: async (): Promise<HoldOutcome> => {
      if (spec === null || hindrance !== null)
        return { type: 'failed', words: hindrance ?? 'Something is still open.' };
      const outcome = await append({
        kind: 'sheet.published',
        body: { spec, replaces: published?.id ?? null },
      });
      if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
      kept.clear();
      void navigate(paths.sheets());
      return { type: 'settled' };
    },
  };

  function hindranceOf(): string | null {
    if (published !== null && published.retired !== null)
      return 'This sheet was replaced or retired meanwhile: what is written here can only be discarded.';
    const refusals = problems.filter((one) => one.weight === 'refusal');
    const [first] = refusals;
    if (first !== undefined) {
      const at = draft.steps.findIndex((step) => step.key === first.step);
      return at < 0 ? first.words : `Step ${at + 1}: ${first.words}`;
    }
    return published !== null && changes.length === 0 ? 'Nothing differs from what is published.' : null;
  }
}

export type SheetEdit = ReturnType<typeof useSheetEdit>;
