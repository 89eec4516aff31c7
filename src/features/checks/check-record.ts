import type { CheckDoc } from '../../domain/book/documents/check';
import type { CheckProgress } from '../../domain/rules/check-progress';
import { momentWords } from '../../domain/report/time-words';
import { recordWords, STATE_WORDS, waiveWords } from './step-words';

export interface RecordRow {
  readonly key: string;
  readonly no: string;
  readonly title: string;
  readonly state: string;
  readonly said: string;
  readonly by: string;
  readonly when: string;
}

interface Facts {
  readonly progress: CheckProgress;
  readonly nameOf: (id: string | null) => string;
  readonly zone: string;
}

/** Every step of a check for the printed record: what was found, or why it was left out, by whom and when. */
export function recordRows({ progress, nameOf, zone }: Facts): readonly RecordRow[] {
  return progress.steps.map((one, i) => {
    const { record, step, state } = one;
    const witness = record?.witness ?? null;
    return {
      key: step.key,
      no: String(i + 1),
      title: step.title,
      state: STATE_WORDS[state],
      said: record === null ? `not done; ${waiveWords(step.waive)}` : recordWords(one, nameOf),
      by: record === null ? '' : `${nameOf(record.by)}${witness === null ? '' : `, with ${nameOf(witness)}`}`,
      when: record === null ? '' : whenWords(record.stamp, zone),
    };
  });
}

/** An uncertain clock is said, never hidden. */
export function whenWords(stamp: CheckDoc['opened']['stamp'], zone: string): string {
  return `${momentWords(stamp.wall_ms, zone)}${stamp.time_uncertain ? ', time uncertain' : ''}`;
}

/** Where the record stands in the Book, so that paper and Book can be held against each other. */
export function bookWords(
  check: CheckDoc,
  book: { readonly revision: number; readonly hash: string },
): string {
  const { ended } = check;
  if (ended === null) return 'The check is open.';
  if (ended.at === null)
    return `Closing entry ${ended.entry}, on this tablet only: the server has not given it a revision yet.`;
  return (
    `Closing entry ${ended.entry}, revision ${ended.at} of the Book. ` +
    `Printed from revision ${book.revision}, chain hash ${book.hash}.`
  );
}
