/**
 * Every shot of a spark gap can fake touches. This machine tells them from a person's (protocol 6): three or more contacts in
 * 150 ms, more than two at once, two far apart within 80 ms, contacts under 25 ms and storms of cancelled contacts are noise.
 * A steady single press is let through once it has outlasted its burst, so that nobody is locked out while a rig fires at 5 Hz:
 * contacts that come later do not disturb it.
 *
 *   down, quiet neighbourhood ─────────────▶ passed
 *   down, inside a burst ──────────────────▶ suspect ── alone, steady, 150 ms old ──▶ revived (its hold starts there)
 *   passed, but the burst forms after it ──▶ suspect (and whoever was told of it is told that it is cancelled)
 */
export const BURST_MS = 150;
export const BURST_DOWNS = 3;
export const MOST_AT_ONCE = 2;
export const FAR_APART_MM = 80;
export const FAR_APART_MS = 80;
export const SHORTEST_CONTACT_MS = 25;
export const STEADY_MM = 2.5;
/** This many cancelled contacts within a second are a storm. */
export const STORM_CANCELS = 3;
export const STORM_MS = 1000;

export type GuardEvent =
  | {
      readonly type: 'down' | 'move' | 'up' | 'cancel';
      readonly id: number;
      readonly t_ms: number;
      readonly x_mm: number;
      readonly y_mm: number;
    }
  | { readonly type: 'tick'; readonly t_ms: number };

interface Contact {
  readonly id: number;
  readonly down_ms: number;
  readonly x_mm: number;
  readonly y_mm: number;
  /** 'steady' has outlasted a burst, or was long down when one came: later noise leaves it alone. */
  readonly status: 'passed' | 'suspect' | 'steady';
  readonly moved: boolean;
}

export interface GuardState {
  readonly contacts: readonly Contact[];
  /** Contacts of the last 150 ms, whether they are still down or not. */
  readonly recent: readonly {
    readonly id: number;
    readonly t_ms: number;
    readonly x_mm: number;
    readonly y_mm: number;
  }[];
  readonly cancels_ms: readonly number[];
}

export interface GuardVerdict {
  /** Whether this event may reach the screen. */
  readonly pass: boolean;
  /** Contacts that were let through before and turn out to be noise. */
  readonly cancelled: readonly number[];
  /** Contacts that count from now on, as if they had come down now. */
  readonly revived: readonly number[];
  /** How many contacts were recognised as noise by this event. */
  readonly noise: number;
}

export interface GuardStep {
  readonly state: GuardState;
  readonly verdict: GuardVerdict;
}

export const initialGuard: GuardState = { contacts: [], recent: [], cancels_ms: [] };

const PASS: GuardVerdict = { pass: true, cancelled: [], revived: [], noise: 0 };

export function stepGuard(state: GuardState, event: GuardEvent): GuardStep {
  switch (event.type) {
    case 'down':
      return contactDown(state, event);
    case 'move':
      return contactMove(state, event);
    case 'up':
    case 'cancel':
      return contactEnd(state, event);
    case 'tick':
      return reviveSteady(state, event.t_ms, PASS);
  }
}

type ContactEvent = Exclude<GuardEvent, { type: 'tick' }>;

function contactDown(state: GuardState, event: ContactEvent): GuardStep {
  const { id, t_ms, x_mm, y_mm } = event;
  const recent = [...state.recent.filter((each) => t_ms - each.t_ms <= BURST_MS), { id, t_ms, x_mm, y_mm }];
  const others = state.contacts.filter((each) => each.id !== id);
  const burst = recent.length >= BURST_DOWNS;
  const crowd = others.length + 1 > MOST_AT_ONCE;
  const apart = recent.some(
    (each) =>
      each.id !== id &&
      t_ms - each.t_ms <= FAR_APART_MS &&
      Math.hypot(each.x_mm - x_mm, each.y_mm - y_mm) > FAR_APART_MM,
  );
  const storm = inStorm(state.cancels_ms, t_ms);
  const noisy = burst || crowd || apart || storm;
  const contact: Contact = {
    id,
    down_ms: t_ms,
    x_mm,
    y_mm,
    status: noisy ? 'suspect' : 'passed',
    moved: false,
  };
  if (!noisy) return { state: { ...state, recent, contacts: [...others, contact] }, verdict: PASS };

  const young = (each: Contact): boolean => each.status === 'passed' && t_ms - each.down_ms <= BURST_MS;
  const cancelled = others.filter(young).map((each) => each.id);
  return {
    state: {
      ...state,
      recent,
      contacts: [
        ...others.map((each): Contact =>
          young(each)
            ? { ...each, status: 'suspect' }
            : each.status === 'passed'
              ? { ...each, status: 'steady' }
              : each,
        ),
        contact,
      ],
    },
    verdict: { pass: false, cancelled, revived: [], noise: 1 + cancelled.length },
  };
}

function contactMove(state: GuardState, event: ContactEvent): GuardStep {
  const known = state.contacts.find((each) => each.id === event.id);
  if (known === undefined) return { state, verdict: PASS };
  const moved = known.moved || Math.hypot(event.x_mm - known.x_mm, event.y_mm - known.y_mm) > STEADY_MM;
  const contacts = state.contacts.map((each) => (each.id === event.id ? { ...each, moved } : each));
  return reviveSteady({ ...state, contacts }, event.t_ms, { ...PASS, pass: known.status !== 'suspect' });
}

function contactEnd(state: GuardState, event: ContactEvent): GuardStep {
  const known = state.contacts.find((each) => each.id === event.id);
  if (known === undefined) return { state, verdict: PASS };
  const contacts = state.contacts.filter((each) => each.id !== event.id);
  const cancels_ms =
    event.type === 'cancel'
      ? [...state.cancels_ms.filter((at) => event.t_ms - at <= STORM_MS), event.t_ms]
      : state.cancels_ms;
  const tooShort =
    event.type === 'up' && known.status === 'passed' && event.t_ms - known.down_ms < SHORTEST_CONTACT_MS;
  const verdict: GuardVerdict =
    known.status === 'suspect'
      ? { ...PASS, pass: false }
      : tooShort
        ? { pass: false, cancelled: [event.id], revived: [], noise: 1 }
        : PASS;
  return reviveSteady({ ...state, contacts, cancels_ms }, event.t_ms, verdict);
}

/** A suspect that is old enough, has not moved and is down alone is a finger that was there while the burst went by. */
function reviveSteady(state: GuardState, t_ms: number, verdict: GuardVerdict): GuardStep {
  const [only, second] = state.contacts;
  if (only === undefined || second !== undefined || only.status !== 'suspect' || only.moved)
    return { state, verdict };
  if (t_ms - only.down_ms < BURST_MS) return { state, verdict };
  return {
    state: { ...state, contacts: [{ ...only, status: 'steady' }] },
    verdict: { ...verdict, revived: [only.id] },
  };
}

function inStorm(cancels_ms: readonly number[], t_ms: number): boolean {
  return cancels_ms.filter((at) => t_ms - at <= STORM_MS).length >= STORM_CANCELS;
}
