import type { SealedEntry, Verdict } from '../../src/domain/book/entry';
import type { Kind } from '../../src/domain/book/kinds';
import { PUSH_MAX_BYTES, PUSH_MAX_ENTRIES } from '../../src/domain/handover/wire';
import { DEMO_LAB, DEMO_TABLETS, type DemoTablet } from '../lab';
import { ADA, INGE, MILO } from '../people';
import type { Dice } from './dice';
import { createMemoryBook, type BookStart, type MemoryBook, type Outcome } from './memory-book';
import { createTablet, type Writing, type WritingTablet } from './tablet';

/** Entries as one tablet sent them under one person's own session. */
export interface Batch {
  readonly tablet: DemoTablet;
  readonly session: string;
  readonly received_ms: number;
  readonly entries: readonly SealedEntry[];
  /** What the domain's judge said of each; a server must say the same. */
  readonly outcomes: readonly Outcome[];
}

/** An entry that is meant to be met with something other than "applied". */
export interface OnPurpose {
  readonly name: string;
  readonly verdict: Exclude<Verdict, 'applied'>;
  readonly code: string;
}

/** The demo lab while its month is being written: one clock, one Book, two tablets. */
export interface Bench {
  readonly dice: Dice;
  readonly book: MemoryBook;
  readonly now: () => number;
  /** Sets the clock to a later moment. */
  readonly goTo: (at_ms: number) => void;
  readonly pass: (seconds: number) => void;
  /** Opens the app on every tablet. */
  readonly openAll: () => void;
  readonly pull: (tablet: DemoTablet) => void;
  readonly tablet: (tablet: DemoTablet) => WritingTablet;
  readonly write: <K extends Kind>(tablet: DemoTablet, kind: K, writing: Writing<K>) => string;
  readonly expect: (id: string, purpose: OnPurpose) => void;
  /** Everything that waits on a tablet goes to the Book, and the tablet pulls. */
  readonly handOver: (tablet: DemoTablet) => void;
  readonly batches: () => readonly Batch[];
  readonly onPurpose: () => ReadonlyMap<string, OnPurpose>;
}

/** People who have signed in on both demo tablets. */
export const GRANTED: readonly string[] = [ADA.id, MILO.id, INGE.id];

const HANDOVER_DELAY_MS = 4000;

export function createBench(start: Omit<BookStart, 'grants'>, dice: Dice): Bench {
  const grants = new Map(DEMO_TABLETS.map(({ id }) => [id, GRANTED]));
  const book = createMemoryBook({ ...start, grants });
  const setting = { lab: DEMO_LAB.id, zone: DEMO_LAB.zone, dice, base: book.head() };
  const tablets = new Map(DEMO_TABLETS.map((facts) => [facts.id, createTablet(facts, setting)]));
  const batches: Batch[] = [];
  const onPurpose = new Map<string, OnPurpose>();
  let now_ms = 0;

  const tablet = ({ id, letter }: DemoTablet) => {
    const found = tablets.get(id);
    if (found === undefined) throw new Error(`no tablet ${letter}`);
    return found;
  };
  const pull = (facts: DemoTablet) => tablet(facts).pull(book.head());
  const goTo = (at_ms: number) => {
    if (at_ms < now_ms) throw new Error(`the month would run backwards by ${(now_ms - at_ms) / 1000} s`);
    now_ms = at_ms;
  };

  return {
    dice,
    book,
    now: () => now_ms,
    goTo,
    pass: (seconds) => goTo(now_ms + Math.round(seconds * 1000)),
    openAll: () => {
      for (const one of tablets.values()) one.open(now_ms);
    },
    pull,
    tablet,
    write: (facts, kind, writing) => tablet(facts).write(kind, now_ms, writing).id,
    expect: (id, purpose) => onPurpose.set(id, purpose),
    handOver: (facts) => {
      const received_ms = now_ms + HANDOVER_DELAY_MS;
      for (const { session, entries } of byAuthor(tablet(facts).takePending())) {
        const outcomes = entries.map((entry) => book.take(entry, { session, now_ms: received_ms }));
        for (const [at, outcome] of outcomes.entries())
          requireExpected(entries[at]?.kind ?? '', outcome, onPurpose.get(outcome.id));
        batches.push({ tablet: facts, session, received_ms, entries, outcomes });
      }
      goTo(received_ms);
      pull(facts);
    },
    batches: () => batches,
    onPurpose: () => onPurpose,
  };
}

/** A seed that the judge sees otherwise than its author meant is wrong, and stops here with the entry and the reason. */
export function requireExpected(kind: string, outcome: Outcome, purpose: OnPurpose | undefined): void {
  const { id, verdict, reason } = outcome;
  const meant = purpose?.verdict ?? 'applied';
  if (verdict === meant && (purpose === undefined || reason?.code === purpose.code)) return;
  throw new Error(
    `demo entry ${kind} ${id}${purpose === undefined ? '' : ` (${purpose.name})`} was to be ${meant}, but is ` +
      `${verdict}${reason === null ? '' : `, ${reason.code}: ${reason.words}`}`,
  );
}

interface Run {
  readonly session: string;
  readonly entries: SealedEntry[];
}

/** An act counts only under its author's own session, so each run of one author's entries goes by itself. */
function byAuthor(entries: readonly SealedEntry[]): readonly Run[] {
  const runs: Run[] = [];
  let size = 0;
  for (const entry of entries) {
    if (entry.author === null) throw new Error('a demo entry has no author');
    const last = runs.at(-1);
    const bytes = JSON.stringify(entry).length;
    const fits =
      last?.session === entry.author &&
      last.entries.length < PUSH_MAX_ENTRIES &&
      size + bytes < PUSH_MAX_BYTES / 2;
    size = fits ? size + bytes : bytes;
    if (fits) last.entries.push(entry);
    else runs.push({ session: entry.author, entries: [entry] });
  }
  return runs;
}
