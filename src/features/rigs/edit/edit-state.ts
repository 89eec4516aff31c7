import type { LabSettings, RigSpec } from '../../../domain/book/rig-spec';
import { specChanges, type SpecChange } from '../../../domain/rules/loosening';
import { parseNumber } from '../../../domain/units/parse-number';
import type { EditField } from './edit-field';
import { readTyped, toOwn, unitsOf } from './edit-units';
import { provisionalSpec, readEdit, textOfDraft, type EditDraft, type EditReading } from './edit-form';
import { SECTIONS, sectionFields, sectionOf, topologyOf, type Section } from './edit-sections';
import { textsOf, type Texts, type TextOf } from './spec-texts';
import { startingValues } from './starting-values';

/** How far one section is. */
export interface SectionStatus {
  readonly section: Section;
  /** Fields that nobody has filled yet. */
  readonly open: number;
  /** Fields that hold something which is refused. */
  readonly refused: number;
  /** Suggestions that nobody has taken for right. */
  readonly suggested: number;
  /** Fields that differ from the revision underneath. */
  readonly changed: number;
}

/** What the figures are computed from while something is still open. */
export interface FiguresFrom {
  readonly spec: RigSpec;
  /** Fields whose value was taken from the suggestions, or from the revision underneath. */
  readonly taken: readonly string[];
}

export interface EditState extends EditReading {
  readonly textOf: TextOf;
  readonly base: Texts;
  readonly before: RigSpec | null;
  readonly changes: readonly SpecChange[];
  readonly sections: readonly SectionStatus[];
  readonly figures: FiguresFrom | null;
  /** Sections that the figures wait for. */
  readonly figures_wait: readonly Section[];
}

/** Without these no figure says anything about the rig that is meant. */
const NEEDED: readonly Section[] = ['circuit', 'gap', 'first', 'second', 'channel', 'charging'];

/** Everything that a screen shows of a rig being edited, from the draft and the spec underneath. Pure and total. */
export function editState(draft: EditDraft, before: RigSpec | null, lab: LabSettings | null): EditState {
  const base = before === null ? {} : textsOf(before);
  const textOf = textOfDraft(draft, base);
  const reading = readEdit(textOf, lab);
  const sections = SECTIONS.map((section) => statusOf(section, { draft, base, textOf, reading }));
  const waits = sections
    .filter((one) => NEEDED.includes(one.section) && one.open + one.refused > 0)
    .map((one) => one.section);
  const figures_wait = before === null ? waits : [];
  const start = startingValues(topologyOf(textOf));
  const instead: TextOf = (key) => base[key] ?? start[key] ?? '';
  return {
    ...reading,
    textOf,
    base,
    before,
    changes: before === null || reading.spec === null ? [] : specChanges(before, reading.spec),
    sections,
    figures:
      reading.spec !== null
        ? { spec: reading.spec, taken: [] }
        : figures_wait.length > 0
          ? null
          : provisionalSpec(textOf, instead, lab),
    figures_wait,
  };
}

interface Parts {
  readonly draft: EditDraft;
  readonly base: Texts;
  readonly textOf: TextOf;
  readonly reading: EditReading;
}

function statusOf(section: Section, { draft, base, textOf, reading }: Parts): SectionStatus {
  const keys = [...sectionFields(section, textOf).map((field) => field.key), ...listKeys(section)];
  const refused = keys.filter((key) => reading.refusals[key] !== undefined);
  const open = refused.filter((key) => textOf(key).trim() === '');
  return {
    section,
    open: open.length,
    refused: refused.length - open.length,
    suggested: keys.filter((key) => isSuggested(key, draft)).length,
    changed: keys.filter((key) => textOf(key) !== (base[key] ?? '')).length,
  };
}

function listKeys(section: Section): readonly string[] {
  if (section === 'nodes') return ['nodes'];
  if (section === 'shorting') return ['shorting_points'];
  return section === 'screws' ? ['channel.screws'] : [];
}

export function isSuggested(key: string, draft: EditDraft): boolean {
  return draft.texts[key] === undefined && draft.suggested[key] !== undefined;
}

/** Takes the suggestions over wherever the section is open; what was typed stays. */
export function suggestSection(draft: EditDraft, section: Section, base: Texts): EditDraft {
  let next = draft;
  // Some fields appear only once a choice has been made.
  for (let pass = 0; pass < 3; pass += 1) {
    const textOf = textOfDraft(next, base);
    const start = startingValues(topologyOf(textOf));
    const keys = [...listKeys(section), ...sectionFields(section, textOf).map((field) => field.key)];
    const found = keys.filter((key) => textOf(key).trim() === '' && (start[key] ?? '') !== '');
    if (found.length === 0) break;
    const texts = Object.fromEntries(Object.entries(next.texts).filter(([key]) => !found.includes(key)));
    const suggested = { ...next.suggested };
    for (const key of found) suggested[key] = start[key] ?? '';
    next = { ...next, texts, suggested };
  }
  return next;
}

/** Somebody says that the suggestions of this section are right: they stand as if typed. */
export function confirmSection(draft: EditDraft, section: Section, base: Texts): EditDraft {
  const textOf = textOfDraft(draft, base);
  const keys = [...listKeys(section), ...sectionFields(section, textOf).map((field) => field.key)];
  const taken = keys.filter((key) => isSuggested(key, draft));
  const texts = { ...draft.texts };
  for (const key of taken) texts[key] = draft.suggested[key] ?? '';
  const suggested = Object.fromEntries(
    Object.entries(draft.suggested).filter(([key]) => !taken.includes(key)),
  );
  return { ...draft, texts, suggested };
}

/** One step up or down in the field's own unit, in decimal, so that 2.6 and 0.1 give 2.7. */
export function stepText(
  field: Extract<EditField, { kind: 'number' }>,
  text: string,
  { direction, ambient_bar_abs }: { readonly direction: -1 | 1; readonly ambient_bar_abs: number | null },
): string {
  const typed = readTyped(text.trim());
  const unit = unitsOf(field.unit, ambient_bar_abs).find((one) => one.key === typed.unit);
  const number = parseNumber(typed.number, field.key, field.label);
  // Which of its two readings to step from is not ours to choose.
  if (!number.ok && number.refusal.type === 'ambiguous-comma') return text;
  const from = !number.ok ? 0 : unit === undefined ? number.value : toOwn(number.value, unit);
  const next = Number((from + direction * field.step).toPrecision(12));
  const least = field.minExcluded ? Math.min(field.step, field.max) : field.min;
  return String(Math.min(field.max, Math.max(least, next)));
}

/** Why it cannot be saved yet, in words; null when it can. */
export function hindranceOf(
  state: EditState,
  draft: EditDraft,
  { isNew, names }: { readonly isNew: boolean; readonly names: readonly string[] },
): string | null {
  const [refused] = Object.values(state.refusals);
  if (isNew) {
    const name = draft.name.trim();
    if (name === '') return 'Give the rig a name.';
    if (names.some((one) => one.toLowerCase() === name.toLowerCase()))
      return `There is a rig called ${name} already.`;
  }
  if (refused !== undefined) return refused;
  if (Object.keys(draft.suggested).some((key) => isLive(key, state) && isSuggested(key, draft)))
    return 'Some values are suggested alone. Say in their section that they are right, or change them.';
  if (isNew) return null;
  if (state.changes.length === 0) return 'Nothing has been changed yet.';
  return draft.why.trim() === '' ? 'Say why the rig is revised.' : null;
}

function isLive(key: string, state: EditState): boolean {
  const section = sectionOf(key);
  if (section === null) return false;
  return (
    listKeys(section).includes(key) || sectionFields(section, state.textOf).some((field) => field.key === key)
  );
}
