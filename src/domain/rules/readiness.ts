import type { KitNote } from '../book/documents/kit';
import type { LabDoc } from '../book/documents/lab';
import type { PersonDoc } from '../book/documents/person';
import { latestRevision, unliftedStandDowns, type Permit, type RigDoc } from '../book/documents/rig';
import type { StampPoint } from '../book/stamp';
import { checkLapse } from './check-validity';
import { hasCompany } from './company';
import { kitFault } from './kit-fitness';
import { isRole } from './roles';

export type Mender = 'you' | 'reviewer' | 'lead' | 'whoever has hands in' | 'a newer app';

/** One thing that stands between a person and firing, and who can mend it. */
export interface Missing {
  readonly code: string;
  readonly words: string;
  readonly mend: Mender;
  /** Revision since which it stands, for "knew" and "could not know" (protocol 1.3). */
  readonly since: number | null;
}

export interface ReadinessInput {
  readonly rig: RigDoc;
  readonly person: PersonDoc | undefined;
  /** Whose settings say whether somebody may work alone. */
  readonly lab: LabDoc | undefined;
  readonly device: string;
  /** Now, or the moment that the entry was written. */
  readonly stamp: StampPoint;
  /** Best knowledge of the true time, for dates: server time plus monotonic time since (protocol 1.8). */
  readonly now_ms: number;
  /** The mirror has not been filled to its head yet. */
  readonly filling: boolean;
}

/** Everything that is missing before this person may open a firing on this rig from this tablet. Empty means ready. */
export function missingToFire(input: ReadinessInput): readonly Missing[] {
  const { rig } = input;
  return [
    ...missingOfRig(input),
    ...missingOfPerson(input),
    ...(rig.heads.length > 1
      ? [missing('parting', 'Two revisions of this rig stand against each other.', 'reviewer')]
      : missingPermit(input)),
    ...missingCheck(input),
    ...missingKit(input),
    ...missingCompany(input),
  ];
}

/** The permit that covers the rig's latest revision now, if there is one. */
export function standingPermit(rig: RigDoc, now_ms: number): Permit | null {
  if (rig.heads.length !== 1) return null;
  const covering = permitsOfHead(rig).filter(
    (permit) => permit.withdrawn === null && permit.until_ms > now_ms,
  );
  return covering.at(-1) ?? null;
}

function missingOfRig({ rig, filling }: ReadinessInput): Missing[] {
  const found: Missing[] = [];
  if (filling) found.push(missing('filling', 'This tablet is still filling its Book.', 'you'));
  if (rig.needs_newer_app)
    found.push(
      missing('newer-app', 'An entry about this rig needs a newer version of the app.', 'a newer app'),
    );
  for (const down of unliftedStandDowns(rig)) {
    found.push(since(missing('stood-down', `The rig is stood down: ${down.why}`, 'reviewer'), down.at));
  }
  for (const tag of rig.hands) {
    found.push(since(missing('hands-in', 'A hands-in tag is on the rig.', 'whoever has hands in'), tag.at));
  }
  return found;
}

function missingOfPerson({ rig, person, now_ms }: ReadinessInput): Missing[] {
  if (person === undefined || !isRole(person.role, 'operator', 'reviewer', 'lead')) {
    return [
      since(missing('role', 'Your role does not include firing.', 'lead'), person?.role_set.at ?? null),
    ];
  }
  const own = person.authorisations.filter((one) => one.rig === rig.id);
  const standing = own.find((one) => one.ended === null && one.until_ms > now_ms);
  if (standing !== undefined) return [];
  const last = own.at(-1);
  if (last === undefined)
    return [missing('not-authorised', 'You are not authorised to fire this rig.', 'reviewer')];
  if (last.ended !== null)
    return [
      since(
        missing('authorisation-ended', 'Your authorisation to fire this rig was ended.', 'reviewer'),
        last.ended.at,
      ),
    ];
  return [missing('authorisation-expired', 'Your authorisation to fire this rig has expired.', 'reviewer')];
}

function missingPermit({ rig, now_ms }: ReadinessInput): Missing[] {
  if (standingPermit(rig, now_ms) !== null) return [];
  const { number } = latestRevision(rig);
  const last = permitsOfHead(rig).at(-1);
  if (last === undefined) {
    const words =
      rig.permits.length === 0
        ? 'No firing permit has been granted.'
        : `The permit was for an earlier revision; revision ${number} has none.`;
    return [missing('no-permit', words, 'reviewer')];
  }
  if (last.withdrawn !== null)
    return [
      since(missing('permit-withdrawn', 'The firing permit was withdrawn.', 'reviewer'), last.withdrawn.at),
    ];
  return [missing('permit-lapsed', 'The firing permit has lapsed.', 'reviewer')];
}

function missingCheck({ rig, device, stamp }: ReadinessInput): Missing[] {
  const lapse = checkLapse(rig, device, stamp);
  return lapse === null ? [] : [since(missing(lapse.code, lapse.words, 'you'), lapse.since)];
}

/** Kit that stays with the rig, that the person holds, or that the standing check named. */
function missingKit({ rig, person, now_ms }: ReadinessInput): Missing[] {
  const held = person?.kit ?? [];
  const known = new Set([...rig.kit, ...held].map((note) => note.kit));
  const named = (rig.ready_check?.kit ?? []).filter((note) => !known.has(note.kit));
  return [
    ...rig.kit.map((note) => kitWords(note, now_ms, 'which stays with this rig')),
    ...held.map((note) => kitWords(note, now_ms, 'which you hold')),
    ...named.map((note) => kitWords(note, now_ms, 'which the check names')),
  ].filter((one) => one !== null);
}

function kitWords(note: KitNote, now_ms: number, where: string): Missing | null {
  const fault = kitFault(note, now_ms);
  if (fault === null) return null;
  const what = `${note.name} ${note.number}, ${where},`;
  return fault === 'failed'
    ? missing('kit-failed', `${what} did not pass and must not be relied on.`, 'you')
    : missing('kit-expired', `${what} is past its inspection or calibration date.`, 'you');
}

function missingCompany({ rig, person, lab, device, stamp }: ReadinessInput): Missing[] {
  if (lab?.settings.working_alone !== 'forbidden' || person === undefined) return [];
  if (hasCompany(rig, person.id, { device, stamp })) return [];
  const words = 'This lab forbids working alone: have a second person in the check, or check somebody in.';
  return [missing('working-alone', words, 'you')];
}

function permitsOfHead(rig: RigDoc): readonly Permit[] {
  return rig.permits.filter((permit) => rig.heads.includes(permit.rig_revision));
}

function missing(code: string, words: string, mend: Mender): Missing {
  return { code, words, mend, since: null };
}

function since(one: Missing, revision: number | null): Missing {
  return { ...one, since: revision };
}
