import { CHECK_IDLE_MS, type ReadyCheck, type RigDoc } from '../book/documents/rig';
import { elapsedMs, type StampPoint } from '../book/stamp';

const MINUTE_MS = 60_000;
/** Whatever happens, a before-firing check is over after four hours (PRODUCT: Checks). */
export const CHECK_AGE_MS = 240 * MINUTE_MS;

export interface Lapse {
  readonly code: string;
  readonly words: string;
  readonly since: number | null;
}

/** Why the rig's before-firing check no longer counts on tablet `device` at `now`; null while it counts. */
export function checkLapse(rig: RigDoc, device: string, now: StampPoint): Lapse | null {
  const check = rig.ready_check;
  if (check === null)
    return { code: 'no-check', words: 'No before-firing check has been closed.', since: null };
  if (check.voided !== null)
    return { code: `check-${check.voided.code}`, words: check.voided.words, since: check.voided.at };
  if (!rig.heads.includes(check.rig_revision)) {
    return {
      code: 'check-other-revision',
      words: 'The check was walked on an earlier revision.',
      since: null,
    };
  }
  if (check.closed.device !== device || rig.holder !== device) {
    return {
      code: 'check-other-tablet',
      words: 'The check was walked on another tablet.',
      since: check.closed.at,
    };
  }
  return lapsedByTime(check, now);
}

/** Time left before the check lapses by itself, ms; null when it does not count any more. */
export function checkTimeLeftMs(check: ReadyCheck, now: StampPoint): number | null {
  const age = elapsedMs(check.closed.stamp, now);
  const idle = elapsedMs(check.active, now);
  if (check.voided !== null || age === null || idle === null) return null;
  const left = Math.min(CHECK_AGE_MS - age, CHECK_IDLE_MS - idle);
  return left > 0 ? left : null;
}

function lapsedByTime(check: ReadyCheck, now: StampPoint): Lapse | null {
  const age = elapsedMs(check.closed.stamp, now);
  const idle = elapsedMs(check.active, now);
  if (age === null || idle === null) {
    return {
      code: 'check-time-unknown',
      words: 'The tablet restarted with an uncertain clock, so the age of the check is not known.',
      since: null,
    };
  }
  if (idle > CHECK_IDLE_MS)
    return { code: 'check-idle', words: 'The check lapsed after 30 min without activity.', since: null };
  if (age > CHECK_AGE_MS) return { code: 'check-old', words: 'The check lapsed after 4 h.', since: null };
  return null;
}
