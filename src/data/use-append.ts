import type { Judged } from '../domain/rules/judge-context';
import { useMaybeLab } from './client-context';
import type { EntryDraft } from './store/entry-draft';
import type { WriteOutcome } from './writer';

export type AppendOutcome = WriteOutcome;
export type Draft = EntryDraft;

const NO_LAB: AppendOutcome = {
  type: 'not-saved',
  cause: 'closed',
  words: 'NOT SAVED: this tablet is not enrolled in any lab yet.',
  detail: '',
};
const NOT_JUDGED: Judged = {
  verdict: 'held-back',
  reason: { cause: 'rule', code: 'no-lab', words: 'This tablet is not enrolled in any lab yet.', knew: null },
};

/** The one way to write: show "logged" only when it answers `logged`. */
export function useAppend(): (draft: EntryDraft) => Promise<AppendOutcome> {
  return useMaybeLab()?.append ?? appendNowhere;
}

/** What would be said of an entry now, without writing it. */
export function useJudge(): (draft: EntryDraft) => Promise<Judged> {
  return useMaybeLab()?.judge ?? judgeNowhere;
}

function appendNowhere(): Promise<AppendOutcome> {
  return Promise.resolve(NO_LAB);
}

function judgeNowhere(): Promise<Judged> {
  return Promise.resolve(NOT_JUDGED);
}
