import type { KitDoc, KitNote } from '../book/documents/kit';
import type { PersonDoc } from '../book/documents/person';
import { latestRevision, type RigDoc } from '../book/documents/rig';
import type { LabSettings } from '../book/rig-spec';
import { elapsedMs, type StampPoint } from '../book/stamp';
import { checkLapse, checkTimeLeftMs } from './check-validity';
import { COMPANY_FOR_MS } from './company';
import { DECLARED_FOR_MS, type DeclaredView } from './declared-view';
import { gasLeft } from './gas-left';
import { kitFault } from './kit-fitness';
import { standingPermit } from './readiness';
import { vesselProof } from './vessel-proof';

const HOUR_MS = 3_600_000;
const DAY_MS = 24 * HOUR_MS;

/** How long before its date something is said to be due; common practice, no source. */
export const PERMIT_NOTICE_MS = 14 * DAY_MS;
export const AUTHORISATION_NOTICE_MS = 30 * DAY_MS;
export const KIT_NOTICE_MS = 30 * DAY_MS;
export const STALE_NOTICE_MS = 3 * HOUR_MS;
/** A tag that hangs longer than this is asked about: hands are rarely in for a whole shift. */
export const TAG_ASKED_AFTER_MS = 8 * HOUR_MS;

/** Where something that is due is mended. */
export type DueLead =
  | { readonly type: 'check'; readonly purpose: 'make-safe' | 'before-firing' }
  | {
      readonly type:
        'people' | 'permit' | 'authorisation' | 'stand-down' | 'rig' | 'parts' | 'kit' | 'claims';
    }
  | { readonly type: 'firings' };

export interface DueItem {
  readonly key: string;
  readonly title: string;
  /** Why, in one sentence without the date. */
  readonly why: string;
  /** Time left, ms; null when it is due now. */
  readonly left_ms: number | null;
  /** `charge`: somebody may touch what is charged; `people`: somebody's protection; then leave to fire, then upkeep. */
  readonly danger: 'charge' | 'people' | 'leave' | 'upkeep';
  readonly lead: DueLead;
}

/** A part whose life is used up to this share; 1 is the expected life. */
export interface WornPart {
  readonly part: string;
  readonly name: string;
  readonly used: number;
  readonly words: string;
}

export interface DueFacts {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly settings: LabSettings;
  readonly person: PersonDoc | undefined;
  /** The register. */
  readonly kit: readonly KitDoc[];
  /** Worn parts and drift come from readings; left out until they are counted. */
  readonly worn?: readonly WornPart[];
  readonly drift?: string | null;
  /** Entries of this tablet whose author was left open and that nobody has claimed. */
  readonly open_author: number;
  readonly device: string;
  readonly stamp: StampPoint;
  readonly now_ms: number;
}

/** Everything that is due at this rig for this person, the soonest first and of two the more dangerous. */
export function dueItems(facts: DueFacts): readonly DueItem[] {
  return [
    ...dueState(facts),
    ...dueHands(facts),
    ...dueGuests(facts),
    ...dueCheck(facts),
    ...duePermit(facts),
    ...dueAuthorisation(facts),
    ...dueKit(facts),
    ...dueVessel(facts),
    ...dueGas(facts),
    ...dueWear(facts),
    ...dueClaims(facts),
  ].sort(soonestAndWorst);
}

const DANGERS: readonly DueItem['danger'][] = ['charge', 'people', 'leave', 'upkeep'];

/** What is due now goes by danger alone; the rest by time, since a date that comes first is met first. */
function soonestAndWorst(a: DueItem, b: DueItem): number {
  const byTime = (a.left_ms ?? 0) - (b.left_ms ?? 0);
  const byDanger = DANGERS.indexOf(a.danger) - DANGERS.indexOf(b.danger);
  return byTime === 0 ? byDanger : byTime;
}

function dueState({ view }: DueFacts): DueItem[] {
  const found: DueItem[] = view.stood_down.map((down) => ({
    key: `down/${down.entry}`,
    title: 'Rig stood down',
    why: down.why,
    left_ms: null,
    danger: 'leave',
    lead: { type: 'stand-down' },
  }));
  const makeSafe = { danger: 'charge', lead: { type: 'check', purpose: 'make-safe' } } as const;
  if (view.state === 'not-known') {
    const why = `State not known, treat as charged: ${view.why ?? 'nothing declared'}.`;
    return [{ key: 'state', title: 'Make safe', why, left_ms: null, ...makeSafe }, ...found];
  }
  const left_ms = view.age_ms === null ? null : DECLARED_FOR_MS - view.age_ms;
  if (left_ms === null || left_ms > STALE_NOTICE_MS) return found;
  const why = 'After 12 h nothing that was declared is believed: then not known, treat as charged.';
  return [{ key: 'state', title: 'State goes stale', why, left_ms, ...makeSafe }, ...found];
}

function dueHands({ rig, stamp, view }: DueFacts): DueItem[] {
  return rig.hands.flatMap((tag): DueItem[] => {
    const age = elapsedMs(tag.stamp, stamp);
    const charged = view.state !== 'shorted';
    if (!charged && age !== null && age <= TAG_ASKED_AFTER_MS) return [];
    const why = charged
      ? 'A hands-in tag hangs on a rig that is not declared shorted.'
      : 'A hands-in tag has hung for more than 8 h: ask whose hands are in.';
    return [
      {
        key: `hands/${tag.entry}`,
        title: 'Hands in',
        why,
        left_ms: null,
        danger: 'charge',
        lead: { type: 'people' },
      },
    ];
  });
}

function dueGuests({ rig, stamp }: DueFacts): DueItem[] {
  return rig.guests.flatMap((guest): DueItem[] => {
    const age = elapsedMs(guest.stamp, stamp);
    if (age !== null && age <= COMPANY_FOR_MS) return [];
    const why = 'Checked in more than 12 h ago, and counts as company no longer.';
    const title = `Check ${guest.name === '' ? 'guest' : guest.name} out`;
    return [
      {
        key: `guest/${guest.entry}`,
        title,
        why,
        left_ms: null,
        danger: 'people',
        lead: { type: 'people' },
      },
    ];
  });
}

function dueCheck({ rig, device, stamp }: DueFacts): DueItem[] {
  const check = rig.ready_check;
  if (check === null || checkLapse(rig, device, stamp) !== null) return [];
  const left_ms = checkTimeLeftMs(check, stamp);
  const why = 'It lapses after 30 min without activity and after 4 h in any case.';
  return [
    {
      key: 'check',
      title: 'Before-firing check lapses',
      why,
      left_ms,
      danger: 'leave',
      lead: { type: 'check', purpose: 'before-firing' },
    },
  ];
}

function duePermit({ rig, now_ms }: DueFacts): DueItem[] {
  const permit = standingPermit(rig, now_ms);
  const item = { key: 'permit', danger: 'leave', lead: { type: 'permit' } } as const;
  const { number } = latestRevision(rig);
  if (permit === null)
    return [
      {
        ...item,
        title: 'Firing permit',
        why: `No permit stands for revision ${number}; a reviewer grants one.`,
        left_ms: null,
      },
    ];
  const left_ms = permit.until_ms - now_ms;
  if (left_ms > PERMIT_NOTICE_MS) return [];
  const why = `The permit for revision ${number} ends; a reviewer grants the next.`;
  return [{ ...item, title: 'Firing permit lapses', why, left_ms }];
}

function dueAuthorisation({ rig, person, now_ms }: DueFacts): DueItem[] {
  if (person === undefined || person.role === null || person.role === 'reader') return [];
  const item = { key: 'authorisation', danger: 'leave', lead: { type: 'authorisation' } } as const;
  const own = person.authorisations.filter((one) => one.rig === rig.id && one.ended === null);
  const until_ms = Math.max(0, ...own.map((one) => one.until_ms));
  if (until_ms <= now_ms) {
    const why =
      own.length === 0
        ? `${person.name} is not authorised to fire this rig.`
        : `The authorisation of ${person.name} to fire this rig has expired.`;
    return [{ ...item, title: 'Authorisation', why, left_ms: null }];
  }
  const left_ms = until_ms - now_ms;
  if (left_ms > AUTHORISATION_NOTICE_MS) return [];
  const why = `That of ${person.name} to fire this rig; a reviewer renews it.`;
  return [{ ...item, title: 'Authorisation expires', why, left_ms }];
}

function dueKit({ rig, person, now_ms }: DueFacts): DueItem[] {
  const held = [...rig.kit, ...(person?.kit ?? []), ...(rig.ready_check?.kit ?? [])];
  const notes = [...new Map(held.map((note) => [note.kit, note])).values()];
  return notes.flatMap((note) => kitItem(note, now_ms));
}

function kitItem(note: KitNote, now_ms: number): DueItem[] {
  const fault = kitFault(note, now_ms);
  const name = `${note.name} ${note.number}`;
  const item = { key: `kit/${note.kit}`, lead: { type: 'kit' } } as const;
  if (fault === 'failed' || note.failed) {
    const why = 'It did not pass, or came back damaged, and must not be relied on.';
    return [{ ...item, title: name, why, left_ms: null, danger: fault === 'failed' ? 'people' : 'upkeep' }];
  }
  if (note.due_ms === null || note.due_ms - now_ms > KIT_NOTICE_MS) return [];
  const left = note.due_ms - now_ms;
  const what = note.type === 'meter' ? 'calibration' : 'inspection';
  const why = left > 0 ? `Its ${what} is due.` : `It is past its ${what} date.`;
  const danger = fault === 'expired' ? 'people' : 'upkeep';
  return [{ ...item, title: name, why, left_ms: left > 0 ? left : null, danger }];
}

function dueVessel({ rig, now_ms }: DueFacts): DueItem[] {
  const proof = vesselProof(latestRevision(rig).spec, now_ms);
  if (proof === null) return [];
  return [{ key: 'vessel', title: 'Vessel proof test', ...proof, danger: 'people', lead: { type: 'rig' } }];
}

function dueGas({ rig, kit, settings }: DueFacts): DueItem[] {
  return gasLeft(rig, kit, settings).map(({ cylinder, minutes, why }) => ({
    key: `gas/${cylinder}`,
    title: minutes === 0 ? 'Gas used up' : `Gas for ${minutes}\u2009min`,
    why,
    left_ms: minutes === 0 ? null : minutes * 60_000,
    danger: 'upkeep',
    lead: { type: 'kit' },
  }));
}

function dueWear({ worn = [], drift = null }: DueFacts): DueItem[] {
  const parts = worn.map((part): DueItem => ({
    key: `part/${part.part}`,
    title: part.name,
    why: part.words,
    left_ms: null,
    danger: part.used >= 1 ? 'people' : 'upkeep',
    lead: { type: 'parts' },
  }));
  if (drift === null) return parts;
  return [
    ...parts,
    {
      key: 'drift',
      title: 'Self-break drifts',
      why: drift,
      left_ms: null,
      danger: 'upkeep',
      lead: { type: 'firings' },
    },
  ];
}

function dueClaims({ open_author, person }: DueFacts): DueItem[] {
  if (open_author === 0 || person === undefined) return [];
  const title = open_author === 1 ? 'An entry without an author' : `${open_author} entries without an author`;
  const why = 'Written here before a PIN: whose they are is said afterwards.';
  return [{ key: 'claims', title, why, left_ms: null, danger: 'leave', lead: { type: 'claims' } }];
}
