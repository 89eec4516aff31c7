import { useMemo, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { HoldOutcome } from '../../components/hold';
import { paths } from '../../config/paths';
import { useAppend } from '../../data/use-append';
import { useDraft } from '../../data/use-draft';
import { useNow } from '../../data/use-now';
import { useResume } from '../../data/use-resume';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import { reviseFields, type ReviseGroup } from './revise-fields';
import { EMPTY_DRAFT, readField, revisionOf, stepText, voidedBy, type ReviseDraft } from './revise-form';

/** State of one revision being written: a draft kept at every key, always laid over the latest revision. */
export function useRevise(rig: RigDoc) {
  const append = useAppend();
  const navigate = useNavigate();
  const resume = useResume();
  const { best_ms } = useNow(60_000);
  const { value: draft, set, clear, save } = useDraft<ReviseDraft>(`revise/${rig.id}`, EMPTY_DRAFT);
  const before = latestRevision(rig);
  const fields = useMemo(() => reviseFields(before.spec), [before]);
  const revision = useMemo(() => revisionOf(before.spec, draft), [before, draft]);
  const [active, setActive] = useState(
    () => fields.find((field) => field.key === resume.place.field)?.key ?? fields[0]?.key ?? '',
  );
  const [typing, setTyping] = useState(false);
  const field = fields.find((one) => one.key === active) ?? null;
  const group = field?.group ?? 'gap';
  const shown = fields.filter((one) => one.group === group);

  const setText = (key: string, text: string): void =>
    set((now) => ({ ...now, texts: { ...now.texts, [key]: text } }));
  const choose = (key: string): void => {
    setActive(key);
    resume.field(key, null);
  };
  const log = async (): Promise<HoldOutcome> => {
    if (revision.hindrance !== null) return { type: 'failed', words: revision.hindrance };
    const outcome = await append({
      kind: 'rig.revised',
      subject: rig.id,
      body: { based_on: before.entry, spec: revision.spec, why: draft.why.trim() },
    });
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    clear();
    void navigate(paths.rig(rig.id));
    return { type: 'settled' };
  };

  return {
    rig,
    before,
    draft,
    save,
    group,
    shown,
    field,
    revision,
    voided: voidedBy(rig, best_ms),
    typing: typing && field !== null,
    choose,
    chooseGroup: (next: ReviseGroup) => choose(fields.find((one) => one.group === next)?.key ?? active),
    openKeypad: () => setTyping(true),
    closeKeypad: () => setTyping(false),
    /** Text of a field as it stands: typed, else the value of the latest revision. */
    textOf: (key: string) => {
      const one = fields.find((each) => each.key === key);
      return draft.texts[key] ?? String(one?.read(before.spec) ?? '');
    },
    type: (text: string) => {
      if (field !== null) setText(field.key, text);
    },
    /** Leaves the keypad when the text is a number of this field; otherwise the refusal stays beside it. */
    enter: (text: string) => {
      if (field === null) return;
      setText(field.key, text);
      if (readField(field, text).ok) setTyping(false);
    },
    revert: (key: string) =>
      set((now) => ({
        ...now,
        texts: Object.fromEntries(Object.entries(now.texts).filter(([one]) => one !== key)),
      })),
    step: (direction: -1 | 1) => {
      if (field !== null)
        setText(field.key, stepText(field, direction, { text: draft.texts[field.key], spec: before.spec }));
    },
    set,
    clear,
    log,
  };
}

export type Revise = ReturnType<typeof useRevise>;
