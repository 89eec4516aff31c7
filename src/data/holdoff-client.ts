import { uuidFromBytes } from '../domain/book/ids';
import { knownLabs } from './known-labs';
import { openLab, type LabClient, type LabOptions } from './lab-client';
import type { Ports } from './ports/ports';
import { createUpdateWatch, type UpdateWatch } from './pwa';
import { createApiClient } from './session/api-client';
import { generateDeviceKeys } from './session/device-key';
import { openPeopleHere } from './session/people-here';
import { PIN_ITERATIONS } from './session/pin';
import type {
  LabRef,
  PinOutcome,
  SessionView,
  SetPinOutcome,
  SignInInput,
  SignInOutcome,
} from './session/session-types';
import { askSignIn, signInRefusal, type SignInAnswer } from './session/sign-in';
import { createStorageWatch, type StorageWatch } from './storage-status';
import { openBookStore } from './store/book-store';
import { cureTornLog } from './store/start-cure';
import { createHere, type Here } from './view/here';

/** The tablet: which lab is open on it, and who. */
export interface HoldoffClient {
  readonly subscribe: (listen: () => void) => () => void;
  readonly labs: () => readonly LabRef[];
  readonly lab: () => LabClient | null;
  readonly session: () => SessionView;
  /** What went wrong at the start, in words, to be shown. */
  readonly notices: readonly string[];
  /** Somebody has read them: they do not come again at the next start. */
  readonly noticesSeen: () => Promise<void>;
  /** Time of this page life, also before any lab is open. */
  readonly here: () => Here;
  readonly ports: Ports;
  readonly update: UpdateWatch;
  readonly storage: StorageWatch;
  readonly signIn: (input: SignInInput) => Promise<SignInOutcome>;
  readonly setPin: (pin: string) => Promise<SetPinOutcome>;
  readonly unlock: (person: string, pin: string) => Promise<PinOutcome>;
  readonly checkPin: (person: string, pin: string) => Promise<PinOutcome>;
  readonly lock: () => Promise<void>;
  readonly signOut: () => Promise<void>;
  readonly chooseLab: (id: string) => Promise<void>;
  readonly close: () => Promise<void>;
}

const LAY_IN_AFTER_MS = 5000;
const NO_LAB: SessionView = { state: 'no-lab' };
const NOBODY_HERE = { type: 'sign-in-needed', words: 'This tablet is not enrolled yet.' } as const;

/** Cures the log, opens the last lab and starts its handover. What goes wrong stands in `notices`, never in a throw. */
export async function openClient(ports: Ports, options: LabOptions = {}): Promise<HoldoffClient> {
  const page_life = uuidFromBytes(ports.random(16));
  const notices: string[] = [];
  const cure = await cureTornLog(ports);
  if (cure.type === 'not-cured') notices.push(cure.words);
  const api = createApiClient(ports.http, ports.timers);
  const known = knownLabs(ports.small);
  const listeners = new Set<() => void>();
  const idleHere = createHere({
    clock: ports.clock,
    page_life,
    build_ms: ports.build_ms,
    highest_wall_ms: 0,
  });
  let lab: LabClient | null = null;
  let stopListening = () => {};

  const notify = () => {
    for (const listen of listeners) listen();
  };
  const become = (next: LabClient) => {
    stopListening();
    lab = next;
    notices.push(...next.notices.filter((words) => !notices.includes(words)));
    known.used(next.lab);
    stopListening = next.session.subscribe(notify);
    notify();
  };
  /** Opens a lab that is enrolled here; false when it is not. */
  const tryLab = async (id: string): Promise<boolean> => {
    if (lab?.lab.id === id) return true;
    const opened = await openLab(ports, { lab: id, page_life }, options);
    if (opened.type === 'failed') notices.push(opened.words);
    if (opened.type !== 'open') return false;
    const before = lab;
    become(opened.lab);
    await before?.close();
    return true;
  };
  const enrolNew = async (answer: SignInAnswer, keys: CryptoKeyPair): Promise<SignInOutcome | null> => {
    const store = openBookStore(answer.lab.id, ports);
    const opened = await store.open();
    if (opened.type === 'failed') return { type: 'not-saved', words: opened.words };
    const saved = await store.setDevice(deviceRecord(answer, keys), answer.lab.epoch);
    const people = openPeopleHere({
      store,
      ...ports,
      pin_iterations: options.pin_iterations ?? PIN_ITERATIONS,
    });
    if (saved.type === 'saved') await people.grant(answer.person);
    store.close();
    if (saved.type === 'not-saved') return saved;
    return (await tryLab(answer.lab.id))
      ? null
      : { type: 'not-saved', words: 'The new lab could not be opened here.' };
  };

  const signIn = async (input: SignInInput): Promise<SignInOutcome> => {
    const wanted = input.lab === undefined ? (lab?.lab.id ?? null) : input.lab;
    const enrolled = wanted !== null && (await tryLab(wanted));
    const keys = (enrolled ? await usableKeys(lab) : null) ?? (await generateDeviceKeys(ports.subtle));
    const asked = await askSignIn(api, ports.subtle, { input, keys, lab: wanted });
    if (asked.type !== 'ok') return signInRefusal(asked);
    const answer = asked.value;
    if (lab?.lab.id !== answer.lab.id && (await tryLab(answer.lab.id)) && (await usableKeys(lab)) !== null)
      return await signIn({ ...input, lab: answer.lab.id });
    const failed = await settle(answer, keys);
    return failed ?? (await openAs(answer));
  };
  const settle = async (answer: SignInAnswer, keys: CryptoKeyPair): Promise<SignInOutcome | null> => {
    if (lab?.lab.id !== answer.lab.id) return await enrolNew(answer, keys);
    const before = await lab.store.device();
    if (before?.id === answer.device.id && before.keys !== null) return null;
    const adopted = await lab.adoptDevice(deviceRecord(answer, keys), answer.lab.epoch);
    return adopted.saved
      ? null
      : { type: 'not-saved', words: 'NOT SAVED: the tablet could not keep its new key.' };
  };
  const openAs = async (answer: SignInAnswer): Promise<SignInOutcome> => {
    if (lab === null) return { type: 'not-saved', words: 'No lab is open on this tablet.' };
    const granted = await lab.people.grant(answer.person);
    if (granted.type === 'not-saved') return granted;
    lab.tokens.put({ person: answer.person.id }, answer.access_token);
    await lab.session.openAs(answer.person.id);
    lab.handover.kick('session');
    const person = lab.people.get(answer.person.id);
    return person === undefined
      ? { type: 'not-saved', words: 'NOT SAVED: the tablet could not keep who signed in.' }
      : { type: 'signed-in', person, pin_needed: !person.has_pin };
  };

  const storage = createStorageWatch(ports.storage, () => lab);
  for (const id of await known.candidates(ports.idb, ports.journal)) if (await tryLab(id)) break;
  // Laying in the ballast writes 20 MB: not while the first screen is being painted.
  const callOffStorage = ports.timers.after(LAY_IN_AFTER_MS, () => void storage.refresh());
  return {
    subscribe: (listen) => {
      listeners.add(listen);
      return () => {
        listeners.delete(listen);
      };
    },
    labs: known.read,
    lab: () => lab,
    session: () => lab?.session.view() ?? NO_LAB,
    notices,
    noticesSeen: async () => {
      notices.length = 0;
      await lab?.store.setKey('findings', []);
      notify();
    },
    here: () => lab?.here ?? idleHere,
    ports,
    update: createUpdateWatch(ports.serviceWorker, () => lab),
    storage,
    signIn,
    setPin: (pin) =>
      lab?.session.setPin(pin) ?? Promise.resolve({ type: 'refused', words: NOBODY_HERE.words }),
    unlock: async (person, pin) => {
      const outcome = await (lab?.session.unlock(person, pin) ?? Promise.resolve(NOBODY_HERE));
      if (outcome.type === 'right') lab?.handover.kick('session');
      return outcome;
    },
    checkPin: (person, pin) => lab?.session.checkPin(person, pin) ?? Promise.resolve(NOBODY_HERE),
    lock: async () => {
      await lab?.session.lock();
    },
    signOut: async () => {
      await lab?.session.signOut();
    },
    chooseLab: async (id) => {
      await tryLab(id);
    },
    close: async () => {
      callOffStorage();
      stopListening();
      await lab?.close();
    },
  };
}

/** Null where only a new tablet helps: the key was lost, or the Book of this one exists twice. */
async function usableKeys(lab: LabClient | null): Promise<CryptoKeyPair | null> {
  const device = await lab?.store.device();
  return device === undefined || device.forked ? null : device.keys;
}

function deviceRecord(answer: SignInAnswer, keys: CryptoKeyPair) {
  const { id, letter, name } = answer.device;
  return { id, letter, name, lab: { id: answer.lab.id, name: answer.lab.name }, keys, forked: false };
}
