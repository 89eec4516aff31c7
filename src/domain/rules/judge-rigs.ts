import { getDoc, type Effect } from '../book/documents/effect';
import {
  headRevisions,
  latestRevision,
  revisionById,
  unliftedStandDowns,
  type RigDoc,
  type StandDown,
} from '../book/documents/rig';
import type { EntryOf } from '../book/read-body';
import { elapsedMs, type StampPoint } from '../book/stamp';
import { anotherReviewerExists, type JudgeContext } from './judge-context';
import { noteParting } from './judge-notes';
import { objection, type Objection } from './objection';

/** How long an accidental stand-down may be taken back by its author, in the same page life (protocol 1.4). */
export const RETRACT_WITHIN_MS = 120_000;

/** Whether `person` may still take this stand-down back: their own, in this page life, within two minutes. */
export function isRetractable(down: StandDown, person: string | null, now: StampPoint): boolean {
  if (person === null || down.lifted !== null || down.by !== person || down.stamp.page_life !== now.page_life)
    return false;
  const age = elapsedMs(down.stamp, now);
  return age !== null && age <= RETRACT_WITHIN_MS;
}

type RigEntry = EntryOf<
  | 'rig.created'
  | 'rig.revised'
  | 'rig.declared'
  | 'rig.stood-down'
  | 'rig.stand-down-retracted'
  | 'rig.returned'
  | 'hands.in'
  | 'hands.out'
  | 'guest.in'
  | 'guest.out'
  | 'gas.changed'
  | 'permit.asked'
  | 'permit.granted'
  | 'permit.withdrawn'
  | 'parting.settled'
>;

export function* rigObjection(entry: RigEntry, context: JudgeContext): Effect<Objection | null> {
  if (entry.kind === 'rig.created') {
    return entry.meta.subject === entry.meta.id
      ? null
      : objection('subject', 'A new rig is its own subject.');
  }
  if (entry.kind === 'parting.settled') {
    const ofNote = yield* noteParting(entry);
    if (ofNote !== 'not-a-note') return ofNote;
  }
  const rig = yield* getDoc('rig', entry.meta.subject);
  if (rig === undefined) return objection('unknown-rig', 'This rig is not in the Book.');
  switch (entry.kind) {
    case 'rig.revised':
      return revisionById(rig, entry.body.based_on) === undefined
        ? objection('unknown-revision', 'The revision that it is based on is not in the Book.')
        : null;
    case 'rig.stand-down-retracted':
      return retractionObjection(rig, entry);
    case 'rig.returned':
      return returnObjection(rig, entry);
    case 'hands.out':
      return tagObjection(rig, entry);
    case 'guest.in':
      return yield* guestObjection(entry);
    case 'guest.out':
      return rig.guests.some((guest) => guest.entry === entry.body.guest)
        ? null
        : objection('unknown-guest', 'This guest is not at the rig.');
    case 'permit.asked':
      return headObjection(rig, entry.body.rig_revision);
    case 'permit.granted':
      return yield* grantObjection(rig, entry, context);
    case 'permit.withdrawn':
      return rig.permits.some((permit) => permit.entry === entry.body.permit)
        ? null
        : objection('unknown-permit', 'This permit is not in the Book.');
    case 'parting.settled':
      return partingObjection(rig, entry);
    default:
      return null;
  }
}

/** Somebody else's tag comes off only with words: a tag that vanishes without a reason protects nobody. */
function tagObjection(rig: RigDoc, entry: EntryOf<'hands.out'>): Objection | null {
  const tag = rig.hands.find((one) => one.entry === entry.body.tag);
  if (tag === undefined) return objection('unknown-tag', 'This hands-in tag is not on the rig.');
  if (tag.by === entry.meta.author || (entry.body.words ?? '').trim() !== '') return null;
  return objection(
    'another-tag',
    'Taking out somebody else’s tag needs words: say why it may come off.',
    tag.at,
  );
}

function* guestObjection(entry: EntryOf<'guest.in'>): Effect<Objection | null> {
  const { person } = entry.body;
  if (person === null) return null;
  if (person === entry.meta.author) return objection('own-company', 'Nobody keeps themselves company.');
  return (yield* getDoc('person', person)) === undefined
    ? objection('unknown-person', 'This person is not in the Book.')
    : null;
}

function* grantObjection(
  rig: RigDoc,
  entry: EntryOf<'permit.granted'>,
  context: JudgeContext,
): Effect<Objection | null> {
  const { rig_revision, envelope, until_ms } = entry.body;
  const head = headObjection(rig, rig_revision);
  if (head !== null) return head;
  if (until_ms <= context.now_ms) return objection('permit-over', 'The permit would already have lapsed.');
  const { author } = entry.meta;
  const revision = latestRevision(rig);
  const limits = revision.spec.envelope;
  if (
    envelope.max_kV > limits.max_kV ||
    envelope.max_bar_g > limits.max_bar_g ||
    envelope.max_rate_Hz > limits.max_rate_Hz
  ) {
    return objection(
      'envelope-beyond-rig',
      `The permit reaches beyond the limits of revision ${revision.number}.`,
      revision.at,
    );
  }
  const asked = rig.permits_asked.some((one) => one.rig_revision === rig_revision && one.by === author);
  if ((asked || revision.by === author) && (yield* anotherReviewerExists(entry.meta.lab, author))) {
    return objection(
      'own-permit',
      'Nobody grants a permit for their own revision or request while another reviewer exists.',
    );
  }
  return null;
}

/** The revision must be the only latest one. */
function headObjection(rig: RigDoc, id: string): Objection | null {
  const revision = revisionById(rig, id);
  if (revision === undefined) return objection('unknown-revision', 'This revision is not in the Book.');
  if (rig.heads.length > 1) {
    return objection(
      'parting',
      'Two revisions of this rig stand against each other; settle the parting first.',
      headRevisions(rig).at(-1)?.at ?? null,
    );
  }
  if (rig.heads[0] === id) return null;
  const latest = latestRevision(rig);
  return objection(
    'superseded-revision',
    `Revision ${revision.number} is no longer the latest; revision ${latest.number} is.`,
    latest.at,
  );
}

function retractionObjection(rig: RigDoc, entry: EntryOf<'rig.stand-down-retracted'>): Objection | null {
  const down = rig.stand_downs.find((one) => one.entry === entry.body.stand_down);
  if (down === undefined) return objection('unknown-stand-down', 'This stand-down is not in the Book.');
  if (down.lifted !== null)
    return objection('already-lifted', 'This stand-down was lifted before.', down.lifted.at);
  if (down.by !== entry.meta.author)
    return objection('not-the-author', 'Only the author of a stand-down may retract it.', down.at);
  const age =
    down.stamp.page_life === entry.meta.stamp.page_life ? elapsedMs(down.stamp, entry.meta.stamp) : null;
  if (age === null || age > RETRACT_WITHIN_MS)
    return objection('too-late', 'A stand-down may be retracted only within two minutes.', down.at);
  return null;
}

function returnObjection(rig: RigDoc, entry: EntryOf<'rig.returned'>): Objection | null {
  const standing = unliftedStandDowns(rig).map((one) => one.entry);
  const unknown = entry.body.lifts.filter((id) => !standing.includes(id));
  return unknown.length === 0
    ? null
    : objection('nothing-to-lift', 'It names a stand-down that does not stand.');
}

function partingObjection(rig: RigDoc, entry: EntryOf<'parting.settled'>): Objection | null {
  const { settles, keeps } = entry.body;
  if (rig.heads.length < 2) return objection('no-parting', 'There is no parting to settle.');
  const namesAll = rig.heads.every((head) => settles.includes(head)) && settles.includes(keeps);
  return namesAll
    ? null
    : objection(
        'parting-not-named',
        'It must name every revision of the parting and keep one of them.',
        headRevisions(rig).at(-1)?.at ?? null,
      );
}
