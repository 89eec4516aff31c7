import type { BodyOf } from '../kinds';
import type { EntryOf } from '../read-body';
import type { RigSpec } from '../rig-spec';
import { elapsedMs, type StampPoint } from '../stamp';
import { getDoc, putDoc, type Effect } from './effect';
import type { KitNote } from './kit';
import { traceOf, type Standing, type Trace } from './trace';

export interface RigRevision extends Trace {
  readonly number: string;
  readonly spec: RigSpec;
  readonly based_on: string | null;
  readonly why: string;
}

export interface StandDown extends Trace {
  readonly why: string;
  /** The `rig.returned` or retraction that lifted it. */
  readonly lifted: Trace | null;
}

export interface Permit extends Trace {
  readonly rig_revision: string;
  readonly envelope: BodyOf<'permit.granted'>['envelope'];
  readonly until_ms: number;
  readonly withdrawn: Trace | null;
}

/** The before-firing check that the rig stands on, and what has voided it. */
export interface ReadyCheck {
  readonly check: string;
  readonly rig_revision: string;
  readonly closed: Trace;
  /** Last activity on the rig from the same tablet: the 30 min of idling count from here. */
  readonly active: StampPoint;
  readonly voided: { readonly code: string; readonly words: string; readonly at: number | null } | null;
  /** People who were there when it was walked. */
  readonly present: readonly string[];
  /** Pieces of the register that its steps named, as they stood when it was closed. */
  readonly kit: readonly KitNote[];
}

/** Somebody at the rig beside the person who works it, until they are checked out. */
export interface Guest extends Trace {
  readonly person: string | null;
  readonly name: string;
  readonly knows_isolator: boolean;
  readonly eyewear: string | null;
  readonly irregular: string | null;
}

export interface Declaration extends Trace {
  readonly state: 'shorted' | 'short-off';
}

export interface RigDoc {
  readonly kind: 'rig';
  readonly id: string;
  readonly parent: null;
  readonly name: string;
  readonly revisions: readonly RigRevision[];
  /** Entry ids of the revisions that nothing has replaced; more than one is a parting (protocol 1.6). */
  readonly heads: readonly string[];
  readonly declared: Declaration | null;
  readonly last_short: Trace | null;
  readonly stand_downs: readonly StandDown[];
  readonly hands: readonly (Trace & { readonly where: string })[];
  readonly guests: readonly Guest[];
  /** Kit that the register has staying with the rig. */
  readonly kit: readonly KitNote[];
  readonly permits: readonly Permit[];
  readonly permits_asked: readonly (Trace & {
    readonly rig_revision: string;
    readonly words: string;
    readonly answered: boolean;
  })[];
  readonly ready_check: ReadyCheck | null;
  readonly open_checks: readonly string[];
  readonly open_firings: readonly string[];
  readonly last_firing: string | null;
  /** Tablet of the last declaration or opened firing. */
  readonly holder: string | null;
  readonly gas_changed: Trace | null;
  /** An entry of a newer app touches this rig: it is not ready here (protocol 1.9). */
  readonly needs_newer_app: boolean;
}

export function* updateRig(id: string, change: (rig: RigDoc) => RigDoc): Effect {
  const rig = yield* getDoc('rig', id);
  if (rig !== undefined) yield* putDoc(change(rig));
}

export function standDown(rig: RigDoc, trace: Trace, why: string): RigDoc {
  const standing = { ...rig, stand_downs: [...rig.stand_downs, { ...trace, why, lifted: null }] };
  return voidCheck(standing, trace, { code: 'stood-down', words: 'The rig was stood down after the check.' });
}

export function voidCheck(
  rig: RigDoc,
  by: Trace,
  why: { readonly code: string; readonly words: string },
): RigDoc {
  const { ready_check } = rig;
  if (ready_check === null || ready_check.voided !== null) return rig;
  return { ...rig, ready_check: { ...ready_check, voided: { ...why, at: by.at } } };
}

/** Once another tablet has had the rig, the check of this one stays void when the rig comes back. */
export function holdBy(rig: RigDoc, trace: Trace): RigDoc {
  const held = { ...rig, holder: trace.device };
  if (rig.ready_check === null || rig.ready_check.closed.device === trace.device) return held;
  return voidCheck(held, trace, {
    code: 'other-tablet',
    words: 'Another tablet took the rig over after the check.',
  });
}

/** A before-firing check lapses after this much idling (PRODUCT: Checks). */
export const CHECK_IDLE_MS = 30 * 60_000;

/** Work on the rig keeps its check alive; one that has lapsed by idling stays void, whatever is done afterwards. */
export function keepActive(rig: RigDoc, trace: Trace): RigDoc {
  const { ready_check } = rig;
  if (ready_check === null || ready_check.closed.device !== trace.device) return rig;
  const idle_ms = elapsedMs(ready_check.active, trace.stamp);
  if (idle_ms === null) return rig;
  if (idle_ms > CHECK_IDLE_MS)
    return voidCheck(rig, trace, { code: 'idle', words: 'The check lapsed after 30 min without activity.' });
  return { ...rig, ready_check: { ...ready_check, active: trace.stamp } };
}

export function declare(rig: RigDoc, trace: Trace, state: Declaration['state']): RigDoc {
  const declared = { ...rig, declared: { ...trace, state } };
  if (state === 'short-off') return holdBy(declared, trace);
  const safe = voidCheck({ ...declared, last_short: trace }, trace, {
    code: 'made-safe',
    words: 'The rig was made safe after the check.',
  });
  return holdBy(safe, trace);
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

export function* foldRig(entry: RigEntry, standing: Standing): Effect {
  const trace = traceOf(entry.meta, standing);
  if (entry.kind === 'rig.created') {
    yield* putDoc(newRig(entry, trace));
    return;
  }
  if (standing.irregular !== null && PERMITS.has(entry.kind)) return;
  if (entry.kind === 'rig.declared' && entry.body.state === 'shorted' && standing.irregular !== null) return;
  yield* updateRig(entry.meta.subject, (rig) =>
    changed(rig, entry, { ...trace, irregular: standing.irregular }),
  );
}

/** What eases something: without effect when irregular, since that never counts as a permission (protocol 1.2). */
const PERMITS: ReadonlySet<string> = new Set(['rig.stand-down-retracted', 'hands.out']);

function newRig(entry: EntryOf<'rig.created'>, trace: Trace): RigDoc {
  const { name, number, spec } = entry.body;
  return {
    kind: 'rig',
    id: entry.meta.id,
    parent: null,
    name,
    revisions: [{ ...trace, number, spec, based_on: null, why: 'Created' }],
    heads: [entry.meta.id],
    declared: null,
    last_short: null,
    stand_downs: [],
    hands: [],
    guests: [],
    kit: [],
    permits: [],
    permits_asked: [],
    ready_check: null,
    open_checks: [],
    open_firings: [],
    last_firing: null,
    holder: null,
    gas_changed: null,
    needs_newer_app: false,
  };
}

function changed(
  rig: RigDoc,
  entry: Exclude<RigEntry, EntryOf<'rig.created'>>,
  { irregular, ...trace }: Trace & { readonly irregular: string | null },
): RigDoc {
  switch (entry.kind) {
    case 'rig.revised':
      return revise(rig, entry.body, trace);
    case 'rig.declared':
      // A short that comes off by itself is not the one that the check took off.
      return voidCheck(declare(rig, trace, entry.body.state), trace, {
        code: 'declared',
        words: 'The state of the rig was declared after the check.',
      });
    case 'rig.stood-down':
      return standDown(rig, trace, entry.body.why);
    case 'rig.stand-down-retracted':
      return lift(rig, [entry.body.stand_down], trace);
    case 'rig.returned':
      return lift(rig, entry.body.lifts, trace);
    case 'hands.in':
      return voidCheck({ ...rig, hands: [...rig.hands, { ...trace, where: entry.body.where }] }, trace, {
        code: 'hands-in',
        words: 'Hands went in after the check.',
      });
    case 'hands.out':
      return { ...rig, hands: rig.hands.filter((tag) => tag.entry !== entry.body.tag) };
    case 'guest.in': {
      const { person, name, knows_isolator, eyewear } = entry.body;
      const guest = { ...trace, person, name, knows_isolator, eyewear, irregular };
      return { ...rig, guests: [...rig.guests, guest] };
    }
    case 'guest.out':
      return { ...rig, guests: rig.guests.filter((guest) => guest.entry !== entry.body.guest) };
    case 'gas.changed':
      return voidCheck({ ...rig, gas_changed: trace }, trace, {
        code: 'gas-changed',
        words: 'The gas was changed after the check.',
      });
    case 'permit.asked':
      return { ...rig, permits_asked: [...rig.permits_asked, { ...trace, ...entry.body, answered: false }] };
    case 'permit.granted':
      return grant(rig, entry.body, trace);
    case 'permit.withdrawn':
      return {
        ...rig,
        permits: rig.permits.map((one) =>
          one.entry === entry.body.permit ? { ...one, withdrawn: trace } : one,
        ),
      };
    case 'parting.settled':
      return voidCheck(
        {
          ...rig,
          heads: [...rig.heads.filter((head) => !entry.body.settles.includes(head)), entry.body.keeps],
        },
        trace,
        { code: 'parting-settled', words: 'A parting of the rig was settled after the check.' },
      );
  }
}

function revise(rig: RigDoc, body: BodyOf<'rig.revised'>, trace: Trace): RigDoc {
  const { number, spec, based_on, why } = body;
  const revised = {
    ...rig,
    revisions: [...rig.revisions, { ...trace, number, spec, based_on, why }],
    heads: [...rig.heads.filter((head) => head !== based_on), trace.entry],
  };
  return voidCheck(revised, trace, { code: 'revised', words: 'The rig was revised after the check.' });
}

function grant(rig: RigDoc, body: BodyOf<'permit.granted'>, trace: Trace): RigDoc {
  const { rig_revision, envelope, until_ms } = body;
  return {
    ...rig,
    permits: [...rig.permits, { ...trace, rig_revision, envelope, until_ms, withdrawn: null }],
    permits_asked: rig.permits_asked.map((one) =>
      one.rig_revision === rig_revision ? { ...one, answered: true } : one,
    ),
  };
}

/** Lifts only what is named: a stand-down that the author did not know of goes on standing (protocol 1.4). */
function lift(rig: RigDoc, ids: readonly string[], trace: Trace): RigDoc {
  return {
    ...rig,
    stand_downs: rig.stand_downs.map((one) =>
      one.lifted === null && ids.includes(one.entry) ? { ...one, lifted: trace } : one,
    ),
  };
}

export function headRevisions(rig: RigDoc): readonly RigRevision[] {
  return rig.revisions.filter((revision) => rig.heads.includes(revision.entry));
}

/** The revision that screens show: the newest head. A rig always has one. */
export function latestRevision(rig: RigDoc): RigRevision {
  const latest = headRevisions(rig).at(-1) ?? rig.revisions.at(-1);
  if (latest === undefined) throw new Error(`rig ${rig.id} has no revision`);
  return latest;
}

export function revisionById(rig: RigDoc, id: string): RigRevision | undefined {
  return rig.revisions.find((revision) => revision.entry === id);
}

/** While a parting stands, the stricter limit of each pair rules (protocol 1.6). */
export function rulingEnvelope(rig: RigDoc): RigSpec['envelope'] {
  const envelopes = headRevisions(rig).map((revision) => revision.spec.envelope);
  return {
    max_kV: Math.min(...envelopes.map((one) => one.max_kV)),
    max_bar_g: Math.min(...envelopes.map((one) => one.max_bar_g)),
    max_rate_Hz: Math.min(...envelopes.map((one) => one.max_rate_Hz)),
  };
}

export function unliftedStandDowns(rig: RigDoc): readonly StandDown[] {
  return rig.stand_downs.filter((one) => one.lifted === null);
}
