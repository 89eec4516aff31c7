import type { Clock, RandomBytes } from '../ports/ports';
import type { PersonRow } from '../store/book-database';
import type { BookStore } from '../store/book-store';
import type { PersonHere, PinOutcome, SetPinOutcome } from './session-types';
import { hashPin, isRightPin, PIN_TRIES, pinDelayMs, pinObjection } from './pin';

export interface PeoplePorts {
  readonly store: BookStore;
  readonly clock: Clock;
  readonly random: RandomBytes;
  readonly subtle: SubtleCrypto;
  readonly pin_iterations: number;
}

export type PeopleHere = ReturnType<typeof openPeopleHere>;

/** Who has signed in on this tablet before: they may unlock it, and be a second person, offline (protocol 4.2, 4.3). */
export function openPeopleHere({ store, clock, random, subtle, pin_iterations }: PeoplePorts) {
  const { database } = store;
  let rows: readonly PersonRow[] = [];
  /** Until when a person has to wait, in this page life; a reload starts the wait anew and never shortens it. */
  const notBefore = new Map<string, { readonly failures: number; readonly until_ms: number }>();

  const load = async () => {
    rows = await database.people.toArray();
    for (const row of rows) holdOff(row);
  };
  const holdOff = ({ id, failures }: PersonRow) => {
    if (notBefore.get(id)?.failures === failures) return;
    notBefore.set(id, { failures, until_ms: clock.monotonicMs() + pinDelayMs(failures) });
  };
  const waitMs = (id: string) => Math.max(0, (notBefore.get(id)?.until_ms ?? 0) - clock.monotonicMs());
  const toHere = (row: PersonRow): PersonHere => ({
    id: row.id,
    name: row.name,
    has_pin: row.pin !== null,
    failures: row.failures,
    wait_ms: waitMs(row.id),
    needs_sign_in: row.pin === null || row.failures >= PIN_TRIES,
  });
  const change = async (id: string, next: (row: PersonRow | undefined) => PersonRow | undefined) => {
    const outcome = await store.write(() =>
      database.transaction('rw', [database.people], async () => {
        const changed = next(await database.people.get(id));
        if (changed !== undefined) await database.people.put(changed);
        return changed;
      }),
    );
    await load();
    return outcome;
  };

  return {
    load,
    list: (): readonly PersonHere[] => rows.map(toHere).sort((a, b) => a.name.localeCompare(b.name)),
    get: (id: string): PersonHere | undefined => {
      const row = rows.find((one) => one.id === id);
      return row === undefined ? undefined : toHere(row);
    },
    hasGrant: (id: string) => rows.some((row) => row.id === id),
    onlineOf: (id: string) => rows.find((row) => row.id === id)?.online ?? 'sign-in-needed',
    /** A sign-in that came through: the person may unlock here from now on. Ten wrong PINs end the old PIN. */
    grant: (person: { readonly id: string; readonly name: string }) =>
      change(person.id, (row) => ({
        id: person.id,
        name: person.name,
        pin: row === undefined || row.failures >= PIN_TRIES ? null : row.pin,
        failures: 0,
        granted_ms: row?.granted_ms ?? clock.wallMs(),
        online: 'signed-in',
      })),
    noteOnline: (id: string, online: PersonRow['online']) =>
      change(id, (row) => (row === undefined || row.online === online ? undefined : { ...row, online })),
    setPin: async (id: string, pin: string): Promise<SetPinOutcome> => {
      const words = pinObjection(pin);
      if (words !== null) return { type: 'refused', words };
      const record = await hashPin(subtle, pin, { random, iterations: pin_iterations });
      const outcome = await change(id, (row) =>
        row === undefined ? undefined : { ...row, pin: record, failures: 0 },
      );
      return outcome.type === 'saved' ? { type: 'set' } : outcome;
    },
    check: async (id: string, pin: string): Promise<PinOutcome> => {
      await load();
      const row = rows.find((one) => one.id === id);
      if (row === undefined || row.pin === null)
        return {
          type: 'sign-in-needed',
          words: 'Sign in once on this tablet, with the network, and choose a PIN.',
        };
      if (row.failures >= PIN_TRIES)
        return { type: 'sign-in-needed', words: 'Ten wrong PINs: sign in with e-mail and password.' };
      const wait_ms = waitMs(id);
      if (wait_ms > 0)
        return { type: 'wait', words: `Wait ${Math.ceil(wait_ms / 1000)} s before the next try.`, wait_ms };
      // Counted before it is compared, so that killing the app in between gains no free try.
      const counted = await change(id, (now) =>
        now === undefined ? undefined : { ...now, failures: now.failures + 1 },
      );
      if (counted.type === 'not-saved') return counted;
      if (!(await isRightPin(subtle, pin, row.pin))) return wrong(counted.value?.failures ?? PIN_TRIES);
      const cleared = await change(id, (now) => (now === undefined ? undefined : { ...now, failures: 0 }));
      if (cleared.type === 'not-saved') return cleared;
      return { type: 'right', person: toHere({ ...row, failures: 0 }) };
    },
  };

  function wrong(failures: number): PinOutcome {
    if (failures >= PIN_TRIES)
      return { type: 'sign-in-needed', words: 'Ten wrong PINs: sign in with e-mail and password.' };
    const wait_ms = pinDelayMs(failures);
    return {
      type: 'wrong',
      words: `Wrong PIN. Wait ${wait_ms / 1000} s before the next try.`,
      wait_ms,
      failures,
    };
  }
}
