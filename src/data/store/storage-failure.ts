export type StorageCause = 'disk-full' | 'closed' | 'blocked' | 'unknown';

export interface StorageFailure {
  readonly type: 'not-saved';
  readonly cause: StorageCause;
  readonly words: string;
  /** What the browser said, for whoever is asked for help. */
  readonly detail: string;
}

const WORDS: Readonly<Record<StorageCause, string>> = {
  'disk-full': 'NOT SAVED: the storage of this tablet is full. Your text is still here.',
  closed: 'NOT SAVED: the tablet’s storage closed and did not open again. Your text is still here.',
  blocked:
    'NOT SAVED: another tab holds the storage in an older version. Close the other tabs. Your text is still here.',
  unknown: 'NOT SAVED: the tablet’s storage failed. Your text is still here.',
};

export function storageFailure(error: unknown): StorageFailure {
  const cause = storageCause(error);
  return { type: 'not-saved', cause, words: WORDS[cause], detail: String(error) };
}

const BY_NAME: Readonly<Record<string, StorageCause>> = {
  QuotaExceededError: 'disk-full',
  DatabaseClosedError: 'closed',
  InvalidStateError: 'closed',
  OpenFailedError: 'closed',
  VersionError: 'blocked',
  UpgradeError: 'blocked',
  BlockedError: 'blocked',
};

/** A full disk arrives as an AbortError with the cause inside it (protocol 2.4), so the innermost known name decides. */
export function storageCause(error: unknown): StorageCause {
  let cause: StorageCause = 'unknown';
  let at: unknown = error;
  for (let depth = 0; depth < 5 && typeof at === 'object' && at !== null; depth += 1) {
    const name = 'name' in at && typeof at.name === 'string' ? at.name : '';
    const known = BY_NAME[name];
    if (known === 'disk-full') return known;
    cause = known ?? cause;
    at = 'inner' in at ? at.inner : 'cause' in at ? at.cause : null;
  }
  return cause;
}
