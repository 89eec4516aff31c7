/** What is typed into a check and not in the Book yet. */
export interface WalkDraft {
  /** Step being looked at; null follows the walk. */
  readonly viewed: string | null;
  /** The whole list is open in the figure's place. */
  readonly list: boolean;
  /** A done step that is being done once more. */
  readonly again: string | null;
  readonly notes: Readonly<Record<string, string>>;
  /** Typed readings by step, and whether the keypad is open. */
  readonly typed: Readonly<Record<string, string>>;
  readonly keypad: boolean;
  readonly waiveWhy: string;
  readonly abandonWhy: string;
}

export const EMPTY_WALK: WalkDraft = {
  viewed: null,
  list: false,
  again: null,
  notes: {},
  typed: {},
  keypad: false,
  waiveWhy: '',
  abandonWhy: '',
};

/** A step is in the Book: what was typed for it goes, and the walk goes on. */
export function afterStep(draft: WalkDraft, key: string): WalkDraft {
  const { [key]: _note, ...notes } = draft.notes;
  const { [key]: _typed, ...typed } = draft.typed;
  return { ...draft, notes, typed, viewed: null, again: null, keypad: false, list: false, waiveWhy: '' };
}
