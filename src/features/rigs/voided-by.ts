import type { RigDoc } from '../../domain/book/documents/rig';
import { voidedByRevision, type Voided } from '../../domain/rules/voided-by';

export interface RevisionCost extends Voided {
  /** Checks that somebody has begun and not closed. */
  readonly open_checks: number;
  readonly parting: boolean;
}

/** What a revision takes away from this rig, to be said before saving. */
export function voidedBy(rig: RigDoc, now_ms: number): RevisionCost {
  return {
    ...voidedByRevision(rig, now_ms),
    open_checks: rig.open_checks.length,
    parting: rig.heads.length > 1,
  };
}
