import { useState } from 'react';
import type { Refusal, Result } from '../../domain/units/result';
import { isQuantity } from './reading-fields';
import {
  afterLogging,
  EMPTY_DRAFT,
  enter,
  enterText,
  fieldOf,
  formValues,
  stepQuantity,
  type Base,
  type ChoiceKey,
  type FieldKey,
  type FormValues,
  type ReadingDraft,
  type WordsKey,
} from './reading-form';

/** Where the draft is kept; every change of it is on the disk within a blink. */
export interface DraftStore {
  readonly value: ReadingDraft;
  readonly set: (next: (now: ReadingDraft) => ReadingDraft) => void;
}

export interface ReadingForm {
  readonly base: Base;
  readonly draft: ReadingDraft;
  readonly values: FormValues;
  /** What stands beside which field. */
  readonly refusal: Refusal | null;
  /** Takes a field in hand; one without steps, or without a value yet, opens at once. */
  readonly select: (field: FieldKey) => void;
  readonly open: (field: FieldKey) => void;
  readonly close: () => void;
  readonly type: (text: string) => void;
  readonly enterTyped: (text: string) => void;
  readonly step: (direction: -1 | 1) => void;
  readonly pick: <K extends ChoiceKey>(key: K, value: FormValues[K]) => void;
  readonly write: (key: WordsKey, words: string) => void;
  /** Sets the spot on its grid; null takes it away. */
  readonly place: (at: { readonly x_mm: number; readonly y_mm: number } | null) => void;
  readonly fold: (group: string) => void;
  /** The shots of this burst are in the Book already. */
  readonly countedElsewhere: () => void;
  readonly refuse: (refusal: Refusal) => void;
  /** The reading is durable: the next one starts. */
  readonly startNext: () => void;
}

/** The one form for a reading, whether it is being logged or corrected. */
export function useReadingForm(base: Base, store: DraftStore): ReadingForm {
  const draft = { ...EMPTY_DRAFT, ...store.value };
  const values = formValues(base, draft);
  const [refusal, setRefusal] = useState<Refusal | null>(null);
  const { set } = store;

  const take = (result: Result<ReadingDraft>): void => {
    if (result.ok) set(() => result.value);
    setRefusal(result.ok ? null : result.refusal);
  };
  const open = (field: FieldKey): void => {
    setRefusal(null);
    set((now) => ({ ...now, field, ...(isQuantity(field) ? { typing: '' } : { open: true }) }));
  };
  return {
    base,
    draft,
    values,
    refusal,
    open,
    select: (field) => {
      if (!isQuantity(field) || values[field] === null) {
        open(field);
        return;
      }
      setRefusal(null);
      set((now) => ({ ...now, field, typing: null, open: false }));
    },
    close: () => {
      setRefusal(null);
      set((now) => ({ ...now, typing: null, open: false }));
    },
    type: (text) => {
      set((now) => ({ ...now, typing: text }));
    },
    enterTyped: (text) => {
      if (isQuantity(draft.field)) take(enterText(draft, draft.field, text));
    },
    step: (direction) => {
      const { field } = draft;
      if (!isQuantity(field)) return;
      const value = values[field];
      if (value === null) open(field);
      else take(stepQuantity(draft, { key: field, value }, direction));
    },
    pick: (key, value) => {
      setRefusal(null);
      set((now) => enter(now, key, value));
    },
    write: (key, words) => {
      set((now) =>
        key === 'dye_batch'
          ? { ...now, entered: { ...now.entered, dye_batch: words === '' ? null : words } }
          : { ...now, [key]: words },
      );
    },
    place: (at) => {
      set((now) => ({
        ...now,
        entered: { ...now.entered, beam_x_mm: at?.x_mm ?? null, beam_y_mm: at?.y_mm ?? null },
      }));
    },
    countedElsewhere: () => {
      set((now) => ({ ...now, entered: { ...now.entered, shots: 0 } }));
    },
    fold: (group) => {
      set((now) => ({
        ...now,
        groups: now.groups.includes(group)
          ? now.groups.filter((one) => one !== group)
          : [...now.groups, group],
      }));
    },
    refuse: (next) => {
      setRefusal(next);
      const field = fieldOf(next);
      if (field === null || field === 'looked') return;
      set((now) => ({ ...now, field, typing: null, open: false }));
    },
    startNext: () => {
      setRefusal(null);
      set(afterLogging);
    },
  };
}
