import type { RigDoc } from '../../domain/book/documents/rig';
import { ageWords } from '../../domain/report/time-words';
import { checkLapse } from '../../domain/rules/check-validity';
import type { DeclaredView, Here } from '../../domain/rules/declared-view';
import { elapsedMs } from '../../domain/book/stamp';

export interface TagEffect {
  /** What a tag does, and to which check. */
  readonly words: string;
  /** Why no hands should go in now; null when the rig is declared shorted. */
  readonly caution: string | null;
}

/** What hanging a tag brings about, said before it is hung. */
export function tagEffect(rig: RigDoc, view: DeclaredView, here: Here): TagEffect {
  return { words: checkWords(rig, here), caution: cautionWords(view) };
}

function checkWords(rig: RigDoc, { device, now }: Here): string {
  const always = 'While a tag hangs, no firing is ready here.';
  const check = rig.ready_check;
  if (check === null || checkLapse(rig, device, now) !== null) return always;
  const age = elapsedMs(check.closed.stamp, now);
  const when = age === null ? '' : ` of ${age < 60_000 ? 'just now' : `${ageWords(age)} ago`}`;
  return `A tag voids the before-firing check${when}: it has to be walked anew. ${always}`;
}

function cautionWords(view: DeclaredView): string | null {
  if (view.state === 'shorted') return null;
  if (view.state === 'firing') return 'A firing is open on this rig. Make safe before hands go in.';
  return 'This rig is not declared shorted: treat it as charged, and make safe before hands go in.';
}
