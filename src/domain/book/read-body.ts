import { bodySchema, isKind, versionOf, type BodyOf, type Kind } from './kinds';
import type { SealedEntry } from './entry';

export type EntryMeta = Omit<SealedEntry, 'kind' | 'version' | 'body' | 'body_sha' | 'entry_sha'>;

/** An entry whose body was understood: what rules and folds read. */
export type ReadableEntry = {
  [K in Kind]: { readonly kind: K; readonly meta: EntryMeta; readonly body: BodyOf<K> };
}[Kind];
export type EntryOf<K extends Kind> = Extract<ReadableEntry, { kind: K }>;

export type ReadOutcome =
  | { readonly type: 'readable'; readonly entry: ReadableEntry }
  /** A kind or version of a newer app: kept as bytes (protocol 1.9). */
  | { readonly type: 'newer'; readonly words: string }
  | { readonly type: 'unreadable'; readonly words: string };

/** Parses and checks the body's text. Upcasting of older versions belongs here and nowhere else (protocol 3.3). */
export function readEntry(entry: SealedEntry): ReadOutcome {
  const { kind } = entry;
  if (!isKind(kind))
    return { type: 'newer', words: `This version does not know entries of the kind ${kind}.` };
  if (entry.version > versionOf(kind)) {
    return { type: 'newer', words: `This version does not know ${kind} in version ${entry.version}.` };
  }
  const outcome = readBody(kind, entry.body);
  if (outcome.type === 'unreadable') return outcome;
  const {
    body: _text,
    body_sha: _bodySha,
    entry_sha: _entrySha,
    kind: _kind,
    version: _version,
    ...meta
  } = entry;
  return { type: 'readable', entry: { kind, meta, body: outcome.body } as ReadableEntry };
}

export type BodyOutcome<K extends Kind> =
  { readonly type: 'ok'; readonly body: BodyOf<K> } | { readonly type: 'unreadable'; readonly words: string };

export function readBody<K extends Kind>(kind: K, text: string): BodyOutcome<K> {
  let raw: unknown;
  try {
    raw = JSON.parse(text);
  } catch {
    return { type: 'unreadable', words: 'The body is not JSON.' };
  }
  return checkBody(kind, raw);
}

/** Checks the fields of a body that has been parsed already. */
export function checkBody<K extends Kind>(kind: K, raw: unknown): BodyOutcome<K> {
  const parsed = bodySchema(kind).safeParse(raw);
  if (parsed.success) return { type: 'ok', body: parsed.data as BodyOf<K> };
  const [first] = parsed.error.issues;
  const where = first === undefined || first.path.length === 0 ? 'the body' : first.path.join('.');
  return { type: 'unreadable', words: `In ${where}: ${first?.message ?? 'does not fit'}.` };
}
