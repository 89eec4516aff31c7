import type { Clock, PagePort, Timers } from '../ports/ports';
import type { BookStore } from '../store/book-store';

const COALESCE_MS = 250;
/** Under this name lie drafts that were written while nobody was open. */
const NOBODY = '';

export type DraftSave = 'saved' | 'saving' | 'not-saved';

export interface DraftState {
  readonly value: unknown;
  /** It came from the store, not from this page life. */
  readonly restored: boolean;
  readonly save: DraftSave;
}

export interface DraftPorts {
  readonly store: BookStore;
  readonly timers: Timers;
  readonly page: PagePort;
  readonly clock: Clock;
}

export type Drafts = ReturnType<typeof openDrafts>;

/**
 * What has been typed and not logged yet. In memory at each input, in the strict store within 250 ms and when the page is
 * hidden (protocol 2.6). A draft belongs to its person: the next one learns only that there is one.
 */
export function openDrafts({ store, timers, page, clock }: DraftPorts) {
  const states = new Map<string, DraftState>();
  const people = new Map<string, Set<string>>();
  const dirty = new Set<string>();
  const listeners = new Set<() => void>();
  let callOff: (() => void) | null = null;

  const notify = () => {
    for (const listen of listeners) listen();
  };
  const remember = (place: DraftPlace, state: DraftState) => {
    states.set(placeKey(place), state);
    const owners = people.get(place.key) ?? new Set();
    people.set(place.key, owners.add(place.person ?? NOBODY));
  };
  const flush = async (): Promise<void> => {
    callOff?.();
    callOff = null;
    const places = [...dirty].map(fromPlaceKey);
    dirty.clear();
    if (places.length === 0) return;
    const outcome = await store.write(() =>
      store.database.transaction('rw', [store.database.drafts], async () => {
        for (const place of places) {
          const row: [string, string] = [place.person ?? NOBODY, place.key];
          const state = states.get(placeKey(place));
          if (state === undefined) await store.database.drafts.delete(row);
          else
            await store.database.drafts.put({
              person: row[0],
              key: row[1],
              value: state.value,
              changed_ms: clock.wallMs(),
            });
        }
      }),
    );
    for (const place of places) settle(place, outcome.type === 'saved');
    notify();
  };
  const settle = (place: DraftPlace, saved: boolean) => {
    const key = placeKey(place);
    if (!saved) dirty.add(key);
    const state = states.get(key);
    if (state !== undefined && !(saved && dirty.has(key)))
      states.set(key, { ...state, save: saved ? 'saved' : 'not-saved' });
  };
  const soon = (place: DraftPlace) => {
    dirty.add(placeKey(place));
    callOff ??= timers.after(COALESCE_MS, () => void flush());
    notify();
  };
  const stopListening = page.on('hidden', () => void flush());

  return {
    load: async () => {
      for (const { person, key, value } of await store.database.drafts.toArray())
        remember(
          { person: person === NOBODY ? null : person, key },
          { value, restored: true, save: 'saved' },
        );
    },
    subscribe: (listen: () => void) => {
      listeners.add(listen);
      return () => {
        listeners.delete(listen);
      };
    },
    get: (place: DraftPlace): DraftState | undefined => states.get(placeKey(place)),
    set: (place: DraftPlace, value: unknown) => {
      remember(place, { value, restored: false, save: 'saving' });
      soon(place);
    },
    clear: (place: DraftPlace) => {
      if (!states.delete(placeKey(place))) return;
      people.get(place.key)?.delete(place.person ?? NOBODY);
      soon(place);
    },
    someoneElses: ({ person, key }: DraftPlace) =>
      [...(people.get(key) ?? [])].some((owner) => owner !== (person ?? NOBODY)),
    flush,
    close: () => {
      stopListening();
      callOff?.();
    },
  };
}

export interface DraftPlace {
  readonly person: string | null;
  readonly key: string;
}

function placeKey({ person, key }: DraftPlace): string {
  return `${person ?? NOBODY}\n${key}`;
}

function fromPlaceKey(text: string): DraftPlace {
  const at = text.indexOf('\n');
  const person = text.slice(0, at);
  return { person: person === NOBODY ? null : person, key: text.slice(at + 1) };
}
