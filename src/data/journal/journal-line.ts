import * as z from 'zod/mini';
import { sealedEntrySchema, type SealedEntry } from '../../domain/book/entry';
import { hashText } from '../../domain/book/length-prefixed';
import { uuid } from '../../domain/book/ids';

/** What a journal has to know by itself when IndexedDB is gone (protocol 2.3). No key: OPFS refuses them. */
export const journalHeaderSchema = z.object({
  journal: z.literal(1),
  lab: uuid,
  lab_name: z.string(),
  device: uuid,
  letter: z.string(),
  device_name: z.string(),
  epoch: z.string(),
  last_seq: z.int(),
  firing_count: z.int(),
  grants: z.array(z.object({ id: uuid, name: z.string() })),
});
export type JournalHeader = z.infer<typeof journalHeaderSchema>;

const lineSchema = z.union([
  z.object({ header: journalHeaderSchema }),
  z.object({ entry: sealedEntrySchema }),
]);
export type JournalLine = z.infer<typeof lineSchema>;

export interface JournalText {
  /** The last header of the file; null where not even that could be read. */
  readonly header: JournalHeader | null;
  readonly entries: readonly SealedEntry[];
  /** Lines that a cut tore or a disk damaged, as they are: shown, never thrown away. */
  readonly torn: readonly string[];
}

const CHECK_DIGITS = 16;

/** One line: the first digits of the text's hash, a space, the text as JSON, a line feed. */
export function journalLine(line: JournalLine): string {
  const text = JSON.stringify(line);
  return `${hashText(text).slice(0, CHECK_DIGITS)} ${text}\n`;
}

export function readJournal(text: string): JournalText {
  let header: JournalHeader | null = null;
  const entries: SealedEntry[] = [];
  const torn: string[] = [];
  for (const raw of text.split('\n')) {
    if (raw === '') continue;
    const line = readLine(raw);
    if (line === null) torn.push(raw);
    else if ('header' in line) header = line.header;
    else entries.push(line.entry);
  }
  return { header, entries, torn };
}

function readLine(raw: string): JournalLine | null {
  const text = raw.slice(CHECK_DIGITS + 1);
  if (hashText(text).slice(0, CHECK_DIGITS) !== raw.slice(0, CHECK_DIGITS)) return null;
  const parsed = lineSchema.safeParse(JSON.parse(text));
  return parsed.success ? parsed.data : null;
}
