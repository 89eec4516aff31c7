import type { BookDatabase } from './book-database';

export interface DeviceRecord {
  readonly id: string;
  readonly letter: string;
  readonly name: string;
  readonly lab: { readonly id: string; readonly name: string };
  /** Not extractable: it signs nonces and never leaves this browser (protocol 4.1). Null once the store was emptied. */
  readonly keys: CryptoKeyPair | null;
  /** The server has another entry at a seq of ours: the next sign-in makes a new tablet of this one (protocol 3.6). */
  readonly forked: boolean;
}

export interface ResumeRecord {
  readonly route: string | null;
  readonly field: string | null;
  readonly caret: number | null;
  readonly scroll: number;
}

/** The small keys of the strict store. */
export interface KeyValues {
  /** Its absence beside a journal tells an emptied store (protocol 2.3). */
  readonly sentinel: Pick<DeviceRecord, 'letter'> & { readonly device: string };
  readonly device: DeviceRecord;
  readonly epoch: string;
  readonly firing_count: number;
  readonly highest_wall_ms: number;
  readonly open_person: string | null;
  readonly resume: ResumeRecord;
  /** Torn journal lines and other findings of earlier starts, shown until somebody has seen them. */
  readonly findings: readonly string[];
}

export async function getKey<K extends keyof KeyValues>(
  database: BookDatabase,
  key: K,
): Promise<KeyValues[K] | undefined> {
  const row = await database.keys.get(key);
  return row?.value as KeyValues[K] | undefined;
}

export async function putKey<K extends keyof KeyValues>(
  database: BookDatabase,
  key: K,
  value: KeyValues[K],
): Promise<void> {
  await database.keys.put({ key, value });
}

/** Counts whose name is made of an id: revisions per rig, seqs written and acknowledged per tablet, sums of waits. */
export type CountKey =
  `revision_count/${string}` | `last_seq/${string}` | `acked_seq/${string}` | `wait/${string}`;

export async function getCount(database: BookDatabase, key: CountKey): Promise<number> {
  const row = await database.keys.get(key);
  return typeof row?.value === 'number' ? row.value : 0;
}

export async function putCount(database: BookDatabase, key: CountKey, value: number): Promise<void> {
  await database.keys.put({ key, value });
}
