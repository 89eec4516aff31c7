import { MAX_BODY_CHARS } from '../../domain/book/entry';
import { versionOf, type BodyOf, type Kind } from '../../domain/book/kinds';
import { checkBody } from '../../domain/book/read-body';

/** Entries that are their own subject. */
type OwnSubject =
  | 'rig.created'
  | 'sheet.published'
  | 'check.opened'
  | 'firing.opened'
  | 'kit.added'
  | 'note.written'
  | 'photo.attached'
  | 'trace.attached';
/** Kinds whose running number is taken in the transaction that appends them (protocol 1.5). */
type Numbered = 'firing.opened' | 'rig.created' | 'rig.revised';

/** Screens build bodies from documents, which nobody may change. */
type Frozen<T> = T extends readonly (infer Item)[]
  ? readonly Frozen<Item>[]
  : T extends object
    ? { readonly [Key in keyof T]: Frozen<T[Key]> }
    : T;

export type DraftBody<K extends Kind> = Frozen<K extends Numbered ? Omit<BodyOf<K>, 'number'> : BodyOf<K>>;

interface DraftPeople {
  /** Left out: the person who is open, or nobody while locked. */
  readonly author?: string | null;
  readonly witness?: string | null;
}

export type EntryDraft = {
  [K in Kind]: { readonly kind: K; readonly body: DraftBody<K> } & DraftPeople &
    (K extends OwnSubject | 'lab.set' ? { readonly subject?: never } : { readonly subject: string });
}[Kind];

export interface ReadDraft {
  readonly kind: Kind;
  readonly version: number;
  /** An id, 'itself' or 'lab'. */
  readonly subject: string;
  readonly body: Readonly<Record<string, unknown>>;
  readonly number: 'firing' | 'revision' | null;
}

export type DraftOutcome =
  | { readonly type: 'ok'; readonly draft: ReadDraft }
  | { readonly type: 'too-large'; readonly words: string }
  | { readonly type: 'unreadable'; readonly words: string };

const ITS_OWN_SUBJECT: ReadonlySet<Kind> = new Set<OwnSubject>([
  'rig.created',
  'sheet.published',
  'check.opened',
  'firing.opened',
  'kit.added',
  'note.written',
  'photo.attached',
  'trace.attached',
]);
/** Room for the salt and the longest number. */
const ENVELOPE_CHARS = 100;

/** Checks a draft's body against its kind, so that nothing is appended that no fold could read. */
export function readDraft(draft: EntryDraft): DraftOutcome {
  const number = numberKind(draft.kind);
  const checked = checkBody(draft.kind, number === null ? draft.body : { ...draft.body, number: '?' });
  if (checked.type === 'unreadable') return checked;
  const body = checked.body as Readonly<Record<string, unknown>>;
  if (JSON.stringify(body).length + ENVELOPE_CHARS > MAX_BODY_CHARS)
    return {
      type: 'too-large',
      words: 'This is longer than an entry can hold. Shorten it or split it in two.',
    };
  return {
    type: 'ok',
    draft: { kind: draft.kind, version: versionOf(draft.kind), subject: subjectOf(draft), body, number },
  };
}

function numberKind(kind: Kind): ReadDraft['number'] {
  if (kind === 'firing.opened') return 'firing';
  return kind === 'rig.created' || kind === 'rig.revised' ? 'revision' : null;
}

function subjectOf(draft: EntryDraft): string {
  if (draft.kind === 'lab.set') return 'lab';
  return ITS_OWN_SUBJECT.has(draft.kind) ? 'itself' : (draft.subject ?? 'itself');
}
