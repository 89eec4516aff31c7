import type { RigSpec } from '../../../domain/book/rig-spec';

/** Every field of a rig as the text that stands in it, by the field's key. */
export type Texts = Readonly<Record<string, string>>;

/** Gives the text of a field as it stands: typed, suggested, or of the revision underneath. */
export type TextOf = (key: string) => string;

/** Lists of a rig: their key holds the names of their rows, and each row's fields carry that name. */
export const LISTS = ['nodes', 'shorting_points', 'channel.screws'] as const;
export type ListKey = (typeof LISTS)[number];

/** Choices that decide which fields there are, and stand in no spec by themselves. */
export const FORM_KEYS = { vessel: 'gap.vessel', gapLaw: 'model.gap_law', channelLaw: 'model.channel_law' };

/** A spec laid out as texts, so that editing it is one map from key to text. */
export function textsOf(spec: RigSpec): Texts {
  const texts: Record<string, string> = {
    [FORM_KEYS.vessel]: spec.gap.vessel === null ? 'none' : 'fitted',
    [FORM_KEYS.gapLaw]: spec.model.gap_law === undefined ? 'usual' : 'given',
    [FORM_KEYS.channelLaw]: spec.model.channel_law === undefined ? 'usual' : 'given',
  };
  collect('', spec, texts);
  for (const list of LISTS) texts[list] ??= '';
  return texts;
}

/** Rows of a list, in order. */
export function rowsOf(text: string | undefined): readonly string[] {
  return (text ?? '').split(' ').filter((row) => row !== '');
}

export function rowsText(rows: readonly string[]): string {
  return rows.join(' ');
}

/** A name that no row of the list has or had: texts of a row that was taken out must not come back in another. */
export function newRow(list: ListKey, texts: Texts): string {
  const taken = Object.keys(texts)
    .filter((key) => key.startsWith(`${list}.`))
    .map((key) => key.slice(list.length + 1).split('.')[0] ?? '');
  const rows = new Set([...taken, ...rowsOf(texts[list])]);
  let n = rows.size;
  while (rows.has(`r${n}`)) n += 1;
  return `r${n}`;
}

function collect(prefix: string, value: object, texts: Record<string, string>): void {
  const names: string[] = [];
  for (const [name, inner] of Object.entries(value) as [string, unknown][]) {
    const key = prefix === '' ? name : `${prefix}.${name}`;
    const row = Array.isArray(value) ? `${prefix}.r${name}` : key;
    names.push(`r${name}`);
    if (inner !== null && typeof inner === 'object') collect(row, inner, texts);
    else if (inner === null || inner === undefined) texts[row] ??= '';
    else texts[row] = textOf(inner);
  }
  if (Array.isArray(value)) texts[prefix] = rowsText(names);
}

function textOf(leaf: unknown): string {
  if (typeof leaf === 'boolean') return leaf ? 'yes' : 'no';
  return typeof leaf === 'number' || typeof leaf === 'string' ? String(leaf) : '';
}
