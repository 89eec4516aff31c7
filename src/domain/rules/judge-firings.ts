import { getDoc, type Effect } from '../book/documents/effect';
import type { FiringDoc } from '../book/documents/firing';
import { revisionById, rulingEnvelope, unliftedStandDowns, type RigDoc } from '../book/documents/rig';
import type { EntryOf } from '../book/read-body';
import { anotherReviewerExists, momentOf, type JudgeContext } from './judge-context';
import { objection, type Objection } from './objection';
import { missingToFire, standingPermit } from './readiness';

type FiringEntry = EntryOf<
  | 'firing.opened'
  | 'firing.reading'
  | 'firing.shots-counted'
  | 'firing.closed'
  | 'firing.reviewed'
  | 'firing.sent-back'
>;

export function* firingObjection(entry: FiringEntry, context: JudgeContext): Effect<Objection | null> {
  if (entry.kind === 'firing.opened') return yield* openingObjection(entry, context);
  const firing = yield* getDoc('firing', entry.meta.subject);
  if (firing === undefined) return objection('unknown-firing', 'This firing is not in the Book.');
  switch (entry.kind) {
    case 'firing.reading':
    case 'firing.shots-counted': {
      if (firing.closed !== null)
        return objection('firing-closed', 'The firing was closed before.', firing.closed.at);
      const rig = yield* getDoc('rig', firing.parent);
      return rig === undefined
        ? objection('unknown-rig', 'The rig of this firing is not in the Book.')
        : whileFiring(entry, firing, rig);
    }
    case 'firing.closed':
      return firing.closed === null
        ? null
        : objection('firing-closed', 'The firing was closed before.', firing.closed.at);
    case 'firing.reviewed':
    case 'firing.sent-back':
      return yield* reviewObjection(entry, firing);
  }
}

function* openingObjection(entry: EntryOf<'firing.opened'>, context: JudgeContext): Effect<Objection | null> {
  const { rig, rig_revision, check, permit, unready } = entry.body;
  const rigDoc = yield* getDoc('rig', rig);
  if (rigDoc === undefined) return objection('unknown-rig', 'This rig is not in the Book.');
  if (revisionById(rigDoc, rig_revision) === undefined)
    return objection('unknown-revision', 'This revision is not in the Book.');
  // Recorded as unready: it says itself what was missing, and the reviewer sees it as such.
  if (unready !== null) return null;
  const person = entry.meta.author === null ? undefined : yield* getDoc('person', entry.meta.author);
  const lab = yield* getDoc('lab', entry.meta.lab);
  const { device, stamp } = entry.meta;
  const [first] = missingToFire({
    rig: rigDoc,
    person,
    lab,
    device,
    stamp,
    now_ms: momentOf(stamp, context),
    filling: false,
  });
  if (first !== undefined) return objection(first.code, first.words, first.since);
  if (!rigDoc.heads.includes(rig_revision))
    return objection('superseded-revision', 'The firing names an earlier revision of the rig.');
  if (check !== rigDoc.ready_check?.check)
    return objection('other-check', 'The firing names another check than the one that stands.');
  if (permit !== standingPermit(rigDoc, momentOf(stamp, context))?.entry)
    return objection('other-permit', 'The firing names another permit than the one that stands.');
  return null;
}

function whileFiring(
  entry: EntryOf<'firing.reading' | 'firing.shots-counted'>,
  firing: FiringDoc,
  rig: RigDoc,
): Objection | null {
  const [down] = unliftedStandDowns(rig);
  if (down !== undefined) return objection('stood-down', 'The rig was stood down.', down.at);
  const [tag] = rig.hands;
  if (tag !== undefined) return objection('hands-in', 'A hands-in tag was on the rig.', tag.at);
  const permit = rig.permits.find((one) => one.entry === firing.permit);
  if (permit !== undefined && permit.withdrawn !== null)
    return objection('permit-withdrawn', 'The firing permit was withdrawn.', permit.withdrawn.at);
  const { ready_check } = rig;
  if (firing.check !== null && ready_check?.check === firing.check && ready_check.voided !== null) {
    return objection(`check-${ready_check.voided.code}`, ready_check.voided.words, ready_check.voided.at);
  }
  return entry.kind === 'firing.reading'
    ? envelopeObjection(entry, permit?.envelope ?? rulingEnvelope(rig))
    : null;
}

function envelopeObjection(
  entry: EntryOf<'firing.reading'>,
  envelope: RigDoc['permits'][number]['envelope'],
): Objection | null {
  const { voltage_kV, pressure_bar_g, rate_Hz } = entry.body;
  if (voltage_kV > envelope.max_kV)
    return objection('beyond-envelope', `The voltage is beyond the limit of ${envelope.max_kV} kV.`);
  if (pressure_bar_g > envelope.max_bar_g)
    return objection('beyond-envelope', `The pressure is beyond the limit of ${envelope.max_bar_g} bar(g).`);
  if (rate_Hz !== null && rate_Hz > envelope.max_rate_Hz)
    return objection('beyond-envelope', `The rate is beyond the limit of ${envelope.max_rate_Hz} Hz.`);
  return null;
}

function* reviewObjection(
  entry: EntryOf<'firing.reviewed' | 'firing.sent-back'>,
  firing: FiringDoc,
): Effect<Objection | null> {
  if (firing.closed === null) return objection('firing-open', 'The firing is still open.', firing.opened.at);
  const { author, lab } = entry.meta;
  const own = firing.opened.by === author;
  if (own && (yield* anotherReviewerExists(lab, author))) {
    return objection('own-firing', 'Nobody reviews a firing of their own while another reviewer exists.');
  }
  return null;
}
