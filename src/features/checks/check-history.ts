import type { CheckDoc } from '../../domain/book/documents/check';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { SheetPurpose } from '../../domain/book/sheet-spec';
import { elapsedMs, type Stamp } from '../../domain/book/stamp';
import { ageWords, agoWords } from '../../domain/report/time-words';
import { checkLapse, checkTimeLeftMs } from '../../domain/rules/check-validity';

export interface HistoryFacts {
  readonly rig: RigDoc;
  readonly device: string;
  readonly now: Stamp;
}

/** What a walked check is worth now: what made it lapse, or how long it still counts. */
export function checkWorth(check: CheckDoc, { rig, device, now }: HistoryFacts): string {
  const { ended } = check;
  if (ended === null) return 'open';
  if (ended.how === 'abandoned') return `abandoned: ${ended.words}`;
  if (ended.irregular !== null) {
    return check.purpose === 'before-firing'
      ? 'closed with steps missing: it declared nothing but the danger'
      : 'closed with steps missing: it declared nothing';
  }
  if (check.purpose === 'make-safe') return 'declared shorted';
  if (check.purpose === 'gas-change') return 'done, before-firing checks before it are void';
  if (check.purpose !== 'before-firing') return 'done';
  if (rig.ready_check?.check !== check.id) return 'replaced by a later check';
  const lapse = checkLapse(rig, device, now);
  if (lapse !== null) return lapse.words;
  const left = checkTimeLeftMs(rig.ready_check, now);
  return left === null ? 'counts' : `counts for another ${ageWords(left)} without activity`;
}

export type HistoryEnd = 'all' | 'closed' | 'abandoned' | 'waived';

export interface HistoryFilter {
  readonly purpose: SheetPurpose | 'all';
  readonly end: HistoryEnd;
}

/** Checks of one purpose, or that ended in one way; "waived": those in which a step was left out. */
export function filterChecks(checks: readonly CheckDoc[], filter: HistoryFilter): readonly CheckDoc[] {
  return checks.filter(
    (check) => (filter.purpose === 'all' || check.purpose === filter.purpose) && endedAs(check, filter.end),
  );
}

function endedAs(check: CheckDoc, end: HistoryEnd): boolean {
  if (end === 'all') return true;
  if (end === 'waived') return Object.values(check.steps).some((step) => step.state === 'waived');
  return check.ended?.how === end;
}

/** "14 min ago"; a check from another page life with an uncertain clock has no age that anybody could vouch for. */
export function checkAge(check: CheckDoc, now: Stamp): string {
  const age_ms = elapsedMs((check.ended ?? check.opened).stamp, now);
  return age_ms === null ? 'age not known' : agoWords(age_ms);
}
