import type { Base, SealedEntry } from '../domain/book/entry';
import { bodyText, sealEntry } from '../domain/book/entry';
import { GENESIS_HASH, uuidFromBytes } from '../domain/book/ids';
import type { Judged } from '../domain/rules/judge-context';
import type { Journal } from './journal/journal';
import type { Bus, RandomBytes } from './ports/ports';
import { readDraft, type EntryDraft, type ReadDraft } from './store/entry-draft';
import type { BookStore } from './store/book-store';
import type { AppendOrder } from './store/append-entry';
import type { StorageFailure } from './store/storage-failure';
import type { BookView } from './view/book-view';
import type { Here } from './view/here';

export type WriteOutcome =
  | {
      readonly type: 'logged';
      readonly entry: SealedEntry;
      /** 2 once the second journal has it as well. */
      readonly copies: 1 | 2;
      readonly words: string;
      /** What the judge said here; null for an act, which waits for the server. */
      readonly forecast: Judged | null;
    }
  | StorageFailure
  | { readonly type: 'too-large'; readonly words: string }
  | { readonly type: 'unreadable'; readonly words: string };

export interface WriterParts {
  readonly store: BookStore;
  readonly view: BookView;
  readonly here: Here;
  readonly bus: Bus;
  readonly random: RandomBytes;
  readonly lab: string;
  readonly device: () => { readonly id: string; readonly letter: string };
  readonly epoch: () => string;
  readonly person: () => string | null;
  readonly journal: () => Journal | null;
  readonly appended: () => void;
}

export type Writer = ReturnType<typeof createWriter>;

/** The one way into the Book: checked, sealed and durable before it answers "logged" (protocol 2.4). */
export function createWriter(parts: WriterParts) {
  const { store, view, bus } = parts;

  const orderFor = (draft: EntryDraft, read: ReadDraft): AppendOrder => {
    const { id: device, letter } = parts.device();
    return {
      lab: parts.lab,
      device,
      letter,
      id: uuidFromBytes(parts.random(16)),
      salt: hex(parts.random(16)),
      draft: read,
      author: draft.author === undefined ? parts.person() : draft.author,
      witness: draft.witness ?? null,
      base: baseOf(view, parts.epoch()),
      stamp: parts.here.stamp(),
      number_floor: numberFloor(view, read, letter),
    };
  };

  return {
    append: async (draft: EntryDraft): Promise<WriteOutcome> => {
      const read = readDraft(draft);
      if (read.type !== 'ok') return read;
      const outcome = await store.append(orderFor(draft, read.draft));
      if (outcome.type === 'not-saved') return outcome;
      const { entry } = outcome.value;
      const journalled = (await parts.journal()?.append(entry)) ?? false;
      const forecast = await view.appended(outcome.value);
      bus.post({ type: 'appended' });
      parts.appended();
      return {
        type: 'logged',
        entry,
        copies: journalled ? 2 : 1,
        words: journalled ? 'logged' : 'logged, one copy only',
        forecast,
      };
    },
    /** What the judge would say of it now, without writing it. */
    judge: async (draft: EntryDraft): Promise<Judged> => {
      const read = readDraft(draft);
      if (read.type !== 'ok') {
        const reason = { cause: 'unreadable', code: read.type, words: read.words, knew: null } as const;
        return { verdict: 'held-back', reason };
      }
      return await view.judge(trial(orderFor(draft, read.draft)));
    },
  };
}

/** An entry as it would be, outside the sequence. */
function trial(order: AppendOrder): SealedEntry {
  const { lab, device, id, author, witness, base, stamp, draft, salt } = order;
  const subject = draft.subject === 'itself' ? id : draft.subject === 'lab' ? lab : draft.subject;
  const body = draft.number === null ? draft.body : { ...draft.body, number: '?' };
  const { kind, version } = draft;
  return sealEntry(
    { lab, id, device, seq: 1, kind, version, subject, author, witness, base, stamp },
    bodyText(body, salt),
  );
}

function baseOf(view: BookView, epochAtEnrolment: string): Base {
  const { epoch, revision, hash } = view.cursor();
  return epoch === null
    ? { epoch: epochAtEnrolment, revision: 0, hash: GENESIS_HASH }
    : { epoch, revision, hash };
}

/** The highest running number that the Book shows: a store that was emptied must not begin at 1 again. */
function numberFloor(view: BookView, { number, subject }: ReadDraft, letter: string): number {
  if (number === 'revision') {
    const rig = view.doc('rig', subject);
    return highest((rig?.revisions ?? []).map((revision) => Number.parseInt(revision.number, 10)));
  }
  if (number !== 'firing') return 0;
  const own = view.list('firing').filter((firing) => firing.number.startsWith(`${letter}-`));
  return highest(own.map((firing) => Number(firing.number.slice(letter.length + 1))));
}

function highest(numbers: readonly number[]): number {
  return numbers.reduce((best, one) => (one > best ? one : best), 0);
}

function hex(bytes: Uint8Array): string {
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
