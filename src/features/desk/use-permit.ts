import type { HoldOutcome } from '../../components/hold';
import { useDraft } from '../../data/use-draft';
import { useNow } from '../../data/use-now';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import {
  EMPTY_PERMIT,
  permitText,
  readPermit,
  shownPermitText,
  stepPermit,
  type PermitDraft,
  type PermitField,
} from './permit-form';
import { useAct, useForecast } from './use-act';

const MINUTE_MS = 60_000;

/** A permit being written: its draft, what the judge would say of it now, and the hold that logs it. */
export function usePermit(rig: RigDoc) {
  const latest = latestRevision(rig);
  const { envelope } = latest.spec;
  const { best_ms } = useNow(MINUTE_MS);
  // A draft belongs to the revision it was written for: another one has other limits.
  const draft = useDraft<PermitDraft>(`desk/permit/${latest.entry}`, EMPTY_PERMIT);
  const act = useAct(() => draft.clear());
  const reading = readPermit(draft.value, envelope, Math.floor(best_ms / MINUTE_MS) * MINUTE_MS);
  const [refused] = Object.values(reading.refusals);
  const body = {
    rig_revision: latest.entry,
    envelope: reading.envelope,
    until_ms: reading.until_ms,
    words: draft.value.words.trim(),
  };
  const entry = { kind: 'permit.granted', subject: rig.id, body } as const;
  const forecast = useForecast(entry, JSON.stringify([latest.entry, rig.heads, reading.envelope]));
  const put = (field: PermitField, text: string): void =>
    draft.set((now) => ({ ...now, texts: { ...now.texts, [field]: text } }));

  return {
    latest,
    reading,
    forecast,
    logged: act.logged,
    words: draft.value.words,
    hindrance: refused ?? forecast.against?.words ?? null,
    setWords: (words: string) => draft.set((now) => ({ ...now, words })),
    text: (field: PermitField) => permitText(draft.value, field, envelope),
    shown: (field: PermitField) => shownPermitText(permitText(draft.value, field, envelope)),
    touched: (field: PermitField) => draft.value.texts[field] !== undefined,
    step: (field: PermitField, direction: -1 | 1) =>
      draft.set((now) => stepPermit(now, { field, direction }, envelope)),
    type: put,
    /** False while the text is refused, so that the keypad stays open with the words beside it. */
    enter: (field: PermitField, text: string): boolean => {
      put(field, text);
      const texts = { ...draft.value.texts, [field]: text };
      return readPermit({ ...draft.value, texts }, envelope, best_ms).refusals[field] === undefined;
    },
    revert: (field: PermitField) =>
      draft.set((now) => {
        const { [field]: _gone, ...texts } = now.texts;
        return { ...now, texts };
      }),
    grant: (): Promise<HoldOutcome> => act.log(entry),
  };
}

export type PermitEditor = ReturnType<typeof usePermit>;
