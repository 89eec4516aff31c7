import type { Reason, SealedEntry } from '../../domain/book/entry';
import { entrySubstance, kindWords } from '../../domain/report/entry-words';
import { reasonWords } from '../../domain/report/reason-words';
import { momentWords } from '../../domain/report/time-words';

type Place = 'on this tablet' | 'sent' | 'backed up';
type Verdict = 'waiting' | 'applied' | 'irregular' | 'held-back' | 'altered';

/** An own entry as the data layer gives it. */
export interface EntryOfTablet {
  readonly entry: SealedEntry;
  readonly place: Place;
  readonly verdict: Verdict;
  readonly reason: Reason | null;
  readonly revision: number | null;
}

export interface EntryRow {
  readonly id: string;
  readonly seq: string;
  readonly when: string;
  readonly kind: string;
  readonly substance: string;
  readonly place: string;
  readonly verdict: string;
  /** Why it is irregular, held back or altered; empty otherwise. */
  readonly reason: string;
}

const VERDICTS: Readonly<Record<Verdict, string>> = {
  waiting: 'waits for the server',
  applied: 'in the Book',
  irregular: 'in the Book, irregular',
  'held-back': 'held back',
  altered: 'the first text stands, both are kept',
};

export function entryRow(own: EntryOfTablet, zone: string): EntryRow {
  const { entry, place, verdict, revision } = own;
  const at = revision === null ? '' : `, revision ${revision}`;
  return {
    id: entry.id,
    seq: String(entry.seq),
    when: momentWords(entry.stamp.wall_ms, zone) + (entry.stamp.time_uncertain ? ', time uncertain' : ''),
    kind: kindWords(entry.kind),
    substance: entrySubstance(entry, zone),
    place,
    verdict: `${VERDICTS[verdict]}${at}`,
    reason: reasonWords(own.reason),
  };
}

/** Bytes as people read them: "3.4 MB". Rounded up, since it is what is used. */
export function bytesWords(bytes: number): string {
  const units = ['B', 'kB', 'MB', 'GB'];
  let value = bytes;
  let at = 0;
  while (value >= 1000 && at < units.length - 1) {
    value /= 1000;
    at += 1;
  }
  const shown = at === 0 ? value : Math.ceil(value * 10) / 10;
  return `${shown}\u2009${units[at] ?? ''}`;
}
