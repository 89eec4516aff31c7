/** What the data layer asks of the world. Each has a twin in memory under `fakes/`, so that tests own time and chance. */
export interface Clock {
  readonly wallMs: () => number;
  /** Milliseconds since the page life began, never set back. */
  readonly monotonicMs: () => number;
  /** Minutes east of UTC at that wall time. */
  readonly offsetMin: (wall_ms: number) => number;
  /** IANA zone name. */
  readonly zone: () => string;
}

export type RandomBytes = (count: number) => Uint8Array<ArrayBuffer>;
/** Even in 0 up to, not including, 1. For jitter only. */
export type Chance = () => number;

export interface Timers {
  /** Runs once after `ms`; the answer calls it off. */
  readonly after: (ms: number, run: () => void) => () => void;
}

export interface IdbPort {
  readonly indexedDB: IDBFactory;
  readonly IDBKeyRange: typeof IDBKeyRange;
}

export type LockOutcome<T> =
  | { readonly type: 'held'; readonly value: T }
  /** Somebody else has it, and the caller did not want to wait. */
  | { readonly type: 'busy' }
  /** Another tab took it away while the work was going on: the work must stop by itself. */
  | { readonly type: 'stolen' }
  | { readonly type: 'called-off' };

export interface LockOptions {
  readonly wait: 'never' | 'for-ever';
  readonly steal?: boolean;
  readonly signal?: AbortSignal;
}

export interface LockPort {
  readonly hold: <T>(
    name: string,
    options: LockOptions,
    work: (lost: AbortSignal) => Promise<T>,
  ) => Promise<LockOutcome<T>>;
}

/** What tabs of one lab tell each other; a message never carries an entry, only that there is something to read. */
export type BusMessage =
  | { readonly type: 'appended' }
  | { readonly type: 'acknowledged' }
  /** The mirror moved on; `keys` of the documents that changed, null for all. */
  | { readonly type: 'mirror'; readonly keys: readonly string[] | null }
  | { readonly type: 'beat'; readonly page_life: string }
  /** The tablet was enrolled anew. */
  | { readonly type: 'device' }
  | { readonly type: 'locked' }
  | { readonly type: 'people' };

export interface Bus {
  readonly post: (message: BusMessage) => void;
  readonly subscribe: (listen: (message: BusMessage) => void) => () => void;
  readonly close: () => void;
}

/** Small, synchronous, may be lost at any time: only for what has to stand before the stores are open. */
export interface SmallStore {
  readonly get: (key: string) => string | null;
  readonly set: (key: string, value: string) => void;
  readonly remove: (key: string) => void;
}

export type PageEvent = 'visible' | 'hidden' | 'online' | 'offline';

export interface PagePort {
  readonly visible: () => boolean;
  /** A hint and nothing more. */
  readonly online: () => boolean;
  readonly on: (event: PageEvent, run: () => void) => () => void;
}

export interface JournalWriter {
  /** Resolves once the text is flushed to the disk. */
  readonly append: (text: string) => Promise<void>;
  readonly close: () => Promise<void>;
}

/** Files of the second journal: one folder per lab, one file per page life. */
export interface JournalFiles {
  readonly folders: () => Promise<readonly string[]>;
  readonly list: (folder: string) => Promise<readonly string[]>;
  readonly read: (folder: string, name: string) => Promise<string>;
  readonly create: (folder: string, name: string) => Promise<JournalWriter>;
  readonly remove: (folder: string, name: string) => Promise<void>;
}

export interface StoragePort {
  readonly persist: () => Promise<boolean>;
  readonly persisted: () => Promise<boolean>;
  readonly estimate: () => Promise<{ readonly usage?: number; readonly quota?: number }>;
}

export interface ServiceWorkerPort {
  readonly register: (events: { readonly onWaiting: () => void; readonly onReplaced: () => void }) => void;
  /** Tells the waiting version to take over. */
  readonly activate: () => void;
  readonly reload: () => void;
}

export interface HttpRequest {
  readonly method: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly body: string | null;
  readonly signal: AbortSignal;
}
export type Http = (path: string, request: HttpRequest) => Promise<Response>;

export interface Ports {
  readonly clock: Clock;
  readonly random: RandomBytes;
  readonly chance: Chance;
  readonly timers: Timers;
  readonly idb: IdbPort;
  readonly locks: LockPort;
  readonly openBus: (name: string) => Bus;
  readonly small: SmallStore;
  readonly page: PagePort;
  readonly journal: JournalFiles;
  readonly storage: StoragePort;
  readonly http: Http;
  /** Null where there is none, as while developing. */
  readonly serviceWorker: ServiceWorkerPort | null;
  readonly subtle: SubtleCrypto;
  readonly build_ms: number;
  readonly app_version: string;
}
