import { bytesWords } from '../../data/photos/photo-size';
import type { StepProgress } from '../../domain/rules/check-progress';
import { figure } from './step-reading';

/** What stands in the Book for a step, in one line. */
export function recordWords(
  { record, state, step }: StepProgress,
  nameOf: (id: string | null) => string,
): string {
  if (record === null) return 'not done yet';
  if (record.state === 'waived') return `waived by ${nameOf(record.by)}: ${record.words}`;
  const note = record.words === '' ? '' : `; ${record.words}`;
  return `${resultWords()}${state === 'outside-limits' ? ', outside its limits' : ''}${note}`;

  function resultWords(): string {
    const result = record?.result ?? null;
    switch (result?.type) {
      case undefined:
      case 'confirm':
        return `confirmed by ${nameOf(record?.by ?? null)}`;
      case 'reading':
        return `${figure(result.value)}\u2009${result.unit}`;
      case 'wait':
        return `waited ${Math.floor(result.waited_s)}\u2009s${result.required_s === null ? ', which proves nothing' : ''}`;
      case 'photo':
        return `photo, ${bytesWords(result.bytes)}, kept`;
      case 'second-person':
        return `${nameOf(record?.witness ?? null)} was there`;
      case 'computed':
        return step.type === 'computed' ? result.shown : 'confirmed';
    }
  }
}

export const STATE_WORDS: Readonly<Record<StepProgress['state'], string>> = {
  open: 'open',
  done: 'done',
  waived: 'waived',
  'outside-limits': 'outside limits',
};

const WAIVE_WORDS = { reviewer: 'a reviewer', operator: 'the operator' } as const;

/** Who may leave the step out, as it stands in the list. */
export function waiveWords(waive: 'never' | 'reviewer' | 'operator'): string {
  return waive === 'never' ? 'never waived' : `may be waived by ${WAIVE_WORDS[waive]}`;
}
