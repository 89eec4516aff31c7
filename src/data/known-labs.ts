import * as z from 'zod/mini';
import { isUuid, uuid } from '../domain/book/ids';
import { journalledLabs } from './journal/journal';
import type { IdbPort, JournalFiles, SmallStore } from './ports/ports';
import type { LabRef } from './session/session-types';
import { BOOK_PREFIX } from './store/book-database';

const KEY = 'holdoff-labs';
const labsSchema = z.array(z.object({ id: uuid, name: z.string() }));

/** Labs enrolled in this browser, the last used first. A hint only: the databases and the journals are asked as well. */
export function knownLabs(small: SmallStore) {
  const read = (): readonly LabRef[] => {
    try {
      const parsed = labsSchema.safeParse(JSON.parse(small.get(KEY) ?? '[]'));
      return parsed.success ? parsed.data : [];
    } catch {
      return [];
    }
  };
  const keep = (labs: readonly LabRef[]) => {
    small.set(KEY, JSON.stringify(labs));
  };
  return {
    read,
    used: ({ id, name }: LabRef) => {
      keep([{ id, name }, ...read().filter((one) => one.id !== id)]);
    },
    /** Ids to try at the start, the last used first. */
    candidates: async (idb: IdbPort, files: JournalFiles): Promise<readonly string[]> => {
      const listed = read().map((lab) => lab.id);
      const stored = await idb.indexedDB.databases().then(
        (all) =>
          all.flatMap(({ name }) => (name?.startsWith(BOOK_PREFIX) ? [name.slice(BOOK_PREFIX.length)] : [])),
        () => [],
      );
      const journalled = await journalledLabs(files).catch(() => []);
      return [...new Set([...listed, ...stored, ...journalled])].filter(isUuid);
    },
  };
}
