import { foldAlignment } from './documents/alignment';
import { foldCheck } from './documents/check';
import { foldClaim } from './documents/claim';
import { getDoc, type Effect } from './documents/effect';
import { foldCorrection, foldStrike } from './documents/entries-about-entries';
import { foldFiring } from './documents/firing';
import { holdBack, markHeld } from './documents/held';
import { foldIncident } from './documents/incident';
import { foldKit } from './documents/kit';
import { foldLab } from './documents/lab';
import { foldLookup } from './documents/lookup';
import { foldNote, settleNote } from './documents/note';
import { foldPart } from './documents/part';
import { foldPerson } from './documents/person';
import { foldRig, updateRig } from './documents/rig';
import { foldSheet } from './documents/sheet';
import { traceOf, type Standing } from './documents/trace';
import type { Reason, SealedEntry, Verdict } from './entry';
import { readEntry, type EntryOf, type ReadableEntry } from './read-body';

/** Raised whenever a fold gives other documents from the same entries: every store then refolds (protocol 1.9). */
export const FOLD_VERSION = 3;

export interface Judgement {
  readonly verdict: Verdict;
  readonly reason: Reason | null;
  /** Revision that the entry took; null while only this tablet has it. */
  readonly revision: number | null;
}

/** Folds one entry with its stored verdict into the documents. Asks no rules (protocol 1.9). */
export function* foldEntry(entry: SealedEntry, judgement: Judgement): Effect {
  const at = judgement.revision;
  if (judgement.verdict === 'held-back') {
    if (judgement.reason === null) throw new Error(`held-back entry ${entry.id} has no reason`);
    yield* holdBack(entry, judgement.reason, at);
    return;
  }
  const outcome = readEntry(entry);
  if (outcome.type !== 'readable') {
    yield* markNewer(entry.subject);
    return;
  }
  yield* foldReadable(outcome.entry, {
    at,
    irregular: judgement.verdict === 'irregular' ? (judgement.reason?.code ?? 'irregular') : null,
  });
}

export function* foldReadable(entry: ReadableEntry, standing: Standing): Effect {
  switch (entry.kind) {
    case 'lab.set':
      return yield* foldLab(entry, standing);
    case 'person.joined':
    case 'person.role-set':
    case 'person.removed':
    case 'person.authorised':
    case 'person.authorisation-ended':
      return yield* foldPerson(entry, standing);
    case 'sheet.published':
    case 'sheet.retired':
      return yield* foldSheet(entry, standing);
    case 'check.opened':
    case 'check.step-done':
    case 'check.step-waived':
    case 'check.closed':
    case 'check.abandoned':
      return yield* foldCheck(entry, standing);
    case 'firing.opened':
    case 'firing.reading':
    case 'firing.shots-counted':
    case 'firing.closed':
    case 'firing.reviewed':
    case 'firing.sent-back':
      return yield* foldFiring(entry, standing);
    case 'incident.reported':
    case 'incident.answered':
    case 'incident.closed':
      return yield* foldIncident(entry, standing);
    case 'entry.corrected':
      return yield* foldCorrection(entry, standing);
    case 'entry.struck':
      return yield* foldStrike(entry, standing);
    case 'entry.adopted':
      return yield* foldAdoption(entry, standing);
    case 'entry.claimed':
      return yield* foldClaim(entry, standing);
    case 'lookup.kept':
      return yield* foldLookup(entry, standing);
    case 'part.fitted':
    case 'part.retired':
      return yield* foldPart(entry, standing);
    case 'kit.added':
    case 'kit.inspected':
    case 'kit.issued':
    case 'kit.returned':
      return yield* foldKit(entry, standing);
    case 'alignment.measured':
    case 'alignment.adjusted':
    case 'alignment.arc-seen':
      return yield* foldAlignment(entry, standing);
    case 'note.written':
    case 'note.amended':
    case 'photo.attached':
    case 'trace.attached':
      return yield* foldNote(entry, standing);
    case 'parting.settled':
      return (yield* settleNote(entry)) ? undefined : yield* foldRig(entry, standing);
    case 'noise.counted':
      return;
    default:
      return yield* foldRig(entry, standing);
  }
}

/** The effect of an adopted entry stands at the revision of the adoption; its first verdict never changes (protocol 3.4). */
function* foldAdoption(entry: EntryOf<'entry.adopted'>, standing: Standing): Effect {
  for (const id of entry.body.adopts) {
    const held = yield* getDoc('held', id);
    if (held === undefined || held.adopted !== null) continue;
    yield* markHeld(id, { adopted: traceOf(entry.meta, standing) });
    const outcome = readEntry(held.entry);
    if (outcome.type === 'readable') yield* foldReadable(outcome.entry, { at: standing.at, irregular: null });
  }
}

/** An entry that this app cannot read makes the rig that it is about not ready here. */
function* markNewer(subject: string): Effect {
  const below =
    (yield* getDoc('firing', subject)) ??
    (yield* getDoc('check', subject)) ??
    (yield* getDoc('incident', subject));
  yield* updateRig(below?.parent ?? subject, (rig) => ({ ...rig, needs_newer_app: true }));
}
