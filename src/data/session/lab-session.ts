import type { Bus } from '../ports/ports';
import type { BookStore } from '../store/book-store';
import type { BookView } from '../view/book-view';
import type { PeopleHere } from './people-here';
import type { LabRef, LabSessionView, OnlineSession, PinOutcome, SetPinOutcome } from './session-types';
import type { Tokens } from './tokens';

export interface SessionParts {
  readonly lab: LabRef;
  readonly store: BookStore;
  readonly view: BookView;
  readonly people: PeopleHere;
  readonly tokens: Tokens;
  readonly bus: Bus;
  readonly device: () => string;
}

export interface LabSession {
  readonly subscribe: (listen: () => void) => () => void;
  readonly view: () => LabSessionView;
  readonly person: () => string | null;
  readonly restore: () => Promise<void>;
  readonly openAs: (person: string) => Promise<void>;
  readonly unlock: (person: string, pin: string) => Promise<PinOutcome>;
  readonly checkPin: (person: string, pin: string) => Promise<PinOutcome>;
  readonly setPin: (pin: string) => Promise<SetPinOutcome>;
  /** False while a firing is open on this tablet: then it stays open (PRODUCT: People). */
  readonly lock: () => Promise<boolean>;
  readonly signOut: () => Promise<void>;
  readonly changed: () => void;
}

export function openLabSession(parts: SessionParts): LabSession {
  const { lab, store, people, tokens, bus } = parts;
  const listeners = new Set<() => void>();
  let open: string | null = null;
  let view = makeView();

  function makeView(): LabSessionView {
    const everybody = people.list();
    const person = open === null ? undefined : people.get(open);
    if (person === undefined) return { state: 'locked', lab, people: everybody };
    return { state: 'open', lab, people: everybody, person, online: onlineOf(person.id) };
  }
  function onlineOf(person: string): OnlineSession {
    if (tokens.holds({ person })) return 'signed-in';
    return people.onlineOf(person) === 'sign-in-needed' ? 'sign-in-needed' : 'not-known';
  }
  const changed = () => {
    view = makeView();
    for (const listen of listeners) listen();
  };
  const become = async (person: string | null) => {
    open = person;
    changed();
    bus.post({ type: 'people' });
    await store.setKey('open_person', person);
  };
  const checkPin = async (person: string, pin: string) => {
    const outcome = await people.check(person, pin);
    changed();
    return outcome;
  };
  const lock = async () => {
    if (firingOpenHere(parts)) return false;
    bus.post({ type: 'locked' });
    await become(null);
    return true;
  };

  bus.subscribe((message) => {
    if (message.type === 'locked' && !firingOpenHere(parts)) {
      open = null;
      changed();
    }
    if (message.type === 'people') void people.load().then(changed);
  });

  return {
    subscribe: (listen) => {
      listeners.add(listen);
      return () => {
        listeners.delete(listen);
      };
    },
    view: () => view,
    person: () => (view.state === 'open' ? view.person.id : null),
    restore: async () => {
      const before = await store.key('open_person');
      // After a kill with a firing open the person goes on without a PIN; otherwise the PIN comes first.
      if (typeof before === 'string' && firingOpenHere(parts)) open = before;
      changed();
    },
    openAs: become,
    unlock: async (person, pin) => {
      const outcome = await checkPin(person, pin);
      if (outcome.type === 'right') await become(person);
      return outcome;
    },
    checkPin,
    setPin: async (pin) => {
      if (open === null) return { type: 'refused', words: 'Nobody is open on this tablet.' };
      const outcome = await people.setPin(open, pin);
      bus.post({ type: 'people' });
      changed();
      return outcome;
    },
    lock,
    signOut: async () => {
      const person = open;
      if (person === null) return;
      // Without a network the cookie stays, but the tablet no longer uses it until the next sign-in.
      await tokens.request({ person }, { method: 'POST', path: '/api/accounts/sign-out', schema: null });
      tokens.drop({ person });
      await people.noteOnline(person, 'sign-in-needed');
      await lock();
      changed();
    },
    changed,
  };
}

function firingOpenHere({ view, device }: SessionParts): boolean {
  return view.list('firing').some((firing) => firing.closed === null && firing.opened.device === device());
}
