import type { Effect } from '../book/documents/effect';
import { getDoc } from '../book/documents/effect';
import { revisionById } from '../book/documents/rig';
import type { Reason, SealedEntry } from '../book/entry';
import { readEntry, type EntryOf, type ReadableEntry } from '../book/read-body';
import { adoptionObjection } from './judge-adoption';
import { bookObjection } from './judge-book';
import { checkObjection } from './judge-checks';
import { firingObjection } from './judge-firings';
import { incidentObjection } from './judge-incidents';
import { kitObjection } from './judge-kit';
import { noteObjection } from './judge-notes';
import { partObjection } from './judge-parts';
import { peopleObjection } from './judge-people';
import { rigObjection } from './judge-rigs';
import type { Judged, JudgeContext } from './judge-context';
import { isLoosening } from './loosening';
import { objection, type Objection } from './objection';
import { KIND_RULES, mayAppend, type EntryClass } from './roles';
import { namedIds } from './references';

const APPLIED: Judged = { verdict: 'applied', reason: null };

/**
 * The one judge (protocol 3.4), asked by the server with the roles held now, and by the tablet to know beforehand.
 * Observations are never refused; acts are held back with the reason.
 */
export function* judgeEntry(entry: SealedEntry, context: JudgeContext): Effect<Judged> {
  const outcome = readEntry(entry);
  if (outcome.type === 'newer')
    return heldBack({ cause: 'version', code: 'newer', words: outcome.words, knew: null });
  if (outcome.type === 'unreadable')
    return heldBack({ cause: 'unreadable', code: 'unreadable', words: outcome.words, knew: null });
  return yield* judgeReadable(outcome.entry, context);
}

export function* judgeReadable(entry: ReadableEntry, context: JudgeContext): Effect<Judged> {
  const kind = yield* entryClass(entry);
  const held = yield* namesHeldBack(entry, kind);
  if (held !== null)
    return heldBack({ cause: 'follows', code: 'follows', words: held.words, knew: null, follows: held.id });
  if (kind === 'act' && context.session !== entry.meta.author) {
    return heldBack({
      cause: 'confirm',
      code: 'confirm',
      words: 'This needs its author to sign in and confirm it.',
      knew: null,
    });
  }
  const found = (yield* authorObjection(entry)) ?? (yield* kindObjection(entry, context));
  if (found === null) return APPLIED;
  const reason = ruleReason(found, entry);
  return kind === 'act' ? heldBack(reason) : { verdict: 'irregular', reason };
}

/** Loosening a rig is an act; everything else is what the table says (protocol 1.2). */
export function* entryClass(entry: ReadableEntry): Effect<EntryClass> {
  if (entry.kind !== 'rig.revised') return KIND_RULES[entry.kind].class;
  return (yield* loosens(entry)) ? 'act' : 'observation';
}

function* loosens(entry: EntryOf<'rig.revised'>): Effect<boolean> {
  const rig = yield* getDoc('rig', entry.meta.subject);
  const before = rig === undefined ? undefined : revisionById(rig, entry.body.based_on);
  return before !== undefined && isLoosening(before.spec, entry.body.spec);
}

/** An act, a correction or a strike that names a held-back entry shares its fate (protocol 3.4). */
function* namesHeldBack(
  entry: ReadableEntry,
  kind: EntryClass,
): Effect<{ readonly id: string; readonly words: string } | null> {
  if (entry.kind === 'entry.adopted') return null;
  if (kind === 'observation' && entry.kind !== 'entry.corrected' && entry.kind !== 'entry.struck')
    return null;
  for (const id of namedIds(entry)) {
    const held = yield* getDoc('held', id);
    if (held === undefined || held.adopted !== null) continue;
    const dismissesOwn = entry.kind === 'entry.struck' && held.entry.author === entry.meta.author;
    if (!dismissesOwn) return { id, words: 'It names an entry that is itself held back.' };
  }
  return null;
}

function* authorObjection(entry: ReadableEntry): Effect<Objection | null> {
  const { author } = entry.meta;
  if (author === null) {
    if (KIND_RULES[entry.kind].openAuthor === true) return null;
    return objection('author-open', 'This needs an author.');
  }
  const person = yield* getDoc('person', author);
  if (person === undefined) return objection('not-a-member', 'The author is not a member of this lab.');
  if (mayAppend(person.role, entry.kind)) return null;
  const words =
    person.role === null
      ? 'The author was removed from this lab.'
      : `The role ${person.role} does not include this.`;
  return objection('role', words, person.role_set.at);
}

function* kindObjection(entry: ReadableEntry, context: JudgeContext): Effect<Objection | null> {
  const { kind } = entry;
  switch (kind) {
    case 'check.opened':
    case 'check.step-done':
    case 'check.step-waived':
    case 'check.closed':
    case 'check.abandoned':
    case 'sheet.published':
    case 'sheet.retired':
      return yield* checkObjection(entry, context);
    case 'firing.opened':
    case 'firing.reading':
    case 'firing.shots-counted':
    case 'firing.closed':
    case 'firing.reviewed':
    case 'firing.sent-back':
      return yield* firingObjection(entry, context);
    case 'incident.reported':
    case 'incident.answered':
    case 'incident.closed':
      return yield* incidentObjection(entry);
    case 'lab.set':
    case 'person.joined':
    case 'person.role-set':
    case 'person.removed':
    case 'person.authorised':
    case 'person.authorisation-ended':
      return yield* peopleObjection(entry, context);
    case 'entry.adopted':
      return yield* adoptionObjection(entry, context, judgeReadable);
    case 'entry.corrected':
    case 'entry.struck':
    case 'entry.claimed':
      return yield* bookObjection(entry);
    case 'part.fitted':
    case 'part.retired':
    case 'alignment.measured':
    case 'alignment.adjusted':
    case 'alignment.arc-seen':
      return yield* partObjection(entry);
    case 'kit.added':
    case 'kit.inspected':
    case 'kit.issued':
    case 'kit.returned':
      return yield* kitObjection(entry, context);
    case 'note.written':
    case 'note.amended':
    case 'photo.attached':
    case 'trace.attached':
      return yield* noteObjection(entry);
    case 'lookup.kept':
    case 'noise.counted':
      return null;
    default:
      return yield* rigObjection(entry, context);
  }
}

function ruleReason(found: Objection, entry: ReadableEntry): Reason {
  const knew = found.since === null ? null : found.since <= entry.meta.base.revision;
  const { code, words } = found;
  return { cause: 'rule', code, words, knew };
}

function heldBack(reason: Reason): Judged {
  return { verdict: 'held-back', reason };
}
