import { unliftedStandDowns, type RigDoc, type StandDown } from '../book/documents/rig';
import type { Trace } from '../book/documents/trace';
import { elapsedMs, type StampPoint } from '../book/stamp';

/** Nothing that was declared is believed for longer than this. */
export const DECLARED_FOR_MS = 12 * 60 * 60_000;

export type DeclaredState = 'shorted' | 'short-off' | 'firing' | 'not-known';

export interface DeclaredView {
  readonly state: DeclaredState;
  /** The declaration or opened firing that it rests on; null when nothing was ever declared. */
  readonly trace: Trace | null;
  readonly age_ms: number | null;
  /** Why it is not known, in words. */
  readonly why: string | null;
  readonly stood_down: readonly StandDown[];
}

export interface Here {
  readonly device: string;
  readonly now: StampPoint;
}

/**
 * What may be believed about the rig from here (PRODUCT: Declared state). Another tablet, a new page life or 12 h turn
 * any declaration into "not known: treat as charged"; nothing ever turns into "shorted" by itself. `openFiring` is the
 * opening of the firing that is open on the rig, if there is one.
 */
export function declaredView(rig: RigDoc, openFiring: Trace | null, here: Here): DeclaredView {
  const stood_down = unliftedStandDowns(rig);
  const trace = openFiring ?? rig.declared;
  if (trace === null)
    return { state: 'not-known', trace, age_ms: null, why: 'nothing declared yet', stood_down };
  const age_ms = elapsedMs(trace.stamp, here.now);
  const why = whyUnknown(trace, here, age_ms);
  if (why !== null) return { state: 'not-known', trace, age_ms, why, stood_down };
  const state = openFiring !== null ? 'firing' : (rig.declared?.state ?? 'not-known');
  return { state, trace, age_ms, why: null, stood_down };
}

function whyUnknown(trace: Trace, here: Here, age_ms: number | null): string | null {
  if (trace.device !== here.device) return 'declared on another tablet';
  if (trace.stamp.page_life !== here.now.page_life) return 'tablet restarted';
  if (age_ms === null || age_ms > DECLARED_FOR_MS) return 'declared more than 12 h ago';
  return null;
}
