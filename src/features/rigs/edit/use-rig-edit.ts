import { useMemo, useState } from 'react';
import { useLocation, useNavigate } from 'react-router-dom';
import type { HoldOutcome } from '../../../components/hold';
import { paths } from '../../../config/paths';
import { useAppend } from '../../../data/use-append';
import { useLab, useRigs } from '../../../data/use-book';
import { useDraft } from '../../../data/use-draft';
import { useResume } from '../../../data/use-resume';
import {
  latestRevision,
  revisionById,
  type RigDoc,
  type RigRevision,
} from '../../../domain/book/documents/rig';
import type { NumberEdit, DayEdit } from './edit-field';
import { EMPTY_EDIT, type EditDraft } from './edit-form';
import { SECTIONS, sectionFields, sectionOf, type Section } from './edit-sections';
import { confirmSection, editState, hindranceOf, stepText, suggestSection } from './edit-state';
import { withDielectric } from './dielectric-choice';
import { newRow, rowsOf, rowsText, type ListKey } from './spec-texts';

/** What the screen shows: one section, all of them in a list, or what would be written. */
export type EditView = Section | 'overview' | 'review';

/** A rig being written down: `rig` is the one that is revised, null for a new one. */
export function useRigEdit(rig: RigDoc | null) {
  const append = useAppend();
  const navigate = useNavigate();
  const resume = useResume();
  const lab = useLab();
  const rigs = useRigs();
  const { value: draft, set, clear, save } = useDraft<EditDraft>(`rig-edit/${rig?.id ?? 'new'}`, EMPTY_EDIT);
  const underneath = rig === null ? copiedRevision(rigs, draft.copied_from) : latestRevision(rig);
  const before = underneath?.spec ?? null;
  const settings = lab?.settings ?? null;
  const state = useMemo(() => editState(draft, before, settings), [draft, before, settings]);
  const { pathname } = useLocation();
  const [place, setPlace] = useState(() =>
    placeOf(resume.place.route === pathname ? resume.place.field : null, rig === null),
  );
  const [typing, setTyping] = useState(false);

  const inView =
    place.view === 'overview' || place.view === 'review' ? [] : sectionFields(place.view, state.textOf);
  const keyed = inView.filter(
    (field): field is NumberEdit | DayEdit => field.kind === 'number' || field.kind === 'day',
  );
  const field = keyed.find((one) => one.key === place.field) ?? keyed[0] ?? null;
  const hindrance = hindranceOf(state, draft, {
    isNew: rig === null,
    names: rig === null ? rigs.map((one) => one.name) : [],
  });
  const ambient_bar_abs = settings?.ambient_bar_abs ?? null;

  const go = (view: EditView, key: string | null = null): void => {
    setTyping(false);
    setPlace({ view, field: key });
    resume.field(`${view} ${key ?? ''}`, null);
  };
  const setText = (key: string, text: string): void =>
    set((now) => ({ ...now, texts: { ...now.texts, [key]: text } }));

  const log = async (): Promise<HoldOutcome> => {
    if (hindrance !== null || state.spec === null)
      return { type: 'failed', words: hindrance ?? 'Something is still open.' };
    const outcome = await append(
      rig === null || underneath === null
        ? { kind: 'rig.created', body: { name: draft.name.trim(), spec: state.spec } }
        : {
            kind: 'rig.revised',
            subject: rig.id,
            body: { based_on: underneath.entry, spec: state.spec, why: draft.why.trim() },
          },
    );
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    clear();
    void navigate(paths.rig(rig?.id ?? outcome.entry.id));
    return { type: 'settled' };
  };

  return {
    ...{ rig, rigs, draft, save, state, hindrance, settings, ambient_bar_abs, underneath },
    view: place.view,
    fields: inView,
    keyed,
    field,
    typing: typing && field !== null,
    go,
    /** To the field that a refusal is about. */
    goTo: (key: string) => go(sectionOf(key) ?? 'overview', key),
    next: nextView(place.view),
    choose: (key: string) => {
      setPlace({ view: place.view, field: key });
      resume.field(`${place.view} ${key}`, null);
    },
    openKeypad: () => setTyping(true),
    closeKeypad: () => setTyping(false),
    /** After a number that can be read: on to the next open one of the section, else the keypad goes away. */
    enterNext: (key: string) => {
      const at = keyed.findIndex((one) => one.key === key);
      const open = keyed
        .slice(at + 1)
        .find((one) => one.empty === 'refused' && state.textOf(one.key).trim() === '');
      if (open === undefined) setTyping(false);
      else setPlace({ view: place.view, field: open.key });
    },
    setText,
    revert: (key: string, text: string | undefined) =>
      set((now) => {
        const { [key]: _gone, ...texts } = now.texts;
        return { ...now, texts: text === undefined ? texts : { ...texts, [key]: text } };
      }),
    step: (direction: -1 | 1) => {
      if (field?.kind !== 'number') return;
      setText(field.key, stepText(field, state.textOf(field.key), { direction, ambient_bar_abs }));
    },
    addRow: (list: ListKey) => {
      const row = newRow(list, { ...state.base, ...draft.suggested, ...draft.texts });
      setText(list, rowsText([...rowsOf(state.textOf(list)), row]));
    },
    takeRowOut: (list: ListKey, row: string) =>
      setText(list, rowsText(rowsOf(state.textOf(list)).filter((one) => one !== row))),
    chooseDielectric: (side: 'first' | 'second', name: string) =>
      set((now) => withDielectric(now, side, name)),
    suggest: (section: Section) => set((now) => suggestSection(now, section, state.base)),
    confirm: (section: Section) => set((now) => confirmSection(now, section, state.base)),
    setName: (name: string) => set((now) => ({ ...now, name })),
    setWhy: (why: string) => set((now) => ({ ...now, why })),
    copyFrom: (revision: string | null) =>
      set((now) => ({ ...EMPTY_EDIT, name: now.name, copied_from: revision })),
    /** The draft stays. */
    leave: () => void navigate(rig === null ? paths.rigs() : paths.rig(rig.id)),
    touched: draft !== EMPTY_EDIT,
    discard: () => {
      clear();
      void navigate(rig === null ? paths.rigs() : paths.rig(rig.id));
    },
    log,
  };
}

export type RigEdit = ReturnType<typeof useRigEdit>;

interface Place {
  readonly view: EditView;
  readonly field: string | null;
}

/** Where the hands were, if that was on this screen; else a new rig starts at its circuit and a revision at the list. */
function placeOf(kept: string | null, isNew: boolean): Place {
  const [view = '', field = ''] = (kept ?? '').split(' ');
  const found = [...SECTIONS, 'overview' as const, 'review' as const].find((one) => one === view);
  if (found === undefined) return { view: isNew ? 'circuit' : 'overview', field: null };
  return { view: found, field: field === '' ? null : field };
}

function nextView(view: EditView): EditView {
  if (view === 'overview') return 'review';
  const at = SECTIONS.findIndex((section) => section === view);
  return at < 0 ? 'review' : (SECTIONS[at + 1] ?? 'review');
}

function copiedRevision(rigs: readonly RigDoc[], entry: string | null): RigRevision | null {
  if (entry === null) return null;
  for (const rig of rigs) {
    const found = revisionById(rig, entry);
    if (found !== undefined) return found;
  }
  return null;
}
