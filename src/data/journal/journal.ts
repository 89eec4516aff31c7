import type { SealedEntry } from '../../domain/book/entry';
import type { JournalFiles, JournalWriter, LockPort, Timers } from '../ports/ports';
import { journalLine, readJournal, type JournalHeader } from './journal-line';

const FOLDER_PREFIX = 'journal-';
/** A flush takes about a millisecond; one that takes this long is not coming. */
const FLUSH_LIMIT_MS = 2000;

interface JournalPorts {
  readonly files: JournalFiles;
  readonly locks: LockPort;
  readonly timers: Timers;
}

export function journalFolder(lab: string): string {
  return FOLDER_PREFIX + lab;
}

/** Labs that a journal exists for, also where IndexedDB knows of none any more. */
export async function journalledLabs(files: JournalFiles): Promise<readonly string[]> {
  const folders = await files.folders();
  return folders
    .filter((name) => name.startsWith(FOLDER_PREFIX))
    .map((name) => name.slice(FOLDER_PREFIX.length));
}

export interface Gathered {
  /** The newest header among files that no living page owns. */
  readonly header: JournalHeader | null;
  readonly entries: readonly SealedEntry[];
  readonly torn: readonly string[];
  readonly files: readonly string[];
}

/** Reads the files whose page is gone, under a lock so that two starting tabs do not both gather them (protocol 2.3). */
export async function gatherJournals(
  lab: string,
  ports: JournalPorts,
  work: (gathered: Gathered) => Promise<void>,
): Promise<void> {
  const folder = journalFolder(lab);
  await ports.locks.hold(`${folder}/gathering`, { wait: 'for-ever' }, async () => {
    const found: { name: string; text: ReturnType<typeof readJournal> }[] = [];
    for (const name of await ports.files.list(folder)) {
      // The page that writes a file holds a lock of its name for as long as it lives.
      await ports.locks.hold(`${folder}/${name}`, { wait: 'never' }, async () => {
        found.push({ name, text: readJournal(await ports.files.read(folder, name)) });
      });
    }
    await work({
      header: newestHeader(found.flatMap(({ text }) => (text.header === null ? [] : [text.header]))),
      entries: found.flatMap(({ text }) => text.entries),
      torn: found.flatMap(({ text }) => text.torn),
      files: found.map(({ name }) => name),
    });
  });
}

function newestHeader(headers: readonly JournalHeader[]): JournalHeader | null {
  return headers.reduce<JournalHeader | null>(
    (best, one) => (best === null || one.last_seq >= best.last_seq ? one : best),
    null,
  );
}

export interface Journal {
  /** True once the entry is flushed; false when only this copy failed. */
  readonly append: (entry: SealedEntry) => Promise<boolean>;
  readonly header: (header: JournalHeader) => Promise<boolean>;
  readonly close: () => Promise<void>;
}

/** The file of this page life, beginning with its header and with what older files still had to hand over. */
export async function openJournal(
  place: { readonly lab: string; readonly page_life: string },
  ports: JournalPorts,
  first: { readonly header: JournalHeader; readonly carried: readonly SealedEntry[] },
): Promise<Journal | null> {
  const folder = journalFolder(place.lab);
  const { release, held } = ownFile(ports.locks, `${folder}/${place.page_life}`);
  await held;
  const opened = await inTime(ports.timers, ports.files.create(folder, place.page_life));
  if (opened === null) {
    release();
    return null;
  }
  const write = (text: string) => flushed(ports.timers, opened, text);
  const begun = [
    journalLine({ header: first.header }),
    ...first.carried.map((entry) => journalLine({ entry })),
  ];
  if (!(await write(begun.join('')))) {
    release();
    return null;
  }
  return {
    append: (entry) => write(journalLine({ entry })),
    header: (header) => write(journalLine({ header })),
    close: async () => {
      await opened.close();
      release();
    },
  };
}

function ownFile(locks: LockPort, name: string) {
  let release = () => {};
  const living = new Promise<void>((resolve) => {
    release = resolve;
  });
  const held = new Promise<void>((resolve) => {
    void locks.hold(name, { wait: 'for-ever' }, async () => {
      resolve();
      await living;
    });
  });
  return { release, held };
}

async function flushed(timers: Timers, writer: JournalWriter, text: string): Promise<boolean> {
  return (
    (await inTime(
      timers,
      writer.append(text).then(() => true),
    )) === true
  );
}

async function inTime<T>(timers: Timers, work: Promise<T>): Promise<T | null> {
  let callOff = () => {};
  const late = new Promise<null>((resolve) => {
    callOff = timers.after(FLUSH_LIMIT_MS, () => {
      resolve(null);
    });
  });
  const outcome = await Promise.race([work.catch(() => null), late]);
  callOff();
  return outcome;
}
