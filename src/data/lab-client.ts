import { openDrafts, type Drafts } from './bench/drafts';
import { openResume, type Resume } from './bench/resume';
import { openWaitClock, type WaitClock } from './bench/wait-clock';
import { createExchange, type Exchange } from './handover/exchange';
import { createHandoverLoop, type HandoverLoop } from './handover/handover-loop';
import { headerOf, openLabStores, type LabPlace, type LabStores } from './lab-stores';
import type { Ports, SmallStore, Timers } from './ports/ports';
import { createApiClient, type ApiRequest } from './session/api-client';
import { openLabSession, type LabSession } from './session/lab-session';
import { openPeopleHere, type PeopleHere } from './session/people-here';
import { PIN_ITERATIONS } from './session/pin';
import type { LabRef } from './session/session-types';
import { createTokens, type Bearer, type LabOutcome, type Tokens } from './session/tokens';
import { photoStore, type PhotoStore } from './store/photo-store';
import type { DeviceRecord } from './store/book-keys';
import type { BookStore } from './store/book-store';
import type { MirrorStore } from './store/mirror-store';
import { openBookView, type BookView } from './view/book-view';
import { openEntryStates, type EntryStates } from './view/entry-states';
import { createHere, type Here } from './view/here';
import { createWriter, type Writer } from './writer';

export interface LabRequest<T> extends ApiRequest<T> {
  /** Whose token goes with it; the person is the one who is open. */
  readonly as: 'person' | 'device';
}

/** One lab's Book on this tablet, and everything that works on it. */
export interface LabClient {
  readonly lab: LabRef;
  readonly device: () => DeviceRecord;
  readonly notices: readonly string[];
  readonly small: SmallStore;
  readonly timers: Timers;
  readonly app_version: string;
  readonly store: BookStore;
  readonly mirror: MirrorStore;
  readonly view: BookView;
  readonly here: Here;
  readonly people: PeopleHere;
  readonly tokens: Tokens;
  readonly session: LabSession;
  readonly drafts: Drafts;
  readonly resume: Resume;
  readonly waits: WaitClock;
  readonly photos: PhotoStore;
  readonly states: EntryStates;
  readonly exchange: Exchange;
  readonly handover: HandoverLoop;
  readonly append: Writer['append'];
  readonly judge: Writer['judge'];
  readonly request: <T>(request: LabRequest<T>) => Promise<LabOutcome<T>>;
  /** The tablet was enrolled anew: what waits goes on under its new name. */
  readonly adoptDevice: (device: DeviceRecord, epoch: string) => Promise<{ readonly saved: boolean }>;
  readonly close: () => Promise<void>;
}

export type LabOpening =
  | { readonly type: 'open'; readonly lab: LabClient }
  | { readonly type: 'not-enrolled' }
  | { readonly type: 'failed'; readonly words: string };

export interface LabOptions {
  readonly pin_iterations?: number;
  readonly ballast_MB?: number;
  /** False where whoever opens it calls `exchange.round` by hand. */
  readonly exchanges_by_itself?: boolean;
}

export async function openLab(ports: Ports, place: LabPlace, options: LabOptions = {}): Promise<LabOpening> {
  const opened = await openLabStores({ ...ports, ...options }, place);
  if (opened.type !== 'open') return opened;
  const lab = await assemble(ports, { place, stores: opened.stores, options });
  await lab.people.load();
  await Promise.all([lab.view.reload(), lab.drafts.load(), lab.resume.load()]);
  await lab.session.restore();
  if (options.exchanges_by_itself !== false) lab.handover.start();
  return { type: 'open', lab };
}

interface Assembly {
  readonly place: LabPlace;
  readonly stores: LabStores;
  readonly options: LabOptions;
}

async function assemble(ports: Ports, { place, stores, options }: Assembly): Promise<LabClient> {
  const { store, mirror, journal } = stores;
  const { clock, timers, page, locks, random, subtle } = ports;
  let { device, epoch } = stores;
  const deviceId = () => device.id;
  const bus = ports.openBus(`holdoff/${place.lab}`);
  const api = createApiClient(ports.http, timers);
  const here = createHere({
    clock,
    page_life: place.page_life,
    build_ms: ports.build_ms,
    highest_wall_ms: (await store.key('highest_wall_ms')) ?? 0,
  });
  const people = openPeopleHere({
    store,
    clock,
    random,
    subtle,
    pin_iterations: options.pin_iterations ?? PIN_ITERATIONS,
  });
  const view = openBookView({ store, mirror, hasGrant: people.hasGrant });
  const noteOnline = (person: string, online: 'signed-in' | 'sign-in-needed') => {
    void people.noteOnline(person, online).then(() => {
      session.changed();
    });
  };
  const tokens = createTokens({
    api,
    clock,
    subtle,
    lab: place.lab,
    device: () => Promise.resolve(device),
    onPersonAccepted: (person) => {
      noteOnline(person, 'signed-in');
    },
    onPersonRefused: (person) => {
      noteOnline(person, 'sign-in-needed');
    },
  });
  const lab = device.lab;
  const session = openLabSession({ lab, store, view, people, tokens, bus, device: deviceId });
  const exchange = createExchange({
    store,
    mirror,
    view,
    tokens,
    here,
    bus,
    clock,
    random,
    journal: () => journal,
    device: deviceId,
    app_version: ports.app_version,
  });
  const handover = createHandoverLoop({
    exchange,
    view,
    chance: ports.chance,
    small: ports.small,
    clock,
    timers,
    page,
    locks,
    bus,
    lab: place.lab,
    page_life: place.page_life,
  });
  const writer = createWriter({
    store,
    view,
    here,
    bus,
    random,
    lab: place.lab,
    device: () => device,
    epoch: () => epoch,
    person: session.person,
    journal: () => journal,
    appended: () => {
      handover.kick('append');
    },
  });
  const rereadDevice = async () => {
    device = (await store.device()) ?? device;
    epoch = (await store.key('epoch')) ?? epoch;
    tokens.dropAll();
    await view.ownChanged();
    handover.kick('session');
  };
  bus.subscribe((message) => {
    if (message.type === 'device') void rereadDevice();
    if (message.type === 'appended') {
      handover.kick('append');
      void view.ownChanged();
    }
    if (message.type === 'acknowledged') void view.ownChanged();
    if (message.type === 'mirror') void view.mirrorMoved(message.keys);
  });
  const drafts = openDrafts({ store, timers, page, clock });
  const resume = openResume({ store, small: ports.small, timers, page });
  const waits = openWaitClock({ store, clock, timers, locks });
  const states = openEntryStates({ store, mirror, view, device: deviceId });

  return {
    lab,
    device: () => device,
    notices: stores.notices,
    small: ports.small,
    timers,
    app_version: ports.app_version,
    store,
    mirror,
    view,
    here,
    people,
    tokens,
    session,
    drafts,
    resume,
    waits,
    photos: photoStore(store.database, store.reserve, subtle),
    states,
    exchange,
    handover,
    append: writer.append,
    judge: writer.judge,
    request: ({ as, ...request }) => {
      const bearer = bearerOf(as, session.person());
      return bearer === null
        ? Promise.resolve({ type: 'sign-in-needed', words: 'Nobody is open on this tablet.' })
        : tokens.request(bearer, request);
    },
    adoptDevice: async (next, nextEpoch) => {
      const outcome = await store.setDevice(next, nextEpoch);
      if (outcome.type === 'not-saved') return { saved: false };
      device = next;
      epoch = nextEpoch;
      tokens.dropAll();
      await store.moveToDevice(next.id);
      await journal?.header(await headerOf(store, next));
      await view.ownChanged();
      bus.post({ type: 'device' });
      return { saved: true };
    },
    close: async () => {
      await handover.stop();
      await drafts.flush();
      drafts.close();
      resume.close();
      waits.close();
      states.close();
      bus.close();
      await journal?.close();
      store.close();
      mirror.close();
    },
  };
}

function bearerOf(as: 'person' | 'device', person: string | null): Bearer | null {
  if (as === 'device') return 'device';
  return person === null ? null : { person };
}
