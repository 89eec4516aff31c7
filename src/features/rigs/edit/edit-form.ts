import { rigSpecSchema, type LabSettings, type RigSpec } from '../../../domain/book/rig-spec';
import { specCheck, type SpecObjection } from '../../../domain/rules/spec-check';
import { readField, type EditField, type EditValue } from './edit-field';
import { allFields } from './edit-sections';
import { FORM_KEYS, LISTS, rowsOf, type TextOf, type Texts } from './spec-texts';

/** What a person typed, chose or took over; the rest stands as underneath. Kept at every key. */
export interface EditDraft {
  readonly texts: Texts;
  /** Suggested values that were taken over: assumed until somebody says that they are right. */
  readonly suggested: Texts;
  /** Revision that a new rig is copied from. */
  readonly copied_from: string | null;
  readonly why: string;
  readonly name: string;
}

export const EMPTY_EDIT: EditDraft = { texts: {}, suggested: {}, copied_from: null, why: '', name: '' };

/** Text of a field as it stands: typed, else suggested and taken over, else of the spec underneath. */
export function textOfDraft(draft: EditDraft, base: Texts): TextOf {
  return (key) => draft.texts[key] ?? draft.suggested[key] ?? base[key] ?? '';
}

export interface EditReading {
  /** By field; beside it they stand. */
  readonly refusals: Readonly<Record<string, string>>;
  /** Where a refusal belongs to no field that is on screen. */
  readonly cautions: readonly SpecObjection[];
  /** The rig as it would be written; null while something is refused. */
  readonly spec: RigSpec | null;
}

type Lab = Pick<LabSettings, 'ambient_bar_abs'> | null;

/** Reads every field that has a meaning, puts them together and holds them against each other. Total: never throws. */
export function readEdit(textOf: TextOf, lab: Lab): EditReading {
  const fields = allFields(textOf);
  const refusals: Record<string, string> = {};
  const values = new Map<string, EditValue>();
  for (const field of fields) {
    const read = readField(field, textOf(field.key), lab?.ambient_bar_abs ?? null);
    if (read.ok) values.set(field.key, read.value);
    else refusals[field.key] = read.refusal.words;
  }
  Object.assign(refusals, emptyLists(textOf));
  if (Object.keys(refusals).length > 0) return { refusals, cautions: [], spec: null };
  const parsed = rigSpecSchema.safeParse(assembled(fields, values, textOf));
  if (!parsed.success) {
    for (const issue of parsed.error.issues) {
      const key = rowKey(issue.path.map(String).join('.'), textOf);
      refusals[key] ??= `${labelOf(fields, key)}: this cannot be read. Enter it again.`;
    }
    return { refusals, cautions: [], spec: null };
  }
  const check = specCheck(parsed.data, lab ?? undefined);
  for (const { field, words } of check.refusals) refusals[rowKey(field, textOf)] ??= words;
  const spec = check.refusals.length === 0 ? parsed.data : null;
  return { refusals, cautions: check.cautions, spec };
}

/**
 * A whole rig for the figures while something is still open: what is refused is taken from `instead`. Says which fields
 * it took, since no figure may lean on an assumption in silence. Null where even that gives no rig.
 */
export function provisionalSpec(
  textOf: TextOf,
  instead: TextOf,
  lab: Lab,
): { readonly spec: RigSpec; readonly taken: readonly string[] } | null {
  const taken: string[] = [];
  // Fields hang on choices that may themselves be open, so they are settled in the order of the sections.
  const settled = new Map<string, string>();
  const settledOf: TextOf = (key) => settled.get(key) ?? textOf(key);
  for (const list of LISTS) {
    if (list !== 'channel.screws' && rowsOf(textOf(list)).length === 0) settled.set(list, instead(list));
  }
  for (let pass = 0; pass < 3; pass += 1) {
    for (const field of allFields(settledOf)) {
      if (readField(field, settledOf(field.key), lab?.ambient_bar_abs ?? null).ok) continue;
      settled.set(field.key, instead(field.key));
      taken.push(field.key);
    }
  }
  const fields = allFields(settledOf);
  const values = new Map<string, EditValue>();
  for (const field of fields) {
    const read = readField(field, settledOf(field.key), lab?.ambient_bar_abs ?? null);
    if (!read.ok) return null;
    values.set(field.key, read.value);
  }
  const parsed = rigSpecSchema.safeParse(assembled(fields, values, settledOf));
  return parsed.success ? { spec: parsed.data, taken } : null;
}

/** Path of a field by its place, as rules name it, to the key of its row; other paths stay as they are. */
export function rowKey(path: string, textOf: TextOf): string {
  const list = LISTS.find((one) => path.startsWith(`${one}.`));
  if (list === undefined) return path;
  const [at = '', ...rest] = path.slice(list.length + 1).split('.');
  const row = rowsOf(textOf(list))[Number(at)];
  return row === undefined ? list : [list, row, ...rest].join('.');
}

function emptyLists(textOf: TextOf): Record<string, string> {
  const found: Record<string, string> = {};
  if (rowsOf(textOf('nodes')).length === 0)
    found['nodes'] = 'Charged nodes: name every node that stays charged by itself.';
  if (rowsOf(textOf('shorting_points')).length === 0)
    found['shorting_points'] = 'Shorting points: name every point that is shorted.';
  return found;
}

function labelOf(fields: readonly EditField[], key: string): string {
  return fields.find((field) => field.key === key)?.label ?? key;
}

interface Tree {
  [name: string]: EditValue | Tree | readonly (EditValue | Tree)[];
}

function assembled(
  fields: readonly EditField[],
  values: ReadonlyMap<string, EditValue>,
  textOf: TextOf,
): Tree {
  const tree: Tree = {};
  for (const field of fields) {
    const value = values.get(field.key);
    if (value === undefined || (field.kind === 'choice' && field.as === 'form')) continue;
    if (LISTS.some((list) => field.key.startsWith(`${list}.`))) continue;
    put(tree, field.key.split('.'), value);
  }
  const gap = branch(tree, 'gap');
  gap['radius_mm'] ??= null;
  gap['radius_known'] ??= 'assumed';
  if (textOf(FORM_KEYS.vessel) !== 'fitted') gap['vessel'] = null;
  tree['nodes'] = rowsOf(textOf('nodes')).map((row) => rowOf('nodes', row, values));
  tree['shorting_points'] = rowsOf(textOf('shorting_points')).map((row) =>
    values.get(`shorting_points.${row}`),
  );
  const screws = rowsOf(textOf('channel.screws'));
  if (screws.length > 0)
    branch(tree, 'channel')['screws'] = screws.map((row) => rowOf('channel.screws', row, values));
  const gapLaw = branch(branch(tree, 'model'), 'gap_law');
  if (gapLaw['law'] === undefined) delete branch(tree, 'model')['gap_law'];
  else {
    gapLaw['fall_ns'] ??= null;
    gapLaw['constant_cm2_atm_V2s'] ??= null;
  }
  return tree;
}

function rowOf(list: string, row: string, values: ReadonlyMap<string, EditValue>): Tree {
  const prefix = `${list}.${row}.`;
  const found: Tree = {};
  for (const [key, value] of values) {
    if (key.startsWith(prefix) && value !== undefined) found[key.slice(prefix.length)] = value;
  }
  return found;
}

function put(tree: Tree, [name = '', ...rest]: readonly string[], value: EditValue): void {
  if (rest.length === 0) tree[name] = value;
  else put(branch(tree, name), rest, value);
}

function branch(tree: Tree, name: string): Tree {
  const inner = tree[name];
  if (inner !== null && typeof inner === 'object' && !Array.isArray(inner)) return inner as Tree;
  const made: Tree = {};
  tree[name] = made;
  return made;
}
